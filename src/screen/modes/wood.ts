import type { Knob, Turn } from '../../explore/knobs/knob.ts';
import type { TypedKnob } from '../../explore/knobs/typed.ts';
import { woodKnobs } from '../../explore/knobs/wood.ts';
import { tidyRack, toggleOnRack } from '../../explore/rack/rack-woods.ts';
import { checkStock } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { still } from '../effect.ts';
import { EXPLORE, type WoodMode } from '../mode.ts';
import { drawWood, lastWoodScroll } from '../panels/wood.ts';
import { memberOf, type State, unitsOf, withMember } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { type WoodAction, woodActionOf } from '../wood-keys.ts';
import { woodViewOf } from '../wood-view.ts';
import { isCancel, type ModeRules } from './mode-rules.ts';
import { openedWorkings } from './workings.ts';

/** Choosing the wood: a draft of the member that Enter takes and Escape drops. */
export const wood: ModeRules<WoodMode> = {
  press: (state, mode, press) =>
    still(mode.edit === null ? choose(state, mode, press) : type(state, mode, press)),
  paste(state, mode, text) {
    const edit = inserted(mode.edit ?? editOf(''), text);
    return { ...state, mode: { ...mode, edit, fault: null } };
  },
  draw(state, mode, canvas, glyphs) {
    const place = drawWood(woodViewOf(state, mode), canvas, glyphs);
    return place === null || mode.edit === null
      ? null
      : { ...place, value: mode.edit.text, cursor: mode.edit.cursor };
  },
};

/** The state with the wood of the member in hand to choose. */
export function openWood(state: State): State {
  const member = memberOf(state);
  const { stock, section } = member;
  const mode: WoodMode = {
    name: 'wood',
    draft: member,
    tried: { [stock.product]: { stock, section } },
    knob: 'stock.product',
    edit: null,
    fault: null,
    scroll: 0,
  };
  return { ...state, mode, notice: null };
}

function choose(state: State, mode: WoodMode, press: KeyPress): State {
  const action = woodActionOf(press);
  if (action !== null) return act(state, mode, action);
  const typed = press.name === 'char' && !press.ctrl && !press.meta;
  return typed ? inMode(state, mode, { edit: inserted(editOf(''), press.char ?? ''), fault: null }) : state;
}

function type(state: State, mode: WoodMode, press: KeyPress): State {
  if (isCancel(press)) return inMode(state, mode, { edit: null, fault: null });
  if (press.name !== 'enter') {
    const edit = edited(mode.edit!, press);
    return edit === null ? state : inMode(state, mode, { edit, fault: null });
  }
  if (mode.edit!.text.trim() === '') return inMode(state, mode, { edit: null, fault: null });
  const turn = inHand(mode).enter(mode.draft, mode.edit!.text, unitsOf(state));
  return turned(state, mode, turn);
}

function act(state: State, mode: WoodMode, action: WoodAction): State {
  const nudge = (direction: 1 | -1, step: 'normal' | 'coarse') =>
    turned(state, mode, inHand(mode).nudge(mode.draft, direction, step, unitsOf(state)));
  switch (action) {
    case 'line-up':
      return move(state, mode, -1);
    case 'line-down':
      return move(state, mode, 1);
    case 'less':
      return nudge(-1, 'normal');
    case 'more':
      return nudge(1, 'normal');
    case 'least':
      return nudge(-1, 'coarse');
    case 'most':
      return nudge(1, 'coarse');
    case 'rack':
      return turned(state, mode, toggleOnRack(mode.draft, memberOf(state).stock));
    case 'clear':
      return clear(state, mode);
    case 'page-up':
      return scroll(state, mode, -PAGE);
    case 'page-down':
      return scroll(state, mode, PAGE);
    case 'workings':
      return openedWorkings(state);
    case 'take':
      return take(state, mode);
    case 'back':
      return { ...state, mode: EXPLORE };
  }
}

/** Lines that one page key scrolls. */
const PAGE = 6;

function scroll(state: State, mode: WoodMode, by: number): State {
  const last = lastWoodScroll(woodViewOf(state, mode), state.columns, state.rows);
  return inMode(state, mode, { scroll: Math.min(last, Math.max(0, mode.scroll + by)) });
}

function inMode(state: State, mode: WoodMode, part: Partial<WoodMode>): State {
  return { ...state, mode: { ...mode, ...part } };
}

function inHand(mode: WoodMode): Knob | TypedKnob {
  const knobs = woodKnobs(mode.draft);
  return knobs.find((knob) => knob.key === mode.knob) ?? knobs[0]!;
}

function move(state: State, mode: WoodMode, by: number): State {
  const knobs = woodKnobs(mode.draft);
  const at = knobs.findIndex((knob) => knob.key === mode.knob);
  const next = knobs[Math.min(knobs.length - 1, Math.max(0, at + by))]!;
  return inMode(state, mode, { knob: next.key, fault: null, scroll: 0 });
}

function turned(state: State, mode: WoodMode, turn: Turn): State {
  if ('fault' in turn) return inMode(state, mode, { fault: turn.fault });
  const draft = remembered(mode, turn.member);
  const { stock, section } = draft;
  return inMode(state, mode, {
    draft,
    tried: { ...mode.tried, [stock.product]: { stock, section } },
    edit: null,
    fault: null,
  });
}

/** Back in a product that was chosen before, with the wood and size chosen there. */
function remembered(mode: WoodMode, next: Member): Member {
  const { product } = next.stock;
  const before = product === mode.draft.stock.product ? undefined : mode.tried[product];
  return before === undefined ? next : { ...next, ...before };
}

function clear(state: State, mode: WoodMode): State {
  const knob = inHand(mode);
  const cleared = 'clear' in knob ? knob.clear(mode.draft) : null;
  if (cleared === null) return inMode(state, mode, { fault: 'nothing is typed here to clear' });
  return inMode(state, mode, { draft: cleared, fault: null, knob: inHand({ ...mode, draft: cleared }).key });
}

function take(state: State, mode: WoodMode): State {
  const before = memberOf(state);
  const draft = tidyRack(mode.draft);
  if (draft === before) return { ...state, mode: EXPLORE };
  const fault = checkStock(draft);
  if (fault !== null) return inMode(state, mode, { fault });
  return { ...withMember(state, draft), ghost: { knob: 'wood', member: before }, mode: EXPLORE };
}
