import fc from 'fast-check';
import { expect, test } from 'vitest';
import { Segmenter } from '../../../src/screen/terminal/segmenter.ts';
import { anyRow, ownText } from './rows-of-any-kind.ts';

test('the stand-in for Intl.Segmenter cuts any text into the graphemes the engine finds', () => {
  const engine = new Intl.Segmenter(undefined, { granularity: 'grapheme' });
  const standIn = new Segmenter(undefined, { granularity: 'grapheme' });
  fc.assert(
    fc.property(fc.oneof(anyRow, ownText), (text) => {
      expect([...standIn.segment(text)]).toEqual([...engine.segment(text)]);
    }),
    { numRuns: 1000 },
  );
});

test('the stand-in for Intl.Segmenter finds the grapheme around a place as the engine does', () => {
  const engine = new Intl.Segmenter();
  const standIn = new Segmenter();
  fc.assert(
    fc.property(ownText, fc.integer({ min: -2, max: 40 }), (text, index) => {
      expect(standIn.segment(text).containing(index)).toEqual(engine.segment(text).containing(index));
    }),
  );
});

test('the stand-in for Intl.Segmenter leaves words and sentences to the engine', () => {
  const options = { granularity: 'word' } as const;
  const words = [...new Segmenter('en', options).segment('a beam')].map(({ segment }) => segment);
  expect(words).toEqual(
    [...new Intl.Segmenter('en', options).segment('a beam')].map(({ segment }) => segment),
  );
  expect(new Segmenter('en', options).resolvedOptions().granularity).toBe('word');
});
