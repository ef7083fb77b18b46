import { describe, expect, it } from 'vitest';
import { type Finding, type KindFigure, type KindNotJudged } from '../assessment.js';
import { defaultLimits } from '../limits.js';
import { type FindingKind } from './kinds.js';
import { isAtKeepLevel, type StandingFinding, standingFindings } from './keep-level.js';
import { severityOf } from './confidence.js';

const share = { raise: 0.05, actNow: 0.4 };

function raised(x: number, kind: FindingKind = 'Undersized'): Finding {
  return {
    kind,
    severity: severityOf({ x, ...share, severityFactor: 1 }),
    confidence: 1,
    x,
    ...share,
    standardError: null,
    rule: 'above band',
    explainedBy: null,
    evidence: {},
  };
}
const figure = (x: number): KindFigure => ({ kind: 'Undersized', rule: 'above band', x, ...share });

function follow(
  previous: readonly StandingFinding[],
  current: { findings?: Finding[]; figures?: KindFigure[]; notJudged?: KindNotJudged[] },
) {
  return standingFindings(previous, { findings: [], figures: [], notJudged: [], ...current }, defaultLimits);
}

describe('findings over successive assessments', () => {
  const first = follow([], { findings: [raised(0.2)], figures: [figure(0.2)] });

  it('enter at their own figure', () => {
    expect(first[0]).toMatchObject({ smoothed: 0.2, under: 0 });
  });

  it('stay while the figure is under the raise threshold but above the keep level', () => {
    const second = follow(first, { figures: [figure(0.045)] });
    expect(second).toHaveLength(1);
    expect(second[0]?.under).toBe(0);
  });

  it('end only when the figure was under the keep level twice in a row', () => {
    const once = follow(first, { figures: [figure(0.01)] });
    expect(once[0]?.under).toBe(1);
    expect(follow(once, { figures: [figure(0.01)] })).toEqual([]);
    const back = follow(once, { figures: [figure(0.046)] });
    expect(back[0]?.under).toBe(0);
  });

  it('stay as they were while their kind cannot be judged', () => {
    const blind = follow(first, {
      notJudged: [{ kind: 'Undersized', reason: 'record-too-short', figures: {} }],
    });
    expect(blind).toEqual(first);
  });

  it('are smoothed while they go on', () => {
    const second = follow(first, { findings: [raised(0.4)], figures: [figure(0.4)] });
    expect(second[0]?.smoothed).toBeCloseTo(0.6 * 0.4 + 0.4 * 0.2, 12);
    expect(second[0]?.finding.x).toBe(0.4);
    expect(second[0]?.finding.severity).toBeLessThan(raised(0.4).severity);
  });

  it('have their consequences marked anew each time', () => {
    const both = follow(first, { findings: [raised(0.2), raised(0.3, 'Pinned at limit')], figures: [] });
    expect(both.find((s) => s.finding.kind === 'Pinned at limit')?.finding.explainedBy).toBe('Undersized');
  });
});

describe('the keep level', () => {
  it('lies 15 % short of the threshold on the healthy side, whichever that is', () => {
    const falling = (x: number): KindFigure => ({ kind: 'Oversized', rule: 'p95', x, raise: 30, actNow: 10 });
    expect(isAtKeepLevel(figure(0.0426), defaultLimits)).toBe(true);
    expect(isAtKeepLevel(figure(0.0424), defaultLimits)).toBe(false);
    expect(isAtKeepLevel(falling(35), defaultLimits)).toBe(true);
    expect(isAtKeepLevel(falling(36), defaultLimits)).toBe(false);
  });
});
