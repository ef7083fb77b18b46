import { type RankingQuery } from '@tailrace/shared/contracts/ranking';
import { criticalities } from '@tailrace/shared/core/data-sheet';
import { findingKinds } from '@tailrace/shared/core/findings/kinds';
import { pageOfAddress } from '../../lib/useUrlState';

/** Everything of the ranking that lives in the address. */
export const viewNames = ['list', 'area', 'kind', 'criticality', 'q', 'page'] as const;
export type RankingView = Partial<Record<(typeof viewNames)[number], string>>;

export const lists = ['ranked', 'trip', 'not judged'] as const;
export const rowsOfPage = 50;

const oneOf = <T extends string>(known: readonly T[], value: string | undefined): T | undefined =>
  known.find((one) => one === value);

/** What to ask of the API for an address; what makes no sense there is left out rather than refused. */
export function askedBy(view: RankingView): Partial<RankingQuery> {
  return {
    list: oneOf(lists, view.list) ?? 'ranked',
    area: view.area,
    kind: oneOf(findingKinds, view.kind),
    criticality: oneOf(criticalities, view.criticality),
    q: view.q,
    page: pageOfAddress(view.page),
    pageSize: rowsOfPage,
  };
}

/** The view an address describes. */
export function viewOf(params: URLSearchParams): RankingView {
  return Object.fromEntries(
    viewNames.flatMap((name) => {
      const value = params.get(name);
      return value ? [[name, value]] : [];
    }),
  );
}

/** Is anything narrowed down, beyond the choice of list and page? */
export function narrowed({ area, kind, criticality, q }: RankingView): boolean {
  return [area, kind, criticality, q].some(Boolean);
}
