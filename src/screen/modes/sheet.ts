import { FORMATS, formatOf } from '../../sheet/format.ts';
import { cells } from '../draw/cells.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { type SheetAnswer, type Step, still } from '../effect.ts';
import { drawExplorer } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawPrompt } from '../panels/prompt.ts';
import { memberOf, refused, type State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';

/** The name of the file that the calculation sheet is written to; its end says as what. */
export const sheet: ModeRules<ModeOf<'sheet'>> = {
  press,
  paste: (state, mode, text) => ({
    ...state,
    mode: { ...mode, edit: inserted(mode.edit, text), fault: null, over: null },
  }),
  draw(state, { edit, fault, whole }, canvas, glyphs) {
    drawExplorer(viewOf(state), canvas, glyphs);
    const name = cells(memberOf(state).name).slice(0, LONGEST_NAME);
    const of = whole ? `the whole job (Tab: ${name} alone)` : `${name} alone (Tab: the whole job)`;
    const hint = `Enter writes ${of}; .pdf .html .md .txt; Esc back`;
    const place = drawPrompt(canvas, 'sheet', fault ?? hint);
    return { ...place, value: edit.text, cursor: edit.cursor };
  },
};

/** So that the hint fits the smallest screen. */
const LONGEST_NAME = 10;

/** Asks where the sheet shall be written, beside the session's file where it has one. */
export function openSheet(state: State): State {
  if (state.readOnly === 'asked') return refused(state, 'opened to be read alone: no sheet is written');
  const name = state.file === null ? 'sheet' : state.file.replace(/\.json$/i, '');
  return {
    ...state,
    mode: { name: 'sheet', edit: editOf(`${name}.pdf`), fault: null, whole: true, over: null },
    notice: null,
  };
}

function press(state: State, mode: ModeOf<'sheet'>, press: KeyPress): Step {
  if (isCancel(press)) return still({ ...state, mode: EXPLORE });
  if (press.name === 'tab') return still({ ...state, mode: { ...mode, whole: !mode.whole } });
  if (press.name !== 'enter') {
    const edit = edited(mode.edit, press);
    return still(edit === null ? state : { ...state, mode: { ...mode, edit, fault: null, over: null } });
  }
  const file = mode.edit.text.trim();
  if (formatOf(file) === null) {
    const ends = FORMATS.map((format) => `.${format}`).join(' ');
    return still({ ...state, mode: { ...mode, fault: `the end of the name says as what: ${ends}` } });
  }
  const { session } = state;
  return {
    state: { ...state, mode: { ...mode, fault: 'writing it ...' } },
    effects: [
      {
        do: 'write-sheet',
        file,
        session,
        members: mode.whole ? session.members : [session.members[state.member]!],
        over: mode.over === file,
      },
    ],
  };
}

/** What came of it: told where it was written, said on the spot where it was not. */
export function withSheetAnswer(state: State, { file, outcome }: SheetAnswer): State {
  if (outcome === 'written') {
    const mode = state.mode.name === 'sheet' ? EXPLORE : state.mode;
    return { ...state, mode, notice: { text: `sheet written to ${file}`, refusal: false } };
  }
  if (outcome === 'there') {
    const fault = 'that file is there already: Enter again writes over it';
    return state.mode.name === 'sheet' ? { ...state, mode: { ...state.mode, fault, over: file } } : state;
  }
  if (state.mode.name !== 'sheet') return refused(state, outcome.fault);
  return { ...state, mode: { ...state.mode, fault: outcome.fault } };
}
