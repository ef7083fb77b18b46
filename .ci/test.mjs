// Runs every suite, goes on after a failure so that one run tells all, and counts them together.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const results = resolve(root, '.test-results');
rmSync(results, { recursive: true, force: true });
mkdirSync(results, { recursive: true });

/** A step without a report counts as one check; a suite counts its tests. `needs` are steps it cannot run without. */
const steps = [
  { name: 'build shared', command: 'npm run build -w shared' },
  { name: 'build service', command: 'npm run build -w service', needs: ['build shared'] },
  { name: 'build dashboard', command: 'npm run build -w dashboard', needs: ['build shared'] },
  { name: 'lint', command: 'npm run lint' },
  { name: 'types', command: 'npm run typecheck' },
  { name: 'shared', command: 'npm run test -w shared', report: 'shared.json', needs: ['build shared'] },
  {
    name: 'service',
    command: `npm run test -w service -- --json --outputFile=${results}/service.json`,
    report: 'service.json',
    needs: ['build shared', 'build service'],
  },
  {
    name: 'dashboard',
    command: 'npm run test -w dashboard',
    report: 'dashboard.json',
    needs: ['build shared'],
  },
  {
    name: 'browser',
    command: 'npm run e2e -w dashboard',
    report: 'e2e.json',
    needs: ['build shared', 'build service', 'build dashboard'],
  },
];

/** Tests passed and failed by a suite's report; a suite that broke before its tests counts as one failure. */
function counted(step, ok) {
  if (!step.report) return { passed: ok ? 1 : 0, failed: ok ? 0 : 1 };
  try {
    const report = JSON.parse(readFileSync(resolve(results, step.report), 'utf8'));
    const failed = Math.max(report.numFailedTests, ok ? 0 : 1);
    return { passed: report.numPassedTests, failed };
  } catch {
    return { passed: 0, failed: 1 };
  }
}

const failedSteps = new Set();
let passed = 0;
let failed = 0;
const table = [];
for (const step of steps) {
  const missing = (step.needs ?? []).filter((need) => failedSteps.has(need));
  console.log(`\n== ${step.name}`);
  const started = Date.now();
  const ok =
    missing.length === 0 &&
    spawnSync(step.command, {
      cwd: root,
      shell: true,
      stdio: 'inherit',
      env: { ...process.env, TEST_RESULTS: results },
    }).status === 0;
  if (missing.length > 0) console.log(`not run: ${missing.join(', ')} failed`);
  const count = counted(step, ok);
  if (count.failed > 0) failedSteps.add(step.name);
  passed += count.passed;
  failed += count.failed;
  table.push(
    `${step.name.padEnd(16)} ${String(count.passed).padStart(5)} passed ${String(count.failed).padStart(5)} failed  ${((Date.now() - started) / 1000).toFixed(0)} s`,
  );
}
const summary = `${passed} passed, ${failed} failed`;
console.log(`\n${table.join('\n')}`);
writeFileSync(resolve(results, 'summary'), `${summary}\n`);
console.log(summary);
process.exitCode = failed > 0 || passed === 0 ? 1 : 0;
