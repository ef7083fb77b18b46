import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { figureText } from '@tailrace/shared/charts/figure-text';
import { type Ridge } from '@tailrace/shared/charts/travel-ridge';
import { type Glyph } from '@tailrace/shared/charts/characteristic-glyph';

/** The sentences in which a drawing is told to a reader who cannot see it. */

const percent = (share: number): string => `${figureText(share * 100, share < 0.1 ? 2 : 3)} %`;

/** The travel ridge in words. */
export function ridgeInWords(ridge: Ridge | null, outside: { below: number; above: number }): string {
  if (!ridge) return 'no travel recorded yet';
  const { p5, p50, p95, band } = ridge;
  return (
    `travel: 5 % of the time below ${figureText(p5)} %, half of it below ${figureText(p50)} %, ` +
    `95 % below ${figureText(p95)} %; specified to work from ${figureText(band.low)} to ${figureText(band.high)} %, ` +
    `${percent(outside.below)} of the time below that and ${percent(outside.above)} above`
  );
}

/** The glyph in words: how far the as-found curve lies from the specified one at its upper end. */
export function glyphInWords(glyph: Glyph | null): string {
  const first = glyph?.asFound[0];
  const last = glyph?.asFound.at(-1);
  if (!glyph || !first || !last) return 'no characteristic found';
  const over = `${figureText(first.travel)} to ${figureText(last.travel)} % travel`;
  return `${glyph.basis} characteristic as found over ${over}${
    glyph.specified.length > 0 ? ', against the specified curve' : ''
  }`;
}

/** Whose curve it is: the valve's own, or the valve's with its line. */
export function basisInWords(pressureDrop: 'measured' | 'modelled' | 'none'): string {
  return {
    measured: 'inherent, pressure drop measured',
    modelled: 'inherent, pressure drop modelled from the design cases',
    none: 'installed: no pressure drop known',
  }[pressureDrop];
}

/** The three percentiles of travel, as a line beside a ridge. */
export function percentilesInWords(range: { p5: number; p50: number; p95: number }): string {
  const { p5, p50, p95 } = range;
  return `Time by travel: 5 % of it below ${figureText(p5)}, half below ${figureText(p50)}, 95 % below ${figureText(p95)}`;
}

type Characteristic = NonNullable<PresentedAssessment['characteristic']>;

/** The characteristic chart in one sentence. */
export function characteristicInWords(
  characteristic: Characteristic,
  deviation: PresentedAssessment['deviation'],
): string {
  const { kind, span, points, pressureDrop, specified } = characteristic;
  const found =
    `Effective characteristic (${basisInWords(pressureDrop)}) from ${points.length} points over ` +
    `${figureText(span.from)} to ${figureText(span.to)} % travel: ${kind === 'undecided' ? 'kind not decided' : kind}`;
  const ratio = deviation?.capacityRatio;
  const against = ratio
    ? `, capacity ${figureText(ratio.value)} of the specified (${figureText(ratio.low)} to ${figureText(ratio.high)})`
    : '';
  const worst = deviation?.worst
    ? `, largest deviation ${figureText(deviation.worst.percent)} % at ${figureText(deviation.worst.travel)} % travel`
    : '';
  return `${found}${specified.length > 0 ? against : ''}${worst}.`;
}
