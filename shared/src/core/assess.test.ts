import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess } from './assess.js';
import { type Assessment } from './assessment.js';
import { type DataSheet } from './data-sheet.js';
import { aRecord, aSeries, aSheet, aStart, daysFromStart, type RecordPlan } from './sample-record.js';
import { type History, type Series, signalRoles } from './series.js';

function assessed(
  plan: Partial<RecordPlan> = {},
  sheet: DataSheet = aSheet(),
  history = aRecord(plan),
): Assessment {
  return assess({ tag: 'FV-1', dataSheet: sheet }, history, daysFromStart(plan.days ?? 6));
}
const kinds = (a: Assessment) => a.findings.map((f) => f.kind);

describe('assess', () => {
  it('finds nothing wrong with a healthy valve, and says what it saw', () => {
    const a = assessed({ days: 15, from: 35, to: 65 });
    expect(kinds(a)).toEqual([]);
    expect(a).toMatchObject({ judged: true, reason: null, basis: 'inherent', attention: 0 });
    expect(a.characteristic?.kind).toBe('equal percentage');
    expect(a.deviation?.capacityRatio?.value).toBeCloseTo(1, 1);
    expect(a.range?.verdict).toBe('well sized');
    expect(a.window.samplesUsed).toBeLessThanOrEqual(a.window.samplesSeen);
  });

  it.each([
    ['Oversized', { from: 5, to: 22 }, {}],
    ['Undersized', { from: 70, to: 98 }, {}],
    ['Off characteristic', { law: (h: number) => 0.02 + 0.98 * h }, {}],
    ['Lost capacity', { capacity: 0.8 }, {}],
    ['Gained capacity', { capacity: 1.2 }, {}],
    [
      'Travel offset',
      { from: 10, to: 70, law: (h: number) => 0.02 + 0.98 * Math.min(1, h + 0.07) },
      { characteristic: 'linear' as const, rangeability: 50 },
    ],
  ])('raises %s on a valve that has it', (kind, plan, sheet) => {
    expect(kinds(assessed({ days: 15, ...plan }, aSheet(sheet)))).toContain(kind);
  });

  it('raises Frozen signal and keeps the rest of the record', () => {
    const record = aRecord({ days: 15 });
    const flow = record.flow as Series;
    const value = flow.value.map((v, i) => (i > 20_000 && i < 23_000 ? 31.4 : v));
    const a = assessed({ days: 15 }, aSheet(), { ...record, flow: { ...flow, value } });
    expect(kinds(a)).toContain('Frozen signal');
    expect(a.characteristic?.kind).toBe('equal percentage');
  });

  it('gives a trip valve no attention and no advice on tuning or trim', () => {
    const a = assessed({ days: 15, from: 5, to: 22, capacity: 0.8 }, aSheet({ trip: true }));
    expect(a.attention).toBeNull();
    expect(kinds(a)).not.toContain('Oversized');
    expect(kinds(a)).toContain('Lost capacity');
    expect(a.notJudged).toContainEqual(expect.objectContaining({ kind: 'Oversized', reason: 'trip-valve' }));
  });

  it('is the same to the bit for the same data', () => {
    expect(assessed({ days: 8 })).toEqual(assessed({ days: 8 }));
  });

  it('lists each kind once: raised, judged, or not judged with its reason', () => {
    const { position, flow } = aRecord();
    const a = assessed({}, aSheet(), { position, flow });
    const refused = a.notJudged.map((k) => k.kind);
    expect(new Set(refused).size).toBe(refused.length);
    for (const finding of a.findings) expect(refused).not.toContain(finding.kind);
    expect(a.notJudged).toContainEqual(
      expect.objectContaining({ kind: 'Off characteristic', reason: 'no-pressures' }),
    );
  });
});

describe('what cannot be judged', () => {
  const time = Array.from({ length: 1_200 }, (_, i) => aStart + i);
  const flow = aSeries(
    time,
    time.map((_, i) => 20 + Math.sin(i) + 0.1 * (i % 7)),
  );

  it('is a valve that stood still for twenty minutes', () => {
    const a = assess(
      { tag: 'A', dataSheet: aSheet() },
      {
        demand: aSeries(
          time,
          time.map(() => 40),
        ),
        flow,
      },
      daysFromStart(1),
    );
    expect(a.judged).toBe(false);
    expect(a.reason).toMatchObject({ reason: 'travel-constant' });
    expect(a.findings).toEqual([]);
  });

  it('is not a valve wide open for twenty minutes: that is pinned, all of its time', () => {
    const a = assess(
      { tag: 'A', dataSheet: aSheet() },
      {
        demand: aSeries(
          time,
          time.map(() => 100),
        ),
        flow,
      },
      daysFromStart(1),
    );
    expect(a.judged).toBe(true);
    expect(a.findings).toHaveLength(1);
    expect(a.findings[0]).toMatchObject({ kind: 'Pinned at limit', x: 1 });
    expect(a.characteristic).toBeNull();
  });

  it('says that the valve was shut, that there is no flow, or that there is nothing at all', () => {
    const at = (history: History) =>
      assess({ tag: 'A', dataSheet: aSheet() }, history, daysFromStart(1)).reason?.reason;
    const moving = aSeries(
      time,
      time.map((_, i) => 40 + 20 * Math.sin(i / 100)),
    );
    expect(
      at({
        demand: aSeries(
          time,
          time.map(() => 0),
        ),
        flow: aSeries(
          time,
          time.map(() => 0),
        ),
      }),
    ).toBe('always-shut');
    expect(at({ demand: moving })).toBe('no-flow');
    expect(at({ flow })).toBe('no-travel-signal');
    expect(at({})).toBe('no-samples');
  });

  it('says that a reverse-acting signal makes the flow fall', () => {
    const record = aRecord();
    const mirrored = (s: Series | undefined) => ({
      ...(s as Series),
      value: (s as Series).value.map((v) => 100 - v),
    });
    const a = assessed({}, aSheet(), {
      ...record,
      position: mirrored(record.position),
      demand: mirrored(record.demand),
    });
    expect(a.reason?.reason).toBe('flow-falls-as-valve-opens');
    expect(a.warnings.map((w) => w.code)).toContain('flow-falls-as-valve-opens');
    const half = assessed({}, aSheet(), { ...record, demand: mirrored(record.demand) });
    expect(half.warnings.map((w) => w.code)).toContain('demand-against-position');
  });
});

describe('invariances', () => {
  const plan = { days: 6, from: 30, to: 70 };
  const base = assessed(plan);
  const flows = (history: History, factor: number): History => {
    const flow = history.flow as Series;
    return { ...history, flow: { ...flow, value: flow.value.map((v) => factor * v) } };
  };

  it('scaling flow, span and rated coefficient together changes no verdict and no ratio', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 50, noNaN: true }), (factor) => {
        const sheet = aSheet({ flowSpan: 100 * factor, ratedCoefficient: 50 * factor });
        const a = assess({ tag: 'FV-1', dataSheet: sheet }, flows(aRecord(plan), factor), daysFromStart(6));
        expect(a.characteristic?.kind).toBe(base.characteristic?.kind);
        expect(a.deviation?.capacityRatio?.value).toBeCloseTo(base.deviation?.capacityRatio?.value ?? NaN, 6);
        expect(a.gain?.ratio.value).toBeCloseTo(base.gain?.ratio.value ?? NaN, 6);
        expect(kinds(a)).toEqual(kinds(base));
      }),
      { numRuns: 6, seed: 1 },
    );
  });

  it('moving the record by whole days changes no figure of range, characteristic or deviation', () => {
    fc.assert(
      fc.property(fc.integer({ min: -3_000, max: 3_000 }), (days) => {
        const moved = Object.fromEntries(
          Object.entries(aRecord(plan)).map(([role, s]) => [
            role,
            { ...s, time: s.time.map((t) => t + 86_400 * days) },
          ]),
        );
        const from = aStart + 86_400 * days;
        const a = assess({ tag: 'FV-1', dataSheet: aSheet() }, moved, { from, to: from + 6 * 86_400 });
        expect(a.range?.p50).toBe(base.range?.p50);
        expect(a.characteristic?.points.length).toBe(base.characteristic?.points.length);
        expect(a.deviation?.capacityRatio?.value).toBeCloseTo(base.deviation?.capacityRatio?.value ?? NaN, 4);
      }),
      { numRuns: 6, seed: 2 },
    );
  });

  it('handing samples over out of order, or twice, changes nothing', () => {
    const record = aRecord({ days: 2 });
    const plain = assessed({ days: 2 }, aSheet(), record);
    const twice = Object.fromEntries(
      Object.entries(record).map(([role, s]) => {
        const order = [...s.time.keys(), ...s.time.keys()].reverse();
        const pick = (c: ArrayLike<number>) => order.map((i) => c[i] as number);
        return [role, aSeries(pick(s.time), pick(s.value), pick(s.good))];
      }),
    );
    const a = assessed({ days: 2 }, aSheet(), twice);
    expect(a.characteristic).toEqual(plain.characteristic);
    expect(a.range).toEqual(plain.range);
  });
});

describe('whatever a record contains', () => {
  const anyValue = fc.oneof(
    { weight: 6, arbitrary: fc.double({ min: -10, max: 110, noNaN: true }) },
    { weight: 1, arbitrary: fc.constantFrom(NaN, Infinity, -Infinity, 0, -0, 100, 1e300, -1e300, 5e-324) },
  );
  const anySeries = fc
    .array(
      fc.tuple(
        fc.oneof(fc.integer({ min: 0, max: 90_000 }), fc.constantFrom(NaN, 5, 5, 60)),
        anyValue,
        fc.boolean(),
      ),
      {
        maxLength: 60,
      },
    )
    .map((rows) =>
      aSeries(
        rows.map(([t]) => aStart + t),
        rows.map(([, v]) => v),
        rows.map(([, , good]) => (good ? 1 : 0)),
      ),
    );
  const anyHistory = fc.record(Object.fromEntries(signalRoles.map((role) => [role, anySeries])), {
    requiredKeys: [],
  });
  const anyNumber = fc.option(fc.oneof(fc.double({ noNaN: false }), fc.integer({ min: -5, max: 200 })), {
    nil: null,
  });
  const anySheet = fc
    .record({
      characteristic: fc.constantFrom(
        null,
        'linear',
        'equal percentage',
        'quick opening',
        'modified parabolic',
        'table',
      ),
      ratedCoefficient: anyNumber,
      rangeability: anyNumber,
      FL: anyNumber,
      xT: anyNumber,
      valveSize: anyNumber,
      pipeSize: anyNumber,
      flowSpan: anyNumber,
      trip: fc.boolean(),
      table: fc.option(
        fc.array(fc.record({ travel: fc.double(), coefficient: fc.double() }), { maxLength: 4 }),
        { nil: null },
      ),
      designBand: fc.option(fc.record({ low: fc.double(), high: fc.double() }), { nil: null }),
      designCases: fc.array(
        fc.record({
          name: fc.constant('case'),
          flow: fc.double(),
          upstreamPressure: anyNumber,
          downstreamPressure: anyNumber,
        }),
        { maxLength: 3 },
      ),
    })
    .map((parts) => aSheet(parts as Partial<DataSheet>));

  it('never throws, and gives no verdict without data', () => {
    fc.assert(
      fc.property(anyHistory, anySheet, (history, sheet) => {
        const a = assess({ tag: 'X', dataSheet: sheet }, history, daysFromStart(1));
        if (!a.judged) expect(a.reason).not.toBeNull();
        for (const finding of a.findings) {
          expect(Number.isFinite(finding.severity)).toBe(true);
          expect(finding.confidence).toBeGreaterThan(0);
        }
        if (a.attention !== null) expect(Number.isFinite(a.attention)).toBe(true);
        expect(a.characteristic?.kind ?? 'undecided').toBe('undecided');
      }),
      { numRuns: 300, seed: 7 },
    );
  });

  const spoiled: Record<string, (v: number, i: number) => number> = {
    'negative flow': (v) => -v,
    'flow of zero': () => 0,
    'infinite flow': () => Infinity,
    'flow in another unit': (v) => 1_000 * v,
    'flow without a good number': () => NaN,
  };
  it.each(Object.keys(spoiled))('a long record with %s is judged without a throw', (name) => {
    const record = aRecord({ days: 4 });
    const flow = record.flow as Series;
    const value = flow.value.map(spoiled[name] as (v: number) => number);
    const a = assessed({ days: 4 }, aSheet(), { ...record, flow: { ...flow, value } });
    expect(a.characteristic?.kind ?? 'undecided').toBe('undecided');
  });

  it('one sample is no record', () => {
    const a = assessed({}, aSheet(), { position: aSeries([aStart], [50]), flow: aSeries([aStart], [20]) });
    expect(a.judged).toBe(false);
  });

  it('crossed pressures leave the flow to judge from', () => {
    const record = aRecord();
    const a = assessed({}, aSheet(), {
      ...record,
      upstreamPressure: record.downstreamPressure as Series,
      downstreamPressure: record.upstreamPressure as Series,
    });
    expect(a.basis).toBe('installed');
    expect(a.warnings.map((w) => w.code)).toContain('pressures-crossed');
  });

  it('travel outside 0 to 100 % is kept to −5 and 105 %', () => {
    const record = aRecord();
    const position = record.position as Series;
    const a = assessed({}, aSheet(), {
      ...record,
      position: { ...position, value: position.value.map((v, i) => (i % 50 === 0 ? 300 : v)) },
    });
    expect(a.window.leftOut['out of range']).toBeGreaterThan(300);
    expect(a.range?.p95).toBeLessThan(105);
  });
});
