import type { HouseGeometry, HouseGeometryGiven } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { materials, type Material } from '@holdwater/shared-types/hydraulics/materials.js';
import { nominalSizesIn, pipeKinds } from '@holdwater/shared-types/hydraulics/pipes.js';
import type { CutawayHouse } from '../../drawings/cutaway';

export const numberFields = [
  'lowestFittingFt',
  'highestFittingFt',
  'ventTerminalFt',
  'atticCutFt',
  'standpipeFt',
  'cappedVents',
  'gaugeFt',
  'highestOutletFt',
  'waterLowestFittingFt',
  'lowestRatedPsi',
  'lowestRatedAirPsi',
  'supplyPsi',
  'elevationFt',
] as const;
export type NumberField = (typeof numberFields)[number];

export type FloorDraft = Record<'name' | 'elevationFt', string>;
export type PlugDraft = Record<'name' | 'elevationFt' | 'ratedPsi' | 'nominalIn', string>;
export type PipeDraft = Record<'nominalIn' | 'material' | 'bottomFt' | 'topFt' | 'lengthFt', string>;

/** A house as typed: every measure in words until it is saved. */
export interface HouseDraft extends Record<string, unknown>, Readonly<Record<NumberField, string>> {
  floors: readonly FloorDraft[];
  plugs: readonly PlugDraft[];
  pipes: readonly PipeDraft[];
  laundry: Record<'floor' | 'boxOutletFt' | 'branchFt', string>;
  pipeMaterial: string;
  waterPipeMaterials: readonly Material[];
}

export const newFloor: FloorDraft = { name: '', elevationFt: '' };
export const newPlug: PlugDraft = { name: '', elevationFt: '', ratedPsi: '', nominalIn: '4' };
export const newPipe: PipeDraft = { nominalIn: '3', material: pipeKinds[0], bottomFt: '', topFt: '', lengthFt: '' };

const text = (value: number | null | undefined): string => (value === null || value === undefined ? '' : String(value));

/** A house already known, or the beginning of one: a first floor, which every height is measured from. */
export function draftOf(house: HouseGeometry | null, firstFloor: string): HouseDraft {
  const numbers = Object.fromEntries(numberFields.map((name) => [name, text(house?.[name])])) as Record<
    NumberField,
    string
  >;
  return {
    ...numbers,
    cappedVents: text(house?.cappedVents ?? 0),
    floors: house?.floors.map(({ name, elevationFt }) => ({ name, elevationFt: text(elevationFt) })) ?? [
      { name: firstFloor, elevationFt: '0' },
    ],
    plugs:
      house?.plugs.map((plug) => ({
        name: plug.name,
        elevationFt: text(plug.elevationFt),
        ratedPsi: text(plug.ratedPsi),
        nominalIn: text(plug.nominalIn),
      })) ?? [],
    pipes:
      house?.pipes.map((pipe) => ({
        nominalIn: text(pipe.nominalIn),
        material: pipe.material,
        bottomFt: text(pipe.bottomFt),
        topFt: text(pipe.topFt),
        lengthFt: text(pipe.lengthFt),
      })) ?? [],
    laundry: {
      floor: house?.laundry?.floor ?? '',
      boxOutletFt: text(house?.laundry?.boxOutletFt),
      branchFt: text(house?.laundry?.branchFt),
    },
    pipeMaterial: house?.pipeMaterial ?? '',
    waterPipeMaterials: house?.waterPipeMaterials ?? [],
  };
}

/** Absent when nothing is typed; NaN for what is no number, which the contract then names. A comma is taken as the point. */
function typed(words: string): number | null {
  const plain = words.trim().replace(',', '.');
  return plain === '' ? null : Number(plain);
}

const needed = (words: string): number => typed(words) ?? Number.NaN;

/** The house to save, by the contract's fields; it still has to be checked. */
export function geometryOf(draft: HouseDraft): HouseGeometryGiven {
  const numbers = Object.fromEntries(numberFields.map((name) => [name, typed(draft[name])]));
  const { laundry } = draft;
  return {
    ...numbers,
    floors: draft.floors.map(({ name, elevationFt }) => ({ name: name.trim(), elevationFt: needed(elevationFt) })),
    plugs: draft.plugs.map((plug) => ({
      name: plug.name.trim(),
      elevationFt: needed(plug.elevationFt),
      ratedPsi: needed(plug.ratedPsi),
      nominalIn: nominalSizesIn.find((size) => String(size) === plug.nominalIn) ?? null,
    })),
    pipes: draft.pipes.map((pipe) => ({
      nominalIn: nominalSizesIn.find((size) => String(size) === pipe.nominalIn) ?? 3,
      material: pipeKinds.find((kind) => kind === pipe.material) ?? pipeKinds[0],
      bottomFt: needed(pipe.bottomFt),
      topFt: needed(pipe.topFt),
      lengthFt: needed(pipe.lengthFt),
    })),
    laundry:
      laundry.floor === ''
        ? null
        : { floor: laundry.floor, boxOutletFt: typed(laundry.boxOutletFt), branchFt: typed(laundry.branchFt) },
    pipeMaterial: materials.find((one) => one === draft.pipeMaterial) ?? null,
    waterPipeMaterials: [...draft.waterPipeMaterials],
  };
}

const farthestDrawnFt = 300;
const drawable = (words: string): number | null => {
  const value = typed(words);
  return value !== null && Number.isFinite(value) && Math.abs(value) <= farthestDrawnFt ? value : null;
};

/** The house drawn while it is typed: what is not a measure yet is left out of the drawing. */
export function drawnDraft(draft: HouseDraft): CutawayHouse {
  const floors = draft.floors.flatMap(({ name, elevationFt }) => {
    const elevation = drawable(elevationFt);
    return elevation === null || name.trim().toLowerCase() === 'attic'
      ? []
      : [{ name: name.trim(), elevationFt: elevation }];
  });
  const { laundry } = draft;
  return {
    floors,
    lowestFittingFt: drawable(draft.lowestFittingFt),
    ventTerminalFt: drawable(draft.ventTerminalFt),
    atticCutFt: drawable(draft.atticCutFt),
    standpipeFt: drawable(draft.standpipeFt),
    gaugeFt: drawable(draft.gaugeFt),
    laundry:
      laundry.floor === ''
        ? null
        : { floor: laundry.floor, boxOutletFt: drawable(laundry.boxOutletFt), branchFt: drawable(laundry.branchFt) },
    plugs: draft.plugs.flatMap((plug) => {
      const elevationFt = drawable(plug.elevationFt);
      return elevationFt === null
        ? []
        : [
            {
              name: plug.name,
              elevationFt,
              ratedPsi: drawable(plug.ratedPsi) ?? 1,
              nominalIn: nominalSizesIn.find((size) => String(size) === plug.nominalIn) ?? null,
            },
          ];
    }),
  };
}
