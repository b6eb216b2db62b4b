/**
 * A copy of a request with one place changed: `plugs.0.ratedPsi` names a field of the first plug, there or new; undefined takes it away.
 */
export function changed(given: object, changes: Record<string, unknown>): Record<string, unknown> {
  const copy = structuredClone(given) as Record<string, unknown>;
  for (const [path, value] of Object.entries(changes)) {
    const keys = path.split('.');
    const last = keys.pop() ?? '';
    const place = keys.reduce<Record<string, unknown>>((at, key) => at[key] as Record<string, unknown>, copy);
    if (value === undefined) delete place[last];
    else place[last] = value;
  }
  return copy;
}

/** JSON in which the text "Infinity" stands for a number beyond every double, which readers of JSON make infinite. */
export const jsonWithInfinity = (given: object) => JSON.stringify(given).replaceAll('"Infinity"', '1e999');
