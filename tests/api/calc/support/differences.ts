/** How far two numbers may be apart: 1e-9 of the larger, and what is left of a subtraction of equal values. */
const isSame = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b)) + 1e-10;

/**
 * Where `actual` differs from `expected`, one line each. Numbers within 1e-9, all else exactly; keys that `expected` does not name are
 * more fields, which an answer may have.
 */
export function differences(expected: unknown, actual: unknown, path = 'answer'): string[] {
  if (typeof expected === 'number' && typeof actual === 'number') {
    return isSame(expected, actual) ? [] : [`${path}: expected ${expected}, got ${actual}`];
  }
  if (Array.isArray(expected)) {
    if (!Array.isArray(actual)) return [`${path}: expected a list, got ${JSON.stringify(actual)}`];
    if (expected.length !== actual.length) {
      return [`${path}: expected ${JSON.stringify(expected)}, got ${JSON.stringify(actual)}`];
    }
    return expected.flatMap((each, index) => differences(each, actual[index], `${path}.${index}`));
  }
  if (isRecord(expected)) {
    if (!isRecord(actual)) return [`${path}: expected an object, got ${JSON.stringify(actual)}`];
    return Object.entries(expected).flatMap(([key, value]) => differences(value, actual[key], `${path}.${key}`));
  }
  return expected === actual ? [] : [`${path}: expected ${JSON.stringify(expected)}, got ${JSON.stringify(actual)}`];
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The codes of findings or of a take-down list, sorted: their order is not pinned. */
export function codesOf(list: unknown): string[] {
  if (!Array.isArray(list)) throw new Error(`not a list: ${JSON.stringify(list)}`);
  return list.map((each) => (isRecord(each) ? String(each.code) : String(each))).sort();
}

/** Differences of two lists of codes without regard to order; a code twice is a difference. */
export function codeDifferences(expected: readonly string[], actual: unknown, path: string): string[] {
  return differences([...expected].sort(), codesOf(actual), path);
}

/** Codes that must be among the actual ones (true) and codes that must not (false), one line for each that errs. */
export function ruleDifferences(rules: Record<string, boolean>, actual: unknown, path: string): string[] {
  const codes = codesOf(actual);
  return Object.entries(rules)
    .filter(([code, isDue]) => codes.includes(code) !== isDue)
    .map(([code, isDue]) => `${path}: ${code} ${isDue ? 'missing' : 'not due'} in ${codes.join(', ')}`);
}
