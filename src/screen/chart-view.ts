import { chartRange, curveOf } from '../explore/curve.ts';
import type { Knob } from '../explore/knobs/knob.ts';
import type { Ranking } from '../explore/rack/best.ts';
import type { Member } from '../timber/member.ts';
import { capacityLines, type FiguresAsked, weightLines } from './chart-lines.ts';
import { keptCurve, type Stretch } from './kept-curve.ts';
import type { ChartView } from './view.ts';

/** What the chart is of. */
export const CHARTS = ['ratio', 'weight', 'capacity'] as const;
export type ChartOf = (typeof CHARTS)[number];

/** Samples along the chart's axis; the panel draws lines between them. */
const SAMPLES = 48;

export interface ChartAsked extends FiguresAsked {
  readonly of: ChartOf;
  readonly ranking: Ranking;
}

/**
 * A quantity against the knob in hand, or against the span where that is a choice; its axes alone until it is
 * `settled`; null where nothing can be drawn.
 */
export function chartView(
  member: Member,
  inHand: Knob,
  span: Knob,
  asked: ChartAsked,
  settled: boolean,
): ChartView | null {
  const knob = inHand.number === null ? span : inHand;
  const number = knob.number;
  if (number === null) return null;
  const { units, ranking, linear } = asked;
  const value = number.get(member);
  const { from, to } = chartRange(value, number.axisUnit(units));
  if (!(to > from)) return null;
  const label = (share: number) => knob.show(number.put(member, from + (to - from) * share), units);
  const against = `against ${knob.label.trim()}`;
  const choice = inHand.number === null ? `, ${inHand.label.trim()} being a choice` : '';
  const place = { now: (value - from) / (to - from), labels: [0, 0.25, 0.5, 0.75, 1].map(label), linear };
  const stretch: Stretch = { member, key: knob.key, number, from, to, ranking };
  switch (asked.of) {
    case 'ratio':
      return { title: `ratio ${against}${choice}`, ...ratioLines(stretch, settled), ...place };
    case 'weight':
      return { title: `weight ${against}${choice}`, ...weightLines(stretch, asked, settled), ...place };
    case 'capacity':
      return { title: `capacity ${against}${choice}`, ...capacityLines(stretch, asked, settled), ...place };
  }
}

const ratioCurve = keptCurve(({ member, number, from, to }) => curveOf(member, number, from, to, SAMPLES));

function ratioLines(stretch: Stretch, settled: boolean): Pick<ChartView, 'series' | 'crossovers'> {
  if (!settled) return { series: [] };
  const { ratios } = ratioCurve(stretch);
  return {
    series: ratios.map((each, index) => ({ power: (index + 1) as 1 | 2 | 3, ratios: each })),
    crossovers: crossoversOf(ratios),
  };
}

/** Where the largest of the powers comes to be another, between two samples along the line of each. */
export function crossoversOf(ratios: readonly (readonly number[])[]): (readonly [number, number])[] {
  const count = ratios[0]?.length ?? 0;
  const largest = (at: number) =>
    ratios.reduce((best, each, power) => (each[at]! > (ratios[best]?.[at] ?? 0) ? power : best), -1);
  const found: (readonly [number, number])[] = [];
  for (let at = 1; at < count; at += 1) {
    const [one, other] = [largest(at - 1), largest(at)];
    if (one < 0 || other < 0 || one === other) continue;
    const apart = (index: number) => Math.log(ratios[one]![index]! / ratios[other]![index]!);
    const [before, after] = [apart(at - 1), apart(at)];
    if (!Number.isFinite(before) || !Number.isFinite(after)) continue;
    const share = before / (before - after);
    const figure = ratios[one]![at - 1]! ** (1 - share) * ratios[one]![at]! ** share;
    found.push([(at - 1 + share) / (count - 1), figure]);
  }
  return found;
}
