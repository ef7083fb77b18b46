import { type Size } from '@tailrace/shared/charts/box';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { gainChart, wantedGain } from '@tailrace/shared/charts/gain-chart';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { AcrossAxis, UpAxis } from './Axes';
import { ChartFrame, type Drawing } from './ChartFrame';
import { gainRatioInWords, rowsOf } from './chart-words';
import { inks } from './inks';

interface GainChartProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  gain: NonNullable<PresentedAssessment['gain']>;
}

/** How much flow a step of travel makes, over the travel used. */
export function GainChart({ tag, gain }: GainChartProps) {
  const unit = gain.absolute ? '% of flow span per % travel' : 'shape only, no unit';
  const draw = (size: Size): Drawing => {
    const { plot, wanted, ...geometry } = gainChart(gain.points, gain.absolute, size);
    return {
      marks: (
        <>
          {wanted && (
            <>
              <rect
                x={plot.left}
                y={wanted.top}
                width={plot.right - plot.left}
                height={wanted.bottom - wanted.top}
                fill={inks.band}
              />
              <text x={plot.right - 6} y={wanted.top + 16} textAnchor="end" fill={inks.quiet}>
                {`wanted: ${wantedGain.low} to ${wantedGain.high}`}
              </text>
            </>
          )}
          <UpAxis ticks={geometry.valueTicks} plot={plot} title={`Installed gain, ${unit}`} />
          <path d={geometry.line} fill="none" stroke={inks.ink} strokeWidth={2.5} strokeLinejoin="round" />
          {geometry.points.length === 1 &&
            geometry.points.map((point) => (
              <circle key={point.travel} cx={point.x} cy={point.y} r={3.5} fill={inks.ink} />
            ))}
          <AcrossAxis ticks={geometry.travelTicks} y={plot.bottom} right={plot.right} title="Travel, %" />
        </>
      ),
      series: [
        {
          name: 'Gain',
          readings: geometry.points.map(({ x, y, travel, gain: value }) => ({
            x,
            y,
            text: `${figureText(travel)} % travel: gain ${figureText(value, 2)}`,
          })),
        },
      ],
    };
  };
  return (
    <ChartFrame
      title="Installed gain"
      note={`Largest to smallest ${gainRatioInWords(gain.ratio)}; 10 to 90 % of day resamples`}
      summary={`Installed gain over the travel used, largest to smallest ${gainRatioInWords(gain.ratio)}.`}
      fileName={`${tag} installed gain`}
      height={() => 240}
      table={{
        columns: ['Travel, %', `Gain, ${unit}`],
        rows: rowsOf(
          gain.points.map((point) => point.travel),
          gain.points.map((point) => point.gain),
        ),
      }}
      draw={draw}
    />
  );
}
