import { type Step, still } from '../effect.ts';
import { EXPLORE } from '../mode.ts';
import type { State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import type { ModeOf, ModeRules } from './mode-rules.ts';
import { asking } from './question.ts';
import { openSaveAs, save } from './save-as.ts';

/** The question before changes are lost. */
export const leaving: ModeRules<ModeOf<'leaving'>> = {
  press,
  draw: asking('Not everything is kept.', 's keep and leave  A elsewhere  d leave anyway  Esc stay'),
};

function press(state: State, _mode: ModeOf<'leaving'>, press: KeyPress): Step {
  if (press.name === 'escape') return still({ ...state, mode: EXPLORE });
  if (press.name !== 'char') return still(state);
  if (press.ctrl) return press.char === 'c' ? { state, effects: [{ do: 'leave' }] } : still(state);
  if (press.char === 's') return save({ ...state, mode: EXPLORE }, true);
  if (press.char === 'A') return still(openSaveAs(state, true));
  if (press.char === 'd' || press.char === 'q') return { state, effects: [{ do: 'leave' }] };
  return still(state);
}
