import { describe, expect, test } from 'vitest';
import { chooseGlyphs } from '../../src/screen/draw/glyphs.ts';
import { BOATHOUSE } from '../support/samples.ts';
import { twinOf } from '../support/twin.ts';
import { agrees, opened } from './explorer.ts';
import type { OpenOptions, TerminalSession } from './harness.ts';

const SAMPLE = BOATHOUSE.file;
const [columns, rows] = [120, 36];
type Environment = NonNullable<OpenOptions['env']>;

/** Letters that stand for glyphs without Unicode: the ghost, and that a list goes on below. */
const GLYPHS = /^[ov]$/;

/**
 * Words and numbers above the foot line, in alphabetical order, powers written as digits, glyphs left out.
 * (The foot line names the arrow keys instead of drawing them, and has room for fewer keys then.)
 */
function wordsOf(screen: readonly string[]): string[] {
  const text = screen.slice(0, -1).join('\n');
  const plain = text.replace(/[¹²³]/g, (sign) => String('¹²³'.indexOf(sign) + 1));
  const words = plain.match(/[A-Za-z][A-Za-z0-9'.]*|\.?\d[\d.'"/]*/g) ?? [];
  return words.filter((word) => !GLYPHS.test(word)).sort();
}

/** Colour codes: 30 to 37, 38, 90 to 97. */
const COLOUR = /\x1b\[(?:[\d;]*;)?(?:3[0-8]|9[0-7])(?:;[\d;]*)?m/;

async function shown(env: Environment): Promise<TerminalSession> {
  const session = await opened(SAMPLE, { columns, rows, env });
  session.press('right');
  await session.until(/► span +15'-3"|> span +15'-3"/);
  await session.settle();
  return session;
}

describe('every kind of terminal', () => {
  const twin = twinOf(SAMPLE, columns, rows);
  twin.press('right');

  test('of 256, 16 or no colours holds the same frame, cell by cell', async () => {
    await Promise.all(
      [
        { COLORTERM: 'truecolor' },
        { TERM: 'xterm-256color' },
        { TERM: 'xterm' },
        { NO_COLOR: '1' },
        { TERM: 'xterm', THRICE_THEME: 'light' },
      ].map(async (env) => agrees(await shown(env), twin)),
    );
  });

  test('with NO_COLOR has weight and reverse video but no colour', async () => {
    const session = await shown({ NO_COLOR: '1', COLORTERM: 'truecolor' });
    expect(session.written()).not.toMatch(COLOUR);
    const verdict = session.screen()[1]!.indexOf('FAILS');
    expect(session.styleAt(verdict, 1).reverse).toBe(true);
    expect((await shown({ TERM: 'xterm' })).written()).toMatch(COLOUR);
  });

  test('without Unicode holds the same words, in glyphs of its own', async () => {
    const envs: Environment[] = [
      { THRICE_GLYPHS: 'ascii' },
      { LANG: 'C' },
      { TERM: 'linux' },
      { TERM: 'dumb' },
    ];
    const plain = twinOf(SAMPLE, columns, rows, chooseGlyphs({ THRICE_GLYPHS: 'ascii' }));
    plain.press('right');
    for (const row of plain.screen()) expect(row).toMatch(/^[\x20-\x7e]*$/);
    expect(wordsOf(plain.screen())).toEqual(wordsOf(twin.screen()));
    await Promise.all(envs.map(async (env) => agrees(await shown(env), plain)));
  });

  test('that is dumb gets no styles and no second screen, and is given back', async () => {
    const session = await shown({ TERM: 'dumb' });
    expect(session.onAlternateScreen()).toBe(false);
    expect(session.written()).not.toMatch(/\x1b\[[\d;]*m/);
    session.press('u', 'q');
    expect(await session.exit()).toEqual({ code: 0, screenRestored: true, modesRestored: true });
  });
});
