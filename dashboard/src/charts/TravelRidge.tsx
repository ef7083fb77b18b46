import { travelRidge, type Ridge } from '@tailrace/shared/charts/travel-ridge';
import { travelTicks } from '@tailrace/shared/charts/travel-scale';
import { ridgeInWords } from './chart-words';
import { inks, lettering } from './inks';
import { RidgeMarks } from './RidgeMarks';

interface TravelRidgeProps {
  ridge: Ridge | null;
  /** px; rows of one list must have the same */
  width?: number;
  height?: number;
  /** whose travel it is: the tag */
  label: string;
}

/** px left and right of the axis, so that what belongs to 0 and 100 % is not cut off. */
const margin = 8;

/** Where a valve has spent its time, in one row of a list. */
export function TravelRidge({ ridge, width = 320, height = 44, label }: TravelRidgeProps) {
  const geometry = travelRidge(ridge, { left: margin, right: width - margin, top: 2, bottom: height });
  return (
    <svg
      role="img"
      aria-label={`${label}, ${ridgeInWords(ridge, geometry.outside)}`}
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      height={height}
      {...lettering}
    >
      <RidgeMarks geometry={geometry} />
    </svg>
  );
}

/** The numbers of the axis that all ridges of a list share, for the head of their column. */
export function TravelRidgeAxis({ width = 320 }: { width?: number }) {
  return (
    <svg aria-hidden viewBox={`0 0 ${width} 14`} width={width} height={14} {...lettering} fontSize={11}>
      {travelTicks(margin, width - margin).map((tick) => (
        <text key={tick.value} x={tick.at} y={11} textAnchor="middle" fill={inks.quiet}>
          {tick.text}
        </text>
      ))}
    </svg>
  );
}
