/** A record of a CSV text, with the line that it begins on, from 1. */
export type CsvRecord =
  | { readonly line: number; readonly cells: readonly string[] }
  /** One that is no row, and what is wrong with it. */
  | { readonly line: number; readonly broken: Broken };

export type Broken = 'too long' | 'open quote';

/** Characters of a record at most; a cell cannot be longer either. */
export const LONGEST_RECORD = 64 * 1024;

const DELIMITERS = [',', ';', '\t'] as const;
type Delimiter = (typeof DELIMITERS)[number];

/**
 * Reads CSV (RFC 4180) piece by piece, keeping no more than one record: quoted cells with commas, line ends and doubled
 * quotes in them; lines that end in LF, CRLF or CR; comma, semicolon or tab between cells, whichever the first line
 * holds most of. Forgiving where people's tables are not strict: a quote inside a cell that does not begin with one (the
 * inch mark of 14'-6") is that mark, and so is what follows a closing quote. Blanks around a cell that is not quoted are
 * dropped, and so are empty lines. A record that is too long, or has a quote that is not closed within that length, is
 * told of and given up at its next line end, so that it does not take the rest of the text with it (csv-parse, which
 * reads yard lists, cannot go on behind such a record).
 */
export class CsvReader {
  #delimiter: Delimiter | null = null;
  /** What has not been read to the end of its record. */
  #rest = '';
  /** The line that it begins on. */
  #line = 1;
  /** The record that is given up, whose line end has not been found; null while there is none. */
  #givenUp: { readonly line: number; readonly broken: Broken } | null = null;
  /** A carriage return at the end of a piece: the line feed may begin the next one. */
  #held = '';

  /** The records that a further piece of the text completes. */
  push(piece: string): CsvRecord[] {
    const text = this.#held + piece;
    this.#held = text.endsWith('\r') ? '\r' : '';
    this.#rest += text.slice(0, text.length - this.#held.length);
    return this.#read(false);
  }

  /** The record that the end of the text completes. */
  end(): CsvRecord[] {
    this.#rest += this.#held;
    this.#held = '';
    return this.#read(true);
  }

  #read(ended: boolean): CsvRecord[] {
    const records: CsvRecord[] = [];
    let from = 0;
    for (;;) {
      if (this.#givenUp !== null) {
        const end = lineEnd(this.#rest, from);
        if (end < 0 && !ended) {
          from = this.#rest.length;
          break;
        }
        records.push(this.#givenUp);
        this.#givenUp = null;
        from = end < 0 ? this.#rest.length : this.#pastLineEnd(end);
      }
      if (from >= this.#rest.length) break;
      this.#delimiter ??= delimiterOf(this.#rest, ended);
      if (this.#delimiter === null) break;
      const record = readRecord(this.#rest, from, this.#delimiter, ended);
      if (record === null) break;
      if ('broken' in record) {
        this.#givenUp = { line: this.#line, broken: record.broken };
        this.#line += countLines(this.#rest, from, record.from);
        from = record.from;
        continue;
      }
      const line = this.#line;
      this.#line += countLines(this.#rest, from, record.end);
      from = record.end >= this.#rest.length ? this.#rest.length : this.#pastLineEnd(record.end);
      if (record.cells.some((cell) => cell !== '')) records.push({ line, cells: record.cells });
    }
    this.#rest = this.#rest.slice(from);
    return records;
  }

  /** Where the next line begins. */
  #pastLineEnd(end: number): number {
    this.#line += 1;
    return end + (this.#rest.startsWith('\r\n', end) ? 2 : 1);
  }
}

/** The separator that stands most often in the first line, outside quotes; null while that line has not ended. */
function delimiterOf(text: string, ended: boolean): Delimiter | null {
  const counts = new Map<string, number>(DELIMITERS.map((mark) => [mark, 0]));
  let quoted = false;
  let at = 0;
  for (; at < text.length && at < LONGEST_RECORD; at += 1) {
    const mark = text[at]!;
    if (mark === '"') quoted = !quoted;
    else if (quoted) continue;
    else if (mark === '\n' || mark === '\r') break;
    else if (counts.has(mark)) counts.set(mark, counts.get(mark)! + 1);
  }
  if (at === text.length && !ended) return null;
  return DELIMITERS.toSorted((a, b) => counts.get(b)! - counts.get(a)!)[0]!;
}

type Found =
  /** `end`: of the line end behind it, or of the text. */
  | { readonly cells: string[]; readonly end: number }
  /** `from`: where to look for the line end that it is given up at. */
  | { readonly broken: Broken; readonly from: number };

/** The record that begins at `from`; null where the text does not hold all of it yet. */
function readRecord(text: string, from: number, delimiter: Delimiter, ended: boolean): Found | null {
  const last = from + LONGEST_RECORD;
  const tooLong: Found = { broken: 'too long', from: last };
  const cells: string[] = [];
  for (let at = from; ; ) {
    const start = skipBlanks(text, at, delimiter);
    const isQuoted = text[start] === '"';
    const close = isQuoted ? closingQuote(text, start + 1, last) : start;
    if (close < 0) return ended || text.length > last ? { broken: 'open quote', from: start } : null;
    const end = cellEnd(text, isQuoted ? close + 1 : start, delimiter);
    if (end > last) return tooLong;
    cells.push(
      isQuoted
        ? text.slice(start + 1, close).replaceAll('""', '"') + text.slice(close + 1, end).trim()
        : text.slice(start, end).trim(),
    );
    if (end >= text.length) return ended ? { cells, end } : null;
    if (text[end] !== delimiter) return { cells, end };
    at = end + 1;
  }
}

/** Past blanks, of which a tab that separates cells is none. */
function skipBlanks(text: string, from: number, delimiter: Delimiter): number {
  let at = from;
  while (text[at] === ' ' || (text[at] === '\t' && delimiter !== '\t')) at += 1;
  return at;
}

/** The quote that is not doubled; -1 where there is none up to `last`. */
function closingQuote(text: string, from: number, last: number): number {
  for (let at = from; ; ) {
    const quote = text.indexOf('"', at);
    if (quote < 0 || quote > last) return -1;
    if (text[quote + 1] !== '"') return quote;
    at = quote + 2;
  }
}

/** The separator or line end from there on; the end of the text where there is none. */
function cellEnd(text: string, from: number, delimiter: Delimiter): number {
  for (let at = from; at < text.length; at += 1) {
    const mark = text[at];
    if (mark === delimiter || mark === '\n' || mark === '\r') return at;
  }
  return text.length;
}

/** The line feed or carriage return from there on; -1 where there is none. */
function lineEnd(text: string, from: number): number {
  for (let at = from; at < text.length; at += 1) if (text[at] === '\n' || text[at] === '\r') return at;
  return -1;
}

/** Line ends within a part of a text. */
function countLines(text: string, from: number, to: number): number {
  let lines = 0;
  for (let at = from; at < to; at += 1) {
    if (text[at] === '\n' || (text[at] === '\r' && text[at + 1] !== '\n')) lines += 1;
  }
  return lines;
}

/** Cells as one line of CSV, a comma between them and CRLF at its end, quoted where they have to be (RFC 4180). */
export function csvLine(cells: readonly string[]): string {
  return `${cells.map(csvCell).join(',')}\r\n`;
}

function csvCell(text: string): string {
  return /[",;\r\n\t]|^\s|\s$/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
