import type { Request } from 'express';
import { refuse } from '../../common/errors/app-error.js';

/**
 * The routes that act by the cookie alone answer to the own page only. SameSite=Strict keeps other sites out; what says where a request
 * comes from keeps out other hosts of the same site too (ASVS 5.0 3.5.1). Programs that are no browser say nothing of it, and carry no
 * cookie they were not given. Throws `not-allowed`.
 */
export function refuseOtherPages(request: Request, appUrl: string): void {
  const site = request.get('sec-fetch-site');
  if (site !== undefined) {
    if (site !== 'same-origin') refuse('not-allowed');
    return;
  }
  const origin = request.get('origin');
  if (origin !== undefined && !isOwn(origin, request.get('host'), appUrl)) refuse('not-allowed');
}

/** By the address it is opened at, or the one the request itself came to. */
function isOwn(origin: string, host: string | undefined, appUrl: string): boolean {
  if (!URL.canParse(origin)) return false;
  const { host: originHost, origin: whole } = new URL(origin);
  return whole === new URL(appUrl).origin || originHost === host;
}
