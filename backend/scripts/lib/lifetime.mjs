import { constants } from 'node:os';
import { watchNpm } from './npm-watch.mjs';
import { reportFailure, say } from './problem.mjs';

/**
 * Runs a command so that whatever it began is ended again, whichever way it ends: by itself, by a failure, by Ctrl-C.
 *
 * `main` gets a lifetime: `onEnd(work)` registers work to do at the end (last registered, first done), `fail(error)` ends the
 * command from anywhere, `ending` tells whether the end has begun, `cleanUpNow()` does the registered work early. What `main` returns is the exit code.
 * @param main the command
 * @param exitCodeWhenStopped what to exit with after a signal; by default 128 + the signal's number
 */
export function runCommandLine(main, { exitCodeWhenStopped } = {}) {
  const cleanups = [];
  let ended = null;

  async function cleanUp() {
    let isClean = true;
    for (let work = cleanups.pop(); work; work = cleanups.pop()) {
      try {
        await work();
      } catch (error) {
        reportFailure(error);
        isClean = false;
      }
    }
    return isClean;
  }

  async function cleanUpAndExit(code) {
    const isClean = await cleanUp();
    process.exit(isClean ? code : code || 1);
  }

  const lifetime = {
    get ending() {
      return ended !== null;
    },
    onEnd(work) {
      cleanups.push(work);
    },
    cleanUpNow: cleanUp,
    end(code) {
      ended ??= cleanUpAndExit(code);
    },
    fail(error) {
      if (ended) return;
      reportFailure(error);
      lifetime.end(1);
    },
  };

  // npm passes signals on that the terminal has sent already: the same one may arrive twice, and means nothing new.
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      if (ended) return;
      say(`\nStopping (${signal}) …`);
      lifetime.end(exitCodeWhenStopped ?? 128 + constants.signals[signal]);
    });
  }
  watchNpm(() => {
    if (ended) return;
    say('\nStopping, because npm was stopped …');
    lifetime.end(exitCodeWhenStopped ?? 1);
  });
  process.stdout.on('error', (error) => endOnClosedOutput(error, lifetime));
  main(lifetime).then(
    (code) => lifetime.end(code ?? 0),
    (error) => lifetime.fail(error),
  );
}

/** A closed terminal or pipe (`npm start | head`) ends the command in order, like a signal. */
function endOnClosedOutput(error, lifetime) {
  if (error.code === 'EPIPE' || error.code === 'EIO') lifetime.end(0);
  else lifetime.fail(error);
}

/** For commands that last until they are stopped. */
export function untilStopped() {
  return new Promise(() => setInterval(() => {}, 2 ** 30));
}
