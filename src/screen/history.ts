import { momentOf, refused, type State } from './state.ts';

/** The state before the last change of the session. */
export function undo(state: State): State {
  const last = state.past.at(-1);
  if (last === undefined) return refused(state, 'nothing to undo');
  return {
    ...state,
    ...last,
    past: state.past.slice(0, -1),
    future: [momentOf(state), ...state.future],
    ghost: null,
    notice: null,
  };
}

/** The state before the last undo. */
export function redo(state: State): State {
  const [next, ...future] = state.future;
  if (next === undefined) return refused(state, 'nothing to redo');
  return { ...state, ...next, past: [...state.past, momentOf(state)], future, ghost: null, notice: null };
}
