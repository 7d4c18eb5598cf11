import { showSpanDown } from '../../quantity/index.ts';
import { woodOf } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { figuresOf, plain, ratioText, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { judge } from '../judge.ts';
import { ASKS_NOTHING, POWERS } from '../powers.ts';
import { sizeName, takeSize } from '../rack/rack.ts';
import { rankedRack } from '../rack/ranked.ts';
import { ratiosOf } from '../ratios.ts';
import { REACH_FROM, REACH_TO, type Reach, reachFinder } from '../reach/reach.ts';
import { lazyReaches } from '../reach/reaches.ts';
import { scaleLengths } from '../scale.ts';
import type { Asked } from './about.ts';

/** How far the section at hand and every size of the rack reach under the loads of the member, and what stops them. */
export function reachLines({ member, units, ranking }: Asked): WorkingLine[] {
  const f = figuresOf(units);
  const { spans } = member.beam;
  const longest = Math.max(...spans);
  const own = reachFinder(member, woodOf(member))(member.section);
  const rack = rankedRack(member, ranking);
  const reaches = lazyReaches(member, rack);
  const of = (symbol: string, sized: Member, reach: Reach): WorkingLine => ({
    symbol,
    result: reach.span === 0 ? 'none' : f.span(reach.span),
    note: stopText(sized, reach, f.span(REACH_FROM), f.span(REACH_TO)),
  });
  return [
    {
      note:
        `The longest span whose shorter ones, down to ${f.span(REACH_FROM)}, all pass every check, at most ` +
        `${f.span(REACH_TO)}. All spans, overhangs and load places move by one factor; bearings and typed unbraced ` +
        'lengths keep their size. Found by running the checks at trial lengths and closing in on the last that passes.',
    },
    { symbol: 'l', result: f.span(longest), note: spans.length === 1 ? 'the span' : 'the longest span' },
    ...lawLines(member, longest, f.span),
    of('reach', member, own),
    ...(own.span === 0
      ? []
      : [{ note: `shown rounded down, ${showSpanDown(own.span, units)}; in columns to the inch below` }]),
    { heading: 'every size of the rack' },
    ...rack.sizes.map(({ size }, at) => {
      const reach = reaches.at(at);
      const symbol = sizeName(rack, size);
      return reach === null
        ? { symbol, result: 'none', note: 'not a choice' }
        : of(symbol, takeSize(member, size), reach);
    }),
  ];
}

/** Where the power law of the check that governs leads. */
function lawLines(member: Member, longest: number, show: (span: number) => string): WorkingLine[] {
  const { governing, worst } = judge(ratiosOf(member));
  const power = POWERS.find((each) => (each.checks as readonly string[]).includes(governing ?? ''));
  if (power === undefined || !(worst > ASKS_NOTHING) || !Number.isFinite(worst)) return [];
  const n = power.exponent;
  return [
    {
      symbol: 'by the power law alone',
      formula: `l x ratio^(-1/${n})`,
      numbers: `${show(longest)} x ${plain(worst)}^(-1/${n})`,
      result: show(longest * worst ** (-1 / n)),
      note: `a first guess from ${WORKINGS_WORD[governing!]} at ${ratioText(worst)}`,
    },
  ];
}

/** What stops a member at its reach, with the worst ratio there. */
function stopText(member: Member, { span, stops }: Reach, least: string, most: string): string {
  const by = stops === null ? '' : WORKINGS_WORD[stops];
  if (span === 0) return `even at ${least} ${by} stops it`;
  if (stops === null || span >= REACH_TO) return `nothing stops it up to ${most}`;
  const { worst } = judge(ratiosOf(scaleLengths(member, span / Math.max(...member.beam.spans))));
  return `worst ratio there ${ratioText(worst)}; any longer ${by} stops it`;
}
