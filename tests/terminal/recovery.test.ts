import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { hostname } from 'node:os';
import { dirname } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readSession } from '../../src/session/index.ts';
import { BUNDLE } from '../support/bundle.ts';
import { opened, sampleCopy, started } from './explorer.ts';
import type { TerminalSession } from './harness.ts';

/**
 * How often the program is killed at random, a small share on every run;
 * `THRICE_KILLS=200 npx vitest run tests/terminal/recovery.test.ts` for all of it, which takes eight minutes.
 */
const KILLS = Number(process.env.THRICE_KILLS ?? 6);

const sleep = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Span of the first member, in, of a session file; throws where that does not open. */
function spanIn(file: string): number {
  const read = readSession(readFileSync(file, 'utf8'), file);
  if (!read.ok) throw new Error(read.fault);
  return read.session.members[0]!.member.beam.spans[0]!;
}

/** The span that the screen shows, in; null while it shows none. */
function spanShown(session: TerminalSession): number | null {
  const shown = /span +(\d+)'-(\d+)"/.exec(session.text());
  return shown === null ? null : Number(shown[1]) * 12 + Number(shown[2]);
}

/** What a killed program leaves: the newest of file and journal, both of which have to open. */
function spanLeft(file: string): number {
  const journal = `${file}.journal`;
  return Math.max(spanIn(file), existsSync(journal) ? spanIn(journal) : 0);
}

const RECOVERED = 'Changes that were not kept';

describe('killed at any moment', () => {
  test(
    `${KILLS} times while editing and keeping, the file opens and at most the last second is gone`,
    async () => {
      const SECOND = 1000;
      for (let turn = 0; turn < KILLS; turn += 1) {
        const file = sampleCopy();
        const session = await opened(file);
        let sent = 0;
        const seen: { readonly time: number; readonly span: number }[] = [];
        const end = performance.now() + 300 + Math.random() * 2200;
        let next = performance.now();
        while (performance.now() < end) {
          if (performance.now() >= next) {
            // Longer and longer by an inch, so that of two spans the larger is the newer; kept now and then, but not
            // so often that it would make up for a journal that is late.
            const key = Math.random() < 0.02 ? 's' : ']';
            session.press(key);
            if (key === ']') sent += 1;
            next = performance.now() + Math.random() * 90;
          }
          await sleep(5);
          const span = spanShown(session);
          if (span !== null) seen.push({ time: performance.now(), span });
        }
        if (Math.random() < 0.4) {
          session.press('s');
          await sleep(Math.random() * 60);
        }
        const killed = performance.now();
        session.signal('SIGKILL');
        await session.close();
        const shown = seen.filter(({ time }) => time <= killed - SECOND).at(-1)?.span ?? 180;
        expect(spanLeft(file), `turn ${turn}, shown a second before`).toBeGreaterThanOrEqual(shown);
        expect(spanLeft(file)).toBeLessThanOrEqual(180 + sent);
      }
    },
    20_000 + KILLS * 10_000,
  );
});

describe('what was not kept', () => {
  async function killedWhileEditing(file: string): Promise<void> {
    const session = await opened(file);
    session.press('right', 'right');
    await session.until(/span +15'-6"/);
    await expect.poll(() => existsSync(`${file}.journal`)).toBe(true);
    session.signal('SIGKILL');
    await session.close();
  }

  test('is offered by the next start, taken, and kept with s', async () => {
    const file = sampleCopy();
    const before = readFileSync(file, 'utf8');
    await killedWhileEditing(file);
    expect(readFileSync(file, 'utf8')).toBe(before);
    const session = started([file]);
    await session.until(RECOVERED);
    expect(session.text()).toMatch(/span: 15 ft → 15'-6"/);
    session.press('t');
    await session.until(/span +15'-6"/);
    expect(session.screen()[0]).toMatch(/not kept$/);
    session.press('s');
    await session.until(/^.*\d {2}kept$/m);
    expect(spanIn(file)).toBe(186);
    session.press('q');
    expect((await session.exit()).code).toBe(0);
    expect(readdirSync(dirname(file))).toEqual(['job.json', 'job.json.bak']);
  });

  test('stays for later when the question is left, and when the program is killed before it is answered', async () => {
    const file = sampleCopy();
    await killedWhileEditing(file);
    for (const end of ['q', 'SIGKILL', 'SIGTERM'] as const) {
      const session = started([file]);
      await session.until(RECOVERED);
      if (end === 'q') session.press('q');
      else session.signal(end);
      await session.exit();
      expect(spanLeft(file)).toBe(186);
    }
  });

  test('of a session without a file is offered by the next start without one', async () => {
    const { XDG_STATE_HOME } = { XDG_STATE_HOME: dirname(sampleCopy()) };
    const env = { XDG_STATE_HOME };
    const first = started([], { env });
    await first.until('What is it part of?');
    first.press('1', ...'14', 'enter', ...'6', 'enter');
    await first.until(/PASSES/);
    await expect.poll(() => readdirSync(`${XDG_STATE_HOME}/thrice`).length).toBe(2);
    first.signal('SIGKILL');
    await first.close();
    const second = started([], { env });
    await second.until(RECOVERED);
    second.press('t');
    await second.until(/span +14'-0"/);
    second.press('q', 'd');
    expect((await second.exit()).code).toBe(0);
    expect(readdirSync(`${XDG_STATE_HOME}/thrice`)).toEqual([]);
  });
});

describe('told to end', () => {
  test.each([
    ['SIGTERM', 143],
    ['SIGHUP', 129],
    ['SIGINT', 130],
  ] as const)('by %s it gives the terminal back, and has written the journal', async (signal, code) => {
    const file = sampleCopy();
    const session = await opened(file);
    session.press('right');
    await session.until(/span +15'-3"/);
    session.signal(signal);
    expect(await session.exit()).toEqual({ code, screenRestored: true, modesRestored: true });
    expect(spanIn(`${file}.journal`)).toBe(183);
    expect(existsSync(`${file}.lock`)).toBe(false);
  });

  test('by an error nobody caught likewise', async () => {
    const file = sampleCopy();
    const breaking = `process.on('SIGUSR2', () => setTimeout(() => { throw new Error('broken'); })); import(${JSON.stringify(BUNDLE)})`;
    const session = await opened(file, { program: [process.execPath, '-e', breaking, BUNDLE] });
    session.press('right');
    await session.until(/span +15'-3"/);
    session.signal('SIGUSR2');
    expect(await session.exit()).toEqual({ code: 1, screenRestored: true, modesRestored: true });
    expect(session.text()).toContain('stopped by a fault of its own: broken');
    expect(spanIn(`${file}.journal`)).toBe(183);
  });

  test('by the user’s leave not to keep it leaves nothing behind', async () => {
    const file = sampleCopy();
    const session = await opened(file);
    session.press('right');
    await session.until(/span +15'-3"/);
    session.press('q', 'd');
    await session.exit();
    expect(readdirSync(dirname(file))).toEqual(['job.json']);
  });
});

describe('not alone', () => {
  test('a second one on the same file says so, is read-only, and keeps under another name', async () => {
    const file = sampleCopy();
    const first = await opened(file);
    const second = await opened(file, { columns: 120, rows: 36 });
    expect(second.screen().at(-1)).toContain(
      `open elsewhere (process ${first.pid()} on ${hostname()}): read-only`,
    );
    second.press('right', 's');
    await second.until(/not kept: .*open elsewhere/);
    second.press('A', 'enter');
    await second.until(/^.*\d {3}kept$/m);
    expect(spanIn(file.replace('.json', '-2.json'))).toBe(183);
    expect(spanIn(file)).toBe(180);
    first.press('q');
    await first.exit();
    expect(existsSync(`${file}.lock`)).toBe(false);
  });

  test('a file that somebody else has written meanwhile is noticed, and both are kept', async () => {
    const file = sampleCopy();
    const session = await opened(file);
    session.press('right');
    await session.until(/span +15'-3"/);
    const theirs = readFileSync(file, 'utf8').replace('Boathouse', 'Theirs: boathouse');
    writeFileSync(file, theirs);
    session.press('s');
    await session.until('changed by somebody else');
    expect(readFileSync(file, 'utf8')).toBe(theirs);
    session.press('o');
    await session.until(/^.*\d {2}kept$/m);
    expect(spanIn(file)).toBe(183);
    expect(readFileSync(`${file}.bak`, 'utf8')).toBe(theirs);
  });
});

describe('nothing written', () => {
  test('--read-only leaves the folder as it was, and is left without a question', async () => {
    const file = sampleCopy();
    const before = readFileSync(file, 'utf8');
    const session = started(['--read-only', file]);
    await session.until(/read-only$/m);
    session.press('right', 's');
    await session.until('writes nothing');
    await session.settle(800);
    session.press('q');
    expect((await session.exit()).code).toBe(0);
    expect(readdirSync(dirname(file))).toEqual(['job.json']);
    expect(readFileSync(file, 'utf8')).toBe(before);
  });

  test('a disk that takes no more leaves the file, says why, and the work goes on', async () => {
    const file = sampleCopy();
    const before = readFileSync(file, 'utf8');
    const full = `const fs = require('fs'); const { writeSync } = fs; fs.writeSync = (to, bytes, at) => {
      if (at > 0) throw Object.assign(new Error('full'), { code: 'ENOSPC' });
      return writeSync(to, bytes, 0, 1000);
    }; require('module').syncBuiltinESMExports(); import(${JSON.stringify(BUNDLE)})`;
    const program = [process.execPath, '-e', full, BUNDLE];
    const session = await opened(file, { program, columns: 120, rows: 36 });
    session.press('right');
    await session.until('no recovery journal: it does not fit: the disk is full');
    session.press('s');
    await session.until(/not kept: .*disk is full; A keeps it elsewhere/);
    expect(readFileSync(file, 'utf8')).toBe(before);
    expect(readdirSync(dirname(file))).toEqual(['job.json', 'job.json.lock']);
    expect(session.screen()[0]).toMatch(/not kept$/);
    expect(session.text()).toMatch(/span +15'-3"/);
  });
});
