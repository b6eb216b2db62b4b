import { ApiError, isApiError } from '../../lib/api-error';

/** A refusal whose fields are named as the form names them: the server names them by their place in the whole body. */
export function withoutPrefix(error: unknown, prefix: string): unknown {
  if (!isApiError(error)) return error;
  const fields = Object.entries(error.fields).map(([path, code]): [string, string] => [
    path.startsWith(prefix) ? path.slice(prefix.length) : path,
    code,
  ]);
  const { status, params, entry } = error;
  return new ApiError(error.code, { status, params, entry: entry ?? undefined, fields: Object.fromEntries(fields) });
}
