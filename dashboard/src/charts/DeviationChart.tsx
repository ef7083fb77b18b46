import { type Size } from '@tailrace/shared/charts/box';
import { deviationChart } from '@tailrace/shared/charts/deviation-chart';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { AcrossAxis, UpAxis } from './Axes';
import { ChartFrame, type Drawing } from './ChartFrame';
import { deviationInWords, rowsOf, signedPercent } from './chart-words';
import { inks } from './inks';

interface DeviationChartProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  bins: NonNullable<PresentedAssessment['deviation']>['byTravel'];
}

/** How far the shape lies from the data sheet's, bin by bin, against the tolerance there. */
export function DeviationChart({ tag, bins }: DeviationChartProps) {
  const draw = (size: Size): Drawing => {
    const { plot, zero, ...geometry } = deviationChart(bins, size);
    return {
      marks: (
        <>
          <path d={geometry.tolerance} fill={inks.band} />
          <UpAxis ticks={geometry.valueTicks} plot={plot} title="Deviation in shape, % of specified" />
          <path d={`M${plot.left},${zero}H${plot.right}`} stroke={inks.quiet} />
          {geometry.bins.map((bin) => (
            <g key={bin.travel} stroke={bin.beyond ? inks.rust : inks.ink}>
              <path d={`M${bin.x},${zero}V${bin.y}`} strokeWidth={bin.beyond ? 2.5 : 1.25} />
              <circle cx={bin.x} cy={bin.y} r={3.5} fill={bin.beyond ? inks.rust : inks.paper} />
            </g>
          ))}
          <AcrossAxis ticks={geometry.travelTicks} y={plot.bottom} right={plot.right} title="Travel, %" />
        </>
      ),
      series: [
        {
          name: 'Deviation',
          readings: geometry.bins.map((bin) => ({
            x: bin.x,
            y: bin.y,
            text: `${figureText(bin.travel)} % travel: ${signedPercent(bin.percent)}, tolerance ±${figureText(bin.tolerance)} %`,
          })),
        },
      ],
    };
  };
  return (
    <ChartFrame
      title="Deviation from the data sheet"
      note="After the capacity ratio is taken out. Grey: tolerance of IEC 60534-2-4. Filled: beyond it."
      summary={deviationInWords(bins)}
      fileName={`${tag} deviation`}
      height={() => 240}
      table={{
        columns: ['Travel, %', 'Deviation, %', 'Tolerance, ± %'],
        rows: rowsOf(
          bins.map((bin) => bin.travel),
          bins.map((bin) => bin.percent),
          bins.map((bin) => bin.tolerance),
        ),
      }}
      draw={draw}
    />
  );
}
