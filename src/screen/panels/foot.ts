import type { Canvas } from '../draw/canvas.ts';
import { cells, clip } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { Notice } from '../state.ts';
import { ALL_KEYS, type FootView, type View } from '../view.ts';
import type { Region } from './region.ts';

const GAP = 2;

/** The keys that matter now, or the message of the moment in their place. */
export function drawFoot(
  view: Pick<View, 'notice' | 'foot'>,
  canvas: Canvas,
  region: Region,
  glyphs: Glyphs,
): void {
  if (view.notice === null) {
    drawKeys(view.foot, canvas, region.x + 1, region.x + region.columns - 1, region.y, glyphs);
    return;
  }
  const end = region.x + region.columns - 1;
  const always = view.foot.find((item) => item.keys === ALL_KEYS.keys);
  const kept = always === undefined ? 0 : widthOf(always, glyphs) + GAP;
  const text = clip(cells(view.notice.text), region.columns - 2 - kept, glyphs);
  canvas.put(region.x + 1, region.y, text, view.notice.style);
  if (always !== undefined)
    drawKeys([always], canvas, region.x + 1 + text.length + GAP, end, region.y, glyphs);
}

/** The foot of a view of its own, on the last row. */
export function drawLastRow(
  notice: Notice | null,
  foot: readonly FootView[],
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  const told =
    notice === null ? null : ({ text: notice.text, style: notice.refusal ? 'governs' : 'strong' } as const);
  const region = { x: 0, y: canvas.rows - 1, columns: canvas.columns, rows: 1 };
  drawFoot({ notice: told, foot }, canvas, region, glyphs);
}

/** Keys and what they do from `x` up to but not at `end`: whole items, dropped from the end, `?` always kept. */
export function drawKeys(
  foot: readonly FootView[],
  canvas: Canvas,
  x: number,
  end: number,
  y: number,
  glyphs: Glyphs,
): void {
  const always = foot.find((item) => item.keys === ALL_KEYS.keys);
  let room = end - x - (always === undefined ? 0 : widthOf(always, glyphs));
  let column = x;
  let full = false;
  for (const item of foot) {
    const width = widthOf(item, glyphs);
    if (item !== always) {
      full ||= width + GAP > room;
      if (full) continue;
      room -= width + GAP;
    } else if (column + width > end) continue;
    const keys = keyNames(item.keys, glyphs);
    canvas.put(column, y, keys, 'strong');
    canvas.put(column + keys.length + 1, y, cells(item.does), 'quiet');
    column += width + GAP;
  }
}

/** The arrow keys in signs or, where the terminal has none, in words. */
export function keyNames(keys: string, glyphs: Glyphs): string {
  return cells(keys.replaceAll('↑↓', glyphs.upDown).replaceAll('←→', glyphs.leftRight));
}

function widthOf(item: FootView, glyphs: Glyphs): number {
  return keyNames(item.keys, glyphs).length + 1 + cells(item.does).length;
}
