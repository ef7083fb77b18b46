import { describe, expect, it } from 'vitest';
import { type DataSheet, type Fluid } from '../data-sheet.js';
import { chokedService } from '../findings/choked-service.js';
import { type Chapters, type Measure } from '../findings/finding-rule.js';
import { defaultLimits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { serviceStress } from './service-stress.js';

const water: Fluid = {
  phase: 'liquid',
  density: 950,
  vapourPressure: 70,
  criticalPressure: 22064,
  viscosity: null,
  molarMass: null,
  specificHeatRatio: null,
  compressibility: null,
  temperature: null,
};
const gas: Fluid = {
  ...water,
  phase: 'gas',
  density: null,
  vapourPressure: null,
  molarMass: 29,
  specificHeatRatio: 1.4,
};

function aSheet(over: Partial<DataSheet> = {}): DataSheet {
  return {
    characteristic: null,
    ratedCoefficient: null,
    rangeability: null,
    table: null,
    style: 'globe',
    fluid: water,
    FL: 0.9,
    xT: 0.7,
    Fd: null,
    valveSize: null,
    pipeSize: null,
    trip: false,
    criticality: 'normal',
    designBand: null,
    flowBasis: 'volume',
    flowSpan: null,
    designCases: [],
    ...over,
  };
}

/** Hourly points: [travel %, P1, P2, in service]. */
function aRecord(...points: [number, number, number, boolean?][]): Prepared {
  const column = (pick: (p: [number, number, number, boolean?]) => number) => Float64Array.from(points, pick);
  return {
    start: 0,
    step: 3600,
    count: points.length,
    travel: column((p) => p[0]),
    travelSource: 'position',
    demand: null,
    position: null,
    flow: null,
    flowBasis: 'volume',
    flowSpan: 100,
    upstreamPressure: column((p) => p[1]),
    downstreamPressure: column((p) => p[2]),
    temperature: null,
    density: null,
    setPoint: null,
    processValue: null,
    mode: null,
    state: Uint8Array.from(points, (p) => (p[3] === false ? valveState.shut : valveState.inService)),
    lag: { seconds: 0, identified: false },
    resolution: { travel: null, flow: null },
    spacing: { travel: 1, flow: null, demand: null },
    samplesSeen: points.length,
    samplesUsed: points.length,
    leftOut: {},
    frozen: [],
    warnings: [],
  };
}

const noWindows: SteadyWindows = {
  count: 0,
  time: new Float64Array(0),
  h: new Float64Array(0),
  flow: new Float64Array(0),
  pressureDrop: new Float64Array(0),
  upstreamPressure: new Float64Array(0),
  coefficient: new Float64Array(0),
  L: new Float64Array(0),
  choked: new Uint8Array(0),
  slot: new Int32Array(0),
  day: new Int32Array(0),
  seconds: 300,
  slotSeconds: 7200,
  source: 'none',
  line: null,
  leftOut: {},
};

const stress = (record: Prepared, sheet = aSheet(), windows = noWindows) =>
  serviceStress(record, windows, sheet, defaultLimits);

describe('service stress of a liquid', () => {
  // P1 1000, Pv 70, FL 0.9: chokes at 0.81·(1000 − 0.944·70) = 756.5 kPa
  it('counts time choked, near choked and flashing while in service', () => {
    const found = stress(
      aRecord([50, 1000, 800], [50, 1000, 290], [50, 1000, 250], [50, 1000, 50], [0, 1000, 20, false]),
    );
    expect(found.chokedShare).toBeCloseTo(2 / 4, 12);
    expect(found.nearChokedShare).toBeCloseTo(2 / 4, 12);
    expect(found.flashingHours).toBe(1);
    expect(found.reason).toBeNull();
  });

  it('gives hours by xF up to the choking limit, and the median cavitation index', () => {
    const found = stress(aRecord([50, 1000, 800], [50, 1000, 400], [50, 1000, 300], [50, 1000, 100]));
    expect(found.bands.map((b) => b.from)).toEqual([0, 0.5, 0.7, expect.closeTo(0.81, 9)]);
    expect(found.bands.map((b) => b.hours)).toEqual([1, 1, 1, 1]);
    expect(found.medianCavitationIndex).toBeCloseTo((930 / 600 + 930 / 700) / 2, 9);
  });

  it('leaves out edges beyond the limit of a valve that recovers much', () => {
    const found = stress(aRecord([50, 1000, 600], [50, 1000, 900]), aSheet({ FL: 0.6 }));
    expect(found.bands.map((b) => b.from)).toEqual([0, expect.closeTo(0.36, 9)]);
    expect(found.bands.map((b) => b.hours)).toEqual([1, 1]);
  });

  it('counts hours near the seat under more than half of the shut drop', () => {
    const record = aRecord([3, 1000, 100], [3, 1000, 700], [8, 1000, 100], [50, 1000, 500]);
    expect(stress(record).lowTravelHours).toBe(1);
    expect(stress(record, aSheet({ style: 'butterfly' })).lowTravelHours).toBe(2);
  });

  it('says nothing of choking from a guess: no vapour pressure, no FL', () => {
    const record = aRecord([50, 1000, 100]);
    const noPv = stress(record, aSheet({ fluid: { ...water, vapourPressure: null } }));
    expect(noPv).toMatchObject({ chokedShare: null, bands: [], reason: { reason: 'no-fluid-data' } });
    const noFL = stress(record, aSheet({ FL: null }));
    expect(noFL).toMatchObject({ chokedShare: null, reason: { reason: 'no-recovery-factor' } });
    expect(noFL.bands.at(-1)?.hours).toBe(1);
    expect(stress({ ...record, downstreamPressure: null })).toMatchObject({
      reason: { reason: 'no-pressures' },
      lowTravelHours: null,
    });
  });
});

describe('service stress of a gas', () => {
  it('chokes at Fγ·xT of the inlet pressure', () => {
    const sheet = aSheet({ fluid: gas });
    const found = stress(aRecord([50, 1000, 290], [50, 1000, 400], [50, 1000, 800]), sheet);
    expect(found.chokedShare).toBeCloseTo(1 / 3, 12);
    expect(found.flashingHours).toBeNull();
    expect(found.medianCavitationIndex).toBeNull();
    expect(stress(aRecord([50, 1000, 290]), aSheet({ fluid: gas, xT: null })).reason?.reason).toBe(
      'no-recovery-factor',
    );
  });

  it('is judged from steady windows where the drop is modelled', () => {
    const windows: SteadyWindows = {
      ...noWindows,
      count: 3,
      h: Float64Array.of(0.5, 0.5, 0.5),
      upstreamPressure: Float64Array.of(1000, 1000, 1000),
      pressureDrop: Float64Array.of(720, 300, NaN),
      coefficient: Float64Array.of(10, 10, NaN),
      source: 'modelled',
    };
    const record = { ...aRecord([50, 1000, 290]), upstreamPressure: null };
    const found = stress(record, aSheet({ fluid: gas }), windows);
    expect(found.chokedShare).toBeCloseTo(1 / 2, 12);
    expect(found.bands.reduce((sum, b) => sum + b.hours, 0)).toBeCloseTo((2 * 300) / 3600, 12);
  });
});

describe('the finding Choked service', () => {
  it('has the choked share as its figure, and is not judged where choking is not', () => {
    const record = aRecord([50, 1000, 100], [50, 1000, 900]);
    const measure = (sheet: DataSheet) => {
      const chapters = { service: stress(record, sheet), pressureDrop: 'measured' } as unknown as Chapters;
      return chokedService.measure(chapters, sheet, defaultLimits);
    };
    const [found] = measure(aSheet()) as readonly Measure[];
    expect(found).toMatchObject({ x: 0.5, raise: 0.05, actNow: 0.5, rests: { onPressures: false } });
    expect(measure(aSheet({ FL: null }))).toMatchObject({ reason: 'no-recovery-factor' });
  });
});
