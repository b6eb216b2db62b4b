/** A failure a person can meet: its message says what happened and what to do next, and no stack is shown. */
export class Problem extends Error {
  name = 'Problem';
}

/** Prints one line for the person at the terminal. */
export function say(line = '') {
  process.stdout.write(`${line}\n`);
}

/** Prints why a command failed; a stack only where the fault is ours. */
export function reportFailure(error) {
  if (error instanceof Problem) {
    process.stderr.write(`\n${error.message}\n`);
    return;
  }
  const detail = error instanceof Error ? (error.stack ?? error.message) : String(error);
  process.stderr.write(`\nHoldwater's own scripts failed. Please report this with the lines below.\n${detail}\n`);
}
