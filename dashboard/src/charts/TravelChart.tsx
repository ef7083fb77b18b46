import { plotBox } from '@tailrace/shared/charts/box';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { sharesOutside } from '@tailrace/shared/charts/share-profile';
import { travelRidge, type Ridge } from '@tailrace/shared/charts/travel-ridge';
import { travelTicks } from '@tailrace/shared/charts/travel-scale';
import { AcrossAxis } from './Axes';
import { ChartFrame, type Drawing } from './ChartFrame';
import { percent, ridgeInWords, rowsOf } from './chart-words';
import { inks } from './inks';
import { RidgeMarks } from './RidgeMarks';

interface TravelChartProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  ridge: Ridge;
}

/** The travel ridge at the size of a sheet, with its numbers and a table by tenths of travel. */
export function TravelChart({ tag, ridge }: TravelChartProps) {
  const outside = sharesOutside(ridge.shares, ridge.band);
  const part = 100 / Math.max(1, ridge.shares.length);

  const draw = (size: { width: number; height: number }): Drawing => {
    const plot = plotBox(size);
    const geometry = travelRidge(ridge, plot);
    return {
      marks: (
        <>
          <RidgeMarks geometry={geometry} />
          {outside.below > 0.001 && (
            <text x={plot.left} y={14} fill={inks.ink}>
              {`${percent(outside.below)} below ${figureText(ridge.band.low)}`}
            </text>
          )}
          {outside.above > 0.001 && (
            <text x={plot.right} y={14} textAnchor="end" fill={inks.ink}>
              {`${percent(outside.above)} above ${figureText(ridge.band.high)}`}
            </text>
          )}
          <AcrossAxis
            ticks={travelTicks(plot.left, plot.right)}
            y={plot.bottom}
            right={plot.right}
            title="Travel, %"
          />
        </>
      ),
      series: [
        {
          name: 'Share of time',
          readings: geometry.edge.slice(1, -1).map((place, i) => ({
            ...place,
            text: `${figureText(i * part)} to ${figureText((i + 1) * part)} % travel: ${percent(ridge.shares[i] ?? 0)} of the time`,
          })),
        },
      ],
    };
  };

  return (
    <ChartFrame
      title="Travel"
      note="Share of time in service by travel; bracket: the band specified; ticks: 5, 50 and 95 % of the time below"
      summary={`${tag}, ${ridgeInWords(ridge, outside)}`}
      fileName={`${tag} travel`}
      height={() => 170}
      table={{ columns: ['Travel, %', 'Share of time, %'], rows: byTenths(ridge.shares) }}
      draw={draw}
    />
  );
}

/** The shares of time summed by tenths of travel: a hundred rows would hide what ten show. */
function byTenths(shares: readonly number[]): string[][] {
  const total = shares.reduce((sum, share) => sum + share, 0);
  const lows = Array.from({ length: 10 }, (_, tenth) => tenth * 10);
  return rowsOf(
    lows.map((low) => `${low} to ${low + 10}`),
    lows.map((low) => {
      const { below, above } = sharesOutside(shares, { low, high: low + 10 });
      return ((total - below - above) * 100).toFixed(1);
    }),
  );
}
