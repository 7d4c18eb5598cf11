import fc from 'fast-check';
import { BINDINGS } from '../../src/screen/keys.ts';

/** Keys that end the program or write: a test of chance would end with them. */
const NOT_BY_CHANCE = new Set(['q', 'ctrl-c', 's']);
const NAMED = ['up', 'down', 'left', 'right', 'enter', 'escape', 'tab', 'backspace', 'delete', 'home', 'end'];
const TYPED = [...'0123456789.-/\'" abcxyzft%'];

const bound = BINDINGS.flatMap(({ presses }) => presses).filter((press) => press.length === 1);

/** Any key of the explorer and of its views but those that end it or write a file. */
export const KEYS_OF_CHANCE: readonly string[] = [...NAMED, ...bound, ...TYPED].filter(
  (key) => !NOT_BY_CHANCE.has(key),
);

/** Keys as somebody might press them: mostly arrows and views, now and then anything. */
export const anyKeys = (maxLength: number): fc.Arbitrary<string[]> =>
  fc.array(
    fc.oneof(
      { arbitrary: fc.constantFrom(...NAMED), weight: 3 },
      { arbitrary: fc.constantFrom(...bound.filter((key) => !NOT_BY_CHANCE.has(key))), weight: 3 },
      { arbitrary: fc.constantFrom(...KEYS_OF_CHANCE), weight: 1 },
    ),
    { maxLength, size: 'max' },
  );
