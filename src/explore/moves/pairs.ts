import type { Member } from '../../timber/member.ts';
import { type Climb, climb, type Ladder } from './ladder.ts';
import { type Move, moveTo, type Table } from './move.ts';

/** A kind of change of any member. */
export type Kind = (member: Member) => Ladder;

/** A kind with how far it gets alone. */
export interface Trial extends Climb {
  readonly kind: Kind;
}

export function tryKind(table: Table, kind: Kind): Trial {
  return { kind, ...climb(kind(table.member), table.judge) };
}

/**
 * Two changes together that do what neither does alone. With one of them taken as far as it helps the least of the
 * other is found that passes, then with that the least of the first.
 */
export function pairsOf(table: Table, trials: readonly Trial[]): Move[] {
  const alone = trials.filter(({ least, nearest }) => least === null && nearest !== null);
  return alone.flatMap((one, at) =>
    alone.slice(at + 1).flatMap((other) => {
      if (one.ladder.group === other.ladder.group) return [];
      return together(table, one, other) ?? together(table, other, one) ?? [];
    }),
  );
}

function together(table: Table, first: Trial, second: Trial): Move | null {
  const furthest = first.nearest!.member;
  const after = second.kind(furthest);
  const found = climb(after, table.judge).least;
  if (found === null) return null;
  // The same step of the second alone, for the first to be taken back as far as it may.
  const alone = second.ladder.count === after.count ? second.ladder.at(found.step) : null;
  const least = alone === null ? null : climb(first.kind(alone), table.judge).least;
  const [one, other] = least === null ? [furthest, found.member] : [least.member, alone!];
  return moveTo(
    table,
    `${first.ladder.kind} + ${second.ladder.kind}`,
    `${first.ladder.label(one, table.units)}, ${second.ladder.label(other, table.units)}`,
    least?.member ?? found.member,
    least?.outcome ?? found.outcome,
  );
}
