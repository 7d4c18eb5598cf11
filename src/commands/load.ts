import { closeSync, openSync, readSync, statSync } from 'node:fs';
import { BESTS } from '../explore/rack/best.ts';
import { harmless, quoted, type Units } from '../quantity/index.ts';
import { readSession, readSessionWithSets } from '../session/index.ts';
import { MAX_BYTES, type Session, type SessionMember } from '../session/session.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import { BadInput } from './status.ts';
import { withYard } from './yard-file.ts';

/** Options that the commands on a session share. */
export interface SessionOptions {
  readonly member?: string;
  readonly set?: readonly string[];
  readonly units?: string;
  readonly only?: string;
  readonly best?: string;
  readonly json?: boolean;
}

/** A session as a command sees it. */
export interface Loaded {
  readonly session: Session;
  /** The members asked for. */
  readonly members: readonly SessionMember[];
  readonly units: Units;
  /** The checks to keep; null for all. */
  readonly only: readonly CheckId[] | null;
}

/** Text of a file, or BadInput with one line that says why not. */
export function readText(file: string): string {
  if (file === '') throw new BadInput('a file name is needed, not an empty text');
  try {
    if (statSync(file).isDirectory())
      throw new BadInput(`${harmless(file)}: is a directory, not a session file`);
    const bytes = readUpTo(file, MAX_BYTES + 1);
    if (bytes.length > MAX_BYTES)
      throw new BadInput(`${harmless(file)}: is larger than 16 MiB, the most a session may be`);
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
  } catch (error) {
    throw unreadable(file, error);
  }
}

/** The fault of a file that could not be read; a BadInput stays what it is. */
export function unreadable(file: string, error: unknown): BadInput {
  if (error instanceof BadInput) return error;
  const code = (error as NodeJS.ErrnoException).code;
  return new BadInput(
    `${harmless(file)}: ${WHY[code ?? ''] ?? `could not be read (${code ?? harmless(String(error))})`}`,
  );
}

/** A pipe or a device does not tell its size: the reading itself has to end. */
function readUpTo(file: string, most: number): Uint8Array {
  const PIECE = 64 * 1024;
  const pieces: Uint8Array[] = [];
  const from = openSync(file, 'r');
  try {
    for (let total = 0; total < most; ) {
      const piece = new Uint8Array(Math.min(PIECE, most - total));
      const read = readSync(from, piece);
      if (read === 0) break;
      pieces.push(piece.subarray(0, read));
      total += read;
    }
  } finally {
    closeSync(from);
  }
  return Buffer.concat(pieces);
}

const WHY: Readonly<Record<string, string>> = {
  ENOENT: 'no such file',
  EACCES: 'may not be read (permission denied)',
  ENOTDIR: 'no such file (a part of the path is not a folder)',
  ENAMETOOLONG: 'no such file (the name is too long)',
  ELOOP: 'no such file (its links run in a circle)',
  ERR_INVALID_ARG_VALUE: 'is not a file name',
  ERR_ENCODING_INVALID_ENCODED_DATA: 'is not UTF-8 text',
};

/** The session of a file's text, with the values of a member set and its yard list read; BadInput where it has none. */
export function sessionOf(
  text: string,
  file: string,
  member: string | null = null,
  set: readonly string[] = [],
): Session {
  const read =
    set.length === 0
      ? readSession(text, harmless(file))
      : readSessionWithSets(text, harmless(file), member, set);
  if (!read.ok) throw new BadInput(read.fault);
  return withYard(read.session, file, readText);
}

/** Reads a session for a command: values set, members chosen, units and checks as asked. */
export function load(file: string, options: SessionOptions): Loaded {
  const read = sessionOf(readText(file), file, options.member ?? null, options.set ?? []);
  const session = withBest(read, options.best);
  const members = session.members.filter(
    ({ member }) => options.member === undefined || member.name === options.member,
  );
  if (members.length === 0) {
    const names = session.members.map(({ member }) => harmless(member.name)).join(', ');
    throw new BadInput(
      `${harmless(file)}: has no member "${harmless(options.member ?? '')}"; it has ${shortened(names)}`,
    );
  }
  return { session, members, units: unitsOf(options.units, session.units), only: onlyOf(options.only) };
}

/** The one member that rack, reach and the like are asked about. */
export function theMember(loaded: Loaded, file: string): SessionMember {
  if (loaded.members.length > 1) {
    const names = loaded.members.map(({ member }) => harmless(member.name)).join(', ');
    throw new BadInput(`${harmless(file)}: has several members; name one with --member: ${shortened(names)}`);
  }
  return loaded.members[0]!;
}

/** The session with what counts as best as asked for. */
function withBest(session: Session, asked: string | undefined): Session {
  if (asked === undefined) return session;
  const best = BESTS.find((each) => each === asked);
  if (best === undefined)
    throw new BadInput(`--best ${harmless(asked)}: is nothing to choose by; ${BESTS.join(', ')} would be`);
  return { ...session, best };
}

const NAMES_SHOWN = 120;

function shortened(text: string): string {
  return text.length > NAMES_SHOWN ? `${text.slice(0, NAMES_SHOWN)} ...` : text;
}

/** The units asked for, else a session's own. */
export function unitsOf(asked: string | undefined, own: Units): Units {
  if (asked === undefined) return own;
  if (asked === 'us' || asked === 'si') return asked;
  throw new BadInput(`--units ${quoted(asked)}: is not a choice of units; us or si would be`);
}

function onlyOf(asked: string | undefined): readonly CheckId[] | null {
  if (asked === undefined) return null;
  const ids = asked.split(',').map((id) => id.trim());
  for (const id of ids) {
    if (!(CHECK_IDS as readonly string[]).includes(id)) {
      throw new BadInput(`--only ${quoted(id)}: is not a check; the checks are ${CHECK_IDS.join(', ')}`);
    }
  }
  return CHECK_IDS.filter((id) => ids.includes(id));
}
