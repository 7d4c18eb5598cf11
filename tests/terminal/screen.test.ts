import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import { bundle } from '../../.build/bundle.mjs';
import { type OpenOptions, open, type TerminalSession } from './harness.ts';

const folder = mkdtempSync(join(tmpdir(), 'small-program-'));
const small = join(folder, 'small-program.mjs');
const sessions: TerminalSession[] = [];

function start(options: OpenOptions = {}): TerminalSession {
  const session = open({ program: [process.execPath, small], ...options });
  sessions.push(session);
  return session;
}

beforeAll(() => bundle({ entry: 'tests/terminal/small-program.tsx', outfile: small }));
afterEach(() => Promise.all(sessions.splice(0).map((session) => session.close())));
afterAll(() => rmSync(folder, { recursive: true }));

const RESTORED = { screenRestored: true, modesRestored: true };

test('a full frame fills the terminal to its last cell without scrolling', async () => {
  for (const [columns, rows] of [
    [80, 24],
    [120, 36],
    [20, 5],
  ] as const) {
    const session = start({ columns, rows });
    const screen = await session.until(/count 0[\s\S]*●/);
    expect(screen[0]).toMatch(new RegExp(`^${columns}x${rows}`));
    expect(screen[rows - 1]).toBe(`${'━'.repeat(columns - 1)}●`);
    expect(session.onAlternateScreen()).toBe(true);
  }
});

test('a key pressed while the program starts acts once it has, and leaves no mark on the screen', async () => {
  const session = start();
  session.press('right');
  expect((await session.until('count 1')).join('')).not.toContain('^[');
});

test('three arrow keys in one write are three key presses', async () => {
  const session = start();
  await session.until('count 0');
  session.press('right', 'right', 'right');
  await session.until('count 3');
  session.press('shift+right', 'left');
  await session.until('count 12');
});

test('keys pressed while the last frame was still held back are drawn in the end', async () => {
  const session = start();
  await session.until('count 0');
  for (let key = 0; key < 50; key += 1) session.press('right');
  await session.until('count 50');
});

test('a field shows what is typed where it lies, with the cursor behind it, and goes with Escape', async () => {
  const session = start();
  await session.until('count 0');
  session.press('enter');
  session.write('12 ft\x7f\x7fin');
  const screen = await session.until('12 in');
  expect(screen[2]).toBe('row 2     12 in     right of the field');
  await session.settle();
  expect(session.cursor()).toEqual({ x: 15, y: 2, shown: true });
  expect(session.styleAt(20, 2).foreground).toBe('default');
  session.press('escape');
  expect((await session.until('row 2               right of the field')).length).toBe(24);
  await session.settle();
  expect(session.cursor().shown).toBe(false);
});

test('a text longer than its field stays inside it', async () => {
  const session = start();
  await session.until('count 0');
  session.press('enter');
  session.write('abcdefghijkl');
  expect((await session.until('hijkl'))[2]).toBe('row 2     fghijkl   right of the field');
});

test('a pasted text arrives as one, whatever keys it would have been', async () => {
  const session = start();
  await session.until('count 0');
  session.paste('qqq 14-6\r');
  await session.until('pasted qqq 14-6');
});

test('after each resize the screen holds the frame of the new size and nothing else', async () => {
  const session = start({ columns: 120, rows: 30 });
  await session.until('count 0');
  for (const [columns, rows] of [
    [80, 24],
    [100, 40],
    [60, 18],
    [160, 48],
    [61, 48],
    [61, 10],
  ] as const) {
    session.resize(columns, rows);
    await session.until(`${columns}x${rows}`);
    const screen = await session.settle();
    const middle = Array.from({ length: rows - 2 }, (_, index) => `row ${index + 1}`);
    middle[1] = 'row 2               right of the field';
    expect(screen).toEqual([`${columns}x${rows} count 0 pasted`, ...middle, `${'━'.repeat(columns - 1)}●`]);
  }
});

test('the terminal is given back when the program is left', async () => {
  const session = start();
  await session.until('count 0');
  session.press('q');
  expect(await session.exit()).toEqual({ code: 0, ...RESTORED });
  expect(session.text().trim()).toBe('closed: left by q');
});

// A shell reports a death by signal as 128 and the signal's number.
test.each([
  ['SIGHUP', 129],
  ['SIGINT', 130],
  ['SIGTERM', 143],
] as const)('the terminal is given back on %s', async (signal, code) => {
  const session = start();
  await session.until('count 0');
  session.signal(signal);
  expect(await session.exit()).toEqual({ code, ...RESTORED });
});

test.each([
  ['x', 'broken later'],
  ['y', 'broken at once'],
])('an error nobody caught (%s) gives the terminal back, then is told', async (key, message) => {
  const session = start();
  await session.until('count 0');
  session.press(key);
  expect(await session.exit()).toEqual({ code: 2, ...RESTORED });
  expect(session.text().trim()).toBe(`failed: ${message}`);
});

test('Ctrl-C is a key like any other and leaves the program running', async () => {
  const session = start();
  await session.until('count 0');
  session.press('ctrl+c', 'right');
  await session.until('count 1');
});

test('Ctrl-Z gives the terminal to the shell, and fg brings the screen back as it was', async () => {
  const session = start({ program: ['bash', '--norc', '--noprofile', '-i'], env: { PS1: 'shell> ' } });
  await session.until('shell>');
  session.write(`${process.execPath} ${small}\r`);
  await session.until('count 0');
  session.press('right', 'ctrl+z');
  await session.until('Stopped');
  session.write('stty -a | tr " ;" "\\n\\n" | grep -x icanon\r');
  await session.until(/^icanon$/m);
  expect(session.onAlternateScreen()).toBe(false);
  expect(session.cursor().shown).toBe(true);
  session.write('fg\r');
  const screen = await session.until('80x24 count 1');
  expect(screen[23]).toBe(`${'━'.repeat(79)}●`);
  session.press('right');
  await session.until('count 2');
  session.press('q');
  await session.until(/closed: left by q\nshell>/);
  session.write('exit\r');
  expect(await session.exit()).toEqual({ code: 0, ...RESTORED });
});

test('a dumb terminal gets no alternate screen and no styles', async () => {
  const session = start({ env: { TERM: 'dumb' } });
  await session.until('count 0');
  expect(session.onAlternateScreen()).toBe(false);
  expect(session.written()).not.toMatch(/\x1b\[[\d;]*m/);
  session.press('q');
  expect(await session.exit()).toEqual({ code: 0, ...RESTORED });
});

test('with CI set the program still draws for the person before it', async () => {
  const session = start({ env: { CI: 'true' } });
  await session.until('count 0');
});

test('without a terminal the screen is refused, and nothing is drawn', () => {
  const run = (): string =>
    execFileSync(process.execPath, [small], { encoding: 'utf8', stdio: 'pipe', input: '' });
  expect(run).toThrow(/refused: stdin is not a terminal/);
});

test('a nudge writes only what changed on the screen', async () => {
  const session = start();
  await session.until('count 0');
  await session.settle();
  const before = session.written().length;
  session.press('right');
  await session.until('count 1');
  await session.settle();
  // One cell: all but two dozen bytes of it steps over the 24 rows that stayed.
  expect(session.written().length - before).toBeLessThan(150);
});

test('the harness tells how a cell looks', async () => {
  const session = start({ env: { COLORTERM: 'truecolor', THRICE_THEME: 'dark' } });
  await session.until('count 0');
  expect(session.styleAt(0, 0)).toMatchObject({ char: '8', bold: true, foreground: 'default' });
  expect(session.styleAt(20, 2)).toMatchObject({ char: 'r', bold: false, foreground: '#7db7ff' });
});

test('the harness says what the screen was when it waited in vain', async () => {
  const session = start();
  await session.until('count 0');
  await expect(session.until('no such text', 100)).rejects.toThrow(
    /in vain for no such text[\s\S]*80x24 count 0/,
  );
});
