import type { Canvas } from '../draw/canvas.ts';
import { cells, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { Notice } from '../state.ts';
import type { View } from '../view.ts';
import type { Region } from './region.ts';
import { writeRight } from './region.ts';

const PROGRAM = 'thrice';
/** Cells that a long session name keeps before the member's name is shortened too. */
const LEAST_SESSION = 12;
/** From this many columns the method stands in the title, and the position says what it counts. */
const WIDE = 100;

/** What every view of its own shows beside what it is about. */
export interface Framed {
  readonly title: View['title'];
  readonly notice: Notice | null;
}

/** An empty canvas with the title on its first row. */
export function drawBegun(view: Pick<Framed, 'title'>, canvas: Canvas, glyphs: Glyphs): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  drawTitle(view, canvas, { x: 0, y: 0, columns: canvas.columns, rows: 1 }, glyphs);
}

/** One row: the program, the session and member at hand, the method, the place in the list, kept or not. */
export function drawTitle(view: Pick<View, 'title'>, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const { title } = view;
  const y = region.y;
  const left = region.x + 1;
  const names = left + PROGRAM.length + 2;
  canvas.put(left, y, PROGRAM, 'strong');

  const position = cells(title.position);
  const wide = region.columns >= WIDE;
  const items = [cells(title.kept), wide && position !== '' ? `member ${position}` : position];
  if (wide) items.push(cells(title.method));
  // The right end gives way to the names: at least half of the row is theirs.
  const middle = region.x + Math.floor(region.columns / 2);
  let end = region.x + region.columns - 2;
  for (const [index, item] of items.entries()) {
    const behind = index === 0 && item.startsWith('not');
    if (!writeRight(canvas, middle, end, y, item, behind ? 'strong' : 'quiet')) continue;
    end -= item.length + (wide ? 3 : 2);
  }

  const room = end - names + 1;
  const session = cells(title.session);
  const member = cells(title.member);
  const separator = session !== '' && member !== '' ? ' / ' : '';
  const least = Math.min(session.length, LEAST_SESSION);
  const forMember = Math.min(member.length, room - separator.length - least);
  const shownMember = shorten(member, forMember, glyphs);
  const shownSession = shorten(session, room - separator.length - shownMember.length, glyphs);
  canvas.put(names, y, shownSession + separator);
  canvas.put(names + shownSession.length + separator.length, y, shownMember, 'strong');
}
