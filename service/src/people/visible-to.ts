import { type Actor } from '@tailrace/shared/contracts/policy';
import { type ObjectLiteral, type SelectQueryBuilder } from 'typeorm';

/**
 * Narrows a query to the areas of who asks. Every read of something that belongs to a valve starts here.
 *
 * @param areaColumn the column that says the row's area, with its alias
 */
export function visibleTo<T extends ObjectLiteral>(
  actor: Pick<Actor, 'areas'>,
  query: SelectQueryBuilder<T>,
  areaColumn: string,
): SelectQueryBuilder<T> {
  if (actor.areas === null) return query;
  if (actor.areas.length === 0) return query.andWhere('1 = 0');
  return query.andWhere(`${areaColumn} IN (:...visibleAreas)`, { visibleAreas: actor.areas });
}
