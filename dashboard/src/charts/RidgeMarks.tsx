import { type RidgeGeometry } from '@tailrace/shared/charts/travel-ridge';
import { inks } from './inks';

/** The marks of a travel ridge: ridge, axis, percentile ticks and the bracket of the specified band. */
export function RidgeMarks({ geometry }: { geometry: RidgeGeometry }) {
  const { left, right, top, baseline } = geometry;
  return (
    <g fill="none">
      <path d={geometry.within} fill={inks.quiet} />
      <path d={geometry.beyond} fill={inks.rust} />
      <path d={geometry.hatch} stroke={inks.paper} strokeWidth={1} />
      <path d={geometry.beyond} stroke={inks.rust} strokeWidth={1} />
      {geometry.cuts.map((x) => (
        <path key={x} d={`M${x - 9},${top + 8}l18,-5`} stroke={inks.paper} strokeWidth={2} />
      ))}
      <path d={`M${left},${baseline}H${right}`} stroke={inks.line} />
      <path
        d={`M${left + 0.5},${baseline - 4}v8M${right - 0.5},${baseline - 4}v8`}
        stroke={inks.quiet}
        strokeWidth={1}
      />
      {geometry.percentiles.map(({ name, x }) => (
        <path
          key={name}
          d={name === 'p50' ? `M${x},${baseline - 3}V${baseline + 6}` : `M${x},${baseline}V${baseline + 6}`}
          stroke={inks.ink}
          strokeWidth={name === 'p50' ? 2.5 : 1.25}
        />
      ))}
      <path d={geometry.bracket} stroke={inks.quiet} strokeWidth={1.25} />
    </g>
  );
}
