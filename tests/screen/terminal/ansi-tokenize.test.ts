import * as library from '@alcalzone/ansi-tokenize';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import * as standIn from '../../../src/screen/terminal/ansi-tokenize.ts';
import { anyRow, ownRow } from './rows-of-any-kind.ts';

const RUNS = { numRuns: 500 };

test('the stand-in for ansi-tokenize reads any text as the library does, at first and again', () => {
  fc.assert(
    fc.property(anyRow, (text) => {
      const expected = library.tokenize(text);
      expect(standIn.tokenize(text)).toEqual(expected);
      expect(standIn.tokenize(text)).toEqual(expected);
    }),
    RUNS,
  );
});

test('the stand-in for ansi-tokenize stops where the library does', () => {
  fc.assert(
    fc.property(anyRow, fc.nat(20), (text, end) => {
      expect(standIn.tokenize(text, end)).toEqual(library.tokenize(text, end));
    }),
  );
});

test('the stand-in for ansi-tokenize styles each character as the library does', () => {
  fc.assert(
    fc.property(anyRow, (text) => {
      const expected = library.styledCharsFromTokens(library.tokenize(text));
      expect(standIn.styledCharsFromTokens(standIn.tokenize(text))).toEqual(expected);
      expect(standIn.styledCharsFromTokens(library.tokenize(text))).toEqual(expected);
    }),
    RUNS,
  );
});

test('the stand-in for ansi-tokenize writes styled characters as the library does, whoever read them', () => {
  fc.assert(
    fc.property(anyRow, anyRow, (left, right) => {
      const theirs = [left, right].flatMap((text) => library.styledCharsFromTokens(library.tokenize(text)));
      const ours = [left, right].flatMap((text) => standIn.styledCharsFromTokens(standIn.tokenize(text)));
      const expected = library.styledCharsToString(theirs);
      expect(standIn.styledCharsToString(theirs)).toBe(expected);
      expect(standIn.styledCharsToString(ours)).toBe(expected);
    }),
    RUNS,
  );
});

test('a row reduced without taking it apart is the row the library would write', () => {
  fc.assert(
    fc.property(ownRow, (row) => {
      const expected = library.styledCharsToString(library.styledCharsFromTokens(library.tokenize(row)));
      expect(standIn.reduceRow(row)).toBe(expected);
    }),
    RUNS,
  );
});
