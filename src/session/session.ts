import type { PriceRow, YardRow } from '../explore/buying/yard.ts';
import type { Best } from '../explore/rack/best.ts';
import type { CombinationSet } from '../loads/loading.ts';
import type { Units } from '../quantity/index.ts';
import type { Member, Stock } from '../timber/member.ts';
import type { Change } from './differences.ts';

/** A job: its members, and how it wants to be shown and combined. */
export interface Session {
  /** Empty when the file gives none. */
  readonly title: string;
  readonly units: Units;
  readonly combinations: CombinationSet;
  /** One or more, names unique. Their links hold what the members they name bring: see `resolved`. */
  readonly members: readonly SessionMember[];
  /** What counts as best; absent: the lightest. */
  readonly best?: Best;
  /** What the yard has; absent or null: no list. */
  readonly yard?: YardList | null;
  /** What woods cost where the yard list does not say. */
  readonly prices?: readonly PriceRow[];
  /** The wood that new members begin with; absent: `USUAL_STOCK`. */
  readonly stock?: Stock;
  /** The title block of the calculation sheet, and its paper; absent: nothing filled in. */
  readonly sheet?: SheetKeys;
  /** The raw top of the file it was read from, without its members; absent for a session that was never a file. */
  readonly written?: unknown;
}

/** Sizes of paper that a sheet is printed on. */
export const PAPERS = ['A4', 'Letter'] as const;
export type Paper = (typeof PAPERS)[number];

/** What the calculation sheet is headed with; an entry that is absent or empty is left out there. */
export interface SheetKeys {
  readonly firm?: string | undefined;
  /** Absent: the title of the session. */
  readonly job?: string | undefined;
  readonly jobNumber?: string | undefined;
  readonly by?: string | undefined;
  readonly checkedBy?: string | undefined;
  readonly revision?: string | undefined;
  /** As it shall stand there; no clock fills it in. */
  readonly date?: string | undefined;
  /** Absent: Letter with US units, A4 with SI. */
  readonly paper?: Paper | undefined;
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
  /** What was done to it; absent: nothing that was noted. It goes with the member wherever that is moved. */
  readonly trail?: Trail;
}

/** A design set aside to compare with others. */
export interface Pin {
  /** Empty where nobody wrote one. */
  readonly note: string;
  readonly member: Member;
  /** The raw record it was read from; undefined for a new one. */
  readonly written: unknown;
}

/** What was done to a member, oldest first. */
export interface Trail {
  /** How many changes older than the entries are told by their number alone. */
  readonly before: number;
  readonly entries: readonly TrailEntry[];
}

/** One change of a member's record; a run of nudges of one knob is one. */
export interface TrailEntry extends Change {
  /** UTC, "2026-12-01T09:30:00Z". The order of the entries is theirs, whatever the clock said. */
  readonly time: string;
  /** In words: "span", "size". */
  readonly what: string;
}

export type SessionRead =
  | { readonly ok: true; readonly session: Session }
  | { readonly ok: false; readonly fault: string };

/** Largest file and counts that are read (contract, "Session file"). */
export const MAX_BYTES = 16 * 1024 * 1024;
export const MAX_MEMBERS = 500;
/** How many of a member there may be. */
export const MAX_COUNT = 10_000;
/** Characters of a member's name, of a title or a note, and of an entry of the title block. */
export const MAX_NAME = 60;
export const MAX_TITLE = 500;
export const MAX_SHEET_ENTRY = 120;
export const MAX_SPANS = 6;
export const MAX_LOADS = 100;
/** Characters of the name of a yard list's file, and lines of a list; bounds of this program's own. */
export const MAX_FILE_NAME = 500;
export const MAX_YARD = 20_000;
/** Designs set aside of one member: as many as can be looked at side by side. */
export const MAX_PINS = 6;
/** Changes of one member that are kept one by one; a bound of this program's own. */
export const MAX_TRAIL = 200;
/** Woods on one rack; a bound of this program's own. */
export const MAX_RACK = 16;
