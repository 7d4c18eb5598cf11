import type { Style } from './draw/canvas.ts';
import type { TableColumn, TableRow } from './panels/table.ts';

/**
 * Everything one frame of the explorer shows, as words and numbers already in the user's units.
 * Made from the state (view-model), drawn by panels/; the panels decide only what fits and where.
 */
export interface View {
  readonly title: TitleView;
  readonly verdict: VerdictView;
  readonly knobs: readonly KnobView[];
  /** Index of the knob in hand. */
  readonly knob: number;
  readonly gauges: readonly GaugeView[];
  /** Worst of the remaining checks first: "bearing", 0.25. */
  readonly others: readonly { readonly label: string; readonly ratio: number; readonly governs: boolean }[];
  /** The load in a word: "216 plf". */
  readonly load: string;
  readonly exponents: readonly ExponentView[];
  readonly ruler: RulerView;
  readonly rack: RackView;
  /** "(2) 2x14 is lightest from 14'-4" to 15'-6"; below, 3x14; above, 4x14"; null until known. */
  readonly handover: string | null;
  readonly chart: ChartView | null;
  readonly cures: readonly CureView[];
  /** Beside the gauges, best first; absent or null until they are found: the cures stand there. */
  readonly moves?: MovesTable | null;
  /** Lines about what is assumed and warned, most worth first. */
  readonly remarks: readonly string[];
  readonly foot: readonly FootView[];
  /** A message of the moment (a refusal with its reason, "kept in boathouse.json"); takes the foot's place. */
  readonly notice: { readonly text: string; readonly style: Style } | null;
  /** The field being typed; drawn at the knob in hand. */
  readonly entry: EntryView | null;
}

export interface TitleView {
  readonly session: string;
  /** "G1 deck girder" */
  readonly member: string;
  /** "ASD, NDS 2018, dry" */
  readonly method: string;
  /** "2 of 7" */
  readonly position: string;
  /** "kept" or "not kept" */
  readonly kept: string;
}

export interface VerdictView {
  readonly passes: boolean;
  /** "Bending stops it at 1.28." */
  readonly reason: string;
  /** Cures as sentences, best first: "Lightest cure: (2) 2x14, 0.93.", "Or shorten to 13'-3"." */
  readonly cures: readonly string[];
}

export interface KnobView {
  readonly label: string;
  readonly value: string;
  /** Set when the last nudge or entry was refused: the reason. */
  readonly fault: string | null;
}

export interface GaugeView {
  /** "shear", "bending", "deflection" */
  readonly label: string;
  /** 1, 2, 3: drawn as ¹ ² ³ and by the line style of the power. */
  readonly power: 1 | 2 | 3;
  /** Demand over capacity; null when the check does not apply. */
  readonly ratio: number | null;
  /** Where it stood before the run of nudges; null when nothing was nudged. */
  readonly ghost: number | null;
  /** Where we began, when that was marked; absent or null: nowhere. */
  readonly began?: number | null;
  /** Ratios at the stiff and the soft end of what the wood's stiffness scatters over; absent or null: no band. */
  readonly band?: readonly [number, number] | null;
  /** Change since the ghost; null when nothing was nudged. */
  readonly nudge: number | null;
  readonly governs: boolean;
  /** "fb 1151 of 900 psi, D+L" */
  readonly demand: string;
  /** The same without place and pattern, for where the whole does not fit. */
  readonly brief?: string;
  /** "alone, to l/h 14.1" */
  readonly alone: string;
}

export interface ExponentView {
  readonly label: string;
  readonly power: 1 | 2 | 3;
  /** Local exponents of span, depth, width, load. */
  readonly local: readonly [number, number, number, number];
  /** "own weight", "whole" */
  readonly why: string;
}

export interface RulerView {
  /** l/h at hand. */
  readonly now: number;
  readonly ghost: number | null;
  /** l/h up to which the member as a whole stands; null when none does. */
  readonly standsTo: number | null;
  /** l/h of shear to bending and bending to deflection; null where there is none. When bending governs nowhere both are the shear-to-deflection one. */
  readonly shearToBending: number | null;
  readonly bendingToDeflection: number | null;
  /** Stock depths at this span: nominal depth and its l/h. */
  readonly stock: readonly { readonly label: string; readonly spanToDepth: number }[];
}

export interface RackView {
  /** "DF-L No.2" */
  readonly wood: string;
  /** What the weights are in: "lb/ft" or "kg/m". */
  readonly weightUnit: string;
  readonly rows: readonly RackRowView[];
  /** Index of the size at hand; -1 when it is not on the rack. */
  readonly current: number;
  /** Index of the lit size; -1 when nothing passes. */
  readonly lightest: number;
  /** What the lit size is called where it is not the lightest: "cheapest". */
  readonly litWord?: string;
}

export interface RackRowView {
  readonly label: string;
  /** The wood in short where several stand on the rack: "DF-L No.2", "24F-1.8E"; absent or empty where one does. */
  readonly wood?: string;
  /** The label as it stands without a column of woods: with the wood where another has the same label. */
  readonly named?: string;
  /** lb/ft or kg/m with one decimal: "7.8" */
  readonly weight: string;
  /** Ratios of shear, bending, deflection; null when refused or not applicable. */
  readonly ratios: readonly [number | null, number | null, number | null];
  readonly passes: boolean;
  /** It passes, and none that passes is as light and as shallow. */
  readonly nonDominated?: boolean;
  /** One member of it: "43.20", or that there is none; absent where nothing on the rack has a price. */
  readonly price?: string;
  /** The yard does not have it, or none so long. */
  readonly lacking?: boolean;
  /** What stops it: "bending", "uplift", or the clause that refuses the size. Empty when it passes. */
  readonly stops: string;
  /** Longest span at which it passes: "13'-3"". */
  readonly reach: string;
}

export interface ChartView {
  /** "ratio against span" */
  readonly title: string;
  /** What the lines are, on a row of its own: the first of these that fits whole; absent: nothing is told. */
  readonly key?: readonly string[];
  /** Sampled at equal steps of the knob: one series a power; NaN where there is no value. */
  readonly series: readonly ChartSeries[];
  /** The axis of the figures; absent: ratios, as the gauges are, with the limit at 1. */
  readonly axis?: ChartAxis;
  /** Places along the knob's axis, 0 to 1, where another power comes to govern, with the figure there; absent: not marked. */
  readonly crossovers?: readonly (readonly [at: number, figure: number])[];
  /** The ratio axis is even from 0 to twice the limit; absent: logarithmic, as the gauges are. */
  readonly linear?: boolean;
  /** Where the knob stands now, 0 to 1 along the axis. */
  readonly now: number;
  /** Labels at 0, 1/4, 1/2, 3/4, 1 of the axis. */
  readonly labels: readonly string[];
}

export interface ChartSeries {
  /** The line it is drawn in: of a power, of checks outside the powers, or that of a limit. */
  readonly power: 1 | 2 | 3 | 'other' | 'limit';
  /** Ratios, or the figures of the axis. */
  readonly ratios: readonly number[];
  /** Where it stands now, where that is known better than from the samples on either side. */
  readonly now?: number;
}

/** An axis of figures: marks are what is written along it. */
export interface ChartAxis {
  readonly from: number;
  readonly to: number;
  /** Else logarithmic. */
  readonly even: boolean;
  readonly marks: readonly (readonly [figure: number, label: string])[];
}

/** Moves as a table, best first. */
export interface MovesTable {
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
  /** Said where there is no move. */
  readonly none: string;
}

export interface CureView {
  /** "deepen" */
  readonly kind: string;
  /** "(2) 2x14" or "13'-3"" */
  readonly label: string;
  readonly ratio: number;
  readonly passes: boolean;
  /** "+1.4 lb/ft" */
  readonly cost: string;
}

export interface FootView {
  /** "↑↓" */
  readonly keys: string;
  /** "knob" */
  readonly does: string;
}

/** On the foot of every view that is not being typed into. */
export const ALL_KEYS: FootView = { keys: '?', does: 'keys' };

export interface EntryView {
  /** The text as typed so far. */
  readonly text: string;
  /** Index of the character the cursor stands on. */
  readonly cursor: number;
  /** What is wrong with it; null while nothing is. */
  readonly fault: string | null;
  /** "span: 14-6, 14'6", 4.4m" */
  readonly hint: string;
}
