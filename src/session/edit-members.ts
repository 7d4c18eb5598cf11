import type { CombinationSet } from '../loads/loading.ts';
import { harmless, isHarmful, quoted } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';
import { MAX_COUNT, MAX_MEMBERS, MAX_NAME, type Session, type SessionMember } from './session.ts';

/** Why a member may not be called so, with the way out; null where it may. `own`: its name now, null for a new one. */
export function nameFault({ members }: Session, name: string, own: string | null): string | null {
  if (name.trim() === '') return 'a name is needed: links, files and commands tell members apart by it';
  if (name.length > MAX_NAME) return `a name has ${MAX_NAME} characters at most, and this has ${name.length}`;
  if (isHarmful(name)) return 'a name holds no control or invisible characters; leave them out';
  if (name === own || members.every(({ member }) => member.name !== name)) return null;
  return `${quoted(name)} is the name of another member; names must differ`;
}

/** Why a text of so many characters at most may not stand in a file; null where it may. */
export function textFault(text: string, most: number): string | null {
  if (text.length > most) return `at most ${most} characters stand here, and this has ${text.length}`;
  return isHarmful(text) ? 'holds control or invisible characters; leave them out' : null;
}

/** How many of a member a text says, or why it says none. */
export function readCount(text: string): { readonly count: number } | { readonly fault: string } {
  const count = /^\d{1,6}$/.test(text) ? Number(text) : 0;
  if (count >= 1 && count <= MAX_COUNT) return { count };
  return { fault: `${quoted(text)} is no whole number from 1 to ${MAX_COUNT}` };
}

/** The first of J1, J2, J3 ... that no member has; the mark is cut where its number would not fit. */
export function freeName({ members }: Session, mark: string): string {
  const taken = new Set(members.map(({ member }) => member.name));
  for (let count = 1; ; count += 1) {
    const number = String(count);
    const name = mark.slice(0, MAX_NAME - number.length) + number;
    if (!taken.has(name)) return name;
  }
}

/** Why no member can be added; null where one can. */
export function fullFault({ members }: Session): string | null {
  return members.length < MAX_MEMBERS
    ? null
    : `a session has ${MAX_MEMBERS} members at most: delete one first`;
}

/** The session with a new member behind the one of this index. */
export function withMemberAfter(session: Session, index: number, one: SessionMember): Session {
  return { ...session, members: session.members.toSpliced(index + 1, 0, one) };
}

const NUMBER = /\d+$/;
/** Words, to which a number is set apart. */
const WORDS = /\s\S*\D$/;

/**
 * The session with a copy of a member behind it, called by the next free number. It carries what the other does and
 * nothing carries it; what was done to the other and what was set aside of it stay with the other.
 */
export function withDuplicate(session: Session, index: number): Session {
  const { member, written } = session.members[index]!;
  const stem = member.name.replace(NUMBER, '');
  const mark = WORDS.test(stem.trimEnd()) ? `${stem.trimEnd()} ` : stem;
  const name = freeName(session, mark.trim() === '' ? 'B' : mark);
  return withMemberAfter(session, index, { member: { ...member, name }, written });
}

/** The session with a member moved to another place among the others. */
export function withMemberAt(session: Session, from: number, to: number): Session {
  const one = session.members[from]!;
  return { ...session, members: session.members.toSpliced(from, 1).toSpliced(to, 0, one) };
}

/** The session with its loads combined by another edition, in every member and every design set aside. */
export function withCombinations(session: Session, combinations: CombinationSet): Session {
  const combined = (member: Member): Member => ({ ...member, combinations });
  const members = session.members.map((one) => ({
    ...one,
    member: combined(one.member),
    ...(one.pins === undefined
      ? {}
      : { pins: one.pins.map((pin) => ({ ...pin, member: combined(pin.member) })) }),
  }));
  return { ...session, combinations, members };
}

/** The longest piece of a name that a message repeats. */
const NAME_TOLD = 30;

/** A member's name in a message: safe, and cut where it is long. */
export function toldName(name: string): string {
  return harmless(name, NAME_TOLD);
}
