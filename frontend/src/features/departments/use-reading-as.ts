import { useSearchParams } from 'react-router-dom';

/** As whom the desk reads a rule card. */
export const readers = ['desk', 'plumber', 'public'] as const;
export type Reader = (typeof readers)[number];

/** Kept in the address, so that a reload reads the same. */
export function useReadingAs(): [Reader, (reader: Reader) => void] {
  const [search, setSearch] = useSearchParams();
  const asked = search.get('as');
  const reader = readers.find((each) => each === asked) ?? 'desk';
  return [
    reader,
    (next) =>
      setSearch(
        (before) => {
          if (next === 'desk') before.delete('as');
          else before.set('as', next);
          return before;
        },
        { replace: true },
      ),
  ];
}
