import type { NewLoad } from '../../explore/beam-edits/edit-beam.ts';
import { basisOf } from '../../explore/diagrams/diagram-model.ts';
import { sketchOf } from '../../explore/diagrams/sketch-model.ts';
import { reactionRange } from '../../loads/index.ts';
import { type Addition, additionsTo, kindsOf } from '../additions.ts';
import { isTooSmall } from '../arrange.ts';
import { still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawAdd } from '../panels/add.ts';
import { knobInHand, memberOf, refused, type State, unitsOf, withMember } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { openChoice } from './links.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';

type Add = ModeOf<'add'>;

/** What can be added to the beam: one key or arrows and Enter; a load asks for its kind next. */
export const add: ModeRules<Add> = {
  press: (state, mode, key) => still(press(state, mode, key)),
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const member = memberOf(state);
    const sketch = sketchOf(member, reactionRange(member, basisOf(member).weight), unitsOf(state));
    const question = mode.load === null ? `add to ${member.name}` : `${LOAD_WORDS[mode.load]} of which kind?`;
    drawAdd(viewOf(state), question, linesOf(state, mode), mode.line, sketch, canvas, glyphs);
    return null;
  },
};

const LOAD_WORDS: Readonly<Record<NewLoad, string>> = {
  point: 'a point load',
  'whole line': 'a line load',
  'partial line': 'a line load on a part',
  'tapered line': 'a tapering line load',
};

function linesOf(state: State, { load }: Add): Addition[] {
  const member = memberOf(state);
  const { knobs, index } = knobInHand(state);
  const knob = knobs[index]!.key;
  return load === null
    ? additionsTo(member, knob, unitsOf(state))
    : kindsOf(member, load, knob, unitsOf(state));
}

function press(state: State, mode: Add, press: KeyPress): State {
  const lines = linesOf(state, mode);
  if (isCancel(press)) {
    if (mode.load === null) return { ...state, mode: EXPLORE };
    const { load } = mode;
    const first: Add = { name: 'add', line: 0, load: null };
    const line = Math.max(
      0,
      linesOf(state, first).findIndex((each) => each.load === load),
    );
    return { ...state, mode: { ...first, line } };
  }
  const last = lines.length - 1;
  if (press.name === 'up') return { ...state, mode: { ...mode, line: Math.max(0, mode.line - 1) } };
  if (press.name === 'down') return { ...state, mode: { ...mode, line: Math.min(last, mode.line + 1) } };
  if (press.name === 'enter') return chosen(state, lines[Math.min(mode.line, last)]!);
  const byKey =
    press.name === 'char' && !press.ctrl ? lines.find((each) => each.key === press.char) : undefined;
  return byKey === undefined ? state : chosen(state, byKey);
}

/** Does it, with the new knob in hand and the ghost where the gauges stood before. */
function chosen(state: State, line: Addition): State {
  if (line.links) return openChoice(state);
  if (line.load !== null) return { ...state, mode: { name: 'add', line: 0, load: line.load } };
  const back: State = { ...state, mode: EXPLORE };
  const edit = line.edit();
  if ('fault' in edit) return refused(back, edit.fault);
  const before = memberOf(state);
  return {
    ...withMember(back, edit.member),
    knob: edit.knob,
    ghost: { knob: edit.knob, member: before },
  };
}
