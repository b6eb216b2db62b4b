import { z } from 'zod';
import { expectedVersion, id, instant, line } from '../common/fields.js';
import { done } from '../common/paging.js';
import { route } from '../common/route.js';
import { houseGeometry } from '../hydraulics/house-geometry.js';
import { houseOrigin } from './house-origin.js';
import { houseToSave } from './house.rules.js';

/** Most units that one act gives a model to, and most that a list of them shows. */
export const mostUnitsAtOnce = 200;
export const mostUnitsListed = 1000;

/** How far a builder's lots use a model, in units. */
export const houseModelUse = z.object({
  units: z.number().int(),
  lots: z.number().int(),
  /** Changed on their lot since. */
  changed: z.number().int(),
  /** Taken from a version before the newest. */
  behind: z.number().int(),
});

export const houseModelBrief = z.object({
  id,
  builderId: id,
  name: z.string(),
  version: z.number().int(),
  geometry: houseGeometry,
  madeAt: instant,
  madeByName: z.string(),
  use: houseModelUse,
});
export type HouseModelBrief = z.infer<typeof houseModelBrief>;

/** The house of one unit as a model finds it. */
export const modelledUnit = z.object({
  lotId: id,
  lotNumber: z.string(),
  address: z.string(),
  tractName: z.string().nullable(),
  unitNumber: z.number().int(),
  unitLabel: z.string(),
  isMeasured: z.boolean(),
  /** The model it was taken from, which may be another; null for one measured on its own. */
  origin: houseOrigin.nullable(),
  /** As the model's newest version already. */
  isSame: z.boolean(),
  /** Measured or changed on its lot, and not as the newest version: asked about before it is replaced. */
  isByHand: z.boolean(),
  /** Its own changes can be carried over to the newest version. */
  canKeepChanges: z.boolean(),
});
export type ModelledUnit = z.infer<typeof modelledUnit>;

export const houseModelDetail = houseModelBrief.extend({
  versions: z.array(z.object({ version: z.number().int(), madeAt: instant, madeByName: z.string() })),
  /** The units taken from it, those at an earlier version first, then by lot. */
  units: z.array(modelledUnit),
  areUnitsCut: z.boolean(),
  abilities: z.object({ canWrite: z.boolean(), canApply: z.boolean() }),
});
export type HouseModelDetail = z.infer<typeof houseModelDetail>;

const modelParams = z.object({ houseModelId: id });
const name = line(60);

export const listHouseModels = route({
  method: 'GET',
  path: '/api/house-models',
  summary: 'Builder: its house models by name',
  status: 200,
  query: z.object({ builderId: id }),
  answer: z.object({ items: z.array(houseModelBrief), canWrite: z.boolean() }),
});

export const createHouseModel = route({
  method: 'POST',
  path: '/api/house-models',
  summary: 'Builder: save a house under a name, to be given to many lots',
  status: 201,
  body: z.strictObject({ builderId: id, name, geometry: houseToSave }),
  answer: houseModelDetail,
});

export const readHouseModel = route({
  method: 'GET',
  path: '/api/house-models/:houseModelId',
  summary: 'Builder: a house model, its versions and the units taken from it',
  status: 200,
  params: modelParams,
  answer: houseModelDetail,
});

export const renameHouseModel = route({
  method: 'PATCH',
  path: '/api/house-models/:houseModelId',
  summary: 'Builder: rename a house model',
  status: 200,
  params: modelParams,
  body: z.strictObject({ name }),
  answer: houseModelDetail,
});

export const addHouseModelVersion = route({
  method: 'POST',
  path: '/api/house-models/:houseModelId/versions',
  summary: 'Builder: a new version of a house model; lots keep theirs until it is given to them',
  status: 200,
  params: modelParams,
  body: z.strictObject({ expectedVersion, geometry: houseToSave }),
  answer: houseModelDetail,
});

export const removeHouseModel = route({
  method: 'DELETE',
  path: '/api/house-models/:houseModelId',
  summary: 'Builder: remove a house model that no lot uses',
  status: 200,
  params: modelParams,
  answer: done,
});

export const listModelledUnits = route({
  method: 'GET',
  path: '/api/house-models/:houseModelId/units',
  summary: 'Builder: the units of a tract, or of the lots in no tract, that a model may be given to',
  status: 200,
  params: modelParams,
  query: z.object({ tractId: z.union([id, z.literal('none')]) }),
  answer: z.object({ items: z.array(modelledUnit), isCut: z.boolean() }),
});

/** What becomes of a house that was measured or changed on its lot. `ask`: nothing is done at all, and it is named. */
export const changedHouseAnswers = ['ask', 'replace', 'keep-changes'] as const;
export type ChangedHouseAnswer = (typeof changedHouseAnswers)[number];

export const applyHouseModel = route({
  method: 'POST',
  path: '/api/house-models/:houseModelId/apply',
  summary: 'Builder: give the newest version to units of several lots, all of them or none',
  status: 200,
  params: modelParams,
  body: z.strictObject({
    expectedVersion,
    units: z
      .array(
        z.strictObject({
          lotId: id,
          unitNumber: z.number().int().min(1).max(12),
          whenChanged: z.enum(changedHouseAnswers).default('ask'),
        }),
      )
      .min(1, 'required')
      .max(mostUnitsAtOnce, 'too-many')
      .superRefine((units, ctx) => {
        const seen = new Set<string>();
        units.forEach(({ lotId, unitNumber }, index) => {
          const key = `${lotId} ${unitNumber}`;
          if (seen.has(key)) ctx.addIssue({ code: 'custom', message: 'named-twice', path: [index] });
          seen.add(key);
        });
      }),
  }),
  /** How many units got it and on how many lots, and how many had it already. */
  answer: z.object({ units: z.number().int(), lots: z.number().int(), alreadySo: z.number().int() }),
});

/** What `houses-changed-by-hand` carries: the houses that were not asked about. */
export const changedHouses = z.object({
  count: z.number().int(),
  units: z.array(z.object({ lotId: id, lotNumber: z.string(), unitNumber: z.number().int(), unitLabel: z.string() })),
});
