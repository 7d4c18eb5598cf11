import { type PageId, pageIds, pageOf, pageWord } from '../../explore/workings/index.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { drawText, lastOffset, type TextLine } from '../panels/text.ts';
import { EXPLORE, memberOf, type State, type Step, still, unitsOf, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import type { FootView } from '../view.ts';
import { type WorkingsRow, workingsRows } from '../workings-rows.ts';
import { isCancel, type ModeOf, type ModeRules, scrolled } from './mode.ts';

type Page = ModeOf<'workings'>;

/** The calculation behind any number: what governs first, then every other check, then what they stand on. */
export const workings: ModeRules<Page> = {
  press,
  draw(state, mode, canvas, glyphs) {
    const { ids, at } = place(state, mode);
    drawWorkings(state, ids, at, mode.scroll, canvas, glyphs);
    return null;
  },
};

/** The state with the workings of what governs opened. */
export function openedWorkings(state: State): State {
  return { ...state, mode: { name: 'workings', page: 0, scroll: 0 }, notice: null };
}

/** The pages of the member, and the one that is open. */
function place(state: State, { page }: Page): { readonly ids: readonly PageId[]; readonly at: number } {
  const ids = pageIds(memberOf(state), unitsOf(state));
  return { ids, at: ((page % ids.length) + ids.length) % ids.length };
}

function press(state: State, mode: Page, press: KeyPress): Step {
  const { ids, at } = place(state, mode);
  const scroll = scrolled(mode.scroll, press, lastScroll(state, ids[at]!));
  if (scroll !== null) return still({ ...state, mode: { ...mode, scroll } });
  const turn = turned(press);
  if (turn !== 0) return still({ ...state, mode: { name: 'workings', page: at + turn, scroll: 0 } });
  if (press.name === 'char' && !press.ctrl && press.char === 'i') {
    const units = unitsOf(state) === 'us' ? 'si' : 'us';
    return still(withSession({ ...state, mode: { ...mode, scroll: 0 } }, { ...state.session, units }));
  }
  const closes =
    isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[wq]$/.test(press.char ?? ''));
  return still(closes ? { ...state, mode: EXPLORE } : state);
}

/** Pages that a key turns: right and Tab one on, left and Shift Tab one back. */
function turned(press: KeyPress): -1 | 0 | 1 {
  if (press.name === 'right') return 1;
  if (press.name === 'left') return -1;
  if (press.name === 'tab') return press.shift ? -1 : 1;
  return 0;
}

/** Longer rows are tiring to read. */
const MEASURE = 100;

function rowsOf(state: State, id: PageId): WorkingsRow[] {
  const { lines } = pageOf(memberOf(state), id, unitsOf(state));
  const safe = lines.map((line) =>
    Object.fromEntries(Object.entries(line).map(([part, text]) => [part, cells(text)])),
  );
  return workingsRows(safe, Math.min(state.columns - 2, MEASURE));
}

function lastScroll(state: State, id: PageId): number {
  return lastOffset(rowsOf(state, id).length, state.rows);
}

function drawWorkings(
  state: State,
  ids: readonly PageId[],
  at: number,
  scroll: number,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  const id = ids[at]!;
  const { title } = pageOf(memberOf(state), id, unitsOf(state));
  const rows = rowsOf(state, id);
  const lines = rows.map(
    ({ text, is }): TextLine => ({
      text,
      style: is === 'heading' ? 'strong' : is === 'note' ? 'quiet' : 'plain',
    }),
  );
  const foot: FootView[] = [
    { keys: 'Esc', does: 'back' },
    ...(lastOffset(rows.length, state.rows) > 0 ? [{ keys: glyphs.upDown, does: 'scroll' }] : []),
    { keys: '←→', does: `page ${at + 1} of ${ids.length}` },
    { keys: 'i', does: 'units' },
    { keys: 'next', does: pageWord(ids[(at + 1) % ids.length]!) },
  ];
  drawText({ title: `workings: ${title}`, lines, offset: scroll, foot }, canvas, glyphs);
}
