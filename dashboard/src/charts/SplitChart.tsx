import { type Size } from '@tailrace/shared/charts/box';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { splitChart, type SplitPlace } from '@tailrace/shared/charts/split-chart';
import { AcrossAxis, UpAxis } from './Axes';
import { ChartFrame, type Drawing } from './ChartFrame';
import { deadBandInWords, rowsOf } from './chart-words';
import { inks } from './inks';

interface SplitChartProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  /** what follows what, as the sheet calls it: "Demand to position" */
  title: string;
  /** names of both axes with their unit: "Demand, %" and "Position, %" */
  reference: string;
  response: string;
  split: { deadBand: number; standardError: number; bins: number; lines: readonly SplitPlace[] };
}

type Pair = ReturnType<typeof splitChart>['places'][number];
const upper = ({ up, down }: Pair) => (down.y < up.y ? down : up);
const lower = ({ up, down }: Pair) => (down.y < up.y ? up : down);

/** What the response was while rising and while falling: the gap between the lines is the dead band. */
export function SplitChart({ tag, title, reference, response, split }: SplitChartProps) {
  const words = deadBandInWords(split);
  const draw = (size: Size): Drawing => {
    const { plot, places, ...geometry } = splitChart(split.lines, size);
    const middle = places[Math.floor(places.length / 2)];
    const read = (direction: 'up' | 'down') =>
      places.map((place) => ({
        ...place[direction],
        text: `${reference} ${figureText(place.at)}: ${response} ${figureText(place[direction].value)}`,
      }));
    return {
      marks: (
        <g fill="none">
          <UpAxis ticks={geometry.valueTicks} plot={plot} title={response} />
          <path d={geometry.between} fill={inks.band} />
          <path d={geometry.up} stroke={inks.ink} strokeWidth={2} />
          <path d={geometry.down} stroke={inks.ink} strokeWidth={2} strokeDasharray="6 3" />
          {places.map(({ at, up, down }) => (
            <g key={at} fill={inks.ink}>
              <path d={`M${up.x - 4},${up.y + 3}h8l-4,-7z`} />
              <path d={`M${down.x - 4},${down.y - 3}h8l-4,7z`} fill={inks.paper} stroke={inks.ink} />
            </g>
          ))}
          {middle && (
            <g fill={inks.ink}>
              <text x={middle.x - 8} y={upper(middle).y - 8} textAnchor="end">
                {middle.down.y < middle.up.y ? 'falling' : 'rising'}
              </text>
              <text x={middle.x + 8} y={lower(middle).y + 20}>
                {middle.down.y < middle.up.y ? 'rising' : 'falling'}
              </text>
            </g>
          )}
          <AcrossAxis ticks={geometry.acrossTicks} y={plot.bottom} right={plot.right} title={reference} />
        </g>
      ),
      series: [
        { name: 'Rising', readings: read('up') },
        { name: 'Falling', readings: read('down') },
      ],
    };
  };
  return (
    <ChartFrame
      title={title}
      note={words}
      summary={`${title}: ${words}.`}
      fileName={`${tag} ${title.toLowerCase()}`}
      height={() => 260}
      table={{
        columns: [reference, `${response}, rising`, `${response}, falling`],
        rows: rowsOf(
          split.lines.map((line) => line.at),
          split.lines.map((line) => line.up),
          split.lines.map((line) => line.down),
        ),
      }}
      draw={draw}
    />
  );
}
