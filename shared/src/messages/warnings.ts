import { duration, number, share } from './figures.js';

type Figures = Readonly<Record<string, number>>;
const fig = (figures: Figures, name: string): number => figures[name] ?? NaN;

/** Things a reader must know before trusting an assessment, by the core's code. */
const sentences: Record<string, (figures: Figures) => string> = {
  'pressures-crossed': (f) =>
    `The downstream pressure lay above the upstream one for ${share(fig(f, 'share'))} of the time. Are the two transmitters swapped?`,
  'flow-leads-position': (f) =>
    `The flow moves ${duration(fig(f, 'seconds'))} before the position. Check the clocks of the two sources, or which tag is which.`,
  'backward-times': (f) =>
    `${number(fig(f, 'samples'))} samples carried a time before the one in front of them; they were put in order.`,
};

/** A warning in words; a code without a sentence is shown as it is rather than lost. */
export function warningSentence(code: string, figures: Figures): string {
  return sentences[code]?.(figures) ?? code;
}
