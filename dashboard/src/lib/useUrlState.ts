import { useSearchParams } from 'react-router-dom';

type State = Readonly<Record<string, string | undefined>>;
type Change<N extends string> = (
  change: Partial<Record<N, string | undefined>>,
  /** whether the browser's way back leads to what was before; filters replace, steps do not */
  way?: { replace: boolean },
) => void;

/**
 * View state that lives in the address: read it, and change part of it. Empty values leave the address; a change of
 * anything but the page goes back to the first page.
 *
 * @param names the parameters that belong to this view; others are left alone
 */
export function useUrlState<N extends string>(...names: N[]): [Partial<Record<N, string>>, Change<N>] {
  const [params, setParams] = useSearchParams();
  const state = Object.fromEntries(
    names.flatMap((name) => {
      const value = params.get(name);
      return value ? [[name, value]] : [];
    }),
  ) as Partial<Record<N, string>>;

  const change = (wanted: State, { replace } = { replace: true }): void =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        if (!('page' in wanted)) next.delete('page');
        for (const [name, value] of Object.entries(wanted)) {
          if (value) next.set(name, value);
          else next.delete(name);
        }
        return next;
      },
      { replace, preventScrollReset: replace },
    );
  return [state, change];
}

/** A page number as it stands in an address, counted from 1 there and from 0 in the API. */
export function pageOfAddress(page: string | undefined): number {
  const number = Number(page ?? 1);
  return Number.isInteger(number) && number >= 1 ? number - 1 : 0;
}
