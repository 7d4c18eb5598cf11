import { linkSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { hostname } from 'node:os';
import { codeOf, remove } from './write-whole.ts';

/** Who has a file open. */
export interface Holder {
  readonly pid: number;
  readonly host: string;
  /** When the process began, by the system's own count: a number is given to another process later. */
  readonly began: string | null;
}

export type LockTry =
  | { readonly kind: 'taken'; readonly release: () => void }
  | { readonly kind: 'held'; readonly by: Holder | null }
  /** No lock can be kept there: the folder may not be written or is gone. */
  | { readonly kind: 'impossible' };

export const lockOf = (file: string): string => `${file}.lock`;

/**
 * Takes the lock of a file: a file beside it that names this process. One whose process has ended (killed, or the
 * machine went down) is stale and is taken over; whether one of another machine is, nobody here can tell.
 */
export function takeLock(file: string): LockTry {
  const lock = lockOf(file);
  const me = JSON.stringify(holderOf(process.pid));
  const taken: LockTry = {
    kind: 'taken',
    release: () => {
      if (textOf(lock) === me) remove(lock);
    },
  };
  for (let tries = 0; tries < MOST_TRIES; tries += 1) {
    const error = putLock(lock, me);
    if (error === null) return taken;
    if (error !== 'EEXIST') return { kind: 'impossible' };
    const text = textOf(lock);
    if (text === me) return taken;
    if (text === null) continue;
    const by = readHolder(text);
    if (by !== null && isAlive(by)) return { kind: 'held', by };
    takeAway(lock, text);
  }
  return { kind: 'held', by: null };
}

/** Others may come and go meanwhile. */
const MOST_TRIES = 5;

/** Puts the lock there in one step, with its text; gives the system's code where that fails. */
function putLock(lock: string, text: string): string | null {
  const own = `${lock}.${process.pid}`;
  try {
    writeFileSync(own, text);
    try {
      linkSync(own, lock);
    } catch (error) {
      // A disk without links.
      if (codeOf(error) === 'EEXIST') throw error;
      writeFileSync(lock, text, { flag: 'wx' });
    }
    return null;
  } catch (error) {
    return codeOf(error) ?? 'unknown';
  } finally {
    remove(own);
  }
}

/** Removes a stale lock, and no other that somebody has put there since. */
function takeAway(lock: string, text: string): void {
  const aside = `${lock}.${process.pid}.stale`;
  try {
    renameSync(lock, aside);
    if (textOf(aside) !== text) linkSync(aside, lock);
  } catch {}
  remove(aside);
}

function textOf(file: string): string | null {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return null;
  }
}

function holderOf(pid: number): Holder {
  return { pid, host: hostname(), began: statusOf(pid)?.began ?? null };
}

/** null: the text is none of this program's, as one cut short; nobody holds a file by it. */
function readHolder(text: string): Holder | null {
  try {
    const { pid, host, began } = JSON.parse(text) as Partial<Holder>;
    if (!Number.isInteger(pid) || pid! <= 0 || typeof host !== 'string') return null;
    return { pid: pid!, host, began: typeof began === 'string' ? began : null };
  } catch {
    return null;
  }
}

function isAlive({ pid, host, began }: Holder): boolean {
  if (host !== hostname()) return true;
  try {
    process.kill(pid, 0);
  } catch (error) {
    // Not permitted: it is there, and somebody else's.
    if (codeOf(error) !== 'EPERM') return false;
  }
  const now = statusOf(pid);
  // Killed, and nobody has asked how it ended.
  if (now !== null && ENDED.includes(now.state)) return false;
  return began === null || now === null || began === now.began;
}

/** Zombie, dead (proc(5)). */
const ENDED = ['Z', 'X', 'x'];
/** The start of a process in clock ticks since the machine's, counted from its state. */
const START_FIELD = 19;

/** What Linux knows of a process; null on other systems, and where there is none. */
function statusOf(pid: number): { readonly state: string; readonly began: string } | null {
  const text = textOf(`/proc/${pid}/stat`);
  // The name before it may hold blanks and brackets.
  const fields = text?.slice(text.lastIndexOf(')') + 2).split(' ');
  return fields === undefined ? null : { state: fields[0]!, began: fields[START_FIELD]! };
}
