import { importColumns } from '@holdwater/shared-types/lots/lot-import.contract.js';

type Column = (typeof importColumns)[number];

const rows: ReadonlyArray<Partial<Record<Column, string>>> = [
  {
    number: '1',
    address: '402 Sedge Loop',
    latitude: '39.5102',
    longitude: '-105.3011',
    permit_number: '26-04101-P',
    permit_status: 'issued',
    permit_holder: 'Dunlatch Plumbing',
    units: '1',
    gate_code: '4410',
    contact_name: 'Della Arkwright',
    contact_phone: '555-0142',
  },
  {
    number: '2',
    address: '404 Sedge Loop',
    permit_status: 'applied',
    units: '2',
    hazards: 'open trench at the street, keep left',
  },
];

/** A cell by RFC 4180: in quotes where it holds a comma, a quote or a line end. */
function cell(text: string): string {
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** A list of lots as it is to be: every column, two lots. */
export function importSample(): string {
  const lines = [
    importColumns.join(','),
    ...rows.map((row) => importColumns.map((column) => cell(row[column] ?? '')).join(',')),
  ];
  return `${lines.join('\r\n')}\r\n`;
}
