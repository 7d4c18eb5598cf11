import { isTooSmall } from '../arrange.ts';
import { still } from '../effect.ts';
import { redo, undo } from '../history.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE, type TrailMode } from '../mode.ts';
import { drawTrail } from '../panels/trail.ts';
import { memberOf, refused, type State, unitsOf, withMember, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { backText, memberThen, type TrailView, trailView } from '../trail-view.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** What was done to the member in hand, oldest first; Enter goes back to how it stood at the line in hand. */
export const trail: ModeRules<TrailMode> = {
  press: (state, mode, key) => still(press(state, mode, key)),
  draw(state, mode, canvas, glyphs) {
    const trail = trailView(state);
    if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
    else drawTrail({ title: titleOf(state) }, trail, held(mode, trail), state.notice, canvas, glyphs);
    return null;
  },
};

/** The trail with its last line in hand: how it stands now. */
export function openTrail(state: State): State {
  return { ...state, mode: { name: 'trail', line: LAST }, notice: null };
}

/** The line in hand of a trail that goes on: its last, however long it gets. */
const LAST = Number.MAX_SAFE_INTEGER;

function held({ line }: TrailMode, { count }: TrailView): number {
  return Math.min(line, count - 1);
}

function press(state: State, mode: TrailMode, press: KeyPress): State {
  const trail = trailView(state);
  const line = scrolled(held(mode, trail), press, trail.count - 1);
  if (line !== null) return { ...state, mode: { name: 'trail', line }, notice: null };
  if (isCancel(press)) return { ...state, mode: EXPLORE };
  if (opensWorkings(press)) return openedWorkings(state);
  if (press.name === 'enter') return backTo(state, held(mode, trail));
  if (press.name !== 'char' || press.ctrl) return state;
  switch (press.char) {
    case 'T':
    case 'q':
      return { ...state, mode: EXPLORE };
    case 'u':
      return atEnd(undo(state));
    case 'r':
      return atEnd(redo(state));
    case 'i':
      return withSession(state, { ...state.session, units: unitsOf(state) === 'us' ? 'si' : 'us' });
    default:
      return state;
  }
}

/** A step back or forth is a line more, which is then in hand. */
function atEnd(state: State): State {
  return { ...state, mode: { name: 'trail', line: LAST } };
}

/** One change more: what it leaves behind stays told, and u takes it back. */
function backTo(state: State, line: number): State {
  const then = memberThen(state, line);
  if (then === null)
    return refused(
      state,
      'it cannot go back to there: what it carried is gone, or the file was edited since',
    );
  const before = memberOf(state);
  if (then === before) return { ...state, notice: { text: 'this is how it stands now', refusal: false } };
  const doing = backText(state, line);
  const back = withMember(state, then);
  if (back.session === state.session) return back;
  return {
    ...back,
    mode: EXPLORE,
    doing,
    ghost: { knob: 'trail', member: before },
    notice: { text: `${doing}; u undoes it`, refusal: false },
  };
}
