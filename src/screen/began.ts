import type { Member } from '../timber/member.ts';
import { backTo } from './pins.ts';
import { memberOf, type State } from './state.ts';

/** Where the member in hand began: the mark that was set, else as it was when the explorer opened. */
export function beganAt(state: State): Member {
  const now = memberOf(state);
  const marked = state.began?.[now.name];
  if (marked !== undefined) return marked;
  const first = state.past[0]?.session.members.find(({ member }) => member.name === now.name);
  return first?.member ?? now;
}

/** The mark that was set by hand, for a second ghost; null where none was. */
export function beganMark(state: State): Member | null {
  return state.began?.[memberOf(state).name] ?? null;
}

export function markBegan(state: State): State {
  const member = memberOf(state);
  return {
    ...state,
    began: { ...state.began, [member.name]: member },
    notice: { text: 'marked as where we began; o comes back here', refusal: false },
  };
}

export function backToBegan(state: State): State {
  return backTo(state, beganAt(state), 'where we began');
}
