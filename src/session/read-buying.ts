import type { Price, PriceRow, YardRow } from '../explore/buying/yard.ts';
import { parseQuantity } from '../quantity/index.ts';
import { type Path, SessionFault } from './fault.ts';
import type { SessionFile } from './schema.ts';
import type { PriceRowFile, YardRowFile } from './schema-buying.ts';
import type { YardList } from './session.ts';

/** The yard list of a session; of a file only its name, whose lines are read where files may be. */
export function readYard(yard: SessionFile['yard']): YardList | null {
  if (yard === undefined) return null;
  if (typeof yard === 'string') return { file: yard, rows: null };
  return { file: null, rows: yard.map((row, at) => readYardRow(row, ['yard', at])) };
}

export function readYardRow(row: YardRowFile, path: Path): YardRow {
  const lengths = (row.lengths ?? []).map((text) => {
    const parsed = parseQuantity('length', text);
    if (!parsed.ok) throw new SessionFault([...path, 'lengths'], parsed.fault);
    return parsed.value;
  });
  return {
    size: row.size,
    ...readWood(row),
    lengths: [...new Set(lengths)].sort((a, b) => a - b),
    price: readPrice(row, path),
  };
}

export function readPrices(rows: readonly PriceRowFile[] | undefined): PriceRow[] {
  return (rows ?? []).map((row, at) => {
    const path = ['prices', at];
    const price = readPrice(row, path);
    if (price === null) {
      throw new SessionFault(
        path,
        'has no price; write each, perFoot or perBoardFoot, as "perBoardFoot": 1.2',
      );
    }
    return { size: row.size ?? null, ...readWood(row), price };
  });
}

function readWood({ product, species, grade }: PriceRowFile) {
  return { product: product ?? null, species: species ?? null, grade: grade ?? null };
}

const MONEY = [
  ['each', 'piece'],
  ['perFoot', 'foot'],
  ['perBoardFoot', 'board foot'],
] as const;

function readPrice(row: PriceRowFile, path: Path): Price | null {
  const given = MONEY.filter(([key]) => row[key] !== undefined);
  if (given.length > 1) {
    const keys = given.map(([key]) => key).join(' and ');
    throw new SessionFault(path, `${keys} are both given; leave one of them out`);
  }
  const [only] = given;
  return only === undefined ? null : { amount: row[only[0]]!, per: only[1] };
}
