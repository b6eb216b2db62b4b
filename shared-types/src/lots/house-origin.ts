import { z } from 'zod';
import { id } from '../common/fields.js';
import { houseParts } from './house-differences.js';

/** Where the house of a unit comes from, and what of it is its own. */
export const houseOrigin = z.object({
  id,
  name: z.string(),
  /** The version it was taken from. */
  version: z.number().int(),
  newestVersion: z.number().int(),
  /** What was changed on this lot since; empty for a house that is as its model. */
  changes: z.array(z.enum(houseParts)),
});
export type HouseOrigin = z.infer<typeof houseOrigin>;
