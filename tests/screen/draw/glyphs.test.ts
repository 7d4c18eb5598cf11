import stringWidth from 'string-width';
import { describe, expect, test } from 'vitest';
import { chooseGlyphs, glyphsOf } from '../../../src/screen/draw/glyphs.ts';
import { isSingleWidth } from '../../../src/screen/terminal/single-width.ts';

/** Every string inside a glyph set, with where it stands. */
function glyphStrings(value: unknown, path = ''): [string, string][] {
  if (typeof value === 'string') return path === '.kind' ? [] : [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => glyphStrings(inner, `${path}.${key}`));
}

test('every Unicode glyph is one cell wide, and read by the quick way', () => {
  for (const [path, glyphs] of glyphStrings(glyphsOf('unicode'))) {
    for (const glyph of glyphs) {
      expect(stringWidth(glyph), path).toBe(1);
      expect(isSingleWidth(glyph), path).toBe(true);
    }
  }
});

test('no glyph is one that some terminals draw as a wide emoji', () => {
  for (const [path, glyphs] of glyphStrings(glyphsOf('unicode'))) {
    expect(glyphs, path).not.toMatch(/\p{Extended_Pictographic}/u);
  }
});

test('every ASCII glyph is printable ASCII', () => {
  for (const [path, glyphs] of glyphStrings(glyphsOf('ascii'))) {
    expect(glyphs, path).toMatch(/^[\x20-\x7e]+$/);
  }
});

test('both sets fill the same places, with as many glyphs where a glyph is one cell of a drawing', () => {
  const unicode = glyphStrings(glyphsOf('unicode'));
  const ascii = glyphStrings(glyphsOf('ascii'));
  expect(ascii.map(([path]) => path)).toEqual(unicode.map(([path]) => path));
});

test('the three powers are drawn by three different lines in either set', () => {
  for (const kind of ['unicode', 'ascii'] as const) expect(new Set(glyphsOf(kind).powers).size).toBe(3);
});

describe('the environment chooses the glyphs', () => {
  test.each([
    [{ TERM: 'xterm', LANG: 'en_US.UTF-8' }, 'unicode'],
    [{ TERM: 'xterm', LANG: 'C.utf8' }, 'unicode'],
    [{ TERM: 'xterm', LC_CTYPE: 'de_DE.UTF-8', LANG: 'C' }, 'unicode'],
    [{ TERM: 'xterm', LC_ALL: 'C', LANG: 'en_US.UTF-8' }, 'ascii'],
    [{ TERM: 'xterm', LC_ALL: '', LANG: 'en_US.UTF-8' }, 'unicode'],
    [{ TERM: 'xterm', LANG: 'en_US.ISO-8859-1' }, 'ascii'],
    [{ TERM: 'xterm' }, 'ascii'],
    [{ TERM: 'linux', LANG: 'en_US.UTF-8' }, 'ascii'],
    [{ TERM: 'dumb', LANG: 'en_US.UTF-8' }, 'ascii'],
    [{ TERM: 'dumb', THRICE_GLYPHS: 'unicode' }, 'unicode'],
    [{ TERM: 'xterm', LANG: 'en_US.UTF-8', THRICE_GLYPHS: 'ascii' }, 'ascii'],
    [{ TERM: 'xterm', LANG: 'en_US.UTF-8', THRICE_GLYPHS: 'runes' }, 'unicode'],
  ])('%j gives %s', (env, kind) => {
    expect(chooseGlyphs(env)).toBe(glyphsOf(kind as 'unicode' | 'ascii'));
  });
});
