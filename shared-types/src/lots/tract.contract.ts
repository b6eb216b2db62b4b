import { z } from 'zod';
import { id, line } from '../common/fields.js';
import { route } from '../common/route.js';

const point = z.tuple([z.number(), z.number()]);

/** A drawn plat in feet: x grows east, y grows south, from the north-west corner. */
export const plat = z.strictObject({
  widthFt: z.number().positive().max(20_000),
  heightFt: z.number().positive().max(20_000),
  /** Clockwise degrees from the drawing's up to north. */
  northDegrees: z.number().min(0).max(360),
  parcels: z.array(z.strictObject({ lotNumber: z.string().max(20), points: z.array(point).min(3).max(60) })).max(500),
  roads: z
    .array(
      z.strictObject({
        name: z.string().max(80),
        points: z.array(point).min(2).max(60),
        widthFt: z.number().positive().max(200),
      }),
    )
    .max(60),
});
export type PlatDrawing = z.infer<typeof plat>;

export const tract = z.object({
  id,
  name: z.string(),
  builderId: id,
  builderName: z.string(),
  lotCount: z.number().int(),
  plat: plat.nullable(),
});
export type Tract = z.infer<typeof tract>;

export const listTracts = route({
  method: 'GET',
  path: '/api/tracts',
  summary: 'Tracts with a lot the reader may see, and those of the own builder',
  status: 200,
  answer: z.object({ items: z.array(tract) }),
});

export const createTract = route({
  method: 'POST',
  path: '/api/tracts',
  summary: 'Builder: add a tract',
  status: 201,
  body: z.strictObject({ builderId: id, name: line(120), plat: plat.nullable().optional() }),
  answer: tract,
});

export const updateTract = route({
  method: 'PATCH',
  path: '/api/tracts/:tractId',
  summary: 'Builder: rename a tract or replace its plat',
  status: 200,
  params: z.object({ tractId: id }),
  body: z.strictObject({ name: line(120).optional(), plat: plat.nullable().optional() }),
  answer: tract,
});
