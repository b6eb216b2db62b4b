import { setTimeout as pause } from 'node:timers/promises';
import { shownPath } from './paths.mjs';
import { Problem } from './problem.mjs';

const retryMs = 100;
const requestLimitMs = 5_000;

async function answersWell(url) {
  try {
    const response = await fetch(url, { signal: AbortSignal.timeout(requestLimitMs) });
    await response.arrayBuffer();
    return response.ok;
  } catch {
    return false;
  }
}

/**
 * Waits until the service answers 2xx at `url`.
 * @throws Problem after `limitMs`; a service that ends meanwhile ends the command by itself
 */
export async function waitForAnswer(service, url, limitMs = 60_000) {
  const deadline = Date.now() + limitMs;
  while (!(await answersWell(url))) {
    if (Date.now() > deadline) {
      throw new Problem(
        `The ${service.name} did not become ready within ${limitMs / 1000} seconds (asked ${url}). ` +
          `Read ${shownPath(service.logFile)} for the reason, then start again.`,
      );
    }
    await pause(retryMs);
  }
}
