import type { NewLoad } from '../explore/beam-edits/edit-beam.ts';
import type { HandoverSearch } from '../explore/handovers/handovers.ts';
import type { Judgement } from '../explore/judge.ts';
import type { Recovered } from '../files/keeper.ts';
import type { CurvesOf } from '../loads/index.ts';
import type { Size } from '../timber/index.ts';
import type { Member, Product } from '../timber/member.ts';
import type { Edit } from './edit.ts';
import type { Strip } from './found.ts';

/** What the screen is in, with what is in hand there. */
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

/** The mode of the one screen; every other mode comes back to it with Escape. */
export const EXPLORE: Mode = { name: 'explore' };
