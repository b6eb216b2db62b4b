import type { ImportFault } from '@holdwater/shared-types/lots/lot-import.contract.js';
import type { ReadLine } from './import-lines.js';

/** What tells lots apart: in a tract the number, without one the address. */
export type LotKey = 'number' | 'address';

/** Lines that name a lot again: one of the file itself (told where it stood first), or one that stands already. */
export function repeatedLots(lines: readonly ReadLine[], key: LotKey, taken: ReadonlySet<string>): ImportFault[] {
  const firstLines = new Map<string, number>();
  return lines.flatMap(({ line, draft }): ImportFault[] => {
    const value = draft[key];
    if (value === '') return [];
    const firstLine = firstLines.get(value);
    firstLines.set(value, firstLine ?? line);
    const fault = { line, column: key, value };
    if (firstLine !== undefined) return [{ ...fault, code: 'repeated-in-file', suggestion: String(firstLine) }];
    return taken.has(value) ? [{ ...fault, code: 'lot-number-taken', suggestion: null }] : [];
  });
}
