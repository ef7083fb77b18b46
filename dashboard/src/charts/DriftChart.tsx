import { type Size } from '@tailrace/shared/charts/box';
import { driftChart } from '@tailrace/shared/charts/drift-chart';
import { dayText } from '@tailrace/shared/charts/time-scale';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { AcrossAxis, UpAxis } from './Axes';
import { ChartFrame, type Drawing } from './ChartFrame';
import { changeInWords, trendInWords } from './chart-words';
import { DriftMarks } from './DriftMarks';
import { inks } from './inks';

interface DriftChartProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  /** changes as ln of capacity, as assessed */
  drift: NonNullable<PresentedAssessment['drift']>;
  /** IANA zone of the site */
  zone: string;
}

const seconds = (instant: string): number => Date.parse(instant) / 1000;

/** Capacity month by month against the reference period, with intervals and the steps found. */
export function DriftChart({ tag, drift, zone }: DriftChartProps) {
  const drawn = {
    reference: { from: seconds(drift.reference.from), to: seconds(drift.reference.to) },
    series: drift.series.map((place) => ({ ...place, at: seconds(place.at) })),
    steps: drift.steps.map((step) => ({ ...step, at: seconds(step.at) })),
  };
  const draw = (size: Size): Drawing => {
    const geometry = driftChart(drawn, size, zone);
    const { plot, reference } = geometry;
    return {
      marks: (
        <>
          <rect
            x={reference.left}
            y={plot.top}
            width={reference.right - reference.left}
            height={plot.bottom - plot.top}
            fill={inks.band}
          />
          <UpAxis
            ticks={geometry.valueTicks}
            plot={plot}
            title="Capacity, % change from the reference period"
          />
          <DriftMarks geometry={geometry} />
          <AcrossAxis ticks={geometry.timeTicks} y={plot.bottom} right={plot.right} title={`Time, ${zone}`} />
        </>
      ),
      series: [
        {
          name: 'Capacity',
          readings: geometry.places.map((place) => ({
            x: place.x,
            y: place.y,
            text: `${dayText(place.at, zone)}: ${changeInWords(place)}, from ${place.windows} windows`,
          })),
        },
      ],
    };
  };
  return (
    <ChartFrame
      title={`Capacity by ${drift.by}`}
      note={trendInWords(drift.trend)}
      summary={`Capacity by ${drift.by}, ${drift.series.length} points against the reference period. ${trendInWords(drift.trend)}`}
      fileName={`${tag} capacity`}
      height={() => 260}
      table={{
        columns: [`${drift.by === 'month' ? 'Month' : 'Week'} about`, 'Change (interval)', 'Steady windows'],
        rows: drawn.series.map((place) => [
          dayText(place.at, zone),
          changeInWords({
            percent: 100 * Math.expm1(place.change),
            lowPercent: 100 * Math.expm1(place.low),
            highPercent: 100 * Math.expm1(place.high),
          }),
          String(place.windows),
        ]),
      }}
      draw={draw}
    />
  );
}
