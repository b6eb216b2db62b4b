/** The one of `words` that was probably meant by `given`: the nearest by edits, if near enough for its length; null when none is. */
export function closestWord(given: string, words: readonly string[]): string | null {
  const wanted = given.trim().toLowerCase();
  if (wanted === '' || wanted.length > 60) return null;
  const ranked = words
    .map((word) => ({ word, edits: editDistance(wanted, word.toLowerCase()) }))
    .sort((a, b) => a.edits - b.edits);
  const [best] = ranked;
  return best && best.edits <= Math.max(1, Math.floor(Math.max(wanted.length, best.word.length) / 3))
    ? best.word
    : null;
}

/** How many letters must be added, left out or replaced to make one word the other (Levenshtein 1966). */
export function editDistance(one: string, other: string): number {
  let row = Array.from({ length: other.length + 1 }, (_, index) => index);
  for (let i = 1; i <= one.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= other.length; j += 1) {
      const replaced = (row[j - 1] ?? 0) + (one[i - 1] === other[j - 1] ? 0 : 1);
      next.push(Math.min(replaced, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[other.length] ?? 0;
}
