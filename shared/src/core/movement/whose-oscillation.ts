import { type Oscillation } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { median } from '../statistics/quantile.js';
import { BlockSpectrum } from './block-spectrum.js';
import { cellsPerPeriod } from './blocks.js';
import { type OscillatingBlock } from './oscillating-block.js';
import { phasorOf } from './phasor.js';
import { cellsOf } from './step-free.js';

/** Blocks looked at: the first ones, spread over the record. */
const looks = 40;
/** Cosine of the angle from which two swings count as together, or as opposed when negative. */
const together = 0.7;
/** Share of blocks that must agree. */
const most = 0.5;
/** Manual blocks needed before their rest says anything. */
const manualBlocks = 3;
/** A swing in manual below this share of the one in automatic is rest. */
const restShare = 0.3;

/**
 * Whose oscillation it is, in the order of the handbook: the set point's (outside), the line's, the valve's
 * (sticking), the loop's (it rests in manual), or not decided.
 *
 * The line: demand opposed to the pressure drop while the flow does not follow the travel. The second half is
 * ours: a loop that swings by itself opposes the pressure drop as well, because its own flow moves it, but there
 * the flow goes with the travel.
 *
 * Source: methods.md §6.2
 */
export function whoseOscillation(
  prepared: Prepared,
  blocks: readonly OscillatingBlock[],
  sticking: boolean,
  limits: Limits,
): Oscillation['cause'] {
  const stride = Math.ceil(blocks.length / looks);
  const looked = blocks.filter((_, i) => i % stride === 0);
  if (fromSetPoint(prepared, looked, limits)) return 'outside';
  if (agree(looked, (b) => fromLine(prepared, b))) return 'line';
  if (sticking) return 'valve';
  return restsInManual(prepared, blocks) ? 'loop' : 'not decided';
}

function agree(blocks: readonly OscillatingBlock[], holds: (block: OscillatingBlock) => boolean): boolean {
  return blocks.length > 0 && blocks.filter(holds).length > most * blocks.length;
}

/**
 * The set point passes the same test at the same period, and swings at least `setPointShare` as far as the process
 * value. Its amplitude alone would not do: set-point steps at random have some at every period.
 */
function fromSetPoint(prepared: Prepared, blocks: readonly OscillatingBlock[], limits: Limits): boolean {
  const { setPoint, processValue, step } = prepared;
  if (setPoint === null || processValue === null || blocks.length === 0) return false;
  const rules = limits.movement;
  const period = median(blocks.map((b) => b.period));
  const cellPoints = Math.max(1, Math.floor(period / cellsPerPeriod / step));
  const cell = cellPoints * step;
  const points = Math.min(...blocks.map((b) => b.to - b.from));
  const block = new Float64Array(Math.floor(points / cellPoints));
  const spectrum = new BlockSpectrum(block.length, {
    shortest: period / rules.oscillationSpread / cell,
    longest: (period * rules.oscillationSpread) / cell,
    amplitude: 0,
    regularity: rules.regularity,
    first: rules.oscillationFirst,
    third: rules.oscillationThird,
    clip: rules.stepClip,
  });
  const swings = (values: Float64Array, from: number) =>
    cellsOf({ ...prepared, values, usable: null }, from, cellPoints, rules.blockCoverage, block)
      ? spectrum.find(block)
      : null;
  return agree(blocks, ({ from, to }) => {
    const asked = swings(setPoint, from);
    if (asked === null) return false;
    const got = phasorOf(processValue, null, from, to, asked.period * cellPoints).amplitude;
    return asked.amplitude >= rules.setPointShare * got;
  });
}

function fromLine(prepared: Prepared, block: OscillatingBlock): boolean {
  const { upstreamPressure, downstreamPressure, flow, travel, step } = prepared;
  if (upstreamPressure === null || downstreamPressure === null || flow === null) return false;
  const period = block.period / step;
  const swing = (values: Float64Array) => phasorOf(values, null, block.from, block.to, period);
  const moved = swing(prepared.demand ?? travel);
  const stem = swing(travel);
  const q = swing(flow);
  const before = swing(upstreamPressure);
  const after = swing(downstreamPressure);
  const drop = { re: before.re - after.re, im: before.im - after.im };
  return angle(moved, drop) < -together && angle(stem, q) < together;
}

function angle(a: { re: number; im: number }, b: { re: number; im: number }): number {
  return (a.re * b.re + a.im * b.im) / (Math.hypot(a.re, a.im) * Math.hypot(b.re, b.im));
}

/** In manual spells of at least three periods the travel does not swing. */
function restsInManual(prepared: Prepared, blocks: readonly OscillatingBlock[]): boolean {
  const { mode, state, travel, step, count } = prepared;
  if (mode === null || blocks.length === 0) return false;
  const period = (blocks[blocks.length >> 1] as OscillatingBlock).period / step;
  const amplitude = (blocks[blocks.length >> 1] as OscillatingBlock).amplitude;
  const length = Math.ceil(3 * period);
  let spells = 0;
  let rested = 0;
  for (let from = 0; from + length <= count; from += length) {
    if (!inManual(state, from, from + length)) continue;
    spells++;
    const swing = phasorOf(travel, null, from, from + length, period).amplitude;
    if (swing < restShare * amplitude) rested++;
  }
  return spells >= manualBlocks && rested > most * spells;
}

function inManual(state: Uint8Array, from: number, to: number): boolean {
  const wanted = valveState.inService | valveState.manual;
  for (let i = from; i < to; i++) if (((state[i] as number) & wanted) !== wanted) return false;
  return true;
}
