import type { Units } from '../../quantity/index.ts';
import type { Member } from '../member.ts';
import { CHECK_IDS, type CheckId } from '../report.ts';
import { sizeLabel } from '../size-label.ts';
import { basisApplies, basisLines } from './basis.ts';
import { checkLines } from './checks.ts';
import { ratioText } from './figures.ts';
import { checkOf, workOf } from './work.ts';
import { BASIS_IDS, type BasisId, WORKINGS_WORD, type Workings, type WorkingsId } from './workings.ts';

export { type DiagramPlace, diagramLines } from './diagrams.ts';
export { type Figures, figuresOf, plain, ratioText, sumText } from './figures.ts';
export { weightLines } from './line-loads.ts';
export { fieldName } from './places.ts';
export { ratioLine } from './result.ts';
export {
  BASIS_IDS,
  type BasisId,
  WORKINGS_WORD,
  type WorkingLine,
  type Workings,
  type WorkingsId,
} from './workings.ts';

/**
 * The calculation behind a check of a member, or behind what its checks stand on, in US or SI numbers. The numbers
 * are those of `reportMember`, never worked out another way; the last line of a check is its ratio.
 */
export function workingsOf(member: Member, id: WorkingsId, units: Units): Workings {
  const { stock, section } = member;
  const wood = `${stock.species} ${stock.grade}`.trim() || stock.product;
  const about = `${sizeLabel(section, stock.product)}, ${wood}`;
  const title = `${WORKINGS_WORD[id]}: ${about}`;
  const work = workOf(member, units);
  if ('refused' in work) {
    return {
      title,
      lines: [{ note: `nothing is worked out: a rule forbids this section: ${work.refused}` }],
    };
  }
  if (isBasis(id)) return { title, lines: basisLines(work, id) };
  const check = checkOf(work, id);
  if (check === null) return { title, lines: [{ note: 'does not apply to this member' }] };
  return {
    title: `${WORKINGS_WORD[id]} ${ratioText(check.ratio)}: ${about}`,
    lines: checkLines(work, check),
  };
}

/** The calculations that a member has: its checks, worst first, then what they stand on. */
export function workingsIds(member: Member, units: Units): WorkingsId[] {
  const work = workOf(member, units);
  if ('refused' in work) return ['design values'];
  const checks = [...work.checks].sort((a, b) => b.ratio - a.ratio || order(a.id) - order(b.id));
  return [...checks.map(({ id }) => id), ...BASIS_IDS.filter((id) => basisApplies(work, id))];
}

function order(id: CheckId): number {
  return CHECK_IDS.indexOf(id);
}

function isBasis(id: WorkingsId): id is BasisId {
  return (BASIS_IDS as readonly string[]).includes(id);
}
