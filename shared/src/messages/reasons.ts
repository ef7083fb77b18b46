import { type ReasonCode } from '../core/reasons.js';
import { duration, number, share, travel } from './figures.js';

type Figures = Readonly<Record<string, number>>;

const has = (f: Figures, ...names: string[]) => names.every((name) => Number.isFinite(f[name]));
const fig = (f: Figures, name: string) => f[name] ?? NaN;

/** Why something cannot be judged, and what data would let it: one sentence or two a code. */
const sentences: Record<ReasonCode, (f: Figures) => string> = {
  'no-samples': () => 'There are no samples in this window. Bring in a trend file that covers it.',
  'no-travel-signal': () =>
    'Neither position nor demand is recorded. Bind one of the two to a historian tag and bring its trend in.',
  'no-demand': () =>
    'The demand is not recorded. Bind the controller output to its historian tag and bring its trend in.',
  'no-flow': () => 'No flow is recorded for this valve. Bind a flow tag and bring its trend in.',
  'no-pressures': () =>
    'No pressure drop is known. Record the pressures on both sides, or give two design cases with their pressures.',
  'no-rated-coefficient': () =>
    'The data sheet gives no rated flow coefficient. Enter it to compare with it.',
  'no-characteristic-specified': () =>
    'The data sheet names no characteristic. Enter it to compare the shape with it.',
  'no-fluid-data': () =>
    'The data sheet lacks the fluid’s properties. A liquid needs its density; a gas needs molar mass or density, temperature and specific heat ratio.',
  'no-recovery-factor': () =>
    'The data sheet gives no pressure recovery factor (FL for a liquid, xT for a gas). Enter the maker’s.',
  'signal-quality': (f) =>
    `${has(f, 'share') ? share(fig(f, 'share')) : 'Too much'} of the in-service time was rejected as bad or out of range${has(f, 'allowed') ? `; ${share(fig(f, 'allowed'))} is the most that can be judged` : ''}. Check the transmitter and its export.`,
  'record-too-short': (f) =>
    `The record is too short${has(f, 'seconds') ? `: ${duration(fig(f, 'seconds'))} in service` : has(f, 'days') ? `: ${number(fig(f, 'days'), 1)} running days` : ''}${has(f, 'neededSeconds') ? `, ${duration(fig(f, 'neededSeconds'))} wanted` : has(f, 'needed') ? `, ${number(fig(f, 'needed'))} wanted` : ''}. Bring in a longer trend.`,
  'too-few-windows': (f) =>
    `Too few steady windows${has(f, 'windows') ? ` (${number(fig(f, 'windows'))}${has(f, 'needed') ? ` of the ${number(fig(f, 'needed'))} needed` : ''})` : ''}. A longer record, or one in which the valve rests now and then, would do.`,
  'too-few-bins': (f) =>
    `The valve rested at too few different travels${has(f, 'bins') ? ` (${number(fig(f, 'bins'))}${has(f, 'needed') ? ` of the ${number(fig(f, 'needed'))} needed` : ''})` : ''}. A record that covers more of its range would do.`,
  'span-too-small': (f) =>
    `The valve used too little of its travel${has(f, 'span') ? ` (${travel(fig(f, 'span'), 1)}${has(f, 'needed') ? `; ${travel(fig(f, 'needed'))} needed` : ''})` : ''}. History with other rates of the plant would do; do not move the valve for it.`,
  'travel-constant': (f) =>
    `The valve stood still${has(f, 'travel') ? ` at ${travel(fig(f, 'travel'), 1)} travel` : ''} for the whole record, so nothing can be inferred about how it works at other travels.`,
  'valve-not-in-service': () => 'The valve was not in service in this window.',
  'always-shut': () => 'The valve was shut for the whole window.',
  'sampled-too-slowly': (f) =>
    `Sampled too slowly${has(f, 'spacing') ? ` (every ${duration(fig(f, 'spacing'))}${has(f, 'needed') ? `; ${duration(fig(f, 'needed'))} or faster needed` : ''})` : ''}.`,
  'models-too-close': (f) =>
    `Two kinds fit nearly equally well${has(f, 'probability') ? ` (the better one is right with ${share(fig(f, 'probability'))})` : ''}; a wider span of travel would tell them apart.`,
  'not-repeatable': (f) =>
    `Different days favour different kinds${has(f, 'agreement') ? ` (the best won in ${share(fig(f, 'agreement'))} of resamples)` : ''}.`,
  'design-pressures-disagree': () =>
    'Within the tolerance of the design pressures different kinds win. Recorded pressures would decide.',
  'not-separable': () =>
    'A change of capacity and a travel offset would look the same here. Only reported travel at a verified shut, or a stroke check under site procedure, can tell them apart.',
  'demand-only': () =>
    'Only the demand is recorded, and the dead band between demand and stem is unknown or large. Record the position.',
  'low-travel-not-visited': () => 'The valve did not work at low travel, where this would show.',
  'too-few-months': (f) =>
    `Too few months or weeks of history${has(f, 'points') ? ` (${number(fig(f, 'points'))}${has(f, 'needed') ? ` of ${number(fig(f, 'needed'))}` : ''})` : ''}.`,
  'months-not-connected': () => 'No travel was visited in two periods, so they cannot be compared.',
  'no-shut-spells': () =>
    'The valve was not shut long enough, with supply pressure on, for a leak to be seen.',
  'meter-cut-off': (f) =>
    `The meter’s cut-off hides small flows${has(f, 'smallest') ? `; the smallest leak that could have been seen is ${share(fig(f, 'smallest'))} of rated` : ''}.`,
  'no-set-point': () => 'Set point and process value are not recorded.',
  'one-direction-only': () => 'The valve moved in one direction only; a dead band shows after reversals.',
  'too-few-slow-samples': () => 'Too few samples were taken while the valve moved slowly.',
  'not-turbulent': () =>
    'Flow through the valve was not turbulent for most of the record; the characteristic is not judged from it.',
  'choked-throughout': () =>
    'Flow was choked for most of the record; the coefficient then depends on a recovery factor that changes with travel.',
  'outside-the-standard': () =>
    'The service is outside IEC 60534-2-1 (two-phase, slurry or wet steam); only the installed characteristic is shown.',
  'flow-falls-as-valve-opens': () =>
    'The flow falls as the signal rises. If the valve is reverse acting, say so on the signal; otherwise check which tag is which.',
  'flow-does-not-follow': () =>
    'The flow does not follow the travel here: what else moves it is larger. A record that covers more travel, or recorded pressures, would do.',
  'trip-valve': () => 'Safety-instrumented or trip duty: not judged for tuning or trim.',
};

/** Why something cannot be judged, in words. */
export function reasonSentence(reason: ReasonCode, figures: Figures = {}): string {
  return sentences[reason](figures);
}
