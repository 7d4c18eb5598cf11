/** Dots of one cell: two across, four down. */
export const DOTS_ACROSS = 2;
export const DOTS_DOWN = 4;

/** Unicode's bits of the eight dots, by column and row. */
export const BITS = [
  [0x01, 0x02, 0x04, 0x40],
  [0x08, 0x10, 0x20, 0x80],
] as const;

/** A field of dots over cells; dots outside it are left out. */
export class Dots {
  readonly columns: number;
  readonly rows: number;
  readonly #cells: Uint8Array;

  constructor(columns: number, rows: number) {
    this.columns = columns;
    this.rows = rows;
    this.#cells = new Uint8Array(columns * rows);
  }

  /** Puts a dot; x from the left, y from the top, in dots. */
  put(x: number, y: number): void {
    const column = Math.floor(x / DOTS_ACROSS);
    const row = Math.floor(y / DOTS_DOWN);
    if (column < 0 || row < 0 || column >= this.columns || row >= this.rows) return;
    this.#cells[row * this.columns + column]! |= BITS[x % DOTS_ACROSS]![y % DOTS_DOWN]!;
  }

  /** All dots of one column from one row of dots to another. */
  upright(x: number, from: number, to: number): void {
    for (let y = Math.min(from, to); y <= Math.max(from, to); y += 1) this.put(x, y);
  }

  /** A line through heights given one a column of dots: neighbours that are apart are joined. NaN leaves a gap. */
  through(heights: readonly number[]): void {
    let before = Number.NaN;
    for (const [x, y] of heights.entries()) {
      if (Number.isFinite(y)) {
        // The riser belongs half to either column, so that it leans neither way.
        const middle = Number.isFinite(before) ? Math.round((before + y) / 2) : y;
        this.upright(x, y, middle === y ? y : middle + Math.sign(y - middle));
        if (Number.isFinite(before) && before !== middle) this.upright(x - 1, before, middle);
      }
      before = y;
    }
  }

  /** The dots of a cell as bits; 0 where it has none. */
  cell(column: number, row: number): number {
    if (column < 0 || row < 0 || column >= this.columns || row >= this.rows) return 0;
    return this.#cells[row * this.columns + column]!;
  }
}

/** The braille glyph of a cell's dots; a blank where it has none. */
export function brailleGlyph(bits: number): string {
  return bits === 0 ? ' ' : String.fromCharCode(BLANK + bits);
}

/** Where Unicode's braille patterns begin. */
const BLANK = 0x2800;
