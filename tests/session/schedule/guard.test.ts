import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { guarded, unguarded } from '../../../src/session/schedule/guard.ts';

describe('a cell that a spreadsheet would run', () => {
  // What begins a formula: OWASP, CSV Injection.
  test.each(['=1+1', '=cmd|"/C calc"!A0', '+1+1', '-1+1', '@SUM(A1)', '\t=1', '  =1', '＝1', '-900 lb'])(
    '%j is written with an apostrophe before it',
    (text) => {
      expect(guarded(text)).toBe(`'${text}`);
    },
  );

  test.each(['-12.5', '+3', '0', '14 ft', "O'Neil", `14'-6"`, '(2) 2x12', ''])(
    '%j stays as it is',
    (text) => {
      expect(guarded(text)).toBe(text);
    },
  );

  test('controls and hidden characters are made visible, line ends stay', () => {
    expect(guarded('a\u001b[31mb\nc\u202Ed')).toBe('a\\u{1b}[31mb\nc\\u{202e}d');
    expect(guarded('a\r\nb\rc')).toBe('a\r\nb\\u{d}c');
    expect(guarded('\r=1')).toBe('\\u{d}=1');
  });

  test('reads back as the text that it was', () => {
    const text = fc.string({ unit: fc.constantFrom("'", '=', '-', '+', '@', ' ', 'a', '1', '\t') });
    fc.assert(
      fc.property(text, (text) => {
        expect(unguarded(guarded(text))).toBe(text);
      }),
      { numRuns: 1000 },
    );
  });
});
