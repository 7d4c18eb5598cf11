import fc from 'fast-check';
import libraryWidth from 'string-width';
import { expect, test } from 'vitest';
import { SINGLE_WIDTH } from '../../../src/screen/terminal/single-width.ts';
import stringWidth from '../../../src/screen/terminal/string-width.ts';
import { anyRow, ownRow } from './rows-of-any-kind.ts';

test('every character the program calls single-width is one cell wide to the library', () => {
  const wrong = [...SINGLE_WIDTH.keys()].filter(
    (code) => SINGLE_WIDTH[code] === 1 && libraryWidth(String.fromCharCode(code)) !== 1,
  );
  expect(wrong.map((code) => code.toString(16))).toEqual([]);
});

test('no character the program calls single-width joins its neighbour or is ignorable', () => {
  const joins = /[\p{Mark}\p{Default_Ignorable_Code_Point}\p{Control}\p{Emoji_Presentation}]/u;
  const wrong = [...SINGLE_WIDTH.keys()].filter(
    (code) => SINGLE_WIDTH[code] === 1 && joins.test(String.fromCharCode(code)),
  );
  expect(wrong.map((code) => code.toString(16))).toEqual([]);
});

test('the stand-in for string-width counts any text as the library does', () => {
  fc.assert(
    fc.property(anyRow, (text) => {
      expect(stringWidth(text)).toBe(libraryWidth(text));
    }),
    { numRuns: 1000 },
  );
});

test('the stand-in for string-width heeds the options of the library', () => {
  fc.assert(
    fc.property(ownRow, fc.boolean(), fc.boolean(), (text, ambiguousIsNarrow, countAnsiEscapeCodes) => {
      const options = { ambiguousIsNarrow, countAnsiEscapeCodes };
      expect(stringWidth(text, options)).toBe(libraryWidth(text, options));
    }),
  );
});
