import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { figureColumn, figureText } from '@tailrace/shared/charts/figure-text';
import { type Ridge } from '@tailrace/shared/charts/travel-ridge';
import { type Glyph } from '@tailrace/shared/charts/characteristic-glyph';

/** The sentences in which a drawing is told to a reader who cannot see it. */

/** A share 0 to 1 as a percentage. */
export function percent(share: number): string {
  return `${figureText(share * 100, share < 0.1 ? 2 : 3)} %`;
}

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

type Characteristic = NonNullable<PresentedAssessment['characteristic']>;

/** Is the deviation in shape at a travel beyond the tolerance there? False where it was not judged. */
export function outsideTolerance(deviation: PresentedAssessment['deviation']): (travel: number) => boolean {
  const bins = (deviation?.byTravel ?? []).filter((bin) => Math.abs(bin.percent) > bin.tolerance);
  return (travel) => bins.some((bin) => Math.abs(bin.travel - travel) < 0.5);
}

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

const counted = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** The deviation chart in one sentence. */
export function deviationInWords(bins: { percent: number; tolerance: number; travel: number }[]): string {
  const beyond = bins.filter((bin) => Math.abs(bin.percent) > bin.tolerance).length;
  return `Deviation in shape from the data sheet in ${counted(bins.length, 'travel bin')}: ${beyond} beyond the tolerance.`;
}

interface Figure {
  value: number;
  low: number;
  high: number;
}

/** A gain ratio as it may honestly be said: "over 4" where even its lower bound is above that. */
export function gainRatioInWords(ratio: Figure): string {
  if (ratio.low > 4) return `over ${figureText(Math.floor(ratio.low))} to 1`;
  return `${ratio.value.toFixed(1)} to 1 (${ratio.low.toFixed(1)} to ${ratio.high.toFixed(1)})`;
}

/** Dead band with its standard error. */
export function deadBandInWords(split: { deadBand: number; standardError: number; bins: number }): string {
  const { deadBand, standardError, bins } = split;
  return `Dead band ${figureText(deadBand, 2)} ± ${figureText(standardError, 1)} % travel, from ${counted(bins, 'travel bin')}`;
}

/** A change with its sign: +4 %, −12 %. */
export function signedPercent(percent: number): string {
  const text = figureText(percent, Math.abs(percent) < 10 ? 2 : 3);
  return `${percent > 0 && text !== '0' ? '+' : ''}${text} %`;
}

/** A change of capacity with its interval. */
export function changeInWords(change: { percent: number; lowPercent: number; highPercent: number }): string {
  const { percent: value, lowPercent, highPercent } = change;
  return `${signedPercent(value)} (${signedPercent(lowPercent)} to ${signedPercent(highPercent)})`;
}

/** What the trend test said, or why it said nothing. Changes are ln of capacity. */
export function trendInWords(trend: NonNullable<PresentedAssessment['drift']>['trend']): string {
  if ('judged' in trend) return `Trend: cannot judge. ${trend.reason}`;
  const change = changeInWords({
    percent: 100 * Math.expm1(trend.change),
    lowPercent: 100 * Math.expm1(trend.low),
    highPercent: 100 * Math.expm1(trend.high),
  });
  return `Trend over the record: ${change}, ${trend.confirmed ? 'confirmed' : 'not confirmed'}.`;
}

/** Table rows from columns of numbers, each column with its own even decimals, and of words. */
export function rowsOf(...columns: (number[] | string[])[]): string[][] {
  const texts = columns.map((column) =>
    figureColumn(column.map(Number)).map((text, i) => (typeof column[i] === 'string' ? column[i] : text)),
  );
  return (texts[0] ?? []).map((_, row) => texts.map((column) => column[row] ?? '–'));
}
