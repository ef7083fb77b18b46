import { runDraft, type RunDraft } from '@tailrace/shared/contracts/runs';
import { z } from 'zod';
import { startOfDay } from '../../lib/dates';

const day = z.union([z.literal(''), z.iso.date('Give a day.')]);

const tagsIn = (text: string): string[] => [...new Set(text.split(/[\s,;]+/).filter(Boolean))];

/** What a person types to start a run. */
export const startForm = z
  .object({ tags: z.string(), from: day, to: day })
  .superRefine(({ tags, from, to }, context) => {
    const parsed = runDraft.shape.tags.safeParse(tagsIn(tags));
    if (!parsed.success)
      context.addIssue({ code: 'custom', path: ['tags'], message: parsed.error.issues[0]?.message ?? '' });
    if (from && to && from > to)
      context.addIssue({ code: 'custom', path: ['to'], message: 'The last day lies before the first.' });
  });
export type StartForm = z.infer<typeof startForm>;

/**
 * What is sent for it.
 *
 * @param zone IANA zone of the site: days begin and end there
 */
export function runDraftOf({ tags, from, to }: StartForm, zone: string): RunDraft {
  const named = tagsIn(tags);
  return {
    ...(named.length > 0 && { tags: named }),
    ...(from && { from: startOfDay(from, zone) }),
    ...(to && { to: startOfDay(dayAfter(to), zone) }),
  };
}

function dayAfter(day: string): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + 86_400_000).toISOString().slice(0, 10);
}
