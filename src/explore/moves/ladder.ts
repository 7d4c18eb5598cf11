import type { Units } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';
import type { Outcome } from './outcome.ts';

/** Changes of one kind, from the least to the most. */
export interface Ladder {
  readonly kind: string;
  /** Kinds of one group change the same thing: two of them together are no move of their own. */
  readonly group: 'section' | 'wood' | 'length' | 'width' | 'brace' | 'bearing' | 'tie';
  readonly count: number;
  at(step: number): Member;
  /** What the change leads to, in a few words: "2x14", `every 4'-0"`. */
  label(changed: Member, units: Units): string;
  /** Each further step helps at least as much, so that the first that does can be found by halving. */
  readonly monotone: boolean;
}

/** A ladder of members made beforehand. */
export function rungs(
  kind: string,
  group: Ladder['group'],
  members: readonly Member[],
  label: Ladder['label'],
): Ladder {
  return { kind, group, count: members.length, at: (step) => members[step]!, label, monotone: false };
}

/** A step of a ladder with what it comes to. */
export interface Rung {
  readonly step: number;
  readonly member: Member;
  readonly outcome: Outcome;
}

/** How far a ladder gets. */
export interface Climb {
  readonly ladder: Ladder;
  /** The least change that passes; null where none does. */
  readonly least: Rung | null;
  /** The change that comes nearest to passing, of equal ones the furthest; null for an empty ladder. */
  readonly nearest: Rung | null;
}

export function climb(ladder: Ladder, judgeOf: (member: Member) => Outcome): Climb {
  const rung = (step: number): Rung => {
    const member = ladder.at(step);
    return { step, member, outcome: judgeOf(member) };
  };
  if (ladder.count === 0) return { ladder, least: null, nearest: null };
  if (ladder.monotone) {
    // Where each step helps, the last helps most.
    const last = rung(ladder.count - 1);
    return { ladder, least: last.outcome.passes ? firstPassing(rung, last) : null, nearest: last };
  }
  let nearest: Rung | null = null;
  for (let step = 0; step < ladder.count; step += 1) {
    const each = rung(step);
    if (each.outcome.passes) return { ladder, least: each, nearest: each };
    if (nearest === null || each.outcome.worst <= nearest.outcome.worst) nearest = each;
  }
  return { ladder, least: null, nearest };
}

/** By halving, below a rung that passes. */
function firstPassing(rung: (step: number) => Rung, passing: Rung): Rung {
  let best = passing;
  let fails = -1;
  while (best.step - fails > 1) {
    const middle = rung(Math.floor((fails + best.step) / 2));
    if (middle.outcome.passes) best = middle;
    else fails = middle.step;
  }
  return best;
}
