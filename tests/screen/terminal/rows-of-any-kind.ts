import fc from 'fast-check';
import { SINGLE_WIDTH } from '../../../src/screen/terminal/single-width.ts';

const OWN = [...SINGLE_WIDTH.keys()]
  .filter((code) => SINGLE_WIDTH[code] === 1)
  .map((code) => String.fromCharCode(code));
const BLANKS_AND_LETTERS = ['  ', ' ', 'a', '12', '━━━', '●'];

/** SGR sequences: those of the themes, compound ones, resets, empty and odd ones. */
const sgr: fc.Arbitrary<string> = fc
  .oneof(
    fc.constantFrom(
      '1',
      '2',
      '22',
      '4',
      '24',
      '7',
      '27',
      '39',
      '34',
      '35',
      '93',
      '96',
      '38;5;111',
      '38;2;125;183;255',
    ),
    fc.constantFrom(
      '',
      '0',
      '1;34',
      '38;5',
      '38;2;1;2',
      '48;5;9',
      '49',
      '58;5;1',
      '1;1',
      '999',
      ';;',
      '22;1',
      '0;7',
    ),
  )
  .map((parameters) => `\x1b[${parameters}m`);

/** Text of the characters this program draws with. */
export const ownText: fc.Arbitrary<string> = fc
  .array(fc.oneof(fc.constantFrom(...BLANKS_AND_LETTERS), fc.constantFrom(...OWN)), { maxLength: 30 })
  .map((parts) => parts.join(''));

/** The same with SGR sequences anywhere. */
export const ownRow: fc.Arbitrary<string> = fc
  .array(fc.oneof({ weight: 2, arbitrary: ownText }, { weight: 1, arbitrary: sgr }), { maxLength: 12 })
  .map((parts) => parts.join(''));

/** What breaks such code: marks that join, wide and zero-width characters, other escapes, controls, halves. */
const foreign: fc.Arbitrary<string> = fc.oneof(
  fc.constantFrom(
    '\u0301',
    '\u200d',
    '\ufe0f',
    '\u20e3',
    '👩‍🚒',
    '漢',
    '한',
    'ﾞ',
    '\u00ad',
    '\t',
    '\r\n',
    '\x00',
    '▪',
    '▶️',
    '◽',
  ),
  fc.constantFrom(
    '\x1b',
    '\x1b[',
    '\x1b[2K',
    '\x1b[1',
    '\x1b[1:2m',
    '\x1b]8;;http://a\x07',
    '\x1b]8;;\x07',
    '\x9b1m',
    '\ud83d',
  ),
  fc.string({ unit: 'binary', maxLength: 6 }),
  fc.string({ unit: 'grapheme', maxLength: 6 }),
);

/** Anything: own rows with foreign matter in them, or not. */
export const anyRow: fc.Arbitrary<string> = fc.oneof(
  ownRow,
  fc.array(fc.oneof(ownRow, foreign), { maxLength: 6 }).map((parts) => parts.join('')),
);
