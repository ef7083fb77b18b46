import { cpus } from 'node:os';
import { assess } from '../src/core/assess.js';
import { aSheet } from '../src/core/sample-record.js';
import { aLoop } from '../src/simulation/a-loop.js';
import { simulate } from '../src/simulation/simulate.js';

/**
 * Measures the whole of `assess` on one valve's position, demand, flow and both pressures, beside one plain pass
 * over the same columns, in turns and in one run: the machine's speed drifts more than their ratio.
 */

const scan = 10;
const turns = 3;

function cpuMs(work: () => void): number {
  const before = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}

const median = (values: number[]) => values.sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

console.log(`${cpus()[0]?.model ?? 'unknown processor'}, ${cpus().length} cores, Node ${process.version}`);
for (const millions of [0.25, 0.5, 1]) {
  const days = (millions * 1e6 * scan) / 86_400;
  const plain = aLoop();
  const loop = aLoop({
    days,
    historian: {
      ...plain.historian,
      scan,
      roles: ['demand', 'position', 'flow', 'upstreamPressure', 'downstreamPressure'],
    },
  });
  const { history, flowSpan } = simulate(loop);
  const valve = { tag: 'FV-1', dataSheet: aSheet({ flowSpan }) };
  const span = { from: loop.start, to: loop.start + days * 86_400 };
  let sum = 0;
  const pass = () => {
    for (const { value } of Object.values(history)) for (const v of value) sum += v;
  };
  assess(valve, history, span);
  pass();
  const own: number[] = [];
  const yard: number[] = [];
  for (let turn = 0; turn < turns; turn++) {
    own.push(cpuMs(() => assess(valve, history, span)));
    yard.push(cpuMs(pass));
  }
  const took = median(own);
  console.log(
    `assess, ${millions} million samples × 5 signals: ${took.toFixed(0)} ms CPU, ${(took / millions).toFixed(0)} ms a million, ` +
      `${(took / Math.max(0.01, median(yard))).toFixed(0)} × one pass over them; peak memory ${(process.resourceUsage().maxRSS / 1024).toFixed(0)} MB`,
  );
  if (!Number.isFinite(sum)) throw new Error('the record holds something that is no number');
}
