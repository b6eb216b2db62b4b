import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useState } from 'react';
import { keepTemperatures, readTemperatures, type TypedTemperatures } from './kept-temperatures';

type Place = Pick<LotDetail, 'id' | 'tract' | 'zone'>;

const zoneOf = ({ zone }: Place): string => zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
const placeOf = ({ id, tract }: Place): string => tract?.id ?? id;

/** The temperatures typed for a lot's tract this evening; a change is kept for the next lot of it. */
export function useKeptTemperatures(lot: Place): [TypedTemperatures, (typed: TypedTemperatures) => void] {
  const place = placeOf(lot);
  const read = (): TypedTemperatures => readTemperatures(place, zoneOf(lot), new Date());
  const [own, setOwn] = useState(() => ({ place, typed: read() }));
  const typed = own.place === place ? own.typed : read();
  const keep = (next: TypedTemperatures): void => {
    setOwn({ place, typed: next });
    keepTemperatures(place, zoneOf(lot), next, new Date());
  };
  return [typed, keep];
}
