import { type Finding } from '../core/assessment.js';
import { type FindingKind } from '../core/findings/kinds.js';
import { capacityChange, duration, number, share, travel } from './figures.js';

/** What a person reads of one kind of finding. */
interface FindingWords {
  /** the kind's figure written out, without the kind's name */
  figure(finding: Finding): string;
  /** what an engineer would do next */
  nextStep: string;
  /** what could make the finding false */
  doubts: readonly string[];
}

const evidence = (finding: Finding, name: string): number => finding.evidence[name] ?? NaN;
const known = (finding: Finding, name: string): boolean => Number.isFinite(finding.evidence[name] ?? NaN);
const give = (finding: Finding, name: string, words: (value: number) => string): string =>
  known(finding, name) ? words(evidence(finding, name)) : '';

const capacity = (direction: 'less' | 'more') => (finding: Finding) => {
  const change = capacityChange(direction === 'less' ? -finding.x : finding.x);
  if (finding.rule === 'sheet') return `passes ${change} ${direction} than the data sheet at the same travel`;
  if (finding.rule === 'step') return `passes ${change} ${direction} since a step within the record`;
  return `passes ${change} ${direction} than in its reference period`;
};

const words: Record<FindingKind, FindingWords> = {
  Oversized: {
    figure: (f) =>
      f.rule === 'below band'
        ? `${share(f.x)} of the time below ${give(f, 'bandLow', (v) => travel(v)) || 'its working band'}`
        : `95 % of the time below ${travel(f.x)} travel`,
    nextStep: 'Replay the recorded duty through a reduced trim before thinking of another body.',
    doubts: [
      'Start-up, turndown season or standby duty.',
      'A valve sized for an emergency flow: see the design maximum on the sheet.',
    ],
  },
  Undersized: {
    figure: (f) =>
      f.rule === 'short'
        ? `${share(f.x)} of the time wide open with the set point not reached`
        : `${share(f.x)} of the time above ${give(f, 'bandHigh', (v) => travel(v)) || 'its working band'} travel`,
    nextStep: 'Check that the pressure drop was as designed, then replay the duty through a larger trim.',
    doubts: [
      'Low supply pressure or a blocked strainer.',
      'Held wide open by hand or on purpose.',
      'Split range with another valve.',
    ],
  },
  'Pinned at limit': {
    figure: (f) => `${share(f.x)} of the time at a limit of travel`,
    nextStep: 'See whether the valve is too small, or a limit is set in the controller.',
    doubts: ['An output limit in the controller.', 'An override selector.', 'Start-up.'],
  },
  'Off characteristic': {
    figure: (f) =>
      `up to ${
        known(f, 'worstPercent')
          ? `${share(Math.abs(evidence(f, 'worstPercent')) / 100)} ${evidence(f, 'worstPercent') < 0 ? 'below' : 'above'}`
          : `${share(Math.exp(f.x) - 1)} away from`
      } the specified characteristic${give(f, 'worstTravel', (v) => `, at ${travel(v)} travel`)}`,
    nextStep:
      'Check the data sheet and the positioner’s characterisation first; then plan an inspection of the trim.',
    doubts: [
      'A sheet that gives another rangeability than the trim has.',
      'A characterised positioner.',
      'Pressure taps with line loss between them and the valve.',
      'A modelled pressure drop.',
    ],
  },
  'Lost capacity': {
    figure: capacity('less'),
    nextStep: 'Check strainer, fouling and the flow meter; then plan an inspection.',
    doubts: [
      'Flow meter or density in error.',
      'A filter inside the tapping span.',
      'Reducers not entered on the sheet.',
    ],
  },
  'Gained capacity': {
    figure: capacity('more'),
    nextStep:
      'Check that no bypass is open and the meter was not re-ranged; then plan an inspection of the trim for wear.',
    doubts: ['A bypass cracked open.', 'A re-ranged flow meter.', 'A seat that passes, at low travel.'],
  },
  'Travel offset': {
    figure: (f) =>
      f.rule === 'curve'
        ? `the trim works ${travel(Math.abs(f.x), 1)} of travel ${evidence(f, 'shift') < 0 ? 'more shut' : 'more open'} than reported`
        : `reported travel is ${travel(Math.abs(f.x), 1)} off at ${f.rule === 'open end' ? 'full opening' : 'shut'}`,
    nextStep: 'Calibrate the positioner and check the coupling at the next opportunity.',
    doubts: [
      'The trim’s own departure from its law.',
      'An equal-percentage trim: only end readings can tell.',
    ],
  },
  'Passing when shut': {
    figure: (f) => `${share(f.x)} of rated capacity flows when shut`,
    nextStep: 'Confirm by isolating under site procedure; then seat or shut-off thrust.',
    doubts: ['Meter zero.', 'A bypass.', 'The valve not fully shut.', 'Line packing or flow the other way.'],
  },
  Sticking: {
    figure: (f) =>
      `moves in jumps after ${travel(f.x, 1)} of demand${give(f, 'jump', (v) => `; median jump ${travel(v, 1)}`)}`,
    nextStep: 'Packing, actuator and air supply; a bench stroke when the valve is out of service.',
    doubts: [
      'An archive tolerance above 0.3 %.',
      'A position signal of coarse resolution.',
      'A controller that moves in steps.',
    ],
  },
  'Lost motion': {
    figure: (f) =>
      `${travel(f.x, 1)} of ${f.rule === 'position to flow' ? 'stem travel' : 'demand'} is lost at each reversal${f.rule === 'position to flow' ? ' before the flow answers' : f.rule === 'demand to flow' ? ' before the flow answers' : ' before the stem moves'}`,
    nextStep:
      'Find the link: demand to position is positioner or actuator; position to flow is coupling, plug or feedback arm.',
    doubts: [
      'Lag at high speed.',
      'Movement driven by disturbances while pressures are not recorded.',
      'Sampled too slowly to exclude sticking.',
    ],
  },
  Hunting: {
    figure: (f) =>
      `oscillates ${share(f.x)} of the time${give(f, 'period', (v) => `, period ${duration(v)}`)}${give(f, 'amplitude', (v) => `, amplitude ${travel(v, 1)} travel`)}`,
    nextStep: 'Decide whose oscillation it is: set point, line, valve or loop.',
    doubts: [
      'A cycling set point or upstream unit.',
      'Batch cycles.',
      'Sampling that is slow against the period.',
    ],
  },
  'Excess movement': {
    figure: (f) =>
      f.rule === 'reversals'
        ? `${number(f.x)} reversals a day`
        : `${number(f.x)} % of travel a day, ${number(f.x / 200)} full strokes there and back`,
    nextStep: 'Look at the filter, the tuning and a dead band in the controller.',
    doubts: [
      'Meter noise with derivative action.',
      'A duty that is fast by design.',
      'A threshold below the resolution of the signal.',
    ],
  },
  'Position mismatch': {
    figure: (f) =>
      `demand and position differ by ${travel(Math.abs(f.x), 1)}${give(f, 'offset', (v) => (v > 0 ? ', the stem below the demand' : ', the stem above the demand'))}`,
    nextStep: 'Calibrate feedback and positioner.',
    doubts: ['A reverse action that is not declared.', 'A characterised signal.', 'Split range or a clamp.'],
  },
  'Uneven gain': {
    figure: (f) => `installed gain changes more than ${number(f.x, 0)} to 1 over the travel used`,
    nextStep: 'Replay another characteristic, or schedule the controller’s gain.',
    doubts: ['True of many healthy equal-percentage valves in lines with little pipe loss.'],
  },
  'Choked service': {
    figure: (f) => `choked ${share(f.x)} of the time`,
    nextStep: 'Consider staged pressure drop, anti-cavitation trim and material with a qualified engineer.',
    doubts: [
      'A vapour pressure that is a guess.',
      'A pressure tap at recovery.',
      'A recovery factor of another travel.',
    ],
  },
  'Frozen signal': {
    figure: (f) =>
      f.rule === 'spells'
        ? `${number(f.x)} frozen spells a week while the partner signal moved`
        : `a signal stood still for ${duration(f.x * 3_600)} while its partner moved`,
    nextStep: 'Mend the instrument or its collection; the spell was cut out of everything else.',
    doubts: ['Held by hand.', 'The plant down.', 'Compression with a long maximum interval.'],
  },
};

/** A finding written out with its figure: "Undersized: 31 % of the time above 90 % travel". */
export function findingPhrase(finding: Finding): string {
  return `${finding.kind}: ${words[finding.kind].figure(finding)}`;
}

/** What an engineer would do next about a finding. */
export function nextStep(kind: FindingKind): string {
  return words[kind].nextStep;
}

/** What could make a finding of this kind false. */
export function findingDoubts(kind: FindingKind): readonly string[] {
  return words[kind].doubts;
}
