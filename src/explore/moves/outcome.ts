import { boardFeet, prepare, refusal, sectionWeight, standingDepth } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import { memberPrice, pieceLength } from '../buying/buying.ts';
import { type Judgement, judge } from '../judge.ts';
import { overLimit } from '../limits.ts';
import type { Ranking } from '../rack/best.ts';
import { ratiosLike } from '../ratios.ts';

/** What a changed member comes to. */
export interface Outcome extends Judgement {
  /** In the order of CHECK_IDS. */
  readonly ratios: readonly number[];
  /** The rule that forbids it, or the limit that it is over: it does not pass. */
  readonly refused: string | null;
}

/** Rates members that are like one. */
export function judgeLike(member: Member, only: readonly CheckId[] | null): (changed: Member) => Outcome {
  const ratiosOf = ratiosLike(member);
  // What carries nothing does not pass, and no move takes its loads away.
  const { loaded } = prepare(member);
  return (changed) => {
    const ratios = ratiosOf(changed);
    const judgement = judge(ratios, only);
    const refused = refusal(changed) ?? overLimit(changed, changed.section);
    return { ratios, refused, ...judgement, passes: judgement.passes && loaded && refused === null };
  };
}

/** What a member takes of what the user wants least of. */
export interface Cost {
  /** lb/in */
  readonly weight: number;
  /** A foot of length; null for glulam and LVL. */
  readonly boardFeet: number | null;
  /** As it stands, in. */
  readonly depth: number;
  /** One member; null where it has no price. */
  readonly price: number | null;
}

export function costOf(member: Member, { shop }: Ranking): Cost {
  const { stock, section } = member;
  return {
    weight: sectionWeight(member, section),
    boardFeet: boardFeet(section, stock.product),
    depth: standingDepth(section),
    price: memberPrice(shop, { ...section, stock }, pieceLength(member)),
  };
}
