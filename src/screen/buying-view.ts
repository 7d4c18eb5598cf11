import { buyPiece, type Purchase } from '../explore/buying/buying.ts';
import { moneyText, rateText } from '../explore/buying/money.ts';
import { type Order, type OrderLine, orderLine, orderOf } from '../explore/buying/order.ts';
import { orderText, unpricedText } from '../explore/buying/order-text.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { gradeWord, hasSize, takeSize } from '../explore/rack/rack.ts';
import type { RankedSize } from '../explore/rack/ranked.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import { massUnit, showRatio, showSpan, type Units } from '../quantity/index.ts';
import { Lately } from '../quantity/lately.ts';
import { rankingOf } from '../session/index.ts';
import type { Session } from '../session/session.ts';
import { PRICE_EXAMPLES, YARD_PARTS } from '../session/yard-text.ts';
import { type Size, sameStock, shortWood, sizeLabel } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { type Answer, answerOf } from './answer.ts';
import { BUYING_BINDINGS } from './buying-keys.ts';
import type { BuyingMode, BuyingQuestion } from './mode.ts';
import type { TableColumn, TableRow } from './panels/table.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import { ALL_KEYS, type FootView } from './view.ts';

/** A size that could be bought for the member in hand. */
export interface BuyingChoice {
  /** null: the member's own, which is not on the rack. */
  readonly size: Size | null;
  /** The member with it. */
  readonly member: Member;
  readonly line: OrderLine;
  /** null for the member's own. */
  readonly ranked: RankedSize | null;
}

/** What the buying view shows, in words. */
export interface BuyingView {
  /** The order and what the figures go by, then the job as it stands. */
  readonly status: readonly string[];
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
  /** Indices of the lit size, of the one that the member has and of the one in hand; -1 where there is none. */
  readonly lit: number;
  readonly current: number;
  readonly inHand: number;
  /** The sizes that pass and that none is both as light and as shallow as. */
  readonly nonDominated: readonly boolean[];
  /** The size in hand in full. */
  readonly note: string;
  /** What is being typed; null while nothing is. */
  readonly question: { readonly asks: string; readonly told: string; readonly isFault: boolean } | null;
  readonly foot: readonly FootView[];
}

const KNOWN = new WeakMap<Answer, readonly BuyingChoice[]>();

/** The sizes of the rack in its order, before them the member's own where it is not on it. */
export function choicesOf(state: State): readonly BuyingChoice[] {
  const member = memberOf(state);
  const ranking = rankingOf(state.session);
  const answer = answerOf(member, ranking);
  const known = KNOWN.get(answer);
  if (known !== undefined) return known;
  const { sizes } = answer.rack;
  const onRack = sizes.some(({ size }) => hasSize(member, size));
  const own: BuyingChoice = { size: null, member, line: orderLine(member, ranking.shop), ranked: null };
  const choices = sizes.map((ranked): BuyingChoice => {
    const taken = takeSize(member, ranked.size);
    return { size: ranked.size, member: taken, line: orderLine(taken, ranking.shop), ranked };
  });
  const all = onRack ? choices : [own, ...choices];
  KNOWN.set(answer, all);
  return all;
}

/** The choice in hand: kept by its size and wood while the order changes, else the member's own. */
export function choiceInHand(state: State, { size }: BuyingMode): number {
  const choices = choicesOf(state);
  const kept =
    size === null
      ? -1
      : choices.findIndex(
          (each) =>
            each.size !== null && each.size.label === size.label && sameStock(each.size.stock, size.stock),
        );
  return kept >= 0 ? kept : currentOf(state, choices);
}

function currentOf(state: State, choices: readonly BuyingChoice[]): number {
  const member = memberOf(state);
  return choices.findIndex(({ size }) => size === null || hasSize(member, size));
}

/** What buying one piece of a choice comes to. */
export function purchaseOf(state: State, { member, line }: BuyingChoice): Purchase {
  const { shop } = rankingOf(state.session);
  return buyPiece(shop, { ...member.section, stock: member.stock }, line.needed);
}

/** One piece of a choice by name: "2x12 DF-L No.2". */
export function pieceName({ line }: BuyingChoice): string {
  return `${line.size} ${gradeWord(line.stock)}`;
}

export function buyingView(state: State, mode: BuyingMode): BuyingView {
  const units = unitsOf(state);
  const choices = choicesOf(state);
  const { rack } = answerOf(memberOf(state), rankingOf(state.session));
  const lit = rack.lit < 0 ? -1 : rack.lit + (choices.length - rack.sizes.length);
  const current = currentOf(state, choices);
  const inHand = choiceInHand(state, mode);
  const mixed = rack.woods.length > 1;
  return {
    status: [`${BEST_WORD[rack.best]} first; ${sourcesText(state.session)}`, jobStatus(state.session)],
    columns: columnsOf(mixed, units),
    rows: choices.map((choice, at) => rowOf(choice, mixed, units, at === current, at === lit)),
    lit,
    current,
    inHand,
    nonDominated: choices.map(({ ranked }) => ranked?.nonDominated ?? false),
    note: choices[inHand] === undefined ? '' : noteOf(choices[inHand], units),
    question: mode.asks === null ? null : questionOf(mode.asks, choices[inHand]!, units),
    foot: footOf(mode),
  };
}

function columnsOf(mixed: boolean, units: Units): TableColumn[] {
  return [
    { head: 'size', align: 'left' },
    ...(mixed ? [{ head: 'wood', align: 'left' } as const] : []),
    { head: 'pcs', align: 'right', spare: 1 },
    { head: 'order', align: 'right' },
    { head: 'waste', align: 'right', spare: 2 },
    { head: `${massUnit(units)} each`, align: 'right', spare: 3 },
    { head: 'bd ft', align: 'right', spare: 4 },
    { head: 'each', align: 'right' },
    { head: 'total', align: 'right' },
    { head: 'price', align: 'left', spare: 5 },
    { head: 'worst', align: 'right', spare: 6 },
    { head: 'stopped by', align: 'left', spare: 7 },
  ];
}

function rowOf(
  { size, line, ranked, member }: BuyingChoice,
  mixed: boolean,
  units: Units,
  isCurrent: boolean,
  isLit: boolean,
): TableRow {
  const text = orderText(line, units);
  const passes = ranked === null || (ranked.passes && line.length !== null);
  return {
    cells: [
      size?.label ?? sizeLabel(member.section, member.stock.product),
      ...(mixed ? [gradeWord(line.stock)] : []),
      text.pieces,
      ...[text.length, text.waste, text.weight, text.boardFeet, text.price, text.total].map(
        (each) => each ?? '—',
      ),
      fromText(line),
      ranked === null || ranked.refused !== null ? '' : showRatio(ranked.worst),
      ranked === null ? '' : stopsText(ranked),
    ],
    style: isCurrent ? 'nowStrong' : isLit ? 'strong' : passes ? 'plain' : 'quiet',
  };
}

const FROM = { yard: 'yard list', prices: 'typed' } as const;
const UNPRICED = {
  'no price': 'none',
  'not in the yard': 'not in yard',
  'none long enough': 'none so long',
} as const;

/** Where a price is from, or why there is none. */
function fromText({ priceFrom, unpriced }: OrderLine): string {
  if (priceFrom !== null) return FROM[priceFrom];
  return unpriced === null ? '' : UNPRICED[unpriced];
}

function stopsText({ refused, passes, governing }: RankedSize): string {
  if (refused !== null) return refusedWord(refused);
  return passes || governing === null ? '' : CHECK_WORD[governing];
}

function noteOf(choice: BuyingChoice, units: Units): string {
  const { line, ranked } = choice;
  const text = orderText(line, units);
  const pieces = `${text.pieces} ${line.pieces === 1 ? 'piece' : 'pieces'}`;
  const needed = showSpan(line.needed, units);
  const lengths =
    text.length === null
      ? `${pieces} of ${needed}`
      : line.waste < HAIR
        ? `${pieces} of ${needed}, nothing cut off`
        : `${pieces} of ${text.length} for ${needed}, ${text.waste} cut off`;
  const price =
    line.rate === null
      ? unpricedText(line, units)
      : `${rateText(line.rate)}, ${line.priceFrom === 'yard' ? 'by the yard list' : 'as typed'}: ${text.price} each, ${text.total} in all`;
  const stops = ranked === null || ranked.passes ? '' : stopsText(ranked);
  const verdict = ranked === null ? [] : [stops === '' ? 'passes' : `does not pass (${stops})`];
  return [`${pieceName(choice)}: ${lengths}`, price, ...verdict].join('; ');
}

/** Waste below this, in, is rounding. */
const HAIR = 1e-6;

function sourcesText({ yard, prices }: Session): string {
  const typed = prices === undefined || prices.length === 0 ? [] : [`typed prices: ${prices.length}`];
  const rows = yard?.rows;
  const list =
    rows == null
      ? 'no yard list: usual even feet (common practice, no source)'
      : `yard list ${yard!.file ?? 'of this session'}, ${rows.length} ${rows.length === 1 ? 'line' : 'lines'}`;
  return [...typed, list].join('; ');
}

const MOST_ORDERS = 4;
const ORDERS = new Lately<Session, Order>(MOST_ORDERS);

function jobOf(session: Session): Order {
  const known = ORDERS.get(session);
  if (known !== undefined) return known;
  const order = orderOf(
    session.members.map(({ member }) => member),
    rankingOf(session).shop,
  );
  ORDERS.set(session, order);
  return order;
}

/** The whole job as it stands; what has no price is named, never counted as nothing. */
function jobStatus(session: Session): string {
  const { lines, pieces, waste, price, complete } = jobOf(session);
  const head = `the job as it stands: ${pieces} pieces, ${(100 * waste).toFixed(0)} % waste`;
  if (complete) return `${head}, ${moneyText(price!)}`;
  const without = lines.filter((line) => line.unpriced !== null).map((line) => line.member);
  if (price === null) return `${head}; no member has a price`;
  return `${head}, ${moneyText(price)}; no price: ${without.join(', ')}`;
}

function questionOf(
  { of, fault }: BuyingQuestion,
  choice: BuyingChoice,
  units: Units,
): NonNullable<BuyingView['question']> {
  return {
    ...QUESTIONS[of](choice, units),
    ...(fault === null ? {} : { told: fault }),
    isFault: fault !== null,
  };
}

type Asked = Readonly<{ asks: string; told: string }>;

const QUESTIONS: Readonly<Record<BuyingQuestion['of'], (choice: BuyingChoice, units: Units) => Asked>> = {
  price: (choice) => ({
    asks: `price of ${pieceName(choice)}`,
    told: `what it is for too: ${PRICE_EXAMPLES} (board foot)`,
  }),
  'wood price': ({ line }) => ({
    asks: `price of ${shortWood(line.stock)}`,
    told: `for all its sizes that have no price of their own: ${PRICE_EXAMPLES} (board foot)`,
  }),
  line: ({ line }, units) => ({
    asks: 'yard line',
    told: `${YARD_PARTS}; empty ones stand for any, lengths are ${units === 'us' ? 'feet' : 'metres'} ("8 10 12", ${units === 'us' ? '"8-20", ' : ''}none: cut to any), a price is ${PRICE_EXAMPLES}. Nothing at all: ${line.size} goes from the list`,
  }),
  file: () => ({
    asks: 'yard list',
    told: 'a CSV file, named from the folder of the session: columns size, species, grade, lengths, and each, per foot or per board foot',
  }),
};

/** Most worth first: what does not fit is dropped from the end. */
function footOf({ asks }: BuyingMode): FootView[] {
  if (asks !== null) return [];
  const bound = BUYING_BINDINGS.filter(({ foot }) => foot !== '').map(({ keys, foot }) => ({
    keys,
    does: foot,
  }));
  const first = bound.findIndex(({ keys }) => keys === LAST_BEFORE_BACK) + 1;
  return [
    { keys: '↑↓', does: 'size' },
    ...bound.slice(0, first),
    { keys: 'Esc', does: 'back' },
    ...bound.slice(first),
    ALL_KEYS,
  ];
}

/** The keys up to this one are worth more than the one that leaves. */
const LAST_BEFORE_BACK = 'y';
