import { renamed, whoLoses, withoutMember } from '../../explore/links/index.ts';
import {
  fullFault,
  nameFault,
  readCount,
  textFault,
  toldName,
  withDuplicate,
  withMemberAt,
} from '../../session/index.ts';
import { MAX_TITLE } from '../../session/session.ts';
import type { Member } from '../../timber/member.ts';
import { isTooSmall } from '../arrange.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { type Step, still } from '../effect.ts';
import { redo, undo } from '../history.ts';
import { drawTooSmall } from '../layout.ts';
import { type MembersAction, membersActionOf } from '../members-keys.ts';
import { listed, membersView, withChanged, withJudged } from '../members-view.ts';
import {
  EXPLORE,
  MEMBER_SORTS,
  type MembersMode,
  type MembersQuestion,
  type TypedQuestion,
} from '../mode.ts';
import { drawMembers } from '../panels/members.ts';
import { memberOf, refused, type State, unitsOf, withMember, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { titleOf } from '../view-model.ts';
import { openLinks } from './links.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';
import { save } from './save-as.ts';
import { openSettings } from './settings.ts';
import { startAdding } from './start.ts';
import { openedWorkings } from './workings.ts';

/** Every member of the session: what it is, what governs it, who carries whom. */
export const members: ModeRules<MembersMode> = {
  press(state, mode, key) {
    const { state: next, effects } =
      mode.asks === null ? press(state, mode, key) : still(answer(state, mode, mode.asks, key));
    return { state: looked(next), effects };
  },
  paste: (state, mode, text) =>
    mode.asks === null || mode.asks.of === 'delete'
      ? state
      : typing(state, mode, { ...mode.asks, edit: inserted(mode.asks.edit, text), fault: null }),
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const screen = { title: titleOf(state), notice: state.notice };
    const place = drawMembers(screen, membersView(state, mode), canvas, glyphs);
    if (place === null || mode.asks === null || mode.asks.of === 'delete') return null;
    return { ...place, value: mode.asks.edit.text, cursor: mode.asks.edit.cursor };
  },
};

/** The list, with the member that was in hand in hand. */
export function openMembers(state: State): State {
  const from = memberOf(state).name;
  const mode: MembersMode = {
    name: 'members',
    from,
    sort: 'file',
    filter: '',
    asks: null,
    judged: new Map(),
  };
  return inMode(state, withJudged(state, mode));
}

function inMode(state: State, mode: MembersMode): State {
  return { ...state, mode, notice: null };
}

/** With what a key has changed worked out, while the list is what is looked at. */
function looked(state: State): State {
  return state.mode.name === 'members' ? { ...state, mode: withChanged(state, state.mode) } : state;
}

function press(state: State, mode: MembersMode, press: KeyPress): Step {
  const letter = press.name === 'char' && !press.ctrl ? press.char : null;
  if (isCancel(press) || letter === 'j' || letter === 'q') return still(closed(state, mode));
  const action = membersActionOf(press);
  if (action !== null) return act(state, mode, action);
  const order = listed(state, mode);
  const line = scrolled(Math.max(0, order.indexOf(state.member)), press, order.length - 1);
  return still(line === null || order.length === 0 ? state : inHand(state, mode, order[line]!));
}

/** Back to the member that was looked at before, where it is still there. */
function closed(state: State, { from }: MembersMode): State {
  const at = state.session.members.findIndex(({ member }) => member.name === from);
  const member = at < 0 ? state.member : at;
  return {
    ...state,
    member,
    ghost: member === state.member ? state.ghost : null,
    mode: EXPLORE,
    notice: null,
  };
}

function inHand(state: State, mode: MembersMode, member: number): State {
  return { ...inMode(state, mode), member, ghost: null };
}

function act(state: State, mode: MembersMode, action: MembersAction): Step {
  switch (action) {
    case 'filter':
      return still(asking(state, mode, 'filter', mode.filter));
    case 'sort': {
      const sort = MEMBER_SORTS[(MEMBER_SORTS.indexOf(mode.sort) + 1) % MEMBER_SORTS.length]!;
      return still(inMode(state, { ...mode, sort }));
    }
    case 'settings':
      return still(openSettings(state));
    case 'save':
      return save(state, false);
    case 'undo':
      return still(undo(state));
    case 'redo':
      return still(redo(state));
    case 'units':
      return still(withSession(state, { ...state.session, units: unitsOf(state) === 'us' ? 'si' : 'us' }));
    case 'add': {
      const fault = fullFault(state.session);
      return still(fault === null ? startAdding(state, mode) : refused(state, fault));
    }
    default:
      return still(
        listed(state, mode).includes(state.member)
          ? ofMember(state, mode, action)
          : refused(state, 'no member is listed: / changes the filter'),
      );
  }
}

/** What is done to the member in hand. */
function ofMember(state: State, mode: MembersMode, action: MembersAction): State {
  switch (action) {
    case 'open':
      return { ...state, ghost: null, mode: EXPLORE, notice: null };
    case 'duplicate':
      return duplicate(state);
    case 'rename':
      return asking(state, mode, 'name', memberOf(state).name);
    case 'note':
      return asking(state, mode, 'note', memberOf(state).note);
    case 'count':
      return asking(state, mode, 'count', '');
    case 'delete':
      return askDelete(state, mode);
    case 'up':
      return move(state, mode, -1);
    case 'down':
      return move(state, mode, 1);
    case 'links':
      return openLinks({ ...state, ghost: null });
    case 'workings':
      return openedWorkings(state);
    default:
      return state;
  }
}

function told(state: State, text: string): State {
  return { ...state, notice: { text, refusal: false } };
}

function duplicate(state: State): State {
  const fault = fullFault(state.session);
  if (fault !== null) return refused(state, fault);
  const of = memberOf(state).name;
  const next = withSession(state, withDuplicate(state.session, state.member));
  const copy = { ...next, member: state.member + 1, ghost: null };
  return told(copy, `${toldName(memberOf(copy).name)}, as ${toldName(of)}; n names it, u undoes it`);
}

/** Past its neighbour in the list, which may have others of the file between. */
function move(state: State, mode: MembersMode, by: 1 | -1): State {
  if (mode.sort !== 'file')
    return refused(
      state,
      `it is listed ${mode.sort === 'name' ? 'by name' : `by ${mode.sort}`}: o goes back to the order of the file, which this moves it in`,
    );
  const order = listed(state, mode);
  const to = order[order.indexOf(state.member) + by];
  if (to === undefined) return refused(state, by < 0 ? 'it is the first already' : 'it is the last already');
  return { ...withSession(state, withMemberAt(state.session, state.member, to)), member: to };
}

function askDelete(state: State, mode: MembersMode): State {
  if (state.session.members.length === 1)
    return refused(state, 'a session has one member at least: add another first');
  const losing = whoLoses(state.session, memberOf(state).name, unitsOf(state));
  return losing.length === 0 ? deleted(state, mode) : inMode(state, { ...mode, asks: { of: 'delete' } });
}

/** Without the member in hand and the links to it; the one below it in hand. */
function deleted(state: State, mode: MembersMode): State {
  const { name } = memberOf(state);
  const losing = whoLoses(state.session, name, unitsOf(state)).length;
  const order = listed(state, mode);
  const at = order.indexOf(state.member);
  const neighbour = order[at + 1] ?? order[at - 1] ?? 0;
  const last = state.session.members.length - 2;
  const member = Math.min(last, neighbour > state.member ? neighbour - 1 : neighbour);
  const next = { ...withSession(state, withoutMember(state.session, name)), member, ghost: null };
  const links = losing === 0 ? '' : ` with ${losing} ${losing === 1 ? 'link' : 'links'} to it`;
  return told(
    { ...next, mode: { ...mode, asks: null } },
    `${toldName(name)} is gone${links}; u brings it back`,
  );
}

function typing(state: State, mode: MembersMode, asks: MembersQuestion): State {
  if (asks.of !== 'filter') return inMode(state, { ...mode, asks });
  return atListed(inMode(state, { ...mode, asks, filter: asks.edit.text }));
}

function asking(state: State, mode: MembersMode, of: TypedQuestion['of'], text: string): State {
  return typing(state, mode, { of, edit: editOf(text), fault: null });
}

/** With a listed member in hand, where any is listed. */
function atListed(state: State): State {
  if (state.mode.name !== 'members') return state;
  const order = listed(state, state.mode);
  const [first] = order;
  return first === undefined || order.includes(state.member)
    ? state
    : { ...state, member: first, ghost: null };
}

function answer(state: State, mode: MembersMode, asks: MembersQuestion, press: KeyPress): State {
  const done = { ...mode, asks: null };
  if (isCancel(press)) return inMode(state, asks.of === 'filter' ? { ...done, filter: '' } : done);
  if (asks.of === 'delete') return press.name === 'enter' ? deleted(state, mode) : state;
  if (press.name === 'enter') return take(state, mode, asks);
  const edit = edited(asks.edit, press);
  return edit === null ? state : typing(state, mode, { ...asks, edit, fault: null });
}

/** Enter: what was typed holds, or why it may not. */
function take(state: State, mode: MembersMode, asks: TypedQuestion): State {
  const text = asks.edit.text.trim();
  const faulty = (fault: string) => typing(state, mode, { ...asks, fault });
  const done: MembersMode = { ...mode, asks: null };
  const member = memberOf(state);
  const changed = (to: Member) =>
    inMode(to.note === member.note && to.count === member.count ? state : withMember(state, to), done);
  switch (asks.of) {
    case 'filter':
      return inMode(state, done);
    case 'name': {
      const fault = nameFault(state.session, text, member.name);
      return fault === null ? named(state, done, text) : faulty(fault);
    }
    case 'note': {
      const fault = textFault(text, MAX_TITLE);
      return fault === null ? changed({ ...member, note: text }) : faulty(fault);
    }
    case 'count': {
      if (text === '') return inMode(state, done);
      const read = readCount(text);
      return 'fault' in read ? faulty(read.fault) : changed({ ...member, count: read.count });
    }
  }
}

/** With the member in hand called otherwise, wherever it is called. */
function named(state: State, mode: MembersMode, name: string): State {
  const { name: before } = memberOf(state);
  if (name === before) return inMode(state, mode);
  const next = withSession(state, renamed(state.session, before, name));
  const { [before]: began, ...others } = state.began ?? {};
  return {
    ...next,
    ...(began === undefined ? {} : { began: { ...others, [name]: { ...began, name } } }),
    mode: { ...mode, from: mode.from === before ? name : mode.from },
  };
}
