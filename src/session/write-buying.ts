import type { Price, PriceRow, YardRow } from '../explore/buying/yard.ts';
import { type Units, writeQuantity } from '../quantity/index.ts';
import { SessionFault } from './fault.ts';
import { keepList, present, rawAt } from './keep.ts';
import { readPrices, readYard } from './read-buying.ts';
import type { SessionFile } from './schema.ts';
import type { Session } from './session.ts';

/** `yard` as the file holds it: the name of the list's file, or its lines, each as the user wrote it while unchanged. */
export function writeYard({ yard, units, written }: Session): unknown {
  if (yard == null) return undefined;
  if (yard.file !== null) return yard.file;
  const raw = rawAt(written, 'yard');
  const before = unlessFaulty(() => readYard(raw as SessionFile['yard'])?.rows ?? undefined);
  return keepList(raw, before, yard.rows ?? [], (row) => yardRow(row, units));
}

export function writePrices({ prices, written }: Session): unknown {
  if (prices === undefined || prices.length === 0)
    return rawAt(written, 'prices') === undefined ? undefined : [];
  const raw = rawAt(written, 'prices');
  const before = unlessFaulty(() => readPrices(raw as SessionFile['prices']));
  return keepList(raw, before, prices, priceRow);
}

function yardRow(row: YardRow, units: Units): unknown {
  const { lengths } = row;
  return present({
    size: row.size,
    ...wood(row),
    lengths: lengths.length === 0 ? undefined : lengths.map((each) => writeQuantity('length', each, units)),
    ...money(row.price),
  });
}

function priceRow(row: PriceRow): unknown {
  return present({ size: row.size ?? undefined, ...wood(row), ...money(row.price) });
}

function wood({ product, species, grade }: Pick<PriceRow, 'product' | 'species' | 'grade'>) {
  return { product: product ?? undefined, species: species ?? undefined, grade: grade ?? undefined };
}

const KEY = { piece: 'each', foot: 'perFoot', 'board foot': 'perBoardFoot' } as const;

function money(price: Price | null): Record<string, number> {
  return price === null ? {} : { [KEY[price.per]]: price.amount };
}

/** What raw lines were read as; undefined where they no longer can be. */
function unlessFaulty<T>(read: () => T): T | undefined {
  try {
    return read();
  } catch (fault) {
    if (fault instanceof SessionFault) return undefined;
    throw fault;
  }
}
