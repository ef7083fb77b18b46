import { chokedService } from './choked-service.js';
import { excessMovement } from './excess-movement.js';
import { type FindingRule } from './finding-rule.js';
import { frozenSignal } from './frozen-signal.js';
import { gainedCapacity } from './gained-capacity.js';
import { hunting } from './hunting.js';
import { type FindingKind } from './kinds.js';
import { lostCapacity } from './lost-capacity.js';
import { lostMotion } from './lost-motion.js';
import { offCharacteristic } from './off-characteristic.js';
import { oversized } from './oversized.js';
import { passingWhenShut } from './passing-when-shut.js';
import { pinnedAtLimit } from './pinned-at-limit.js';
import { positionMismatch } from './position-mismatch.js';
import { sticking } from './sticking.js';
import { travelOffset } from './travel-offset.js';
import { undersized } from './undersized.js';
import { unevenGain } from './uneven-gain.js';

/** Every kind's rule: leave one out and it does not compile. */
export const findingRules: Record<FindingKind, FindingRule> = {
  Oversized: oversized,
  Undersized: undersized,
  'Pinned at limit': pinnedAtLimit,
  'Off characteristic': offCharacteristic,
  'Lost capacity': lostCapacity,
  'Gained capacity': gainedCapacity,
  'Travel offset': travelOffset,
  'Passing when shut': passingWhenShut,
  Sticking: sticking,
  'Lost motion': lostMotion,
  Hunting: hunting,
  'Excess movement': excessMovement,
  'Position mismatch': positionMismatch,
  'Uneven gain': unevenGain,
  'Choked service': chokedService,
  'Frozen signal': frozenSignal,
};
