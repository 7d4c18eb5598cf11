import { describe, expect, test } from 'vitest';
import { BOATHOUSE } from '../support/samples.ts';
import { type Twin, twinOf } from '../support/twin.ts';
import { agrees, opened, sampleCopy, started } from './explorer.ts';
import { BUNDLE, type TerminalSession } from './harness.ts';

const SAMPLE = BOATHOUSE.file;
const SIZES = [
  [80, 24],
  [120, 36],
  [160, 48],
] as const;

/** Keys that open a view, and what the frame kept of it is called; null where the twin alone says what it shows. */
const VIEWS: readonly (readonly [key: string, frame: string | null])[] = [
  ['right', 'explorer'],
  ['m', 'moves'],
  ['v', 'diagrams'],
  ['w', 'workings'],
  ['y', null],
  ['a', null],
  ['c', null],
  ['e', null],
  ['H', null],
  ['h', null],
  ['K', null],
  ['j', null],
  ['=', null],
  ['$', null],
  ['S', null],
  ['?', null],
];

/** Presses the same keys in the terminal and on its twin. */
function both(session: TerminalSession, twin: Twin, ...keys: string[]): void {
  session.press(...keys);
  twin.press(...keys);
}

describe('every view in a terminal', () => {
  test.each(SIZES)(
    'of %d x %d is the frame that is kept, and Escape leaves it',
    async (columns, rows) => {
      const session = await opened(SAMPLE, { columns, rows });
      const twin = twinOf(SAMPLE, columns, rows);
      for (const [key, name] of VIEWS) {
        both(session, twin, key);
        // The sheet is named after the file, which is another here.
        if (key !== 'S') await agrees(session, twin);
        else await session.until('Enter writes the whole job');
        if (name !== null) {
          const frame = new URL(`frames/${name}-${columns}x${rows}.txt`, import.meta.url);
          await expect(`${session.text()}\n`).toMatchFileSnapshot(frame.pathname);
        }
        both(session, twin, key === 'right' ? 'u' : 'escape');
        await agrees(session, twin);
      }
    },
    60_000,
  );
});

describe('a storm of sizes', () => {
  test.each(['right', 'v', 'j', '?'])('with keys between leaves a clean screen: %s', async (key) => {
    const session = await opened(SAMPLE);
    const twin = twinOf(SAMPLE, 80, 24);
    both(session, twin, key);
    for (let at = 0; at < 40; at += 1) {
      const [columns, rows] = [50 + ((at * 37) % 120), 16 + ((at * 11) % 40)];
      session.resize(columns, rows);
      twin.resize(columns, rows);
      // The same in whatever size it arrives.
      both(session, twin, 'i');
    }
    session.resize(100, 30);
    twin.resize(100, 30);
    await agrees(session, twin);
    expect(session.screen().length).toBe(30);
  });
});

describe('bytes that are no key of the program', () => {
  test('do nothing and say nothing: mouse, focus, unknown sequences, control codes', async () => {
    const session = await opened(SAMPLE);
    const twin = twinOf(SAMPLE, 80, 24);
    const before = await agrees(session, twin);
    for (const bytes of [
      '\x1b[M !!',
      '\x1b[<0;10;10M\x1b[<0;10;10m',
      '\x1b[I\x1b[O',
      '\x1b[99~',
      '\x1b[?1;2c',
      '\x1bOZ',
      '\x1d\x1e\x1f\x00',
      '\x1bx',
      '\x1b]11;rgb:0000/0000/0000\x07',
      '\x1bP1$r0m\x1b\\',
      '\x1b_answer\x1b\\',
    ]) {
      session.write(bytes);
      await session.settle();
    }
    await session.settle(300);
    expect(session.screen()).toEqual(before);
    both(session, twin, 'right');
    await agrees(session, twin);
  });

  test('a pasted text of lines becomes one entry, whatever keys it would have been', async () => {
    const session = await opened(SAMPLE);
    session.paste('14\nqq\r\n6');
    await session.until(/► span +14 qq 6/);
    session.press('enter');
    await session.until('is not a');
    session.press('escape');
    await session.until(/► span +15'-0"/);
  });
});

describe('Ctrl-Z', () => {
  test('gives the shell its terminal; fg shows the work as it was, in the size the window has by then', async () => {
    const file = sampleCopy();
    const session = started([], {
      program: ['bash', '--norc', '--noprofile', '-i'],
      env: { PS1: 'shell> ' },
      columns: 120,
      rows: 36,
    });
    await session.until('shell>');
    session.write(`${process.execPath} ${BUNDLE} ${file}\r`);
    await session.until('? keys');
    const twin = twinOf(SAMPLE, 120, 36);
    both(session, twin, 'right');
    await agrees(session, twin);
    session.press('ctrl+z');
    await session.until('Stopped');
    expect(session.onAlternateScreen()).toBe(false);
    session.resize(80, 24);
    twin.resize(80, 24);
    session.write('fg\r');
    await agrees(session, twin);
    both(session, twin, 'u');
    await agrees(session, twin);
    session.press('q');
    await session.until(/shell> fg[^>]*shell>/);
    session.write('exit\r');
    expect(await session.exit()).toMatchObject({ screenRestored: true, modesRestored: true });
  });
});
