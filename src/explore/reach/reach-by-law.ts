import { isSelfSimilar, liftsOf, loadsOf } from '../../loads/index.ts';
import { beamFields } from '../../statics/beam.ts';
import type { Prepared, Wood } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { CHECK_IDS, type CheckId, PASS_LIMIT } from '../../timber/report.ts';

/** How each check of a member that follows the power laws goes with its length; those absent cannot occur there. */
const EXPONENT: Readonly<Partial<Record<CheckId, number>>> = {
  shear: 1,
  bending: 2,
  'bending-hogging': 2,
  'deflection-live': 3,
  'deflection-total': 3,
  bearing: 1,
  slenderness: 0,
  notch: 1,
};

/**
 * True where every ratio is a pure power of the length: one span or one cantilever under downward line loads,
 * limits as l/n, no factor that goes with the length (CL of an edge held at the ends only, CV).
 */
export function followsLaws(prepared: Prepared, member: Member, wood: Wood): boolean {
  const downward =
    member.area.windUp === 0 &&
    liftsOf(member).length === 0 &&
    loadsOf(member).every(
      (load) => load.type === 'line' && load.kind !== 'windUp' && load.start >= 0 && load.end >= 0,
    );
  return (
    downward &&
    isSelfSimilar(member) &&
    beamFields(member.beam).length === 1 &&
    member.limits.liveMax === null &&
    wood.rules.volume === 'none' &&
    (prepared.sagging.count === 0 || member.bracing !== 'ends') &&
    (prepared.hogging.count === 0 || member.bracingBottom !== 'ends')
  );
}

/** The factor on all lengths at which the first check reaches its limit, and that check, from the ratios as they are. */
export function lengthByLaw(
  ratios: ArrayLike<number>,
  only: readonly CheckId[] | null,
): { factor: number; stops: CheckId | null } {
  let factor = Number.POSITIVE_INFINITY;
  let stops: CheckId | null = null;
  CHECK_IDS.forEach((id, at) => {
    const ratio = ratios[at]!;
    if (Number.isNaN(ratio) || (only !== null && !only.includes(id))) return;
    const exponent = EXPONENT[id] ?? 1;
    const own = exponent > 0 ? ratio ** (-1 / exponent) : ratio > PASS_LIMIT ? 0 : Number.POSITIVE_INFINITY;
    if (own < factor) {
      factor = own;
      stops = id;
    }
  });
  return { factor, stops };
}
