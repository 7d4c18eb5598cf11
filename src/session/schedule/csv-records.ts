/** A record of a CSV text, with the line that it begins on, from 1. */
export type CsvRecord =
  | { readonly line: number; readonly cells: readonly string[] }
  /** One that is longer than any row: its cells are not kept. */
  | { readonly line: number; readonly tooLong: true; readonly lastLine: number };

/** Characters of a record at most; a cell cannot be longer either. */
export const LONGEST_RECORD = 64 * 1024;

const DELIMITERS = [',', ';', '\t'] as const;
type Delimiter = (typeof DELIMITERS)[number];

/**
 * Reads CSV (RFC 4180) piece by piece, keeping no more than one record: quoted cells with commas, line ends and doubled
 * quotes in them; lines that end in LF, CRLF or CR; comma, semicolon or tab between cells, whichever the first line
 * holds most of. Forgiving where people's tables are not strict: a quote inside a cell that does not begin with one (the
 * inch mark of 14'-6") is that mark, and so is what follows a closing quote. Blanks around a cell that is not quoted are
 * dropped, and so are empty lines. A record that is too long is told of and skipped up to the next line end, so that a
 * quote that is never closed does not take the rest of the text with it.
 */
export class CsvReader {
  #delimiter: Delimiter | null = null;
  /** What has not been read to the end of its record. */
  #rest = '';
  /** The line that it begins on. */
  #line = 1;
  /** Where a record that is too long began; null while none is. */
  #skipping: number | null = null;
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
      if (this.#skipping !== null) {
        const end = lineEnd(this.#rest, from);
        if (end < 0 && !ended) {
          from = this.#rest.length;
          break;
        }
        records.push({ line: this.#skipping, tooLong: true, lastLine: this.#line });
        this.#skipping = null;
        from = end < 0 ? this.#rest.length : this.#pastLineEnd(end);
      }
      if (from >= this.#rest.length) break;
      this.#delimiter ??= delimiterOf(this.#rest, ended);
      if (this.#delimiter === null) break;
      const record = readRecord(this.#rest, from, this.#delimiter, ended);
      if (record === 'too long') {
        this.#skipping = this.#line;
        const passed = from + LONGEST_RECORD;
        this.#line += countLines(this.#rest, from, passed);
        from = passed;
        continue;
      }
      if (record === null) break;
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

/** The record that begins at `from` and the place of the line end behind it; null where the text does not hold all of it. */
function readRecord(
  text: string,
  from: number,
  delimiter: Delimiter,
  ended: boolean,
): { readonly cells: string[]; readonly end: number } | 'too long' | null {
  const last = from + LONGEST_RECORD;
  const incomplete = () => (text.length > last ? 'too long' : null);
  const cells: string[] = [];
  for (let at = from; ; ) {
    const start = skipBlanks(text, at, delimiter);
    let cell: string;
    let end: number;
    if (text[start] === '"') {
      const close = closingQuote(text, start + 1, last);
      if (close < 0 && (!ended || text.length > last)) return incomplete();
      // A quote that is never closed: all that follows it is the cell.
      const inner = text.slice(start + 1, close < 0 ? text.length : close).replaceAll('""', '"');
      end = cellEnd(text, close < 0 ? text.length : close + 1, delimiter);
      cell = inner + text.slice(close + 1, end).trim();
      if (close < 0) cell = inner;
    } else {
      end = cellEnd(text, start, delimiter);
      cell = text.slice(start, end).trim();
    }
    if (end > last) return 'too long';
    cells.push(cell);
    if (end >= text.length) return ended ? { cells, end } : incomplete();
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
