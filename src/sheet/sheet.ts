import type { CheckId } from '../timber/report.ts';
import type { WorkingLine } from '../timber/workings/index.ts';
import type { Drawing } from './drawing/drawing.ts';

/** The calculation written out, as content: no layout in it. Texts are plain; each writer makes them safe. */
export interface Sheet {
  /** "Boathouse at Alder Cove: calculation sheet" */
  readonly title: string;
  /** What stands on every page: those entries of the title block that somebody filled in. */
  readonly titleBlock: readonly Fact[];
  /** Every member on it passes. */
  readonly passes: boolean;
  /** As somebody wrote it; null where nobody gave one. */
  readonly date: string | null;
  /** The job first, then a section for each member; each begins a page. */
  readonly sections: readonly Section[];
}

/** A name and what it is: "checked by", "R. Vane". */
export type Fact = readonly [label: string, value: string];

export interface Section {
  /** Good for a link within the document: "job", "member-2". */
  readonly id: string;
  readonly title: string;
  readonly blocks: readonly Block[];
}

export type Block =
  | { readonly kind: 'heading'; readonly text: string }
  | Verdict
  | { readonly kind: 'text'; readonly text: string }
  | Facts
  | { readonly kind: 'list'; readonly items: readonly string[] }
  | Table
  | Picture
  | { readonly kind: 'workings'; readonly title: string; readonly lines: readonly WorkingLine[] };

/** What it comes to, to be seen first. */
export interface Verdict {
  readonly kind: 'verdict';
  readonly passes: boolean;
  /** "PASSES", "FAILS" */
  readonly word: string;
  /** "Bending governs at 1.28, D+L." */
  readonly sentence: string;
  readonly facts: readonly Fact[];
}

/** Names and what they are, one beside the other. */
export interface Facts {
  readonly kind: 'facts';
  readonly caption: string;
  readonly facts: readonly Fact[];
}

export interface Table {
  readonly kind: 'table';
  /** What it shows, for those who cannot see where it stands. */
  readonly caption: string;
  readonly columns: readonly Column[];
  readonly rows: readonly Row[];
}

export interface Column {
  readonly head: string;
  readonly align: 'left' | 'right';
}

export interface Row {
  readonly cells: readonly string[];
  /** Stands out: it governs, or it is the size chosen. A word in its cells says so too. */
  readonly strong?: boolean;
  /** A section that its first cell leads to. */
  readonly leadsTo?: string;
  /** What the row is of, for programs that read the sheet. */
  readonly check?: CheckId;
}

export interface Picture {
  readonly kind: 'picture';
  readonly caption: string;
  /** What it shows, in words. */
  readonly says: string;
  /** The drawing on a sheet of so many columns. */
  readonly draw: (columns: number) => Drawing;
}
