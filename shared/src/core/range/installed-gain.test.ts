import { describe, expect, it } from 'vitest';
import { fitCharacteristic } from '../characteristic/fit-characteristic.js';
import { type DataSheet } from '../data-sheet.js';
import { defaultLimits } from '../limits.js';
import { prepare } from '../preparation/prepare.js';
import { steadyWindows } from '../preparation/steady-windows.js';
import { aRecord, aSheet, daysFromStart, type RecordPlan } from '../sample-record.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { installedGain } from './installed-gain.js';
import { operatingRange } from './operating-range.js';

function gainOf(plan: Partial<RecordPlan>, sheet: DataSheet = aSheet()) {
  const prepared = prepare(aRecord(plan), sheet, daysFromStart(plan.days ?? 6), defaultLimits);
  if ('judged' in prepared) throw new Error(prepared.reason);
  const windows = steadyWindows(prepared, sheet, defaultLimits);
  const { characteristic } = fitCharacteristic(windows, {
    sheet,
    travelSource: 'position',
    deadBand: null,
    random: seededRandom(1),
    limits: defaultLimits,
  });
  if (characteristic === null) throw new Error('no characteristic');
  const range = operatingRange(prepared, sheet, null, defaultLimits);
  return installedGain(prepared, windows, range, characteristic, seededRandom(2), defaultLimits);
}

describe('installed gain', () => {
  it('of a linear trim under a steady drop is the same all along', () => {
    const gain = gainOf({ law: (h) => 0.02 + 0.98 * h }, aSheet({ characteristic: 'linear' }));
    if (!('points' in gain)) throw new Error(gain.reason);
    // 0.98·Kv 50·0.1·√400 kPa is 98 m³/h over full travel, of a span of 100
    for (const { gain: g } of gain.points) expect(g).toBeCloseTo(0.98, 0);
    expect(gain.ratio.value).toBeLessThan(1.3);
    expect(gain.absolute).toBe(true);
  });

  it('of an equal-percentage trim grows with the flow, and its ratio lies in its interval', () => {
    const gain = gainOf({ days: 12 });
    if (!('points' in gain)) throw new Error(gain.reason);
    // dq/dh ∝ R^h: over 34 to 71 % travel 40^0.37 = 3.9
    expect(gain.ratio.value).toBeGreaterThan(3.2);
    expect(gain.ratio.value).toBeLessThan(4.6);
    expect(gain.ratio.low).toBeLessThanOrEqual(gain.ratio.value);
    expect(gain.ratio.high).toBeGreaterThanOrEqual(gain.ratio.value);
  });

  it('is refused below twelve per cent of travel', () => {
    expect(gainOf({ from: 45, to: 53 })).toMatchObject({ judged: false });
  });
});
