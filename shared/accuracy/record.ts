import { type DataSheet } from '../src/core/data-sheet.js';
import { aSheet } from '../src/core/sample-record.js';
import { type History, type Span } from '../src/core/series.js';
import { archiveHistory, spreadOverMonths } from '../src/simulation/archive-history.js';
import { asGas } from '../src/simulation/as-gas.js';
import { mapSeries, readBy, usualInstruments, withBadValues } from '../src/simulation/instruments.js';
import { type Loop } from '../src/simulation/loop-settings.js';
import { simulate } from '../src/simulation/simulate.js';
import { type Family, plainLoop, type Truth } from './family.js';

/** A simulated valve as the core meets it, and what is true of it. */
export interface SimulatedRecord {
  readonly history: History;
  readonly dataSheet: DataSheet;
  readonly span: Span;
  readonly truth: Truth;
}

/** share of stored values the historian does not vouch for (methods.md §12.1) */
const badShare = 0.0005;

/** The record of a family's loop of one seed: simulated, read by instruments that err, and archived. */
export function recordOf(family: Family, seed: number): SimulatedRecord {
  const plain = plainLoop(seed);
  const loop: Loop = { ...plain, ...family.loop(plain) };
  const { historian, line, start } = loop;
  const scans = simulate({ ...loop, frozen: [], historian: { ...historian, tolerance: 0 } });
  const filled = family.gas ? asGas(scans.history, line.density, family.gas) : scans.history;
  const flowSpan = family.gas ? 1.1 * largest(filled.flow?.value) : scans.flowSpan;
  const read = frozen(readBy(filled, usualInstruments(loop.seed, line.dropShut), loop.seed), loop);
  const laid = family.daysAMonth ? spreadOverMonths(read, start, family.daysAMonth) : read;
  const spans = { demand: 100, position: 100, upstreamPressure: 1_000, downstreamPressure: 1_000 };
  const kept = archiveHistory(laid, {
    ...historian,
    span: (role) => (spans as Partial<Record<string, number>>)[role] ?? flowSpan,
  });
  const length = family.daysAMonth ? 365.25 : loop.days;
  return {
    history: withBadValues(kept, badShare, loop.seed),
    dataSheet: { ...sheetOf(loop, flowSpan, family), ...family.sheet?.(loop) },
    span: { from: start, to: start + length * 86_400 },
    truth: { ...scans.truth, loop },
  };
}

/** A transmitter that freezes goes on saying what it last said, whatever its own errors do. */
function frozen(history: History, { start, frozen: spells }: Loop): History {
  return mapSeries(history, (role, series) => {
    const value = Float64Array.from(series.value);
    for (const spell of spells) {
      if (spell.role !== role) continue;
      const first = series.time.findIndex((t) => t >= start + spell.from);
      const last = series.time.findIndex((t) => t >= start + spell.to);
      value.fill(value[first] as number, first, last < 0 ? value.length : last);
    }
    return { ...series, value };
  });
}

function largest(values: Float64Array = new Float64Array()): number {
  return values.reduce((most, v) => Math.max(most, v), 0);
}

function sheetOf({ valve, line }: Loop, flowSpan: number, { gas }: Family): DataSheet {
  return aSheet({
    characteristic: valve.kind,
    rangeability: valve.kind === 'equal percentage' ? valve.parameter : null,
    ratedCoefficient: valve.ratedCoefficient,
    FL: valve.FL,
    xT: gas?.xT ?? null,
    flowSpan,
    flowBasis: gas ? 'normal volume' : 'volume',
    fluid: {
      phase: gas ? 'gas' : 'liquid',
      density: gas ? null : line.density,
      vapourPressure: gas ? null : line.vapourPressure,
      criticalPressure: gas ? null : 22_064,
      viscosity: gas ? null : 1,
      molarMass: gas?.molarMass ?? null,
      specificHeatRatio: gas?.specificHeatRatio ?? null,
      compressibility: gas ? 1 : null,
      temperature: gas?.temperature ?? 293,
    },
  });
}
