import { errorCatalogue, type ErrorCode, type ErrorParams } from '@holdwater/shared-types/errors/catalogue.js';

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

/** Refuses with a code of the catalogue and what its words are made of. */
export function refuse<C extends ErrorCode>(
  code: C,
  params: ErrorParams<C> = {} as ErrorParams<C>,
  fields: Record<string, string> = {},
): never {
  throw new AppError(code, params, fields);
}
