import { moneyText } from '../explore/buying/money.ts';
import { type Order, type OrderLine, orderOf } from '../explore/buying/order.ts';
import { orderText, unpricedText } from '../explore/buying/order-text.ts';
import { gradeWord } from '../explore/rack/rack.ts';
import { harmless, massNumber, massUnit, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Session } from '../session/session.ts';
import { woodName } from '../timber/member-words.ts';
import { load, type SessionOptions } from './load.ts';
import { closing, heading, wrapped } from './prose.ts';
import { woodJson } from './rack.ts';
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
      ...orderLines(found, loaded.session, loaded.units),
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
      ...(line.priceFrom === null ? {} : { priceFrom: line.priceFrom }),
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

function orderLines(order: Order, { yard }: Session, units: Units): string[] {
  const rows = order.lines.map((line) => {
    const text = orderText(line, units);
    return [
      harmless(line.member, NAME),
      text.pieces,
      harmless(`${line.size} ${gradeWord(line.stock)}`, WOOD),
      text.length ?? 'none',
      text.waste ?? '',
      text.weight,
      text.price ?? 'none',
      text.total ?? '',
    ];
  });
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
        { head: `${massUnit(units)} each`, align: 'right' },
        { head: 'each', align: 'right' },
        { head: 'total', align: 'right' },
      ],
      rows,
    ),
    '',
    `${order.pieces} pieces, ${massNumber(order.weight, units)} ${massUnit(units)}, ${(100 * order.waste).toFixed(0)} % waste`,
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
function whyNot(line: OrderLine, units: Units): string {
  return `${harmless(line.member)}, ${line.size} ${woodName(line.stock)}: ${unpricedText(line, units)}`;
}
