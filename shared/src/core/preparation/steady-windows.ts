import { type DropSource } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { flowCoefficient } from '../flow-coefficient/flow-coefficient.js';
import { type LineModel } from '../flow-coefficient/line-model.js';
import { type Limits } from '../limits.js';
import { cutWindows, type CutWindows } from './cut-windows.js';
import { modelledPressures, type ModelledPressures } from './modelled-pressures.js';
import { type Prepared } from './prepared.js';
import { windowLengths } from './window-lengths.js';

/**
 * Accepted steady windows as columns of one length (§1.9): what the characteristic, drift and trim replay are
 * made from. One entry a window; NaN where a quantity is not known.
 */
export interface SteadyWindows {
  readonly count: number;
  /** s, middle of the window */
  readonly time: Float64Array;
  /** mean relative travel, 0 to 1 */
  readonly h: Float64Array;
  /** mean flow, unit of the flow basis */
  readonly flow: Float64Array;
  /** kPa; NaN without pressures */
  readonly pressureDrop: Float64Array;
  readonly upstreamPressure: Float64Array;
  /** Kv by §2; NaN where the basis is installed */
  readonly coefficient: Float64Array;
  /** ln of the coefficient, or of the flow where the basis is installed; NaN where the window says nothing of the trim */
  readonly L: Float64Array;
  /** 1 where choked: kept for stress, no weight in fits */
  readonly choked: Uint8Array;
  /** index of the 2 h slot (shorter in short records), and of the calendar day (UTC) */
  readonly slot: Int32Array;
  readonly day: Int32Array;
  /** length of a window, s */
  readonly seconds: number;
  /** length of a slot, s */
  readonly slotSeconds: number;
  /** where the pressure drop behind the coefficients came from; 'none': L is ln of the flow */
  readonly source: DropSource;
  /** the line model behind modelled drops; null otherwise */
  readonly line: LineModel | null;
  /** windows refused, by reason */
  readonly leftOut: Readonly<Record<string, number>>;
}

/** Pressures of windows too few to be worth losing the rest of the record for, as a share of it. */
const worthwhile = 0.25;

/**
 * Cuts the record into windows, keeps the steady ones and gives each its flow coefficient.
 *
 * The pressure drop is the measured one; the sheet's line model (§2.5) where pressures are missing; else the
 * basis is installed. Windows are 300 s, and shorter or longer where the record's pace asks for it.
 *
 * @returns no windows where no flow is known; never a throw
 * Source: methods.md §1.9, §1.10, §2
 */
export function steadyWindows(prepared: Prepared, sheet: DataSheet, limits: Limits): SteadyWindows {
  if (prepared.upstreamPressure !== null && prepared.downstreamPressure !== null && sheet.fluid !== null) {
    const cut = enoughWindows(prepared, true, limits);
    const { upstreamPressure, downstreamPressure } = cut;
    const drop = upstreamPressure.map((p, i) => p - (downstreamPressure[i] as number));
    const measured = withCoefficients(cut, sheet, limits, {
      source: 'measured',
      line: null,
      upstreamPressure,
      drop,
    });
    if (saysSomething(measured, limits)) {
      if (cut.count >= limits.windows.least) return measured;
      const all = enoughWindows(prepared, false, limits);
      // pressures recorded now and then only: the record says more without them
      if (cut.count >= worthwhile * all.count) return measured;
    }
  }
  const cut = enoughWindows(prepared, false, limits);
  const modelled = modelledPressures(cut, sheet);
  if (modelled !== null) {
    const windows = withCoefficients(cut, sheet, limits, modelled);
    if (saysSomething(windows, limits)) return windows;
  }
  return asInstalled(cut);
}

/** Windows of the first length that gives enough of them, else of the length that gives most. */
function enoughWindows(prepared: Prepared, needPressures: boolean, limits: Limits): CutWindows {
  let best: CutWindows | null = null;
  for (const length of windowLengths(prepared, limits)) {
    const cut = cutWindows(prepared, length, needPressures, limits);
    if (best === null || cut.count > best.count) best = cut;
    const share = (cut.count * length.seconds) / (prepared.count * prepared.step);
    if (cut.count >= limits.windows.least && share >= length.leastShare) break;
  }
  return best as CutWindows;
}

/** False where the coefficient is unknown in most windows: fluid data missing, line model out of its range. */
function saysSomething(windows: SteadyWindows, limits: Limits): boolean {
  let known = 0;
  for (const C of windows.coefficient) if (C > 0) known++;
  return known > 0 && known >= Math.min(limits.windows.least, 0.5 * windows.count);
}

function withCoefficients(
  cut: CutWindows,
  sheet: DataSheet,
  limits: Limits,
  pressures: ModelledPressures,
): SteadyWindows {
  const coefficient = new Float64Array(cut.count).fill(NaN);
  const L = new Float64Array(cut.count).fill(NaN);
  const choked = new Uint8Array(cut.count);
  let notTurbulent = 0;
  let unknown = 0;
  for (let i = 0; i < cut.count; i++) {
    const upstreamPressure = pressures.upstreamPressure[i] as number;
    const drop = pressures.drop[i] as number;
    const found = flowCoefficient(
      {
        flow: cut.flow[i] as number,
        upstreamPressure,
        downstreamPressure: upstreamPressure - drop,
        temperature: knownOrNull(cut.temperature[i] as number),
        density: knownOrNull(cut.density[i] as number),
      },
      sheet,
      limits.stress.chokedShare,
    );
    coefficient[i] = found.coefficient;
    choked[i] = found.choked ? 1 : 0;
    if (!(found.coefficient > 0)) unknown++;
    else if (!found.turbulent) notTurbulent++;
    else L[i] = Math.log(found.coefficient);
  }
  return {
    ...columnsOf(cut),
    pressureDrop: pressures.drop,
    upstreamPressure: pressures.upstreamPressure,
    coefficient,
    L,
    choked,
    source: pressures.source,
    line: pressures.line,
    leftOut: { ...cut.leftOut, 'not turbulent': notTurbulent, 'no coefficient': unknown },
  };
}

function asInstalled(cut: CutWindows): SteadyWindows {
  return {
    ...columnsOf(cut),
    pressureDrop: new Float64Array(cut.count).fill(NaN),
    upstreamPressure: cut.upstreamPressure,
    coefficient: new Float64Array(cut.count).fill(NaN),
    L: cut.flow.map((q) => (q > 0 ? Math.log(q) : NaN)),
    choked: new Uint8Array(cut.count),
    source: 'none',
    line: null,
    leftOut: cut.leftOut,
  };
}

function columnsOf({ count, time, h, flow, slot, day, length }: CutWindows) {
  return { count, time, h, flow, slot, day, seconds: length.seconds, slotSeconds: length.slotSeconds };
}

function knownOrNull(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}
