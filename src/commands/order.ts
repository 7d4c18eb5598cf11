import { type Order, type OrderLine, orderOf } from '../explore/buying/order.ts';
import { gradeWord } from '../explore/rack/rack.ts';
import { harmless, showSpan, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Session } from '../session/session.ts';
import { load, type SessionOptions } from './load.ts';
import { closing, heading, woodName, wrapped } from './prose.ts';
import { moneyText, woodJson } from './rack.ts';
import { STATUS } from './status.ts';
import { table } from './table.ts';

/** `thrice order FILE`: what to buy for the job by the yard list. Status 0 when every size has a price. */
export function order(file: string, options: SessionOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { shop } = rankingOf(loaded.session);
  const found = orderOf(
    loaded.members.map(({ member }) => member),
    shop,
  );
  if (options.json === true) {
    print(`${JSON.stringify(orderJson(found), null, 2)}\n`);
  } else {
    const lines = [
      ...heading(loaded.session),
      '',
      ...orderText(found, loaded.session, loaded.units),
      '',
      ...closing(),
    ];
    print(`${lines.join('\n')}\n`);
  }
  return found.complete ? STATUS.yes : STATUS.no;
}

function orderJson({ lines, pieces, weight, waste, price, complete }: Order) {
  return {
    thrice: 1,
    lines: lines.map((line) => ({
      member: line.member,
      size: line.size,
      ...woodJson(line.stock),
      pieces: line.pieces,
      needed: line.needed,
      length: line.length,
      waste: line.waste,
      weight: line.weight,
      boardFeet: line.boardFeet,
      price: line.price,
      total: line.price === null ? null : line.price * line.pieces,
      ...(line.unpriced === null ? {} : { unpriced: line.unpriced }),
    })),
    pieces,
    weight,
    waste,
    price,
    complete,
    unpriced: lines.filter((line) => line.unpriced !== null).map((line) => line.member),
  };
}

function orderText(order: Order, { yard }: Session, units: Units): string[] {
  const rows = order.lines.map((line) => [
    harmless(line.member, NAME),
    String(line.pieces),
    harmless(`${line.size} ${gradeWord(line.stock)}`, WOOD),
    line.length === null ? 'none' : showSpan(line.length, units),
    line.length === null ? '' : `${((100 * line.waste) / line.length).toFixed(0)} %`,
    weightText(line.weight, units),
    line.price === null ? 'none' : moneyText(line.price),
    line.price === null ? '' : moneyText(line.price * line.pieces),
  ]);
  const without = order.lines.filter((line) => line.unpriced !== null);
  const priceOf = order.complete ? 'price of the job' : 'price of those that have one';
  return [
    ...table(
      [
        { head: 'for', align: 'left' },
        { head: 'pcs', align: 'right' },
        { head: 'size', align: 'left' },
        { head: 'order', align: 'right' },
        { head: 'waste', align: 'right' },
        { head: units === 'us' ? 'lb each' : 'kg each', align: 'right' },
        { head: 'each', align: 'right' },
        { head: 'total', align: 'right' },
      ],
      rows,
    ),
    '',
    `${order.pieces} pieces, ${weightText(order.weight, units)} ${units === 'us' ? 'lb' : 'kg'}, ${(100 * order.waste).toFixed(0)} % waste`,
    order.price === null ? 'no size has a price' : `${priceOf}: ${moneyText(order.price)}`,
    ...without.flatMap((line) => wrapped(`NOT PRICED: ${whyNot(line, units)}`)),
    ...(yard == null
      ? wrapped('no yard list: lengths are the usual even feet (common practice, no source)')
      : []),
  ];
}

/** Widest texts that leave room for the figures. */
const NAME = 12;
const WOOD = 26;
/** Exact. */
const KG_PER_LB = 0.45359237;

function weightText(pounds: number, units: Units): string {
  return (units === 'us' ? pounds : pounds * KG_PER_LB).toFixed(0);
}

function whyNot(line: OrderLine, units: Units): string {
  const what = `${harmless(line.member)}, ${line.size} ${woodName(line.stock)}`;
  if (line.unpriced === 'none long enough') {
    const longest = line.longest === null ? '' : `; the longest is ${showSpan(line.longest, units)}`;
    return `${what}: none is stocked ${showSpan(line.needed, units)} long${longest}`;
  }
  return `${what}: ${line.unpriced}`;
}
