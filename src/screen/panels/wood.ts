import type { Canvas, Style } from '../draw/canvas.ts';
import { cells, keepToGlyphs, shorten, wrap } from '../draw/cells.ts';
import { type Glyphs, glyphsOf } from '../draw/glyphs.ts';
import type { WoodLine, WoodView } from '../wood-view.ts';
import { drawKeys } from './foot.ts';
import { drawKnobs, type EntryPlace } from './knobs.ts';
import { heading, type Region, rule, writeRight } from './region.ts';

/** Below this many columns what the wood brings stands under the choices. */
const TWO_COLUMNS = 72;
const CHOICES = 30;
const CHOICES_WIDE = 34;
const WIDE = 100;
/** Longer lines are tiring to read. */
const MEASURE = 100;
/** Title, foot. */
const AROUND = 2;
const NAME_LEAST = 9;
const NAME_MOST = 24;

interface Line {
  readonly text: string;
  readonly style: Style;
  /** The option as it is chosen now. */
  readonly chosen: boolean;
}

/** The choices at the left, what they bring at the right; says where the field being typed stands. */
export function drawWood(view: WoodView, canvas: Canvas, glyphs: Glyphs): EntryPlace | null {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  const title = shorten(cells(view.title), columns - 2, glyphs);
  canvas.put(1, 0, title, 'strong');
  writeRight(canvas, title.length + 4, columns - 2, 0, cells(view.now), 'quiet');
  const [left, right] = regions(columns, rows);
  const place = drawKnobs(view, canvas, left, glyphs);
  drawBrought(view, canvas, right, glyphs);
  drawKeys(view.foot, canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
  return place;
}

function regions(columns: number, rows: number): [Region, Region] {
  const body = rows - AROUND;
  if (columns >= TWO_COLUMNS) {
    const left = columns >= WIDE ? CHOICES_WIDE : CHOICES;
    return [
      { x: 0, y: 1, columns: left, rows: body },
      { x: left, y: 1, columns: columns - left, rows: body },
    ];
  }
  const half = Math.floor(body / 2);
  return [
    { x: 0, y: 1, columns, rows: half },
    { x: 0, y: 1 + half, columns, rows: body - half },
  ];
}

/** The furthest that what the wood brings can be scrolled. */
export function lastWoodScroll(view: WoodView, columns: number, rows: number): number {
  const [, region] = regions(columns, rows);
  return Math.max(0, linesOf(view, region, glyphsOf('unicode')).length - (region.rows - 1));
}

function drawBrought(view: WoodView, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const lines = linesOf(view, region, glyphs);
  const shown = region.rows - 1;
  const from = Math.max(0, Math.min(view.scroll, lines.length - shown));
  rule(canvas, region, glyphs);
  heading(canvas, region, region.x + 2, 'what it brings');
  if (lines.length > shown) {
    const place = `lines ${from + 1} to ${Math.min(lines.length, from + shown)} of ${lines.length}`;
    heading(canvas, region, region.x + region.columns - place.length - 2, place);
  }
  for (let row = 0; row < shown && from + row < lines.length; row += 1) {
    const { text, style, chosen } = lines[from + row]!;
    if (chosen) canvas.put(region.x, region.y + 1 + row, glyphs.hand, 'nowStrong');
    canvas.put(region.x + 2, region.y + 1 + row, text, style);
  }
}

/** Cells at the left of the text: the mark of what is chosen, a blank. */
const MARGIN = 2;

function linesOf(view: WoodView, region: Region, glyphs: Glyphs): Line[] {
  const width = Math.min(region.columns - MARGIN - 1, MEASURE);
  return [
    ...view.verdict.flatMap((line) => wrapped(line, width, glyphs)),
    ...optionLines(view, width, glyphs),
    ...view.notes.flatMap((line) => wrapped(line, width, glyphs)),
  ];
}

/** Cells that the further lines of a text without a head are moved in. */
const HANG = 2;

function wrapped({ text, style, head }: WoodLine, width: number, glyphs: Glyphs): Line[] {
  const first = cells(head ?? '');
  const hang = ' '.repeat(head === undefined ? HANG : first.length);
  const rows = wrap(cells(text), width - hang.length, Number.POSITIVE_INFINITY, glyphs);
  return rows.map((row, at) => ({ text: (at === 0 ? first : hang) + row, style, chosen: false }));
}

function optionLines(view: WoodView, width: number, glyphs: Glyphs): Line[] {
  const cellsOf = (at: number) =>
    1 + Math.max(view.heads[at]!.length, ...view.options.map(({ values }) => values[at]?.length ?? 0));
  let left = width - NAME_LEAST;
  const shown: number[] = [];
  for (let at = 0; at < view.heads.length; at += 1) {
    left -= cellsOf(at);
    if (left < 0) break;
    shown.push(cellsOf(at));
  }
  const name = Math.min(NAME_MOST, width - shown.reduce((sum, cell) => sum + cell, 0));
  const row = (values: readonly string[]) =>
    shown.map((cell, at) => (values[at] ?? '').padStart(cell)).join('');
  const heads = shown.map((cell, at) => view.heads[at]!.padStart(cell)).join('');
  return [
    { text: `${''.padEnd(name)}${heads}`, style: 'quiet', chosen: false },
    ...view.options.map(({ name: text, chosen, values }): Line => {
      const told = values.length > 0 ? row(values) : '  asks for its values';
      const label = shorten(cells(text), name, glyphs).padEnd(name);
      return { text: label + told, style: chosen ? 'nowStrong' : 'plain', chosen };
    }),
    ...wrapped({ text: view.units, style: 'quiet' }, width, glyphs),
  ];
}
