import { createHash } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, renameSync, statSync } from 'node:fs';
import { hostname } from 'node:os';
import { basename, dirname, join } from 'node:path';
import { remove, writeWhole } from './write-whole.ts';

/**
 * The recovery journal of a file: the session as it stood within the last second, as the text of a session file, so
 * that it can be opened like one. It stands beside the file, or where that folder may not be written in the folder that
 * the system keeps for a program's own state.
 */
export interface Journal {
  /** Where it may stand, the best first; empty where there is no place for it. */
  readonly places: readonly string[];
}

const journalOf = (file: string): string => `${file}.journal`;

export function journalBeside(file: string, stateFolder: string | null): Journal {
  const beside = journalOf(file);
  if (stateFolder === null) return { places: [beside] };
  // Files of one name in several folders have journals of their own.
  const id = createHash('sha256').update(file).digest('hex').slice(0, 16);
  return { places: [beside, journalOf(join(stateFolder, `${id}-${basename(file)}`))] };
}

/** What a session without a file is called in the folder for state; its lock has that name too. */
const UNTITLED = 'untitled';

export function untitledIn(stateFolder: string): string {
  return join(stateFolder, `${UNTITLED}-${hostname()}-${process.pid}`);
}

export function untitledJournal(base: string): Journal {
  return { places: [journalOf(base)] };
}

/** The sessions without a file that have a journal, whosever they are; the newest first. */
export function untitledWithJournal(stateFolder: string): string[] {
  try {
    return readdirSync(stateFolder)
      .filter((name) => name.startsWith(`${UNTITLED}-`) && name.endsWith(journalOf('')))
      .map((name) => join(stateFolder, name.slice(0, -journalOf('').length)))
      .sort((one, other) => (writtenAt(journalOf(other)) ?? 0) - (writtenAt(journalOf(one)) ?? 0));
  } catch {
    return [];
  }
}

export interface Written {
  readonly place: string;
  readonly text: string;
  /** ms since 1970, by the disk's clock. */
  readonly time: number;
}

/** The newest journal that is there; null where none is. */
export function readJournal({ places }: Journal): Written | null {
  const found = places.flatMap((place): Written[] => {
    try {
      return [{ place, text: readFileSync(place, 'utf8'), time: statSync(place).mtimeMs }];
    } catch {
      return [];
    }
  });
  return found.sort((one, other) => other.time - one.time)[0] ?? null;
}

/** Writes it at the first place that takes it, and leaves no older one elsewhere; throws the first place's error. */
export function writeJournal({ places }: Journal, text: string, like?: string): void {
  let first: unknown = null;
  for (const place of places) {
    try {
      // The folder for state is made when it is first needed; that of a file is not, it was there.
      if (place !== places[0] || places.length === 1) makeFolderOf(place);
      writeWhole(place, text, { quick: true, ...(like === undefined ? {} : { like }) });
      for (const other of places) if (other !== place) remove(other);
      return;
    } catch (error) {
      first ??= error;
    }
  }
  throw first ?? Object.assign(new Error('no place'), { code: 'ENOENT' });
}

/** Makes the folder that a name is in, for this user alone. */
export function makeFolderOf(name: string): void {
  mkdirSync(dirname(name), { recursive: true, mode: 0o700 });
}

export function removeJournal({ places }: Journal): void {
  for (const place of places) remove(place);
}

/** Gives the journal a name of its own, where no other one takes its place; null where that cannot be done. */
export function setJournalAside(journal: Journal): string | null {
  const written = readJournal(journal);
  if (written === null) return null;
  const stem = written.place.slice(0, -journalOf('').length);
  for (let count = 1; count <= MOST_ASIDE; count += 1) {
    const name = `${stem}.recovered${count === 1 ? '' : `-${count}`}`;
    if (writtenAt(name) !== null) continue;
    try {
      renameSync(written.place, name);
      return name;
    } catch {
      return null;
    }
  }
  return null;
}

const MOST_ASIDE = 999;

function writtenAt(file: string): number | null {
  try {
    return statSync(file).mtimeMs;
  } catch {
    return null;
  }
}
