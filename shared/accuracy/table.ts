import { type Family } from './family.js';
import { type ValveResult } from './valve-result.js';

export const tableHead = [
  '| family | valves | found % | unrelated % | kind right / wrong / cannot tell | capacity error, rms % | error of the figure |',
  '| --- | --- | --- | --- | --- | --- | --- |',
];

export function share(results: readonly ValveResult[], holds: (result: ValveResult) => boolean): number {
  return results.length === 0 ? NaN : results.filter(holds).length / results.length;
}

export function rms(errors: readonly number[]): number {
  const known = errors.filter(Number.isFinite);
  return Math.sqrt(known.reduce((sum, e) => sum + e * e, 0) / known.length);
}

const percent = (x: number) => (100 * x).toFixed(0);

/** One line of the table: a family and what became of its valves. */
export function tableRow({ name, sought, figure }: Family, results: readonly ValveResult[]): string {
  const kinds = (['right', 'wrong', 'cannot tell'] as const).map(
    (kind) => results.filter((one) => one.kind === kind).length,
  );
  const capacity = rms(results.map((one) => one.capacity));
  return `| ${[
    name,
    results.length,
    sought.length === 0 ? '–' : percent(share(results, (one) => one.found)),
    `${percent(share(results, (one) => one.unrelated.length > 0))}${counted(results)}`,
    kinds.join(' / '),
    Number.isFinite(capacity) ? capacity.toFixed(1) : '–',
    figure ? figureText(figure.name, results) : '',
  ].join(' | ')} |`;
}

function counted(results: readonly ValveResult[]): string {
  const counts = new Map<string, number>();
  for (const { unrelated } of results)
    for (const kind of unrelated) counts.set(kind, (counts.get(kind) ?? 0) + 1);
  return counts.size === 0 ? '' : ` (${[...counts].map(([kind, n]) => `${kind} ${n}`).join(', ')})`;
}

function figureText(name: string, results: readonly ValveResult[]): string {
  const errors = results.map((one) => one.figure).filter(Number.isFinite);
  if (errors.length === 0) return `${name}: never given`;
  const bias = errors.reduce((sum, e) => sum + e, 0) / errors.length;
  const worst = errors.reduce((most, e) => Math.max(most, Math.abs(e)), 0);
  const given = errors.length < results.length ? `, given for ${errors.length}` : '';
  const sign = bias < 0 ? '' : '+';
  return `${name}: bias ${sign}${bias.toFixed(2)}, rms ${rms(errors).toFixed(2)}, worst ${worst.toFixed(2)}${given}`;
}
