import { type SignalRole, signalRoles } from '../core/series.js';
import { duration, number, share } from './figures.js';

type Figures = Readonly<Record<string, number>>;
const fig = (figures: Figures, name: string): number => figures[name] ?? NaN;

const roleWords: Record<SignalRole, string> = {
  demand: 'demand',
  position: 'position',
  flow: 'flow',
  upstreamPressure: 'upstream pressure',
  downstreamPressure: 'downstream pressure',
  temperature: 'temperature',
  density: 'density',
  setPoint: 'set point',
  processValue: 'process value',
  mode: 'mode',
};

const refused =
  (role: string) =>
  (f: Figures): string =>
    `The ${role} was bad or out of range for ${share(fig(f, 'share'))} of the time and is left out; ${share(fig(f, 'allowed'))} is the most that can be used.`;
const outliersKept = (role: string) => (): string =>
  `More than 1 % of the ${role} looks like outliers, so none was taken out.`;

/** Things a reader must know before trusting an assessment, by the core's code. */
const sentences: Record<string, (figures: Figures) => string> = {
  'pressures-crossed': (f) =>
    `The downstream pressure lay above the upstream one for ${share(fig(f, 'share'))} of the time. Are the two transmitters swapped?`,
  'flow-leads-position': (f) =>
    `The flow moves ${duration(fig(f, 'seconds'))} before the position. Check the clocks of the two sources, or which tag is which.`,
  'backward-times': (f) =>
    `${number(fig(f, 'samples'))} samples carried a time before the one in front of them; they were put in order.`,
  'flow-falls-as-valve-opens': () =>
    'The flow falls as the signal rises: the signal looks reverse acting and is not declared so.',
  'demand-against-position': () =>
    'The position falls as the demand rises: one of the two looks reverse acting and is not declared so.',
  ...Object.fromEntries(signalRoles.map((role) => [`${role}-quality`, refused(roleWords[role])])),
  ...Object.fromEntries(signalRoles.map((role) => [`${role}-outliers-kept`, outliersKept(roleWords[role])])),
};

/** A warning in words; a code without a sentence is shown as it is rather than lost. */
export function warningSentence(code: string, figures: Figures): string {
  return sentences[code]?.(figures) ?? code;
}
