import { createReadStream, statSync, watchFile, unwatchFile } from 'node:fs';
import { createInterface } from 'node:readline';
import { say } from './problem.mjs';

const pollMs = 300;

/** Prints what a log file holds and what is added to it, each line with the name of the program in front. */
export function followLog(lifetime, name, file) {
  let shownBytes = 0;
  let isReading = false;
  async function showMore() {
    const { size } = statSync(file, { throwIfNoEntry: false }) ?? { size: 0 };
    if (isReading || size <= shownBytes) return;
    isReading = true;
    const stream = createReadStream(file, { start: shownBytes, end: size - 1 });
    for await (const line of createInterface({ input: stream })) say(`${name.padEnd(8)} | ${line}`);
    shownBytes = size;
    isReading = false;
  }
  const show = () => showMore().catch((error) => lifetime.fail(error));
  watchFile(file, { interval: pollMs }, show);
  lifetime.onEnd(() => unwatchFile(file, show));
  void show();
}
