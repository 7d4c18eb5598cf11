import { showSpanDown, type Units } from '../../quantity/index.ts';
import { sizeLabel, woodOf } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { figuresOf, plain, ratioText, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { judge } from '../judge.ts';
import { ASKS_NOTHING, POWERS } from '../powers.ts';
import { rackOf } from '../rack/rack.ts';
import { ratiosOf } from '../ratios.ts';
import { REACH_TO, reachFinder } from '../reach/reach.ts';
import { scaleLengths } from '../scale.ts';

/** How far the section reaches under the loads of the member, and what stops it. */
export function reachLines(member: Member, units: Units): WorkingLine[] {
  const f = figuresOf(units);
  const { spans } = member.beam;
  const longest = Math.max(...spans);
  const { span, stops } = reachFinder(member, woodOf(member))(member.section);
  const { governing, worst } = judge(ratiosOf(member));
  const lines: WorkingLine[] = [
    {
      note:
        'The longest span whose shorter ones, down to 1 ft, all pass every check, at most 100 ft. All spans, overhangs and ' +
        'load places move by one factor; bearings and typed unbraced lengths keep their size. Found by running the checks ' +
        'at trial lengths and closing in on the last that passes.',
    },
    { symbol: 'l', result: f.span(longest), note: spans.length === 1 ? 'the span' : 'the longest span' },
  ];
  const power = POWERS.find((each) => (each.checks as readonly string[]).includes(governing ?? ''));
  if (power !== undefined && worst > ASKS_NOTHING && Number.isFinite(worst)) {
    const n = power.exponent;
    lines.push({
      symbol: 'by the power law alone',
      formula: `l x ratio^(-1/${n})`,
      numbers: `${f.span(longest)} x ${plain(worst)}^(-1/${n})`,
      result: f.span(longest * worst ** (-1 / n)),
      note: `a first guess from ${WORKINGS_WORD[governing!]} at ${ratioText(worst)}`,
    });
  }
  if (span === 0) return [...lines, { note: 'even 1 ft does not pass' }];
  lines.push({
    symbol: 'reach',
    result: f.span(span),
    note: `shown rounded down: ${showSpanDown(span, units)}`,
  });
  if (stops === null || span >= REACH_TO) return [...lines, { note: 'nothing stops it up to 100 ft' }];
  const there = judge(ratiosOf(scaleLengths(member, span / longest)));
  lines.push({
    symbol: 'worst ratio there',
    result: ratioText(there.worst),
    note: `any longer ${WORKINGS_WORD[stops]} stops it`,
  });
  return lines;
}

/** How the rack is made and its lit size found, around the size at hand. */
export function rackLines(member: Member, units: Units): WorkingLine[] {
  const f = figuresOf(units);
  const { sizes, lightest } = rackOf(member);
  const lines: WorkingLine[] = [
    {
      note:
        'Every stock size of the wood under the same loads, each with its own weight and its own factors, by the same ' +
        'checks; lightest first. The lit size is the first of them that passes. Take a size with x, then w shows its workings.',
    },
    { symbol: 'size at hand', result: sizeLabel(member.section, member.stock.product) },
  ];
  const lit = sizes[lightest];
  lines.push(
    lit === undefined
      ? { note: 'no size passes: none is lit' }
      : {
          symbol: 'lit',
          result: lit.size.label,
          note: `${f.line(lit.weight)}, worst ratio ${ratioText(lit.worst)}${
            lit.governing === null ? '' : `, ${WORKINGS_WORD[lit.governing]}`
          }`,
        },
  );
  const lighter = lit === undefined ? [] : sizes.slice(0, lightest);
  if (lighter.length > 0) lines.push({ heading: 'lighter, and what stops them' });
  for (const each of lighter.reverse()) {
    const stop =
      each.governing === null ? '' : `${WORKINGS_WORD[each.governing]} at ${ratioText(each.worst)}`;
    lines.push({ symbol: each.size.label, result: f.line(each.weight), note: each.refused ?? stop });
  }
  return lines;
}
