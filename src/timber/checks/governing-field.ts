import type { Member } from '../member.ts';
import { CHECK_IDS, roomForRatios } from '../report.ts';
import { type Governing, governingTerm } from './governing-term.ts';
import { type Prepared, prepare } from './prepare.ts';
import { BENDING, HOGGING, LIVE, rate, SHEAR, TOTAL } from './rate.ts';
import { woodOf } from './wood.ts';

const POWERS = [SHEAR, BENDING, HOGGING, LIVE, TOTAL];

/** Places this near to each other, as part of a field, are one. */
const SAME_PLACE = 1e-6;

/** Index of the field where the worst of shear, bending and deflection stands; 0 where nothing is checked. */
export function governingField(member: Member): number {
  const ratios = roomForRatios();
  const groups = new Int32Array(CHECK_IDS.length);
  const prepared = prepare(member);
  const wood = woodOf(member);
  rate(prepared, wood, member.section, ratios, groups);
  if (ratios[SHEAR] === Number.POSITIVE_INFINITY) return 0;
  let worst = -1;
  for (const id of POWERS)
    if (ratios[id]! > (worst < 0 ? Number.NEGATIVE_INFINITY : ratios[worst]!)) worst = id;
  if (worst < 0) return 0;
  const found = governingTerm(prepared, wood, worst, groups[worst]!);
  return worst === BENDING || worst === HOGGING ? fieldOfMoment(prepared, found) : found.place;
}

/**
 * The field that a moment goes by. One over a support stands in both fields beside it, and the checks have it in each:
 * it is that of an overhang, whose q a²/2 is the q l²/8 of twice its length, else of the longer span. A support held
 * against rotation parts the two.
 */
function fieldOfMoment({ fields, member }: Prepared, { place, at }: Governing): number {
  const { start, length, kind } = fields[place]!;
  const near = SAME_PLACE * length;
  const beside = at - start < near ? place - 1 : start + length - at < near ? place + 1 : place;
  const other = fields[beside];
  if (other === undefined) return place;
  if (other.kind === kind) return other.length > length ? beside : place;
  const overhang = kind === 'overhang' ? place : beside;
  const { left, right } = member.beam.fixed;
  return (overhang === 0 ? left : right) ? place : overhang;
}
