import { lightestOf, takeSize } from '../../explore/rack/rack.ts';
import { parseQuantity, showSpan } from '../../quantity/index.ts';
import { newMember, newSession } from '../../session/index.ts';
import type { Use } from '../../timber/member.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { drawStart } from '../panels/start.ts';
import { STARTS } from '../starts.ts';
import { EXPLORE, type State, type Step, still } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode.ts';

type Start = ModeOf<'start'>;

/** The first question of an empty start. */
export const START: Start = { name: 'start', step: 'use', use: 0, edit: editOf(''), span: 0, fault: null };

/** An empty start asks use, span and tributary width, and shows a sized beam. Escape goes back a question. */
export const start: ModeRules<Start> = {
  press(state, mode, press) {
    if (mode.step === 'use') return chooseUse(state, mode, press);
    if (isCancel(press)) {
      const step = mode.step === 'tributary' ? 'span' : 'use';
      return asking(state, mode, { step, edit: editOf(''), fault: null });
    }
    if (press.name === 'enter') return answer(state, mode);
    const edit = edited(mode.edit, press);
    return edit === null ? still(state) : asking(state, mode, { edit, fault: null });
  },
  paste: (state, mode, text) =>
    mode.step === 'use'
      ? state
      : { ...state, mode: { ...mode, edit: inserted(mode.edit, text), fault: null } },
  draw(_state, mode, canvas, glyphs) {
    const place = drawStart(mode, canvas, glyphs);
    return place === null ? null : { ...place, value: mode.edit.text, cursor: mode.edit.cursor };
  },
};

function asking(state: State, mode: Start, next: Partial<Start>): Step {
  return still({ ...state, mode: { ...mode, ...next } });
}

function chooseUse(state: State, mode: Start, press: KeyPress): Step {
  if (isCancel(press) || (press.name === 'char' && press.char === 'q'))
    return { state, effects: [{ do: 'leave' }] };
  if (press.name === 'enter') return asking(state, mode, { step: 'span' });
  const last = STARTS.length - 1;
  if (press.name === 'down' || press.name === 'right')
    return asking(state, mode, { use: Math.min(last, mode.use + 1) });
  if (press.name === 'up' || press.name === 'left')
    return asking(state, mode, { use: Math.max(0, mode.use - 1) });
  const use = press.name === 'char' ? Number(press.char) - 1 : -1;
  return use >= 0 && use <= last ? asking(state, mode, { use, step: 'span' }) : still(state);
}

/** What can be answered, in. */
const RANGE = { span: { least: 12, most: 1200 }, tributary: { least: 1, most: 1200 } };

function answer(state: State, mode: Start): Step {
  const range = mode.step === 'span' ? RANGE.span : RANGE.tributary;
  const parsed = parseQuantity('length', mode.edit.text, 'ft');
  if (!parsed.ok) return asking(state, mode, { fault: parsed.fault });
  if (parsed.value < range.least || parsed.value > range.most) {
    return asking(state, mode, {
      fault: `from ${showSpan(range.least, 'us')} to ${showSpan(range.most, 'us')}`,
    });
  }
  if (mode.step === 'span') {
    return asking(state, mode, { step: 'tributary', span: parsed.value, edit: editOf(''), fault: null });
  }
  return still(sized(state, STARTS[mode.use]!.use, mode.span, parsed.value));
}

/** The explorer on a new member, with the lightest stock size that passes where there is one. */
function sized(state: State, use: Use, span: number, tributary: number): State {
  const member = newMember(use, [span], tributary);
  const lit = lightestOf(member);
  const session = newSession(lit === null ? member : takeSize(member, lit));
  return { ...state, session, kept: null, member: 0, knob: 'spans.0', mode: EXPLORE, notice: null };
}
