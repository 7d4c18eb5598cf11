import { moneyText } from '../explore/buying/money.ts';
import { ratiosById } from '../explore/judge.ts';
import { powersOf } from '../explore/powers.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { gradeWord, type Rack, type RackSize, sizeName } from '../explore/rack/rack.ts';
import { type RankedRack, type RankedSize, rankedRack } from '../explore/rack/ranked.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import {
  harmless,
  showInches,
  showRatio,
  showSpan,
  type Units,
  weightNumber,
  weightUnit,
} from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { standingDepth, standingWidth } from '../timber/index.ts';
import type { Member, Stock } from '../timber/member.ts';
import { lengthsText, woodName } from '../timber/member-words.ts';
import type { CheckId } from '../timber/report.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { printAnswer } from './answer.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { beside, given, LINE, wrapped } from './prose.ts';
import { STATUS } from './status.ts';
import { type Column, table } from './table.ts';

/** `thrice rack FILE --member NAME`: the stock sizes, best first. Status 0 when some size passes. */
export function rack(file: string, options: SessionOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member } = theMember(loaded, file);
  const sizes = rankedRack(member, rankingOf(loaded.session), loaded.only);
  printAnswer(loaded, member, options.json, print, {
    document: () => rackJson(member, sizes, loaded.only),
    lines: () => rackText(member, sizes, loaded.units),
  });
  return sizes.lightest >= 0 ? STATUS.yes : STATUS.no;
}

function rackJson(
  member: Member,
  { sizes, lightest, lit, best }: RankedRack,
  only: readonly CheckId[] | null,
) {
  return {
    member: member.name,
    lightest: sizes[lightest]?.size.label ?? null,
    best,
    lit: sizes[lit]?.size.label ?? null,
    lightestWood: lightest < 0 ? null : woodJson(sizes[lightest]!.size.stock),
    ...given(member).json,
    sizes: sizes.map((each) => ({ ...sizeJson(member, each, only), ...choiceJson(each) })),
  };
}

/** A wood as the session file names it. */
export function woodJson({ product, species, grade }: Stock) {
  return { product, species, grade };
}

/** What it takes to choose between sizes; of yard, prices and headroom only where the session has them. */
function choiceJson({ nonDominated, inYard, price, clear, over }: RankedSize) {
  return {
    nonDominated,
    ...(inYard === null ? {} : { inYard }),
    ...(price === null ? {} : { price }),
    ...(clear === null ? {} : { clear }),
    ...(over === 0 ? {} : { over }),
  };
}

/** One size as rack and reach print it. */
export function sizeJson(member: Member, each: RackSize, only: readonly CheckId[] | null) {
  const { size } = each;
  const byId = each.refused === null ? ratiosById(each.ratios, only) : {};
  const ratios = Object.fromEntries(
    Object.entries(byId).map(([id, ratio]) => [id, Number.isFinite(ratio) ? ratio : null]),
  );
  return {
    label: size.label,
    width: standingWidth({ ...size, flat: member.section.flat }),
    depth: standingDepth({ ...size, flat: member.section.flat }),
    plies: size.plies,
    ...woodJson(size.stock),
    weight: each.weight,
    boardFeet: size.boardFeet,
    passes: each.passes,
    governing: each.governing,
    ratios,
    ...(each.refused === null ? {} : { refused: each.refused }),
  };
}

/** Heads of the columns that rack and reach share; the wood's where several stand together. */
export function sizeColumns(rack: Rack, units: Units): Column[] {
  return [
    { head: '  size', align: 'left' },
    ...(rack.woods.length > 1 ? [{ head: 'wood', align: 'left' } as const] : []),
    { head: weightUnit(units), align: 'right' },
  ];
}

/** Cells of the columns that rack and reach share. */
export function sizeCells(rack: Rack, each: RackSize, lit: boolean, units: Units): string[] {
  return [
    `${lit ? '*' : ' '} ${each.size.label}`,
    ...(rack.woods.length > 1 ? [harmless(gradeWord(each.size.stock))] : []),
    weightNumber(each.weight, units),
  ];
}

const RATIO_COLUMNS: readonly Column[] = [
  { head: 'shear', align: 'right' },
  { head: 'bending', align: 'right' },
  { head: 'defl.', align: 'right' },
];

function ratioCells(each: RackSize): string[] {
  const powers = each.refused === null ? powersOf(each.ratios) : null;
  const ratio = (at: 0 | 1 | 2) => (powers?.[at].ratio == null ? '' : showRatio(powers[at].ratio));
  return [ratio(0), ratio(1), ratio(2)];
}

function stopsText({ refused, passes, governing }: RackSize): string {
  if (refused !== null) return refusedWord(refused);
  if (passes) return '';
  return governing === null ? 'no load' : CHECK_WORD[governing];
}

function rackText(member: Member, rack: RankedRack, units: Units): string[] {
  const { sizes, lit, best } = rack;
  const priced = sizes.some((each) => each.price !== null);
  const storey = member.headroom != null;
  const tableOf = (short: boolean) =>
    table(
      [
        ...sizeColumns(rack, units),
        ...(short ? [{ head: 'ratio', align: 'right' } as const] : RATIO_COLUMNS),
        ...(priced ? [{ head: 'price', align: 'right' } as const] : []),
        ...(storey ? [{ head: 'clear', align: 'right' } as const] : []),
        { head: 'stopped by', align: 'left' },
      ],
      sizes.map((each, at) => {
        const [first, ...rest] = sizeCells(rack, each, at === lit, units);
        return [
          at === lit ? first! : `${choiceMark(each)}${first!.slice(1)}`,
          ...rest,
          ...(short ? [each.refused === null ? showRatio(each.worst) : ''] : ratioCells(each)),
          ...(priced ? [each.price === null ? 'none' : moneyText(each.price)] : []),
          ...(storey ? [each.clear === null ? '' : showSpan(each.clear, units)] : []),
          at === lit ? BEST_WORD[best] : choiceText(each, units),
        ];
      }),
    );
  const full = tableOf(false);
  // Prices, heights and several woods together leave no room for each power.
  const rows = full.every((line) => line.length <= LINE) ? full : tableOf(true);
  const word = BEST_WORD[best];
  return [
    ...beside([harmless(member.name), ...rack.woods.map(woodName), lengthsText(member, units)]),
    ...rows,
    lit < 0 ? 'no size passes' : `${word} that passes: ${sizeName(rack, sizes[lit]!.size)}`,
    ...(sizes.some((each, at) => each.nonDominated && at !== lit)
      ? wrapped('+ passes, and none that passes is as light and as shallow')
      : []),
    ...(sizes.some((each) => each.inYard === false) ? ['- the yard lacks it, or has none so long'] : []),
  ];
}

function choiceMark({ inYard, nonDominated }: RankedSize): string {
  if (inYard === false) return '-';
  return nonDominated ? '+' : ' ';
}

/** What stops a size, or keeps it from being a choice. */
function choiceText(each: RankedSize, units: Units): string {
  if (each.over > 0) return `over by ${showInches(each.over, units)}`;
  return stopsText(each);
}
