import { quoted } from './harmless.ts';
import { KIND_EXAMPLES, KIND_NAMES, QUANTITY_KINDS, type QuantityKind } from './kinds.ts';
import { AMOUNT, readAmount } from './number-text.ts';
import { findUnit, UNITS } from './units.ts';

export type Parsed =
  | { readonly ok: true; readonly value: number }
  | { readonly ok: false; readonly fault: string };

/** Enough for every finite double written out as a plain decimal. */
const LONGEST_TEXT = 1100;
/** Long enough for any quantity a person writes, short enough never to overflow. */
const LONGEST_PLAIN = 40;
const INCHES_PER_FOOT = 12;

const GLYPHS: Readonly<Record<string, string>> = {
  '½': '1/2',
  '¼': '1/4',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
};

/** Nearly everything in a file is written so; read without the long patterns, which are slow to compile. */
const PLAIN = /^(\d+(?:\.\d+)?) ?([A-Za-z]+)$/;
/** "14'-6 1/2"", "14 ft 6 in", "14'6": feet, their mark, then something that begins as a number. */
const MARKED_FEET = /^(.+?) ?(?:'|ft\.?|feet|foot) ?-? ?([\d.].*)$/i;
/** "14-6", "14-6 1/2", "14-6"": feet and inches by the dash alone. */
const DASHED_FEET = /^(\d+) ?- ?([\d.].*)$/;
/** "3-1/2" is three and a half of something, not three feet and half an inch. */
const MIXED_FRACTION = /^\d+ ?- ?\d+ ?\/ ?\d+/;
/** The inch mark may be left out after feet. */
const INCHES = /^(.*?) ?(?:"|in\.?|inch|inches)?$/i;
const WHOLE_AMOUNT = new RegExp(`^${AMOUNT}$`);
const AMOUNT_AND_UNIT = new RegExp(`^(${AMOUNT}) ?(.*)$`);

/**
 * Reads a quantity with its unit, US or SI. A bare number is taken as so many `bareUnit`, and refused without one;
 * `14-6` is always feet and inches. The value is in base units (lb, in, psi, lb/in, in²), finite, of either sign:
 * whether it is in range is the caller's to say. A fault names the text, what is wrong and what would be right.
 */
export function parseQuantity(kind: QuantityKind, text: string, bareUnit?: string): Parsed {
  const simple = readPlain(kind, text);
  if (simple !== null) return { ok: true, value: simple };
  const wrong = (what: string): Parsed => ({
    ok: false,
    fault: `${quoted(text)} is not ${KIND_NAMES[kind]}: ${what}; write ${KIND_EXAMPLES[kind]}`,
  });
  if (text.trim() === '') {
    return {
      ok: false,
      fault: `${KIND_NAMES[kind]} is missing: nothing is written; write ${KIND_EXAMPLES[kind]}`,
    };
  }
  if (text.length > LONGEST_TEXT) return wrong('it is too long');

  const plain = plainText(text);
  const sign = plain.startsWith('-') ? -1 : 1;
  const unsigned = plain.replace(/^[+-] ?/, '');
  const read = kind === 'length' ? readFeetInches(unsigned) : null;
  const outcome = read ?? readAmountAndUnit(kind, unsigned, bareUnit);
  if (typeof outcome === 'string') return wrong(outcome);
  if (!Number.isFinite(outcome)) return wrong('it is too large');
  // Adding 0 turns -0 into 0.
  return { ok: true, value: sign * outcome + 0 };
}

/** One way of writing marks, dashes, blanks and fractions. */
function plainText(text: string): string {
  return text
    .replace(/[‘’′ʹ]/g, "'")
    .replace(/[“”″ʺ]/g, '"')
    .replace(/''/g, '"')
    .replace(/[−–—‑‐]/g, '-')
    .replace(/ ?[½¼¾⅛⅜⅝⅞]/g, (glyph) => ` ${GLYPHS[glyph.trim()]!}`)
    .replace(/[^\S\n\r\v\f\u2028\u2029]+/g, ' ')
    .trim()
    .replace(/- (?=\d+ ?\/)/, '-');
}

/** The value of "40 psf" and the like; null for anything less plain, right or wrong. */
function readPlain(kind: QuantityKind, text: string): number | null {
  if (text.length > LONGEST_PLAIN) return null;
  const parts = PLAIN.exec(text);
  const unit = parts === null ? undefined : UNITS[kind].get(parts[2]!.toLowerCase());
  return unit === undefined ? null : (Number(parts![1]) * unit.times) / unit.over;
}

/** Inches, a fault, or null where the text is not feet and inches. */
function readFeetInches(text: string): number | string | null {
  const dashed = MIXED_FRACTION.test(text) ? null : DASHED_FEET.exec(text);
  const parts = MARKED_FEET.exec(text) ?? dashed;
  if (parts === null) return null;
  const feetText = parts[1]!;
  const inchesText = INCHES.exec(parts[2]!)?.[1] ?? '';
  if (!WHOLE_AMOUNT.test(feetText) || !WHOLE_AMOUNT.test(inchesText)) return null;
  const feet = readAmount(feetText);
  const inches = readAmount(inchesText);
  if (Number.isNaN(feet) || Number.isNaN(inches)) return 'a fraction over zero';
  if (!Number.isInteger(feet)) return 'feet must be whole where inches follow';
  if (inches >= INCHES_PER_FOOT) return 'inches after feet must be under 12';
  return feet * INCHES_PER_FOOT + inches;
}

function readAmountAndUnit(kind: QuantityKind, text: string, bareUnit: string | undefined): number | string {
  const parts = AMOUNT_AND_UNIT.exec(text);
  if (parts === null) return 'it does not begin with a plain number';
  const amount = readAmount(parts[1]!);
  if (Number.isNaN(amount)) return 'a fraction over zero';
  const spelling = parts[2]!;
  if (/^[\d.,]|^e[+-]?\d|^x[\da-f]/i.test(spelling)) return 'the number is not a plain decimal';
  const unit = findUnit(kind, spelling === '' && bareUnit !== undefined ? bareUnit : spelling);
  if (unit !== undefined) return (amount * unit.times) / unit.over;
  if (spelling === '') return 'it has no unit';
  if (kind === 'number') return `it takes no unit, and ${quoted(spelling)} follows it`;
  const other = QUANTITY_KINDS.find((k) => findUnit(k, spelling) !== undefined);
  return other === undefined
    ? `unknown unit ${quoted(spelling)}`
    : `${quoted(spelling)} measures ${KIND_NAMES[other]}`;
}
