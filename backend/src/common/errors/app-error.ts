import { errorCatalogue, type ErrorCode } from '@holdwater/shared-types/errors/catalogue.js';

/** A refusal a person can meet; its code stands in the catalogue and has words in both languages. */
export class AppError extends Error {
  readonly status: number;

  constructor(
    readonly code: ErrorCode,
    readonly params: Record<string, unknown> = {},
    readonly fields: Record<string, string> = {},
  ) {
    super(code);
    this.status = errorCatalogue[code];
  }
}

/** Refuses with a code of the catalogue. */
export function refuse(
  code: ErrorCode,
  params: Record<string, unknown> = {},
  fields: Record<string, string> = {},
): never {
  throw new AppError(code, params, fields);
}
