import { describe, expect, test } from 'vitest';
import { settingsOf, withSettings } from '../../src/files/settings.ts';

const of = (text: string | null) => settingsOf(text, 'settings.json');

describe('settings', () => {
  test('are not needed: no file, and an empty one, say nothing and cost nothing', () => {
    expect(of(null)).toEqual({ settings: {}, fault: null });
    expect(of('{}')).toEqual({ settings: {}, fault: null });
  });

  test('each may be given', () => {
    const all = { theme: 'light', glyphs: 'ascii', units: 'si', screenReader: true };
    expect(of(JSON.stringify(all))).toEqual({ settings: all, fault: null });
  });

  test.each([
    ['', 'it is not JSON'],
    ['[]', 'it is not an object'],
    ['null', 'it is not an object'],
    ['{"theme":"blue"}', 'theme is dark or light, not "blue"'],
    ['{"units":7}', 'units is us or si, not "7"'],
    ['{"screenReader":"yes"}', 'screenReader is true or false, not "yes"'],
    ['{"colour":"red"}', 'there is no setting "colour"; there are theme, glyphs, units, screenReader'],
    ['{"__proto__":1}', 'there is no setting "__proto__"; there are theme, glyphs, units, screenReader'],
  ])('%s is told and not taken', (text, why) => {
    expect(of(text)).toEqual({ settings: {}, fault: `settings not taken: ${why} (settings.json)` });
  });

  test('what the environment says wins', () => {
    const settings = { theme: 'dark', glyphs: 'ascii' } as const;
    expect(withSettings({ THRICE_THEME: 'light', HOME: '/h' }, settings)).toEqual({
      THRICE_THEME: 'light',
      THRICE_GLYPHS: 'ascii',
      HOME: '/h',
    });
  });
});
