const firstWaitSeconds = 30;
const longestWaitSeconds = 3_600;
/** About a day of trying. */
export const mostAttempts = 30;

/** When to try again after `attempts` failed: 30 s, doubled each time, an hour at most. */
export function nextAttemptAt(now: Date, attempts: number): Date {
  const seconds = Math.min(firstWaitSeconds * 2 ** Math.max(0, attempts - 1), longestWaitSeconds);
  return new Date(now.getTime() + seconds * 1_000);
}

/** Whether trying again is of no use: the server refused the recipient for good (a 5xx answer, RFC 5321 4.2.1), or it was tried long enough. */
export function isFinal(error: unknown, attempts: number): boolean {
  const code = typeof error === 'object' && error !== null && 'responseCode' in error ? Number(error.responseCode) : 0;
  return attempts >= mostAttempts || (code >= 550 && code <= 559);
}
