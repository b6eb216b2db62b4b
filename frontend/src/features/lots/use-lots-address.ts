import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { asFilter, type LotFilter } from './lots-model';

export interface LotsAddress {
  /** Null: all lots of the organization. */
  readonly tractId: string | null;
  readonly stage: string | null;
  readonly filter: LotFilter;
  readonly chosenId: string | null;
  readonly part: 'table' | 'plat';
  readonly change: (set: Partial<Record<'tract' | 'stage' | 'filter' | 'lot' | 'part', string | null>>) => void;
}

/** What the lots page shows lives in its address: a link, a reload and the back key agree. */
export function useLotsAddress(): LotsAddress {
  const [search, setSearch] = useSearchParams();
  return useMemo(
    () => ({
      tractId: search.get('tract'),
      stage: search.get('stage'),
      filter: asFilter(search.get('filter')),
      chosenId: search.get('lot'),
      part: search.get('part') === 'plat' ? 'plat' : 'table',
      change: (set) =>
        setSearch(
          (before) => {
            const after = new URLSearchParams(before);
            for (const [name, value] of Object.entries(set)) {
              if (value === null || value === undefined) after.delete(name);
              else after.set(name, value);
            }
            return after;
          },
          { replace: true },
        ),
    }),
    [search, setSearch],
  );
}
