import type { HouseModelDetail, ModelledUnit } from '@holdwater/shared-types/lots/house-model.contract.js';
import type { HouseOrigin } from '@holdwater/shared-types/lots/house-origin.js';
import { odderly } from '../../../lib/testing/people';
import { house, uuid } from './lot-fixtures';

/** An invented house model for specs: Plan 2210, at its second version. */
export const planId = uuid(2210);

export function originOf(changes: HouseOrigin['changes'], version = 1): HouseOrigin {
  return { id: planId, name: 'Plan 2210', version, newestVersion: 2, changes };
}

export function modelledUnitOf(lotNumber: string, parts: Partial<ModelledUnit> = {}): ModelledUnit {
  const isMeasured = parts.isByHand === true || (parts.origin ?? null) !== null;
  return {
    ...{ lotId: uuid(Number(lotNumber)), lotNumber, address: `${lotNumber} Sedge Loop`, tractName: 'Sorrel Bench' },
    ...{ unitNumber: 1, unitLabel: 'House', origin: null, isSame: false, isByHand: false, canKeepChanges: false },
    isMeasured,
    ...parts,
  };
}

export function houseModelOf(parts: Partial<HouseModelDetail> = {}): HouseModelDetail {
  return {
    ...{ id: planId, builderId: odderly.id, name: 'Plan 2210', version: 2, geometry: house },
    ...{ madeAt: '2026-04-10T15:00:00Z', madeByName: 'Della Arkwright' },
    use: { units: 0, lots: 0, changed: 0, behind: 0 },
    versions: [
      { version: 2, madeAt: '2026-04-10T15:00:00Z', madeByName: 'Della Arkwright' },
      { version: 1, madeAt: '2026-03-02T15:00:00Z', madeByName: 'Della Arkwright' },
    ],
    units: [],
    areUnitsCut: false,
    abilities: { canWrite: true, canApply: true },
    ...parts,
  };
}
