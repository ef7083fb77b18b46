import { type FindingRule } from './finding-rule.js';
import { frozenSignal } from './frozen-signal.js';
import { gainedCapacity } from './gained-capacity.js';
import { type FindingKind } from './kinds.js';
import { lostCapacity } from './lost-capacity.js';
import { offCharacteristic } from './off-characteristic.js';
import { oversized } from './oversized.js';
import { pinnedAtLimit } from './pinned-at-limit.js';
import { travelOffset } from './travel-offset.js';
import { undersized } from './undersized.js';
import { unevenGain } from './uneven-gain.js';

/** Every kind's rule: leave one out and it does not compile. */
export const findingRules: Partial<Record<FindingKind, FindingRule>> = {
  Oversized: oversized,
  Undersized: undersized,
  'Pinned at limit': pinnedAtLimit,
  'Off characteristic': offCharacteristic,
  'Lost capacity': lostCapacity,
  'Gained capacity': gainedCapacity,
  'Travel offset': travelOffset,
  'Uneven gain': unevenGain,
  'Frozen signal': frozenSignal,
};
