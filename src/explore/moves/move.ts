import type { Units } from '../../quantity/index.ts';
import { rackSizesOf, type Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import type { Ranking } from '../rack/best.ts';
import { hasSize } from '../rack/rack.ts';
import { compare, measureOf } from '../rack/ranked.ts';
import type { Ladder } from './ladder.ts';
import { type Cost, costOf, judgeLike, type Outcome } from './outcome.ts';
import { setsBetween } from './sets.ts';

/** One change that would help, with what it does and what it takes. */
export interface Move extends Outcome, Cost {
  /** "deepen", "brace", "deepen + brace". */
  readonly kind: string;
  /** What it leads to: "2x14", `13'-3"`, "No.1". */
  readonly label: string;
  readonly member: Member;
  /** The stock size that it leads to, where the section or the wood is another. */
  readonly size: Size | null;
  /** The longest span it leads to, in, where it is another. */
  readonly span: number | null;
  /** What to put on the command line as --set to get exactly this. */
  readonly set: readonly string[];
  /** After less before; null where either is not known. */
  readonly change: Readonly<Record<keyof Cost, number | null>>;
  /** How many times as many members the same floor takes: more than 1 where they stand closer. */
  readonly times: number;
}

/** What moves of one member are judged and priced by. */
export interface Table {
  readonly member: Member;
  readonly ranking: Ranking;
  readonly only: readonly CheckId[] | null;
  readonly units: Units;
  readonly now: Outcome;
  readonly cost: Cost;
  judge(changed: Member): Outcome;
}

export function tableOf(
  member: Member,
  ranking: Ranking,
  only: readonly CheckId[] | null,
  units: Units,
): Table {
  const judge = judgeLike(member, only);
  return { member, ranking, only, units, judge, now: judge(member), cost: costOf(member, ranking) };
}

/** The move to a changed member. */
export function moveTo(
  table: Table,
  kind: string,
  label: string,
  member: Member,
  outcome: Outcome = table.judge(member),
): Move {
  const before = table.member;
  const cost = costOf(member, table.ranking);
  const resized = member.section !== before.section || member.stock !== before.stock;
  const [was, is] = [Math.max(...before.beam.spans), Math.max(...member.beam.spans)];
  const less = (key: keyof Cost) => {
    const [one, other] = [cost[key], table.cost[key]];
    return one === null || other === null ? null : one - other;
  };
  let set: readonly string[] | null = null;
  return {
    kind,
    label,
    member,
    ...outcome,
    ...cost,
    size: resized ? (rackSizesOf(member.stock).find((size) => hasSize(member, size)) ?? null) : null,
    span: was === is ? null : is,
    // Written out only for those who read it: the screen does not, at every nudge.
    get set() {
      set ??= setsBetween(before, member);
      return set;
    },
    change: {
      weight: less('weight'),
      boardFeet: less('boardFeet'),
      depth: less('depth'),
      price: less('price'),
    },
    times: timesAsMany(before, member),
  };
}

/** How many times as many members the same floor takes after as before. */
export function timesAsMany(before: Member, after: Member): number {
  return before.tributary > 0 && after.tributary > 0 ? before.tributary / after.tributary : 1;
}

/** The move to a step of a ladder. */
export function moveBy(table: Table, ladder: Ladder, member: Member, outcome?: Outcome): Move {
  return moveTo(table, ladder.kind, ladder.label(member, table.units), member, outcome);
}

/** What a move takes of what the user wants least of: of all members together; null where that is not known. */
export function takes({ ranking }: Pick<Table, 'ranking'>, move: Move, best = ranking.best): number | null {
  const measure = measureOf(best, move);
  return measure === null || best === 'depth' ? measure : measure * move.times;
}

/** Those that pass first, by what they take, then by weight; then those that come nearest to passing. */
export function bestFirst(table: Pick<Table, 'ranking'>, moves: readonly Move[]): Move[] {
  return moves.toSorted((a, b) => {
    if (a.passes !== b.passes) return a.passes ? -1 : 1;
    if (!a.passes) return a.worst - b.worst;
    return (
      compare(takes(table, a), takes(table, b)) ||
      compare(takes(table, a, 'weight'), takes(table, b, 'weight'))
    );
  });
}

/** A difference below this is rounding. */
const HAIR = 1e-9;

/** Whether a move does something for the member: it passes, comes nearer to it, or takes less. */
export function helps(table: Table, move: Move): boolean {
  const { now } = table;
  if (move.set.length === 0 || move.refused !== null) return false;
  if (!move.passes) return !now.passes && move.worst < now.worst - HAIR;
  if (!now.passes) return true;
  const [before, after] = [measureOf(table.ranking.best, table.cost), takes(table, move)];
  return move.worst < now.worst - HAIR || (before !== null && after !== null && after < before * (1 - HAIR));
}
