import type { Product, Section, Stock, StockValue } from './member.ts';
import { nearestName } from './nearest-name.ts';
import { nominalUp, SIZE_TOLERANCE, TIMBER_DRESSING } from './nominal.ts';
import type { DesignValues, Refusal } from './reference-values.ts';
import { rowsOf } from './rows.ts';
import { pieceThickness, pieceWidth } from './standing.ts';
import { GLULAM } from './tables/glulam.ts';
import { LVL } from './tables/lvl.ts';
import type { LumberRow, SizeClass } from './tables/row.ts';
import { SHORT_SPECIES, SP, WESTERN } from './tables/species.ts';

/** The values of one row with what the user typed over them, and the sizes that it covers. */
export interface Candidate {
  /** null: any size. */
  readonly size: SizeClass | null;
  /** Grade of the row. */
  readonly grade: string;
  readonly values: DesignValues;
}

/** Coefficient of variation of E (NDS Appendix F; LVL typical). */
const COV = { 'visually graded': 0.25, 'machine stress rated': 0.11, glulam: 0.1, LVL: 0.1 } as const;

/** What a stock without a row of a table must have typed. */
const NEEDED: readonly StockValue[] = ['Fb', 'Fv', 'Fcperp', 'E', 'Emin', 'G'];

const SIZES: Readonly<Partial<Record<Product, SizeClass>>> = {
  'dimension lumber': {
    text: '2-4 in thick, 2 in and wider',
    thickness: [2, 4],
    depth: [2, Infinity],
    shape: null,
  },
  'machine stress rated': {
    text: '2 in and less thick',
    thickness: [0, 2],
    depth: [2, Infinity],
    shape: null,
  },
  timber: { text: '5x5 in and larger', thickness: [5, Infinity], depth: [5, Infinity], shape: null },
};

const KNOWN = new WeakMap<Stock, Candidate[] | Refusal>();

/** The rows of a stock, one or several by size, or why there are none. A stock is never changed: found once. */
export function candidatesOf(stock: Stock): Candidate[] | Refusal {
  let known = KNOWN.get(stock);
  if (known === undefined) {
    known = findCandidates(stock);
    KNOWN.set(stock, known);
  }
  return known;
}

function findCandidates(stock: Stock): Candidate[] | Refusal {
  const fault = typedFault(stock);
  if (fault !== null) return { refused: fault };
  const { product } = stock;
  if (product === 'glulam') return glulamOf(stock);
  if (product === 'LVL') return lvlOf(stock);
  if (product === 'custom') return typedOf(stock, 'custom needs');
  const ofSpecies = rowsOf(product).filter((row) => row.species === stock.species);
  const rows = lumberRowsOf(ofSpecies, stock.grade);
  if (rows.length > 0) {
    const cov = product === 'machine stress rated' ? COV['machine stress rated'] : COV['visually graded'];
    return rows.map((row) => ({
      size: row.size,
      grade: row.grade,
      values: typedOver(fromRow(row, cov), stock),
    }));
  }
  if (isComplete(stock)) return typedOf(stock, '');
  return { refused: unknownName(stock, ofSpecies) };
}

/** Table 4A has Stud 8 in and deeper take the values (and CF) of No.3. */
const STUD_DEEP: SizeClass = {
  text: '8 in and deeper as No.3',
  thickness: [2, 4],
  depth: [8, Infinity],
  shape: null,
};
const STUD: SizeClass = { text: '2-4 in thick, 2-6 in wide', thickness: [2, 4], depth: [2, 6], shape: null };

function lumberRowsOf(ofSpecies: readonly LumberRow[], grade: string): LumberRow[] {
  const rows = ofSpecies.filter((row) => row.grade === grade);
  if (grade !== 'Stud') return rows;
  const deep = ofSpecies.filter((row) => row.grade === 'No.3');
  return [
    ...rows.map((row) => ({ ...row, size: STUD })),
    ...deep.map((row) => ({ ...row, size: STUD_DEEP })),
  ];
}

/** Index of the candidate that covers a section, -1 for none. */
export function candidateAt(candidates: readonly Candidate[], product: Product, section: Section): number {
  const thick = pieceThickness(section, product);
  const wide = pieceWidth(section, product);
  for (let at = 0; at < candidates.length; at += 1) if (covers(candidates[at]!.size, thick, wide)) return at;
  return -1;
}

/** Posts & timbers have a depth not more than this over their width, in (NDS 4.1.3.4). */
const POST_OVER = 2;
/** Floating-point slack on the difference of two typed sizes. */
const ROUNDING = 1e-9;

function covers(size: SizeClass | null, thick: number, wide: number): boolean {
  if (size === null) return true;
  const thin = size.thickness[0];
  const most = size.thickness[1];
  if (thick < dressedLeast(thin) - SIZE_TOLERANCE || thick > most + SIZE_TOLERANCE) return false;
  if (thin >= TIMBER) {
    if (size.shape === null) return true;
    const beams = wide - thick > POST_OVER + ROUNDING;
    return beams === (size.shape === 'beams & stringers');
  }
  const depth = nominalUp(wide);
  return (
    wide >= dressedLeast(2) - SIZE_TOLERANCE &&
    depth <= size.depth[1] &&
    (depth >= size.depth[0] || size.depth[0] <= 2)
  );
}

/** Nominal thickness from which lumber is timber (NDS 4.1.3). */
const TIMBER = 5;

/** Least dressed size of a nominal one: both 2 to 4 in lumber and timbers are at most 1/2 in less. */
function dressedLeast(nominal: number): number {
  return Math.max(0, nominal - TIMBER_DRESSING);
}

/** One line on a size that no row covers. */
export function sizesCovered(candidates: readonly Candidate[], stock: Stock, section: Section): string {
  const texts = [...new Set(candidates.map(({ size }) => size?.text ?? ''))].join('; ');
  const source = candidates[0]!.values.source;
  const size = `${number(section.width)} x ${number(section.depth)} in`;
  return `${stock.species} ${stock.grade} has no values at ${size}: the table covers ${texts} (${source})`;
}

function number(value: number): string {
  return String(Math.round(value * 1000) / 1000);
}

function fromRow(row: LumberRow, cov: number): DesignValues {
  const { Fb, Fv, Fcperp, E, Emin, G, source, status } = row;
  return { Fb, FbNeg: Fb, Fv, Fcperp, E, Emin, EyMin: Emin, G, COV: cov, source, status };
}

function glulamOf(stock: Stock): Candidate[] | Refusal {
  const row = GLULAM.find(({ grade }) => grade === stock.grade);
  const group = glulamGroup(stock);
  if (group === null) {
    const known = [WESTERN, SP];
    return { refused: `no glulam of ${quote(stock.species)}: ${suggestion(stock.species, known)}` };
  }
  if (row && (row.only === null || row.only === group)) {
    const { Fb, FbNeg, Fv, Fcperp, E, Emin, EyMin, G, source, status } = row;
    const values = { Fb, FbNeg, Fv, Fcperp, E, Emin, EyMin, G, COV: COV.glulam, source, status };
    return [{ size: null, grade: row.grade, values: typedOver(values, stock) }];
  }
  if (row) return { refused: `glulam ${row.grade} is made of ${row.only} only (${row.source})` };
  if (isComplete(stock) && typed(stock, 'FbNeg') && typed(stock, 'EyMin')) return typedOf(stock, '');
  const known = GLULAM.map(({ grade }) => grade);
  return {
    refused: `glulam has no stress class ${quote(stock.grade)} in Table 5A: ${suggestion(stock.grade, known)}`,
  };
}

/** The species group of a glulam: `Western species` where nothing says Southern Pine; null for an unknown name. */
export function glulamGroup(stock: Stock): string | null {
  const species = stock.species.trim();
  const madeOf = GLULAM.find(({ grade }) => grade === stock.grade)?.only ?? null;
  if (species === '') return madeOf ?? WESTERN;
  if (species === SP) return SP;
  const western = [WESTERN, 'Western', 'Douglas Fir', 'DF', ...Object.keys(SHORT_SPECIES)];
  return western.some((name) => name.toLowerCase() === species.toLowerCase()) ? WESTERN : null;
}

const TYPICAL_LVL = /^(typical)?\s*(2\.0E)?$/i;

function lvlOf(stock: Stock): Candidate[] | Refusal {
  if (isComplete(stock)) return typedOf(stock, '');
  if (TYPICAL_LVL.test(stock.grade.trim())) {
    const { Fb, Fv, Fcperp, E, Emin, G, source, status, grade } = LVL[0]!;
    const values = { Fb, FbNeg: Fb, Fv, Fcperp, E, Emin, EyMin: Emin, G, COV: COV.LVL, source, status };
    return [{ size: null, grade, values: typedOver(values, stock) }];
  }
  const missing = missingOf(stock).join(', ');
  return {
    refused: `LVL ${quote(stock.grade)} needs its maker's values (${missing}); the typical set is ${quote(LVL[0]!.grade)}`,
  };
}

/** A stock all of whose values are typed. */
function typedOf(stock: Stock, asking: string): Candidate[] | Refusal {
  const missing = missingOf(stock);
  if (missing.length > 0) return { refused: `${asking} typed values: ${missing.join(', ')} (stock.values)` };
  const { Fb, Fv, Fcperp, E, G } = stock.values as Record<StockValue, number>;
  const Emin = typed(stock, 'Emin') ?? eMin(E, typed(stock, 'COV')!);
  const values: DesignValues = {
    Fb,
    FbNeg: typed(stock, 'FbNeg') ?? Fb,
    Fv,
    Fcperp,
    E,
    Emin,
    EyMin: typed(stock, 'EyMin') ?? Emin,
    G,
    COV: typed(stock, 'COV') ?? null,
    source: stock.valuesFrom ?? '',
    status: 'typed',
  };
  return [{ size: SIZES[stock.product] ?? null, grade: stock.grade, values }];
}

/** Emin from E and its COV: factor 1.03 to pure bending, 1.66 of safety, lower fifth percentile (NDS Appendix D). */
export function eMin(E: number, cov: number): number {
  return (E * 1.03 * (1 - 1.645 * cov)) / 1.66;
}

function missingOf(stock: Stock): StockValue[] {
  const derived = typed(stock, 'COV') !== undefined;
  return NEEDED.filter((key) => typed(stock, key) === undefined && !(key === 'Emin' && derived));
}

/** Whether the typed values do without a table. */
export function isComplete(stock: Stock): boolean {
  return missingOf(stock).length === 0;
}

function typed(stock: Stock, key: StockValue): number | undefined {
  return stock.values?.[key];
}

/** Table values with the typed ones over them; a typed Fb goes for FbNeg too, except that of glulam. */
function typedOver(table: DesignValues, stock: Stock): DesignValues {
  if (stock.values === null || Object.keys(stock.values).length === 0) return table;
  const over = stock.values;
  const one = stock.product !== 'glulam';
  return {
    ...table,
    ...(one && over.Fb !== undefined ? { FbNeg: over.Fb } : {}),
    ...(one && over.Emin !== undefined ? { EyMin: over.Emin } : {}),
    ...over,
    source: `${table.source}; ${Object.keys(over).join(', ')} from ${stock.valuesFrom}`,
    status: `${table.status}; ${Object.keys(over).join(', ')} typed`,
  };
}

/** What is wrong with the typed values themselves; null when nothing is. */
function typedFault(stock: Stock): string | null {
  const entries = Object.entries(stock.values ?? {});
  if (entries.length === 0) return null;
  for (const [key, value] of entries) {
    if (value === undefined || !Number.isFinite(value) || value <= 0)
      return `typed ${key} must be more than 0`;
  }
  if (!stock.valuesFrom?.trim()) return 'typed values need the place where they were read (stock.valuesFrom)';
  return null;
}

function unknownName(stock: Stock, ofSpecies: readonly LumberRow[]): string {
  const species = [...new Set(rowsOf(stock.product).map((row) => row.species))];
  if (ofSpecies.length === 0) {
    return `no ${stock.product} of species ${quote(stock.species)}: ${suggestion(stock.species, species)}`;
  }
  const grades = [...new Set(ofSpecies.map((row) => row.grade))];
  const asked = `${stock.species} has no grade ${quote(stock.grade)} as ${stock.product}`;
  return `${asked}: ${suggestion(stock.grade, grades)} (${ofSpecies[0]!.source})`;
}

function suggestion(name: string, known: readonly string[]): string {
  const nearest = nearestName(name, known);
  return nearest === null ? `known are ${known.join(', ')}` : `nearest is ${quote(nearest)}`;
}

function quote(text: string): string {
  return `"${text}"`;
}
