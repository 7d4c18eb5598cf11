import type { YardRow } from '../explore/buying/yard.ts';
import type { ReadOnly, Recovered, RecoveredAnswer } from '../files/keeper.ts';
import type { Session } from '../session/session.ts';
import type { State } from './state.ts';

/** What one event comes to. */
export interface Step {
  readonly state: State;
  readonly effects: readonly Effect[];
}

/** A step that asks for nothing outside. */
export function still(state: State): Step {
  return { state, effects: [] };
}

/** What is to be done outside the state; carried out in one place. */
export type Effect =
  | {
      readonly do: 'save';
      readonly file: string;
      readonly session: Session;
      readonly fresh: boolean;
      /** Also over what somebody else has written meanwhile. */
      readonly over: boolean;
      readonly thenLeave: boolean;
    }
  /** Note the session in the recovery journal; null: the file holds all of it. */
  | { readonly do: 'journal'; readonly session: Session | null }
  | { readonly do: 'answer-recovered'; readonly answer: RecoveredAnswer }
  /** Put text on the clipboard, where the terminal takes that. */
  | { readonly do: 'copy'; readonly text: string }
  /** Read the yard list of this name, beside the session's file. */
  | {
      readonly do: 'read-yard';
      readonly name: string;
      readonly session: Session;
      readonly file: string | null;
    }
  /** Open a sample or another file in place of the empty start. */
  | { readonly do: 'open'; readonly what: Opened }
  /** Write the calculation sheet of these members; `over`: also over a file that is there. */
  | {
      readonly do: 'write-sheet';
      readonly file: string;
      readonly session: Session;
      readonly members: Session['members'];
      readonly over: boolean;
    }
  | { readonly do: 'leave' };

/** A sample by its place among those offered, or a file by its name. */
export type Opened = { readonly sample: number } | { readonly file: string };

/** What came of opening it: the session with what its keeper found, or why it could not be read. */
export type OpenAnswer =
  | {
      readonly ok: true;
      readonly session: Session;
      /** null: a sample, which is no file. */
      readonly file: string | null;
      readonly readOnly: ReadOnly | null;
      readonly recovered: Recovered | null;
      readonly notice: string | null;
    }
  | { readonly ok: false; readonly fault: string };

/** What came of writing a sheet; `there`: a file of the name is there already, and was not written over. */
export interface SheetAnswer {
  readonly file: string;
  readonly outcome: 'written' | 'there' | { readonly fault: string };
}

/** The lines of a yard list with the name that a session keeps it by, or why there are none, with the way out. */
export type YardAnswer =
  | { readonly ok: true; readonly file: string; readonly rows: readonly YardRow[] }
  | { readonly ok: false; readonly fault: string };
