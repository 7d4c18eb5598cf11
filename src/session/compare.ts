import type { Units } from '../quantity/index.ts';
import { differences, isEmpty, pathsOf } from './differences.ts';
import { present, type Raw, rawAt } from './keep.ts';
import { writePins } from './pins.ts';
import type { Session, SessionMember } from './session.ts';
import { memberRecord, sessionDocument } from './write.ts';

/** A value of the file that differs; undefined where one of the two says nothing, and so has the default. */
export interface Difference {
  /** "spans.0", "section.depth" */
  readonly path: string;
  readonly from: unknown;
  readonly to: unknown;
}

/** A member of one session and what stands for it in the other. */
export interface MemberPair {
  readonly before: SessionMember;
  readonly after: SessionMember;
  /** Of what its record says, name apart; empty where it says the same. */
  readonly differences: readonly Difference[];
}

export interface Comparison {
  /** Of what stands at the top of the files. */
  readonly top: readonly Difference[];
  readonly added: readonly SessionMember[];
  readonly removed: readonly SessionMember[];
  /** In the order of the second session; names differ where one was renamed. */
  readonly pairs: readonly MemberPair[];
  /** Whether members that are in both stand in another order. */
  readonly reordered: boolean;
}

/** A renamed member may have changed in so many values beside; more make it another one. */
const MOST_CHANGED_IN_RENAMED = 3;

/**
 * What changed from one session to another, by value: "14 ft" and "168 in" are the same, and so are a default and that
 * default written out, unless it then is no longer listed as assumed. Members are the same by name; of those left over a
 * pair that differs in little but its name was renamed. Values are written in `units`. What was done on the way (the
 * trail) counts for nothing.
 */
export function compareSessions(before: Session, after: Session, units: Units): Comparison {
  const differing = (one: SessionMember, other: SessionMember) =>
    listed(recordOf(one, units), recordOf(other, units));
  const partner = new Map<SessionMember, SessionMember>();
  const byName = new Map(before.members.map((one) => [one.member.name, one]));
  for (const one of after.members) {
    const twin = byName.get(one.member.name);
    if (twin !== undefined) partner.set(one, twin);
  }
  const taken = new Set(partner.values());
  const gone = before.members.filter((one) => !taken.has(one));
  const come = after.members.filter((one) => !partner.has(one));
  for (const one of come) {
    const renamed = nearest(
      one,
      gone.filter((each) => !taken.has(each)),
      differing,
    );
    if (renamed === null) continue;
    partner.set(one, renamed);
    taken.add(renamed);
  }
  const pairs = after.members.flatMap((one): MemberPair[] => {
    const twin = partner.get(one);
    return twin === undefined ? [] : [{ before: twin, after: one, differences: differing(twin, one) }];
  });
  const places = pairs.map((pair) => before.members.indexOf(pair.before));
  return {
    top: listed(topOf(before, units), topOf(after, units)),
    added: after.members.filter((one) => !partner.has(one)),
    removed: before.members.filter((one) => !taken.has(one)),
    pairs,
    reordered: places.some((place, at) => at > 0 && place < places[at - 1]!),
  };
}

/** Whether nothing differs. */
export function isSame({ top, added, removed, pairs, reordered }: Comparison): boolean {
  return (
    !reordered &&
    top.length + added.length + removed.length === 0 &&
    pairs.every((pair) => pair.differences.length === 0 && pair.before.member.name === pair.after.member.name)
  );
}

function nearest(
  one: SessionMember,
  among: readonly SessionMember[],
  differing: (one: SessionMember, other: SessionMember) => readonly Difference[],
): SessionMember | null {
  let best: SessionMember | null = null;
  let least = MOST_CHANGED_IN_RENAMED + 1;
  for (const each of among) {
    const count = differing(each, one).length;
    if (count >= least) continue;
    least = count;
    best = each;
  }
  return best;
}

/** What a member's file says, each value written one way, without its name. */
function recordOf(one: SessionMember, units: Units): Raw {
  const { name: _name, ...record } = memberRecord({ member: one.member, written: undefined }, units);
  const unwritten = one.pins?.map((pin) => ({ ...pin, written: undefined }));
  return present({ ...record, pins: writePins(unwritten, one.member, undefined, units) });
}

function topOf(session: Session, units: Units): Raw {
  const plain = { ...session, units, written: undefined, members: [] };
  const { members: _members, ...top } = sessionDocument(plain) as Raw;
  return { ...top, units: session.units };
}

function listed(before: Raw, after: Raw): Difference[] {
  const change = differences(before, after);
  if (isEmpty(change)) return [];
  return pathsOf(change).map((path) => ({
    path,
    from: rawAt(change.from, path),
    to: rawAt(change.to, path),
  }));
}
