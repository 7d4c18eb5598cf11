import { type Units, writeQuantity } from '../quantity/index.ts';
import { Lately } from '../quantity/lately.ts';
import type { Member } from '../timber/member.ts';
import { SessionFault } from './fault.ts';
import { present, type Raw, rawAt } from './keep.ts';
import { writePins } from './pins.ts';
import { readMember, readStock } from './read-member.ts';
import { FORMAT, type MemberFile } from './schema.ts';
import { MAX_MEMBERS, MAX_TRAIL, type Session, type SessionMember } from './session.ts';
import { isTooLarge } from './too-large.ts';
import { writeTrail } from './trail.ts';
import { writePrices, writeYard } from './write-buying.ts';
import { writeJson } from './write-json.ts';
import { writeMember } from './write-member.ts';
import { writeStock } from './write-stock.ts';

/**
 * The session as the text of its file. Every value that has not changed keeps the user's own text; what was absent and
 * still has its default stays absent; keys stand in the contract's order. Reading the text gives the session back. What
 * was done to its members is cut short where the text would be larger than is read.
 */
export function writeSession(session: Session): string {
  let text = '';
  for (const most of TRAILS_TRIED) {
    text = writeJson(sessionDocument(session, most));
    if (!isTooLarge(text)) break;
  }
  return text;
}

/** Entries of a trail: as many as there are, then few, then none. */
const TRAILS_TRIED = [MAX_TRAIL, 20, 0];

/** The raw document that writeSession prints, with so many entries a trail. */
export function sessionDocument(session: Session, trails = MAX_TRAIL): unknown {
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
    stock: writeNewStock(session),
    sheet: session.sheet,
    members: session.members.map((one) =>
      present({
        ...memberRecord(one, units),
        pins: writePins(one.pins, one.member, one.written, units),
        trail: writeTrail(one.trail, trails),
      }),
    ),
  });
}

/** The wood of new members, its values as the user wrote them while unchanged. */
function writeNewStock({ stock, units, written }: Session): Raw | undefined {
  if (stock === undefined) return undefined;
  const raw = rawAt(written, 'stock');
  const before = raw === undefined ? undefined : readStock(raw as MemberFile['stock'], ['stock']);
  return writeStock(stock, raw, before, (value) => writeQuantity('stress', value, units));
}

/** Records by the member that they are of: at a change all members but one are as they were. */
const RECORDS = new Lately<Member, { readonly of: unknown; readonly units: Units; readonly record: Raw }>(
  MAX_MEMBERS,
);

/** A member's own record: all that its file holds of it but its pins and its trail. */
export function memberRecord(one: Pick<SessionMember, 'member' | 'written'>, units: Units): Raw {
  const known = RECORDS.get(one.member);
  if (known !== undefined && known.of === one.written && known.units === units) return known.record;
  const record = writeMember(one.member, one.written, before(one), units);
  RECORDS.set(one.member, { of: one.written, units, record });
  return record;
}

/** What members' raw records were read as: asked for at every change, and the same while the file is. */
const READ = new WeakMap<object, Member>();

/** What the member's raw record was read as; undefined for a new member. */
function before({ member, written }: Pick<SessionMember, 'member' | 'written'>): Member | undefined {
  if (written === undefined || written === null || typeof written !== 'object') return undefined;
  const known = READ.get(written);
  if (known !== undefined && known.combinations === member.combinations) return known;
  try {
    const read = readMember(written as MemberFile, member.combinations, []);
    READ.set(written, read);
    return read;
  } catch (fault) {
    if (fault instanceof SessionFault) return undefined;
    throw fault;
  }
}
