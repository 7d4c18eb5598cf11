import type { Loading } from '../loads/loading.ts';

/** What a session file says of one member, in base units (lb, in, psi, lb/in), with every default filled in. */
export interface Member extends Loading {
  readonly name: string;
  readonly note: string;
  readonly use: Use;
  /** How many such members the job has. */
  readonly count: number;
  /** Centre to centre, in; where given the tributary width equals it. */
  readonly spacing: number | null;
  readonly stock: Stock;
  /**
   * Woods that stand on the rack together; the member's own is always among them. Absent or null: its own alone.
   */
  readonly rack?: readonly Stock[] | null;
  readonly section: Section;
  readonly service: 'dry' | 'wet';
  readonly temperature: 'normal' | '100-125 F' | '125-150 F';
  readonly incised: boolean;
  readonly repetitive: boolean;
  readonly seasoned: boolean;
  /** Top edge. */
  readonly bracing: Bracing;
  /** Bottom edge. */
  readonly bracingBottom: Bracing;
  readonly limits: Limits;
  readonly creep: 'half dead' | 'Kcr';
  /** Depth of the notch on the tension face at each end, in. */
  readonly notch: { readonly left: number; readonly right: number };
  /** Uplift that each support can hold down, lb; null where no tie-down is stated. */
  readonly tiedDown: readonly number[] | null;
  /** Choices deeper or wider than these do not count, in. */
  readonly maxDepth: number | null;
  readonly maxWidth: number | null;
  /** The storey it stands in, which leaves it so much depth. Absent or null: not stated. */
  readonly headroom?: Headroom | null;
  /** Adjustment factors typed over the standard's, each with the reason that must be given. */
  readonly typedFactors?: TypedFactors | null;
  /** Keys whose value is a default that nobody stated; each is listed in every output. */
  readonly assumed: readonly AssumedKey[];
}

/** Adjustment factors by the symbols of NDS Table 4.3.1. */
export const FACTOR_SYMBOLS = ['CD', 'CM', 'Ct', 'CL', 'CF', 'CV', 'Cfu', 'Ci', 'Cr', 'Cb'] as const;
export type FactorSymbol = (typeof FACTOR_SYMBOLS)[number];
export type TypedFactors = Readonly<
  Partial<Record<FactorSymbol, { readonly value: number; readonly reason: string }>>
>;

export type Use = 'floor' | 'roof-plaster' | 'roof-ceiling' | 'roof';

/** What a storey is made up of, in. */
export interface Headroom {
  readonly floorToFloor: number;
  /** Clear height wanted below. */
  readonly clear: number;
  /** Deck and finishes above the joists. */
  readonly floor: number;
  /** Depth of the joists. */
  readonly joists: number;
  /** Ceiling below the beam. */
  readonly ceiling: number;
  /** Dropped: the joists rest on it; flush: they hang between, their tops with its top. */
  readonly beam: 'dropped' | 'flush';
}

/** `continuous`: held throughout; `ends`: held at the supports only; a number: unbraced length, in. */
export type Bracing = 'continuous' | 'ends' | number;

export const PRODUCTS = [
  'dimension lumber',
  'machine stress rated',
  'timber',
  'glulam',
  'LVL',
  'custom',
] as const;
export type Product = (typeof PRODUCTS)[number];

export interface Stock {
  readonly product: Product;
  readonly species: string;
  /** Grade, or the stress class of glulam. */
  readonly grade: string;
  /** Typed values, psi (G without unit, COV of E without unit), over those of the table. */
  readonly values: Readonly<Partial<Record<StockValue, number>>> | null;
  /** Where the typed values were read. */
  readonly valuesFrom: string | null;
}

export const STOCK_VALUES = ['Fb', 'FbNeg', 'Fv', 'Fcperp', 'E', 'Emin', 'EyMin', 'G', 'COV'] as const;
export type StockValue = (typeof STOCK_VALUES)[number];

export interface Section {
  /** Width of one ply, in; the member's is width x plies. As bought: before any laying flat. */
  readonly width: number;
  /** in; as bought: before any laying flat. */
  readonly depth: number;
  readonly plies: number;
  /** Laid on its wide face: width and depth change places. */
  readonly flat: boolean;
}

/** Deflection limits as n of l/n (IBC Table 1604.3); `liveMax` is a length, in. */
export interface Limits {
  readonly live: number;
  readonly total: number;
  readonly liveMax: number | null;
}

export const ASSUMED_KEYS = [
  'bearing',
  'bracing',
  'bracingBottom',
  'seasoned',
  'service',
  'temperature',
  'tributary',
] as const;
export type AssumedKey = (typeof ASSUMED_KEYS)[number];

/** Limits by use (IBC Table 1604.3). */
export const LIMITS_BY_USE: Readonly<Record<Use, { readonly live: number; readonly total: number }>> = {
  floor: { live: 360, total: 240 },
  'roof-plaster': { live: 360, total: 240 },
  'roof-ceiling': { live: 240, total: 180 },
  roof: { live: 180, total: 120 },
};
