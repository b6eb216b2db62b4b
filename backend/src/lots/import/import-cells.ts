import { latitude, line, longitude, phone, zone } from '@holdwater/shared-types/common/fields.js';
import { permitStatuses } from '@holdwater/shared-types/lots/lot.contract.js';
import type { z } from 'zod';
import type { LotRecord } from '../lot-record.js';
import { closestWord } from './closest-word.js';
import { unreadable } from './csv-table.js';

/** What is wrong with one cell, and what was probably meant. */
export interface CellFault {
  readonly code: string;
  readonly suggestion: string | null;
}
/** A cell read, or its fault. */
export type Cell<T> = { readonly value: T; readonly fault?: undefined } | { readonly fault: CellFault };

const faultOf = (code: string, suggestion: string | null = null): { fault: CellFault } => ({
  fault: { code, suggestion },
});

/** Text by the same rule as the form has. */
export function textCell(cell: string, schema: z.ZodType<string>): Cell<string> {
  if (cell.includes(unreadable)) return faultOf('not-text');
  const parsed = schema.safeParse(cell);
  return parsed.success ? { value: parsed.data } : faultOf(parsed.error.issues[0]?.message ?? 'not-text');
}

export function optionalTextCell(cell: string, longest: number): Cell<string | null> {
  return cell === '' ? { value: null } : textCell(cell, line(longest));
}

export function phoneCell(cell: string): Cell<string | null> {
  return cell === '' ? { value: null } : textCell(cell, phone);
}

export function degreesCell(cell: string, of: 'latitude' | 'longitude'): Cell<number | null> {
  if (cell === '') return { value: null };
  if (!/^[+-]?\d+(\.\d+)?$/.test(cell))
    return faultOf('not-a-number', /^[+-]?\d+,\d+$/.test(cell) ? cell.replace(',', '.') : null);
  const degrees = Number(cell);
  return (of === 'latitude' ? latitude : longitude).safeParse(degrees).success
    ? { value: degrees }
    : faultOf('out-of-range');
}

export function permitStatusCell(cell: string): Cell<LotRecord['permitStatus']> {
  if (cell === '') return { value: 'not-applied' };
  const plain = cell.toLowerCase().replaceAll(/[\s_]+/g, '-');
  const status = permitStatuses.find((each) => each === plain);
  return status ? { value: status } : faultOf('not-one-of-the-choices', closestWord(plain, permitStatuses));
}

export function unitsCell(cell: string): Cell<number> {
  if (cell === '') return { value: 1 };
  if (!/^\d+$/.test(cell)) return faultOf('not-a-number');
  const units = Number(cell);
  return units >= 1 && units <= 12 ? { value: units } : faultOf('out-of-range');
}

/** A zone is the department's, not the lot's: naming it checks that the file was meant for this department. */
export function zoneCell(cell: string, departmentZone: string | null): Cell<null> {
  if (cell === '') return { value: null };
  if (!zone.safeParse(cell).success)
    return faultOf('no-such-zone', closestWord(cell, Intl.supportedValuesOf('timeZone')) ?? departmentZone);
  const isOwn = departmentZone === null || canonicalZone(cell) === canonicalZone(departmentZone);
  return isOwn ? { value: null } : faultOf('zone-differs', departmentZone);
}

/** Zones have several names, `US/Mountain` and `America/Denver`. */
function canonicalZone(name: string): string {
  return new Intl.DateTimeFormat('en-US', { timeZone: name }).resolvedOptions().timeZone;
}
