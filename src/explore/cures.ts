import { writeQuantity } from '../quantity/index.ts';
import { type Size, woodOf } from '../timber/index.ts';
import type { Member, Section } from '../timber/member.ts';
import { type Judgement, judge } from './judge.ts';
import { type Rack, takeSize } from './rack.ts';
import { ratiosOf } from './ratios.ts';
import { reachFinder } from './reach.ts';
import { scaleLengths } from './scale.ts';

/** One change that would help, with what it does. */
export interface Cure extends Judgement {
  readonly kind: CureKind;
  readonly member: Member;
  /** The size it leads to, where it is another size. */
  readonly size: Size | null;
  /** The longest span it leads to, in, where it is another span. */
  readonly span: number | null;
  /** In the order of CHECK_IDS. */
  readonly ratios: Float64Array;
  /** What to put on the command line as --set to get exactly this. */
  readonly set: readonly string[];
}

export type CureKind = 'lightest' | 'deepen' | 'widen' | 'add a ply' | 'shorten';

/**
 * The nearest changes that make a member pass: the lightest stock size, the next deeper and the next wider
 * stock size that do it, another ply, a shorter span. A kind that cannot help is absent.
 */
export function curesOf(member: Member, rack: Rack): Cure[] {
  const { width, depth, plies } = member.section;
  const passing = rack.sizes.filter((each) => each.passes).map((each) => each.size);
  const least = (key: 'width' | 'depth' | 'plies', fits: (size: Size) => boolean) =>
    passing.filter((size) => fits(size)).sort((a, b) => a[key] - b[key])[0];

  const cures = [
    bySize('lightest', member, passing[0]),
    bySize(
      'deepen',
      member,
      least('depth', (to) => to.width === width && to.plies === plies && to.depth > depth),
    ),
    bySize(
      'widen',
      member,
      least('width', (to) => to.depth === depth && to.plies === plies && to.width > width),
    ),
    bySize(
      'add a ply',
      member,
      least('plies', (to) => to.depth === depth && to.width === width && to.plies > plies),
    ),
    byShorterSpan(member),
  ];
  return cures.filter((cure) => cure !== null);
}

function bySize(kind: CureKind, member: Member, size: Size | undefined): Cure | null {
  if (size === undefined) return null;
  const changed = takeSize(member, size);
  return {
    kind,
    member: changed,
    size,
    span: null,
    set: sectionSets(member.section, changed.section),
    ...outcome(changed),
  };
}

function sectionSets(from: Section, to: Section): string[] {
  const set = (['width', 'depth'] as const)
    .filter((key) => to[key] !== from[key])
    .map((key) => `section.${key}=${writeQuantity('length', to[key], 'us')}`);
  return to.plies === from.plies ? set : [...set, `section.plies=${to.plies}`];
}

/** To the quarter inch below the reach, so that what people are told to build passes. */
const SPAN_STEP = 0.25;

function byShorterSpan(member: Member): Cure | null {
  const longest = Math.max(...member.beam.spans);
  const reach = reachFinder(member, woodOf(member))(member.section);
  const span = Math.floor(reach.span / SPAN_STEP) * SPAN_STEP;
  if (span <= 0 || span >= longest) return null;
  const changed = scaleLengths(member, span / longest);
  const set = [`spans.0=${writeQuantity('length', span, 'us')}`];
  return { kind: 'shorten', member: changed, size: null, span, set, ...outcome(changed) };
}

function outcome(member: Member): Judgement & { ratios: Float64Array } {
  const ratios = ratiosOf(member);
  return { ratios, ...judge(ratios) };
}
