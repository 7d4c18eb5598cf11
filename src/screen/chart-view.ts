import { type Curve, chartRange, curveOf } from '../explore/curve.ts';
import type { Knob, NumberKnob } from '../explore/knobs/knob.ts';
import type { Units } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';
import type { ChartView } from './view.ts';

/** Samples along the chart's axis; the panel draws lines between them. */
const SAMPLES = 48;

/**
 * The three powers against the knob in hand, or against the span where that is a choice; its axes alone until it is
 * `settled`; null where nothing can be drawn.
 */
export function chartView(
  member: Member,
  inHand: Knob,
  span: Knob,
  units: Units,
  settled: boolean,
): ChartView | null {
  const knob = inHand.number === null ? span : inHand;
  const number = knob.number;
  if (number === null) return null;
  const value = number.get(member);
  const { from, to } = chartRange(value, number.axisUnit(units));
  if (!(to > from)) return null;
  const curve = settled ? curveAlong(member, knob.key, number, from, to) : null;
  const label = (share: number) => knob.show(number.put(member, from + (to - from) * share), units);
  return {
    title: `ratio against ${knob.label.trim()}`,
    series: (curve?.ratios ?? []).map((ratios, index) => ({ power: (index + 1) as 1 | 2 | 3, ratios })),
    now: (value - from) / (to - from),
    labels: [0, 0.25, 0.5, 0.75, 1].map(label),
  };
}

interface Kept {
  readonly key: string;
  /** The member with the knob at the beginning of the axis: alike for all values of the knob. */
  readonly origin: Member;
  readonly to: number;
  readonly curve: Curve;
}

/** The last curve: while its knob is nudged it stays the same, and only the beads move. */
let last: Kept | null = null;

function curveAlong(member: Member, key: string, number: NumberKnob, from: number, to: number): Curve {
  const origin = number.put(member, from);
  if (last === null || last.key !== key || last.to !== to || !alike(last.origin, origin)) {
    last = { key, origin, to, curve: curveOf(member, number, from, to, SAMPLES) };
  }
  return last.curve;
}

/** True for members that say the same; parts that are the same object are not looked into. */
function alike(one: Member, other: Member): boolean {
  const keys = new Set([...Object.keys(one), ...Object.keys(other)]) as Set<keyof Member>;
  for (const key of keys) {
    if (one[key] !== other[key] && JSON.stringify(one[key]) !== JSON.stringify(other[key])) return false;
  }
  return true;
}
