import { assess } from '../src/core/assess.js';
import { type FindingKind } from '../src/core/findings/kinds.js';
import { type Family } from './family.js';
import { recordOf } from './record.js';

export interface FamilyResult {
  readonly name: string;
  readonly seeds: number;
  readonly found: number;
  /** valves with a finding that is neither sought, related nor Uneven gain, and which */
  readonly unrelated: number;
  readonly unrelatedKinds: readonly string[];
  readonly figure: {
    readonly name: string;
    readonly rms: number;
    readonly worst: number;
    readonly known: number;
  } | null;
  readonly kinds: { readonly right: number; readonly wrong: number };
}

/** Simulates and assesses a family's loops, one a seed, and holds the answers against the truth. */
export function runFamily(family: Family, seeds: number): FamilyResult {
  let found = 0;
  let unrelated = 0;
  let right = 0;
  let wrong = 0;
  const unrelatedKinds = new Set<string>();
  const errors: number[] = [];
  for (let seed = 1; seed <= seeds; seed++) {
    const { history, dataSheet, span, truth } = recordOf(family, seed);
    const { loop } = truth;
    const assessment = assess({ tag: `${family.name} ${seed}`, dataSheet }, history, span);
    const raised = assessment.findings
      .filter(({ explainedBy }) => explainedBy === null)
      .map(({ kind }) => kind);
    const sees = (kind: FindingKind) => raised.includes(kind);
    if (family.either ? family.sought.some(sees) : family.sought.every(sees)) found += 1;
    const odd = raised.filter(
      (kind) => kind !== 'Uneven gain' && !family.sought.includes(kind) && !family.related?.includes(kind),
    );
    if (odd.length > 0) unrelated += 1;
    for (const kind of odd) unrelatedKinds.add(kind);
    const kind = assessment.characteristic?.kind;
    if (kind === loop.valve.kind) right += 1;
    else if (kind !== undefined && kind !== 'undecided') wrong += 1;
    const error = family.figure?.error(assessment, truth);
    if (error !== undefined && Number.isFinite(error)) errors.push(error);
  }
  return {
    name: family.name,
    seeds,
    found,
    unrelated,
    unrelatedKinds: [...unrelatedKinds],
    figure: family.figure
      ? {
          name: family.figure.name,
          rms: Math.sqrt(errors.reduce((sum, e) => sum + e * e, 0) / Math.max(1, errors.length)),
          worst: errors.reduce((worst, e) => Math.max(worst, Math.abs(e)), 0),
          known: errors.length,
        }
      : null,
    kinds: { right, wrong },
  };
}
