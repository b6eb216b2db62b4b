import { findParent, readCommandLine } from './process-identity.mjs';

const checkMs = 250;

/** Who runs this process: npm, or npm and the shell that npm puts between. */
function describeAncestors() {
  const parent = process.ppid;
  const isShell = /^(\S*\/)?(ba|da)?sh -c /.test(readCommandLine(parent));
  return isShell ? `${parent} ${findParent(parent)}` : `${parent}`;
}

/** Tells when npm, or the shell between, was killed: then no signal reaches this process, only another parent. */
export function watchNpm(onGone) {
  if (!process.env.npm_lifecycle_event) return;
  const ancestors = describeAncestors();
  const timer = setInterval(() => {
    if (describeAncestors() === ancestors) return;
    clearInterval(timer);
    onGone();
  }, checkMs);
  timer.unref();
}
