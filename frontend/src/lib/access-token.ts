type Listener = (token: string | null) => void;

let token: string | null = null;
const listeners = new Set<Listener>();

/** The access token lives here only: never in storage, never in a cookie that scripts can read. */
export function getAccessToken(): string | null {
  return token;
}

/** Replaces the token and tells everyone who listens (the socket, the session). */
export function setAccessToken(next: string | null): void {
  if (next === token) return;
  token = next;
  listeners.forEach((listener) => listener(next));
}

export function onAccessToken(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
