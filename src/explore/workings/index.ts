import type { Units } from '../../quantity/index.ts';
import { refusal } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import {
  WORKINGS_WORD,
  type WorkingLine,
  type Workings,
  type WorkingsId,
  workingsIds,
  workingsOf,
} from '../../timber/workings/index.ts';
import { exponentLines } from './exponents.ts';
import { crossoverLines, spanToDepthLines } from './proportions.ts';
import { rackLines, reachLines } from './sizes.ts';

/** What explore makes of the checks. */
export const PROPORTION_IDS = ['l/h', 'crossovers', 'exponents', 'reach', 'rack'] as const;
export type ProportionId = (typeof PROPORTION_IDS)[number];

/** Everything whose workings can be asked for. */
export type PageId = WorkingsId | ProportionId;

const WORD: Readonly<Record<ProportionId, string>> = {
  'l/h': 'span to depth, l/h',
  crossovers: 'crossovers and what it stands to',
  exponents: 'local exponents',
  reach: 'reach',
  rack: 'rack and lit size',
};

/** The pages that a member has: its checks, worst first, what they stand on, what explore makes of them. */
export function pageIds(member: Member, units: Units): PageId[] {
  const own = workingsIds(member, units);
  return refusal(member) === null ? [...own, ...PROPORTION_IDS] : own;
}

/** The name of a page. */
export function pageWord(id: PageId): string {
  return isProportion(id) ? WORD[id] : WORKINGS_WORD[id];
}

const KNOWN = new WeakMap<Member, Map<string, Workings>>();

/** The workings of a page; the same object for the same member, page and units. */
export function pageOf(member: Member, id: PageId, units: Units): Workings {
  const known = KNOWN.get(member) ?? new Map<string, Workings>();
  KNOWN.set(member, known);
  const key = `${id} ${units}`;
  const page = known.get(key) ?? makePage(member, id, units);
  known.set(key, page);
  return page;
}

function makePage(member: Member, id: PageId, units: Units): Workings {
  if (!isProportion(id)) return workingsOf(member, id, units);
  return { title: WORD[id], lines: LINES[id](member, units) };
}

const LINES: Readonly<Record<ProportionId, (member: Member, units: Units) => WorkingLine[]>> = {
  'l/h': spanToDepthLines,
  crossovers: crossoverLines,
  exponents: exponentLines,
  reach: reachLines,
  rack: rackLines,
};

function isProportion(id: PageId): id is ProportionId {
  return (PROPORTION_IDS as readonly string[]).includes(id);
}
