import { NOT_WRITTEN } from '../../files/keeper.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { type Step, still } from '../effect.ts';
import { drawExplorer } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawPrompt } from '../panels/prompt.ts';
import { refused, type State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';

/** The name of a file being typed, for a session that has none. */
export const saveAs: ModeRules<ModeOf<'save-as'>> = {
  press,
  paste: (state, mode, text) => ({
    ...state,
    mode: { ...mode, edit: inserted(mode.edit, text), fault: null },
  }),
  draw(state, { edit, fault }, canvas, glyphs) {
    drawExplorer(viewOf(state), canvas, glyphs);
    const place = drawPrompt(canvas, 'keep as', fault ?? 'Enter writes the file, Esc goes back');
    return { ...place, value: edit.text, cursor: edit.cursor };
  },
};

/** Asks for the session to be written, and for a name first where it has none. */
export function save(state: State, thenLeave: boolean): Step {
  if (state.readOnly === 'asked') return still(refused(state, NOT_WRITTEN));
  if (state.file === null) return still(openSaveAs(state, thenLeave));
  if (state.session === state.kept)
    return still({ ...state, notice: { text: `${state.file} already holds this`, refusal: false } });
  return {
    state,
    effects: [{ do: 'save', file: state.file, session: state.session, fresh: false, over: false, thenLeave }],
  };
}

/** Asks for the name of a new file; one beside the session's own is offered. */
export function openSaveAs(state: State, thenLeave: boolean): State {
  if (state.readOnly === 'asked') return refused(state, NOT_WRITTEN);
  const name = state.file === null ? 'beam.json' : state.file.replace(/(\.json)?$/, '-2.json');
  return { ...state, mode: { name: 'save-as', edit: editOf(name), fault: null, thenLeave }, notice: null };
}

function press(state: State, mode: ModeOf<'save-as'>, press: KeyPress): Step {
  if (isCancel(press)) return still({ ...state, mode: EXPLORE });
  if (press.name !== 'enter') {
    const next = edited(mode.edit, press);
    return still(next === null ? state : { ...state, mode: { ...mode, edit: next, fault: null } });
  }
  const file = mode.edit.text.trim();
  if (file === '')
    return still({ ...state, mode: { ...mode, fault: 'a file name is needed, such as beam.json' } });
  return {
    state: { ...state, mode: EXPLORE },
    effects: [
      { do: 'save', file, session: state.session, fresh: true, over: false, thenLeave: mode.thenLeave },
    ],
  };
}
