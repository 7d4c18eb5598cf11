import { nearestSection } from '../../explore/rack/choose-wood.ts';
import { takeSize } from '../../explore/rack/rack.ts';
import { bestOf } from '../../explore/rack/ranked.ts';
import { parseQuantity, showSpan, type Units } from '../../quantity/index.ts';
import {
  freeName,
  MEMBER_KINDS,
  type MemberKind,
  memberOfKind,
  newSession,
  rankingOf,
  USUAL_STOCK,
  withMemberAfter,
} from '../../session/index.ts';
import { isTooSmall } from '../arrange.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { type OpenAnswer, type Opened, type Step, still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE, type MembersMode, type Offers, type StartMode } from '../mode.ts';
import { drawStart } from '../panels/start.ts';
import { startLines, startView } from '../starts.ts';
import { type State, unitsOf, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';

/** An empty start with what there is to open. */
export function startWith(offers: Offers): StartMode {
  return {
    name: 'start',
    step: 'choose',
    line: 0,
    edit: editOf(''),
    span: 0,
    fault: null,
    offers,
    addTo: null,
  };
}

/** The same questions of a member that is added to the list. */
export function startAdding(state: State, list: MembersMode): State {
  const mode: StartMode = { ...startWith({ samples: [], files: [] }), addTo: list };
  return { ...state, mode, notice: null };
}

/**
 * What a new member is, its span and the width it carries, and then a sized beam; or a sample or a file to open. Escape
 * goes back a question.
 */
export const start: ModeRules<StartMode> = {
  press(state, mode, press) {
    if (mode.step === 'choose') return choose(state, mode, press);
    if (isCancel(press)) {
      const step = mode.step === 'width' ? 'span' : 'choose';
      return asking(state, mode, { step, edit: editOf(''), fault: null });
    }
    if (press.name === 'enter') return answer(state, mode);
    const edit = edited(mode.edit, press);
    return edit === null ? still(state) : asking(state, mode, { edit, fault: null });
  },
  paste: (state, mode, text) =>
    mode.step === 'choose'
      ? state
      : { ...state, mode: { ...mode, edit: inserted(mode.edit, text), fault: null } },
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const place = drawStart(startView(mode, unitsOf(state)), canvas, glyphs);
    return place === null ? null : { ...place, value: mode.edit.text, cursor: mode.edit.cursor };
  },
};

function asking(state: State, mode: StartMode, next: Partial<StartMode>): Step {
  return still({ ...state, mode: { ...mode, ...next }, notice: null });
}

function choose(state: State, mode: StartMode, press: KeyPress): Step {
  if (isCancel(press) || (press.name === 'char' && press.char === 'q'))
    return mode.addTo === null
      ? { state, effects: [{ do: 'leave' }] }
      : still({ ...state, mode: mode.addTo });
  const lines = startLines(mode);
  const line = scrolled(mode.line, press, lines.length - 1);
  if (line !== null) return asking(state, mode, { line, fault: null });
  if (press.name === 'enter') return take(state, mode);
  const at = press.name === 'char' ? Number(press.char) - 1 : -1;
  return lines[at]?.is === 'kind' ? take(state, { ...mode, line: at }) : still(state);
}

function take(state: State, mode: StartMode): Step {
  const line = startLines(mode)[mode.line]!;
  switch (line.is) {
    case 'kind':
      return asking(state, mode, { step: 'span', edit: editOf(''), fault: null });
    case 'path':
      return asking(state, mode, { step: 'file', edit: editOf(''), fault: null });
    case 'sample':
      return opening(state, mode, { sample: line.index });
    case 'file':
      return opening(state, mode, { file: line.file });
  }
}

function opening(state: State, mode: StartMode, what: Opened): Step {
  return { state: { ...state, mode: { ...mode, fault: null } }, effects: [{ do: 'open', what }] };
}

/** What can be answered, in. */
const RANGE = { span: { least: 12, most: 1200 }, width: { least: 1, most: 1200 } };

function answer(state: State, mode: StartMode): Step {
  const text = mode.edit.text.trim();
  if (mode.step === 'file') {
    if (text === '')
      return asking(state, mode, { fault: 'type the name of a session file, such as job.json' });
    return opening(state, mode, { file: text });
  }
  const kind = kindOf(mode);
  if (mode.step === 'width' && text === '' && kind.spacing !== null)
    return still(made(state, mode, kind, kind.spacing));
  const units = unitsOf(state);
  const range = mode.step === 'span' ? RANGE.span : RANGE.width;
  const parsed = parseQuantity('length', text, plainUnit(mode, units));
  if (!parsed.ok) return asking(state, mode, { fault: parsed.fault });
  if (parsed.value < range.least || parsed.value > range.most) {
    return asking(state, mode, {
      fault: `from ${showSpan(range.least, units)} to ${showSpan(range.most, units)}`,
    });
  }
  if (mode.step === 'span') {
    return asking(state, mode, { step: 'width', span: parsed.value, edit: editOf(''), fault: null });
  }
  return still(made(state, mode, kind, parsed.value));
}

/** The kinds stand first among the lines. */
function kindOf({ line }: StartMode): MemberKind {
  return MEMBER_KINDS[line]!;
}

/** What a figure without a unit is in: spacings are told in inches, all else in feet. */
function plainUnit(mode: StartMode, units: Units): 'ft' | 'in' | 'm' | 'mm' {
  const isSpacing = mode.step === 'width' && kindOf(mode).spacing !== null;
  if (units === 'us') return isSpacing ? 'in' : 'ft';
  return isSpacing ? 'mm' : 'm';
}

/** The new member with the best size that passes where there is one: the explorer on it, or the list that it is added to. */
function made(state: State, mode: StartMode, kind: MemberKind, width: number): State {
  const { session } = state;
  const { stock = USUAL_STOCK, combinations } = session;
  const plain = memberOfKind(kind, mode.span, width, freeName(session, kind.mark), { combinations, stock });
  const member = { ...plain, section: nearestSection(stock, plain.section) };
  const best = bestOf(member, rankingOf(session));
  const sized = best === null ? member : takeSize(member, best);
  if (mode.addTo === null) {
    const begun = { ...newSession(sized), units: session.units };
    const first = { session: begun, kept: null, member: 0, knob: 'spans.0', notice: null };
    return { ...state, ...first, mode: EXPLORE };
  }
  const next = withSession(
    state,
    withMemberAfter(session, state.member, { member: sized, written: undefined }),
  );
  if (next.session === session) return { ...next, mode: mode.addTo };
  const text = `${sized.name} added${best === null ? ', and no size passes' : ''}; Enter opens it, u undoes it`;
  return {
    ...next,
    member: state.member + 1,
    ghost: null,
    mode: { ...mode.addTo, filter: '' },
    notice: { text, refusal: false },
  };
}

/** The explorer on what was opened, or the start with the reason why it could not be. */
export function withOpened(state: State, answer: OpenAnswer): State {
  const { mode } = state;
  if (!answer.ok) {
    const { fault } = answer;
    return mode.name === 'start' ? { ...state, mode: { ...mode, fault } } : state;
  }
  const { session, file, readOnly, recovered, notice } = answer;
  return {
    ...state,
    session,
    kept: session,
    file,
    readOnly,
    member: 0,
    knob: 'spans.0',
    past: [],
    future: [],
    ghost: null,
    mode: recovered === null ? EXPLORE : { name: 'recovered', recovered, scroll: 0, after: EXPLORE },
    notice: notice === null ? null : { text: notice, refusal: true },
  };
}
