import type { NewLoad } from '../explore/beam-edits/edit-beam.ts';
import { knobsOf } from '../explore/knobs/knobs.ts';
import type { CurvesOf } from '../loads/index.ts';
import type { Units } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import type { Member, Product } from '../timber/member.ts';
import type { Edit } from './edit.ts';
import type { FoundAround, Strip } from './handover-now.ts';

/** Everything the explorer knows; one value, never changed in place. */
export interface State {
  readonly session: Session;
  /** The session as the file holds it; another identity than `session` means something is not kept. */
  readonly kept: Session | null;
  /** Where `s` writes; null until a name was given. */
  readonly file: string | null;
  /** Index of the member in hand. */
  readonly member: number;
  /** Key of the knob in hand. */
  readonly knob: string;
  readonly past: readonly Moment[];
  readonly future: readonly Moment[];
  /** Where the run of nudges on one knob began. */
  readonly ghost: { readonly knob: string; readonly member: Member } | null;
  /** By member's name, where the user said that we began; a name that is absent began as it was opened. */
  readonly began?: Readonly<Record<string, Member>>;
  /** What the scatter of stiffness comes to is told among the remarks. */
  readonly scatter?: boolean;
  /** The chart's ratio axis is even; absent or false: logarithmic. */
  readonly linear?: boolean;
  readonly mode: Mode;
  readonly notice: Notice | null;
  readonly columns: number;
  readonly rows: number;
  /**
   * False for the first frame of a member that takes long to work out: it shows what the nudge did at once, and
   * the rest (cures, reach, exponents, chart) with the next frame, which follows as soon as no key waits.
   */
  readonly settled: boolean;
  /** The handovers that were found last; they hold for their own member and knob alone. */
  readonly found?: FoundAround;
}

/** A point to come back to. */
export interface Moment {
  readonly session: Session;
  readonly member: number;
  readonly knob: string;
}

export interface Notice {
  readonly text: string;
  /** A refusal stands in the style of what stops. */
  readonly refusal: boolean;
}

export type Mode =
  | { readonly name: 'explore' }
  | { readonly name: 'entry'; readonly edit: Edit; readonly fault: string | null }
  | {
      readonly name: 'save-as';
      readonly edit: Edit;
      readonly fault: string | null;
      readonly thenLeave: boolean;
    }
  | { readonly name: 'help'; readonly scroll: number }
  | { readonly name: 'workings'; readonly page: number; readonly scroll: number }
  | DiagramsMode
  | WoodMode
  | AddMode
  | MovesMode
  | CompareMode
  | HandoversMode
  | HeadroomMode
  | { readonly name: 'copy' }
  | { readonly name: 'proportions' }
  | { readonly name: 'reach'; readonly scroll: number }
  | { readonly name: 'leaving' }
  | StartMode;

/** Choosing the wood of the member in hand. */
export interface WoodMode {
  readonly name: 'wood';
  /** The member as it would be; taken with Enter alone. */
  readonly draft: Member;
  /** What was chosen of each product so far, to come back to. */
  readonly tried: Readonly<Partial<Record<Product, Pick<Member, 'stock' | 'section'>>>>;
  /** Key of the knob in hand. */
  readonly knob: string;
  /** What is being typed on it; null while nothing is. */
  readonly edit: Edit | null;
  /** Why the last key did nothing. */
  readonly fault: string | null;
  /** First line shown of what the wood brings. */
  readonly scroll: number;
}

/** The beam with its diagrams. */
export interface DiagramsMode {
  readonly name: 'diagrams';
  /** The cursor, in from the member's left end. */
  readonly at: number;
  /** One combination by its index, or all. */
  readonly which: CurvesOf;
}

/** The list of what can be added; a load asks for its kind next. */
export interface AddMode {
  readonly name: 'add';
  /** Index of the line in hand. */
  readonly line: number;
  /** The load whose kind is asked for; null while it is asked what to add. */
  readonly load: NewLoad | null;
}

/** The storey of the member in hand. */
export interface HeadroomMode {
  readonly name: 'headroom';
  /** Key of the knob in hand. */
  readonly knob: string;
  /** What is being typed on it; null while nothing is. */
  readonly edit: Edit | null;
  /** Why the last key did nothing. */
  readonly fault: string | null;
}

/** The handovers along the knob in hand. */
export interface HandoversMode {
  readonly name: 'handovers';
  /** null: still being found. */
  readonly strip: Strip | null;
  readonly scroll: number;
}

/** Designs side by side. */
export interface CompareMode {
  readonly name: 'compare';
  /** 0: the one at hand, then the pins. */
  readonly design: number;
  readonly scroll: number;
  /** The note of the pin in hand being typed; null while none is. */
  readonly edit: Edit | null;
}

/** The list of moves. */
export interface MovesMode {
  readonly name: 'moves';
  /** 0: 10 % more wood, 1: the next stock size, then the moves, best first. */
  readonly line: number;
  /** Of the first two lines. */
  readonly way: 'deepen' | 'widen';
}

/** The three questions of an empty start. */
export interface StartMode {
  readonly name: 'start';
  readonly step: 'use' | 'span' | 'tributary';
  /** Index into the uses offered. */
  readonly use: number;
  readonly edit: Edit;
  /** in */
  readonly span: number;
  readonly fault: string | null;
}

/** The mode of the one screen; every other mode comes back to it with Escape. */
export const EXPLORE: Mode = { name: 'explore' };

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
      readonly thenLeave: boolean;
    }
  /** Put text on the clipboard, where the terminal takes that. */
  | { readonly do: 'copy'; readonly text: string }
  | { readonly do: 'leave' };

export function memberOf(state: State): Member {
  return state.session.members[state.member]!.member;
}

export function unitsOf(state: State): Units {
  return state.session.units;
}

export function isKept(state: State): boolean {
  return state.session === state.kept;
}

/** The state with the member in hand changed; what was is put on the past. */
export function withMember(state: State, member: Member): State {
  const members = state.session.members.map((each, index) =>
    index === state.member ? { ...each, member } : each,
  );
  return withSession(state, { ...state.session, members });
}

/** The state with another session; what was is put on the past. */
export function withSession(state: State, session: Session): State {
  return { ...state, session, past: [...state.past, momentOf(state)], future: [], notice: null };
}

export function momentOf(state: State): Moment {
  return { session: state.session, member: state.member, knob: state.knob };
}

/**
 * Knob in hand, kept when the member has it. Otherwise the nearest by name ("loads.0" for "loads.0.line.1"), else the
 * first span.
 */
export function knobInHand(state: State): {
  readonly knobs: ReturnType<typeof knobsOf>;
  readonly index: number;
} {
  const knobs = knobsOf(memberOf(state));
  for (let key = state.knob; key !== ''; key = key.slice(0, Math.max(0, key.lastIndexOf('.')))) {
    const index = knobs.findIndex((knob) => knob.key === key || knob.key.startsWith(`${key}.`));
    if (index >= 0) return { knobs, index };
  }
  return {
    knobs,
    index: Math.max(
      0,
      knobs.findIndex((knob) => knob.key === 'spans.0'),
    ),
  };
}

/** The state with a refusal on the foot line; everything else stays. */
export function refused(state: State, reason: string): State {
  return { ...state, notice: { text: reason, refusal: true } };
}
