import { isTooSmall } from '../arrange.ts';
import { compareView } from '../compare-view.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { type CompareMode, EXPLORE } from '../mode.ts';
import { drawCompare, lastCompareScroll } from '../panels/compare.ts';
import { backTo, pinsOf, withNote, withoutPin } from '../pins.ts';
import { type State, unitsOf, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** Designs side by side with what differs marked: go back to one, note one, drop one. */
export const compare: ModeRules<CompareMode> = {
  press: (state, mode, key) => still(mode.edit === null ? press(state, mode, key) : type(state, mode, key)),
  paste: (state, mode, text) =>
    mode.edit === null ? state : { ...state, mode: { ...mode, edit: inserted(mode.edit, text) } },
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const { design, scroll, edit } = mode;
    const shown = { design: held(state, design), scroll, typing: edit !== null };
    const place = drawCompare({ title: titleOf(state) }, compareView(state), shown, canvas, glyphs);
    return place === null || edit === null ? null : { ...place, value: edit.text, cursor: edit.cursor };
  },
};

/** The designs side by side, the last one pinned in hand. */
export function openCompare(state: State): State {
  const mode: CompareMode = { name: 'compare', design: pinsOf(state).length, scroll: 0, edit: null };
  return { ...state, mode, notice: null };
}

function held(state: State, design: number): number {
  return Math.max(0, Math.min(pinsOf(state).length, design));
}

function press(state: State, mode: CompareMode, press: KeyPress): State {
  const design = held(state, mode.design);
  if (isCancel(press)) return { ...state, mode: EXPLORE };
  if (opensWorkings(press)) return openedWorkings(state);
  const scroll = scrolled(
    mode.scroll,
    press,
    lastCompareScroll(compareView(state), state.columns, state.rows),
  );
  if (scroll !== null) return { ...state, mode: { ...mode, scroll } };
  switch (press.name) {
    case 'left':
      return { ...state, mode: { ...mode, design: held(state, design - 1) } };
    case 'right':
      return { ...state, mode: { ...mode, design: held(state, design + 1) } };
    case 'delete':
    case 'backspace':
      if (design === 0) return state;
      return { ...withoutPin(state, design - 1), mode: { ...mode, design: design - 1 } };
    case 'enter':
      return returned(state, design);
    case 'char':
      return press.ctrl ? state : lettered(state, mode, design, press.char ?? '');
    default:
      return state;
  }
}

function returned(state: State, design: number): State {
  const back: State = { ...state, mode: EXPLORE };
  const pin = pinsOf(state)[design - 1];
  return pin === undefined ? back : backTo(back, pin.member, `pin ${design}`);
}

function lettered(state: State, mode: CompareMode, design: number, letter: string): State {
  if (letter === 'c' || letter === 'q') return { ...state, mode: EXPLORE };
  if (letter === 'n' && design > 0) {
    return { ...state, mode: { ...mode, design, edit: editOf(pinsOf(state)[design - 1]!.note) } };
  }
  if (letter === 'i') {
    const units = unitsOf(state) === 'us' ? 'si' : 'us';
    return withSession(state, { ...state.session, units });
  }
  return state;
}

/** The note of the pin in hand while it is typed. */
function type(state: State, mode: CompareMode, press: KeyPress): State {
  const edit = mode.edit!;
  if (isCancel(press)) return { ...state, mode: { ...mode, edit: null } };
  if (press.name === 'enter') {
    return { ...withNote(state, mode.design - 1, edit.text.trim()), mode: { ...mode, edit: null } };
  }
  const next = edited(edit, press);
  return next === null ? state : { ...state, mode: { ...mode, edit: next } };
}
