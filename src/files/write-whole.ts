import {
  chmodSync,
  chownSync,
  closeSync,
  existsSync,
  fsyncSync,
  linkSync,
  openSync,
  realpathSync,
  renameSync,
  rmSync,
  type Stats,
  statSync,
  writeFileSync,
  writeSync,
} from 'node:fs';
import { dirname, resolve } from 'node:path';

interface WriteOptions {
  /** Refuses (EEXIST) to take the place of a file that is there. */
  readonly fresh?: boolean;
  /** Does not wait for the folder: after a power cut the version before may stand in its place, as whole. */
  readonly quick?: boolean;
  /** Whose owner and permissions the file gets; by default its own, where it is there. */
  readonly like?: string;
}

/** Where a file is written until it is whole. One at a time: who holds the file's lock owns this name too. */
export const unfinishedOf = (file: string): string => `${file}.new`;

/**
 * Writes a file whole or not at all, whenever the program or the machine stops: all of it to another name beside it,
 * down to the disk, then in one step under its own name. Throws the system's error; the file is then as it was. What is
 * no plain file (a pipe, a device) is written to as it is.
 */
export function writeWhole(file: string, content: string | Uint8Array, options: WriteOptions = {}): void {
  const whole = throughLinks(file);
  const there = statOf(whole);
  if (there?.isCharacterDevice() || there?.isFIFO()) {
    writeFileSync(whole, content);
    return;
  }
  const unfinished = unfinishedOf(whole);
  try {
    writeAll(unfinished, content, options.like === undefined ? there : statOf(options.like));
    if (options.fresh === true) putInFreePlace(unfinished, whole);
    else renameSync(unfinished, whole);
  } catch (error) {
    remove(unfinished);
    throw error;
  }
  if (options.quick !== true) syncFolder(dirname(whole));
}

/** The file that a name leads to; the whole path of the name where there is none yet. */
export function throughLinks(name: string): string {
  try {
    return realpathSync(name);
  } catch {
    return resolve(name);
  }
}

function writeAll(file: string, content: string | Uint8Array, like: Stats | null): void {
  // Whatever has that name is left over, and is not written into: it might be a link to elsewhere.
  rmSync(file, { force: true });
  const to = openSync(file, 'wx', like === null ? 0o666 : like.mode & 0o777);
  try {
    const bytes = typeof content === 'string' ? Buffer.from(content) : content;
    // A disk that fills up takes a part and says so with the next write alone.
    for (let at = 0; at < bytes.length; ) at += writeSync(to, bytes, at);
    fsyncSync(to);
  } finally {
    closeSync(to);
  }
  if (like !== null) takeAfter(file, like);
}

/** Only root may give a file away, and some disks know no permissions: the file is written all the same. */
function takeAfter(file: string, { uid, gid, mode }: Stats): void {
  try {
    if (process.getuid?.() === 0) chownSync(file, uid, gid);
    chmodSync(file, mode & 0o777);
  } catch {}
}

/** A link fails where the name is taken, however short a time ago; not every disk has links. */
function putInFreePlace(from: string, to: string): void {
  try {
    linkSync(from, to);
  } catch (error) {
    if (codeOf(error) === 'EEXIST' || existsSync(to)) throw errorOf('EEXIST');
    renameSync(from, to);
    return;
  }
  remove(from);
}

/** The new name is on the disk only once the folder is. Some systems cannot be asked for that. */
function syncFolder(folder: string): void {
  try {
    const handle = openSync(folder, 'r');
    try {
      fsyncSync(handle);
    } finally {
      closeSync(handle);
    }
  } catch {}
}

/** Removes a file if it is there and may be removed. */
export function remove(file: string): void {
  try {
    rmSync(file, { force: true });
  } catch {}
}

export function codeOf(error: unknown): string | undefined {
  return (error as NodeJS.ErrnoException).code;
}

function errorOf(code: string): NodeJS.ErrnoException {
  return Object.assign(new Error(code), { code });
}

function statOf(file: string): Stats | null {
  try {
    return statSync(file);
  } catch {
    return null;
  }
}
