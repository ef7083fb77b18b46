import { describe, expect, it } from 'vitest';
import { defaultLimits } from '../limits.js';
import { loopSample } from '../movement/loop-sample.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { aSheet } from '../sample-record.js';
import { passingOf } from './passing.js';

interface ShutPlan {
  /** leak in Kv, of the sheet's 50 */
  readonly leak: number;
  readonly hours?: number;
  readonly spells?: number;
  /** kPa while shut; 400 while working */
  readonly drop?: number;
  readonly flowSpan?: number;
}

/** A valve that works for a day with 400 kPa over it, and between times stands shut. */
function aValveShut({ leak, hours = 2, spells = 2, drop = 400, flowSpan = 20 }: ShutPlan): Prepared {
  const step = 10;
  const shutPoints = Math.round((hours * 3_600) / step);
  const count = 8_640 + spells * (shutPoints + 360);
  const column = (value: number) => new Float64Array(count).fill(value);
  const state = new Uint8Array(count).fill(valveState.inService);
  const [travel, flow, P1] = [column(50), column(10), column(1_000)];
  for (let k = 0; k < spells; k++) {
    const from = 8_640 + k * (shutPoints + 360);
    const to = from + shutPoints;
    state.fill(valveState.shut, from, to);
    state.fill(valveState.shut | valveState.settling, from, from + 30);
    travel.fill(0, from, to);
    P1.fill(600 + drop, from, to);
    // C = 10·q·√((ρ/ρ0)/ΔP) in Kv, m³/h and kPa (IEC 60534-2-1, N1 = 0.1)
    flow.fill(0.1 * leak * Math.sqrt(drop), from, to);
    flow.fill(8, from, from + 30);
  }
  return {
    ...loopSample({ days: 0.01 }),
    step,
    count,
    travel,
    position: travel,
    demand: travel,
    flow,
    flowSpan,
    upstreamPressure: P1,
    downstreamPressure: column(600),
    state,
  };
}

const look = (plan: ShutPlan) => passingOf(aValveShut(plan), aSheet(), defaultLimits);

describe('flow through a shut valve', () => {
  it.each([1, 3, 8])('of %d per cent of the rated coefficient is read within a hundredth', (percent) => {
    const passing = look({ leak: percent / 2 });
    if ('reason' in passing) throw new Error(passing.reason);
    expect(passing.share).toBeGreaterThan(0.0099 * percent);
    expect(passing.share).toBeLessThan(0.0101 * percent);
    expect(passing.spells).toBe(2);
    expect(passing.seconds).toBeCloseTo(2 * (7_200 - 300), 6);
  });

  it('is not seen in a tight valve, and the smallest leak that would have been is said', () => {
    expect(look({ leak: 0 })).toMatchObject({ share: 0, spells: 0, smallestVisible: 0.005 });
  });

  it('is refused where the meter’s cut-off hides it', () => {
    const refused = look({ leak: 0.4, flowSpan: 200 });
    expect(refused).toMatchObject({ reason: 'meter-cut-off' });
    // twice the cut-off of 2 m³/h at 400 kPa is Kv 2, 4 % of 50
    if ('reason' in refused) expect(refused.figures.smallest).toBeCloseTo(0.04, 2);
  });

  it('says nothing without supply pressure, from short spells, or without shut spells', () => {
    expect(look({ leak: 2, drop: 50 })).toMatchObject({ reason: 'no-shut-spells' });
    expect(look({ leak: 2, hours: 0.2 })).toMatchObject({ reason: 'no-shut-spells' });
    expect(look({ leak: 2, spells: 0 })).toMatchObject({ reason: 'no-shut-spells' });
  });

  it('says nothing without pressures, flow, fluid or rated coefficient, each with its reason', () => {
    const valve = aValveShut({ leak: 2 });
    const sheet = aSheet();
    const reason = (prepared: Prepared, of = sheet) => passingOf(prepared, of, defaultLimits);
    expect(reason({ ...valve, upstreamPressure: null })).toMatchObject({ reason: 'no-pressures' });
    expect(reason({ ...valve, flow: null })).toMatchObject({ reason: 'no-flow' });
    expect(reason(valve, aSheet({ fluid: null }))).toMatchObject({ reason: 'no-fluid-data' });
    expect(reason(valve, aSheet({ ratedCoefficient: null }))).toMatchObject({
      reason: 'no-rated-coefficient',
    });
  });
});
