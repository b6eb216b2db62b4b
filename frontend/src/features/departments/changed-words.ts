/** A run of words of a line, and whether the version before has it. */
export interface WordRun {
  readonly text: string;
  readonly isNew: boolean;
}

/** Which words of a line are new against what stood there before: all that is not in the longest common row of words. */
export function changedWords(before: string, after: string): WordRun[] {
  const [old, now] = [before.split(' '), after.split(' ')];
  const kept = commonWords(old, now);
  const runs: { words: string[]; isNew: boolean }[] = [];
  now.forEach((word, at) => {
    const isNew = !kept.has(at);
    const last = runs.at(-1);
    if (last?.isNew === isNew) last.words.push(word);
    else runs.push({ words: [word], isNew });
  });
  return runs.map(({ words, isNew }) => ({ text: words.join(' '), isNew }));
}

/** Places in `now` of a longest common subsequence of both. */
function commonWords(old: readonly string[], now: readonly string[]): Set<number> {
  const length = (i: number, j: number): number => lengths[i]?.[j] ?? 0;
  const lengths = old.map(() => now.map(() => 0));
  for (let i = old.length - 1; i >= 0; i -= 1) {
    for (let j = now.length - 1; j >= 0; j -= 1) {
      const best = old[i] === now[j] ? length(i + 1, j + 1) + 1 : Math.max(length(i + 1, j), length(i, j + 1));
      lengths[i]?.splice(j, 1, best);
    }
  }
  const kept = new Set<number>();
  for (let i = 0, j = 0; i < old.length && j < now.length;) {
    if (old[i] === now[j]) {
      kept.add(j);
      i += 1;
      j += 1;
    } else if (length(i + 1, j) >= length(i, j + 1)) i += 1;
    else j += 1;
  }
  return kept;
}
