import { describe, expect, it } from 'vitest';
import { readCsv } from './csv-table.js';

const linesOf = (csv: string) => {
  const table = readCsv(csv);
  if (!('head' in table)) throw new Error(table.code);
  return { head: table.head, lines: table.lines.map(({ line, cells }) => [line, ...cells]) };
};

// RFC 4180 for quotes and line ends; the rest is what spreadsheets write (common practice, no published source)
describe('reading CSV', () => {
  it.each([
    ['LF', 'number,address\n1,A\n2,B\n'],
    ['CRLF', 'number,address\r\n1,A\r\n2,B'],
    ['CR', 'number,address\r1,A\r2,B\r'],
    ['a byte-order mark', '\uFEFFnumber,address\r\n1,A\r\n2,B\r\n'],
    ['semicolons', 'number;address\n1;A\n2;B'],
    ['tabs', 'number\taddress\n1\tA\n2\tB'],
    ['spaces around', ' number , address \n 1 , A \n 2 , B '],
  ])('takes %s', (_, csv) => {
    expect(linesOf(csv)).toEqual({
      head: ['number', 'address'],
      lines: [
        [2, '1', 'A'],
        [3, '2', 'B'],
      ],
    });
  });

  it('keeps commas in an address whichever way cells are parted', () => {
    expect(linesOf('number;address\n1;12 Tern Court, rear').lines).toEqual([[2, '1', '12 Tern Court, rear']]);
    expect(linesOf('number,address\n1,"12 Tern Court, ""rear"""').lines).toEqual([[2, '1', '12 Tern Court, "rear"']]);
  });

  it('names the line on which each begins, past empty lines and lines within quotes', () => {
    expect(linesOf('number,address\r\n\r\n1,"A\r\nB"\r\n,,\r\n2,C').lines).toEqual([
      [3, '1', 'A\nB'],
      [6, '2', 'C'],
    ]);
  });

  it('leaves what looks like a formula as text', () => {
    expect(linesOf('number,address\n=cmd()|A1,"@SUM(1;2)"\n+1,-1').lines).toEqual([
      [2, '=cmd()|A1', '@SUM(1;2)'],
      [3, '+1', '-1'],
    ]);
  });

  it('takes a quote inside a cell as typed, and says where one is never closed', () => {
    expect(linesOf('number,address\n1,The "Oaks" 4').lines).toEqual([[2, '1', 'The "Oaks" 4']]);
    expect(readCsv('number,address\n1,A\n2,"B\n3,C')).toMatchObject({ code: 'quote-not-closed', line: 3 });
  });

  it('marks what could not be read', () => {
    expect(linesOf('number,address\n1,a\u0000b\u0007c\n2,M\uFFFDrz').lines).toEqual([
      [2, '1', 'a\uFFFDb\uFFFDc'],
      [3, '2', 'M\uFFFDrz'],
    ]);
  });

  it('says so when there is nothing', () => {
    for (const csv of ['\n\n', '  ', ',,\n,,', '\uFEFF']) expect(readCsv(csv)).toMatchObject({ line: 0 });
  });
});
