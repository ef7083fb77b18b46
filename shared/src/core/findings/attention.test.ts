import { describe, expect, it } from 'vitest';
import { type Finding } from '../assessment.js';
import { aSheet } from '../sample-record.js';
import { attentionOf, carryAttention, compareRank, isTellingMove } from './attention.js';
import { type FindingKind } from './kinds.js';

function aFinding(
  kind: FindingKind,
  severity: number,
  confidence: number,
  explainedBy: FindingKind | null = null,
): Finding {
  return {
    kind,
    severity,
    confidence,
    explainedBy,
    x: 0,
    raise: 0,
    actNow: 1,
    standardError: null,
    rule: 'rule',
    evidence: {},
  };
}

describe('attention', () => {
  it('is 46.73 for Sticking of 0.54 and Uneven gain of 0.24 on a valve of normal criticality (methods.md §12.5)', () => {
    const findings = [aFinding('Sticking', 0.6, 0.9), aFinding('Uneven gain', 0.3, 0.8)];
    const { attention } = attentionOf(findings, aSheet({ criticality: 'normal' }));
    expect(attention).toBeCloseTo(46.73, 2);
    expect(Math.round(attention ?? NaN)).toBe(47);
  });

  it('lets one real fault outrank ten trifles', () => {
    const trifles = Array.from({ length: 10 }, () => aFinding('Sticking', 0.05, 1));
    const high = aSheet({ criticality: 'high' });
    expect(attentionOf(trifles, high).attention).toBeCloseTo(40, 0);
    expect(attentionOf([aFinding('Sticking', 0.8, 1)], high).attention).toBeCloseTo(80, 9);
  });

  it('never passes the criticality’s ceiling', () => {
    const all = Array.from({ length: 16 }, () => aFinding('Undersized', 1, 1));
    expect(attentionOf(all, aSheet({ criticality: 'low' })).attention).toBeLessThanOrEqual(60);
  });

  it('does not count what another finding explains', () => {
    const findings = [aFinding('Undersized', 0.5, 1), aFinding('Pinned at limit', 1, 1, 'Undersized')];
    const { attention, attentionTerms } = attentionOf(findings, aSheet({ criticality: 'high' }));
    expect(attention).toBeCloseTo(50, 9);
    expect(attentionTerms.map((t) => t.kind)).toEqual(['Undersized']);
  });

  it('is not given to a trip valve', () => {
    expect(attentionOf([aFinding('Sticking', 1, 1)], aSheet({ trip: true })).attention).toBeNull();
  });
});

describe('the ranking’s order', () => {
  const valve = (
    tag: string,
    attention: number,
    largestTerm = 0.5,
    criticality: 'high' | 'normal' = 'normal',
  ) => ({
    tag,
    attention,
    largestTerm,
    criticality,
  });

  it('is by attention at whole numbers, then the largest term, then criticality, then tag', () => {
    const valves = [
      valve('D', 40.2),
      valve('A', 40.4),
      valve('C', 39.9, 0.9),
      valve('B', 40.1, 0.5, 'high'),
      valve('E', 80),
    ];
    expect([...valves].sort(compareRank).map((v) => v.tag)).toEqual(['E', 'C', 'B', 'A', 'D']);
  });

  it('tells a move only where attention itself changed by five', () => {
    expect(isTellingMove(44, 40)).toBe(false);
    expect(isTellingMove(35, 40)).toBe(true);
  });
});

describe('a valve that cannot be judged this month', () => {
  it('keeps four fifths of its attention for two months and then leaves', () => {
    const first = carryAttention({ attention: 50, months: 0 });
    expect(first).toEqual({ attention: 40, months: 1 });
    const second = carryAttention(first ?? { attention: NaN, months: 9 });
    expect(second).toEqual({ attention: 32, months: 2 });
    expect(carryAttention(second ?? { attention: NaN, months: 0 })).toBeNull();
  });
});
