/** The sixteen things an assessment can say is wrong (product.md §2, methods.md §9.2). */
export const findingKinds = [
  'Oversized',
  'Undersized',
  'Pinned at limit',
  'Off characteristic',
  'Lost capacity',
  'Gained capacity',
  'Travel offset',
  'Passing when shut',
  'Sticking',
  'Lost motion',
  'Hunting',
  'Excess movement',
  'Position mismatch',
  'Uneven gain',
  'Choked service',
  'Frozen signal',
] as const;
export type FindingKind = (typeof findingKinds)[number];
