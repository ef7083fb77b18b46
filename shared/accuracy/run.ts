import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { type Family } from './family.js';
import { faulty, healthy } from './families.js';
import { type FamilyResult, runFamily } from './run-family.js';

/**
 * Scenario families with known truth through the core. `--seeds N` loops a family (20), `--family TEXT` those whose
 * name holds it, `--write` keeps the table in RESULTS.md.
 */
const { values } = parseArgs({
  options: {
    seeds: { type: 'string', default: '20' },
    family: { type: 'string', default: '' },
    write: { type: 'boolean', default: false },
  },
});
const seeds = Number(values.seeds);

const header = [
  '| family | loops | found | unrelated | kind right / wrong | error of the figure |',
  '| --- | --- | --- | --- | --- | --- |',
];

function row(result: FamilyResult, isHealthy: boolean): string {
  const { name, figure, unrelatedKinds, kinds } = result;
  const odd = unrelatedKinds.length > 0 ? ` (${unrelatedKinds.join(', ')})` : '';
  const error = figure
    ? `${figure.name}: rms ${figure.rms.toFixed(2)}, worst ${figure.worst.toFixed(2)}, known in ${figure.known}`
    : '';
  return `| ${name} | ${result.seeds} | ${isHealthy ? '–' : result.found} | ${result.unrelated}${odd} | ${kinds.right} / ${kinds.wrong} | ${error} |`;
}

function table(
  title: string,
  families: readonly Family[],
  isHealthy: boolean,
): { text: string; results: FamilyResult[] } {
  const lines = [`## ${title}`, '', ...header];
  console.log(lines.join('\n'));
  const results: FamilyResult[] = [];
  for (const family of families.filter(({ name }) => name.includes(values.family))) {
    const result = runFamily(family, seeds);
    results.push(result);
    lines.push(row(result, isHealthy));
    console.log(lines.at(-1));
  }
  console.log('');
  return { text: `${lines.join('\n')}\n`, results };
}

const well = table('Healthy valves', healthy, true);
const ill = table('Valves with one thing wrong', faulty, false);
const count = (results: readonly FamilyResult[], of: (result: FamilyResult) => number) =>
  results.reduce((sum, result) => sum + of(result), 0);
const summary = [
  `Healthy valves with a finding other than Uneven gain: ${count(well.results, (r) => r.unrelated)} of ${count(well.results, (r) => r.seeds)}.`,
  `Faults found: ${count(ill.results, (r) => r.found)} of ${count(ill.results, (r) => r.seeds)}; valves with an unrelated finding: ${count(ill.results, (r) => r.unrelated)}.`,
  `Kinds named wrongly: ${count([...well.results, ...ill.results], (r) => r.kinds.wrong)} of ${count([...well.results, ...ill.results], (r) => r.seeds)}.`,
].join('\n');
console.log(summary);

if (values.write) {
  const head = `# How well the core does\n\nSimulated closed loops with known truth (\`shared/src/simulation\`); \`npm run accuracy -- --write\` writes this page. Each loop of a family has another valve size, rangeability, line, noise and disturbance; seeds are fixed. It is a simulation by the authors of the rules: it bounds what is reachable and does not prove plant performance.\n`;
  const path = fileURLToPath(new URL('RESULTS.md', import.meta.url));
  writeFileSync(
    path,
    [
      head,
      well.text,
      ill.text,
      `${summary
        .split('\n')
        .map((l) => `- ${l}`)
        .join('\n')}\n`,
    ].join('\n'),
  );
}
