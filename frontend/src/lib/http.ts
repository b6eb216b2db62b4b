import { errorBody } from '@holdwater/shared-types/errors/error-body.js';
import axios, { isAxiosError } from 'axios';
import { ApiError } from './api-error';

/** After this long without an answer a call is given up; the words say so. */
export const answerWithinMs = 20_000;

/** The one axios instance. The refresh cookie is same-origin, so no credentials flag is needed. */
export const http = axios.create({ timeout: answerWithinMs, headers: { Accept: 'application/json' } });

/** Turns whatever axios threw into an `ApiError`; a cancelled call stays what it is. */
export function toApiError(error: unknown): unknown {
  if (!isAxiosError(error) || error.code === 'ERR_CANCELED') return error;
  if (error.response === undefined) {
    const isSlow = error.code === 'ECONNABORTED' || error.code === 'ETIMEDOUT';
    return new ApiError(isSlow ? 'slow' : 'offline', { status: 0, params: { seconds: answerWithinMs / 1000 } });
  }
  const body = errorBody.safeParse(error.response.data);
  const status = error.response.status;
  if (body.success) return new ApiError(body.data.code, { ...body.data, status });
  return new ApiError(status === 502 || status === 503 || status === 504 ? 'busy' : 'unknown', { status });
}
