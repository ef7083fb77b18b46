import { type Box, type Tick } from '@tailrace/shared/charts/box';
import { inks } from './inks';

interface AcrossAxisProps {
  ticks: readonly Tick[];
  /** px of the line the ticks hang from */
  y: number;
  title: string;
  /** px where the title ends */
  right: number;
}

/** The axis under a drawing: ticks, numbers, and its title at the right end. */
export function AcrossAxis({ ticks, y, title, right }: AcrossAxisProps) {
  return (
    <g>
      {ticks.map((tick) => (
        <g key={tick.value}>
          <path d={`M${tick.at},${y}v4`} stroke={inks.quiet} />
          <text x={tick.at} y={y + 16} textAnchor="middle" fill={inks.ink}>
            {tick.text}
          </text>
        </g>
      ))}
      <text x={right} y={y + 31} textAnchor="end" fill={inks.quiet}>
        {title}
      </text>
    </g>
  );
}

interface UpAxisProps {
  ticks: readonly Tick[];
  plot: Box;
  title: string;
}

/** The axis at the left of a drawing: faint lines across, numbers, and its title above. */
export function UpAxis({ ticks, plot, title }: UpAxisProps) {
  return (
    <g>
      {ticks.map((tick) => (
        <g key={tick.value}>
          <path d={`M${plot.left},${tick.at}H${plot.right}`} stroke={inks.line} strokeWidth={0.75} />
          <text x={plot.left - 6} y={tick.at + 4} textAnchor="end" fill={inks.ink}>
            {tick.text}
          </text>
        </g>
      ))}
      <text x={0} y={plot.top - 12} fill={inks.quiet}>
        {title}
      </text>
    </g>
  );
}
