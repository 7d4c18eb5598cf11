import { removeAt } from '../../explore/beam-edits/edit-beam.ts';
import { basisOf } from '../../explore/diagrams/diagram-model.ts';
import { sketchOf } from '../../explore/diagrams/sketch-model.ts';
import type { Turn } from '../../explore/knobs/knob.ts';
import { couldCarry, withLink, withNextEnd, withOtherRepeat } from '../../explore/links/index.ts';
import { reactionRange } from '../../loads/index.ts';
import type { Member } from '../../timber/member.ts';
import { isTooSmall } from '../arrange.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { still } from '../effect.ts';
import { redo, undo } from '../history.ts';
import { actionOf, startsEntry } from '../keys.ts';
import { drawTooSmall } from '../layout.ts';
import { type LinkLine, linesOf, linksView, memberNamed } from '../links-view.ts';
import { EXPLORE, type LinksMode } from '../mode.ts';
import { nudgeOf } from '../nudges.ts';
import { drawLinks } from '../panels/links.ts';
import { memberOf, refused, type State, unitsOf, withMember, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** The reactions of other members that the one in hand carries, and where its own land. */
export const links: ModeRules<LinksMode> = {
  press: (state, mode, key) => still(mode.typing === null ? press(state, mode, key) : type(state, mode, key)),
  paste(state, mode, text) {
    const line = inHand(state, mode);
    if (mode.typing !== null)
      return typing(state, mode, { ...mode.typing, edit: inserted(mode.typing.edit, text) });
    return line?.is === 'link' && /[0-9]/.test(text) ? begin(state, mode, line.knob.key, text) : state;
  },
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const member = memberOf(state);
    const sketch = sketchOf(member, reactionRange(member, basisOf(member).weight), unitsOf(state));
    const place = drawLinks(viewOf(state), linksView(state, mode), sketch, canvas, glyphs);
    if (place === null || mode.typing === null) return null;
    return { ...place, value: mode.typing.edit.text, cursor: mode.typing.edit.cursor };
  },
};

/** The links of the member in hand. */
export function openLinks(state: State): State {
  return inMode(state, { name: 'links', line: 0, choosing: false, typing: null });
}

function inMode(state: State, mode: LinksMode): State {
  return { ...state, mode, notice: null };
}

function inHand(state: State, mode: LinksMode): LinkLine | null {
  const view = linksView(state, mode);
  return view.lines[view.inHand] ?? null;
}

function press(state: State, mode: LinksMode, press: KeyPress): State {
  const letter = press.name === 'char' && !press.ctrl ? press.char : null;
  if (isCancel(press) || letter === 'K' || letter === 'q') {
    return mode.choosing ? inMode(state, { ...mode, choosing: false, line: 0 }) : { ...state, mode: EXPLORE };
  }
  if (opensWorkings(press)) return openedWorkings(state);
  const line = inHand(state, mode);
  const last = linesOf(linksView(state, mode)).length - 1;
  const moved = scrolled(Math.min(mode.line, Math.max(0, last)), press, Math.max(0, last));
  if (moved !== null) return inMode(state, { ...mode, line: moved });
  if (mode.choosing) {
    return press.name === 'enter' && line?.is === 'choice' ? carry(state, line.member) : state;
  }
  if (line?.is === 'link' && startsEntry(press)) return begin(state, mode, line.knob.key, press.char ?? '');
  if (letter === 'a') return choose(state, mode);
  if (letter === 'e' || letter === 't') return changed(state, line, letter);
  if (letter === 'g') return line === null ? state : goTo(state, line);
  const action = actionOf(press);
  switch (action) {
    case 'undo':
      return undo(state);
    case 'redo':
      return redo(state);
    case 'units':
      return withSession(state, { ...state.session, units: unitsOf(state) === 'us' ? 'si' : 'us' });
    case 'type':
      if (line?.is === 'link') return begin(state, mode, line.knob.key, '');
      return line === null ? state : goTo(state, line);
    case 'remove':
      return line?.is === 'link' ? without(state, mode, line) : refused(state, OTHERS);
    default: {
      const nudge = nudgeOf(action);
      if (nudge === null || line === null) return state;
      if (line.is !== 'link') return refused(state, OTHERS);
      return turned(state, line.knob.nudge(memberOf(state), ...nudge, unitsOf(state)));
    }
  }
}

const OTHERS = 'that is a link of the other member: g goes to it';

function turned(state: State, turn: Turn): State {
  return 'fault' in turn ? refused(state, turn.fault) : changedTo(state, turn.member);
}

/** The changed member with the ghosts where its gauges stood. */
function changedTo(state: State, member: Member): State {
  return { ...withMember(state, member), ghost: { knob: 'links', member: memberOf(state) } };
}

/** The next support of the same member, or once instead of repeated. */
function changed(state: State, line: LinkLine | null, key: 'e' | 't'): State {
  if (line === null) return state;
  if (line.is !== 'link') return refused(state, OTHERS);
  const member = memberOf(state);
  const from = memberNamed(state, member.links![line.index]!.member);
  if (from === null) return state;
  const change = key === 'e' ? withNextEnd : withOtherRepeat;
  return changedTo(state, change(member, line.index, from));
}

/** The members that the one in hand could carry. */
export function openChoice(state: State): State {
  const open = openLinks(state);
  return choose(open, open.mode as LinksMode);
}

function choose(state: State, mode: LinksMode): State {
  const { name } = memberOf(state);
  if (state.session.members.length === 1)
    return refused(state, 'this session has one member: nothing else to carry');
  if (couldCarry(state.session, name).length === 0)
    return refused(
      state,
      `every other member carries ${name}, itself or through others: it would be a circle`,
    );
  return inMode(state, { ...mode, choosing: true, line: 0 });
}

/** The chosen member's left end on the one in hand, in hand to be moved. */
function carry(state: State, from: Member): State {
  const member = memberOf(state);
  const edit = withLink(member, from);
  if ('fault' in edit) return refused(state, edit.fault);
  const next = changedTo(state, edit.member);
  const mode: LinksMode = { name: 'links', line: 0, choosing: false, typing: null };
  const line = linesOf(linksView(next, mode)).findIndex(
    (each) => each.is === 'link' && each.knob.key === edit.knob,
  );
  return { ...next, mode: { ...mode, line: Math.max(0, line) } };
}

function without(state: State, mode: LinksMode, line: LinkLine & { readonly is: 'link' }): State {
  const edit = removeAt(memberOf(state), line.knob.key, line.knob.label);
  if ('fault' in edit) return refused(state, edit.fault);
  const text = `${line.knob.label.trim()} taken out; u undoes it`;
  return { ...changedTo(state, edit.member), mode, notice: { text, refusal: false } };
}

/** The other member in hand, with its links. */
function goTo(state: State, line: LinkLine): State {
  const name =
    line.is === 'link'
      ? memberOf(state).links![line.index]!.member
      : line.is === 'landing'
        ? line.landing.carrier
        : line.member.name;
  const member = state.session.members.findIndex((each) => each.member.name === name);
  return openLinks({ ...state, member, ghost: null });
}

function begin(state: State, mode: LinksMode, knob: string, text: string): State {
  return inMode(state, { ...mode, typing: { knob, edit: editOf(text), fault: null } });
}

function typing(state: State, mode: LinksMode, now: LinksMode['typing']): State {
  return inMode(state, { ...mode, typing: now });
}

function type(state: State, mode: LinksMode, press: KeyPress): State {
  const now = mode.typing!;
  if (isCancel(press)) return typing(state, mode, null);
  if (press.name !== 'enter') {
    const edit = edited(now.edit, press);
    return edit === null ? state : typing(state, mode, { ...now, edit, fault: null });
  }
  if (now.edit.text.trim() === '') return typing(state, mode, null);
  const line = linesOf(linksView(state, mode)).find(
    (each) => each.is === 'link' && each.knob.key === now.knob,
  );
  if (line?.is !== 'link') return typing(state, mode, null);
  const turn = line.knob.enter(memberOf(state), now.edit.text, unitsOf(state));
  if ('fault' in turn) return typing(state, mode, { ...now, fault: turn.fault });
  return { ...changedTo(state, turn.member), mode: { ...mode, typing: null } };
}
