import { type Finding } from '../assessment.js';
import { type FindingKind } from './kinds.js';
import { findingRules } from './rules.js';

/** Travel below which a seat that passes may be all there is to a curve's departure, %. */
const lowTravel = 30;

/** Conditions under which a primary finding explains another, beside both being raised (§9.1). */
const onlyWhere: Partial<Record<FindingKind, (explained: Finding) => boolean>> = {
  'Passing when shut': ({ evidence }) => {
    const highest = evidence.highestBeyond ?? evidence.worstTravel ?? null;
    return highest !== null && highest < lowTravel;
  },
  // a stem that rests inside its band stands to the digit while demand moves: no transmitter has failed
  Sticking: restsInItsBand,
  'Lost motion': restsInItsBand,
};

function restsInItsBand({ kind, evidence }: Finding): boolean {
  return kind !== 'Frozen signal' || evidence.flowHours === 0;
}

/**
 * Marks findings that another one explains: they are shown struck through and not counted.
 *
 * Explanations may chain (Sticking → Hunting → Excess movement); the first of the chain is counted.
 *
 * Source: methods.md §9.1
 */
export function withConsequences(findings: readonly Finding[]): Finding[] {
  const raised = new Map(findings.map((f) => [f.kind, f]));
  const primary = new Map<FindingKind, FindingKind>();
  for (const finding of findings) {
    for (const kind of findingRules[finding.kind].explains) {
      const explained = raised.get(kind);
      if (explained === undefined || primary.has(kind)) continue;
      if (onlyWhere[finding.kind]?.(explained) ?? true) primary.set(kind, finding.kind);
    }
  }
  return findings.map((finding) => {
    const by = primary.get(finding.kind);
    return by === undefined ? finding : { ...finding, explainedBy: by };
  });
}
