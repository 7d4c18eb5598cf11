/** What a cell means; the theme decides how it looks. Meaning never rests on the style alone. */
export const STYLES = [
  'plain',
  'strong',
  'quiet',
  'now',
  'governs',
  'verdict',
  'nowStrong',
  'governsStrong',
] as const;
export type Style = (typeof STYLES)[number];

/** A grid of single-width cells that the panels draw into; nothing drawn outside it, nothing wraps. */
export class Canvas {
  readonly columns: number;
  readonly rows: number;
  /** Row-major; one character a cell. */
  readonly glyphs: string[];
  /** Row-major; index into STYLES. */
  readonly styles: Uint8Array;

  constructor(columns: number, rows: number) {
    this.columns = columns;
    this.rows = rows;
    this.glyphs = new Array<string>(columns * rows).fill(' ');
    this.styles = new Uint8Array(columns * rows);
  }

  /** Puts text at column x, row y; what falls outside the canvas is not drawn. */
  put(x: number, y: number, text: string, style: Style = 'plain'): void {
    if (y < 0 || y >= this.rows) return;
    const code = STYLES.indexOf(style);
    let column = x;
    for (const glyph of text) {
      if (column >= this.columns) return;
      if (column >= 0) {
        this.glyphs[y * this.columns + column] = glyph;
        this.styles[y * this.columns + column] = code;
      }
      column += 1;
    }
  }

  /** Puts text so that its last character stands at column x. */
  putRight(x: number, y: number, text: string, style: Style = 'plain'): void {
    this.put(x - [...text].length + 1, y, text, style);
  }

  /** A row as plain text, trailing blanks trimmed: what a test or a reader sees. */
  text(y: number): string {
    return this.glyphs
      .slice(y * this.columns, (y + 1) * this.columns)
      .join('')
      .trimEnd();
  }
}
