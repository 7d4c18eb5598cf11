import { describe, expect, test } from 'vitest';
import { knobInHand } from '../../src/screen/state.ts';
import { ABSURD } from '../support/absurd.ts';
import { BOATHOUSE, SAMPLES } from '../support/samples.ts';
import { command } from '../support/session.ts';
import { type Twin, twinOf } from '../support/twin.ts';
import { agrees, opened, sampleCopy, started } from './explorer.ts';
import type { TerminalSession } from './harness.ts';

const SIZES = [
  [80, 24],
  [120, 36],
  [160, 48],
] as const;
const SAMPLE = BOATHOUSE.file;

/** Presses the same keys, in one write, in the terminal and on its twin. */
function both(session: TerminalSession, twin: Twin, ...keys: string[]): void {
  session.press(...keys);
  twin.press(...keys);
}

describe('the explorer opens', () => {
  test.each(SAMPLES)('on $title at 80x24, 120x36 and 160x48', async ({ file, title, members }) => {
    const [name] = members;
    const [checked] = JSON.parse((await command('check', file, '--member', name!, '--json')).out).members;
    const { lightest } = JSON.parse((await command('rack', file, '--member', name!, '--json')).out);
    await Promise.all(
      SIZES.map(async ([columns, rows]) => {
        const session = await opened(file, { columns, rows });
        expect(session.onAlternateScreen()).toBe(true);
        const screen = await agrees(session, twinOf(file, columns, rows));
        // A long name of the job gives way to that of the member where there is no room for both.
        const beginning = columns < 160 ? title.slice(0, 10) : `${title} / `;
        expect(screen[0]).toContain(`thrice  ${beginning}`);
        expect(screen[0]).toContain(` / ${name} `);
        expect(screen[0]).toMatch(/ kept$/);
        expect(screen[1]).toMatch(checked.passes ? /^ {2}PASSES {2}Everything passes/ : /^ {2}FAILS {2}\w/);
        expect(screen.some((row) => row.includes(`◆ ${lightest} `))).toBe(true);
        expect(screen.at(-1)).toContain('? keys');
        expect(Math.max(...screen.map((row) => row.length))).toBeLessThanOrEqual(columns);
        expect(screen.join('\n')).not.toMatch(ABSURD);
      }),
    );
  });
});

describe('keys', () => {
  test('three arrow keys in one write give three nudges, and "uuu" in one write takes them back', async () => {
    const session = await opened(SAMPLE);
    const twin = twinOf(SAMPLE, 80, 24);
    const before = await agrees(session, twin);
    both(session, twin, 'right', 'right', 'right');
    // The sample's girder spans 15 ft; a nudge of the span is 3 in.
    expect((await agrees(session, twin)).join('\n')).toMatch(/► span +15'-9"/);
    both(session, twin, 'u', 'u', 'u');
    expect(await agrees(session, twin)).toEqual(before);
    both(session, twin, 'r', 'r');
    expect((await agrees(session, twin)).join('\n')).toMatch(/► span +15'-6"/);
  });

  /** Presses keys one by one, and gives how many of them were not digits. */
  function besidesDigits(session: TerminalSession, ...keys: string[]): number {
    for (const key of keys) session.press(key);
    return keys.filter((key) => !/^\d$/.test(key)).length;
  }

  test('a span takes 3 keys besides digits, the next grade 2, the next member 1, keeping 1', async () => {
    const session = await opened(sampleCopy());
    session.press('down', 'down');
    expect(besidesDigits(session, 'l', '1', '6', 'enter')).toBeLessThanOrEqual(3);
    await session.until(/► span +16'-0"/);
    expect(besidesDigits(session, 'g', 'right')).toBeLessThanOrEqual(2);
    await session.until(/► grade +No\.1/);
    expect(besidesDigits(session, 's')).toBe(1);
    await session.until(/\d {2}kept\n/);
    expect(besidesDigits(session, 'tab')).toBe(1);
    await session.until(/2 of \d/);
  });

  test('every knob nudged past its limits both ways says why it stops, and every nudge can be undone', async () => {
    const [columns, rows] = [80, 24];
    const session = await opened(SAMPLE, { columns, rows });
    const twin = twinOf(SAMPLE, columns, rows);
    const { knobs } = knobInHand(twin.state());
    expect(knobs.length).toBeGreaterThan(20);
    const start = await agrees(session, twin);
    for (let index = 0; index < knobs.length; index += 1) {
      for (const key of ['shift+right', 'shift+left']) {
        const sent: string[] = [];
        while (!twin.state().notice?.refusal) {
          expect(sent.length).toBeLessThan(200);
          twin.press(key);
          sent.push(key);
        }
        session.press(...sent);
        const screen = await agrees(session, twin);
        expect(screen.at(-1)).toContain(twin.state().notice!.text);
        expect(screen.join('\n')).not.toMatch(ABSURD);
        // To the next member and back takes the reason away.
        both(session, twin, 'tab', 'shift+tab');
      }
      both(session, twin, ...twin.state().past.map(() => 'u'), 'down');
      await agrees(session, twin);
    }
    both(session, twin, ...knobs.map(() => 'up'));
    expect(await agrees(session, twin)).toEqual(start);
  }, 60_000);
});

describe('typing', () => {
  const [columns, rows] = [80, 24];
  /** The knobs' part of a screen, its words one after another. */
  const knobsText = (screen: readonly string[]): string =>
    screen
      .map((row) => row.slice(0, 26))
      .join(' ')
      .replace(/\s+/g, ' ');

  test('takes values in any unit, from Enter, from a digit, and pasted', async () => {
    const session = await opened(SAMPLE, { columns, rows });
    const twin = twinOf(SAMPLE, columns, rows);
    const typed: [string[], RegExp][] = [
      [['enter', ...'14-6', 'enter'], /► span +14'-6"/],
      [[...'16', 'enter'], /► span +16'-0"/],
      [['enter', ...'4.42 m', 'enter'], /► span +14'-6"/],
      [['enter', ...`13'3"`, 'enter'], /► span +13'-3"/],
      [['n', ...'3', 'enter'], /► plies +3/],
      [['g', 'enter', ...'sel', 'enter'], /► grade +S/],
    ];
    for (const [keys, shows] of typed) {
      both(session, twin, ...keys);
      expect((await agrees(session, twin)).join('\n')).toMatch(shows);
    }
    session.press('l');
    session.paste(`14'-6 1/2"`);
    await session.until(/► span.*14'-6 1\/2"/);
    session.press('enter');
    await session.until(/► span +14'-6 1\/2" /);
  });

  test('keeps the old value when the new one cannot be, with the reason below the field', async () => {
    const session = await opened(SAMPLE, { columns, rows });
    const wrong: [string, RegExp][] = [
      ['14 psf', /"14 psf" is not a length/],
      ['abc', /"abc" is not a length/],
      ['14 xx', /unknown unit "xx"/],
      ['0', /span runs from 1'-0" to 100'-0"/],
      ['-5', /span runs from 1'-0" to 100'-0"/],
      ['99999', /span runs from 1'-0" to 100'-0"/],
      ['1e5', /"1e5" is not a length/],
    ];
    for (const [text, says] of wrong) {
      session.press('enter', ...text, 'enter');
      const shown = await session.until((screen) => says.test(knobsText(screen.slice(5, 11))));
      expect(shown.join('\n')).not.toMatch(ABSURD);
      session.press('escape');
      await session.until(/► span +15'-0"/);
    }
    const twin = twinOf(SAMPLE, columns, rows);
    await agrees(session, twin);
  });

  test('the field edits where its cursor stands, and several backspaces in one write delete as many', async () => {
    const session = await opened(SAMPLE, { columns, rows });
    session.press('enter', ...'1999', 'backspace', 'backspace', 'backspace', ...'6-6', 'enter');
    await session.until(/► span +16'-6"/);
    session.press('enter', ...'4', 'home', '1', 'end', ...'ft', 'enter');
    await session.until(/► span +14'-0"/);
    session.press('enter', ...'20', 'escape');
    await session.until(/► span +14'-0"/);
  });

  test('pasted text is no keys: without a number nothing happens, with one it waits in the field', async () => {
    const session = await opened(SAMPLE, { columns, rows });
    const twin = twinOf(SAMPLE, columns, rows);
    session.paste('qqs\r\n');
    await session.settle();
    await agrees(session, twin);
    session.paste('\x1b[2J14\x07-6\r\nq');
    await session.until(/► span.*14/);
    expect((await session.settle())[4]!.slice(0, 26)).toMatch(/14 ?-6 ?q/);
    session.press('escape');
    await agrees(session, twin);
  });
});

describe('a resize', () => {
  test('up, down and in a storm leaves the screen of the last size and nothing else', async () => {
    const session = await opened(SAMPLE);
    const twin = twinOf(SAMPLE, 80, 24);
    both(session, twin, 'down', 'right', 'tab');
    for (const [columns, rows] of [
      [120, 36],
      [160, 48],
      [60, 18],
      [71, 34],
      [100, 30],
    ] as const) {
      session.resize(columns, rows);
      twin.resize(columns, rows);
      await agrees(session, twin);
    }
    for (let turn = 0; turn < 40; turn += 1)
      session.resize(60 + ((turn * 37) % 120), 18 + ((turn * 13) % 40));
    session.resize(80, 24);
    twin.resize(80, 24);
    await session.settle();
    await agrees(session, twin);
    both(session, twin, 'right');
    await agrees(session, twin);
  });

  test('below 60x18 leaves one line that says what size is needed', async () => {
    const session = await opened(SAMPLE);
    session.resize(50, 15);
    await session.until(/60 ?x ?18/);
    expect((await session.settle()).filter((row) => row.trim() !== '')).toHaveLength(1);
    session.resize(80, 24);
    await agrees(session, twinOf(SAMPLE, 80, 24));
  });
});

describe('leaving', () => {
  // A shell reports a death by signal as 128 and the signal's number.
  test.each([
    ['q', 0],
    ['ctrl+c', 0],
    ['SIGTERM', 143],
    ['SIGHUP', 129],
  ] as const)('by %s gives the terminal back', async (how, code) => {
    const session = await opened(SAMPLE);
    session.press('right', 'u');
    await session.settle();
    if (how === 'SIGTERM' || how === 'SIGHUP') session.signal(how);
    else session.press(how);
    expect(await session.exit()).toEqual({ code, screenRestored: true, modesRestored: true });
    // What the shell around it says of a death by signal.
    expect(session.text().trim()).toMatch(/^(Terminated|Hangup)?$/);
  });

  test('by Escape from the first question of an empty start gives it back too', async () => {
    const session = started([]);
    await session.until('What is it part of?');
    session.press('escape');
    expect(await session.exit()).toEqual({ code: 0, screenRestored: true, modesRestored: true });
  });
});
