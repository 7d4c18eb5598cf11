import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { CsvReader, type CsvRecord, csvLine } from '../../../src/session/schedule/csv-records.ts';

function recordsOf(text: string, piece = text.length || 1): CsvRecord[] {
  const reader = new CsvReader();
  const records: CsvRecord[] = [];
  for (let at = 0; at < text.length; at += piece) records.push(...reader.push(text.slice(at, at + piece)));
  return [...records, ...reader.end()];
}

const cellsOf = (text: string) => recordsOf(text).map((record) => ('cells' in record ? record.cells : null));

describe('CSV', () => {
  test.each([
    [
      'commas',
      'a,b\n1,2\n',
      [
        ['a', 'b'],
        ['1', '2'],
      ],
    ],
    [
      'semicolons',
      'a;b\r\n1,5;2\r\n',
      [
        ['a', 'b'],
        ['1,5', '2'],
      ],
    ],
    [
      'tabs',
      'a\tb\n1\t2',
      [
        ['a', 'b'],
        ['1', '2'],
      ],
    ],
    [
      'old line ends',
      'a,b\r1,2\r',
      [
        ['a', 'b'],
        ['1', '2'],
      ],
    ],
    [
      'no line end at the end',
      'a,b\n1,',
      [
        ['a', 'b'],
        ['1', ''],
      ],
    ],
    [
      'empty lines',
      'a,b\n\n\r\n,\n1,2\n',
      [
        ['a', 'b'],
        ['1', '2'],
      ],
    ],
    [
      'blanks around cells',
      ' a , b \n 1 ," 2 "\n',
      [
        ['a', 'b'],
        ['1', ' 2 '],
      ],
    ],
    [
      'quoted separators and line ends',
      'a,b\n"1,\n2","x ""y"" z"\n',
      [
        ['a', 'b'],
        ['1,\n2', 'x "y" z'],
      ],
    ],
    [
      'an inch mark in a cell without quotes',
      `a,b\n14'-6",2\n`,
      [
        ['a', 'b'],
        [`14'-6"`, '2'],
      ],
    ],
    [
      'more after a closing quote',
      'a,b\n"14" ft,2\n',
      [
        ['a', 'b'],
        ['14ft', '2'],
      ],
    ],
    [
      'a separator in a quoted head',
      '"a,b,c";d\n1;2\n',
      [
        ['a,b,c', 'd'],
        ['1', '2'],
      ],
    ],
  ])('is read with %s', (_, text, cells) => {
    expect(cellsOf(text)).toEqual(cells);
  });

  test('tells the line that each record begins on, those with line ends in them too', () => {
    const lines = recordsOf('a,b\n"1\r\n2",3\n\n4,5\r\n"6\n",7\n8,9').map(({ line }) => line);
    expect(lines).toEqual([1, 2, 5, 6, 8]);
  });

  test('says which record is too long, and reads on behind it', () => {
    const long = 'x'.repeat(10_000_000);
    expect(recordsOf(`a,b\n1,${long}\n2,3\n`, 65536)).toEqual([
      { line: 1, cells: ['a', 'b'] },
      { line: 2, broken: 'too long' },
      { line: 3, cells: ['2', '3'] },
    ]);
  });

  test.each([20, 20_000])(
    'loses no line but its own to a quote that is never closed, %i lines before the end',
    (count) => {
      const rows = Array.from({ length: count }, (_, at) => `${at},${at}`);
      const [, ...records] = recordsOf(`a,b\n"1\n2",3\n4,"open\n${rows.join('\n')}\n`, 65536);
      expect(records.slice(0, 2)).toEqual([
        { line: 2, cells: ['1\n2', '3'] },
        { line: 4, broken: 'open quote' },
      ]);
      expect(records.slice(2)).toEqual(rows.map((row, at) => ({ line: 5 + at, cells: row.split(',') })));
    },
  );

  const text = fc.string({ unit: fc.constantFrom('a', '1', '"', ',', ';', '\n', '\r', '\t', ' ', "'") });

  test('is the same in whatever pieces it comes', () => {
    fc.assert(
      fc.property(text, fc.integer({ min: 1, max: 7 }), (text, piece) => {
        expect(recordsOf(text, piece)).toEqual(recordsOf(text));
      }),
      { numRuns: 2000 },
    );
  });

  const cell = fc.string({
    unit: fc.constantFrom('a', '1', '"', ',', ';', '\n', '\r', '\t', ' ', "'"),
    maxLength: 8,
  });
  const table = fc
    .record({ width: fc.integer({ min: 1, max: 4 }), rows: fc.integer({ min: 1, max: 5 }) })
    .chain(({ width, rows }) =>
      fc.array(fc.array(cell, { minLength: width, maxLength: width }), { minLength: rows, maxLength: rows }),
    )
    // The head settles what separates; a row of nothing is none.
    .map((rows) => [
      rows[0]!.map((_, at) => `c${at}`),
      ...rows.filter((row) => row.some((each) => each !== '')),
    ]);

  test('that was written here reads back the same', () => {
    fc.assert(
      fc.property(table, (rows) => {
        expect(cellsOf(rows.map(csvLine).join(''))).toEqual(rows);
      }),
      { numRuns: 1000 },
    );
  });

  test('that was written here is read the same by another reader', () => {
    fc.assert(
      fc.property(table, (rows) => {
        expect(parse(rows.map(csvLine).join(''), { relax_column_count: true })).toEqual(rows);
      }),
      { numRuns: 300 },
    );
  });
});
