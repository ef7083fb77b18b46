import { type Criticality } from '@tailrace/shared/core/data-sheet';

/** What the order of the ranking is decided by. */
export interface Standing {
  readonly tag: string;
  readonly attention: number;
  /** largest severity × confidence among counted findings */
  readonly strongest: number;
  readonly criticality: Criticality;
}

const weight: Record<Criticality, number> = { high: 1, normal: 0.8, low: 0.6 };

/** Order of the ranking: attention at whole numbers, then the strongest finding, then criticality, then tag (methods.md §9.3). */
export function byAttention(a: Standing, b: Standing): number {
  return (
    Math.round(b.attention) - Math.round(a.attention) ||
    b.strongest - a.strongest ||
    weight[b.criticality] - weight[a.criticality] ||
    a.tag.localeCompare(b.tag, 'en', { numeric: true })
  );
}
