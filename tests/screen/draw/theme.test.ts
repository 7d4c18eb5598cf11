import { describe, expect, test } from 'vitest';
import { STYLES, type Style } from '../../../src/screen/draw/canvas.ts';
import { chooseTheme, createTheme, type Theme } from '../../../src/screen/draw/theme.ts';

const openOf = (theme: Theme, style: Style): string[] =>
  theme.codes[STYLES.indexOf(style)]!.map(({ open }) => open.slice(2, -1));

describe('the environment chooses the depth of colour', () => {
  test.each([
    [{ TERM: 'xterm-256color', COLORTERM: 'truecolor' }, 'true'],
    [{ TERM: 'xterm', COLORTERM: '24bit' }, 'true'],
    [{ TERM: 'xterm-direct' }, 'true'],
    [{ TERM: 'screen-256color' }, '256'],
    [{ TERM: 'xterm-256color', COLORTERM: '' }, '256'],
    [{ TERM: 'xterm' }, '16'],
    [{ TERM: 'linux' }, '16'],
    [{}, '16'],
    [{ TERM: 'xterm-256color', COLORTERM: 'truecolor', NO_COLOR: '1' }, 'none'],
    [{ TERM: 'xterm-256color', NO_COLOR: '' }, '256'],
    [{ TERM: 'dumb', COLORTERM: 'truecolor' }, 'bare'],
    [{ TERM: 'dumb', NO_COLOR: '1' }, 'bare'],
  ])('%j gives %s', (env, depth) => {
    expect(chooseTheme(env).depth).toBe(depth);
  });
});

describe('the environment chooses the ground', () => {
  test.each([
    [{ THRICE_THEME: 'dark' }, 'dark'],
    [{ THRICE_THEME: 'light' }, 'light'],
    [{ THRICE_THEME: 'light', COLORFGBG: '15;0' }, 'light'],
    [{ THRICE_THEME: 'mauve', COLORFGBG: '15;0' }, 'dark'],
    [{ COLORFGBG: '15;0' }, 'dark'],
    [{ COLORFGBG: '0;default;15' }, 'light'],
    [{ COLORFGBG: '0;7' }, 'light'],
    [{ COLORFGBG: '7;8' }, 'dark'],
    [{ COLORFGBG: 'default;default' }, 'unknown'],
    [{ COLORFGBG: '0;231' }, 'unknown'],
    [{}, 'unknown'],
  ])('%j gives %s', (env, ground) => {
    expect(chooseTheme(env).ground).toBe(ground);
  });
});

test('without colour every style but the plain one still differs from it', () => {
  const theme = createTheme('none', 'unknown');
  for (const style of STYLES) {
    const codes = openOf(theme, style);
    expect(codes.length === 0, style).toBe(style === 'plain');
    for (const code of codes) expect(['1', '2', '4', '7'], style).toContain(code);
  }
});

test('a dumb terminal is sent no codes at all', () => {
  expect(createTheme('bare', 'dark').codes.flat()).toEqual([]);
});

test('on a ground nobody named, nothing but magenta is coloured, at any depth', () => {
  for (const depth of ['true', '256', '16'] as const) {
    const colours = createTheme(depth, 'unknown')
      .codes.flat()
      .filter(({ close }) => close === '\x1b[39m');
    expect(new Set(colours.map(({ open }) => open))).toEqual(new Set(['\x1b[35m']));
  }
});

test('a strong accent can be told from the accent itself in every theme', () => {
  for (const depth of ['true', '256', '16', 'none'] as const) {
    for (const ground of ['dark', 'light', 'unknown'] as const) {
      const theme = createTheme(depth, ground);
      expect(openOf(theme, 'nowStrong')).not.toEqual(openOf(theme, 'now'));
      expect(openOf(theme, 'governsStrong')).not.toEqual(openOf(theme, 'governs'));
      expect(openOf(theme, 'now')).not.toEqual(openOf(theme, 'governs'));
    }
  }
});

/** WCAG 2.1, relative luminance: sRGB channels made linear and weighed. */
function luminance([red, green, blue]: readonly number[]): number {
  const linear = (channel: number): number => {
    const part = channel / 255;
    return part <= 0.03928 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * linear(red!) + 0.7152 * linear(green!) + 0.0722 * linear(blue!);
}

/** WCAG 2.1, contrast ratio. */
function contrast(a: readonly number[], b: readonly number[]): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (light! + 0.05) / (dark! + 0.05);
}

/** xterm's colour cube (16 to 231) and grey ramp (232 to 255). */
function indexedColour(index: number): number[] {
  if (index >= 232) return new Array(3).fill(8 + 10 * (index - 232));
  const steps = [0, 95, 135, 175, 215, 255];
  const place = index - 16;
  return [Math.floor(place / 36), Math.floor(place / 6) % 6, place % 6].map((step) => steps[step]!);
}

test('accents and quiet text hold 4.5:1 on black and on white (WCAG 2.1, level AA)', () => {
  for (const depth of ['true', '256'] as const) {
    for (const [ground, behind] of [
      ['dark', [0, 0, 0]],
      ['light', [255, 255, 255]],
    ] as const) {
      const theme = createTheme(depth, ground);
      for (const style of ['now', 'governs', 'quiet'] as const) {
        const parameters = openOf(theme, style)[0]!.split(';').map(Number);
        const shown = depth === 'true' ? parameters.slice(2) : indexedColour(parameters[2]!);
        expect(contrast(shown, behind), `${depth} ${ground} ${style}`).toBeGreaterThanOrEqual(4.5);
      }
    }
  }
});
