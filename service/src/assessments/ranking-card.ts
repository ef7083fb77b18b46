import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { type RankingRow } from '@tailrace/shared/contracts/ranking';

/** What a ranking row draws of an assessment. */
export type RankingCard = Pick<RankingRow, 'ridge' | 'glyph'>;

/** Points a 40 px square can still show. */
const glyphPoints = 24;

type Curve = readonly { readonly travel: number; readonly value: number }[];

function thinned(curve: Curve, top: number): { travel: number; value: number }[] {
  const step = Math.max(1, Math.ceil(curve.length / glyphPoints));
  return curve
    .filter((_, i) => i % step === 0 || i === curve.length - 1)
    .map(({ travel, value }) => ({ travel, value: value / top }));
}

/** Cuts an assessment down to what a ranking row draws. */
export function rankingCard(result: PresentedAssessment): RankingCard {
  const { range, characteristic } = result;
  return {
    ridge: range && {
      shares: range.ridge,
      band: range.band,
      p5: range.p5,
      p50: range.p50,
      p95: range.p95,
    },
    glyph: characteristic && glyphOf(characteristic),
  };
}

function glyphOf(characteristic: NonNullable<PresentedAssessment['characteristic']>): RankingCard['glyph'] {
  const { specified, curve, points, pressureDrop } = characteristic;
  const asFound: Curve = curve.length > 0 ? curve : points;
  const top = Math.max(0, ...specified.map((p) => p.value), ...asFound.map((p) => p.value));
  if (!(top > 0)) return null;
  return {
    specified: thinned(specified, top),
    asFound: thinned(asFound, top),
    basis: pressureDrop === 'none' ? 'installed' : 'inherent',
  };
}
