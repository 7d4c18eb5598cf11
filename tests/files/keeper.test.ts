import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  symlinkSync,
  utimesSync,
  writeFileSync,
} from 'node:fs';
import { hostname, tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { type Keeper, type KeeperOptions, openKeeper } from '../../src/files/keeper.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import type { Session } from '../../src/session/session.ts';
import { sessionText } from '../support/session.ts';
import { failing } from './failing-disk.ts';

vi.mock('node:fs', async (original) => (await import('./failing-disk.ts')).onFailingDisk(await original()));

function sessionOf(text: string): Session | null {
  const read = readSession(text, 'job.json');
  return read.ok ? read.session : null;
}

const TEXT = sessionText({ name: 'G1' });
const session = sessionOf(TEXT)!;
const titled = (title: string): Session => ({ ...session, title });

let folder = '';
let file = '';
let state = '';
let keepers: Keeper[] = [];
beforeEach(() => {
  vi.useFakeTimers();
  folder = mkdtempSync(join(tmpdir(), 'thrice-keeper-'));
  state = join(mkdtempSync(join(tmpdir(), 'thrice-state-')), 'thrice');
  file = join(folder, 'job.json');
  writeFileSync(file, TEXT);
  keepers = [];
});
afterEach(() => {
  failing.stop();
  for (const keeper of keepers) keeper.close();
  vi.useRealTimers();
});

function opened(options: Partial<KeeperOptions> = {}): Keeper {
  const keeper = openKeeper({
    file,
    text: file !== null && existsSync(file) ? readFileSync(file, 'utf8') : '',
    readOnly: false,
    stateFolder: state,
    read: sessionOf,
    ...options,
  });
  keepers.push(keeper);
  return keeper;
}

const save = (keeper: Keeper, what: Session, over = false) =>
  keeper.save({ file, session: what, fresh: false, over });
const saveAs = (keeper: Keeper, name: string, what: Session) =>
  keeper.save({ file: name, session: what, fresh: true, over: false });
/** Long enough for the journal, whatever it waits for. */
const aSecond = () => vi.advanceTimersByTime(1000);
const titleIn = (name: string) => sessionOf(readFileSync(name, 'utf8'))?.title;
/** The process ends here without another word: nothing waits to be written, and a lock that stays is stale. */
function killed(keeper: Keeper): void {
  vi.clearAllTimers();
  keeper.close();
}

describe('keeping a file', () => {
  it('writes the file on save alone, the version before stays as .bak, and nothing else is left', () => {
    const keeper = opened();
    keeper.note(titled('One'));
    aSecond();
    expect(readFileSync(file, 'utf8')).toBe(TEXT);
    expect(save(keeper, titled('One'))).toEqual({ kind: 'saved' });
    expect(titleIn(file)).toBe('One');
    expect(readFileSync(`${file}.bak`, 'utf8')).toBe(TEXT);
    expect(save(keeper, titled('Two'))).toEqual({ kind: 'saved' });
    expect(titleIn(`${file}.bak`)).toBe('One');
    keeper.close();
    expect(readdirSync(folder)).toEqual(['job.json', 'job.json.bak']);
    expect(existsSync(state)).toBe(false);
  });

  it('stopped before any step of the system loses nothing: the newest work is in the file or in the journal', () => {
    let outcome = 'died';
    let steps = 0;
    for (; outcome !== 'saved'; steps += 1) {
      rmSync(`${file}.journal`, { force: true });
      writeFileSync(file, TEXT);
      const keeper = opened();
      keeper.note(titled('One'));
      aSecond();
      failing.dieAfter({ steps });
      outcome = save(keeper, titled('One')).kind;
      if (failing.stop() === steps) outcome = 'died';
      killed(keeper);

      expect([TEXT, writeSession(titled('One'))]).toContain(readFileSync(file, 'utf8'));
      const next = opened();
      expect(titleIn(file) === 'One' || next.recovered?.session.title === 'One', `${steps} steps`).toBe(true);
      // Never is what the file holds already, or something older, offered as lost.
      if (titleIn(file) === 'One') expect(next.recovered).toBeNull();
      killed(next);
    }
    expect(steps).toBeGreaterThan(20);
  });

  it('notices what somebody else has written, and keeps both', () => {
    const keeper = opened();
    writeFileSync(file, writeSession(titled('Theirs')));
    expect(save(keeper, titled('Mine'))).toEqual({ kind: 'changed' });
    expect(titleIn(file)).toBe('Theirs');
    expect(save(keeper, titled('Mine'), true)).toEqual({ kind: 'saved' });
    expect(titleIn(file)).toBe('Mine');
    expect(titleIn(`${file}.bak`)).toBe('Theirs');
    // What it wrote itself is no change by somebody else.
    expect(save(keeper, titled('Mine again'))).toEqual({ kind: 'saved' });
  });

  it('says what the disk says, keeps the file, and keeps the work elsewhere', () => {
    const keeper = opened();
    failing.fullAfter(100);
    const full = save(keeper, titled('Mine'));
    expect(full).toEqual({
      kind: 'failed',
      reason: expect.stringMatching(/^not kept: .*disk is full; A keeps it elsewhere$/),
    });
    failing.stop();
    expect(readFileSync(file, 'utf8')).toBe(TEXT);

    renameSync(folder, `${folder}-gone`);
    expect(save(keeper, titled('Mine'))).toEqual({
      kind: 'failed',
      reason: `not kept: the folder ${folder} is not there; A keeps it elsewhere`,
    });
    const other = join(`${folder}-gone`, 'other.json');
    expect(saveAs(keeper, other, titled('Mine'))).toEqual({ kind: 'saved' });
    expect(titleIn(other)).toBe('Mine');
  });

  it('into a folder that comes back works again, with its lock', () => {
    const keeper = opened();
    rmSync(folder, { recursive: true });
    expect(save(keeper, titled('One')).kind).toBe('failed');
    mkdirSync(folder);
    expect(save(keeper, titled('One'))).toEqual({ kind: 'saved' });
    expect(readdirSync(folder)).toEqual(['job.json', 'job.json.lock']);
  });

  it('under another name writes over nothing, and goes on there', () => {
    const keeper = opened();
    keeper.note(titled('One'));
    aSecond();
    const taken = join(folder, 'taken.json');
    writeFileSync(taken, 'mine');
    expect(saveAs(keeper, taken, titled('One'))).toEqual({
      kind: 'failed',
      reason: `${taken} is there already: choose another name`,
    });
    const other = join(folder, 'other.json');
    expect(saveAs(keeper, other, titled('One'))).toEqual({ kind: 'saved' });
    expect(readdirSync(folder)).toEqual(['job.json', 'other.json', 'other.json.lock', 'taken.json']);
    expect(keeper.save({ file: other, session: titled('Two'), fresh: false, over: false }).kind).toBe(
      'saved',
    );
    expect(titleIn(other)).toBe('Two');
    expect(readFileSync(file, 'utf8')).toBe(TEXT);
  });

  it('that came through a pipe cannot write back, and says where it can', () => {
    const keeper = opened({ file: '/dev/null', text: TEXT });
    expect(keeper.save({ file: '/dev/null', session, fresh: false, over: false })).toEqual({
      kind: 'failed',
      reason: 'not kept: /dev/null is no ordinary file; A keeps it elsewhere',
    });
    expect(existsSync('/dev/null.lock')).toBe(false);
  });
});

describe('the recovery journal', () => {
  const journal = () => `${file}.journal`;

  it('is there within the second of a change, and follows changes that do not pause', () => {
    const keeper = opened();
    keeper.note(titled('One'));
    aSecond();
    expect(titleIn(journal())).toBe('One');
    for (let at = 0; at < 40; at += 1) {
      keeper.note(titled(`held ${at}`));
      vi.advanceTimersByTime(33);
      const noted = Number(/\d+/.exec(titleIn(journal()) ?? '')?.[0] ?? 0);
      expect(at - noted).toBeLessThan(1000 / 33);
    }
  });

  it('goes once nothing is to be kept', () => {
    const keeper = opened();
    keeper.note(titled('One'));
    aSecond();
    keeper.note(null);
    expect(existsSync(journal())).toBe(false);
    aSecond();
    expect(existsSync(journal())).toBe(false);
  });

  it('holds what was noted last when the program is told to end', () => {
    const keeper = opened();
    keeper.note(titled('One'));
    keeper.close();
    expect(titleIn(journal())).toBe('One');
    expect(existsSync(`${file}.lock`)).toBe(false);
  });

  it('is offered by the next start, and stays until somebody has answered', () => {
    const first = opened();
    first.note(titled('One'));
    first.close();
    const second = opened();
    expect(second.recovered).toMatchObject({ session: { title: 'One' }, isOlder: false });
    second.close();
    expect(opened().recovered?.session.title).toBe('One');
  });

  it.each([
    ['take', ['job.json', 'job.json.journal', 'job.json.lock']],
    ['drop', ['job.json', 'job.json.lock']],
    ['set aside', ['job.json', 'job.json.lock', 'job.json.recovered']],
  ] as const)('that is answered with %s leaves its folder so', (answer, left) => {
    const first = opened();
    first.note(titled('One'));
    first.close();
    const second = opened();
    second.answer(answer);
    expect(readdirSync(folder)).toEqual(left);
    // What is done now is noted again, and does not touch what was set aside.
    second.note(titled('Two'));
    aSecond();
    expect(titleIn(journal())).toBe('Two');
    if (answer === 'set aside') expect(titleIn(`${file}.recovered`)).toBe('One');
  });

  it('that says what the file says is not offered', () => {
    writeFileSync(journal(), TEXT);
    expect(opened().recovered).toBeNull();
    expect(existsSync(journal())).toBe(false);
  });

  it('that cannot be read is told of and kept', () => {
    writeFileSync(journal(), '{ "thrice": 1');
    const keeper = opened();
    expect(keeper.recovered).toBeNull();
    expect(keeper.notice).toBe(`the recovery journal cannot be read; it stays as ${file}.recovered`);
    expect(readFileSync(`${file}.recovered`, 'utf8')).toBe('{ "thrice": 1');
  });

  it('older than the file says so', () => {
    const first = opened();
    first.note(titled('One'));
    first.close();
    const LATER = new Date('2099-01-01');
    writeFileSync(file, writeSession(titled('Theirs')));
    utimesSync(file, LATER, LATER);
    expect(opened().recovered?.isOlder).toBe(true);
  });

  it('goes to the folder for state where the file’s own is gone, and is found there', () => {
    const keeper = opened();
    const moved = `${folder}-gone`;
    renameSync(folder, moved);
    keeper.note(titled('One'));
    aSecond();
    expect(readdirSync(state).filter((name) => name.endsWith('job.json.journal'))).toHaveLength(1);
    renameSync(moved, folder);
    keeper.close();
    expect(opened().recovered?.session.title).toBe('One');
  });

  it('that cannot be written is told of once, until it can be again', () => {
    const keeper = opened();
    const told: string[] = [];
    keeper.listen((reason) => told.push(reason));
    failing.fullAfter(10);
    keeper.note(titled('One'));
    aSecond();
    keeper.note(titled('Two'));
    aSecond();
    expect(told).toEqual(['no recovery journal: it does not fit: the disk is full']);
    failing.stop();
    keeper.note(titled('Three'));
    aSecond();
    expect(titleIn(journal())).toBe('Three');
    failing.fullAfter(10);
    keeper.note(titled('Four'));
    aSecond();
    expect(told).toHaveLength(2);
  });

  it('of a session without a file waits in the folder for state, for the next start without one', () => {
    const first = opened({ file: null });
    expect(existsSync(state)).toBe(false);
    first.note(titled('Untitled'));
    aSecond();
    // While that program runs it is its own.
    expect(readdirSync(state)).toHaveLength(2);
    first.close();
    const second = opened({ file: null });
    expect(second.recovered?.session.title).toBe('Untitled');
    second.answer('take');
    expect(saveAs(second, join(folder, 'new.json'), titled('Untitled'))).toEqual({ kind: 'saved' });
    expect(readdirSync(state)).toEqual([]);
  });
});

describe('a file that is open elsewhere', () => {
  beforeEach(() => {
    // The process that runs the tests' runner is alive as long as they are.
    writeFileSync(`${file}.lock`, JSON.stringify({ pid: process.ppid, host: hostname(), began: null }));
  });

  it('is read-only here, with its process named, and can be kept under another name', () => {
    writeFileSync(`${file}.journal`, writeSession(titled('Theirs')));
    const keeper = opened();
    expect(keeper.readOnly).toBe('open elsewhere');
    expect(keeper.notice).toContain(`open elsewhere (process ${process.ppid} on ${hostname()})`);
    expect(keeper.recovered).toBeNull();
    keeper.note(titled('Mine'));
    aSecond();
    expect(titleIn(`${file}.journal`)).toBe('Theirs');
    expect(save(keeper, titled('Mine')).kind).toBe('failed');
    expect(readFileSync(file, 'utf8')).toBe(TEXT);
    const other = join(folder, 'mine.json');
    expect(saveAs(keeper, other, titled('Mine'))).toEqual({ kind: 'saved' });
    expect(keeper.readOnly).toBeNull();
    keeper.note(titled('Mine too'));
    aSecond();
    expect(titleIn(`${other}.journal`)).toBe('Mine too');
    keeper.close();
    expect(titleIn(`${file}.journal`)).toBe('Theirs');
    expect(existsSync(`${file}.lock`)).toBe(true);
  });

  it('on another machine says what to do where that has left it behind', () => {
    writeFileSync(`${file}.lock`, JSON.stringify({ pid: 12, host: 'far', began: null }));
    expect(opened().notice).toBe(
      'open elsewhere (process 12 on far; if it is not, remove job.json.lock): read-only, A keeps a copy',
    );
  });

  it('is noticed through a link too', () => {
    symlinkSync(file, join(folder, 'link.json'));
    expect(opened({ file: join(folder, 'link.json') }).readOnly).toBe('open elsewhere');
  });
});

describe('--read-only', () => {
  it('writes nothing: no file, no journal, no lock', () => {
    chmodSync(folder, 0o755);
    const keeper = opened({ readOnly: true });
    keeper.note(titled('Mine'));
    aSecond();
    expect(save(keeper, titled('Mine'))).toMatchObject({ kind: 'failed' });
    expect(saveAs(keeper, join(folder, 'other.json'), titled('Mine'))).toMatchObject({ kind: 'failed' });
    keeper.close();
    expect(readdirSync(folder)).toEqual(['job.json']);
    expect(existsSync(state)).toBe(false);
  });

  it('says that there is work to recover, and leaves it', () => {
    writeFileSync(`${file}.journal`, writeSession(titled('Lost')));
    const keeper = opened({ readOnly: true });
    expect(keeper.recovered).toBeNull();
    expect(keeper.notice).toContain('open it without --read-only');
    expect(titleIn(`${file}.journal`)).toBe('Lost');
  });
});
