import type { YardRow } from '../explore/buying/yard.ts';
import { harmless, parseQuantity, quoted } from '../quantity/index.ts';
import { nearestName } from '../timber/nearest-name.ts';
import { explainIssues } from './explain-issue.ts';
import { SessionFault } from './fault.ts';
import { readYardRow } from './read-buying.ts';
import { PARTS } from './schema.ts';
import { yardRow } from './schema-buying.ts';
import { MAX_YARD } from './session.ts';

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

type MoneyKey = 'each' | 'perFoot' | 'perBoardFoot';

const PER: Readonly<Record<string, MoneyKey>> = {
  piece: 'each',
  pc: 'each',
  each: 'each',
  ea: 'each',
  foot: 'perFoot',
  ft: 'perFoot',
  lf: 'perFoot',
  boardfoot: 'perBoardFoot',
  bdft: 'perBoardFoot',
  bf: 'perBoardFoot',
};

/**
 * A yard list from the lines of a table, its heads first, in any order. Lengths stand in one cell ("8 10 12", "8-20" for
 * every two feet, "2.4 m; 3 m"), bare numbers in feet, or metres where the head says so. Prices have a column for each
 * way of counting, or one for the amount and one for what it is for. An empty cell says nothing.
 */
export function readYardTable(lines: readonly TableLine[]): YardRead {
  const [head, ...rest] = lines;
  try {
    if (head === undefined)
      throw new SessionFault([], 'is empty; its first line names its columns: size, grade, ...');
    const keys = head.cells.map(keyOf);
    if (!keys.includes('size')) throw new SessionFault([], `line ${head.line}: no column is named size`);
    const metres = head.cells.some((cell) => /^lengths? *\(?m\)?$/i.test(cell.trim()));
    if (rest.length > MAX_YARD)
      throw new SessionFault([], `has over ${MAX_YARD} lines, the most that are read`);
    return { ok: true, rows: rest.map((line) => readLine(line, keys, metres ? 'm' : 'ft')) };
  } catch (fault) {
    if (fault instanceof SessionFault) return { ok: false, fault: fault.message };
    throw fault;
  }
}

function keyOf(cell: string): Key {
  const plain = cell.toLowerCase().replace(/[^a-z]/g, '');
  const key = Object.hasOwn(HEADS, plain) ? HEADS[plain] : undefined;
  if (key !== undefined) return key;
  const near = nearestName(cell.trim().slice(0, 40), KNOWN);
  throw new SessionFault(
    [],
    `line 1: no column ${quoted(cell)} is known; ${near === null ? `known are ${KNOWN.join(', ')}` : `the nearest is "${near}"`}`,
  );
}

function readLine({ line, cells }: TableLine, keys: readonly Key[], unit: 'ft' | 'm'): YardRow {
  const at = (text: string) => new SessionFault([], `line ${line}: ${text}`);
  const raw: Record<string, unknown> = {};
  let price: string | null = null;
  let per: string | null = null;
  keys.forEach((key, column) => {
    const text = (cells[column] ?? '').trim();
    if (text === '') return;
    if (key === 'price') price = text;
    else if (key === 'per') per = text;
    else if (key === 'lengths') raw.lengths = lengthsOf(text, unit, at);
    else if (key === 'each' || key === 'perFoot' || key === 'perBoardFoot') raw[key] = moneyOf(text, at);
    else raw[key] = text;
  });
  if (price !== null) raw[countedBy(per, at)] = moneyOf(price, at);
  const schema = yardRow(PARTS);
  const parsed = schema.safeParse(raw);
  if (!parsed.success) {
    const { path, message } = explainIssues(parsed.error.issues, raw, schema);
    throw at(`${path.length === 0 ? '' : `${path.join('.')}: `}${message}`);
  }
  try {
    return readYardRow(parsed.data, []);
  } catch (fault) {
    if (fault instanceof SessionFault) throw at(fault.message);
    throw fault;
  }
}

function countedBy(per: string | null, at: (text: string) => SessionFault): MoneyKey {
  if (per === null) throw at('the price does not say for what; write piece, foot or board foot under "per"');
  const plain = per
    .toLowerCase()
    .replace(/^(a|per) |[^a-z]/g, '')
    .replace(/feet$/, 'foot');
  const key = Object.hasOwn(PER, plain) ? PER[plain] : undefined;
  if (key === undefined)
    throw at(`${quoted(per)} is nothing that a price is for; write piece, foot or board foot`);
  return key;
}

/** "12.50", "$1,234.50", "12.50 EUR". */
function moneyOf(text: string, at: (text: string) => SessionFault): number {
  const plain = text.replace(/^\p{Sc}\s*|\s*(?:\p{Sc}|[A-Z]{3})$/gu, '');
  if (!/^(?:\d{1,3}(?:,\d{3})+|\d+)(?:\.\d+)?$|^\.\d+$/.test(plain)) {
    throw at(`${quoted(text)} is no price; write 12.50`);
  }
  return Number(plain.replaceAll(',', ''));
}

const FEET_APART = 2;
const MOST_FEET = 200;

function lengthsOf(text: string, unit: 'ft' | 'm', at: (text: string) => SessionFault): string[] {
  const range = /^(\d+) ?- ?(\d+)$/.exec(text);
  if (range !== null && unit === 'ft') {
    const [from, to] = [Number(range[1]), Number(range[2])];
    if (from > to || to > MOST_FEET) throw at(`${quoted(text)} is no range of lengths; write 8-20`);
    return Array.from(
      { length: Math.floor((to - from) / FEET_APART) + 1 },
      (_, n) => `${from + n * FEET_APART} ft`,
    );
  }
  const parts = /[;,|/]/.test(text)
    ? text.split(/[;,|/]/)
    : /[a-z'"]/i.test(text)
      ? [text]
      : text.split(/\s+/);
  return parts
    .map((part) => part.trim())
    .filter((part) => part !== '')
    .map((part) => {
      const written = /^[\d.]+$/.test(part) ? `${part} ${unit}` : part;
      const parsed = parseQuantity('length', written);
      if (!parsed.ok) throw at(`lengths: ${harmless(parsed.fault, FAULT_LENGTH)}`);
      return written;
    });
}

const FAULT_LENGTH = 160;
