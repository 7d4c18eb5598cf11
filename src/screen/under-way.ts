import type { Session, SessionMember, TrailEntry } from '../session/session.ts';

/** A run of changes of one thing, told as one entry: from before the first to after the last. */
export interface Run {
  readonly what: string;
  /** When the last of them was, ms. */
  readonly time: number;
  /** The member before the first of them. */
  readonly first: SessionMember;
  /** The entry that tells them so far; it is the last of the trail. */
  readonly entry: TrailEntry;
}

/** What came of changes for the members that carry the changed one, to be told once no key waits. */
export interface Watch {
  /** The session before the first of the changes. */
  readonly before: Session;
  /** How many members have been looked at. */
  readonly seen: number;
  /** What is to be told so far. */
  readonly told: readonly string[];
}
