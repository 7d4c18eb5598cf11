import { type Crossovers, crossovers } from '../explore/crossovers.ts';
import { type Cure, curesOf } from '../explore/cures.ts';
import { type Exponents, exponentsOf } from '../explore/exponents.ts';
import { type Judgement, judge } from '../explore/judge.ts';
import { OTHER_CHECKS, type PowerRatio, powersOf, standsTo } from '../explore/powers.ts';
import { BY_WEIGHT, type Ranking } from '../explore/rack/best.ts';
import { type RankedRack, rankedRack } from '../explore/rack/ranked.ts';
import { ratiosOf } from '../explore/ratios.ts';
import { lazyReaches, type Reaches } from '../explore/reach/reaches.ts';
import { spanToDepthOf } from '../explore/span-to-depth.ts';
import { Lately } from '../quantity/lately.ts';
import { reportMember } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_IDS, type CheckId, type MemberReport } from '../timber/report.ts';

/** What the core says of one member. Each part is worked out when it is first asked for, and kept. */
export interface Answer extends Judgement {
  readonly report: MemberReport;
  readonly powers: readonly [PowerRatio, PowerRatio, PowerRatio];
  /** Checks outside the powers, worst first. */
  readonly others: readonly { readonly id: CheckId; readonly ratio: number }[];
  readonly spanToDepth: number;
  readonly crossovers: Crossovers;
  /** l/h up to which every check passes, by the power laws; null where none does. */
  readonly standsTo: number | null;
  /** In the order of what counts as best. */
  readonly rack: RankedRack;
  readonly ranking: Ranking;
  readonly cures: readonly Cure[];
  readonly exponents: Partial<Record<CheckId, Exponents>>;
  /** Reach of each size of the rack, in its order; null where the size is refused. */
  readonly reaches: Reaches;
}

/** The member in hand, its ghosts and pins: an answer that has found its reaches holds half a megabyte. */
const MOST_MEMBERS = 16;
const MOST_RANKINGS = 4;
const KNOWN = new Lately<Ranking, Lately<Member, Answer>>(MOST_RANKINGS);

/** The answer for a member; the same object for the same member and the same of what counts as best. */
export function answerOf(member: Member, ranking: Ranking = BY_WEIGHT): Answer {
  const answers = KNOWN.get(ranking) ?? new Lately<Member, Answer>(MOST_MEMBERS);
  KNOWN.set(ranking, answers);
  const known = answers.get(member);
  if (known !== undefined) return known;
  const answer = new LazyAnswer(member, ranking);
  answers.set(member, answer);
  return answer;
}

/** Keeps what a getter worked out by putting it in the getter's place. */
function keep<T>(on: object, name: string, value: T): T {
  Object.defineProperty(on, name, { value, enumerable: true });
  return value;
}

class LazyAnswer implements Answer {
  readonly #member: Member;
  readonly #ratios: readonly number[];
  readonly passes: boolean;
  readonly governing: CheckId | null;
  readonly worst: number;
  readonly powers: Answer['powers'];
  readonly spanToDepth: number;

  constructor(
    member: Member,
    readonly ranking: Ranking,
  ) {
    this.#member = member;
    this.#ratios = ratiosOf(member);
    const judgement = judge(this.#ratios);
    this.passes = judgement.passes;
    this.governing = judgement.governing;
    this.worst = judgement.worst;
    this.powers = powersOf(this.#ratios);
    this.spanToDepth = spanToDepthOf(member);
  }

  get report(): MemberReport {
    return keep(this, 'report', reportMember(this.#member));
  }

  get others(): Answer['others'] {
    const others = OTHER_CHECKS.map((id) => ({ id, ratio: this.#ratios[CHECK_IDS.indexOf(id)]! }))
      .filter(({ ratio }) => !Number.isNaN(ratio))
      .sort((a, b) => b.ratio - a.ratio);
    return keep(this, 'others', others);
  }

  get crossovers(): Crossovers {
    const [shear, bending, deflection] = this.powers.map((power) => power.ratio ?? 0);
    return keep(this, 'crossovers', crossovers(this.spanToDepth, shear!, bending!, deflection!));
  }

  get standsTo(): number | null {
    // Checks outside the powers follow the span once, as shear does.
    const limits = [
      ...this.powers.map(({ ratio, exponent }) =>
        ratio === null ? Number.POSITIVE_INFINITY : standsTo(this.spanToDepth, ratio, exponent),
      ),
      ...this.others.map(({ ratio }) => standsTo(this.spanToDepth, ratio, 1)),
    ];
    const least = Math.min(...limits);
    return keep(this, 'standsTo', least > 0 && Number.isFinite(least) ? least : null);
  }

  get rack(): RankedRack {
    return keep(this, 'rack', rankedRack(this.#member, this.ranking));
  }

  get cures(): readonly Cure[] {
    return keep(this, 'cures', curesOf(this.#member, this.rack, this.ranking));
  }

  get exponents(): Answer['exponents'] {
    return keep(this, 'exponents', exponentsOf(this.#member));
  }

  get reaches(): Answer['reaches'] {
    return keep(this, 'reaches', lazyReaches(this.#member, this.rack));
  }
}
