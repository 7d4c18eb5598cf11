import { pageOf, pageWord } from '../../explore/workings/index.ts';
import { type WorkingsRow, workingsRows } from '../../sheet/workings-rows.ts';
import { CHECK_IDS } from '../../timber/report.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { type Step, still } from '../effect.ts';
import type { Mode, WorkingsMode } from '../mode.ts';
import { windowStart } from '../panels/table.ts';
import { drawText, lastOffset, type TextLine, textRows } from '../panels/text.ts';
import { type State, unitsOf, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { ALL_KEYS, type FootView } from '../view.ts';
import { type WorkingsSubject, workingsSubject } from '../workings-subject.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';

/** The calculation behind any number: what the view it was asked in is about first, then every other. */
export const workings: ModeRules<WorkingsMode> = {
  press(state, mode, press) {
    return mode.line === null ? turn(state, mode, press) : still(choose(state, mode, mode.line, press));
  },
  draw(state, mode, canvas, glyphs) {
    const subject = workingsSubject(state, mode.from);
    if (mode.line === null) drawPage(state, mode, subject, canvas, glyphs);
    else drawList(state, mode.line, subject, canvas, glyphs);
    return null;
  },
};

/** The workings opened from the view a state is in, the page of what it is about in front; Escape leads back to it. */
export function openedWorkings(state: State): State {
  const { mode: from } = state;
  const { front } = workingsSubject(state, from);
  return { ...state, mode: { name: 'workings', page: front, scroll: 0, line: null, from }, notice: null };
}

/** True for the key that opens the workings from any view. */
export function opensWorkings(press: KeyPress): boolean {
  return press.name === 'char' && !press.ctrl && !press.meta && press.char === 'w';
}

/** The page of a mode, counted round. */
function pageAt({ ids }: WorkingsSubject, page: number): number {
  return ((page % ids.length) + ids.length) % ids.length;
}

function turn(state: State, mode: WorkingsMode, press: KeyPress): Step {
  const subject = workingsSubject(state, mode.from);
  const at = pageAt(subject, mode.page);
  const scroll = scrolled(mode.scroll, press, lastOffset(rowsOf(state, subject, at).length, state.rows));
  if (scroll !== null) return still({ ...state, mode: { ...mode, scroll } });
  const by = turned(press);
  if (by !== 0) return still({ ...state, mode: { ...mode, page: at + by, scroll: 0 } });
  const letter = press.name === 'char' && !press.ctrl ? press.char : null;
  if (letter === 'i') return still(otherUnits(state, mode));
  if (letter === 'l') return still({ ...state, mode: { ...mode, line: at } });
  const closes = isCancel(press) || press.name === 'enter' || letter === 'w' || letter === 'q';
  return still(closes ? { ...state, mode: mode.from } : state);
}

/** Pages that a key turns: right and Tab one on, left and Shift Tab one back. */
function turned(press: KeyPress): -1 | 0 | 1 {
  if (press.name === 'right') return 1;
  if (press.name === 'left') return -1;
  if (press.name === 'tab') return press.shift ? -1 : 1;
  return 0;
}

function otherUnits(state: State, mode: WorkingsMode): State {
  const units = unitsOf(state) === 'us' ? 'si' : 'us';
  const from = inUnits(mode.from);
  return withSession({ ...state, mode: { ...mode, scroll: 0, from } }, { ...state.session, units });
}

/** A view to come back to in other units: the strip of handovers is found anew. */
function inUnits(from: Mode): Mode {
  return from.name === 'handovers' ? { ...from, strip: null, search: null } : from;
}

/** The list of pages: a line is chosen, Enter opens its page. */
function choose(state: State, mode: WorkingsMode, line: number, press: KeyPress): State {
  const { ids } = workingsSubject(state, mode.from);
  const to = scrolled(line, press, ids.length - 1);
  if (to !== null) return { ...state, mode: { ...mode, line: to } };
  if (press.name === 'enter') return { ...state, mode: { ...mode, page: line, scroll: 0, line: null } };
  const letter = press.name === 'char' && !press.ctrl ? press.char : null;
  const closes = isCancel(press) || letter === 'l' || letter === 'q' || letter === 'w';
  return closes ? { ...state, mode: { ...mode, line: null } } : state;
}

/** Longer rows are tiring to read. */
const MEASURE = 100;

function rowsOf(state: State, { member, about, ids }: WorkingsSubject, at: number): WorkingsRow[] {
  const { lines } = pageOf(member, ids[at]!, unitsOf(state), about);
  const safe = lines.map((line) =>
    Object.fromEntries(Object.entries(line).map(([part, text]) => [part, cells(text)])),
  );
  return workingsRows(safe, Math.min(state.columns - 2, MEASURE));
}

function drawPage(
  state: State,
  mode: WorkingsMode,
  subject: WorkingsSubject,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  const { member, about, ids } = subject;
  const at = pageAt(subject, mode.page);
  const { title } = pageOf(member, ids[at]!, unitsOf(state), about);
  const rows = rowsOf(state, subject, at);
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
    { keys: 'l', does: 'list' },
    { keys: 'i', does: 'units' },
    { keys: 'next', does: pageWord(ids[(at + 1) % ids.length]!) },
    ALL_KEYS,
  ];
  drawText({ title: `${headOf(subject)}: ${title}`, lines, offset: mode.scroll, foot }, canvas, glyphs);
}

/** "workings", "workings of pin 2". */
function headOf({ label }: WorkingsSubject): string {
  return label === '' ? 'workings' : `workings of ${label}`;
}

function drawList(
  state: State,
  line: number,
  subject: WorkingsSubject,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  const { member, about, ids } = subject;
  const lines = ids.map((id, at): TextLine => {
    const isCheck = (CHECK_IDS as readonly string[]).includes(id);
    const title = isCheck ? pageOf(member, id, unitsOf(state), about).title : pageWord(id);
    const mark = at === line ? glyphs.hand : ' ';
    return { text: ` ${mark} ${cells(title)}`, style: at === line ? 'nowStrong' : 'plain' };
  });
  const foot: FootView[] = [
    { keys: 'Esc', does: 'back' },
    { keys: glyphs.upDown, does: 'page' },
    { keys: 'Enter', does: 'open' },
    ALL_KEYS,
  ];
  const offset = windowStart(lines.length, textRows(state.rows), line);
  drawText({ title: `${headOf(subject)}: every page`, lines, offset, foot }, canvas, glyphs);
}
