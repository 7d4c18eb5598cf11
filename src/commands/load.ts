import { readFileSync, statSync } from 'node:fs';
import { harmless, type Units } from '../quantity/index.ts';
import { readSession, readSessionWithSets } from '../session/index.ts';
import { MAX_BYTES, type Session, type SessionMember } from '../session/session.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import { BadInput } from './status.ts';

/** Options that the commands on a session share. */
export interface SessionOptions {
  readonly member?: string;
  readonly set?: readonly string[];
  readonly units?: string;
  readonly only?: string;
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
  try {
    const stat = statSync(file);
    if (stat.isDirectory()) throw new BadInput(`${harmless(file)}: is a directory, not a session file`);
    if (stat.size > MAX_BYTES)
      throw new BadInput(`${harmless(file)}: is larger than 16 MiB, the most a session may be`);
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(readFileSync(file));
  } catch (error) {
    if (error instanceof BadInput) throw error;
    const code = (error as NodeJS.ErrnoException).code;
    throw new BadInput(`${harmless(file)}: ${WHY[code ?? ''] ?? 'is not UTF-8 text'}`);
  }
}

const WHY: Readonly<Record<string, string>> = {
  ENOENT: 'no such file',
  EACCES: 'may not be read (permission denied)',
  ENOTDIR: 'no such file (a part of the path is not a folder)',
  ENAMETOOLONG: 'no such file (the name is too long)',
  ELOOP: 'no such file (its links run in a circle)',
  ERR_INVALID_ARG_VALUE: 'is not a file name',
};

/** Reads a session for a command: values set, members chosen, units and checks as asked. */
export function load(file: string, options: SessionOptions): Loaded {
  const text = readText(file);
  const set = options.set ?? [];
  const read =
    set.length === 0
      ? readSession(text, harmless(file))
      : readSessionWithSets(text, harmless(file), options.member ?? null, set);
  if (!read.ok) throw new BadInput(read.fault);
  const { session } = read;
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

const NAMES_SHOWN = 120;

function shortened(text: string): string {
  return text.length > NAMES_SHOWN ? `${text.slice(0, NAMES_SHOWN)} ...` : text;
}

function unitsOf(asked: string | undefined, own: Units): Units {
  if (asked === undefined) return own;
  if (asked === 'us' || asked === 'si') return asked;
  throw new BadInput(`--units ${harmless(asked)}: is not a choice of units; us or si would be`);
}

function onlyOf(asked: string | undefined): readonly CheckId[] | null {
  if (asked === undefined) return null;
  const ids = asked.split(',').map((id) => id.trim());
  for (const id of ids) {
    if (!(CHECK_IDS as readonly string[]).includes(id)) {
      throw new BadInput(`--only ${harmless(id)}: is not a check; the checks are ${CHECK_IDS.join(', ')}`);
    }
  }
  return CHECK_IDS.filter((id) => ids.includes(id));
}
