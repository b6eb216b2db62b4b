import type { HouseGeometry, HouseGeometryGiven } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { materials, type Material } from '@holdwater/shared-types/hydraulics/materials.js';
import { nominalSizesIn, pipeKinds, waterSizesIn } from '@holdwater/shared-types/hydraulics/pipes.js';
import type { CutawayHouse } from '../../drawings/cutaway';
import type { Units } from '../../lib/units';
import { houseMeasures, readNumber, type HouseMeasures, type MeasureKind } from './house-measures';

export const numberFields = [
  'lowestFittingFt',
  'highestFittingFt',
  'ventTerminalFt',
  'atticCutFt',
  'standpipeFt',
  'cappedVents',
  'laundryTrapFt',
  'gaugeFt',
  'highestOutletFt',
  'waterLowestFittingFt',
  'lowestRatedPsi',
  'lowestRatedAirPsi',
  'supplyPsi',
  'elevationFt',
] as const;
export type NumberField = (typeof numberFields)[number];

/** Null for a count. */
export const kindOf = (field: NumberField): MeasureKind | null =>
  field === 'cappedVents' ? null : field.endsWith('Psi') ? 'pressure' : 'length';

export type FloorDraft = Record<'name' | 'elevationFt', string>;
export type PlugDraft = Record<'name' | 'elevationFt' | 'ratedPsi' | 'nominalIn', string>;
export type PipeDraft = Record<'nominalIn' | 'material' | 'bottomFt' | 'topFt' | 'lengthFt', string>;

export type WaterPipeDraft = Record<'material' | 'nominalIn' | 'lengthFt', string>;

/** A house as typed: every measure in words, in the units of whoever types, until it is saved. */
export interface HouseDraft extends Record<string, unknown>, Readonly<Record<NumberField, string>> {
  floors: readonly FloorDraft[];
  plugs: readonly PlugDraft[];
  pipes: readonly PipeDraft[];
  waterPipes: readonly WaterPipeDraft[];
  laundry: Record<'floor' | 'boxOutletFt' | 'branchFt', string>;
  pipeMaterial: string;
  waterPipeMaterials: readonly Material[];
  measures: HouseMeasures;
}

export const newFloor: FloorDraft = { name: '', elevationFt: '' };
export const newPlug: PlugDraft = { name: '', elevationFt: '', ratedPsi: '', nominalIn: '' };
export const newPipe: PipeDraft = { nominalIn: '3', material: pipeKinds[0], bottomFt: '', topFt: '', lengthFt: '' };
export const newWaterPipe: WaterPipeDraft = { material: 'pex', nominalIn: '0.75', lengthFt: '' };

const text = (value: number | null | undefined): string => (value === null || value === undefined ? '' : String(value));

/** A house already known, or the beginning of one: a first floor, which every height is measured from. */
export function draftOf(house: HouseGeometry | null, firstFloor: string, units: Units = 'us'): HouseDraft {
  const measures = houseMeasures(units);
  const feet = (value: number | null | undefined): string => measures.show(value, 'length');
  const shown = (name: NumberField): string => {
    const kind = kindOf(name);
    return kind === null ? text(house?.[name] ?? 0) : measures.show(house?.[name], kind);
  };
  const numbers = Object.fromEntries(numberFields.map((name) => [name, shown(name)])) as Record<NumberField, string>;
  return {
    ...numbers,
    measures,
    floors: house?.floors.map(({ name, elevationFt }) => ({ name, elevationFt: feet(elevationFt) })) ?? [
      { name: firstFloor, elevationFt: '0' },
    ],
    plugs:
      house?.plugs.map((plug) => ({
        name: plug.name,
        elevationFt: feet(plug.elevationFt),
        ratedPsi: measures.show(plug.ratedPsi, 'pressure'),
        nominalIn: text(plug.nominalIn),
      })) ?? [],
    pipes:
      house?.pipes.map((pipe) => ({
        nominalIn: text(pipe.nominalIn),
        material: pipe.material,
        bottomFt: feet(pipe.bottomFt),
        topFt: feet(pipe.topFt),
        lengthFt: feet(pipe.lengthFt),
      })) ?? [],
    waterPipes:
      house?.waterPipes?.map((pipe) => ({
        material: pipe.material,
        nominalIn: text(pipe.nominalIn),
        lengthFt: feet(pipe.lengthFt),
      })) ?? [],
    laundry: {
      floor: house?.laundry?.floor ?? '',
      boxOutletFt: feet(house?.laundry?.boxOutletFt),
      branchFt: feet(house?.laundry?.branchFt),
    },
    pipeMaterial: house?.pipeMaterial ?? '',
    waterPipeMaterials: house?.waterPipeMaterials ?? [],
  };
}

/** The house to save, by the contract's fields, in feet and psi; it still has to be checked. */
export function geometryOf(draft: HouseDraft): HouseGeometryGiven {
  const { laundry, measures } = draft;
  const feet = (words: string): number | null => measures.read(words, 'length');
  // what a row needs and lacks is NaN, which the contract then names
  const needed = (words: string, kind: MeasureKind = 'length'): number => measures.read(words, kind) ?? Number.NaN;
  const read = (name: NumberField): number | null => {
    const kind = kindOf(name);
    return kind === null ? readNumber(draft[name]) : measures.read(draft[name], kind);
  };
  return {
    ...Object.fromEntries(numberFields.map((name) => [name, read(name)])),
    laundryTrapFt: laundry.floor === '' ? null : read('laundryTrapFt'),
    floors: draft.floors.map(({ name, elevationFt }) => ({ name: name.trim(), elevationFt: needed(elevationFt) })),
    plugs: draft.plugs.map((plug) => ({
      name: plug.name.trim(),
      elevationFt: needed(plug.elevationFt),
      ratedPsi: needed(plug.ratedPsi, 'pressure'),
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
        : { floor: laundry.floor, boxOutletFt: feet(laundry.boxOutletFt), branchFt: feet(laundry.branchFt) },
    pipeMaterial: materials.find((one) => one === draft.pipeMaterial) ?? null,
    ...waterLines(draft, needed),
  };
}

/** A line of a material puts the material on the list. */
function waterLines(
  { waterPipes, waterPipeMaterials }: HouseDraft,
  needed: (words: string) => number,
): Pick<HouseGeometryGiven, 'waterPipes' | 'waterPipeMaterials'> {
  const lines = waterPipes.map((pipe) => ({
    material: materials.find((one) => one === pipe.material) ?? 'pex',
    nominalIn: waterSizesIn.find((size) => String(size) === pipe.nominalIn) ?? 0.75,
    lengthFt: needed(pipe.lengthFt),
  }));
  return {
    waterPipes: lines,
    waterPipeMaterials: [...new Set([...waterPipeMaterials, ...lines.map(({ material }) => material)])],
  };
}

const farthestDrawnFt = 300;
const drawableBy =
  ({ measures }: HouseDraft) =>
  (words: string): number | null => {
    const value = measures.read(words, 'length');
    return value !== null && Number.isFinite(value) && Math.abs(value) <= farthestDrawnFt ? value : null;
  };

/** The house drawn while it is typed: what is not a measure yet is left out of the drawing. */
export function drawnDraft(draft: HouseDraft): CutawayHouse {
  const drawable = drawableBy(draft);
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
              ratedPsi: 1,
              nominalIn: nominalSizesIn.find((size) => String(size) === plug.nominalIn) ?? null,
            },
          ];
    }),
  };
}
