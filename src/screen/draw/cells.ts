import type { Canvas } from './canvas.ts';
import type { Glyphs } from './glyphs.ts';

const PLAIN = /^[\x20-\x7e]*$/;

/**
 * What may stand in one cell: letters, figures and signs that every terminal draws one column wide and
 * left to right. The gaps are code points drawn as emoji (two columns), the soft hyphen, and marks that
 * join the letter before them.
 */
const ONE_CELL =
  /^[\x20-\x7e\xa1-\xac\xae-\u02ff\u0370-\u0377\u037a-\u037f\u0384-\u038a\u038c\u038e-\u03a1\u03a3-\u0482\u048a-\u052f\u1e00-\u1f15\u2010-\u2027\u2030-\u203b\u203d-\u2048\u2070\u2071\u2074-\u208e\u20a0-\u20bf\u2150-\u2189\u2190-\u2193\u21d0-\u21ff\u2200-\u22ff\u2500-\u259f\u25a0-\u25a9\u25ac-\u25b5\u25b7-\u25bf\u25c1-\u25fa]$/u;

/** Drawn nowhere: marks that join a letter, joiners, direction overrides, variation selectors. */
const NO_CELL = /^[\p{M}\p{Cf}]$/u;

/**
 * Text as single-width cells, safe to put on the screen: composed, controls and white space as a blank,
 * joiners and loose accents dropped, and whatever a terminal might draw wider than a cell as a middle dot.
 */
export function cells(text: string): string {
  if (PLAIN.test(text)) return text;
  let safe = '';
  for (const glyph of text.normalize('NFC')) {
    if (ONE_CELL.test(glyph)) safe += glyph;
    else if (NO_CELL.test(glyph)) continue;
    else safe += /^[\p{Cc}\p{Z}]$/u.test(glyph) ? ' ' : '·';
  }
  return safe;
}

/**
 * A name in at most `width` cells, ended by the mark of what is left out: after a whole word where that leaves half of
 * it. The text is cells already.
 */
export function shorten(text: string, width: number, glyphs: Glyphs): string {
  if (text.length <= width) return text;
  if (width < 1) return '';
  const blank = text.lastIndexOf(' ', width - 1);
  return text.slice(0, 2 * blank >= width ? blank : width - 1).replace(LOOSE_END, '') + glyphs.more;
}

/** What joins words to those that are left out. */
const LOOSE_END = /[ ,;+]+$/;

/** A sentence in at most `width` cells, ended after a whole word. */
export function clip(text: string, width: number, glyphs: Glyphs): string {
  if (text.length <= width) return text;
  const blank = text.lastIndexOf(' ', width - 2);
  return blank > 0 ? `${text.slice(0, blank)} ${glyphs.more}` : shorten(text, width, glyphs);
}

/** A sentence as lines of at most `width` cells, broken between words; at most `most` lines. */
export function wrap(text: string, width: number, most: number, glyphs: Glyphs): string[] {
  const lines: string[] = [];
  if (most < 1) return lines;
  let line = '';
  const words = text.split(' ').filter((word) => word !== '');
  for (const word of words) {
    const longer = line === '' ? shorten(word, width, glyphs) : `${line} ${word}`;
    if (longer.length <= width) {
      line = longer;
      continue;
    }
    if (lines.length === most - 1) {
      lines.push(clip(longer, width, glyphs));
      return lines;
    }
    lines.push(line);
    line = shorten(word, width, glyphs);
  }
  if (line !== '' && lines.length < most) lines.push(line);
  return lines;
}

const STAND_INS: Readonly<Record<string, string>> = {
  '−': '-',
  '–': '-',
  '—': '-',
  '‐': '-',
  '‑': '-',
  '…': '~',
  '·': '.',
  '×': 'x',
  '¹': '1',
  '²': '2',
  '³': '3',
  '↑': '^',
  '↓': 'v',
  '←': '<',
  '→': '>',
  '≤': '<',
  '≥': '>',
  '′': "'",
  '″': '"',
  '‘': "'",
  '’': "'",
  '“': '"',
  '”': '"',
  ß: 's',
  æ: 'a',
  Æ: 'A',
  ø: 'o',
  Ø: 'O',
  ł: 'l',
  Ł: 'L',
  đ: 'd',
  Đ: 'D',
};

/** One cell for a terminal that shows ASCII only: an accent is dropped, an unknown letter becomes "?". */
export function asciiCell(glyph: string): string {
  if (glyph >= ' ' && glyph <= '~') return glyph;
  const stand = STAND_INS[glyph];
  if (stand !== undefined) return stand;
  const bare = glyph.normalize('NFD')[0]!;
  return bare >= ' ' && bare <= '~' ? bare : '?';
}

/** Turns every cell of the canvas into ASCII; does nothing when the set is not the ASCII one. */
export function keepToGlyphs(canvas: Canvas, glyphs: Glyphs): void {
  if (glyphs.kind !== 'ascii') return;
  const all = canvas.glyphs;
  for (let cell = 0; cell < all.length; cell += 1) {
    if (all[cell]! > '~') all[cell] = asciiCell(all[cell]!);
  }
}
