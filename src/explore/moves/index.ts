import type { Units } from '../../quantity/index.ts';
import { prepare, sameStock } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { CHECK_IDS, type CheckId, PASS_LIMIT } from '../../timber/report.ts';
import { BEST_WORD, type Best, BY_WEIGHT, type Ranking } from '../rack/best.ts';
import { gradeWord, sizeName, takeSize } from '../rack/rack.ts';
import { type RankedRack, type RankedSize, rankedRack } from '../rack/ranked.ts';
import { type Climb, climb, type Ladder } from './ladder.ts';
import { closer, shorten } from './length.ts';
import { bestFirst, helps, type Move, moveBy, moveTo, type Table, tableOf } from './move.ts';
import type { Outcome } from './outcome.ts';
import { type Kind, pairsOf, tryKind } from './pairs.ts';
import { addPly, deepen, freeSize, NEAREST, steps, widen } from './section.ts';
import { brace, longerBearing, tieDown } from './support.ts';
import { betterGrade, otherProducts, otherSpecies } from './wood.ts';

export type { Move } from './move.ts';
export { type Cost, costOf } from './outcome.ts';
export { setsBetween } from './sets.ts';

/** Deepening and widening side by side. */
export interface DeepenOrWiden {
  /** 10 % more wood either way, as free sizes. */
  readonly free: { readonly deepen: Move; readonly widen: Move };
  /** The nearest stock sizes either way; null at the end of the stock. */
  readonly stock: { readonly deepen: Move | null; readonly widen: Move | null };
}

export interface Moves {
  readonly best: Best;
  readonly deepenOrWiden: DeepenOrWiden;
  /** Best first: those that pass, by what they take of what the user wants least of; then the nearest to passing. */
  readonly moves: readonly Move[];
}

export interface MoveOptions {
  readonly ranking?: Ranking;
  readonly only?: readonly CheckId[] | null;
  /** Of the labels. */
  readonly units?: Units;
  /** The member's rack, where it has been rated already. */
  readonly rack?: RankedRack;
}

const braceBoth: Kind = (member) => brace(member, ['bracing', 'bracingBottom']);
/** Kinds of which two may be put together; those that change what stands or carries only where it fails. */
const SIZE_KINDS: readonly Kind[] = [deepen, widen, addPly, betterGrade];
/** More pairs than this are no help to somebody who has to choose. */
const PAIRS = 3;

/** Every move that would help a member; none for a member that carries nothing. */
export function movesOf(member: Member, options: MoveOptions = {}): Moves {
  const { ranking = BY_WEIGHT, only = null, units = 'us' } = options;
  const table = tableOf(member, ranking, only, units);
  const sides = deepenOrWiden(table);
  if (!prepare(member).loaded) return { best: ranking.best, deepenOrWiden: sides, moves: [] };
  const rack = options.rack ?? rankedRack(member, ranking, only);
  const fails = (...ids: CheckId[]) =>
    ids.some(
      (id) => (only === null || only.includes(id)) && table.now.ratios[CHECK_IDS.indexOf(id)]! > PASS_LIMIT,
    );

  const sized = SIZE_KINDS.map((kind) => tryKind(table, kind));
  const moves = [
    bestMove(table, rack),
    ...sized.map((each) => climbMove(table, each)),
    ...speciesMoves(table),
    ...productMoves(table),
  ];
  if (!table.now.passes) {
    const kinds = [
      closer,
      ...(fails('bearing') ? [longerBearing] : []),
      ...(fails('uplift') ? [tieDown] : []),
    ];
    const standing = kinds.map((kind) => tryKind(table, kind));
    const others = [otherSpecies, braceBoth].map((kind) => tryKind(table, kind));
    moves.push(
      ...standing.map((each) => climbMove(table, each)),
      ladderMove(table, shorten(member, only)),
      ...braceMoves(table),
      ...bestFirst(table, pairsOf(table, [...sized, ...standing, ...others])).slice(0, PAIRS),
    );
  }
  const helping = moves.filter((move): move is Move => move !== null && helps(table, move));
  return { best: ranking.best, deepenOrWiden: sides, moves: bestFirst(table, once(helping)) };
}

/** The one move of a kind: the least that passes, of those where none does the one that comes nearest. */
export function ladderMove(table: Table, ladder: Ladder): Move | null {
  return climbMove(table, climb(ladder, table.judge));
}

function climbMove(table: Table, { ladder, least, nearest }: Climb): Move | null {
  const rung = least ?? nearest;
  return rung === null ? null : moveBy(table, ladder, rung.member, rung.outcome);
}

/** The size that is lit on the rack; null where none is. */
export function bestMove(table: Table, rack: RankedRack): Move | null {
  const lit = rack.sizes[rack.lit];
  if (lit === undefined) return null;
  return moveTo(
    table,
    BEST_WORD[rack.best],
    sizeName(rack, lit.size),
    takeSize(table.member, lit.size),
    outcomeOf(lit),
  );
}

/** What the rack has found of a size. */
function outcomeOf({ ratios, refused, passes, governing, worst }: RankedSize): Outcome {
  return { ratios, refused, passes, governing, worst };
}

function deepenOrWiden(table: Table): DeepenOrWiden {
  const free = (way: 'deepen' | 'widen') => {
    const changed = freeSize(table.member, way);
    return moveTo(table, way, deepen(table.member).label(changed, table.units), changed);
  };
  const next = (ladder: Ladder) => (ladder.count === 0 ? null : moveBy(table, ladder, ladder.at(0)));
  return {
    free: { deepen: free('deepen'), widen: free('widen') },
    stock: { deepen: next(deepen(table.member)), widen: next(widen(table.member)) },
  };
}

const SPECIES = 3;

/** The other species that pass, best first; where none does the one that comes nearest. */
function speciesMoves(table: Table): Move[] {
  const ladder = otherSpecies(table.member);
  const all = Array.from({ length: ladder.count }, (_, step) => moveBy(table, ladder, ladder.at(step)));
  const sorted = bestFirst(table, all);
  const passing = sorted.filter((move) => move.passes);
  return passing.length > 0 ? passing.slice(0, SPECIES) : sorted.slice(0, 1);
}

/** The best size of each other product. */
function productMoves(table: Table): Move[] {
  return otherProducts(table.member).flatMap((changed) => {
    const rack = rankedRack(changed, table.ranking, table.only);
    const lit = rack.sizes[rack.lit];
    if (lit === undefined) return [];
    const member = { ...takeSize(changed, lit.size), rack: table.member.rack ?? null };
    return [moveTo(table, 'other product', `${lit.size.label} ${gradeWord(lit.size.stock)}`, member)];
  });
}

/** Braces along the edge that does it, or along both; of those that help without doing it the one that helps most. */
function braceMoves(table: Table): Move[] {
  const { member } = table;
  const choices = [brace(member, ['bracing']), brace(member, ['bracingBottom'])];
  if (choices.every((each) => each.count > 0)) choices.push(brace(member, ['bracing', 'bracingBottom']));
  const moves = choices.map((ladder) => ladderMove(table, ladder)).filter((move) => move !== null);
  return bestFirst(table, moves).slice(0, 1);
}

/** Without moves that lead to the same as one before. */
function once(moves: readonly Move[]): Move[] {
  const seen = new Set<string>();
  return moves.filter(({ set }) => {
    const key = [...set].sort().join('\n');
    return !seen.has(key) && seen.add(key);
  });
}

/** The kinds that the sentence of the meeting is made of, those that pass alone. */
export function nearestMoves(
  member: Member,
  rack: RankedRack,
  options: Omit<MoveOptions, 'rack'> = {},
): Move[] {
  const { ranking = BY_WEIGHT, only = null, units = 'us' } = options;
  const table = tableOf(member, ranking, only, units);
  // The rack has rated every size of the member's own wood already.
  const own = rack.sizes.filter((each) => each.passes && sameStock(each.size.stock, member.stock));
  const moves = [
    bestMove(table, rack),
    ...NEAREST.map((kind) => {
      const [nearest] = steps(member, own, kind);
      if (nearest === undefined) return null;
      return moveTo(table, kind.kind, nearest.size.label, takeSize(member, nearest.size), outcomeOf(nearest));
    }),
    ...(table.now.passes ? [] : [ladderMove(table, shorten(member, only))]),
  ];
  return moves.filter((move): move is Move => move?.passes === true);
}
