import type { Member } from '../member.ts';
import { CHECK_IDS } from '../report.ts';
import { governingTerm } from './governing-term.ts';
import { prepare } from './prepare.ts';
import { BENDING, HOGGING, LIVE, rate, SHEAR, TOTAL } from './rate.ts';
import { woodOf } from './wood.ts';

const POWERS = [SHEAR, BENDING, HOGGING, LIVE, TOTAL];

/** Index of the field where the worst of shear, bending and deflection stands; 0 where nothing is checked. */
export function governingField(member: Member): number {
  const ratios = new Float64Array(CHECK_IDS.length);
  const groups = new Int32Array(CHECK_IDS.length);
  const prepared = prepare(member);
  const wood = woodOf(member);
  rate(prepared, wood, member.section, ratios, groups);
  if (ratios[SHEAR] === Number.POSITIVE_INFINITY) return 0;
  let worst = -1;
  for (const id of POWERS)
    if (ratios[id]! > (worst < 0 ? Number.NEGATIVE_INFINITY : ratios[worst]!)) worst = id;
  return worst < 0 ? 0 : governingTerm(prepared, wood, worst, groups[worst]!).place;
}
