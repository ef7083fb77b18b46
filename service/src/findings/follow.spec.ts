import { type AssessedFinding } from '@tailrace/shared/contracts/findings';
import { followFindings, type Standing } from './follow.js';

const found = (kind: AssessedFinding['kind']): AssessedFinding => ({
  kind,
  severity: 0.5,
  confidence: 0.9,
  text: kind,
  nextStep: '',
  doubts: [],
  explainedBy: null,
  rule: 'only',
  x: 1,
  raise: 1,
  actNow: 2,
  standardError: null,
  evidence: {},
});
const standing = (kind: Standing['kind'], state: Standing['state'], missed = 0): Standing => ({
  kind,
  state,
  missed,
});
const none = new Set<string>();

describe('findings that follow an assessment', () => {
  it('opens a kind seen for the first time', () => {
    expect(followFindings([], [found('Hunting')], none)).toEqual([
      { what: 'opens', found: found('Hunting') },
    ]);
  });

  it('keeps one finding a kind instead of opening another', () => {
    const steps = followFindings([standing('Hunting', 'confirmed')], [found('Hunting')], none);
    expect(steps.map((s) => s.what)).toEqual(['goes on']);
  });

  it('misses a finding once before it clears it', () => {
    const first = followFindings([standing('Sticking', 'new')], [], none);
    expect(first).toEqual([{ what: 'is missed', kind: 'Sticking', missed: 1 }]);
    const second = followFindings([standing('Sticking', 'new', 1)], [], none);
    expect(second).toEqual([{ what: 'clears', kind: 'Sticking' }]);
  });

  it('neither supports nor clears what it could not judge', () => {
    expect(followFindings([standing('Sticking', 'new', 1)], [], new Set(['Sticking']))).toEqual([]);
  });

  it('reopens a cleared finding that comes back', () => {
    const steps = followFindings([standing('Oversized', 'cleared')], [found('Oversized')], none);
    expect(steps.map((s) => s.what)).toEqual(['reopens']);
  });

  it('leaves a ruled-out finding to go on without asking again', () => {
    const steps = followFindings([standing('Oversized', 'ruled out')], [found('Oversized')], none);
    expect(steps.map((s) => s.what)).toEqual(['goes on']);
  });
});
