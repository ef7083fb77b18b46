import { trendFileStates } from '@tailrace/shared/contracts/trends';
import { pageOfAddress } from '../../lib/useUrlState';

/** What of the list of trend files lives in the address. */
export interface TrendsView {
  readonly state?: string | undefined;
  readonly page?: string | undefined;
}

export const filesOfPage = 50;

/** What to ask of the API for an address. */
export function filesAsked({ state, page }: TrendsView) {
  return {
    state: trendFileStates.find((one) => one === state),
    page: pageOfAddress(page),
    pageSize: filesOfPage,
  };
}
