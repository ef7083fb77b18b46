import { type Size } from '@tailrace/shared/charts/box';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { movementBars } from '@tailrace/shared/charts/movement-bars';
import { dayText } from '@tailrace/shared/charts/time-scale';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { AcrossAxis, UpAxis } from './Axes';
import { ChartFrame, type Drawing } from './ChartFrame';
import { rowsOf } from './chart-words';
import { inks } from './inks';

interface MovementBarsProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  movement: Pick<
    NonNullable<PresentedAssessment['movement']>,
    'perDay' | 'threshold' | 'reversalsPerDay' | 'travelPerDay'
  >;
  /** IANA zone of the site */
  zone: string;
}

/** How far the valve went and how often it turned, day by day. */
export function MovementBars({ tag, movement, zone }: MovementBarsProps) {
  const days = movement.perDay.map((day) => ({ ...day, day: Date.parse(day.day) / 1000 }));
  const means = `${figureText(movement.travelPerDay)} % travel and ${figureText(movement.reversalsPerDay)} reversals a day`;
  const draw = (size: Size): Drawing => {
    const { travel, reversals, timeTicks } = movementBars(days, size, zone);
    const panels = [
      { panel: travel, title: 'Travel a day, %', name: 'Travel', unit: ' %' },
      { panel: reversals, title: 'Reversals a day', name: 'Reversals', unit: '' },
    ];
    return {
      marks: (
        <>
          {panels.map(({ panel, title }) => (
            <g key={title}>
              <UpAxis ticks={panel.valueTicks} plot={panel.plot} title={title} />
              {panel.bars.map((bar) => (
                <rect
                  key={bar.day}
                  x={bar.x}
                  y={bar.y}
                  width={bar.width}
                  height={bar.height}
                  fill={inks.quiet}
                />
              ))}
            </g>
          ))}
          <AcrossAxis
            ticks={timeTicks}
            y={reversals.plot.bottom}
            right={reversals.plot.right}
            title={`Day, ${zone}`}
          />
        </>
      ),
      series: panels.map(({ panel, name, unit }) => ({
        name,
        readings: panel.bars.map((bar) => ({
          x: bar.x + bar.width / 2,
          y: bar.y,
          text: `${dayText(bar.day, zone)}: ${figureText(bar.value)}${unit}`,
        })),
      })),
    };
  };
  return (
    <ChartFrame
      title="Movement"
      note={`${means} on average; moves under ${figureText(movement.threshold)} % not counted`}
      summary={`Movement over ${days.length} days in service: ${means} on average.`}
      fileName={`${tag} movement`}
      height={() => 300}
      table={{
        columns: ['Day', 'Travel, %', 'Reversals'],
        rows: rowsOf(
          days.map((day) => dayText(day.day, zone)),
          days.map((day) => day.travel),
          days.map((day) => day.reversals),
        ),
      }}
      draw={draw}
    />
  );
}
