import { knobsOf } from '../explore/knobs/knobs.ts';
import { linkFault, resolved } from '../explore/links/index.ts';
import type { ReadOnly } from '../files/keeper.ts';
import type { Units } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import { sameButTrails } from '../session/trail.ts';
import type { Member } from '../timber/member.ts';
import type { ChartOf } from './chart-view.ts';
import type { FoundAround, FoundMoves } from './found.ts';
import type { Mode } from './mode.ts';
import type { Run, Watch } from './under-way.ts';

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
  /** Why the file is not written; absent or null where it is. */
  readonly readOnly?: ReadOnly | null;
  readonly past: readonly Moment[];
  readonly future: readonly Moment[];
  /** What a key has just done, where the change does not say it itself; for the trail, which takes it away. */
  readonly doing?: string;
  /** The changes of one thing that the trail tells as one while they go on. */
  readonly run?: Run | null;
  /** Where the run of nudges on one knob began. */
  readonly ghost: { readonly knob: string; readonly member: Member } | null;
  /** By member's name, where the user said that we began; a name that is absent began as it was opened. */
  readonly began?: Readonly<Record<string, Member>>;
  /** What the scatter of stiffness comes to is told among the remarks. */
  readonly scatter?: boolean;
  /** What the chart is of; absent: the ratios of the powers. */
  readonly chart?: ChartOf;
  /** The chart's axis of figures is even; absent or false: logarithmic. */
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
  /** Members that carry a changed one, still to be looked at; absent: none. */
  readonly watch?: Watch;
  /** The handovers that were found last; they hold for their own member and knob alone. */
  readonly found?: FoundAround;
  /** The moves that were found last; they hold for their own member alone. */
  readonly foundMoves?: FoundMoves;
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

export function memberOf(state: State): Member {
  return state.session.members[state.member]!.member;
}

export function unitsOf(state: State): Units {
  return state.session.units;
}

/** Nothing but what was done to get there tells the session from the file. */
export function isKept(state: State): boolean {
  return state.kept !== null && sameButTrails(state.session, state.kept);
}

/** The state with the member in hand changed; what was is put on the past. */
export function withMember(state: State, member: Member): State {
  const members = state.session.members.map((each, index) =>
    index === state.member ? { ...each, member } : each,
  );
  return withSession(state, { ...state.session, members });
}

/**
 * The state with another session, what its links bring worked out; what was is put on the past. Refused where a link
 * would lead nowhere or in a circle.
 */
export function withSession(state: State, changed: Session): State {
  const fault = linkFault(changed);
  if (fault !== null) return refused(state, `${changed.members[fault.member]!.member.name}: ${fault.text}`);
  const session = resolved(changed);
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
