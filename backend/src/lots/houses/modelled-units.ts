import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { differingParts } from '@holdwater/shared-types/lots/house-differences.js';
import type { ModelledUnit } from '@holdwater/shared-types/lots/house-model.contract.js';
import type { HouseOrigin } from '@holdwater/shared-types/lots/house-origin.js';
import type { UnitHouse } from './unit-houses.queries.js';

/** Where a unit's house comes from and what of it is its own; null for one measured on its own. */
export function originOf(unit: UnitHouse): HouseOrigin | null {
  const { geometry, modelId, modelName, modelVersion, newestVersion, modelGeometry } = unit;
  if (modelId === null || modelName === null || modelVersion === null || newestVersion === null) return null;
  if (geometry === null || modelGeometry === null) return null;
  return {
    ...{ id: modelId, name: modelName, version: modelVersion, newestVersion },
    changes: differingParts(modelGeometry, geometry),
  };
}

/** A unit as a model finds it: what giving it the newest version would take away. */
export function modelledUnitOf(unit: UnitHouse, model: { id: string; geometry: HouseGeometry }): ModelledUnit {
  const origin = originOf(unit);
  const isAsNewest = unit.geometry !== null && differingParts(unit.geometry, model.geometry).length === 0;
  const hasOwn = unit.geometry !== null && (origin === null || origin.changes.length > 0);
  const isByHand = hasOwn && !isAsNewest;
  const { lotId, lotNumber, address, tractName, unitNumber, unitLabel } = unit;
  return {
    ...{ lotId, lotNumber, address, tractName, unitNumber, unitLabel, origin, isByHand },
    isMeasured: unit.geometry !== null,
    isSame: isAsNewest && origin?.id === model.id && origin.version === origin.newestVersion,
    canKeepChanges: isByHand && origin?.id === model.id,
  };
}
