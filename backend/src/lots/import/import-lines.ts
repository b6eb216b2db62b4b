import { line } from '@holdwater/shared-types/common/fields.js';
import type { ImportFault } from '@holdwater/shared-types/lots/lot-import.contract.js';
import type { LotDraft } from '../add-lots.service.js';
import type { CsvLine } from './csv-table.js';
import {
  type Cell,
  degreesCell,
  optionalTextCell,
  permitStatusCell,
  phoneCell,
  textCell,
  unitsCell,
  zoneCell,
} from './import-cells.js';
import type { ImportColumn } from './import-head.js';

export interface ReadLine {
  readonly line: number;
  readonly draft: LotDraft;
}

/** Reads the cells of one line; each fault is kept with its column, so that a line tells all of its faults at once. */
class LineReader {
  readonly faults: ImportFault[] = [];

  constructor(
    private readonly csvLine: CsvLine,
    private readonly columns: ReadonlyArray<ImportColumn | null>,
  ) {}

  read<T>(column: ImportColumn, reader: (cell: string) => Cell<T>, otherwise: T): T {
    const written = this.cellOf(column);
    const cell = reader(written);
    if (!cell.fault) return cell.value;
    this.refuse(column, cell.fault.code, written, cell.fault.suggestion);
    return otherwise;
  }

  cellOf(column: ImportColumn): string {
    return this.csvLine.cells[this.columns.indexOf(column)] ?? '';
  }

  refuse(column: string | null, code: string, value: string, suggestion: string | null = null): void {
    this.faults.push({
      line: this.csvLine.line,
      column,
      code,
      value: value === '' ? null : value.slice(0, 200),
      suggestion,
    });
  }

  /** A cell beyond the head, or under an empty head, belongs nowhere: most often a comma in an address without quotes. */
  refuseStray(): void {
    this.csvLine.cells.forEach((cell, index) => {
      if (cell !== '' && (this.columns[index] ?? null) === null) this.refuse(null, 'cell-without-column', cell);
    });
  }
}

/** Reads every line by itself; what lines are to each other and to what stands already is looked at afterwards. */
export function readLines(
  lines: readonly CsvLine[],
  columns: ReadonlyArray<ImportColumn | null>,
  departmentZone: string | null,
) {
  const faults: ImportFault[] = [];
  const read: ReadLine[] = [];
  for (const csvLine of lines) {
    const reader = new LineReader(csvLine, columns);
    read.push({ line: csvLine.line, draft: draftOf(reader, departmentZone) });
    reader.refuseStray();
    faults.push(...reader.faults);
  }
  return { read, faults };
}

function draftOf(reader: LineReader, departmentZone: string | null): LotDraft {
  const units = reader.read('units', unitsCell, 1);
  reader.read('zone', (cell) => zoneCell(cell, departmentZone), null);
  return {
    number: reader.read('number', (cell) => textCell(cell, line(20)), ''),
    address: reader.read('address', (cell) => textCell(cell, line(200)), ''),
    ...placeOf(reader),
    permitNumber: reader.read('permit_number', (cell) => optionalTextCell(cell, 60), null),
    permitStatus: reader.read('permit_status', permitStatusCell, 'not-applied'),
    permitHolder: reader.read('permit_holder', (cell) => optionalTextCell(cell, 120), null),
    mayPlumberRequest: false,
    coverDate: null,
    gateCode: reader.read('gate_code', (cell) => optionalTextCell(cell, 40), null),
    contactName: reader.read('contact_name', (cell) => optionalTextCell(cell, 120), null),
    contactPhone: reader.read('contact_phone', phoneCell, null),
    hazards: reader.read('hazards', (cell) => optionalTextCell(cell, 1000), null),
    unitLabels: Array.from({ length: units }, (_, index) => String(index + 1)),
  };
}

function placeOf(reader: LineReader): Pick<LotDraft, 'latitude' | 'longitude'> {
  const latitude = reader.read('latitude', (cell) => degreesCell(cell, 'latitude'), null);
  const longitude = reader.read('longitude', (cell) => degreesCell(cell, 'longitude'), null);
  const isHalf = (reader.cellOf('latitude') === '') !== (reader.cellOf('longitude') === '');
  if (isHalf) reader.refuse(reader.cellOf('latitude') === '' ? 'latitude' : 'longitude', 'both-or-neither', '');
  return { latitude, longitude };
}
