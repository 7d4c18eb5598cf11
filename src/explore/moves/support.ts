import { showInches, showQuantity, showSpan, type Units } from '../../quantity/index.ts';
import { beamFields } from '../../statics/beam.ts';
import { reportMember } from '../../timber/index.ts';
import type { Bracing, Member } from '../../timber/member.ts';
import type { Ladder } from './ladder.ts';

const BRACE_STEP = 1;
/** Closer than this an edge is held throughout, in. */
const CLOSEST_BRACE = 12;

type Edge = 'bracing' | 'bracingBottom';

/** Braces closer together along the edges given, down to an edge that is held throughout. */
export function brace(member: Member, edges: readonly Edge[]): Ladder {
  const fields = beamFields(member.beam).map((field) => field.length);
  const longest = Math.max(...fields);
  const now = (edge: Edge) => lengthOf(member[edge], longest);
  const free = edges.filter((edge) => now(edge) > 0);
  const most = Math.max(0, ...free.map(now));
  const first = Math.ceil(most / BRACE_STEP - 1) * BRACE_STEP;
  const lengths = Math.max(0, Math.floor((first - CLOSEST_BRACE) / BRACE_STEP) + 1);
  const put = (length: number | 'continuous'): Member => {
    const changed = Object.fromEntries(
      free
        .filter((edge) => length === 'continuous' || now(edge) > length)
        .map((edge) => [edge, length] as const),
    );
    return { ...member, ...changed, assumed: member.assumed.filter((key) => !(key in changed)) };
  };
  return {
    kind: 'brace',
    group: 'brace',
    count: free.length === 0 ? 0 : lengths + 1,
    at: (step) => put(step < lengths ? first - step * BRACE_STEP : 'continuous'),
    label: (changed, units) => braceText(member, changed, units),
    monotone: true,
  };
}

function lengthOf(bracing: Bracing, longest: number): number {
  return bracing === 'continuous' ? 0 : bracing === 'ends' ? longest : bracing;
}

function braceText(before: Member, { bracing, bracingBottom }: Member, units: Units): string {
  const one = (edge: Bracing) => (typeof edge === 'number' ? `every ${showSpan(edge, units)}` : 'throughout');
  const top = bracing === before.bracing ? '' : `top ${one(bracing)}`;
  const bottom = bracingBottom === before.bracingBottom ? '' : `bottom ${one(bracingBottom)}`;
  return [top, bottom].filter((text) => text !== '').join(', ');
}

const BEARING_STEP = 1 / 8;
const LONGEST_BEARING = 24;

/** Longer bearings: those that are shorter than a length get it. */
export function longerBearing(member: Member): Ladder {
  const { bearing } = member;
  const least = Math.min(...bearing);
  const first = (Math.floor(least / BEARING_STEP) + 1) * BEARING_STEP;
  return {
    kind: 'longer bearing',
    group: 'bearing',
    count: Math.max(0, Math.floor((LONGEST_BEARING - first) / BEARING_STEP) + 1),
    at: (step) => ({
      ...member,
      bearing: bearing.map((each) => Math.max(each, first + step * BEARING_STEP)),
      assumed: member.assumed.filter((key) => key !== 'bearing'),
    }),
    label: (changed, units) => showInches(Math.min(...changed.bearing), units),
    monotone: true,
  };
}

const TIE_STEP = 10;

/** Supports tied down against what lifts them; empty where nothing does. */
export function tieDown(member: Member): Ladder {
  const lifts = () =>
    reportMember(member)
      .analysed()
      .reactions.map(({ min }) => Math.max(0, -min));
  let known: Member | null = null;
  const tied = (): Member => {
    known ??= {
      ...member,
      tiedDown: lifts().map((lift, at) =>
        Math.max(member.tiedDown?.[at] ?? 0, Math.ceil(lift / TIE_STEP) * TIE_STEP),
      ),
    };
    return known;
  };
  return {
    kind: 'tie down',
    group: 'tie',
    count: 1,
    at: tied,
    label: (changed, units) => showQuantity('pointLoad', Math.max(...(changed.tiedDown ?? [0])), units),
    monotone: false,
  };
}
