import type { Canvas } from '../draw/canvas.ts';
import { cells, clip, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';

/** Cells of a field being typed into. */
export interface Place {
  readonly row: number;
  readonly column: number;
  readonly width: number;
}

const GAP = 2;

/** A question on the last two rows, over what stands there; gives the place of a field after its words. */
export function drawPrompt(canvas: Canvas, question: string, hint: string): Place {
  const row = canvas.rows - 2;
  const blank = ' '.repeat(canvas.columns);
  canvas.put(0, row, blank);
  canvas.put(0, row + 1, blank);
  canvas.put(1, row, question, 'governsStrong');
  canvas.put(1, row + 1, hint, 'quiet');
  const column = 1 + question.length + GAP;
  return { row, column, width: Math.max(1, canvas.columns - column - 1) };
}

/** What is asked in a view of its own. */
export interface Question {
  /** The words before the field. */
  readonly asks: string;
  /** What may be typed, or why that may not be. */
  readonly told: string;
  readonly isFault: boolean;
}

/** A question on the last row, and above it what may be typed; gives the place of a field after its words. */
export function drawQuestion({ asks, told, isFault }: Question, canvas: Canvas, glyphs: Glyphs): Place {
  const { columns, rows } = canvas;
  canvas.put(1, rows - 2, clip(cells(told), columns - 2, glyphs), isFault ? 'governs' : 'quiet');
  const question = shorten(cells(asks), Math.floor(columns / 2), glyphs);
  canvas.put(1, rows - 1, question, 'governsStrong');
  const column = question.length + 3;
  return { row: rows - 1, column, width: Math.max(1, columns - column - 1) };
}
