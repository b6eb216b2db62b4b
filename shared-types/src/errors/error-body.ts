import { z } from 'zod';
import { errorCodes, type ErrorCode } from './catalogue.js';

/**
 * The one shape of an error. `message` is plain English for a log or a script; pages word `code` and `params` in the reader's language.
 * `fields` names what is wrong at which path of the input (`plugs.0.ratedPsi`), `entry` is what to tell support.
 */
export const errorBody = z.object({
  code: z.enum(errorCodes as [ErrorCode, ...ErrorCode[]]),
  message: z.string(),
  params: z.record(z.string(), z.unknown()).optional(),
  fields: z.record(z.string(), z.string()).optional(),
  entry: z.string().optional(),
});
export type ErrorBody = z.infer<typeof errorBody>;
