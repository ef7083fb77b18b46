import { type SignalRole } from '../src/core/series.js';
import { aLoop } from '../src/simulation/a-loop.js';
import { type Loop, type TrueValve } from '../src/simulation/loop-settings.js';

/** One valve of the demo plant: what its register says, how its loop really is, and what that shows. */
export interface DemoValve {
  readonly area: string;
  readonly tag: string;
  readonly service: string;
  /** in the reader's words, for the page beside the trends */
  readonly shows: string;
  /** the data sheet where it differs from the truth */
  readonly sheet?: Readonly<Record<string, unknown>>;
  readonly valve?: Partial<TrueValve>;
  readonly loop?: Partial<Omit<Loop, 'valve' | 'line'>>;
  readonly line?: Partial<Loop['line']>;
  readonly roles?: readonly SignalRole[];
}

/** How an area's historian keeps and exports its trends. */
export interface Collection {
  readonly scan: number;
  readonly tolerance: number;
  readonly days: number;
}

/** s UTC: every record ends here */
export const end = Date.UTC(2026, 10, 29, 23) / 1000;

const everyRole: readonly SignalRole[] = [
  'demand',
  'position',
  'flow',
  'setPoint',
  'upstreamPressure',
  'downstreamPressure',
];

/** The loop of a valve, with what nobody specified taken from a healthy one. */
export function loopOf(valve: DemoValve, { scan, tolerance, days }: Collection, seed: number): Loop {
  const plain = aLoop();
  return {
    ...plain,
    ...valve.loop,
    seed,
    days,
    start: end - days * 86_400,
    valve: { ...plain.valve, ripple: 0.015, ...valve.valve },
    line: { ...plain.line, ...valve.line },
    historian: { scan, tolerance, longest: 3_600, roles: valve.roles ?? everyRole },
  };
}

/** Units the plant records in, and the historian's name of each point. */
const points: Record<SignalRole, { unit: string | null; tag: (number: string, valve: string) => string }> = {
  demand: { unit: '%', tag: (_, valve) => `${valve}.OP` },
  position: { unit: '%', tag: (_, valve) => `${valve}.ZT` },
  flow: { unit: 'm3/h', tag: (n) => `FT-${n}` },
  setPoint: { unit: 'm3/h', tag: (n) => `FIC-${n}.SP` },
  processValue: { unit: 'm3/h', tag: (n) => `FIC-${n}.PV` },
  upstreamPressure: { unit: 'bar(a)', tag: (n) => `PT-${n}A` },
  downstreamPressure: { unit: 'bar(a)', tag: (n) => `PT-${n}B` },
  temperature: { unit: 'K', tag: (n) => `TT-${n}` },
  density: { unit: 'kg/m3', tag: (n) => `DT-${n}` },
  mode: { unit: null, tag: (n) => `FIC-${n}.MODE` },
};

export function pointOf(role: SignalRole, tag: string): { tag: string; unit: string | null } {
  const number = tag.split('-')[1] ?? tag;
  return { tag: points[role].tag(number, tag), unit: points[role].unit };
}

/** The valve in the register's own form. */
export function registerForm(valve: DemoValve, loop: Loop, flowSpan: number) {
  const { valve: truth, line } = loop;
  const roles = loop.historian.roles;
  return {
    area: valve.area,
    tag: valve.tag,
    dataSheet: {
      service: valve.service,
      characteristic: truth.kind,
      ratedCoefficient: truth.ratedCoefficient,
      coefficientUnit: 'Kv',
      rangeability: truth.kind === 'equal percentage' ? truth.parameter : truth.kind === 'linear' ? 50 : null,
      style: 'globe',
      fluid: {
        phase: 'liquid',
        density: line.density,
        vapourPressure: line.vapourPressure,
        criticalPressure: 22_064,
        viscosity: 1,
      },
      FL: truth.FL,
      trip: false,
      criticality: 'normal',
      flowSpan,
      flowSpanUnit: 'm3/h',
      failAction: 'closes',
      leakageClass: 'IV',
      ...valve.sheet,
    },
    signals: Object.fromEntries(
      roles.map((role) => [role, { ...pointOf(role, valve.tag), reversed: false }]),
    ),
  };
}
