import { present, rawAt } from './keep.ts';
import type { TrailFile } from './schema-trail.ts';
import { MAX_TRAIL, type Session, type SessionMember, type Trail, type TrailEntry } from './session.ts';

const NO_TRAIL: Trail = { before: 0, entries: [] };

export function trailOf({ trail }: Pick<SessionMember, 'trail'>): Trail {
  return trail ?? NO_TRAIL;
}

/** The trail with an entry more; beyond `MAX_TRAIL` the oldest are folded into their number. */
export function withEntry(trail: Trail, entry: TrailEntry): Trail {
  return folded({ ...trail, entries: [...trail.entries, entry] }, MAX_TRAIL);
}

/** The trail with its newest entries alone, the others told by their number. */
export function folded({ before, entries }: Trail, most: number): Trail {
  const over = Math.max(0, entries.length - most);
  return { before: before + over, entries: over === 0 ? entries : entries.slice(over) };
}

/** Whether two sessions say the same of everything but what was done to get there; by the identity of their parts. */
export function sameButTrails(one: Session, other: Session): boolean {
  if (one === other) return true;
  return (
    sameParts(one, other, 'members') &&
    one.members.length === other.members.length &&
    one.members.every(
      (each, at) => each === other.members[at] || sameParts(each, other.members[at]!, 'trail'),
    )
  );
}

function sameParts(one: object, other: object, but: string): boolean {
  const keys = new Set([...Object.keys(one), ...Object.keys(other)]);
  keys.delete(but);
  return [...keys].every((key) => rawAt(one, key) === rawAt(other, key));
}

export function readTrail(file: TrailFile | undefined): Trail | undefined {
  return file === undefined ? undefined : { before: file.before ?? 0, entries: file.changes ?? [] };
}

/** `trail` as the file holds it, with so many entries at most; nothing where there is none. */
export function writeTrail(trail: Trail | undefined, most: number): unknown {
  if (trail === undefined) return undefined;
  const { before, entries } = folded(trail, most);
  return present({
    before: before === 0 ? undefined : before,
    changes: entries.map(({ time, what, from, to }) => ({ time, what, from, to })),
  });
}
