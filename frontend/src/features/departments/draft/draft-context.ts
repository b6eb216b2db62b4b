import { createContext, useContext } from 'react';

/** What is wrong in the draft, for the fields wherever they stand in it. */
export interface DraftFaults {
  /** The words of what is wrong at a path such as `asking.windows.0.end`. */
  readonly faultOf: (path: string) => string | undefined;
  /** How many things are wrong at a path or under it. */
  readonly countUnder: (path: string) => number;
}

export const DraftFaultsContext = createContext<DraftFaults | null>(null);

export function useDraftFaults(): DraftFaults {
  const faults = useContext(DraftFaultsContext);
  if (faults === null) throw new Error('a field of a rule card stands outside its form');
  return faults;
}
