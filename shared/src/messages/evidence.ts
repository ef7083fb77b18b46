import { duration, number, share, travel } from './figures.js';

/** The figures a finding rests on, named and written out. A name not listed stands as it is, with its plain number. */

type Write = (value: number) => string;

const inTravel: Write = (value) => travel(value, 1);
const inHours: Write = (value) => duration(value * 3_600);
const change: Write = (ln) => `${ln < 0 ? '−' : '+'}${share(Math.abs(Math.exp(ln) - 1))}`;
const claim: Write = (value) => (value === 0 ? 'no' : 'yes');
const plain: Write = (value) => {
  const size = Math.abs(value);
  return number(value, Number.isInteger(value) || size >= 100 ? 0 : size >= 10 ? 1 : 2);
};

const known: Readonly<Record<string, readonly [name: string, write: Write]>> = {
  p5: ['5 % of the time below', inTravel],
  p50: ['half the time below', inTravel],
  p95: ['95 % of the time below', inTravel],
  bandLow: ['working band from', inTravel],
  bandHigh: ['working band to', inTravel],
  belowLow: ['time below the band', share],
  aboveHigh: ['time above the band', share],
  atSeat: ['time at the seat', share],
  atOpen: ['time wide open', share],
  short: ['wide open, set point not reached', share],
  hours: ['hours', inHours],
  rangeabilityUsed: ['rangeability used', (value) => `${plain(value)} to 1`],
  gainAtMedian: ['gain at median travel', plain],
  capacityRatio: ['capacity against sheet', share],
  capacityLow: ['at least', share],
  capacityHigh: ['at most', share],
  change: ['change of capacity', change],
  p: ['p of the trend', (value) => (value < 0.001 ? 'below 0.001' : number(value, 3))],
  months: ['spans compared', plain],
  suspectedUnitFactor: ['near the unit factor', plain],
  equivalentShift: ['or a travel shift of', inTravel],
  shift: ['travel shift', inTravel],
  reading: ['travel reported', inTravel],
  worstTravel: ['worst at', inTravel],
  worstPercent: ['deviation there', (value) => `${number(value)}\u00a0%`],
  lowestBeyond: ['beyond tolerance from', inTravel],
  highestBeyond: ['to', inTravel],
  binsBeyond: ['bins beyond tolerance', plain],
  bins: ['bins', plain],
  coefficient: ['coefficient when shut', plain],
  spells: ['spells', plain],
  seconds: ['time shut', duration],
  smallestVisible: ['smallest that could be seen', (value) => `${number(value * 100, 2)}\u00a0%`],
  threshold: ['moves under this not counted', inTravel],
  reversalsPerDay: ['reversals a day', plain],
  travelPerDay: ['travel a day', inTravel],
  offset: ['position less demand', inTravel],
  spread: ['spread', inTravel],
  sameSignDays: ['days of the same sign', share],
  slope: ['slope', plain],
  characterised: ['follows a curve of demand', claim],
  jump: ['median jump', inTravel],
  jumpShare: ['moves that jump', share],
  jumps: ['jumps', plain],
  deadBand: ['dead band', inTravel],
  resolution: ['resolution of travel', (value) => travel(value, 2)],
  standardError: ['standard error', (value) => travel(value, 2)],
  stickingExcluded: ['sticking could be excluded', claim],
  period: ['period', duration],
  amplitude: ['amplitude', inTravel],
  regularity: ['regularity', plain],
  blocks: ['blocks', plain],
  blockHours: ['length of a block', inHours],
  fromOutside: ['comes from outside', claim],
  chokedShare: ['time choked', share],
  nearChokedShare: ['time near choking', share],
  flashingHours: ['flashing', inHours],
  medianCavitationIndex: ['median cavitation index', plain],
  longestHours: ['longest spell', inHours],
  flowHours: ['flow frozen', inHours],
  positionHours: ['position frozen', inHours],
  ratio: ['largest to smallest gain', (value) => `${plain(value)} to 1`],
  min: ['smallest gain', plain],
  max: ['largest gain', plain],
};

/** Instants among the evidence, s UTC: a screen shows them in its zone, not as a number. */
const instants = new Set(['at']);

/** The evidence of a finding as names with figures; what is not known stays out. */
export function evidenceInWords(
  evidence: Readonly<Record<string, number | null>>,
): { name: string; figure: string }[] {
  return Object.entries(evidence).flatMap(([name, value]) => {
    if (value === null || !Number.isFinite(value) || instants.has(name)) return [];
    const [words, write] = known[name] ?? [name.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase(), plain];
    return [{ name: words, figure: write(value) }];
  });
}
