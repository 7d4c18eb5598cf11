import type { Units } from '../quantity/index.ts';
import { reportMember } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import type { CheckId, CheckResult, MemberReport } from '../timber/report.ts';
import { judge } from './judge.ts';
import { ratiosOf } from './ratios.ts';

/** A report cut down to the checks asked for. */
export interface Checked {
  readonly member: Member;
  readonly report: MemberReport;
  readonly checks: readonly CheckResult[];
  readonly passes: boolean;
  readonly governing: CheckId | null;
  /** The largest ratio of those asked for; 0 where nothing applies. */
  readonly worst: number;
  readonly ratios: readonly number[];
}

/** The checks of a member, all or `only` those asked for, with what they come to; words in `units`. */
export function checkedMember(member: Member, only: readonly CheckId[] | null, units: Units): Checked {
  const report = reportMember(member, units);
  const ratios = ratiosOf(member);
  const unloaded = report.cautions.some((caution) => caution.id === 'unloaded');
  const { passes, governing, worst } = judge(ratios, only);
  const checks = report.checks.filter((each) => only === null || only.includes(each.id));
  return { member, report, checks, passes: passes && !unloaded, governing, worst, ratios };
}
