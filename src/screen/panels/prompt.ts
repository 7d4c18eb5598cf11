import type { Canvas } from '../draw/canvas.ts';

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
