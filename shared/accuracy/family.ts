import { type Assessment } from '../src/core/assessment.js';
import { type DataSheet } from '../src/core/data-sheet.js';
import { type FindingKind } from '../src/core/findings/kinds.js';
import { type SignalRole } from '../src/core/series.js';
import { type Gas } from '../src/simulation/as-gas.js';
import { type Loop, type Spell } from '../src/simulation/loop-settings.js';
import { type Simulated } from '../src/simulation/simulate.js';

/** One valve of a family: how its loop really is, how it was recorded and what its sheet says. */
export interface Plant {
  readonly loop: Loop;
  /** where the sheet differs from the truth */
  readonly sheet: Partial<DataSheet>;
  readonly tolerance: number;
  readonly gas: Gas | null;
  /** days of each of twelve months; null: one record without holes */
  readonly daysAMonth: number | null;
  readonly frozen: readonly (Spell & { readonly role: SignalRole })[];
}

/** What was true of a simulated valve. */
export interface Truth extends Simulated {
  readonly plant: Plant;
}

/** The figure a family is about, as an error in `unit`; null where the assessment gave none. */
export interface Figure {
  readonly unit: string;
  readonly error: (assessment: Assessment, truth: Truth) => number | null;
}

/** Valves of one description, another one for every seed. */
export interface Family {
  readonly name: string;
  /** any of these counts as found; none: the valves are healthy */
  readonly sought: readonly FindingKind[];
  /** true as well, so neither sought nor unrelated */
  readonly alsoTrue?: readonly FindingKind[];
  readonly figure?: Figure;
  readonly plant: (seed: number) => Plant;
}
