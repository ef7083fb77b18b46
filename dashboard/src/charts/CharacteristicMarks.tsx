import { type CharacteristicGeometry, type CurveLabel } from '@tailrace/shared/charts/characteristic-chart';
import { type ReactNode } from 'react';
import { inks } from './inks';

/** The curves, bands and points of the characteristic chart, from the quietest to what was found. */
export function CharacteristicMarks({ geometry }: { geometry: CharacteristicGeometry }) {
  const { plot, ridge } = geometry;
  return (
    <g fill="none">
      <path d={geometry.tolerance} fill={inks.band} />
      {ridge.percentiles.map(({ name, x }) => (
        <path
          key={name}
          d={`M${x},${plot.top}V${plot.bottom}`}
          stroke={inks.quiet}
          strokeWidth={0.75}
          strokeDasharray="1 4"
        />
      ))}
      <path d={geometry.specified} stroke={inks.quiet} strokeWidth={1.25} />
      <path d={geometry.fittedBand} fill={inks.ink} fillOpacity={0.18} />
      {geometry.points.map((point) => (
        <circle
          key={point.travel}
          cx={point.x}
          cy={point.y}
          r={point.radius}
          fill={inks.paper}
          stroke={inks.ink}
          strokeWidth={1}
        />
      ))}
      <path d={geometry.beyondFitted} stroke={inks.ink} strokeWidth={2} strokeDasharray="2 4" />
      <path d={geometry.fitted} stroke={inks.ink} strokeWidth={2.75} strokeLinecap="round" />
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
