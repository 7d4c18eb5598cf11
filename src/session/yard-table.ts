import type { YardRow } from '../explore/buying/yard.ts';
import { doubleIn, yardChecker } from '../explore/buying/yard-fault.ts';
import { quoted } from '../quantity/index.ts';
import type { Stock } from '../timber/member.ts';
import { nearestName } from '../timber/nearest-name.ts';
import { SessionFault } from './fault.ts';
import { MAX_YARD } from './session.ts';
import { countedBy, lengthsOf, type MoneyKey, moneyOf, yardRowOf } from './yard-cells.ts';

export type YardRead =
  | { readonly ok: true; readonly rows: readonly YardRow[] }
  /** What is wrong and what would be right, the line first: "line 3: ...". */
  | { readonly ok: false; readonly fault: string };

/** A line of a table with the number it has in its file. */
export interface TableLine {
  readonly line: number;
  readonly cells: readonly string[];
}

type Key = 'size' | 'product' | 'species' | 'grade' | 'lengths' | MoneyKey | 'price' | 'per';

/** Heads by their letters alone: "Price / bd ft" is pricebdft. */
const HEADS: Readonly<Record<string, Key>> = {
  size: 'size',
  product: 'product',
  species: 'species',
  wood: 'species',
  grade: 'grade',
  lengths: 'lengths',
  length: 'lengths',
  lengthsft: 'lengths',
  lengthft: 'lengths',
  lengthsm: 'lengths',
  lengthm: 'lengths',
  each: 'each',
  piece: 'each',
  priceeach: 'each',
  pricepiece: 'each',
  priceapiece: 'each',
  priceperpiece: 'each',
  perpiece: 'each',
  foot: 'perFoot',
  perfoot: 'perFoot',
  pricefoot: 'perFoot',
  priceafoot: 'perFoot',
  priceperfoot: 'perFoot',
  boardfoot: 'perBoardFoot',
  perboardfoot: 'perBoardFoot',
  priceboardfoot: 'perBoardFoot',
  priceaboardfoot: 'perBoardFoot',
  priceperboardfoot: 'perBoardFoot',
  price: 'price',
  per: 'per',
  unit: 'per',
};
const KNOWN = [
  'size',
  'product',
  'species',
  'grade',
  'lengths',
  'each',
  'per foot',
  'per board foot',
  'price',
  'per',
];

/**
 * A yard list from the lines of a table, its heads first, in any order. Lengths stand in one cell ("8 10 12", "8-20" for
 * every two feet, "2.4 m; 3 m"), bare numbers in feet, or metres where the head says so. Prices have a column for each
 * way of counting, or one for the amount and one for what it is for. An empty cell says nothing. `woods`: those of the
 * job, known beside the ones in the tables.
 */
export function readYardTable(lines: readonly TableLine[], woods: readonly Stock[] = []): YardRead {
  const [head, ...rest] = lines;
  try {
    if (head === undefined)
      throw new SessionFault([], 'is empty; its first line names its columns: size, grade, ...');
    const keys = keysOf(head);
    const metres = head.cells.some((cell) => /^lengths? *\(?m\)?$/i.test(cell.trim()));
    if (rest.length === 0)
      throw new SessionFault([], `has no line below its heads; one a size, as ${EXAMPLE}`);
    if (rest.length > MAX_YARD)
      throw new SessionFault([], `has over ${MAX_YARD} lines, the most that are read`);
    const check = yardChecker(woods);
    const rows = rest.map((line) => readLine(line, keys, metres ? 'm' : 'ft', check));
    const double = doubleIn(rows);
    if (double !== null) {
      const [line, first] = [rest[double.at]!.line, rest[double.of]!.line];
      throw new SessionFault(
        [],
        `line ${line}: ${quoted(rows[double.at]!.size)} of this wood and length is in line ${first} already; leave one of them out`,
      );
    }
    return { ok: true, rows };
  } catch (fault) {
    if (fault instanceof SessionFault) return { ok: false, fault: fault.message };
    throw fault;
  }
}

const EXAMPLE = '2x12,No.2,8-20,35';

function keysOf({ line, cells }: TableLine): Key[] {
  const keys = cells.map((cell) => keyOf(cell, line));
  if (!keys.includes('size'))
    throw new SessionFault([], `line ${line}: no column is named size; the first line names the columns`);
  const twice = keys.find((key, at) => keys.indexOf(key) < at);
  if (twice !== undefined)
    throw new SessionFault([], `line ${line}: two columns are for ${twice}; leave one of them out`);
  return keys;
}

function keyOf(cell: string, line: number): Key {
  const plain = cell.toLowerCase().replace(/[^a-z]/g, '');
  const key = Object.hasOwn(HEADS, plain) ? HEADS[plain] : undefined;
  if (key !== undefined) return key;
  const near = nearestName(cell.trim().slice(0, 40), KNOWN);
  throw new SessionFault(
    [],
    `line ${line}: no column ${quoted(cell)} is known; ${near === null ? `known are ${KNOWN.join(', ')}` : `the nearest is "${near}"`}`,
  );
}

/** A longer cell is no cell of such a list: a quote was left open, or the file is another one. */
const LONGEST_CELL = 1000;

function readLine(
  { line, cells }: TableLine,
  keys: readonly Key[],
  unit: 'ft' | 'm',
  check: ReturnType<typeof yardChecker>,
): YardRow {
  const at = (text: string) => new SessionFault([], `line ${line}: ${text}`);
  if (cells.slice(keys.length).some((cell) => cell.trim() !== ''))
    throw at(`has more cells than the ${keys.length} columns named; quote a cell that holds the separator`);
  const raw: Record<string, unknown> = {};
  let price: string | null = null;
  let per: string | null = null;
  keys.forEach((key, column) => {
    const text = (cells[column] ?? '').trim();
    if (text === '') return;
    if (text.length > LONGEST_CELL)
      throw at(`${key}: a cell of ${text.length} characters; is a quote left open in this line or above?`);
    if (/^[=+@]/.test(text)) throw at(`${key}: ${quoted(text)} is a formula; put the value in its place`);
    if (key === 'price') price = text;
    else if (key === 'per') per = text;
    else if (key === 'lengths') raw.lengths = lengthsOf(text, unit, at);
    else if (key === 'each' || key === 'perFoot' || key === 'perBoardFoot') raw[key] = moneyOf(text, at);
    else raw[key] = text;
  });
  if (price !== null) raw[countedBy(per, at)] = moneyOf(price, at);
  const row = yardRowOf(raw, at);
  const fault = check(row);
  if (fault !== null) throw at(`${fault.key}: ${fault.reason}`);
  return row;
}
