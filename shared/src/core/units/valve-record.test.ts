import { describe, expect, it } from 'vitest';
import { type Series, type SignalRole } from '../series.js';
import { type RegisterForm, type RegisterSheet, type RegisterSignal } from './register-form.js';
import { differenceFromCore, registerUnits, shownIn } from './register-units.js';
import { type ValveReading, valveRecord } from './valve-record.js';

const water = {
  phase: 'liquid' as const,
  density: 965.4,
  vapourPressure: 70.1,
  criticalPressure: 22120,
  viscosity: null,
  molarMass: null,
  specificHeatRatio: null,
  compressibility: null,
  temperature: null,
};

function aForm(
  sheet: Partial<RegisterSheet> = {},
  signals: Partial<Record<SignalRole, Partial<RegisterSignal>>> = { flow: { unit: 'm3/h' } },
): RegisterForm {
  return {
    tag: 'FV-101',
    dataSheet: {
      characteristic: 'linear',
      ratedCoefficient: 115.6,
      coefficientUnit: 'Cv',
      rangeability: null,
      table: null,
      style: 'globe',
      fluid: water,
      FL: 0.9,
      xT: null,
      Fd: null,
      valveSize: null,
      pipeSize: null,
      trip: false,
      criticality: 'normal',
      designBand: null,
      flowSpan: null,
      flowSpanUnit: null,
      designCases: [],
      ...sheet,
    },
    signals: Object.fromEntries(
      Object.entries(signals).map(([role, s]) => [role, { unit: null, reversed: false, ...s }]),
    ),
  };
}

const series = (...value: number[]): Series => ({
  time: Float64Array.from(value, (_, i) => i),
  value: Float64Array.from(value),
  good: new Uint8Array(value.length).fill(1),
});

function read(form: RegisterForm): ValveReading {
  const reading = valveRecord(form);
  if ('problems' in reading) throw new Error(JSON.stringify(reading.problems));
  return reading;
}

describe('a valve of the register in the core’s units', () => {
  it('has its rated coefficient and its table in Kv, the table by ascending travel', () => {
    const table = [
      { travel: 100, coefficient: 115.6 },
      { travel: 0, coefficient: 1.156 },
    ];
    const { dataSheet } = read(aForm({ characteristic: 'table', table })).valve;
    expect(dataSheet.ratedCoefficient).toBeCloseTo(100, 12);
    expect(dataSheet.table?.map((p) => p.travel)).toEqual([0, 100]);
    expect(dataSheet.table?.[0]?.coefficient).toBeCloseTo(1, 12);
  });

  it('counts flow by the flow signal’s unit, else the span’s, else in m³/h', () => {
    expect(read(aForm({}, { flow: { unit: 't/h' } })).valve.dataSheet.flowBasis).toBe('mass');
    const bySpan = read(aForm({ flowSpan: 2, flowSpanUnit: 'kscmh' }, { flow: {} }));
    expect(bySpan.valve.dataSheet).toMatchObject({ flowBasis: 'normal volume' });
    expect(bySpan.toHistory('flow', series(1))?.value[0]).toBeCloseTo(947.94, 2);
    expect(read(aForm({}, {})).flow).toEqual({ basis: 'volume', scaled: true, unit: null });
  });

  it('takes a span without a unit in the unit of the flow signal', () => {
    const { dataSheet } = read(aForm({ flowSpan: 40 }, { flow: { unit: 'l/min' } })).valve;
    expect(dataSheet.flowSpan).toBeCloseTo(2.4, 12);
  });

  it('connects a span and design cases in another flow basis through the fluid', () => {
    const designCases = [
      {
        name: 'normal',
        flow: 9.654,
        flowUnit: 't/h',
        upstreamPressure: 5,
        downstreamPressure: 3,
        pressureUnit: 'bar(g)',
      },
    ];
    const { dataSheet } = read(aForm({ designCases, flowSpan: 19308, flowSpanUnit: 'kg/h' })).valve;
    expect(dataSheet.flowSpan).toBeCloseTo(20, 9);
    expect(dataSheet.designCases[0]?.flow).toBeCloseTo(10, 9);
    expect(dataSheet.designCases[0]).toMatchObject({
      upstreamPressure: 601.325,
      downstreamPressure: 401.325,
    });
  });

  it('lets nothing but the installed characteristic be made from a flow in % or without a unit', () => {
    for (const unit of ['%', null]) {
      const reading = read(aForm({ flowSpan: 100 }, { flow: { unit } }));
      expect(reading.valve.dataSheet).toMatchObject({ flowUnscaled: true, designCases: [], flowSpan: 100 });
      expect(reading.doubts).toContainEqual({
        pointer: '/signals/flow/unit',
        code: 'flow-without-scale',
        found: unit,
      });
      expect(reading.toHistory('flow', series(42))?.value[0]).toBe(42);
    }
  });

  it('names every field whose unit cannot be used instead of throwing', () => {
    const result = valveRecord(
      aForm(
        { flowSpan: 1, flowSpanUnit: 'furlong' },
        { flow: { unit: 'slpm' }, position: { unit: 'bar' }, temperature: { unit: 'warm' } },
      ),
    );
    expect(result).toEqual({
      problems: [
        { pointer: '/signals/flow/unit', code: 'state-not-named', found: 'slpm' },
        { pointer: '/signals/position/unit', code: 'unit-of-another-quantity', found: 'bar' },
        { pointer: '/signals/temperature/unit', code: 'unit-unknown', found: 'warm' },
      ],
    });
    const noDensity = aForm({ fluid: { ...water, density: null }, flowSpan: 1, flowSpanUnit: 't/h' });
    expect(valveRecord(noDensity)).toMatchObject({ problems: [{ code: 'flow-bases-not-connected' }] });
  });
});

describe('recorded signals as history', () => {
  it('are converted, and turned round where the signal is reversed', () => {
    const reading = read(
      aForm(
        {},
        {
          position: { unit: 'fraction', reversed: true },
          demand: {},
          upstreamPressure: { unit: 'bar' },
          downstreamPressure: {},
          processValue: { unit: 'l/min' },
          setPoint: { unit: 'm' },
          mode: {},
        },
      ),
    );
    const recorded = series(0.25, NaN);
    expect([...(reading.toHistory('position', recorded)?.value ?? [])]).toEqual([75, NaN]);
    expect([...recorded.value]).toEqual([0.25, NaN]);
    expect(reading.toHistory('demand', recorded)).toEqual(recorded);
    expect(reading.toHistory('upstreamPressure', series(2))?.value[0]).toBe(200);
    expect(reading.toHistory('downstreamPressure', series(2))).toBeNull();
    expect(reading.toHistory('processValue', series(100))?.value[0]).toBeCloseTo(6, 12);
    expect(reading.toHistory('setPoint', series(3))?.value[0]).toBe(3);
    expect(reading.toHistory('density', series(3))).toBeNull();
    expect(reading.doubts.map(({ pointer, code }) => `${pointer} ${code}`)).toEqual([
      '/signals/upstreamPressure/unit gauge-or-absolute-not-stated',
      '/signals/downstreamPressure/unit unit-missing',
    ]);
    expect(Object.keys(reading.historyOf({ mode: series(1), downstreamPressure: series(1) }))).toEqual([
      'mode',
    ]);
  });
});

describe('the register’s units', () => {
  it('show a coefficient, a flow and a pressure as they were entered', () => {
    const units = registerUnits(aForm({}, { flow: { unit: 'gpm' }, upstreamPressure: { unit: 'psig' } }));
    expect(units).toMatchObject({
      flow: { name: 'gpm' },
      pressure: { name: 'psi(g)' },
      coefficient: { name: 'Cv' },
    });
    expect(shownIn(100, units.coefficient)).toBeCloseTo(115.6, 9);
    expect(shownIn(0.2271247, units.flow)).toBeCloseTo(1, 6);
    expect(differenceFromCore(6.894757, units.pressure)).toBeCloseTo(1, 6);
    expect(shownIn(7, null)).toBe(7);
  });
});
