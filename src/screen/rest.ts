import { isQuick } from '../explore/is-quick.ts';
import { watched } from './carriers.ts';
import { isAroundMissing, stripOf, withAround } from './handover-now.ts';
import { unjudged, withJudged } from './members-view.ts';
import { isMovesMissing, withMoves } from './moves-beside.ts';
import { stripRows } from './panels/strip.ts';
import { windowStart } from './panels/table.ts';
import { memberOf, type State } from './state.ts';

/** What is left to work out once a frame is on the screen; null where nothing is. `ms`: how long no key may have come. */
export function restOf(state: State): { readonly ms: number } | null {
  if (!state.settled) return { ms: state.session.members.length > 0 && isQuick(memberOf(state)) ? 0 : IDLE };
  if (state.mode.name === 'handovers') return state.mode.strip === null ? { ms: 0 } : null;
  if (state.session.members.length === 0) return null;
  if (state.mode.name === 'members' && unjudged(state, state.mode) > 0) return { ms: 0 };
  return state.watch !== undefined || isAroundMissing(state) || isMovesMissing(state) ? { ms: IDLE } : null;
}

/** Longer than a held key takes from one to the next (30 a second), so that a search never holds one up. */
const IDLE = 60;

/** The state with the next part of the rest worked out. */
export function rested(state: State): State {
  if (!state.settled) return { ...state, settled: true };
  if (state.mode.name === 'handovers') return state.mode.strip === null ? withStrip(state) : state;
  if (state.mode.name === 'members' && unjudged(state, state.mode) > 0)
    return { ...state, mode: withJudged(state, state.mode) };
  if (state.watch !== undefined) return watched(state);
  if (isAroundMissing(state)) return withAround(state);
  return isMovesMissing(state) ? withMoves(state) : state;
}

/** With the strip found, scrolled to the stretch that holds now. */
function withStrip(state: State): State {
  const strip = stripOf(state);
  const at = strip.segments.findIndex(({ to }) => strip.now < to);
  const scroll = windowStart(strip.segments.length, stripRows(state.rows), at);
  return { ...state, mode: { name: 'handovers', strip, scroll } };
}
