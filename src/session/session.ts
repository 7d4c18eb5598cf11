import type { PriceRow, YardRow } from '../explore/buying/yard.ts';
import type { Best } from '../explore/rack/best.ts';
import type { CombinationSet } from '../loads/loading.ts';
import type { Units } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';

/** A job: its members, and how it wants to be shown and combined. */
export interface Session {
  /** Empty when the file gives none. */
  readonly title: string;
  readonly units: Units;
  readonly combinations: CombinationSet;
  /** One or more, names unique. */
  readonly members: readonly SessionMember[];
  /** What counts as best; absent: the lightest. */
  readonly best?: Best;
  /** What the yard has; absent or null: no list. */
  readonly yard?: YardList | null;
  /** What woods cost where the yard list does not say. */
  readonly prices?: readonly PriceRow[];
  /** The raw top of the file it was read from, without its members; absent for a session that was never a file. */
  readonly written?: unknown;
}

export interface YardList {
  /** Its file, from the folder of the session; null where its lines stand in the session. */
  readonly file: string | null;
  /** null: its file has not been read. */
  readonly rows: readonly YardRow[] | null;
}

export interface SessionMember {
  readonly member: Member;
  /** The raw record it was read from, so that the user's own text can be kept; undefined for a new member. */
  readonly written: unknown;
  /** Designs set aside, in the order they were; absent: none. */
  readonly pins?: readonly Pin[];
}

/** A design set aside to compare with others. */
export interface Pin {
  /** Empty where nobody wrote one. */
  readonly note: string;
  readonly member: Member;
  /** The raw record it was read from; undefined for a new one. */
  readonly written: unknown;
}

export type SessionRead =
  | { readonly ok: true; readonly session: Session }
  | { readonly ok: false; readonly fault: string };

/** Largest file and counts that are read (contract, "Session file"). */
export const MAX_BYTES = 16 * 1024 * 1024;
export const MAX_MEMBERS = 500;
export const MAX_SPANS = 6;
export const MAX_LOADS = 100;
/** Lines of a yard list; a bound of this program's own. */
export const MAX_YARD = 20_000;
/** Designs set aside of one member: as many as can be looked at side by side. */
export const MAX_PINS = 6;
/** Woods on one rack; a bound of this program's own. */
export const MAX_RACK = 16;
