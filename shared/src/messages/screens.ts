import { type AssessedFinding } from '../contracts/findings.js';
import { type SignalRole } from '../core/series.js';
import { capacityChange, duration, number, share, travel } from './figures.js';

/** Sentences the screens show, where more than a label is said. */

/** From this severity on a finding needs work: half way from its raise threshold to "act now" (methods.md §9.1). */
const needsWork = 0.6;

/** How bad a finding is, in words. */
export function severityInWords(severity: number): 'needs work' | 'worth a look' {
  return severity >= needsWork ? 'needs work' : 'worth a look';
}

const counted = (count: number, one: string, many: string): string =>
  `${number(count)} ${count === 1 ? one : many}`;

interface RankingCounts {
  readonly valves: number;
  readonly judged: number;
  readonly needAttention: number;
  readonly trips: number;
  readonly notJudged: number;
}

/**
 * The one sentence above the ranking.
 *
 * @param since first day of the windows judged, written for the site; null where nothing was judged
 */
export function rankingInWords(counts: RankingCounts, since: string | null): string {
  const { valves, judged, needAttention, trips, notJudged } = counts;
  if (valves === 0) return 'No valves in your areas yet.';
  const lead = `${counted(valves, 'valve', 'valves')} in your areas, ${judged === valves ? 'all' : number(judged)} judged`;
  const attention =
    needAttention === 0
      ? 'none needs attention'
      : `${counted(needAttention, 'needs attention', 'need attention')}`;
  const rest = [
    notJudged > 0 ? `${number(notJudged)} cannot be judged` : null,
    trips > 0 ? `${counted(trips, 'trip valve is', 'trip valves are')} listed apart` : null,
  ].filter((part) => part !== null);
  return `${lead}${since ? ` on history since ${since}` : ''}; ${attention}${rest.length > 0 ? `, ${rest.join(', ')}` : ''}.`;
}

/** What the analysis is doing or did, over many valves. */
export function runInWords(run: {
  readonly valves: number;
  readonly judged: number;
  readonly notJudged: number;
  readonly failed: number;
}): string {
  const finished = run.judged + run.notJudged + run.failed;
  const parts = [
    `${number(finished)} of ${counted(run.valves, 'valve', 'valves')} finished`,
    `${number(run.judged)} judged`,
    `${number(run.notJudged)} cannot be judged`,
    ...(run.failed > 0 ? [`${number(run.failed)} failed`] : []),
  ];
  return `${parts.join(', ')}.`;
}

/** The nightly schedule. */
export function scheduleInWords(at: string, zone: string, next: string | null): string {
  return `Every night at ${at} (${zone}) every valve with new samples is assessed again${next ? `; next on ${next}` : ''}.`;
}

/** What was taken in from a trend file, and what was not. */
export function takenInWords(report: {
  readonly rows: number;
  readonly samples: number;
  readonly badSamples: number;
  readonly rejected: number;
}): string {
  const { rows, samples, badSamples, rejected } = report;
  const bad = badSamples > 0 ? `, ${number(badSamples)} of them marked bad` : '';
  const rejects =
    rejected > 0 ? `; ${counted(rejected, 'reject is', 'rejects are')} listed below` : '; nothing rejected';
  return `${counted(rows, 'row', 'rows')} read, ${counted(samples, 'sample', 'samples')} taken${bad}${rejects}.`;
}

/** What each reason for leaving samples or windows out means (methods.md §1). Unknown reasons stand as they are. */
const leftOutWords: Readonly<Record<string, string>> = {
  bad: 'marked bad by the historian',
  'out of range': 'out of the signal’s range',
  outlier: 'single outliers',
  frozen: 'frozen while the partner signal moved',
  outage: 'during an outage of collection',
  'pressures crossed': 'downstream pressure above upstream',
  'not in service': 'windows with the valve not in service',
  incomplete: 'windows with gaps',
  'not steady': 'windows not steady',
  'end of travel': 'windows at an end of travel',
  'low drop': 'windows with too little pressure drop',
};

export function leftOutInWords(reason: string): string {
  return leftOutWords[reason] ?? reason;
}

/** What a person must still do or know while a trend file is in a state. */
export const trendFileWords = {
  received: 'Received. Look at its first rows and take it in.',
  reading: 'Being read. You may leave this page; the work goes on.',
  taken: 'Taken in whole.',
  'taken with rejects': 'Taken in, except for the rejects below.',
  refused: 'Refused. Nothing of it was kept.',
} as const;

export const screenWords = {
  rankingEmpty: {
    title: 'Nothing is ranked yet',
    detail:
      'A valve is ranked once it has trends and was assessed. Bring in a trend file, then start an analysis run or wait for the nightly one.',
  },
  nothingFits: {
    title: 'Nothing fits what you asked for',
    detail: 'Take a filter away, or look for another word.',
  },
  trendsEmpty: {
    title: 'No trend file yet',
    detail:
      'Export the history of some valves from the historian as CSV, wide or long, also gzipped, and bring it in here.',
  },
  runsEmpty: {
    title: 'No analysis run yet',
    detail: 'The nightly run assesses every valve that has trends.',
  },
  valvesEmpty: {
    title: 'The register is empty',
    detail: 'An engineer enters valves with their data sheets, and binds their signals to historian tags.',
  },
  neverAssessed: {
    title: 'Not assessed yet',
    detail: 'This valve has no assessment. It gets one with the next analysis run after its trends are in.',
  },
  noFindings: 'No finding. That is not evidence of health: see what could not be judged, and why.',
} as const;

/** What a signal's role is called on screen. */
export const roleWords: Readonly<Record<SignalRole, string>> = {
  demand: 'demand',
  position: 'position',
  flow: 'flow',
  upstreamPressure: 'upstream pressure',
  downstreamPressure: 'downstream pressure',
  temperature: 'temperature',
  density: 'density',
  setPoint: 'set point',
  processValue: 'process value',
  mode: 'loop mode',
};

/** How the pressure drop behind a characteristic was known. */
export const pressureDropWords = {
  measured: 'pressure drop measured',
  modelled: 'pressure drop modelled from the design cases',
  none: 'no pressure drop known',
} as const;

/** Whose oscillation a hunting valve shows. */
export const oscillationCauseWords = {
  outside: 'comes from outside, with the set point',
  line: 'comes from the line',
  valve: 'made by the valve itself',
  loop: 'made by the loop',
  'not decided': 'not decided whose it is',
} as const;

type Measured = Pick<AssessedFinding, 'kind' | 'rule' | 'x' | 'raise' | 'actNow' | 'standardError'>;

/** How a finding's measure and its limits are written: a share, a travel, a change of capacity, or a count. */
function measureOf({ kind, rule }: Measured): (x: number) => string {
  switch (kind) {
    case 'Oversized':
      return rule === 'below band' ? share : travel;
    case 'Undersized':
    case 'Pinned at limit':
    case 'Passing when shut':
    case 'Hunting':
    case 'Choked service':
      return share;
    case 'Off characteristic':
      return (x) => share(Math.exp(Math.abs(x)) - 1);
    case 'Lost capacity':
      return (x) => capacityChange(-x);
    case 'Gained capacity':
      return capacityChange;
    case 'Travel offset':
    case 'Sticking':
    case 'Lost motion':
    case 'Position mismatch':
      return (x) => travel(Math.abs(x), 1);
    case 'Uneven gain':
      return (x) => `${number(x, 1)} to 1`;
    case 'Excess movement':
      return (x) => `${number(x)}${rule === 'reversals' ? ' reversals a day' : ' % a day'}`;
    case 'Frozen signal':
      return (x) => (rule === 'spells' ? `${number(x)} spells a week` : duration(x * 3_600));
  }
}

/** A finding's measure beside the limits it is held against. */
export function limitsInWords(finding: Measured): string {
  const words = measureOf(finding);
  return `measured ${words(finding.x)}; raised from ${words(finding.raise)}, act now at ${words(finding.actNow)}`;
}
