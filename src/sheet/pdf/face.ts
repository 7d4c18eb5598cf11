import { create, type Font } from 'fontkit';

/** Stands in the place of a sign that the font lacks, so that nothing vanishes unseen. */
const LACKING = '□';

/** Marks after which a word may be broken. */
const BREAKING = ['-', '/', ',', ';', '_', '.', '+'];

/** A font as the layout needs it: how wide its texts are, and where they can be broken. Sizes and widths in points. */
export class Face {
  readonly font: Font;
  /** Of a point of size, by code point; negative where the font lacks it. */
  readonly #advances = new Map<number, number>();

  constructor(bytes: Uint8Array) {
    const font = create(bytes as Buffer);
    if (!('glyphForCodePoint' in font)) throw new TypeError('a collection of fonts is not one');
    this.font = font;
  }

  #advance(code: number): number {
    let advance = this.#advances.get(code);
    if (advance === undefined) {
      advance = this.font.hasGlyphForCodePoint(code)
        ? this.font.glyphForCodePoint(code).advanceWidth / this.font.unitsPerEm
        : -1;
      this.#advances.set(code, advance);
    }
    return advance;
  }

  /** The text with the stand-in for each sign that the font lacks. */
  shown(text: string): string {
    let shown = '';
    for (const sign of text) shown += this.#advance(sign.codePointAt(0)!) < 0 ? LACKING : sign;
    return shown;
  }

  width(text: string, size: number): number {
    let width = 0;
    for (const sign of text) width += this.#advance(sign.codePointAt(0)!);
    return width * size;
  }

  /** The text in lines no wider than `width`: broken between words, within a word that is wider. Never none. */
  lines(text: string, size: number, width: number): string[] {
    const lines: string[] = [];
    const blank = this.width(' ', size);
    let line = '';
    let taken = 0;
    for (const word of text.split(' ')) {
      for (const piece of this.#pieces(word, size, width)) {
        const more = this.width(piece, size);
        if (line !== '' && taken + blank + more <= width) {
          line += ` ${piece}`;
          taken += blank + more;
          continue;
        }
        if (line !== '') lines.push(line);
        line = piece;
        taken = more;
      }
    }
    if (line !== '' || lines.length === 0) lines.push(line);
    return lines;
  }

  /** A word whole, or in parts where it is wider than a line. */
  #pieces(word: string, size: number, width: number): string[] {
    if (this.width(word, size) <= width) return word === '' ? [] : [word];
    const pieces: string[] = [];
    let piece = '';
    for (const sign of word) {
      if (piece !== '' && this.width(piece + sign, size) > width) {
        // After a mark that may end a line, where one stands in the latter half.
        const mark = Math.max(...BREAKING.map((each) => piece.lastIndexOf(each))) + 1;
        const end = mark > piece.length / 2 ? mark : piece.length;
        pieces.push(piece.slice(0, end));
        piece = piece.slice(end);
      }
      piece += sign;
    }
    return [...pieces, piece];
  }
}
