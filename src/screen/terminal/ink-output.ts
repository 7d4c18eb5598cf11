/**
 * Takes the place of Ink's own output grid in the bundle (see .build/stand-ins.mjs). Ink lays every text out
 * cell by cell on a grid, each frame anew, and joins the cells back into rows. Where each row of the frame
 * is one text that starts at its left edge, as on this program's screens, the row is the text itself:
 * what Ink would print for it is worked out once and kept. Any other frame is handed to Ink's grid, to
 * which this one is held equal by a property test.
 */
import InkOutput from '../../../node_modules/ink/build/output.js';
import { reduceRow } from './ansi-tokenize.ts';
import { createGenerations } from './generations.ts';
import { isPlainRow } from './plain-row.ts';

type Transformer = (line: string, index: number) => string;

interface Write {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly transformers: Transformer[];
}

interface Clip {
  x1: number | undefined;
  x2: number | undefined;
  y1: number | undefined;
  y2: number | undefined;
}

interface Size {
  readonly width: number;
  readonly height: number;
}

/** A few frames of the largest screen. */
const ROWS_KEPT = 512;

const printedRows = createGenerations<string, string | Foreign>(ROWS_KEPT);
const FOREIGN = Symbol('more than single-width characters and styles');
type Foreign = typeof FOREIGN;
/** The row as Ink writes it, each change of style in its shortest form; or that it is Ink's to write. */
function printed(row: string): string | Foreign {
  let known = printedRows.get(row);
  if (known === undefined) {
    known = isPlainRow(row) ? reduceRow(row) : FOREIGN;
    printedRows.set(row, known);
  }
  return known;
}

/** One frame being drawn; the interface is that of Ink's Output. */
export default class Output {
  readonly #size: Size;
  readonly #writes: Write[] = [];
  /** The frame's calls, to be made again on Ink's grid. */
  readonly #calls: ((output: InkOutput) => void)[] = [];
  #clipped = false;

  constructor(size: Size) {
    this.#size = size;
  }

  write(x: number, y: number, text: string, options: { transformers: Transformer[] }): void {
    if (text === '') return;
    this.#writes.push({ x, y, text, transformers: options.transformers });
    this.#calls.push((output) => output.write(x, y, text, options));
  }

  clip(clip: Clip): void {
    this.#clipped = true;
    this.#calls.push((output) => output.clip(clip));
  }

  unclip(): void {
    this.#calls.push((output) => output.unclip());
  }

  get(): { output: string; height: number } {
    return this.#quick() ?? this.#whole();
  }

  #whole(): { output: string; height: number } {
    const output = new InkOutput(this.#size);
    for (const call of this.#calls) call(output);
    return output.get();
  }

  #quick(): { output: string; height: number } | null {
    const { height } = this.#size;
    if (this.#clipped || !Number.isInteger(height)) return null;
    const rows = new Array<string>(height).fill('');
    const taken = new Uint8Array(height);
    for (const { x, y, text, transformers } of this.#writes) {
      if (x !== 0 || taken[y] !== 0) return null;
      taken[y] = 1;
      const before = printed(text);
      if (before === FOREIGN) return null;
      let line = before;
      for (const transformer of transformers) line = transformer(line, 0);
      const after = printed(line);
      if (after === FOREIGN) return null;
      rows[y] = after.trimEnd();
    }
    return { output: rows.join('\n'), height };
  }
}
