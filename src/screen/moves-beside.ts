import type { Moves } from '../explore/moves/index.ts';
import { rankingOf } from '../session/index.ts';
import { WIDEST } from './arrange.ts';
import type { FoundMoves } from './found.ts';
import { movesNow, movesTable } from './moves-view.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import type { View } from './view.ts';

/** True where the moves have a place on the screen and are still to be found. */
export function isMovesMissing(state: State): boolean {
  const shown = state.mode.name === 'explore' && state.columns >= WIDEST;
  return shown && foundMoves(state) === null;
}

/** The state with the moves found. */
export function withMoves(state: State): State {
  const found: FoundMoves = {
    member: memberOf(state),
    ranking: rankingOf(state.session),
    units: unitsOf(state),
    moves: movesNow(state),
  };
  return { ...state, foundMoves: found };
}

function foundMoves(state: State): Moves | null {
  const found = state.foundMoves;
  const holds =
    found !== undefined &&
    found.member === memberOf(state) &&
    found.ranking === rankingOf(state.session) &&
    found.units === unitsOf(state);
  return holds ? found.moves : null;
}

/**
 * The moves as the view of them lists them, in its order, their kinds in a word; null where there is no place for them,
 * or until they are found.
 */
export function movesBeside(state: State): View['moves'] {
  const moves = state.columns >= WIDEST ? foundMoves(state) : null;
  if (moves === null) return null;
  const table = movesTable(moves, unitsOf(state), []);
  const rows = table.rows.map((row) => {
    const [kind, ...rest] = row.cells;
    return { ...row, cells: [inAWord(kind!), ...rest] };
  });
  return { ...table, rows };
}

/** "a ply + spacing" of "add a ply + closer spacing": the room is for the sizes. */
function inAWord(kind: string): string {
  return kind.replace(/\b(add|better|closer|longer|other) /g, '');
}
