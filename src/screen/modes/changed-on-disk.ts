import { type Step, still } from '../effect.ts';
import { EXPLORE } from '../mode.ts';
import type { State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';
import { asking } from './question.ts';
import { openSaveAs } from './save-as.ts';

type Changed = ModeOf<'changed-on-disk'>;

/** The question before a file is written that somebody else has written meanwhile; both are kept. */
export const changedOnDisk: ModeRules<Changed> = {
  press,
  draw: asking(
    'The file was changed by somebody else.',
    'A keep as another  o over it (theirs to .bak)  Esc back',
  ),
};

function press(state: State, { thenLeave }: Changed, press: KeyPress): Step {
  const back: State = { ...state, mode: EXPLORE };
  if (isCancel(press)) return still(back);
  if (press.name !== 'char' || press.ctrl) return still(state);
  if (press.char === 'A' || press.char === 'a') return still(openSaveAs(back, thenLeave));
  const { file, session } = state;
  if (press.char !== 'o' || file === null) return still(state);
  return { state: back, effects: [{ do: 'save', file, session, fresh: false, over: true, thenLeave }] };
}
