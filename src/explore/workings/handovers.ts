import type { Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { figuresOf, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { handoversOf } from '../handovers/handovers.ts';
import { stretchOf, sweptOf, valueText } from '../handovers/swept.ts';
import { judge } from '../judge.ts';
import { costOf } from '../moves/index.ts';
import { BEST_WORD } from '../rack/best.ts';
import { rackOf, sizeName, takeSize } from '../rack/rack.ts';
import { measureOf } from '../rack/ranked.ts';
import { ratiosOf } from '../ratios.ts';
import type { Asked } from './about.ts';

/** Which size is the best from where to where along the knob in hand, and the ratios of both sizes at each handover. */
export function handoverLines(asked: Asked): WorkingLine[] {
  const { member, units, ranking, knob: key } = asked;
  const swept = sweptOf(member, key);
  if (swept === null) return [{ note: 'no size goes by a knob of this member' }];
  const { knob, sweep } = swept;
  const { from, to, now } = stretchOf(member, swept, units);
  const name = knob.label.trim();
  const show = (value: number) => valueText(swept, value, units);
  const rack = rackOf(member);
  const nameOf = (size: Size | null) => (size === null ? 'none' : sizeName(rack, size));
  const segments = handoversOf(member, sweep.put, from, to, { ranking });
  const lines: WorkingLine[] = [
    {
      note:
        `Along ${name}, all else as it is: the ${BEST_WORD[ranking.best]} size that passes. The whole rack is checked at ` +
        'places from end to end, and where the best size is another between two of them the place is closed in on, to a ' +
        'ten-millionth. One size hands over to the next where its worst ratio comes to 1, or where a better one begins to ' +
        'pass, as where uplift that nothing ties down ends, or can be had for less.',
    },
    { symbol: `${name} now`, result: show(now) },
  ];
  segments.forEach((segment, at) => {
    lines.push({
      heading: `${show(segment.from)} to ${show(segment.to)}: ${nameOf(segment.size)}`,
    });
    const next = segments[at + 1];
    if (next === undefined) return;
    const there = (size: Size | null) =>
      size === null ? [] : [sizeThere(asked, (at) => sweep.put(member, at), segment.to, size, nameOf(size))];
    lines.push(
      { symbol: 'hands over at', result: show(segment.to), note: `to ${nameOf(next.size)}` },
      ...there(segment.size),
      ...there(next.size),
    );
  });
  return lines;
}

/** What a size comes to at a handover, and where it is another just before it. */
function sizeThere(
  { units, ranking }: Asked,
  put: (value: number) => Member,
  at: number,
  size: Size,
  name: string,
): WorkingLine {
  const judged = (value: number) => judge(ratiosOf(takeSize(put(value), size)));
  const [then, before] = [judged(at), judged(at * JUST_BEFORE)];
  const measure = measureOf(ranking.best, costOf(takeSize(put(at), size), ranking));
  const f = figuresOf(units);
  const takes: Readonly<Record<typeof ranking.best, (value: number) => string>> = {
    weight: f.weight,
    depth: (value) => `${f.size(value)} deep`,
    boardFeet: (value) => `${value.toFixed(2)} board feet a foot`,
    price: (value) => `${value.toFixed(2)} a member`,
  };
  const notes = [
    then.governing === null ? '' : WORKINGS_WORD[then.governing],
    worstText(before.worst) === worstText(then.worst) ? '' : `just before ${worstText(before.worst)}`,
    measure === null ? '' : takes[ranking.best](measure),
  ];
  return {
    symbol: `${name} there`,
    result: worstText(then.worst),
    note: notes.filter((text) => text !== '').join(', '),
  };
}

/** A place so near before another that nothing but what steps is another there. */
const JUST_BEFORE = 1 - 1e-6;
const PLACES = 4;

/** On the edge itself a hair to either side tells nothing. */
function worstText(worst: number): string {
  return Number.isFinite(worst) ? worst.toFixed(PLACES) : 'untied';
}
