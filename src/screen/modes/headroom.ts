import type { Turn } from '../../explore/knobs/knob.ts';
import { isTooSmall } from '../arrange.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { still } from '../effect.ts';
import { headroomInHand, headroomView, inStorey } from '../headroom-view.ts';
import { actionOf, startsEntry } from '../keys.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE, type HeadroomMode } from '../mode.ts';
import { nudgeOf } from '../nudges.ts';
import { drawHeadroom } from '../panels/headroom.ts';
import { memberOf, type State, unitsOf, withMember } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { isCancel, type ModeRules } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** The storey that a member stands in, with knobs of its own; what is nudged or typed is taken at once. */
export const headroom: ModeRules<HeadroomMode> = {
  press: (state, mode, key) => still(mode.edit === null ? press(state, mode, key) : type(state, mode, key)),
  paste: (state, mode, text) => ({
    ...state,
    mode: { ...mode, edit: inserted(mode.edit ?? editOf(''), text), fault: null },
  }),
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const place = drawHeadroom(viewOf(state), headroomView(state, mode), canvas, glyphs);
    return place === null || mode.edit === null
      ? null
      : { ...place, value: mode.edit.text, cursor: mode.edit.cursor };
  },
};

/** The storey of the member in hand; a usual one is offered where none is stated, and stated with the first change. */
export function openHeadroom(state: State): State {
  const mode: HeadroomMode = { name: 'headroom', knob: 'headroom.floorToFloor', edit: null, fault: null };
  return { ...state, mode, notice: null };
}

function press(state: State, mode: HeadroomMode, press: KeyPress): State {
  const closes = isCancel(press) || (press.name === 'char' && !press.ctrl && /^[hq]$/.test(press.char ?? ''));
  if (closes) return { ...state, mode: EXPLORE };
  if (opensWorkings(press)) return openedWorkings(state);
  if (startsEntry(press)) return { ...state, mode: { ...mode, edit: editOf(press.char ?? ''), fault: null } };
  const { knobs, index } = headroomInHand(state, mode);
  const action = actionOf(press);
  const move = (by: number): State => {
    const next = knobs[Math.max(0, Math.min(knobs.length - 1, index + by))]!;
    return { ...state, mode: { ...mode, knob: next.key, fault: null } };
  };
  if (action === 'knob-up') return move(-1);
  if (action === 'knob-down') return move(1);
  if (action === 'type') return { ...state, mode: { ...mode, edit: editOf(''), fault: null } };
  if (action === 'remove') return without(state, mode);
  const nudge = nudgeOf(action);
  if (nudge === null) return state;
  return turned(state, mode, knobs[index]!.nudge(inStorey(state), ...nudge, unitsOf(state)));
}

function type(state: State, mode: HeadroomMode, press: KeyPress): State {
  const edit = mode.edit!;
  if (isCancel(press)) return { ...state, mode: { ...mode, edit: null, fault: null } };
  if (press.name !== 'enter') {
    const next = edited(edit, press);
    return next === null ? state : { ...state, mode: { ...mode, edit: next, fault: null } };
  }
  if (edit.text.trim() === '') return { ...state, mode: { ...mode, edit: null, fault: null } };
  const { knobs, index } = headroomInHand(state, mode);
  return turned(state, mode, knobs[index]!.enter(inStorey(state), edit.text, unitsOf(state)));
}

function turned(state: State, mode: HeadroomMode, turn: Turn): State {
  if ('fault' in turn) return { ...state, mode: { ...mode, fault: turn.fault } };
  const before = memberOf(state);
  return {
    ...withMember(state, turn.member),
    ghost: { knob: mode.knob, member: before },
    mode: { ...mode, edit: null, fault: null },
  };
}

/** No storey any more: nothing but a typed depth limits the beam. */
function without(state: State, mode: HeadroomMode): State {
  const member = memberOf(state);
  if (member.headroom == null) return { ...state, mode: { ...mode, fault: 'no storey is stated yet' } };
  return { ...withMember(state, { ...member, headroom: null }), mode: { ...mode, fault: null } };
}
