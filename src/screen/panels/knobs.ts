import type { Canvas } from '../draw/canvas.ts';
import { cells, shorten, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { EntryView, KnobView, View } from '../view.ts';
import { fitted } from './knob-text.ts';
import { heading, type Region, rule } from './region.ts';

/** Where the field being typed stands on the screen, in cells. */
export interface EntryPlace {
  readonly row: number;
  readonly column: number;
  readonly width: number;
}

/** A value further from its label would be hard to follow. */
const MOST_COLUMNS = 34;
/** Cells before a knob's label: a blank, the hand, a blank. */
const MARGIN = 3;
/** Cells the field being typed takes where its label leaves them, and those the label must leave. */
const FIELD = 14;
const LEAST_FIELD = 9;
/** Rows that a fault and a hint may take below the knob in hand. */
const FAULT_ROWS = 6;
const HINT_ROWS = 2;

/**
 * The knobs, one a row, under a heading. Where there are more than rows, the list scrolls so that the one
 * in hand is seen, with what is wrong with it, or how to type it, right below.
 */
export function drawKnobs(
  view: Pick<View, 'knobs' | 'knob' | 'entry'>,
  canvas: Canvas,
  region: Region,
  glyphs: Glyphs,
): EntryPlace | null {
  rule(canvas, region, glyphs);
  heading(canvas, region, region.x + 4, 'knobs');
  const rows = region.rows - 1;
  if (rows < 1 || view.knobs.length === 0) return null;

  const inHand = Math.min(Math.max(view.knob, 0), view.knobs.length - 1);
  const words = wordsBelow(view.knobs[inHand]!, view.entry, region.columns - MARGIN - 4, rows - 1, glyphs);
  const shown = Math.min(view.knobs.length, rows - words.length);
  const start = firstShown(inHand, shown, view.knobs.length);

  let place: EntryPlace | null = null;
  let y = region.y + 1;
  for (let index = start; index < start + shown; index += 1) {
    const knob = view.knobs[index]!;
    const isInHand = index === inHand;
    if (isInHand) canvas.put(region.x + 1, y, glyphs.hand, 'nowStrong');
    if (isInHand && view.entry !== null) place = drawField(knob, view.entry, canvas, region, y, glyphs);
    else drawKnob(knob, isInHand, canvas, region, y, glyphs);
    y += 1;
    if (!isInHand) continue;
    for (const { text, fault } of words) {
      canvas.put(region.x + MARGIN + 1, y, text, fault ? 'governs' : 'quiet');
      y += 1;
    }
  }
  markHidden(canvas, region, start, start + shown < view.knobs.length, glyphs);
  return place;
}

/** Keeps the knob in hand in the middle of the list, as far as the list's ends allow. */
function firstShown(inHand: number, shown: number, all: number): number {
  return Math.max(0, Math.min(inHand - Math.floor(shown / 2), all - shown));
}

/** Says in the heading that the list goes on above or below what is shown. */
function markHidden(canvas: Canvas, region: Region, above: number, below: boolean, glyphs: Glyphs): void {
  const marks = `${above > 0 ? glyphs.further[0] : ''}${below ? glyphs.further[1] : ''}`;
  heading(canvas, region, region.x + 10, marks);
}

function drawKnob(
  knob: KnobView,
  isInHand: boolean,
  canvas: Canvas,
  region: Region,
  y: number,
  glyphs: Glyphs,
): void {
  const style = isInHand ? 'nowStrong' : 'plain';
  const end = region.x + Math.min(region.columns, MOST_COLUMNS) - 4;
  const left = region.x + MARGIN;
  const room = end - left + 1;
  const { label, value } = fitted(cells(knob.label), cells(knob.value), room, glyphs);
  canvas.put(left, y, label, style);
  canvas.putRight(end, y, value, style);
  if (knob.fault !== null) canvas.put(end + 1, y, '!', 'governsStrong');
}

/** The label, then the text typed so far, its cursor in reverse video, held in view as it moves. */
function drawField(
  knob: KnobView,
  entry: EntryView,
  canvas: Canvas,
  region: Region,
  y: number,
  glyphs: Glyphs,
): EntryPlace {
  const left = region.x + MARGIN;
  const right = region.x + Math.min(region.columns, MOST_COLUMNS) - 3;
  const label = shorten(cells(knob.label), right - left - LEAST_FIELD, glyphs);
  const column = Math.max(right - FIELD + 1, left + label.length + 1);
  const width = right - column + 1;
  canvas.put(left, y, label, 'nowStrong');

  const text = cells(entry.text);
  const cursor = Math.min(Math.max(entry.cursor, 0), text.length);
  const from = Math.max(0, cursor - width + 1);
  canvas.put(column, y, text.slice(from, from + width), 'nowStrong');
  canvas.put(column + cursor - from, y, text[cursor] ?? ' ', 'verdict');
  return { row: y, column, width };
}

/** What stands below the knob in hand: the fault of the entry and its hint, or why a nudge was refused. */
function wordsBelow(
  knob: KnobView,
  entry: EntryView | null,
  width: number,
  rows: number,
  glyphs: Glyphs,
): { text: string; fault: boolean }[] {
  const fault = entry === null ? knob.fault : entry.fault;
  const hint = entry === null ? '' : entry.hint;
  const lines: { text: string; fault: boolean }[] = [];
  if (fault !== null) {
    for (const text of wrap(cells(fault), width, Math.min(FAULT_ROWS, rows), glyphs)) {
      lines.push({ text, fault: true });
    }
  }
  const left = Math.min(HINT_ROWS, rows - lines.length);
  if (hint !== '' && left > 0) {
    for (const text of wrap(cells(hint), width, left, glyphs)) lines.push({ text, fault: false });
  }
  return lines;
}
