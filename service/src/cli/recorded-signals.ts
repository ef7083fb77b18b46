import { type ColumnPlan, type TakeInReport } from '@tailrace/shared/contracts/trends';
import { type Signal, type Signals } from '@tailrace/shared/contracts/valves';
import { type Series, type SignalRole } from '@tailrace/shared/core/series';
import { unitOf } from '@tailrace/shared/core/units/unit-of';
import { stat } from 'node:fs/promises';
import { columnHeader } from '../trends/reading/column-header.js';
import { guessFile, lookAt } from '../trends/reading/look.js';
import { readTrend } from '../trends/reading/read-trend.js';
import { Refusal } from '../trends/reading/refusal.js';
import { mergeSamples } from '../trends/store/merge-samples.js';
import { UnusableInput } from './unusable-input.js';
import { laidOver, type PartialPlan, wholePlan } from './valve-file.js';

export interface Recorded {
  readonly signals: Partial<Record<SignalRole, Series>>;
  /** the signals as bound; one without a unit takes the one its column names */
  readonly bound: Signals;
  /** what a person should know of how the files were read */
  readonly remarks: readonly string[];
}

/**
 * Reads a valve's signals from trend files, as a take-in does. Where two files hold the same tag, both are merged
 * and the later file's values stand.
 *
 * @throws UnusableInput naming the file that cannot be used, and why
 */
export async function recordedSignals(
  paths: readonly string[],
  bound: Signals,
  plan: PartialPlan | null,
): Promise<Recorded> {
  const parts = new Map<string, Series[]>();
  const units = new Map<string, string>();
  const remarks: string[] = [];
  for (const { tag } of Object.values(bound)) parts.set(columnHeader(tag).tag, []);
  for (const path of paths) {
    try {
      const whole = await planFor(path, plan, remarks);
      const report = await readTrend({
        path,
        plan: whole,
        wanted: (tag) => parts.has(tag),
        onSamples: (tag, series) => void parts.get(tag)?.push(series),
      });
      for (const { historianTag, unit } of (await lookAt(path, whole)).tags)
        if (unit !== null && unitOf(unit)) units.set(historianTag, unit);
      remarks.push(...rejectsOf(report).map((line) => `${path}: ${line}`));
    } catch (error) {
      if (error instanceof Refusal) throw new UnusableInput(`${path}: ${error.message}`);
      throw error;
    }
  }
  const signals: Recorded['signals'] = {};
  const inUnits: Signals = {};
  for (const [role, signal] of Object.entries(bound) as [SignalRole, Signal][]) {
    const tag = columnHeader(signal.tag).tag;
    const series = joined(parts.get(tag) ?? []);
    if (series) signals[role] = series;
    else remarks.push(`The tag “${signal.tag}” (${role}) is in none of the files, or has no sample there.`);
    inUnits[role] = { ...signal, unit: signal.unit ?? units.get(tag) ?? null };
  }
  return { signals, bound: inUnits, remarks };
}

async function planFor(path: string, given: PartialPlan | null, remarks: string[]): Promise<ColumnPlan> {
  const found = await stat(path).catch((error: Error) => error);
  if (found instanceof Error) throw new UnusableInput(`${path} cannot be read: ${found.message}.`);
  if (!found.isFile()) throw new UnusableInput(`${path} is not a file.`);
  const whole = given && wholePlan(given);
  if (whole) return whole;
  const { plan, doubts } = await guessFile(path, given?.time?.zone ?? 'UTC');
  remarks.push(...doubts.map((doubt) => `${path}: ${doubt}`));
  return given ? laidOver(plan, given, path) : plan;
}

/** Ascending records as one; where two hold a time, the later record's sample stands. */
function joined(series: readonly Series[]): Series | null {
  if (series.length <= 1) return series[0] ?? null;
  const middle = series.length >> 1;
  const [older, newer] = [joined(series.slice(0, middle)), joined(series.slice(middle))];
  return older && newer ? mergeSamples(older, newer) : (older ?? newer);
}

function rejectsOf({ rejects }: TakeInReport): string[] {
  return rejects.map(
    ({ reason, count, firstLines, example }) =>
      `${count} rejected, ${reason}; first in line ${firstLines[0]}: “${example}”.`,
  );
}
