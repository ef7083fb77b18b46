import { unitRemarkSentence } from '@tailrace/shared/messages/unit-remarks';
import { assessForm, wholeRecord } from '@tailrace/shared/register/assess-form';
import { resolve } from 'node:path';
import { assessArguments, usage } from './assess-arguments.js';
import { recordedSignals } from './recorded-signals.js';
import { UnusableInput } from './unusable-input.js';
import { readLimitsFile, readValveFile } from './valve-file.js';

/** npm runs scripts in the repository; a path is meant from where the person stands. */
const startedIn = (process.env.npm_lifecycle_event === 'assess' && process.env.INIT_CWD) || process.cwd();

const tell = (line: string) => process.stderr.write(`${line}\n`);

/** One assessment from trend files and a valve's form, without the server. */
async function assess(argv: readonly string[]): Promise<string> {
  const given = assessArguments(argv);
  if (given.help) return usage;
  const at = (path: string) => resolve(startedIn, path);
  const { form, plan } = await readValveFile(at(given.valve));
  const limits = given.limits === null ? null : await readLimitsFile(at(given.limits));
  const { signals, bound, remarks } = await recordedSignals(given.trends.map(at), form.signals, plan);
  remarks.forEach(tell);
  if (!signals.position && !signals.demand) {
    const tags = [form.signals.position, form.signals.demand].flatMap((signal) =>
      signal ? [signal.tag] : [],
    );
    throw new UnusableInput(
      tags.length === 0
        ? 'The valve has neither a position nor a demand signal; give the tag of one.'
        : `No travel can be read: ${tags.map((tag) => `“${tag}”`).join(' and ')} is in none of the files, or has no sample there.`,
    );
  }
  const record = wholeRecord(signals);
  // A window beside the record holds nothing, which the assessment says; it is no fault of the input.
  const from = given.from ?? Math.min(record.from, (given.to ?? Infinity) - 1);
  const span = { from, to: given.to ?? Math.max(record.to, from + 1) };
  const outcome = assessForm({ ...form, signals: bound }, signals, { span, ...(limits && { limits }) });
  if ('problems' in outcome)
    throw new UnusableInput(
      `${given.valve} cannot be used:\n${outcome.problems.map((p) => `  ${unitRemarkSentence(p)}`).join('\n')}`,
    );
  return `${JSON.stringify(outcome.result, null, 2)}\n`;
}

assess(process.argv.slice(2)).then(
  (text) => process.stdout.write(text),
  (error: unknown) => {
    tell(error instanceof UnusableInput ? error.message : String((error as Error).stack ?? error));
    process.exitCode = error instanceof UnusableInput ? 2 : 1;
  },
);
