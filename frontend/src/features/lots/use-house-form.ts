import type { HouseGeometry, HouseGeometryGiven } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { houseToSave } from '@holdwater/shared-types/lots/house.rules.js';
import { useRef, useState, type RefObject } from 'react';
import { useMe } from '../../app/session';
import { useContractForm, type ContractForm } from '../../lib/use-contract-form';
import { focusFirstFault } from './focus-fault';
import { draftOf, geometryOf, type HouseDraft } from './house-draft';
import { withoutPrefix } from './without-prefix';

export interface HouseFormState {
  readonly form: ContractForm<HouseDraft>;
  readonly place: RefObject<HTMLFormElement | null>;
  /** How often it was refused, for the folds with a fault in them. */
  readonly refusals: number;
  /** The house to send, or null where it cannot be: what is wrong is then marked and has the focus. */
  readonly takeHouse: () => HouseGeometryGiven | null;
  /** Marks what the server refused of the house. */
  readonly takeError: (error: unknown) => void;
}

/** A house as typed, held to the rules the server holds it to. */
export function useHouseForm(house: HouseGeometry | null): HouseFormState {
  const { units } = useMe();
  const place = useRef<HTMLFormElement>(null);
  const [refusals, setRefusals] = useState(0);
  const form = useContractForm(houseToSave, draftOf(house, 'first', units));
  const showFaults = (): void => {
    setRefusals((before) => before + 1);
    focusFirstFault(place.current);
  };
  return {
    form,
    place,
    refusals,
    takeHouse: () => {
      const geometry = geometryOf(form.values);
      if (form.check(geometry)) return geometry;
      showFaults();
      return null;
    },
    takeError: (error) => {
      form.takeError(withoutPrefix(error, 'geometry.'));
      showFaults();
    },
  };
}
