import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Canvas } from '../../../src/screen/draw/canvas.ts';
import { asciiCell, cells, clip, keepToGlyphs, shorten, wrap } from '../../../src/screen/draw/cells.ts';
import { glyphsOf } from '../../../src/screen/draw/glyphs.ts';
import stringWidth from '../../../src/screen/terminal/string-width.ts';

const unicode = glyphsOf('unicode');

describe('cells', () => {
  it('leaves words, figures and the signs of the trade as they are', () => {
    const text = `(2) 2x12, 14'-6 1/2", Fb′ ≤ 900 psi · l/h² — Fichtenträger, стропило, Δ ½`;
    expect(cells(text)).toBe(text);
  });

  it('lets no control character through', () => {
    expect(cells('a\u001b[31mred\u0007\tb\nc\u009b')).toBe('a [31mred  b c ');
  });

  it('drops what joins a letter or turns the direction, after composing what can be composed', () => {
    expect(cells('e\u0301te\u0301 z\u0328\u0334 \u202eabc\u200d\ufe0f')).toBe('été z abc');
  });

  it('puts a middle dot for each character that is wider than a cell', () => {
    expect(cells('梁 girder 🚣 ⚠')).toBe('· girder · ·');
  });

  it('makes any text one cell a character, as wide as the screen measures it', () => {
    const anyText = fc.oneof(
      fc.string({ unit: 'binary' }),
      fc.string({ unit: 'grapheme' }),
      fc
        .array(fc.integer({ min: 0, max: 0xffff }).map((code) => String.fromCharCode(code)))
        .map((all) => all.join('')),
    );
    fc.assert(
      fc.property(anyText, (text) => {
        const safe = cells(text);
        expect(stringWidth(safe)).toBe(safe.length);
        for (const glyph of safe) expect(stringWidth(glyph)).toBe(1);
      }),
      { numRuns: 2000 },
    );
  });

  it('holds for every character of the basic plane by itself', () => {
    const wrong: number[] = [];
    for (let code = 0; code <= 0xffff; code += 1) {
      const safe = cells(String.fromCharCode(code));
      if (stringWidth(safe) !== safe.length) wrong.push(code);
    }
    expect(wrong).toEqual([]);
  });
});

describe('shorten, clip and wrap', () => {
  it('ends a name that is too long with the mark of what is left out', () => {
    expect(shorten('Boathouse at Alder Cove', 12, unicode)).toBe('Boathouse…');
    expect(shorten('Boathouse at Alder Cove', 13, unicode)).toBe('Boathouse at…');
    expect(shorten('2x12 + brace, 8 ft', 9, unicode)).toBe('2x12…');
    // Within a word where whole ones would leave less than half.
    expect(shorten('A boathouse', 8, unicode)).toBe('A boath…');
    expect(shorten('Boathouse', 5, unicode)).toBe('Boat…');
    expect(shorten('Boathouse', 9, unicode)).toBe('Boathouse');
    expect(shorten('Boathouse', 0, unicode)).toBe('');
  });

  it('ends a sentence that is too long after a whole word', () => {
    expect(clip('Bending stops it at 1.28.', 20, unicode)).toBe('Bending stops it …');
  });

  it('breaks lines between words only, and never makes one too long or too many', () => {
    const word = fc.stringMatching(/^[a-z]{1,12}$/);
    fc.assert(
      fc.property(
        fc.array(word, { maxLength: 30 }),
        fc.integer({ min: 1, max: 40 }),
        fc.integer({ min: 0, max: 6 }),
        (words, width, most) => {
          const lines = wrap(words.join(' '), width, most, unicode);
          expect(lines.length).toBeLessThanOrEqual(most);
          for (const line of lines) {
            expect(line.length).toBeLessThanOrEqual(width);
            expect(line).not.toBe('');
            for (const piece of line.split(' ')) {
              expect(words.includes(piece) || piece.endsWith('…')).toBe(true);
            }
          }
          const shown = lines.join(' ');
          if (most > 0 && !shown.includes('…')) expect(shown).toBe(words.join(' '));
        },
      ),
    );
  });
});

describe('ASCII', () => {
  it('has a stand-in of one cell for every character', () => {
    expect(asciiCell('−') + asciiCell('…') + asciiCell('é') + asciiCell('ø') + asciiCell('Ж')).toBe('-~eo?');
  });

  it('is all that remains on a canvas drawn with the ASCII glyphs', () => {
    const canvas = new Canvas(12, 1);
    canvas.put(0, 0, 'été −0.96 ≡ж');
    keepToGlyphs(canvas, unicode);
    expect(canvas.text(0)).toBe('été −0.96 ≡ж');
    keepToGlyphs(canvas, glyphsOf('ascii'));
    expect(canvas.text(0)).toBe('ete -0.96 ??');
  });
});
