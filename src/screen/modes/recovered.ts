import type { RecoveredAnswer } from '../../files/keeper.ts';
import { type Step, still } from '../effect.ts';
import type { RecoveredMode } from '../mode.ts';
import { drawText, lastOffset } from '../panels/text.ts';
import { recoveredLines } from '../recovered-view.ts';
import { momentOf, type State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';

/** What was not kept when the program last ended: looked at here, and taken, dropped or set aside. */
export const recovered: ModeRules<RecoveredMode> = {
  press,
  draw(state, mode, canvas, glyphs) {
    const foot = [
      { keys: 't', does: 'take it' },
      { keys: 'd', does: 'drop it' },
      { keys: 'Esc', does: 'set it aside' },
      { keys: 'q', does: 'leave it for later' },
      { keys: '↑↓', does: 'scroll' },
    ];
    const lines = recoveredLines(state, mode.recovered);
    drawText({ title: 'thrice: not everything was kept', lines, offset: mode.scroll, foot }, canvas, glyphs);
    return null;
  },
};

function press(state: State, mode: RecoveredMode, press: KeyPress): Step {
  const last = lastOffset(recoveredLines(state, mode.recovered).length, state.rows);
  const scroll = scrolled(mode.scroll, press, last);
  if (scroll !== null) return still({ ...state, mode: { ...mode, scroll } });
  const answered = (answer: RecoveredAnswer, next: State): Step => ({
    state: { ...next, notice: null },
    effects: [{ do: 'answer-recovered', answer }],
  });
  if (isCancel(press)) return answered('set aside', { ...state, mode: mode.after });
  if (press.name !== 'char' || press.ctrl) return still(state);
  switch (press.char) {
    case 't':
      return answered('take', taken(state, mode));
    case 'd':
      return answered('drop', { ...state, mode: mode.after });
    case 'q':
      return { state, effects: [{ do: 'leave' }] };
    default:
      return still(state);
  }
}

/** The work goes on where it was; what the file holds is one undo away. */
function taken(state: State, { recovered: { session } }: RecoveredMode): State {
  const past = state.session.members.length === 0 ? [] : [momentOf(state)];
  return { ...state, session, past, mode: { name: 'explore' } };
}
