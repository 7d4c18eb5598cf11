import { moneyText } from '../explore/buying/money.ts';
import { ratiosById } from '../explore/judge.ts';
import { type Move, type Moves, movesOf } from '../explore/moves/index.ts';
import { powersOf } from '../explore/powers.ts';
import { BEST_WORD, type Best } from '../explore/rack/best.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import { showInches, showRatio, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { prepare, standingDepth, standingWidth } from '../timber/index.ts';
import type { CheckId } from '../timber/report.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { type Answer, answerOf } from './answer.ts';
import type { MovesMode } from './mode.ts';
import type { TableColumn, TableRow } from './panels/table.ts';
import { signed } from './signed.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import type { MovesTable } from './view.ts';

/** The two ways to put in more wood. */
export type Way = 'deepen' | 'widen';
export const WAYS: readonly Way[] = ['deepen', 'widen'];
/** Lines above the moves: 10 % more wood either way, the nearest stock size either way. */
export const SIDE_LINES = 2;

/** What the moves view shows, in words. */
export interface MovesView extends MovesTable {
  /** "moves, lightest first" */
  readonly heading: string;
  readonly sides: readonly SideLine[];
  /** Of the move in hand: each check with its ratio after, "bending 0.93". */
  readonly after: readonly string[];
  /** The move in hand in full: "closer spacing, 12": passes, with 1.33 x as many members". */
  readonly note: string;
  /** What the move in hand takes more or less of. */
  readonly takes: string;
}

export interface SideLine {
  readonly label: string;
  readonly sides: Readonly<Record<Way, SideView | null>>;
}

export interface SideView {
  readonly to: string;
  readonly ratios: readonly (number | null)[];
  readonly passes: boolean;
}

const KNOWN = new WeakMap<Answer, Map<Units, Moves>>();

/** The moves of the member in hand. Searched once a member: the list that is shown is always that of its own state. */
export function movesNow(state: State): Moves {
  const member = memberOf(state);
  const units = unitsOf(state);
  const ranking = rankingOf(state.session);
  const answer = answerOf(member, ranking);
  const known = KNOWN.get(answer) ?? new Map<Units, Moves>();
  KNOWN.set(answer, known);
  const moves = known.get(units) ?? movesOf(member, { ranking, units, rack: answer.rack });
  known.set(units, moves);
  return moves;
}

/** The move that is in hand; null where the line holds none. */
export function moveInHand(moves: Moves, { line, way }: MovesMode): Move | null {
  if (line === 0) return moves.deepenOrWiden.free[way];
  if (line === 1) return moves.deepenOrWiden.stock[way];
  return moves.moves[line - SIDE_LINES] ?? null;
}

export function movesView(state: State, mode: MovesMode): MovesView {
  const moves = movesNow(state);
  const units = unitsOf(state);
  const { free, stock } = moves.deepenOrWiden;
  const inHand = moveInHand(moves, mode);
  return {
    heading: `moves, ${BEST_WORD[moves.best]} first`,
    sides: [
      {
        label: '10 % more',
        sides: {
          deepen: freeSide(free.deepen, units, 'deepen'),
          widen: freeSide(free.widen, units, 'widen'),
        },
      },
      { label: 'next size', sides: { deepen: sideView(stock.deepen), widen: sideView(stock.widen) } },
    ],
    ...movesTable(moves, units, state.columns >= WIDE ? WIDE_HEADS : CLOSE_HEADS),
    after: inHand === null ? [] : afterText(inHand),
    note: inHand === null ? '' : noteText(inHand, prepare(memberOf(state)).loaded),
    takes: inHand === null ? '' : takesText(inHand, units),
  };
}

/** The moves as a table, best first, with the ratio of each power where `heads` names them. */
export function movesTable(moves: Moves, units: Units, heads: readonly string[]): MovesTable {
  return {
    columns: columnsOf(moves, units, heads),
    rows: moves.moves.map((move) => rowOf(move, units, heads.length)),
    none: 'No change of this member helps.',
  };
}

function freeSide(move: Move, units: Units, way: Way): SideView | null {
  const { section } = move.member;
  const to =
    way === 'deepen'
      ? `${showInches(standingDepth(section), units)} deep`
      : `${showInches(standingWidth(section), units)} wide`;
  return { ...sideView(move)!, to };
}

function sideView(move: Move | null): SideView | null {
  if (move === null) return null;
  return { to: move.label, ratios: powersOf(move.ratios).map(({ ratio }) => ratio), passes: move.passes };
}

/** From this many columns the powers have their names above. */
const WIDE = 100;
const WIDE_HEADS = ['shear¹', 'bend²', 'defl³'];
const CLOSE_HEADS = ['¹', '²', '³'];
const WANTED: Readonly<Record<Best, number>> = { weight: 6, depth: 7, boardFeet: 9, price: 8 };
const RATIOS_AT = 2;
/** Cells of nearly any size with its grade: "GL 3-1/8x13-1/2 16F-1.3E". */
const NAME = 25;

/** What is wanted least of stands whatever else has no room. */
function columnsOf({ best, moves }: Moves, units: Units, heads: readonly string[]): TableColumn[] {
  const measure = (key: Best, head: string): TableColumn =>
    key === best ? { head, align: 'right' } : { head, align: 'right', spare: WANTED[key] };
  return [
    { head: 'move', align: 'left' },
    { head: 'to', align: 'left', least: NAME },
    ...heads.map((head, at): TableColumn => ({ head, align: 'right', spare: 3 - at })),
    { head: 'worst', align: 'right' },
    { head: 'by', align: 'left', spare: 5 },
    measure('weight', weightUnit(units)),
    measure('depth', 'depth'),
    measure('boardFeet', 'bd ft'),
    ...(moves.some((move) => move.price !== null) ? [measure('price', 'price')] : []),
  ];
}

function rowOf(move: Move, units: Units, powers: number): TableRow {
  const { change, passes, governing, worst } = move;
  const ratios = powersOf(move.ratios)
    .slice(0, powers)
    .map(({ ratio }) => (ratio === null ? '—' : showRatio(ratio)));
  return {
    cells: [
      move.kind,
      move.label,
      ...ratios,
      showRatio(worst),
      governing === null ? '' : CHECK_WORD[governing],
      signed(change.weight, (value) => weightNumber(value, units)),
      signed(change.depth, (value) => showInches(value, units)),
      signed(change.boardFeet, (value) => value.toFixed(1)),
      signed(change.price, moneyText),
    ],
    style: passes ? 'plain' : 'quiet',
    ...(passes ? {} : { styles: { [RATIOS_AT + ratios.length]: 'governs' as const } }),
  };
}

function afterText(move: Move): string[] {
  const byId = Object.entries(ratiosById(move.ratios)) as [CheckId, number][];
  return byId.map(([id, ratio]) => `${CHECK_WORD[id]} ${showRatio(ratio)}`);
}

function noteText({ kind, label, times, refused, passes }: Move, loaded: boolean): string {
  if (refused !== null) return `${kind}, ${label}: not allowed, ${refusedWord(refused)}`;
  const many = times > MANY ? `, with ${times.toFixed(2)} x as many members` : '';
  return `${kind}, ${label}: ${loaded ? (passes ? 'passes' : 'does not do it alone') : 'carries nothing'}${many}`;
}

function takesText({ change }: Move, units: Units): string {
  const parts = [
    `weight ${signed(change.weight, (value) => weightNumber(value, units))} ${weightUnit(units)}`,
    `depth ${signed(change.depth, (value) => showInches(value, units))}`,
    ...(change.boardFeet === null
      ? []
      : [`board feet ${signed(change.boardFeet, (value) => value.toFixed(1))} a foot`]),
    ...(change.price === null ? [] : [`price ${signed(change.price, moneyText)} a member`]),
  ];
  return parts.join('   ');
}

/** From here "1.01 x as many" would be said. */
const MANY = 1.005;
