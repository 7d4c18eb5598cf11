import { chmodSync, existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readSession } from '../../src/session/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { PROGRAM_OF_NO_PRIVILEGE } from '../support/bundle.ts';
import { twinOf } from '../support/twin.ts';
import { opened, sampleCopy, started } from './explorer.ts';

function membersIn(file: string): Member[] {
  const read = readSession(readFileSync(file, 'utf8'), file);
  if (!read.ok) throw new Error(read.fault);
  return read.session.members.map(({ member }) => member);
}

/** The end of the title once nothing is left to keep. */
const KEPT = /^.*\d {2}kept$/m;
const ENDED_WELL = { code: 0, screenRestored: true, modesRestored: true };

describe('keeping', () => {
  test('the file stays byte for byte until s is pressed, then holds what the screen shows', async () => {
    const file = sampleCopy();
    const before = readFileSync(file);
    const session = await opened(file);
    const twin = twinOf(file, 80, 24);
    const keys = ['right', 'right', 'down', 'right', 'g', 'right', 'tab', 'l', 'left', 'x'];
    session.press(...keys);
    twin.press(...keys);
    await session.until(/2 of \d +not kept/);
    await session.settle();
    expect(readFileSync(file).equals(before)).toBe(true);
    session.press('s');
    await session.until(KEPT);
    expect(membersIn(file)).toEqual(twin.state().session.members.map(({ member }) => member));
    expect(readdirSync(dirname(file))).toEqual(['job.json', 'job.json.bak', 'job.json.lock']);
    expect(readFileSync(`${file}.bak`).equals(before)).toBe(true);

    // Kept: q leaves without a question, and the file opens again as it was left.
    session.press('q');
    expect(await session.exit()).toEqual(ENDED_WELL);
    expect(readdirSync(dirname(file))).toEqual(['job.json', 'job.json.bak']);
    const again = await opened(file);
    again.press('tab');
    const knobs = (screen: readonly string[]) => screen.slice(4, 16).map((row) => row.slice(3, 23));
    expect(knobs(await again.until(/2 of \d +kept/))).toEqual(knobs(twin.screen()));
  });

  test('leaving asks when something is not kept: stay, leave without, or keep and leave', async () => {
    const file = sampleCopy();
    const before = readFileSync(file, 'utf8');
    const session = await opened(file);
    session.press('right', 'q');
    await session.until('Not everything is kept');
    session.press('escape');
    await session.until((screen) => !screen.join('\n').includes('Not everything is kept'));
    await session.until(/► span +15'-3"/);
    session.press('q', 'd');
    expect(await session.exit()).toEqual(ENDED_WELL);
    expect(readFileSync(file, 'utf8')).toBe(before);

    const second = await opened(file);
    second.press('right', 'q', 's');
    expect(await second.exit()).toEqual(ENDED_WELL);
    // 15 ft and a nudge of 3 in.
    expect(membersIn(file)[0]!.beam.spans).toEqual([183]);
  });

  test('into a folder that is gone says so, keeps the work on the screen, and asks again on leaving', async () => {
    const file = sampleCopy();
    const session = await opened(file);
    session.press('right');
    await session.until('not kept');
    rmSync(dirname(file), { recursive: true });
    session.press('s');
    await session.until(/not kept: the folder .*is not/);
    const screen = await session.settle();
    expect(screen.join('\n')).toMatch(/► span +15'-3"/);
    expect(screen[0]).toMatch(/not kept$/);
    session.press('q');
    await session.until('Not everything is kept');
    session.press('s');
    await session.until(/not kept: the folder/);
    mkdirSync(dirname(file));
    session.press('s');
    await session.until(KEPT);
    expect(membersIn(file)[0]!.beam.spans).toEqual([183]);
  });

  test('into a folder that may not be written says so and keeps the work', async () => {
    const file = sampleCopy();
    chmodSync(dirname(file), 0o555);
    chmodSync(file, 0o444);
    const before = readFileSync(file, 'utf8');
    const state = mkdtempSync(join(tmpdir(), 'thrice-state-'));
    chmodSync(state, 0o777);
    const session = await opened(file, {
      program: PROGRAM_OF_NO_PRIVILEGE,
      columns: 120,
      rows: 36,
      env: { XDG_STATE_HOME: state },
    });
    session.press('right', 's');
    await session.until('not kept: ');
    const screen = await session.settle();
    expect(screen.at(-1)).toMatch(/not kept: .*may not be written|not kept: .*permission denied/);
    expect(screen.join('\n')).toMatch(/► span +15'-3"/);
    expect(screen[0]).toMatch(/not kept$/);
    expect(readFileSync(file, 'utf8')).toBe(before);
    // The journal stands where the program may write.
    await expect
      .poll(() => readdirSync(join(state, 'thrice')).filter((name) => /job\.json\.journal$/.test(name)))
      .toHaveLength(1);
    expect(readdirSync(dirname(file))).toEqual(['job.json']);
    chmodSync(dirname(file), 0o755);
  });
});

describe('without a file', () => {
  test('at most 8 keys besides digits lead to a sized beam, and s asks for a name', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'thrice-empty-'));
    const session = started([], { cwd: folder });
    await session.until('What is it part of?');
    const keys = ['1', ...'14', 'enter', ...'6', 'enter'];
    for (const key of keys) session.press(key);
    const screen = await session.until(/PASSES/);
    expect(keys.filter((key) => !/^\d$/.test(key)).length).toBeLessThanOrEqual(8);
    expect(screen.join('\n')).toMatch(/► span +14'-0"/);
    expect(screen.join('\n')).toMatch(/tributary +6'-0"/);
    // The lit size is the one at hand.
    expect(screen.some((row) => row.includes('●◆'))).toBe(true);
    expect(screen[0]).toMatch(/not kept$/);
    expect(readdirSync(folder)).toEqual([]);

    session.press('s');
    await session.until('keep as');
    session.press('enter');
    await session.until(KEPT);
    const [name] = readdirSync(folder);
    expect(membersIn(join(folder, name!))[0]!.beam.spans).toEqual([168]);

    // A name that is there already is not written over.
    session.press('q');
    expect(await session.exit()).toEqual(ENDED_WELL);
    const second = started([], { cwd: folder });
    await second.until('What is it part of?');
    second.press('2', ...'10', 'enter', ...'2', 'enter');
    await second.until(/PASSES|FAILS/);
    second.press('s', 'enter');
    await second.until('is there already');
    expect(membersIn(join(folder, name!))[0]!.beam.spans).toEqual([168]);
  });

  test('an answer that cannot be stays in its field with the reason, and Escape goes back a question', async () => {
    const session = started([]);
    await session.until('What is it part of?');
    session.press('1', ...'14 psf', 'enter');
    await session.until('"14 psf" is not a length');
    session.press('ctrl+u', ...'0', 'enter');
    await session.until(/from 1'-0" to/);
    session.press('escape', '2', ...'12', 'enter');
    await session.until(/12'-0"/);
  });

  test('a file that cannot be read is refused before the screen opens', async () => {
    const file = sampleCopy();
    const session = started([`${file}.not`]);
    expect(await session.exit()).toEqual({ ...ENDED_WELL, code: 2 });
    expect(session.text()).toContain('no such file');
    expect(session.written()).not.toContain('\x1b[?1049h');
    expect(existsSync(`${file}.not`)).toBe(false);
  });
});
