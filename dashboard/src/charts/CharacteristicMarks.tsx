import { type CharacteristicGeometry, type CurveLabel } from '@tailrace/shared/charts/characteristic-chart';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { type ReactNode } from 'react';
import { inks } from './inks';

interface CharacteristicMarksProps {
  geometry: CharacteristicGeometry;
  /** is the shape at this travel outside its tolerance? such points are filled */
  outside: (travel: number) => boolean;
}

/** The curves, bands and points of the characteristic chart, from the quietest to what was found. */
export function CharacteristicMarks({ geometry, outside }: CharacteristicMarksProps) {
  const { plot } = geometry;
  return (
    <g fill="none">
      <path d={geometry.tolerance} fill={inks.band} />
      {geometry.ridge?.percentiles.map(({ name, x }) => (
        <path
          key={name}
          d={`M${x},${plot.top}V${plot.bottom}`}
          stroke={inks.quiet}
          strokeWidth={0.75}
          strokeDasharray="1 4"
        />
      ))}
      {geometry.percentileNames.map(({ name, travel, x }) => (
        <text key={name} x={x} y={plot.bottom + 18} textAnchor="middle" fill={inks.quiet}>
          {name} <tspan fill={inks.ink}>{figureText(travel)}</tspan>
        </text>
      ))}
      <path d={geometry.specified} stroke={inks.quiet} strokeWidth={1.25} />
      <path d={geometry.fittedBand} fill={inks.ink} fillOpacity={0.18} />
      {geometry.points
        .filter((point) => !outside(point.travel))
        .map((point) => (
          <circle
            key={point.travel}
            cx={point.x}
            cy={point.y}
            r={point.radius}
            fill={inks.paper}
            stroke={inks.ink}
          />
        ))}
      <path d={geometry.beyondFitted} stroke={inks.ink} strokeWidth={2} strokeDasharray="2 4" />
      <path d={geometry.fitted} stroke={inks.ink} strokeWidth={2.75} strokeLinecap="round" />
      {geometry.points
        .filter((point) => outside(point.travel))
        .map((point) => (
          <circle
            key={point.travel}
            cx={point.x}
            cy={point.y}
            r={point.radius + 0.5}
            fill={inks.rust}
            stroke={inks.paper}
          />
        ))}
    </g>
  );
}

interface CurveNameProps {
  label: CurveLabel | null;
  strong?: boolean;
  children: ReactNode;
}

/** A curve's name beside the curve, on a rim of paper so that lines under it do not cross the letters. */
export function CurveName({ label, strong = false, children }: CurveNameProps) {
  if (!label) return null;
  return (
    <text
      x={label.x}
      y={label.y}
      textAnchor={label.anchor}
      fill={strong ? inks.ink : inks.quiet}
      fontWeight={strong ? 700 : 400}
      stroke={inks.paper}
      strokeWidth={4}
      strokeLinejoin="round"
      paintOrder="stroke"
    >
      {children}
    </text>
  );
}
