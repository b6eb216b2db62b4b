import type { ErrorCode } from '@holdwater/shared-types/errors/catalogue.js';

/** Faults the page itself finds: no network, no answer in time, an answer that is not ours. */
export const pageFaults = ['offline', 'slow', 'unknown'] as const;
export type PageFault = (typeof pageFaults)[number];
export type ApiErrorCode = ErrorCode | PageFault;

export interface ApiErrorParts {
  readonly params?: Record<string, unknown>;
  readonly fields?: Record<string, string>;
  /** What to tell support: the server's entry number of the request. */
  readonly entry?: string;
  /** HTTP status; 0 when no answer came. */
  readonly status: number;
}

/** What every failed call throws; `code` is the key of its words (`errors:<code>`). */
export class ApiError extends Error {
  readonly params: Record<string, unknown>;
  readonly fields: Record<string, string>;
  readonly entry: string | null;
  readonly status: number;

  constructor(
    readonly code: ApiErrorCode,
    parts: ApiErrorParts,
  ) {
    super(code);
    this.name = 'ApiError';
    this.params = parts.params ?? {};
    this.fields = parts.fields ?? {};
    this.entry = parts.entry ?? null;
    this.status = parts.status;
  }

  /** Whether it is unknown if the server did the work: asking again must carry the same idempotency key. */
  get isUndecided(): boolean {
    return this.status === 0 || this.status >= 500;
  }
}

/** Whether an error is a certain refusal. */
export function isApiError(error: unknown, code?: ApiErrorCode): error is ApiError {
  return error instanceof ApiError && (code === undefined || error.code === code);
}
