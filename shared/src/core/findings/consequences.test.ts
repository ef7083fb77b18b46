import { describe, expect, it } from 'vitest';
import { type Finding } from '../assessment.js';
import { withConsequences } from './consequences.js';
import { type FindingKind } from './kinds.js';

function raised(kind: FindingKind, evidence: Finding['evidence'] = {}): Finding {
  return {
    kind,
    severity: 0.5,
    confidence: 1,
    x: 1,
    raise: 0,
    actNow: 2,
    standardError: null,
    rule: 'rule',
    explainedBy: null,
    evidence,
  };
}
const explained = (findings: Finding[]) =>
  Object.fromEntries(withConsequences(findings).map((f) => [f.kind, f.explainedBy]));

describe('consequences', () => {
  it('name the finding that explains them', () => {
    expect(explained([raised('Undersized'), raised('Pinned at limit')])).toEqual({
      Undersized: null,
      'Pinned at limit': 'Undersized',
    });
    expect(explained([raised('Travel offset'), raised('Gained capacity')])['Gained capacity']).toBe(
      'Travel offset',
    );
  });

  it('leave a finding alone when nothing else is raised', () => {
    expect(explained([raised('Pinned at limit')])).toEqual({ 'Pinned at limit': null });
  });

  it('let a passing seat explain a shape only where that lies at low travel', () => {
    const off = (highestBeyond: number) => raised('Off characteristic', { highestBeyond });
    expect(explained([raised('Passing when shut'), off(20)])['Off characteristic']).toBe('Passing when shut');
    expect(explained([raised('Passing when shut'), off(60)])['Off characteristic']).toBeNull();
  });

  it('let a stem that rests in its band explain a position that stands still, but not a flow', () => {
    const frozen = (flowHours: number) => raised('Frozen signal', { flowHours, positionHours: 3 });
    expect(explained([raised('Sticking'), frozen(0)])['Frozen signal']).toBe('Sticking');
    expect(explained([raised('Lost motion'), frozen(5)])['Frozen signal']).toBeNull();
  });

  it('may chain, so that only the first cause is counted', () => {
    const found = explained([raised('Sticking'), raised('Hunting'), raised('Excess movement')]);
    expect(found).toEqual({ Sticking: null, Hunting: 'Sticking', 'Excess movement': 'Hunting' });
  });
});
