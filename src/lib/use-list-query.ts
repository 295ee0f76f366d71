// What a list shows, kept in the address so that it can be sent and is still there after going back.
import { useSearchParams } from 'react-router-dom';

export interface ListQuery<S extends string, T extends string> {
  readonly search: string;
  readonly sort: S;
  readonly state: T;
  readonly set: (change: { readonly search?: string; readonly sort?: S; readonly state?: T }) => void;
  /** Whether anything but the sort narrows the list. */
  readonly isNarrowed: boolean;
}

/** The first of each list is what holds where the address says nothing. */
export function useListQuery<S extends string, T extends string>(
  sorts: readonly [S, ...S[]],
  states: readonly [T, ...T[]],
): ListQuery<S, T> {
  const [params, setParams] = useSearchParams();
  const search = params.get('search') ?? '';
  const sort = sorts.find((s) => s === params.get('sort')) ?? sorts[0];
  const state = states.find((s) => s === params.get('state')) ?? states[0];
  return {
    search,
    sort,
    state,
    isNarrowed: search !== '',
    set: (change) =>
      setParams(
        (before) => {
          const next = new URLSearchParams(before);
          const put = (name: string, value: string | undefined, usual: string): void => {
            if (value === undefined) return;
            if (value === usual) next.delete(name);
            else next.set(name, value);
          };
          put('search', change.search, '');
          put('sort', change.sort, sorts[0]);
          put('state', change.state, states[0]);
          return next;
        },
        { replace: true },
      ),
  };
}
