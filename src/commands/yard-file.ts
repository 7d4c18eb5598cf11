import { dirname, resolve } from 'node:path';
import { CsvError, parse } from 'csv-parse/sync';
import type { YardRow } from '../explore/buying/yard.ts';
import { harmless } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import { readYardTable, type TableLine } from '../session/yard-table.ts';
import { BadInput } from './status.ts';

/** The session with the lines of its yard list's file, which is named from the session's own folder. */
export function withYard(session: Session, file: string, readText: (file: string) => string): Session {
  const { yard } = session;
  if (yard == null || yard.file === null) return session;
  return {
    ...session,
    yard: { file: yard.file, rows: readYardFile(resolve(dirname(file), yard.file), readText) },
  };
}

/** Throws BadInput with the line and what would be right. */
function readYardFile(file: string, readText: (file: string) => string): readonly YardRow[] {
  const read = readYardTable(linesOf(readText(file), file));
  if (!read.ok) throw new BadInput(`${harmless(file)}: ${read.fault}`);
  return read.rows;
}

const DELIMITERS = [',', ';', '\t'];
const BYTE_ORDER_MARK = /^\uFEFF/;
const FAULT_LENGTH = 200;

function linesOf(text: string, file: string): TableLine[] {
  const plain = text.replace(BYTE_ORDER_MARK, '');
  const head = plain.slice(0, plain.search(/[\r\n]|$/));
  const count = (mark: string) => head.split(mark).length;
  const delimiter = DELIMITERS.toSorted((a, b) => count(b) - count(a))[0]!;
  try {
    const records = parse(plain, {
      delimiter,
      info: true,
      relax_column_count: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      trim: true,
    }) as unknown as { readonly info: { readonly lines: number }; readonly record: string[] }[];
    return records.map(({ info, record }) => ({ line: info.lines, cells: record }));
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    throw new BadInput(`${harmless(file)}: is not CSV: ${harmless(error.message, FAULT_LENGTH)}`);
  }
}
