import type { NewLoad } from '../explore/beam-edits/edit-beam.ts';
import type { YardRow } from '../explore/buying/yard.ts';
import type { HandoverSearch } from '../explore/handovers/handovers.ts';
import type { Judgement } from '../explore/judge.ts';
import { knobsOf } from '../explore/knobs/knobs.ts';
import { linkFault, resolved } from '../explore/links/index.ts';
import type { ReadOnly, Recovered, RecoveredAnswer } from '../files/keeper.ts';
import type { CurvesOf } from '../loads/index.ts';
import type { Units } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import { sameButTrails } from '../session/trail.ts';
import type { Size } from '../timber/index.ts';
import type { Member, Product } from '../timber/member.ts';
import type { ChartOf } from './chart-view.ts';
import type { Edit } from './edit.ts';
import type { FoundAround, FoundMoves, Strip } from './found.ts';
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

export type Mode =
  | { readonly name: 'explore' }
  | { readonly name: 'entry'; readonly edit: Edit; readonly fault: string | null }
  | {
      readonly name: 'save-as';
      readonly edit: Edit;
      readonly fault: string | null;
      readonly thenLeave: boolean;
    }
  | { readonly name: 'changed-on-disk'; readonly thenLeave: boolean }
  | RecoveredMode
  | TrailMode
  | HelpMode
  | WorkingsMode
  | DiagramsMode
  | WoodMode
  | AddMode
  | MovesMode
  | CompareMode
  | HandoversMode
  | HeadroomMode
  | LinksMode
  | MembersMode
  | SettingsMode
  | BuyingMode
  | SheetMode
  | { readonly name: 'copy' }
  | { readonly name: 'proportions' }
  | { readonly name: 'reach'; readonly scroll: number }
  | { readonly name: 'leaving' }
  | StartMode;

/** Every key and every word. */
export interface HelpMode {
  readonly name: 'help';
  readonly scroll: number;
  /** The view that is explained first, and that Escape leads back to. */
  readonly from: Mode;
}

/** Where the calculation sheet shall be written. */
export interface SheetMode {
  readonly name: 'sheet';
  readonly edit: Edit;
  readonly fault: string | null;
  /** Of the whole job; false: of the member in hand alone. */
  readonly whole: boolean;
  /** The file that is there already, of which that was told. */
  readonly over: string | null;
}

/** What came of writing a sheet; `there`: a file of the name is there already, and was not written over. */
export interface SheetAnswer {
  readonly file: string;
  readonly outcome: 'written' | 'there' | { readonly fault: string };
}

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

/** The calculations, page by page. */
export interface WorkingsMode {
  readonly name: 'workings';
  /** Index of the page; counted on round and round. */
  readonly page: number;
  readonly scroll: number;
  /** Line in hand of the list of pages; null while a page is shown. */
  readonly line: number | null;
  /** Where Escape leads back to; what stands in hand there says whose calculations these are. */
  readonly from: Mode;
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

/** What each size takes to buy. */
export interface BuyingMode {
  readonly name: 'buying';
  /** The size in hand: of the rack; null: the member's own. */
  readonly size: Size | null;
  /** What is being typed; null while nothing is. */
  readonly asks: BuyingQuestion | null;
}

export interface BuyingQuestion {
  /** A price of the piece in hand or of its wood, a line of the yard list, the file of a list. */
  readonly of: 'price' | 'wood price' | 'line' | 'file';
  readonly edit: Edit;
  /** Why what was typed may not be. */
  readonly fault: string | null;
}

/** The handovers along the knob in hand. */
export interface HandoversMode {
  readonly name: 'handovers';
  /** null: still being found. */
  readonly strip: Strip | null;
  /** What is found of it so far; null: not begun, or all found. */
  readonly search: HandoverSearch | null;
  readonly scroll: number;
}

/** What was done to the member in hand. */
export interface TrailMode {
  readonly name: 'trail';
  /** How many of the entries are done at the line in hand: 0 before all of them. */
  readonly line: number;
}

/** The question of what is to become of what was not kept when the program last ended. */
export interface RecoveredMode {
  readonly name: 'recovered';
  readonly recovered: Recovered;
  readonly scroll: number;
  /** Where it goes on. */
  readonly after: Mode;
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

/** What the member in hand carries of others, and what carries it. */
export interface LinksMode {
  readonly name: 'links';
  /** Index among the lines that can be taken in hand. */
  readonly line: number;
  /** It is asked which member to carry. */
  readonly choosing: boolean;
  /** The place or spacing being typed, by the key of its knob; null while none is. */
  readonly typing: { readonly knob: string; readonly edit: Edit; readonly fault: string | null } | null;
}

/** The list of moves. */
export interface MovesMode {
  readonly name: 'moves';
  /** 0: 10 % more wood, 1: the next stock size, then the moves, best first. */
  readonly line: number;
  /** Of the first two lines. */
  readonly way: 'deepen' | 'widen';
}

/** What the list of members is sorted by; the order of the file stays as it is. */
export const MEMBER_SORTS = ['file', 'name', 'ratio', 'size', 'weight'] as const;
export type MemberSort = (typeof MEMBER_SORTS)[number];

/** The members of the session; the one in hand is the state's. */
export interface MembersMode {
  readonly name: 'members';
  /** Name of the member that Escape leads back to. */
  readonly from: string;
  readonly sort: MemberSort;
  /** Only members that hold these words are listed; empty: all. */
  readonly filter: string;
  readonly asks: MembersQuestion | null;
  /** What members came to so far; those that are not in it are still to be worked out. */
  readonly judged: ReadonlyMap<Member, Judgement>;
}

/** What is typed in the list: of the list, or of the member in hand. */
export interface TypedQuestion {
  readonly of: 'filter' | 'name' | 'note' | 'count';
  readonly edit: Edit;
  readonly fault: string | null;
}

export type MembersQuestion =
  | TypedQuestion
  /** Whether the member in hand shall go, though others carry it. */
  | { readonly of: 'delete' };

/** What is set for the whole session. */
export interface SettingsMode {
  readonly name: 'settings';
  /** Index of the setting in hand. */
  readonly line: number;
  readonly typing: { readonly edit: Edit; readonly fault: string | null } | null;
  /** Where Escape leads back to. */
  readonly back: Mode;
}

/** What an empty start offers to open. */
export interface Offers {
  readonly samples: readonly SampleOffer[];
  /** Session files of the folder that the program was started in. */
  readonly files: readonly string[];
}

export interface SampleOffer {
  readonly title: string;
  readonly members: number;
}

/** An empty start, or the same questions of a member to be added. */
export interface StartMode {
  readonly name: 'start';
  readonly step: 'choose' | 'span' | 'width' | 'file';
  /** Index of the line in hand: what kind of member it shall be, or what shall be opened. */
  readonly line: number;
  readonly edit: Edit;
  /** in */
  readonly span: number;
  readonly fault: string | null;
  readonly offers: Offers;
  /** The list that the member is added to; null: there is no session yet. */
  readonly addTo: MembersMode | null;
}

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

/** The lines of a yard list with the name that a session keeps it by, or why there are none, with the way out. */
export type YardAnswer =
  | { readonly ok: true; readonly file: string; readonly rows: readonly YardRow[] }
  | { readonly ok: false; readonly fault: string };

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
