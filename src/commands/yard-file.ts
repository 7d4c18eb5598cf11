import { homedir } from 'node:os';
import { dirname, resolve } from 'node:path';
import { CsvError, parse } from 'csv-parse/sync';
import type { YardRow } from '../explore/buying/yard.ts';
import { harmless, isHarmful } from '../quantity/index.ts';
import type { YardAnswer } from '../screen/effect.ts';
import { MAX_FILE_NAME, type Session } from '../session/session.ts';
import { readYardTable, type TableLine } from '../session/yard-table.ts';
import { woodsOf } from '../timber/index.ts';
import type { Stock } from '../timber/member.ts';
import { BadInput } from './status.ts';

/** The session with the lines of its yard list's file, which is named from the session's own folder. */
export function withYard(session: Session, file: string, readText: (file: string) => string): Session {
  const { yard } = session;
  if (yard == null || yard.file === null) return session;
  const at = resolve(dirname(file), yard.file);
  return { ...session, yard: { file: yard.file, rows: readYardFile(at, woodsIn(session), readText) } };
}

/**
 * Reads a list by the name that was typed: from the folder of the session, or of the program where the session has no
 * file yet; then it is kept by its whole path, which holds wherever the session will be kept.
 */
export function openYard(
  name: string,
  session: Session,
  file: string | null,
  readText: (file: string) => string,
): YardAnswer {
  const plain = name.replace(/^~(?=\/)/, homedir());
  const at = file === null ? resolve(plain) : resolve(dirname(file), plain);
  const kept = file === null ? at : plain;
  if (kept.length > MAX_FILE_NAME || isHarmful(kept)) {
    return {
      ok: false,
      fault: `${harmless(kept)}: no session can keep such a name; move the list to another folder`,
    };
  }
  try {
    const rows = readYardFile(at, woodsIn(session), readText);
    return { ok: true, file: kept, rows };
  } catch (error) {
    if (error instanceof BadInput) return { ok: false, fault: error.message };
    throw error;
  }
}

/** Every wood of a job, those on its racks too. */
function woodsIn({ members }: Session): Stock[] {
  return members.flatMap(({ member }) => woodsOf(member));
}

/** Throws BadInput with the line and what would be right. */
function readYardFile(
  file: string,
  woods: readonly Stock[],
  readText: (file: string) => string,
): readonly YardRow[] {
  const read = readYardTable(linesOf(readText(file), file), woods);
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
      // Inches within a cell: 1.5" x 11.25".
      relax_quotes: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      trim: true,
    }) as unknown as { readonly info: { readonly lines: number }; readonly record: string[] }[];
    return records.map(({ info, record }) => ({ line: info.lines, cells: record }));
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    throw new BadInput(
      `${harmless(file)}: is not CSV: ${harmless(error.message, FAULT_LENGTH)}; close the quote or take it out`,
    );
  }
}
