import { valveQuery } from '@tailrace/shared/contracts/valves';
import { pageOfAddress } from '../../lib/useUrlState';

/** Everything of the register that lives in the address. */
export const registerNames = ['q', 'area', 'sort', 'direction', 'page', 'rows'] as const;
export type RegisterView = Partial<Record<(typeof registerNames)[number], string | undefined>>;

const { sort: sorts, direction: directions } = valveQuery.shape;

/** What to ask of the API for an address; what makes no sense there is left out rather than refused. */
export function registerAsked(view: RegisterView) {
  const rows = Number(view.rows);
  return {
    q: view.q,
    area: view.area,
    sort: sorts.safeParse(view.sort).data ?? 'tag',
    direction: directions.safeParse(view.direction).data ?? 'asc',
    page: pageOfAddress(view.page),
    pageSize: [25, 50, 100].includes(rows) ? rows : 50,
  };
}
