import { DateTime } from 'luxon';
import { parseArgs } from 'node:util';
import { UnusableInput } from './unusable-input.js';

export const usage = `Usage: npm run --silent assess -- --trends FILE… --valve VALVE.json [--from ISO --to ISO] [--limits LIMITS.json]

  --trends FILE…       trend exports, CSV or a gzip of one; where two hold the same tag, the later file's values stand
  --valve VALVE.json   the register's form of the valve: data sheet, signals, and columnPlan if it is not to be guessed
  --from ISO, --to ISO the window, “to” not included; left out, the whole record. Without an offset: UTC
  --limits LIMITS.json thresholds to lay over the defaults

Prints the assessment as JSON. Ends with 0, judged or not, and with 2 where an input cannot be used.
`;

export interface AssessArguments {
  readonly help: boolean;
  readonly trends: readonly string[];
  readonly valve: string;
  readonly limits: string | null;
  /** s UTC; null: from the first sample, to the last */
  readonly from: number | null;
  readonly to: number | null;
}

/**
 * The command line of `assess`. Files may follow `--trends` one after the other.
 *
 * @throws UnusableInput for an unknown, repeated or missing option, or a time that is none
 */
export function assessArguments(argv: readonly string[]): AssessArguments {
  const { values, tokens } = parsed(argv);
  const none = { trends: [], valve: '', limits: null, from: null, to: null };
  if (values.help) return { ...none, help: true };
  const trends: string[] = [];
  const seen = new Set<string>();
  let listing = false;
  for (const token of tokens) {
    if (token.kind === 'positional') {
      if (!listing) throw new UnusableInput(`“${token.value}” stands where no file is expected.`);
      trends.push(token.value);
    }
    if (token.kind !== 'option') continue;
    listing = token.name === 'trends';
    if (listing) trends.push(token.value ?? '');
    else if (seen.has(token.name)) throw new UnusableInput(`--${token.name} is given twice.`);
    seen.add(token.name);
  }
  if (trends.length === 0) throw new UnusableInput('--trends is missing: give at least one trend file.');
  if (!values.valve) throw new UnusableInput('--valve is missing: give the valve’s JSON file.');
  const from = instant('from', values.from);
  const to = instant('to', values.to);
  if (from !== null && to !== null && from >= to)
    throw new UnusableInput(`--from ${values.from} is not before --to ${values.to}.`);
  return { help: false, trends, valve: values.valve, limits: values.limits ?? null, from, to };
}

function parsed(argv: readonly string[]) {
  try {
    return parseArgs({
      args: [...argv],
      allowPositionals: true,
      tokens: true,
      options: {
        trends: { type: 'string', multiple: true },
        valve: { type: 'string' },
        limits: { type: 'string' },
        from: { type: 'string' },
        to: { type: 'string' },
        help: { type: 'boolean', short: 'h' },
      },
    });
  } catch (error) {
    throw new UnusableInput((error as Error).message);
  }
}

function instant(name: string, text: string | undefined): number | null {
  if (text === undefined) return null;
  const read = DateTime.fromISO(text, { zone: 'utc' });
  if (!/^\d{4}-/.test(text) || !read.isValid)
    throw new UnusableInput(`--${name} “${text}” is not a time such as 2026-03-01T06:00:00Z.`);
  return read.toMillis() / 1000;
}
