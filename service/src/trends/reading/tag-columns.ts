import { type ColumnPlan } from '@tailrace/shared/contracts/trends';
import { columnHeader, type ColumnHeader } from './column-header.js';
import { Refusal } from './refusal.js';

/** Where in a row the plan finds its time, tags, values and qualities. */
export interface Columns {
  readonly header: readonly string[];
  readonly time: number;
  /** wide form: one entry a tag */
  readonly tags: readonly (ColumnHeader & { readonly index: number })[];
  /** long form: the columns of tag, value and quality */
  readonly long: { readonly tag: number; readonly value: number; readonly quality: number | null } | null;
}

/** Finds the plan's columns in the header; refuses a header that lacks one or names a tag twice. */
export function findColumns(header: readonly string[], plan: ColumnPlan): Columns {
  const names = header.map((name) => name.trim());
  const index = (name: string): number => {
    const found = names.indexOf(name.trim());
    if (found < 0) throw Refusal.because('missingColumn', name, names);
    return found;
  };
  const time = index(plan.time.column);
  if (plan.form === 'long' && plan.long) {
    const { tagColumn, valueColumn, qualityColumn } = plan.long;
    const quality = qualityColumn === null ? null : index(qualityColumn);
    return {
      header: names,
      time,
      tags: [],
      long: { tag: index(tagColumn), value: index(valueColumn), quality },
    };
  }
  const tags = names
    .map((name, i) => ({ ...columnHeader(name), index: i }))
    .filter(({ tag, index: at }) => at !== time && tag !== '');
  const seen = new Map<string, number>();
  for (const { tag, index: at } of tags) {
    const first = seen.get(tag);
    if (first !== undefined) throw Refusal.because('sameTagTwice', tag, first + 1, at + 1);
    seen.set(tag, at);
  }
  return { header: names, time, tags, long: null };
}
