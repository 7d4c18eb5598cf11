import { isQuick } from '../explore/is-quick.ts';
import { rulesOf } from './modes/index.ts';
import { rested } from './rest.ts';
import { memberOf, refused, type State, type Step, still } from './state.ts';
import type { KeyPress } from './terminal/key-press.ts';

/** What can happen to the explorer. */
export type Event =
  | { readonly type: 'key'; readonly press: KeyPress }
  | { readonly type: 'paste'; readonly text: string }
  | { readonly type: 'resize'; readonly columns: number; readonly rows: number }
  | {
      readonly type: 'saved';
      readonly file: string;
      readonly session: State['session'];
      readonly thenLeave: boolean;
    }
  | { readonly type: 'save-failed'; readonly reason: string }
  /** The frame is on the screen and no key waits: the rest may be worked out. */
  | { readonly type: 'settle' };

/** The next state and what is to be done; the only place where the state changes. */
export function update(state: State, event: Event): Step {
  const step = next(state, event);
  const after = step.state;
  if (
    after.session.members.length === 0 ||
    after.session.members[after.member] === state.session.members[state.member]
  ) {
    return step;
  }
  return { ...step, state: { ...after, settled: isQuick(memberOf(after)) } };
}

function next(state: State, event: Event): Step {
  switch (event.type) {
    case 'key':
      return rulesOf(state.mode).press(state, state.mode, event.press);
    case 'paste':
      return still(rulesOf(state.mode).paste?.(state, state.mode, event.text) ?? state);
    case 'resize':
      return still({ ...state, columns: event.columns, rows: event.rows });
    case 'settle':
      return still(rested(state));
    case 'save-failed':
      return still(refused(state, event.reason));
    case 'saved': {
      const { file, session, thenLeave } = event;
      const kept = { ...state, kept: session, file, notice: { text: `kept in ${file}`, refusal: false } };
      return thenLeave ? { state: kept, effects: [{ do: 'leave' }] } : still(kept);
    }
  }
}
