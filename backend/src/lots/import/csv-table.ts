import type { ImportFault } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { CsvError, parse } from 'csv-parse/sync';

/** One line of data; `line` is where it begins in the file, the head being on line 1. */
export interface CsvLine {
  readonly line: number;
  readonly cells: readonly string[];
}

export interface CsvTable {
  readonly head: readonly string[];
  readonly lines: readonly CsvLine[];
}

/** U+FFFD: a sign that could not be read, also where the file was not in UTF-8. */
export const unreadable = '\uFFFD';

interface ParsedRecord {
  record: string[];
  info: { lines: number };
}

/**
 * Reads a CSV as spreadsheets write it: with or without a byte-order mark, lines ended by LF, CRLF or CR, cells parted by commas,
 * semicolons or tabs, whichever the head uses. Lines without any value are left out. Cells are trimmed text and nothing else: what looks
 * like a formula stays as it is typed.
 */
export function readCsv(csv: string): CsvTable | ImportFault {
  // the parser counts CRLF inside quotes as two lines
  const text = withoutControls(csv.replace(/^\uFEFF/, '').replaceAll(/\r\n?/g, '\n'));
  try {
    const records = parse(text, {
      delimiter: delimiterOf(text),
      info: true,
      relax_column_count: true,
      relax_quotes: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
    }) as unknown as ParsedRecord[];
    const [head, ...lines] = records.map(lineOf);
    return head ? { head: head.cells, lines } : { line: 0, column: null, code: 'empty', value: null, suggestion: null };
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return { line: lineOfLastQuote(text), column: null, code: 'quote-not-closed', value: null, suggestion: null };
  }
}

function lineOf({ record, info }: ParsedRecord): CsvLine {
  const newlines = record.reduce((count, cell) => count + (cell.split('\n').length - 1), 0);
  return { line: info.lines - newlines, cells: record.map((cell) => cell.trim()) };
}

/** A database keeps no NUL, and other controls are never typed: they become the sign that stands for what could not be read. */
function withoutControls(text: string): string {
  return text.replaceAll(/\p{Cc}/gu, (sign) => (sign === '\n' || sign === '\t' ? sign : unreadable));
}

/** Where the quote was opened that swallowed the rest of the file; the parser tells only where the file ended. */
function lineOfLastQuote(text: string): number {
  return text.slice(0, text.lastIndexOf('"')).split('\n').length;
}

function delimiterOf(text: string): string {
  const head = (text.split('\n').find((line) => line.trim() !== '') ?? '').replaceAll(/"[^"]*"/g, '');
  const counted = [',', ';', '\t'].map((delimiter) => ({ delimiter, count: head.split(delimiter).length }));
  return counted.reduce((most, each) => (each.count > most.count ? each : most)).delimiter;
}
