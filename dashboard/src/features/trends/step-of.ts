/** The way from a file to samples. */
export const steps = ['file', 'look', 'plan', 'take in'] as const;
export type Step = (typeof steps)[number];

/** The step an address stands for: without a file there is only the first, with one the first is behind. */
export function stepOf(file: string | undefined, wanted: string | undefined): Step {
  if (!file) return 'file';
  return steps.slice(1).find((step) => step === wanted) ?? 'look';
}
