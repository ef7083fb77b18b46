import {
  type Assessment,
  type KindNotJudged,
  methodVersion,
  type OperatingRange,
  type WindowUse,
} from './assessment.js';
import { compareWithSheet } from './characteristic/compare-with-sheet.js';
import { endReadings } from './characteristic/end-readings.js';
import { type CharacteristicFit, fitCharacteristic } from './characteristic/fit-characteristic.js';
import { type DataSheet, type ValveRecord } from './data-sheet.js';
import { driftOf } from './drift/drift.js';
import { passingOf } from './drift/passing.js';
import { attentionOf } from './findings/attention.js';
import { find } from './findings/find.js';
import { type Chapters } from './findings/finding-rule.js';
import { defaultLimits, type Limits } from './limits.js';
import { movementOf } from './movement/movement.js';
import { runsAgainst } from './preparation/runs-against.js';
import { prepare } from './preparation/prepare.js';
import { type Prepared, valveState } from './preparation/prepared.js';
import { type SteadyWindows, steadyWindows } from './preparation/steady-windows.js';
import { installedGain } from './range/installed-gain.js';
import { operatingRange } from './range/operating-range.js';
import { cannotJudge, type CannotJudge } from './reasons.js';
import { type AssessedSpan, type History, type Span } from './series.js';
import { seededRandom, seedFrom } from './statistics/seeded-random.js';
import { serviceStress } from './stress/service-stress.js';
import { unassessed } from './unassessed.js';

/**
 * Everything that can be inferred for one valve over one window: the whole pipeline, chapter by chapter.
 *
 * Nothing a record contains makes it throw; what cannot be judged says why. Random steps are seeded by the valve,
 * the window and the method version, so the same data give the same bits.
 *
 * @param history recorded signals by role, units of methods.md §0
 * @param span window, s UTC, `to` excluded; drift is followed back to its `since`
 * @param limits thresholds of the handbook, or a site's own
 * @throws RangeError only where a series' columns differ in length
 */
export function assess(
  valve: ValveRecord,
  history: History,
  span: AssessedSpan,
  limits: Limits = defaultLimits,
): Assessment {
  const sheet = valve.dataSheet;
  const prepared = prepare(history, sheet, span, limits);
  if ('judged' in prepared) return unassessed(valve, span, prepared);
  const random = seededRandom(seedFrom(valve.tag, span.from, span.to, methodVersion));

  const windows = steadyWindows(prepared, sheet, limits);
  const movement = movementOf(prepared, windows, sheet, limits);
  const fit = fitCharacteristic(windows, {
    sheet,
    travelSource: prepared.travelSource,
    deadBand: 'deadBand' in movement.demandToFlow ? movement.demandToFlow.deadBand : null,
    random,
    limits,
  });
  const { characteristic } = fit;
  const comparison = compareWithSheet(windows, fit.bins, sheet, random, limits);
  const range = operatingRange(prepared, sheet, curveOf(fit), limits);
  const gain =
    characteristic === null ? null : installedGain(prepared, windows, range, characteristic, random, limits);

  const drift = driftOf(windowsOfDrift(windows, { history, sheet, span }, limits), sheet, limits);

  const chapters: Chapters = {
    tag: valve.tag,
    methodVersion,
    window: windowUse(prepared, windows, span),
    travelSource: prepared.travelSource,
    basis: windows.source === 'none' ? 'installed' : 'inherent',
    pressureDrop: windows.source,
    lag: prepared.lag,
    resolution: prepared.resolution,
    characteristic,
    deviation: characteristic === null ? null : comparison.deviation,
    range,
    gain: gain !== null && 'points' in gain ? gain : null,
    endReadings: endReadings(prepared, limits),
    frozen: prepared.frozen,
    movement,
    drift: 'series' in drift ? drift : null,
    passing: passingOf(prepared, sheet, limits),
    service: serviceStress(prepared, windows, sheet, limits),
    warnings: [...prepared.warnings, ...reverseAction(prepared, fit)],
  };
  const found = find(chapters, sheet, limits);
  const refusal = principalRefusal(prepared, windows, fit, range);
  return {
    ...chapters,
    judged: characteristic !== null || range?.judged === true || found.findings.length > 0,
    reason: refusal,
    findings: found.findings,
    figures: found.figures,
    notJudged: [...refusedChapters(fit, range, chapters, limits), ...found.notJudged],
    ...attentionOf(found.findings, sheet),
  };
}

/** A signal that looks reverse acting without being declared so: nothing is turned round, it is only said. */
function reverseAction(
  { demand, position }: Prepared,
  { refusal }: CharacteristicFit,
): Assessment['warnings'] {
  const warnings: { code: string; figures: Record<string, number> }[] = [];
  if (refusal?.reason === 'flow-falls-as-valve-opens') warnings.push({ code: refusal.reason, figures: {} });
  if (demand !== null && position !== null && runsAgainst(demand, position))
    warnings.push({ code: 'demand-against-position', figures: {} });
  return warnings;
}

/** Steady windows of the longer record that drift is followed over; the window's own where no longer one is asked for. */
function windowsOfDrift(
  own: SteadyWindows,
  { history, sheet, span }: { history: History; sheet: DataSheet; span: AssessedSpan },
  limits: Limits,
): SteadyWindows {
  if (span.since === undefined || span.since >= span.from) return own;
  const prepared = prepare(history, sheet, { from: span.since, to: span.to }, limits);
  return 'judged' in prepared ? own : steadyWindows(prepared, sheet, limits);
}

function curveOf({ bins, logCurve }: CharacteristicFit) {
  if (logCurve === null) return null;
  return { at: logCurve, from: bins.h[0] as number, to: bins.h[bins.count - 1] as number };
}

/** Travel between the 5th and 95th percentile below which a valve has stood still, %. */
const stoodStill = 1;

/** What principally cannot be judged: the characteristic, for the reason that comes first on the way to it. */
function principalRefusal(
  prepared: Prepared,
  windows: SteadyWindows,
  fit: CharacteristicFit,
  range: OperatingRange | null,
): CannotJudge | null {
  if (fit.characteristic !== null) return null;
  if (range === null) return whyOutOfService(prepared);
  if (range.p95 - range.p5 < stoodStill && fit.bins.count <= 1)
    return cannotJudge('travel-constant', { travel: range.p50 });
  if (prepared.flow === null) {
    const refused = prepared.warnings.find((w) => w.code === 'flow-quality');
    return refused ? cannotJudge('signal-quality', refused.figures) : cannotJudge('no-flow');
  }
  const choked = windows.choked.reduce((count, one) => count + one, 0);
  if (choked > windows.count / 2) return cannotJudge('choked-throughout', { share: choked / windows.count });
  return fit.refusal;
}

function whyOutOfService(prepared: Prepared): CannotJudge {
  let known = 0;
  let shut = 0;
  for (let i = 0; i < prepared.count; i++) {
    if (Number.isNaN(prepared.travel[i])) continue;
    known++;
    if (((prepared.state[i] as number) & valveState.shut) !== 0) shut++;
  }
  return cannotJudge(known > 0 && shut >= 0.95 * known ? 'always-shut' : 'valve-not-in-service');
}

function refusedChapters(
  fit: CharacteristicFit,
  range: OperatingRange | null,
  { window }: Chapters,
  limits: Limits,
): KindNotJudged[] {
  const refused: KindNotJudged[] = [];
  const refusal = fit.refusal ?? fit.characteristic?.undecided ?? null;
  if (refusal !== null)
    refused.push({ kind: 'characteristic', reason: refusal.reason, figures: refusal.figures });
  if (range === null) refused.push({ kind: 'range', reason: 'valve-not-in-service', figures: {} });
  else if (!range.judged)
    refused.push({
      kind: 'range',
      reason: 'record-too-short',
      figures: { days: window.runningDays, needed: limits.range.days },
    });
  return refused;
}

function windowUse(prepared: Prepared, windows: SteadyWindows, span: Span): WindowUse {
  let running = 0;
  let slots = 0;
  let last = NaN;
  const periods = new Set<number>();
  for (let i = 0; i < prepared.count; i++) {
    if (((prepared.state[i] as number) & valveState.inService) === 0) continue;
    running++;
    const slot = Math.floor((prepared.start + i * prepared.step) / windows.slotSeconds);
    if (slot !== last) slots++;
    last = slot;
  }
  for (let w = 0; w < windows.count; w++)
    periods.add((windows.slot[w] as number) * 64 + Math.floor((windows.h[w] as number) * 50));
  return {
    from: span.from,
    to: span.to,
    samplesSeen: prepared.samplesSeen,
    samplesUsed: prepared.samplesUsed,
    runningDays: (running * prepared.step) / 86_400,
    step: prepared.step,
    steadyWindows: windows.count,
    periods: periods.size,
    runningPeriods: slots,
    leftOut: Object.fromEntries(
      Object.entries({ ...prepared.leftOut, ...windows.leftOut }).filter(([, n]) => n > 0),
    ),
  };
}
