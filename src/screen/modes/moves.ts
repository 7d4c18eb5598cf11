import { isTooSmall } from '../arrange.ts';
import { still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE, type MovesMode } from '../mode.ts';
import { moveInHand, movesNow, movesView, SIDE_LINES } from '../moves-view.ts';
import { drawMoveList } from '../panels/move-list.ts';
import { memberOf, refused, type State, unitsOf, withMember, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { isCancel, type ModeRules } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** The changes that would help, best first; Enter applies the one in hand. */
export const moves: ModeRules<MovesMode> = {
  press: (state, mode, key) => still(press(state, mode, key)),
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
    else drawMoveList(viewOf(state), movesView(state, mode), mode.line, mode.way, canvas, glyphs);
    return null;
  },
};

/** The moves of the member in hand, the best of them chosen. */
export function openMoves(state: State): State {
  const line = movesNow(state).moves.length > 0 ? SIDE_LINES : 1;
  return { ...state, mode: { name: 'moves', line, way: 'deepen' }, notice: null };
}

function press(state: State, mode: MovesMode, press: KeyPress): State {
  const closes = isCancel(press) || (press.name === 'char' && /^[mq]$/.test(press.char ?? ''));
  if (closes) return { ...state, mode: EXPLORE };
  if (opensWorkings(press)) return openedWorkings(state);
  const last = SIDE_LINES + movesNow(state).moves.length - 1;
  const at = (line: number): State => ({
    ...state,
    mode: { ...mode, line: Math.max(0, Math.min(last, line)) },
  });
  switch (press.name) {
    case 'up':
      return at(mode.line - 1);
    case 'down':
      return at(mode.line + 1);
    case 'home':
      return at(0);
    case 'end':
      return at(last);
    case 'left':
    case 'right':
      if (mode.line >= SIDE_LINES) return state;
      return { ...state, mode: { ...mode, way: press.name === 'left' ? 'deepen' : 'widen' } };
    case 'enter':
      return applied(state, mode);
    case 'char':
      return press.char === 'i' && !press.ctrl ? otherUnits(state) : state;
    default:
      return state;
  }
}

function otherUnits(state: State): State {
  const units = unitsOf(state) === 'us' ? 'si' : 'us';
  return withSession(state, { ...state.session, units });
}

/** One step to undo; the ghosts show where the gauges stood. */
function applied(state: State, mode: MovesMode): State {
  const move = moveInHand(movesNow(state), mode);
  const back: State = { ...state, mode: EXPLORE };
  if (move === null) return { ...refused(state, 'there is no such move'), mode: EXPLORE };
  if (move.refused !== null) return refused(back, `${move.label}: ${move.refused}`);
  const before = memberOf(state);
  return {
    ...withMember(back, move.member),
    doing: move.kind,
    ghost: { knob: 'moves', member: before },
    notice: { text: `${move.kind}: ${move.label}; u undoes it`, refusal: false },
  };
}
