import { isFound, onward } from '../explore/handovers/handovers.ts';
import { isQuick } from '../explore/is-quick.ts';
import { watched } from './carriers.ts';
import { isAroundMissing, stripOf, stripSearch, withAround } from './handover-now.ts';
import { unjudged, withJudged } from './members-view.ts';
import type { HandoversMode } from './mode.ts';
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
  if (state.mode.name === 'handovers')
    return state.mode.strip === null ? withMoreOfStrip(state, state.mode) : state;
  if (state.mode.name === 'members' && unjudged(state, state.mode) > 0)
    return { ...state, mode: withJudged(state, state.mode) };
  if (state.watch !== undefined) return watched(state);
  if (isAroundMissing(state)) return withAround(state);
  return isMovesMissing(state) ? withMoves(state) : state;
}

/** Readings of the rack at a time, so that a key never waits longer than for a frame; of a quick member they are short. */
const READINGS = 3;
const QUICK_READINGS = 16;

/** With the search for the strip begun or gone on with; found, it is scrolled to the stretch that holds now. */
function withMoreOfStrip(state: State, mode: HandoversMode): State {
  if (mode.search === null) return { ...state, mode: { ...mode, search: stripSearch(state) } };
  const search = onward(mode.search, isQuick(memberOf(state)) ? QUICK_READINGS : READINGS);
  if (!isFound(search)) return { ...state, mode: { ...mode, search } };
  const strip = stripOf(state, search);
  const at = strip.groups.findIndex((group) => strip.now < group.at(-1)!.to);
  const scroll = windowStart(strip.groups.length, stripRows(state.rows), at);
  return { ...state, mode: { name: 'handovers', strip, search: null, scroll } };
}
