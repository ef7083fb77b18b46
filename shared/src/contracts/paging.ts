import { z } from 'zod';

/** What may be asked of any long list. */
export const pageQuery = z.object({
  page: z.coerce.number().int().min(0).max(100_000).default(0),
  pageSize: z.coerce.number().int().min(1).max(500).default(50),
});

/** One page of a list, and how many there are in all. */
export function pageOf<T extends z.ZodType>(row: T) {
  return z.object({ rows: z.array(row), total: z.number().int() });
}
