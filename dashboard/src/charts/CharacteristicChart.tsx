import { characteristicChart } from '@tailrace/shared/charts/characteristic-chart';
import { curveAt } from '@tailrace/shared/charts/curve-between';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { useState } from 'react';
import { AcrossAxis, UpAxis } from './Axes';
import { CharacteristicMarks, CurveName } from './CharacteristicMarks';
import { ChartFrame, type Drawing } from './ChartFrame';
import { ChartTool } from './ChartTool';
import { basisInWords, characteristicInWords, outsideTolerance, rowsOf } from './chart-words';
import { RidgeMarks } from './RidgeMarks';

interface CharacteristicChartProps {
  /** the valve's tag, for the name of a saved file */
  tag: string;
  characteristic: NonNullable<PresentedAssessment['characteristic']>;
  range: PresentedAssessment['range'];
  deviation: PresentedAssessment['deviation'];
}

/** What was found of the characteristic, over what was specified, above the travel it was found from. */
export function CharacteristicChart({ tag, characteristic, range, deviation }: CharacteristicChartProps) {
  const [axis, setAxis] = useState<'linear' | 'log'>('linear');
  const { unit, points, curve, specified, pressureDrop } = characteristic;
  const quantity = `${pressureDrop === 'none' ? 'Flow' : 'Flow coefficient'}, ${unit}`;
  const basis = basisInWords(pressureDrop);
  const ridge = range && { ...range, shares: range.ridge };

  const outside = outsideTolerance(deviation);
  const draw = (size: { width: number; height: number }): Drawing => {
    const geometry = characteristicChart(characteristic, ridge, size, axis);
    const { plot, asFoundLabel, specifiedLabel } = geometry;
    return {
      marks: (
        <>
          <UpAxis ticks={geometry.valueTicks} plot={plot} title={`${quantity}, ${basis}`} />
          <CharacteristicMarks geometry={geometry} outside={outside} />
          <CurveName label={specifiedLabel}>specified ± tolerance</CurveName>
          <CurveName label={asFoundLabel} strong>
            as found
          </CurveName>
          {geometry.ridge && <RidgeMarks geometry={geometry.ridge} />}
          <AcrossAxis
            ticks={geometry.travelTicks}
            y={size.height - 36}
            right={plot.right}
            title="Travel, %"
          />
        </>
      ),
      series: [
        {
          name: 'As found',
          readings: geometry.points.map((point) => ({
            x: point.x,
            y: point.y,
            text: `${figureText(point.travel)} % travel, ${figureText(point.value)} ${unit} from ${point.count} windows`,
          })),
        },
        {
          name: 'Specified',
          readings: specified.map(({ travel, value, low, high }) => ({
            ...geometry.place(travel, value),
            text: `${figureText(travel)} % travel, ${figureText(value)} ${unit}, tolerance ${figureText(low)} to ${figureText(high)}`,
          })),
        },
      ],
    };
  };

  return (
    <ChartFrame
      title="Effective characteristic"
      note={
        'Circles: median of steady windows, larger where there are more. Band: 2.5 to 97.5 % of day resamples.' +
        (deviation ? ' Filled: shape outside the tolerance of IEC 60534-2-4.' : '')
      }
      summary={characteristicInWords(characteristic, deviation)}
      fileName={`${tag} characteristic`}
      height={(width) => (width < 560 ? 420 : 500)}
      tools={
        <ChartTool pressed={axis === 'log'} onClick={() => setAxis(axis === 'log' ? 'linear' : 'log')}>
          Log axis
        </ChartTool>
      }
      table={{
        columns: ['Travel, %', `As found, ${unit}`, 'Steady windows', `Fit, ${unit}`, `Specified, ${unit}`],
        rows: rowsOf(
          points.map((point) => point.travel),
          points.map((point) => point.value),
          points.map((point) => String(point.count)),
          points.map((point) => curveAt(curve, point.travel)?.value ?? NaN),
          points.map((point) => curveAt(specified, point.travel)?.value ?? NaN),
        ),
      }}
      draw={draw}
    />
  );
}
