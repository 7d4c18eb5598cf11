import { BEST_WORD } from '../explore/rack/best.ts';
import { type RackSize, sizeName } from '../explore/rack/rack.ts';
import { type RankedRack, rankedRack } from '../explore/rack/ranked.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import type { Reach } from '../explore/reach/reach.ts';
import { reachesOf } from '../explore/reach/reaches.ts';
import { harmless, showSpanDown, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { woodName } from '../timber/member-words.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { printAnswer } from './answer.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { beside, given } from './prose.ts';
import { sizeCells, sizeColumns, sizeJson, woodJson } from './rack.ts';
import { STATUS } from './status.ts';
import { table } from './table.ts';

/**
 * `thrice reach FILE --member NAME`: the longest span of each stock size, best first. Status 0 when some size passes as
 * it is. A session that does not say what counts as best is told the lightest, whatever its yard has.
 */
export function reach(file: string, options: SessionOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member } = theMember(loaded, file);
  const rack = rankedRack(member, rankingOf(loaded.session), loaded.only);
  const stated = loaded.session.best !== undefined;
  const marked = stated ? rack.lit : rack.lightest;
  const reaches = reachesOf(member, rack, loaded.only);
  printAnswer(loaded, member, options.json, print, {
    document: () => {
      const sizes = rack.sizes.map((each, at) => ({
        ...sizeJson(member, each, loaded.only),
        span: reaches[at]?.span ?? null,
        stops: reaches[at]?.stops ?? null,
      }));
      const lit = rack.sizes[rack.lightest]?.size;
      return {
        member: member.name,
        lightest: lit?.label ?? null,
        ...(stated ? { best: rack.best, lit: rack.sizes[rack.lit]?.size.label ?? null } : {}),
        lightestWood: lit === undefined ? null : woodJson(lit.stock),
        ...given(member).json,
        sizes,
      };
    },
    lines: () => [
      ...reachText(member, rack, reaches, marked, loaded.units),
      ...(stated ? [bestText(rack)] : []),
    ],
  });
  return rack.lightest >= 0 ? STATUS.yes : STATUS.no;
}

/** What counts as best decides the order: named with the size that it comes to. */
function bestText(rack: RankedRack): string {
  const size = rack.sizes[rack.lit]?.size;
  if (size !== undefined) return `${BEST_WORD[rack.best]} that passes: ${sizeName(rack, size)}`;
  return rack.lightest < 0 ? 'no size passes' : 'the yard has no size that passes';
}

function reachText(
  member: Member,
  rack: RankedRack,
  reaches: readonly (Reach | null)[],
  marked: number,
  units: Units,
): string[] {
  return [
    ...beside([harmless(member.name), ...rack.woods.map(woodName)]),
    ...table(
      [
        ...sizeColumns(rack, units),
        { head: 'reach', align: 'right' },
        { head: 'stopped there by', align: 'left' },
      ],
      rack.sizes.map((each, at) => [
        ...sizeCells(rack, each, at === marked, units),
        spanText(reaches[at] ?? null, units),
        stopsText(each, reaches[at] ?? null),
      ]),
    ),
  ];
}

function stopsText({ refused }: RackSize, reach: Reach | null): string {
  if (refused !== null) return refusedWord(refused);
  return reach === null || reach.stops === null ? '' : CHECK_WORD[reach.stops];
}

function spanText(reach: Reach | null, units: Units): string {
  if (reach === null) return '';
  return reach.span === 0 ? 'none' : showSpanDown(reach.span, units);
}
