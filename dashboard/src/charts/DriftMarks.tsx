import { type DriftGeometry } from '@tailrace/shared/charts/drift-chart';
import { signedPercent } from './chart-words';
import { inks } from './inks';

/** The marks of the drift chart: reference period, capacities with their intervals, steps. */
export function DriftMarks({ geometry }: { geometry: DriftGeometry }) {
  const { plot, zero, reference } = geometry;
  const line = geometry.places.map((place) => `${place.x.toFixed(1)},${place.y.toFixed(1)}`).join('L');
  return (
    <g fill="none">
      <path d={`M${plot.left},${zero}H${plot.right}`} stroke={inks.quiet} />
      {line && <path d={`M${line}`} stroke={inks.quiet} strokeWidth={1} />}
      {geometry.places.map((place) => (
        <g key={place.at} stroke={inks.ink}>
          <path
            d={`M${place.x},${place.low}V${place.high}m-3,0h6M${place.x - 3},${place.low}h6`}
            strokeWidth={1.25}
          />
          <circle cx={place.x} cy={place.y} r={3.5} fill={place.beyond ? inks.ink : inks.paper} />
        </g>
      ))}
      {geometry.steps.map((step) => (
        <g key={step.at}>
          <path
            d={`M${step.x},${plot.top}V${plot.bottom}`}
            stroke={inks.rust}
            strokeWidth={1.5}
            strokeDasharray="5 3"
          />
          <text
            x={step.x > plot.right - 80 ? step.x - 5 : step.x + 5}
            y={plot.bottom - 6}
            textAnchor={step.x > plot.right - 80 ? 'end' : 'start'}
            fill={inks.ink}
            stroke={inks.paper}
            strokeWidth={4}
            paintOrder="stroke"
          >
            {`step ${signedPercent(step.percent)}`}
          </text>
        </g>
      ))}
      {reference.right > reference.left && (
        <text x={reference.left + 4} y={plot.top + 13} fill={inks.quiet}>
          reference
        </text>
      )}
    </g>
  );
}
