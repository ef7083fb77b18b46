import { type CharacteristicKind, characteristicKinds, type DataSheet } from '../data-sheet.js';
import { type DutySummary } from './duty-summary.js';
import { replayTrim, type TrimCandidate, type TrimReplay } from './trim-replay.js';

type SheetTrim = Pick<DataSheet, 'characteristic' | 'rangeability'>;

/** A candidate with what it would do. */
export interface SuggestedTrim {
  readonly candidate: TrimCandidate;
  readonly replay: TrimReplay;
}

/** Highest 95th percentile of travel, and highest travel at a design case, of a suggested trim, %. */
const most = { p95: 80, design: 90 };
/** Gain ratios this close are a tie (our choice: the ratio is no sharper). */
const tie = 1.1;

/**
 * The rated coefficients a trim is chosen from: the maker's, else steps of 1.6 about the present one.
 *
 * @example ladderAbout(100) // … 39.1, 62.5, 100, 160 …
 * Source: methods.md §5.4 (4)
 */
export function ladderAbout(ratedCoefficient: number): readonly number[] {
  return Array.from({ length: 12 }, (_, i) => ratedCoefficient * 1.6 ** (i - 8));
}

/**
 * The trim the handbook's rule picks: for each kind the smallest rated coefficient whose 95th percentile of travel is at
 * most 80 % and whose design cases stay within 90 %, then the kind with the smallest gain ratio; near ties go to the
 * sheet's own kind, then to the smaller coefficient.
 *
 * A starting point for an engineer, not a sizing.
 *
 * @param ladder rated coefficients to choose from, Kv
 * @returns null where no rung passes
 * Source: methods.md §5.4 (4), (5)
 */
export function suggestTrim(
  duty: DutySummary,
  sheet: SheetTrim,
  ladder: readonly number[],
): SuggestedTrim | null {
  const rungs = [...ladder].filter((C) => C > 0).sort((a, b) => a - b);
  const found = characteristicKinds.flatMap((kind) => {
    for (const ratedCoefficient of rungs) {
      const candidate = candidateOf(kind, ratedCoefficient, sheet);
      const replay = replayTrim(duty, candidate);
      if ('reason' in replay) return [];
      if (replay.p95.value <= most.p95 && replay.short === 0 && passesDesign(replay))
        return [{ candidate, replay }];
    }
    return [];
  });
  const ratio = ({ replay }: SuggestedTrim) => replay.gain?.ratio ?? Infinity;
  const least = Math.min(...found.map(ratio));
  const near = found.filter((one) => ratio(one) <= tie * least || ratio(one) === least);
  return (
    near.find((one) => one.candidate.characteristic === sheet.characteristic) ??
    near.sort((a, b) => a.candidate.ratedCoefficient - b.candidate.ratedCoefficient)[0] ??
    null
  );
}

function candidateOf(kind: CharacteristicKind, ratedCoefficient: number, sheet: SheetTrim): TrimCandidate {
  const rangeability = kind === sheet.characteristic ? sheet.rangeability : null;
  return { characteristic: kind, ratedCoefficient, rangeability, table: null, travelLow: 0, travelHigh: 100 };
}

function passesDesign({ designCases }: TrimReplay): boolean {
  return designCases.every(({ travel }) => travel !== null && travel <= most.design);
}
