import { importColumns, type ImportFault } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { closestWord } from './closest-word.js';

export type ImportColumn = (typeof importColumns)[number];

const required: readonly ImportColumn[] = ['number', 'address'];

/** What else these columns are called, where no count of edits would tell. */
const otherNames: Readonly<Record<string, ImportColumn>> = {
  lot: 'number',
  lot_no: 'number',
  street: 'address',
  lat: 'latitude',
  lng: 'longitude',
  lon: 'longitude',
  long: 'longitude',
  permit: 'permit_number',
  status: 'permit_status',
  holder: 'permit_holder',
  timezone: 'zone',
  time_zone: 'zone',
  gate: 'gate_code',
  contact: 'contact_name',
  phone: 'contact_phone',
};

/** Where each column stands; `null` is a head cell left empty. */
export function readHead(head: readonly string[]): { columns: Array<ImportColumn | null>; faults: ImportFault[] } {
  const columns = head.map(columnOf);
  const faults: ImportFault[] = [];
  head.forEach((written, index) => {
    const column = columns[index] ?? null;
    const fault = { line: 1, column: written, value: written };
    if (written !== '' && column === null)
      faults.push({ ...fault, code: 'unknown-column', suggestion: suggestionFor(written) });
    else if (column !== null && columns.indexOf(column) < index)
      faults.push({ ...fault, code: 'column-twice', suggestion: null });
  });
  const missing = required.filter((column) => !columns.includes(column));
  faults.push(...missing.map((column) => ({ line: 1, column, code: 'missing-column', value: null, suggestion: null })));
  return { columns, faults };
}

function columnOf(written: string): ImportColumn | null {
  return importColumns.find((column) => column === plain(written)) ?? null;
}

function suggestionFor(written: string): string | null {
  return otherNames[plain(written)] ?? closestWord(plain(written), importColumns);
}

/** `Permit Number` is `permit_number`. */
function plain(written: string): string {
  return written
    .trim()
    .toLowerCase()
    .replaceAll(/[\s-]+/g, '_');
}
