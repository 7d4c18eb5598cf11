import { type Edit, edited, editOf, inserted } from '../edit.ts';
import { still } from '../effect.ts';
import { drawExplorer } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { knobInHand, memberOf, type State, unitsOf, withMember } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';

/** A value being typed on the knob in hand. */
export const entry: ModeRules<ModeOf<'entry'>> = {
  press: (state, mode, key) => still(press(state, mode, key)),
  paste: (state, mode, text) => ({
    ...state,
    mode: { ...mode, edit: inserted(mode.edit, text), fault: null },
  }),
  draw(state, { edit }, canvas, glyphs) {
    const { entry: place } = drawExplorer(viewOf(state), canvas, glyphs);
    return place === null ? null : { ...place, value: edit.text, cursor: edit.cursor };
  },
};

/** The state with a field opened on the knob in hand. */
export function opened(state: State, edit: Edit = editOf('')): State {
  return { ...state, mode: { name: 'entry', edit, fault: null }, notice: null };
}

function press(state: State, { edit }: ModeOf<'entry'>, press: KeyPress): State {
  if (isCancel(press)) return { ...state, mode: EXPLORE };
  if (press.name !== 'enter') {
    const next = edited(edit, press);
    return next === null ? state : { ...state, mode: { name: 'entry', edit: next, fault: null } };
  }
  if (edit.text.trim() === '') return { ...state, mode: EXPLORE };
  const { knobs, index } = knobInHand(state);
  const turn = knobs[index]!.enter(memberOf(state), edit.text, unitsOf(state));
  if ('fault' in turn) return { ...state, mode: { name: 'entry', edit, fault: turn.fault } };
  return {
    ...withMember(state, turn.member),
    ghost: { knob: state.knob, member: memberOf(state) },
    mode: EXPLORE,
  };
}
