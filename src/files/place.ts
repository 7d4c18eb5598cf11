import { statSync } from 'node:fs';
import {
  type Journal,
  journalBeside,
  makeFolderOf,
  untitledIn,
  untitledJournal,
  untitledWithJournal,
} from './journal.ts';
import { type LockTry, takeLock } from './lock.ts';
import { remove, throughLinks, unfinishedOf } from './write-whole.ts';

/** Where a session is kept. */
export interface Place {
  /** The file, by its whole path and through all links; null where it has none. */
  readonly file: string | null;
  readonly journal: Journal;
  /** What the locks are of, the best first. */
  readonly locked: readonly string[];
}

/** The version before the last save. */
export const backupOf = (file: string): string => `${file}.bak`;

/** A place, and what came of taking its lock. */
export interface Opened {
  readonly place: Place;
  readonly lock: LockTry;
}

/** Where a file is kept, with its lock taken where that can be. */
export function openFile(name: string, stateFolder: string | null): Opened {
  const file = throughLinks(name);
  // A pipe or a device has nothing beside it, and cannot be written back to.
  if (!isOrdinary(file)) return newUntitled(stateFolder);
  const place = placeOf(file, stateFolder);
  const lock = firstLock(place.locked);
  // What a killed program had not finished.
  if (lock.kind === 'taken') {
    for (const each of [file, backupOf(file), ...place.journal.places]) remove(unfinishedOf(each));
  }
  return { place, lock };
}

/** The newest session without a file that a program left behind, else a new one. */
export function openUntitled(stateFolder: string | null): Opened {
  for (const base of stateFolder === null ? [] : untitledWithJournal(stateFolder)) {
    const lock = takeLock(base);
    if (lock.kind === 'taken') return { place: untitledPlace(base), lock };
  }
  return newUntitled(stateFolder);
}

/** Its lock is taken with the first thing worth a journal: until then nothing is written. */
function newUntitled(stateFolder: string | null): Opened {
  const place =
    stateFolder === null
      ? { file: null, journal: { places: [] }, locked: [] }
      : untitledPlace(untitledIn(stateFolder));
  return { place, lock: { kind: 'impossible' } };
}

function untitledPlace(base: string): Place {
  return { file: null, journal: untitledJournal(base), locked: [base] };
}

export function placeOf(file: string, stateFolder: string | null): Place {
  const journal = journalBeside(file, stateFolder);
  return { file, journal, locked: [file, ...journal.places.slice(1)] };
}

/** The lock of the file; in the folder for state where the file's own may not be written. */
function firstLock([beside, inState]: readonly string[]): LockTry {
  const lock = takeLock(beside!);
  if (lock.kind !== 'impossible' || inState === undefined) return lock;
  try {
    makeFolderOf(inState);
  } catch {
    return lock;
  }
  return takeLock(inState);
}

function isOrdinary(file: string): boolean {
  try {
    return statSync(file).isFile();
  } catch {
    return false;
  }
}
