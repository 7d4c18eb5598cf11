import { prepare, rate, woodOf } from '../timber/index.ts';
import type { Member, Section } from '../timber/member.ts';
import { CHECK_IDS } from '../timber/report.ts';

/** Ratios of every check of a member, in the order of CHECK_IDS; NaN where a check does not apply. */
export function ratiosOf(member: Member): Float64Array {
  const ratios = new Float64Array(CHECK_IDS.length);
  rate(prepare(member), woodOf(member), member.section, ratios);
  return ratios;
}

/** The same for another section under the same loads, without preparing them again. */
export function sectionRater(member: Member): (section: Section) => Float64Array {
  const prepared = prepare(member);
  const wood = woodOf(member);
  return (section) => {
    const ratios = new Float64Array(CHECK_IDS.length);
    rate(prepared, wood, section, ratios);
    return ratios;
  };
}
