import { WIDEST } from '../arrange.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { CureView, View } from '../view.ts';
import { showRatio } from './figures.ts';
import type { Region } from './region.ts';
import { write } from './region.ts';

/**
 * The verdict: a word in reverse video, what stops the member, and its cures as whole sentences. On two
 * rows the cures have the second, behind what of the reason goes on there; on one they follow, and the moves
 * fill what is left at the right end.
 */
export function drawVerdict(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const { verdict } = view;
  const word = verdict.passes ? ' PASSES ' : ' FAILS ';
  const left = region.x + 1;
  const right = region.x + region.columns - 2;
  canvas.put(left, region.y, word, 'verdict');

  const start = left + word.length + 1;
  const oneRow = region.rows < 2;
  const lines = wrap(cells(verdict.reason), right - start + 1, oneRow ? 1 : 2, glyphs);
  for (const [at, line] of lines.entries())
    canvas.put(start, region.y + at, line, verdict.passes ? 'strong' : 'governsStrong');

  const y = oneRow ? region.y : region.y + 1;
  const before = lines[y - region.y] ?? '';
  let x = before === '' ? start : start + before.length + 1;
  const told: string[] = [];
  for (const cure of verdict.cures) {
    const sentence = cells(cure);
    if (!write(canvas, x, y, sentence, right - x + 1)) break;
    told.push(sentence);
    x += sentence.length + 1;
  }
  if (!oneRow || region.columns >= WIDEST) return;
  const others = view.cures.filter((cure) => !told.some((sentence) => isToldIn(sentence, cure, glyphs)));
  drawAside(others, canvas, x + 2, right, y, glyphs);
}

/** True where a sentence of the verdict has named the size or the span of a cure: "Lightest cure: 4x16, 0.90." */
function isToldIn(sentence: string, { label, ratio }: CureView, glyphs: Glyphs): boolean {
  return [`${label}, ${showRatio(ratio, glyphs)}`, `to ${label}.`].some((text) => sentence.includes(text));
}

/** "deepen 0.93 · a ply more 0.87" at the right end: as many cures, best first, as fit whole. */
function drawAside(
  cures: readonly CureView[],
  canvas: Canvas,
  from: number,
  end: number,
  y: number,
  glyphs: Glyphs,
): void {
  let text = '';
  for (const cure of cures) {
    const item = `${cells(cure.kind)} ${showRatio(cure.ratio, glyphs)}`;
    const longer = text === '' ? item : `${text} · ${item}`;
    if (longer.length > end - from + 1) break;
    text = longer;
  }
  canvas.put(end - text.length + 1, y, text, 'quiet');
}
