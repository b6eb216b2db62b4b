import { refreshSession, type Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import { isApiError } from './api-error';
import { setAccessToken } from './access-token';
import { http, toApiError } from './http';

let running: Promise<Session> | null = null;
const lostListeners = new Set<() => void>();
const renewedListeners = new Set<(session: Session) => void>();

/** Called when the session is over on the server's word (never for a lost signal). */
export function onSessionLost(listener: () => void): () => void {
  lostListeners.add(listener);
  return () => lostListeners.delete(listener);
}

/** Called with every renewed session: the person may have changed in another tab. */
export function onSessionRenewed(listener: (session: Session) => void): () => void {
  renewedListeners.add(listener);
  return () => renewedListeners.delete(listener);
}

/**
 * A new access token for the refresh cookie. All callers of one page share one request; other tabs are covered by the minute in which the
 * server answers a just-replaced cookie with the same successor.
 * @throws ApiError `signed-out` or `session-reused` when there is no session, `offline` or `slow` without an answer
 */
export function refreshAccess(): Promise<Session> {
  running ??= askForRefresh().finally(() => {
    running = null;
  });
  return running;
}

async function askForRefresh(): Promise<Session> {
  try {
    const headers = { 'X-Sent-At': new Date().toISOString(), 'Idempotency-Key': crypto.randomUUID() };
    const answer = await http.request<Session>({ method: refreshSession.method, url: refreshSession.path, headers });
    setAccessToken(answer.data.accessToken);
    renewedListeners.forEach((listener) => listener(answer.data));
    return answer.data;
  } catch (error) {
    const fault = toApiError(error);
    if (isApiError(fault) && fault.status === 401) {
      setAccessToken(null);
      lostListeners.forEach((listener) => listener());
    }
    throw fault;
  }
}
