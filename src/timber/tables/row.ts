/** Sizes that a row of a table covers, in nominal inches of the piece as bought. */
export interface SizeClass {
  /** As the table words it. */
  readonly text: string;
  readonly thickness: readonly [least: number, most: number];
  readonly depth: readonly [least: number, most: number];
  /** NDS 4.1.3: timbers are told apart by how far the depth is over the width. */
  readonly shape: 'beams & stringers' | 'posts & timbers' | null;
}

/** Reference design values of one grade of sawn lumber; psi, G without unit. */
export interface LumberRow {
  readonly species: string;
  readonly grade: string;
  readonly size: SizeClass;
  readonly Fb: number;
  readonly Ft: number;
  readonly Fv: number;
  readonly Fcperp: number;
  readonly Fc: number;
  readonly E: number;
  readonly Emin: number;
  readonly G: number;
  readonly source: string;
  readonly status: string;
}

/** How far the values of a row were checked. */
export const MEMORY = 'from memory';
export const CHECKED =
  'cross-checked: Fb and E reproduce published joist span tables to the inch; the rest from memory';
export const OF_SPECIES =
  'from memory; G, Fv and Fcperp are those of the species, on the safe side where a grade has its own';

/** A row as it stands in a table file, one line a grade. */
export type LumberLine = readonly [
  species: string,
  grade: string,
  size: SizeClass,
  Fb: number,
  Ft: number,
  Fv: number,
  Fcperp: number,
  Fc: number,
  E: number,
  Emin: number,
  G: number,
  status: string,
];

/** Lines of one table with their source. */
export function lumberRows(source: string, lines: readonly LumberLine[]): LumberRow[] {
  return lines.map(([species, grade, size, Fb, Ft, Fv, Fcperp, Fc, E, Emin, G, status]) => ({
    species,
    grade,
    size,
    Fb,
    Ft,
    Fv,
    Fcperp,
    Fc,
    E,
    Emin,
    G,
    source,
    status,
  }));
}
