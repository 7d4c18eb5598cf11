import { accessSync, constants, existsSync, readFileSync, statSync } from 'node:fs';
import { hostname } from 'node:os';
import { basename, dirname, resolve } from 'node:path';
import { harmless } from '../quantity/index.ts';
import { writeSession } from '../session/index.ts';
import type { Session } from '../session/session.ts';
import { makeFolderOf, readJournal, removeJournal, setJournalAside, writeJournal } from './journal.ts';
import { type Holder, lockOf, takeLock } from './lock.ts';
import { backupOf, openFile, openUntitled, type Place, placeOf } from './place.ts';
import { whyNot } from './why.ts';
import { codeOf, throughLinks, writeWhole } from './write-whole.ts';

/** Keeps the session of the explorer: its file, the recovery journal, the lock. */
export interface Keeper {
  /** Why the file is not written; null where it is. */
  readonly readOnly: ReadOnly | null;
  /** What to say at the start; null for nothing. */
  readonly notice: string | null;
  /** What was not kept when the program last ended; null where all was. */
  readonly recovered: Recovered | null;
  save(wanted: SaveWanted): SaveOutcome;
  /** Notes a session for the journal, which is written within the second; null: the file holds all of it. */
  note(session: Session | null): void;
  /** Answers what is to become of what was recovered; says what has been done where that needs saying. */
  answer(answer: RecoveredAnswer): string | null;
  /** Tells whoever listens why the journal cannot be written, once each time that begins. */
  listen(listener: (reason: string) => void): void;
  /** Writes the journal where it is behind, and gives the file back. */
  close(): void;
}

/** Asked for, or because another process has the file open. */
export type ReadOnly = 'asked' | 'open elsewhere';

export interface Recovered {
  readonly session: Session;
  /** ms since 1970 */
  readonly time: number;
  /** The file was written after it, so by somebody else. */
  readonly isOlder: boolean;
}

export type RecoveredAnswer = 'take' | 'drop' | 'set aside';

export interface SaveWanted {
  readonly file: string;
  readonly session: Session;
  /** A new file: refused where one is there. */
  readonly fresh: boolean;
  /** Also over what somebody else has written meanwhile; that stays as the backup. */
  readonly over: boolean;
}

export type SaveOutcome =
  | { readonly kind: 'saved' }
  /** Somebody else has written the file since it was read: nothing has been written. */
  | { readonly kind: 'changed' }
  /** One line. */
  | { readonly kind: 'failed'; readonly reason: string };

export interface KeeperOptions {
  /** null: a session without a file. */
  readonly file: string | null;
  /** The text that was read from the file. */
  readonly text: string;
  /** Nothing at all is written. */
  readonly readOnly: boolean;
  /** Where the journal goes that cannot stand beside its file; null: nowhere. */
  readonly stateFolder: string | null;
  /** The session of a journal's text; null where it cannot be read. */
  readonly read: (text: string) => Session | null;
}

/** Why --read-only keeps nothing. */
export const NOT_WRITTEN = 'not kept: opened with --read-only, which writes nothing';

/** The journal is written once no change has come for the first, at the latest after the second; ms. */
const QUIET = 150;
const LATEST = 600;

export function openKeeper(options: KeeperOptions): Keeper {
  if (options.readOnly) return readOnlyKeeper(options);
  return new FileKeeper(options);
}

class FileKeeper implements Keeper {
  readonly recovered: Recovered | null;
  private told: string | null = null;
  private place: Place;
  private readonly stateFolder: string | null;
  /** What the file holds as far as is known; null: it was not there. */
  private known: string | null;
  private release: (() => void) | null = null;
  /** Another process has the file open. */
  private isElsewhere: boolean;
  /** Until somebody has said what is to become of the old journal it is not touched. */
  private unanswered: boolean;
  private waiting: Session | null = null;
  private soon: NodeJS.Timeout | undefined;
  private latest: NodeJS.Timeout | undefined;
  private trouble: string | null = null;
  private listener: (reason: string) => void = () => {};
  private readonly onExit = (): void => this.close();

  constructor({ file, text, stateFolder, read }: KeeperOptions) {
    this.stateFolder = stateFolder;
    this.known = file === null ? null : text;
    const opened = file === null ? openUntitled(stateFolder) : openFile(file, stateFolder);
    this.place = opened.place;
    if (opened.lock.kind === 'taken') this.release = opened.lock.release;
    this.isElsewhere = opened.lock.kind === 'held';
    if (opened.lock.kind === 'held')
      this.told = `${heldText(file ?? '', opened.lock.by)}: read-only, A keeps a copy`;
    this.recovered = this.isElsewhere ? null : this.findRecovered(read);
    this.unanswered = this.recovered !== null;
    process.on('exit', this.onExit);
  }

  get readOnly(): ReadOnly | null {
    return this.isElsewhere ? 'open elsewhere' : null;
  }

  get notice(): string | null {
    return this.told;
  }

  private findRecovered(read: KeeperOptions['read']): Recovered | null {
    const { journal, file } = this.place;
    const written = readJournal(journal);
    if (written === null) return null;
    const session = written.text === this.known ? null : read(written.text);
    if (session !== null) {
      const isOlder = file !== null && statSync(file).mtimeMs > written.time;
      return { session, time: written.time, isOlder };
    }
    // Kept before the program ended; or not to be read, by whatever accident: then it stays under another name.
    if (written.text === this.known) {
      removeJournal(journal);
      return null;
    }
    const name = setJournalAside(journal);
    this.told = `the recovery journal cannot be read; it stays as ${harmless(name ?? written.place)}`;
    return null;
  }

  save(wanted: SaveWanted): SaveOutcome {
    const outcome = this.trySaving(wanted, writeSession(wanted.session));
    if (outcome.kind !== 'failed' || wanted.fresh) return outcome;
    return failed(`${outcome.reason}; A keeps it elsewhere`);
  }

  private trySaving({ file, fresh, over }: SaveWanted, text: string): SaveOutcome {
    try {
      const outcome = fresh ? this.saveAs(file, text) : this.saveFile(file, text, over);
      if (outcome.kind === 'saved') {
        this.known = text;
        this.note(null);
      }
      return outcome;
    } catch (error) {
      return failed(`not kept: ${harmless(file)} ${whyNot(error)}`);
    }
  }

  private saveAs(name: string, text: string): SaveOutcome {
    const file = resolve(name);
    if (existsSync(file)) return failed(`${harmless(name)} is there already: choose another name`);
    const missing = missingFolder(name);
    if (missing !== null) return missing;
    const lock = takeLock(file);
    if (lock.kind === 'held') return failed(`not kept: ${harmless(name)} is ${heldText(file, lock.by)}`);
    try {
      writeWhole(file, text, { fresh: true });
    } catch (error) {
      if (lock.kind === 'taken') lock.release();
      throw error;
    }
    this.leavePlace();
    this.place = placeOf(file, this.stateFolder);
    this.isElsewhere = false;
    this.unanswered = false;
    if (lock.kind === 'taken') this.release = lock.release;
    return { kind: 'saved' };
  }

  private saveFile(name: string, text: string, over: boolean): SaveOutcome {
    const { file } = this.place;
    if (this.isElsewhere) return failed(`not kept: ${harmless(name)} is open elsewhere`);
    if (file === null) return failed(`not kept: ${harmless(name)} is no ordinary file`);
    const missing = missingFolder(name);
    if (missing !== null) return missing;
    const lock = takeLock(file);
    if (lock.kind === 'held') return failed(`not kept: ${harmless(name)} is ${heldText(file, lock.by)}`);
    if (lock.kind === 'taken') this.release = lock.release;
    const there = contentOf(file);
    if (there !== null) {
      accessSync(file, constants.W_OK);
      if (!over && !(this.known !== null && there.equals(Buffer.from(this.known))))
        return { kind: 'changed' };
    }
    // Whatever stops the program from here on, the journal is never behind the file.
    if (!this.unanswered) this.noteNow(text);
    if (there !== null && !there.equals(Buffer.from(text))) writeWhole(backupOf(file), there, { like: file });
    writeWhole(file, text);
    return { kind: 'saved' };
  }

  note(session: Session | null): void {
    if (this.unanswered || this.isElsewhere) return;
    this.waiting = session;
    clearTimeout(this.soon);
    if (session === null) {
      this.stopWaiting();
      removeJournal(this.place.journal);
      return;
    }
    this.soon = setTimeout(this.flush, QUIET);
    this.latest ??= setTimeout(this.flush, LATEST);
  }

  private readonly flush = (): void => {
    const session = this.waiting;
    this.stopWaiting();
    if (session !== null) this.noteNow(writeSession(session));
  };

  private stopWaiting(): void {
    clearTimeout(this.soon);
    clearTimeout(this.latest);
    this.latest = undefined;
    this.waiting = null;
  }

  private noteNow(text: string): void {
    const { file, journal } = this.place;
    try {
      if (file === null && this.release === null) this.lockUntitled();
      writeJournal(journal, text, file ?? undefined);
      this.trouble = null;
    } catch (error) {
      const reason = `no recovery journal: it ${whyNot(error)}`;
      if (reason !== this.trouble) this.listener(reason);
      this.trouble = reason;
    }
  }

  /** The lock of a session without a file tells those of programs that run from those that are left over. */
  private lockUntitled(): void {
    const [base] = this.place.locked;
    if (base === undefined) return;
    makeFolderOf(base);
    const lock = takeLock(base);
    if (lock.kind === 'taken') this.release = lock.release;
  }

  answer(answer: RecoveredAnswer): string | null {
    this.unanswered = false;
    if (answer === 'take') return null;
    if (answer === 'drop') {
      removeJournal(this.place.journal);
      return 'dropped what was recovered';
    }
    const name = setJournalAside(this.place.journal);
    if (name !== null) return `set aside as ${harmless(name)}`;
    this.unanswered = true;
    return 'it could not be set aside, and stays; without a journal of what is done now';
  }

  listen(listener: (reason: string) => void): void {
    this.listener = listener;
  }

  close(): void {
    this.flush();
    process.off('exit', this.onExit);
    this.release?.();
    this.release = null;
  }

  /** The work goes on in another file: nothing of it is left behind here. */
  private leavePlace(): void {
    if (this.isElsewhere) return;
    if (!this.unanswered) removeJournal(this.place.journal);
    this.release?.();
    this.release = null;
  }
}

/** Writes nothing at all. */
function readOnlyKeeper({ file, text, stateFolder }: KeeperOptions): Keeper {
  const written = file === null ? null : readJournal(placeOf(throughLinks(file), stateFolder).journal);
  return {
    readOnly: 'asked',
    notice:
      written === null || written.text === text
        ? null
        : 'there is work that was not kept: open it without --read-only to take it',
    recovered: null,
    save: () => failed(NOT_WRITTEN),
    note: () => {},
    answer: () => null,
    listen: () => {},
    close: () => {},
  };
}

function contentOf(file: string): Buffer | null {
  try {
    return readFileSync(file);
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return null;
    throw error;
  }
}

function missingFolder(name: string): SaveOutcome | null {
  const folder = dirname(name);
  return existsSync(folder) ? null : failed(`not kept: the folder ${harmless(folder)} is not there`);
}

function failed(reason: string): SaveOutcome {
  return { kind: 'failed', reason };
}

function heldText(file: string, by: Holder | null): string {
  if (by === null) return 'open elsewhere';
  // Whether a process of another machine still runs nobody here can tell.
  const ifNot = by.host === hostname() ? '' : `; if it is not, remove ${harmless(basename(lockOf(file)))}`;
  return `open elsewhere (process ${by.pid} on ${harmless(by.host)}${ifNot})`;
}
