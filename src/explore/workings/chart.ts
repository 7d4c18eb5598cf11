import { beamLength } from '../../statics/index.ts';
import { lineLoadOf, sectionWeight } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { figuresOf, plain, ratioText, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { placeFault } from '../beam-edits/placed.ts';
import { capacityOf } from '../capacity.ts';
import { chartRange, spanKnob } from '../curve.ts';
import { judge } from '../judge.ts';
import type { Knob } from '../knobs/knob.ts';
import { knobsOf } from '../knobs/knobs.ts';
import { powersOf } from '../powers.ts';
import { BEST_WORD } from '../rack/best.ts';
import { sizeName } from '../rack/rack.ts';
import { rankedRack } from '../rack/ranked.ts';
import { ratiosOf } from '../ratios.ts';
import { scaleLoads } from '../scale.ts';
import type { Asked } from './about.ts';

/** Marks of a chart's axis. */
const QUARTERS = [0, 0.25, 0.5, 0.75, 1];

/** The figures of the three charts, now and at the marks of their axis. */
export function chartLines(asked: Asked): WorkingLine[] {
  const { member, units, knob: key } = asked;
  const knobs = knobsOf(member);
  const inHand = knobs.find((each) => each.key === key) ?? knobs[0]!;
  const knob = inHand.number === null ? spanKnob(member, knobs) : inHand;
  const marks = marksOf(asked, knob);
  return [
    {
      note:
        `Against ${knob.label.trim()}, all else as it is: at each place the same checks of the changed member, from end ` +
        'to end of the axis; lines are drawn between the places.',
    },
    { symbol: `${knob.label.trim()} now`, result: knob.show(member, units) },
    { heading: 'ratios of the powers' },
    ...marks.map(({ symbol, turned }) => ({ symbol, result: powersText(turned) })),
    ...weightLines(asked, marks),
    ...capacityLines(asked),
  ];
}

interface Mark {
  readonly symbol: string;
  readonly turned: Member;
}

/** Now and the marks of the axis, those at which no load is off the member. */
function marksOf({ member, units }: Asked, knob: Knob): Mark[] {
  const { number } = knob;
  const marks: Mark[] = [{ symbol: 'now', turned: member }];
  if (number === null) return marks;
  const { from, to } = chartRange(number.get(member), number.axisUnit(units));
  for (const share of QUARTERS) {
    const turned = number.put(member, from + (to - from) * share);
    if (placeFault(turned) === null) marks.push({ symbol: `at ${knob.show(turned, units)}`, turned });
  }
  return marks;
}

function powersText(member: Member): string {
  const texts = powersOf(ratiosOf(member)).flatMap(({ name, ratio }) =>
    ratio === null ? [] : [`${name} ${ratioText(ratio)}`],
  );
  return texts.length === 0 ? 'no power is checked' : texts.join(', ');
}

function weightLines({ member, units, ranking }: Asked, marks: readonly Mark[]): WorkingLine[] {
  const f = figuresOf(units);
  const weight = sectionWeight(member, member.section);
  const length = beamLength(member.beam);
  const word = BEST_WORD[ranking.best];
  return [
    { heading: `weight: of this size, and of the ${word} that passes` },
    ...marks.map(({ symbol, turned }): WorkingLine => {
      const rack = rankedRack(turned, ranking);
      const lit = rack.sizes[rack.lit];
      const own = sectionWeight(turned, turned.section);
      return {
        symbol,
        result: Number.isFinite(own) ? f.weight(own) : 'not known',
        note:
          lit === undefined
            ? 'no size passes'
            : `${word} ${sizeName(rack, lit.size)}, ${f.weight(lit.weight)}`,
      };
    }),
    ...(Number.isFinite(weight)
      ? [
          {
            symbol: 'in all, now',
            formula: 'own weight x length',
            numbers: `${f.line(weight)} x ${f.span(length)}`,
            result: f.force(weight * length),
          },
        ]
      : []),
  ];
}

/** What it carries, all applied loads growing in step. */
function capacityLines({ member, units }: Asked): WorkingLine[] {
  const f = figuresOf(units);
  const heading = { heading: 'capacity: the load it carries now' };
  const bare = { ...member, selfWeight: false };
  const { factor, stops, asked, carries } = capacityOf(member);
  if (!(asked > 0)) return [heading, { note: 'it carries no load downward that could grow' }];
  const lines: WorkingLine[] = [
    heading,
    { symbol: 'asked', result: f.line(lineLoadOf(bare)), note: 'the load at a glance without own weight' },
  ];
  if (!Number.isFinite(factor)) return [...lines, { note: 'no load makes it fail' }];
  if (factor === 0) return [...lines, { note: 'it fails under its own weight' }];
  const { worst } = judge(ratiosOf(scaleLoads(member, factor)));
  lines.push(
    {
      symbol: 'factor',
      result: plain(factor),
      note:
        'all applied loads times this, own weight as it is, bring the first check to its limit' +
        `${stops === null ? '' : `: ${WORKINGS_WORD[stops]}`}; found by running the checks, worst ratio there ${ratioText(worst)}`,
    },
    {
      symbol: 'carries',
      formula: 'factor x asked',
      numbers: `${plain(factor)} x ${f.line(asked)}`,
      result: f.line(carries),
    },
  );
  return lines;
}
