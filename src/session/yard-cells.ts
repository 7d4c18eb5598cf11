import type { YardRow } from '../explore/buying/yard.ts';
import { harmless, parseQuantity, quoted } from '../quantity/index.ts';
import { explainIssues } from './explain-issue.ts';
import { SessionFault } from './fault.ts';
import { readYardRow } from './read-buying.ts';
import { PARTS } from './schema.ts';
import { yardRow } from './schema-buying.ts';

/** Says what is wrong in the line at hand. */
export type At = (text: string) => SessionFault;

/** What an amount is for, by its key in the session file. */
export type MoneyKey = 'each' | 'perFoot' | 'perBoardFoot';

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

/** Built when the first line is read: a list has thousands. */
let schema: ReturnType<typeof yardRow> | null = null;

/** The line that texts by their keys are, as the session file would hold it. Throws what `at` makes of a fault. */
export function yardRowOf(raw: Readonly<Record<string, unknown>>, at: At): YardRow {
  schema ??= yardRow(PARTS);
  const parsed = schema.safeParse(raw);
  if (!parsed.success) {
    const { path, message } = explainIssues(parsed.error.issues, raw, schema);
    throw at(`${path.length === 0 ? '' : `${path[0]}: `}${message}`);
  }
  try {
    return readYardRow(parsed.data, []);
  } catch (fault) {
    if (fault instanceof SessionFault) throw at(fault.message);
    throw fault;
  }
}

/** What a price is for: "piece", "a foot", "bd ft". */
export function countedBy(per: string | null, at: At): MoneyKey {
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
export function moneyOf(text: string, at: At): number {
  if (/^-|^\(.*\)$/.test(text)) throw at(`${quoted(text)} is less than nothing; a price is more than 0`);
  const plain = text.replace(/^\p{Sc}\s*|\s*(?:\p{Sc}|[A-Z]{3})$/gu, '');
  if (!/^(?:\d{1,3}(?:,\d{3})+|\d+)(?:\.\d+)?$|^\.\d+$/.test(plain)) {
    throw at(`${quoted(text)} is no price; write 12.50`);
  }
  return Number(plain.replaceAll(',', ''));
}

const FEET_APART = 2;
const MOST_FEET = 200;

/** "8 10 12", "8-20" for every two feet, "2.4 m; 3 m"; bare numbers in `unit`. */
export function lengthsOf(text: string, unit: 'ft' | 'm', at: At): string[] {
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
