import type { Member } from '../timber/member.ts';
import { type Change, changed, differences, isEmpty, reversed } from './differences.ts';
import { type Raw, same } from './keep.ts';
import { readOneMember } from './read.ts';
import type { Session, SessionMember } from './session.ts';
import { trailOf } from './trail.ts';
import { memberRecord } from './write.ts';
import { asWritten } from './write-links.ts';

/** What of its record tells one state of a member from another; null where nothing does. */
export function memberChange(
  before: SessionMember,
  after: SessionMember,
  { units }: Pick<Session, 'units'>,
): Change | null {
  if (before.written === after.written && isOfOthers(before.member, after.member)) return null;
  const change = differences(memberRecord(before, units), memberRecord(after, units));
  return isEmpty(change) ? null : change;
}

/** Whether members differ in what their links bring alone: a change of the member they come from, and there told. */
function isOfOthers(before: Member, after: Member): boolean {
  const { links: were = [], ...design } = before;
  const { links: are = [], ...now } = after;
  return (
    Object.keys(now).length === Object.keys(design).length &&
    Object.entries(design).every(([key, value]) => value === now[key as keyof typeof now]) &&
    same(were.map(asWritten), are.map(asWritten))
  );
}

/**
 * The raw record of a member as it stood after each entry of its trail, the first element before all of them and the
 * last as it is now. undefined from where back the trail leads nowhere, as after an edit by hand.
 */
export function recordsAlong(one: SessionMember, { units }: Pick<Session, 'units'>): (Raw | undefined)[] {
  const { entries } = trailOf(one);
  const records: (Raw | undefined)[] = [memberRecord(one, units)];
  for (const entry of entries.toReversed()) {
    const after = records[0];
    records.unshift(after === undefined ? undefined : (changed(after, reversed(entry)) as Raw | undefined));
  }
  return records;
}

/** A member as one of its earlier records says, under the name that it has now; null where that cannot be read. */
export function memberFrom(
  record: Raw,
  { member: { name } }: SessionMember,
  { combinations }: Pick<Session, 'combinations'>,
): SessionMember['member'] | null {
  return readOneMember({ ...record, name }, combinations);
}
