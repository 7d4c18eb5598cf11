import { BITS, brailleGlyph } from '../../sheet/drawing/dots.ts';
import type { Glyphs } from './glyphs.ts';

/** The glyph of a cell's dots: braille, or where the terminal has none the ASCII mark that lies as they do. */
export function dotGlyph(bits: number, glyphs: Glyphs): string {
  if (bits === 0 || glyphs.kind === 'unicode') return brailleGlyph(bits);
  const rows = [0, 1, 2, 3].filter((row) => (bits & (BITS[0][row]! | BITS[1][row]!)) !== 0);
  const top = rows[0]!;
  const bottom = rows.at(-1)!;
  if (bottom - top >= 2) return '|';
  if (bottom === 0) return "'";
  return top === 3 ? '.' : '-';
}
