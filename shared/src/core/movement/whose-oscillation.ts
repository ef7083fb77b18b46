import { type Oscillation } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { type OscillatingBlock } from './oscillation.js';
import { phasorOf } from './phasor.js';

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
  if (agree(looked, (b) => fromSetPoint(prepared, b, limits.movement.setPointShare))) return 'outside';
  if (agree(looked, (b) => fromLine(prepared, b))) return 'line';
  if (sticking) return 'valve';
  return restsInManual(prepared, blocks) ? 'loop' : 'not decided';
}

function agree(blocks: readonly OscillatingBlock[], holds: (block: OscillatingBlock) => boolean): boolean {
  return blocks.length > 0 && blocks.filter(holds).length > most * blocks.length;
}

function fromSetPoint(prepared: Prepared, block: OscillatingBlock, share: number): boolean {
  const { setPoint, processValue, step } = prepared;
  if (setPoint === null || processValue === null) return false;
  const period = block.period / step;
  const asked = phasorOf(setPoint, null, block.from, block.to, period).amplitude;
  const got = phasorOf(processValue, null, block.from, block.to, period).amplitude;
  return asked > 0 && asked >= share * got;
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
