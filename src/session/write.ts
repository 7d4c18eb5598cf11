import type { Member } from '../timber/member.ts';
import { SessionFault } from './fault.ts';
import { present, rawAt } from './keep.ts';
import { writePins } from './pins.ts';
import { readMember } from './read-member.ts';
import { FORMAT, type MemberFile } from './schema.ts';
import type { Session, SessionMember } from './session.ts';
import { writePrices, writeYard } from './write-buying.ts';
import { writeJson } from './write-json.ts';
import { writeMember } from './write-member.ts';

/**
 * The session as the text of its file. Every value that has not changed keeps the user's own text; what was absent and
 * still has its default stays absent; keys stand in the contract's order. Reading the text gives the session back.
 */
export function writeSession(session: Session): string {
  return writeJson(sessionDocument(session));
}

/** The raw document that writeSession prints. */
export function sessionDocument(session: Session): unknown {
  const { title, units, combinations, written } = session;
  const stated = (key: string, value: string, otherwise: string) =>
    rawAt(written, key) === undefined && value === otherwise ? undefined : value;
  return present({
    thrice: FORMAT,
    title: stated('title', title, ''),
    units: stated('units', units, 'us'),
    combinations: stated('combinations', combinations, 'ASCE 7-16'),
    best: stated('best', session.best ?? 'weight', 'weight'),
    yard: writeYard(session),
    prices: writePrices(session),
    members: session.members.map((one) =>
      present({
        ...writeMember(one.member, one.written, before(one), units),
        pins: writePins(one.pins, one.member, one.written, units),
      }),
    ),
  });
}

/** What the member's raw record was read as; undefined for a new member. */
function before({ member, written }: SessionMember): Member | undefined {
  if (written === undefined) return undefined;
  try {
    return readMember(written as MemberFile, member.combinations, []);
  } catch (fault) {
    if (fault instanceof SessionFault) return undefined;
    throw fault;
  }
}
