import { isQuick } from '../explore/is-quick.ts';
import { watching } from './carriers.ts';
import {
  type Effect,
  type OpenAnswer,
  type SheetAnswer,
  type Step,
  still,
  type YardAnswer,
} from './effect.ts';
import { withYardAnswer } from './modes/buying.ts';
import { openedHelp, opensHelp } from './modes/help.ts';
import { rulesOf } from './modes/index.ts';
import { withSheetAnswer } from './modes/sheet.ts';
import { withOpened } from './modes/start.ts';
import { rested } from './rest.ts';
import { isKept, memberOf, refused, type State } from './state.ts';
import type { KeyPress } from './terminal/key-press.ts';
import { traced } from './trail.ts';

/** What can happen to the explorer. */
export type Event =
  /** `time`: ms since 1970, by a clock that may go wrong. */
  | { readonly type: 'key'; readonly press: KeyPress; readonly time?: number }
  | { readonly type: 'paste'; readonly text: string }
  | { readonly type: 'resize'; readonly columns: number; readonly rows: number }
  | {
      readonly type: 'saved';
      readonly file: string;
      readonly session: State['session'];
      readonly thenLeave: boolean;
    }
  | { readonly type: 'save-failed'; readonly reason: string }
  /** Somebody else has written the file: nothing was saved. */
  | { readonly type: 'changed-on-disk'; readonly thenLeave: boolean }
  /** Something came of what was asked for outside. */
  | { readonly type: 'told'; readonly text: string; readonly refusal: boolean }
  /** A sheet was asked for. */
  | { readonly type: 'sheet'; readonly answer: SheetAnswer }
  /** A sample or a file was asked for. */
  | { readonly type: 'opened'; readonly answer: OpenAnswer }
  /** A yard list was asked for. */
  | { readonly type: 'yard'; readonly answer: YardAnswer }
  /** The frame is on the screen and no key waits: the rest may be worked out. */
  | { readonly type: 'settle' };

/** The next state and what is to be done; the only place where the state changes. */
export function update(state: State, event: Event): Step {
  const step = journaled(state, noted(state, event, next(state, event)));
  const after = watching(state, step.state);
  if (
    after.session.members.length === 0 ||
    after.session.members[after.member] === state.session.members[state.member]
  ) {
    return { ...step, state: after };
  }
  return { ...step, state: { ...after, settled: isQuick(memberOf(after)) } };
}

/** With what was done to the members on their trails; what was recovered brings its own. */
function noted(state: State, event: Event, step: Step): Step {
  if (event.type !== 'key' || state.mode.name === 'recovered') return step;
  return { ...step, state: traced(state, step.state, event.time ?? 0) };
}

/** Every change goes into the recovery journal. */
function journaled(state: State, step: Step): Step {
  const { session } = step.state;
  if (session === state.session) return step;
  const journal: Effect = { do: 'journal', session: isKept(step.state) ? null : session };
  return { ...step, effects: [...step.effects, journal] };
}

function next(state: State, event: Event): Step {
  switch (event.type) {
    case 'key':
      if (opensHelp(state, event.press)) return still(openedHelp(state));
      return rulesOf(state.mode).press(state, state.mode, event.press);
    case 'paste':
      return still(rulesOf(state.mode).paste?.(state, state.mode, event.text) ?? state);
    case 'resize':
      return still({ ...state, columns: event.columns, rows: event.rows });
    case 'settle':
      return still(rested(state));
    case 'sheet':
      return still(withSheetAnswer(state, event.answer));
    case 'yard':
      return still(withYardAnswer(state, event.answer));
    case 'opened':
      return still(withOpened(state, event.answer));
    case 'save-failed':
      return still(refused(state, event.reason));
    case 'changed-on-disk':
      return still({ ...state, mode: { name: 'changed-on-disk', thenLeave: event.thenLeave }, notice: null });
    case 'told':
      return still({ ...state, notice: { text: event.text, refusal: event.refusal } });
    case 'saved': {
      const { file, session, thenLeave } = event;
      const kept = {
        ...state,
        kept: session,
        file,
        readOnly: null,
        notice: { text: `kept in ${file}`, refusal: false },
      };
      return thenLeave ? { state: kept, effects: [{ do: 'leave' }] } : still(kept);
    }
  }
}
