import type { Units } from '../quantity/index.ts';
import { assumptionsOf } from './assumptions.ts';
import { cautionsOf, SUGGESTED_FREQUENCY } from './cautions.ts';
import { explainChecks } from './checks/explain.ts';
import { firstFrequency } from './checks/frequency.ts';
import { type Prepared, prepare } from './checks/prepare.ts';
import { analyse } from './checks/reactions.ts';
import { woodOf } from './checks/wood.ts';
import { lookUp } from './look-up.ts';
import type { Member } from './member.ts';
import { isRefusal } from './reference-values.ts';
import { refusal } from './refusal.ts';
import type { Analysed, CheckId, CheckResult, MemberReport } from './report.ts';
import { sectionWeight } from './section-weight.ts';
import { sizeLabel } from './size-label.ts';
import { standingDepth, standingWidth } from './standing.ts';

/**
 * Every check of a member with its words, sizes in them in `units`: the same numbers as `rate`, to the last bit.
 * `ready` is the member prepared, by who has it already.
 */
export function reportMember(
  member: Member,
  units: Units = 'us',
  ready: Prepared | null = null,
): MemberReport {
  const { section, stock } = member;
  const refused = refusal(member);
  const values = lookUp(stock, section);
  const base = {
    name: member.name,
    label: sizeLabel(section, stock.product),
    width: standingWidth(section),
    depth: standingDepth(section),
    plies: section.plies,
    weight: sectionWeight(member, section),
    refused,
    source: isRefusal(values) ? '' : values.source,
    status: isRefusal(values) ? '' : values.status,
    assumptions: assumptionsOf(member, units),
  };
  if (refused !== null || isRefusal(values)) {
    const cautions = cautionsOf(member, true, null);
    return {
      ...base,
      passes: false,
      governing: null,
      checks: [],
      advice: [],
      analysed: () => NOT_ANALYSED,
      cautions,
    };
  }
  const prepared = ready ?? prepare(member);
  const wood = woodOf(member);
  const { checks, passes } = explainChecks(prepared, wood, section, units);
  const EI = wood.at.E * wood.at.inertia;
  const w = member.selfWeight ? wood.at.weight : 0;
  // The advice is about floors that people walk on.
  const frequency = member.use === 'floor' ? firstFrequency(member, w, EI) : null;
  const advice =
    frequency === null
      ? []
      : [{ id: 'frequency', value: frequency, unit: 'Hz', suggested: SUGGESTED_FREQUENCY }];
  let analysed: Analysed | null = null;
  return {
    ...base,
    passes,
    governing: governingOf(checks),
    checks,
    advice,
    analysed() {
      analysed ??= analyse(member, w, EI);
      return analysed;
    },
    cautions: cautionsOf(member, prepared.loaded, frequency),
  };
}

const NOT_ANALYSED: Analysed = { reactions: [], analysis: {} };

function governingOf(checks: readonly CheckResult[]): CheckId | null {
  let worst: CheckResult | null = null;
  for (const check of checks) if (worst === null || check.ratio > worst.ratio) worst = check;
  return worst?.id ?? null;
}
