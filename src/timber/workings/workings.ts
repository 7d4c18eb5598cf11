import type { CheckId } from '../report.ts';

/**
 * One line of a calculation: "S = b d^2 / 6 = 3 in x (11.25 in)^2 / 6 = 63.281 in3". `numbers` works out to
 * `result`: signs stand between blanks, units against blanks or brackets, so that it can be read and checked.
 */
export interface WorkingLine {
  /** Begins a part of the calculation; nothing else stands in such a line. */
  readonly heading?: string;
  readonly symbol?: string;
  readonly formula?: string;
  readonly numbers?: string;
  readonly result?: string;
  readonly clause?: string;
  readonly note?: string;
}

/** The calculation behind a number, as content: no layout in it. */
export interface Workings {
  readonly title: string;
  readonly lines: readonly WorkingLine[];
}

/** The calculations of a member beside its checks. */
export const BASIS_IDS = ['loads', 'design values', 'reactions', 'frequency', 'plies'] as const;
export type BasisId = (typeof BASIS_IDS)[number];

export type WorkingsId = CheckId | BasisId;

/** What the calculations are called. */
export const WORKINGS_WORD: Readonly<Record<WorkingsId, string>> = {
  shear: 'shear',
  bending: 'bending',
  'bending-hogging': 'bending, top in tension',
  'deflection-live': 'live deflection',
  'deflection-total': 'total deflection',
  bearing: 'bearing',
  slenderness: 'lateral slenderness',
  uplift: 'uplift',
  notch: 'end notch',
  loads: 'loads and own weight',
  'design values': 'design values',
  reactions: 'reactions',
  frequency: 'first frequency',
  plies: 'plies and their fastening',
};
