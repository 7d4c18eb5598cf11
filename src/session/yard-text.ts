import type { Price, YardRow } from '../explore/buying/yard.ts';
import { yardChecker } from '../explore/buying/yard-fault.ts';
import { type Units, writeQuantity } from '../quantity/index.ts';
import type { Stock } from '../timber/member.ts';
import { SessionFault } from './fault.ts';
import { present } from './keep.ts';
import { countedBy, lengthsOf, moneyOf, yardRowOf } from './yard-cells.ts';

/** What was typed, or why it is nothing, with the way out. */
export type Typed<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly fault: string };

const KEY = { each: 'piece', perFoot: 'foot', perBoardFoot: 'board foot' } as const;
const WORD = { piece: 'each', foot: 'ft', 'board foot': 'bf' } as const;

/** How a price is typed. */
export const PRICE_EXAMPLES = '35 each, 2.40 ft or 1.20 bf';

/** A price as it is typed: "35 each", "$2.40/ft", "1.20 a board foot". */
export function readPriceText(text: string): Typed<Price> {
  return typed(() => priceOf(text));
}

/** As `readPriceText` takes it: "1.2 bf". */
export function writePriceText({ amount, per }: Price): string {
  return `${amount} ${WORD[per]}`;
}

const at = (text: string) => new SessionFault([], text);

function priceOf(text: string): Price {
  const [, amount, rest] = /^(.*?[\d.)])\s*([^\d.)]*)$/u.exec(text.trim()) ?? [];
  if (amount === undefined) throw at(`"${text.trim()}" is no price; write ${PRICE_EXAMPLES}`);
  const money = moneyOf(amount, at);
  const per = rest!
    .replace(/^(?:\p{Sc}|[A-Z]{3}\b)\s*/u, '')
    .replace(/^\/\s*/, '')
    .trim();
  if (per === '') throw at(`${amount} for what? Write ${PRICE_EXAMPLES}`);
  const key = countedBy(per, at);
  return checkedPrice({ [key]: money }, KEY[key]);
}

/** Within the bounds of the session file. */
function checkedPrice(money: Readonly<Record<string, number>>, per: Price['per']): Price {
  return { amount: yardRowOf({ size: '2x4', ...money }, at).price!.amount, per };
}

/** The parts of a line as it is typed, in their order. */
export const YARD_PARTS = 'size; species; grade; lengths; price';

/**
 * A line of a yard list as it is typed, its parts in the order of `YARD_PARTS`, empty ones for any:
 * "2x12; DF-L; No.2; 8-20; 1.20 bf". Bare lengths are feet, metres in SI. It is of the product that `product` says.
 */
export function readYardText(
  text: string,
  product: YardRow['product'],
  units: Units,
  woods: readonly Stock[],
): Typed<YardRow> {
  return typed(() => {
    const parts = text.split(';').map((part) => part.trim());
    const [size, species, grade, lengths, price] = parts;
    if (parts.length > 5) throw at(`has ${parts.length} parts; it has five: ${YARD_PARTS}`);
    const raw = present({
      size: size || undefined,
      product: product ?? undefined,
      species: species || undefined,
      grade: grade || undefined,
      lengths: lengths ? lengthsOf(lengths, units === 'us' ? 'ft' : 'm', at) : undefined,
    });
    const row = yardRowOf(raw, at);
    const whole = price ? { ...row, price: priceOf(price) } : row;
    const fault = yardChecker(woods)(whole);
    if (fault !== null) throw at(`${fault.key}: ${fault.reason}`);
    return whole;
  });
}

/** As `readYardText` takes it; lengths in feet or metres. */
export function writeYardText(row: YardRow, units: Units): string {
  const { size, species, grade, lengths, price } = row;
  return [
    size,
    species ?? '',
    grade ?? '',
    lengths.map((length) => lengthText(length, units)).join(', '),
    price === null ? '' : writePriceText(price),
  ]
    .join('; ')
    .replace(/(; )+$/, '');
}

const FOOT = 12;

/** Bare where it is whole feet: "16". */
function lengthText(length: number, units: Units): string {
  return units === 'us' && length % FOOT === 0
    ? String(length / FOOT)
    : writeQuantity('length', length, units);
}

function typed<T>(read: () => T): Typed<T> {
  try {
    return { ok: true, value: read() };
  } catch (fault) {
    if (fault instanceof SessionFault) return { ok: false, fault: fault.message };
    throw fault;
  }
}
