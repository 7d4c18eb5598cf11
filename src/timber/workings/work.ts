import type { Units } from '../../quantity/index.ts';
import { Lately } from '../../quantity/lately.ts';
import { explain } from '../checks/explain.ts';
import { HEAVIEST, type Prepared, prepare } from '../checks/prepare.ts';
import { heavyEnough, rate } from '../checks/rate.ts';
import { type Wood, woodOf } from '../checks/wood.ts';
import type { Member } from '../member.ts';
import type { DesignValues } from '../reference-values.ts';
import { refusal } from '../refusal.ts';
import { CHECK_IDS, type CheckId, type CheckResult, roomForRatios } from '../report.ts';
import { type Figures, figuresOf } from './figures.ts';

/** Everything that the calculations of one member are written from: the same numbers as the report's. */
export interface Work {
  readonly member: Member;
  readonly units: Units;
  readonly figures: Figures;
  /** Good for the member's own weight. */
  readonly prepared: Prepared;
  /** Standing at the member's section. */
  readonly wood: Wood;
  /** Reference values of the row that covers the section. */
  readonly values: DesignValues;
  /** lb/in; 0 where own weight is off. */
  readonly ownWeight: number;
  readonly checks: readonly CheckResult[];
  /** Group behind each check, in the order of CHECK_IDS. */
  readonly groups: Int32Array;
}

/** What forbids the section, where nothing can be worked out. */
export interface NoWork {
  readonly refused: string;
}

/** The member in hand and those it is held against. */
const MOST_MEMBERS = 16;
const KNOWN = new Lately<Member, Partial<Record<Units, Work | NoWork>>>(MOST_MEMBERS);

/** The work of a member; the same object for the same member and units. */
export function workOf(member: Member, units: Units): Work | NoWork {
  const known = KNOWN.get(member) ?? {};
  KNOWN.set(member, known);
  known[units] ??= makeWork(member, units);
  return known[units];
}

function makeWork(member: Member, units: Units): Work | NoWork {
  const refused = refusal(member);
  if (refused !== null) return { refused };
  const wood = woodOf(member);
  const ratios = roomForRatios();
  const groups = new Int32Array(CHECK_IDS.length);
  const first = prepare(member);
  rate(first, wood, member.section, ratios, groups);
  const checks: CheckResult[] = [];
  ratios.forEach((ratio, id) => {
    if (!Number.isNaN(ratio)) checks.push(explain(first, wood, id, ratio, groups[id]!, units));
  });
  return {
    member,
    units,
    figures: figuresOf(units),
    prepared: heavyEnough(first, wood),
    wood,
    values: wood.candidates[wood.at.row]!.values,
    ownWeight: member.selfWeight ? wood.at.weight : 0,
    checks,
    groups,
  };
}

/** A check of the work; null where it does not apply. */
export function checkOf(work: Work, id: CheckId): CheckResult | null {
  return work.checks.find((each) => each.id === id) ?? null;
}

/** Heaviest own weight that demands of one combination have to be searched for, lb/in. */
export function heaviestOf(work: Work): number {
  return Math.max(HEAVIEST, 2 * work.wood.at.weight);
}
