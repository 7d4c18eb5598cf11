import { slopeStretch } from '../../loads/index.ts';
import { beamLength } from '../../statics/beam.ts';
import { isSawn, sectionWeight } from '../../timber/index.ts';
import {
  type Figures,
  figuresOf,
  plain,
  type WorkingLine,
  weightLines,
} from '../../timber/workings/index.ts';
import { beyondEnds } from '../buying/buying.ts';
import { type Order, type OrderLine, orderLine, orderOf } from '../buying/order.ts';
import type { Asked } from './about.ts';

/** How many pieces to buy for a member and those like it, how long, and what they weigh and cost. */
export function buyingLines({ member, units, ranking, job }: Asked): WorkingLine[] {
  const f = figuresOf(units);
  const { section, count } = member;
  const order = orderLine(member, ranking.shop);
  return [
    { heading: 'how many' },
    {
      symbol: 'pieces',
      formula: 'plies x members alike',
      numbers: `${section.plies} x ${count}`,
      result: String(order.pieces),
      note: `of ${order.size}`,
    },
    ...lengthLines(f, member, order),
    ...weightOf(f, member, order),
    ...feetLines(order),
    ...priceLines(order),
    ...(job.length > 1
      ? jobLines(
          f,
          orderOf(
            job.map((each) => each.member),
            ranking.shop,
          ),
        )
      : []),
  ];
}

/** All members of the session as they stand. */
function jobLines(f: Figures, { lines, pieces, weight, waste, price, complete }: Order): WorkingLine[] {
  const sum = (symbol: string, of: (line: OrderLine) => string, result: string): WorkingLine => ({
    symbol,
    formula: 'sum over all members',
    numbers: lines.map(of).join(' + '),
    result,
  });
  const ordered = (line: OrderLine) => line.length ?? line.needed;
  const all = lines.reduce((total, line) => total + line.pieces * ordered(line), 0);
  const priced = lines.filter((line) => line.price !== null);
  return [
    { heading: 'the job: every member of the session as it stands' },
    sum('pieces', (line) => String(line.pieces), String(pieces)),
    Number.isFinite(weight)
      ? sum('weight', (line) => `${line.pieces} x ${f.mass(line.weight)}`, f.mass(weight))
      : { note: 'weight is not known: a size has no values' },
    sum('length', (line) => `${line.pieces} x ${f.span(ordered(line))}`, f.span(all)),
    sum('cut off', (line) => `${line.pieces} x ${f.span(line.waste)}`, f.span(waste * all)),
    {
      symbol: 'waste',
      formula: '100 x cut off / length',
      numbers: `100 x ${f.span(waste * all)} / ${f.span(all)}`,
      result: `${plain(100 * waste)} %`,
    },
    price === null
      ? { note: 'no member has a price' }
      : {
          symbol: complete ? 'price' : 'price of those that have one',
          formula: 'sum over all members',
          numbers: priced.map((line) => `${line.pieces} x ${plain(line.price!)}`).join(' + '),
          result: plain(price),
        },
  ];
}

function lengthLines(
  f: Figures,
  member: Asked['member'],
  { needed, length, waste, longest }: OrderLine,
): WorkingLine[] {
  const { left, right } = beyondEnds(member);
  const stretch = slopeStretch(member.slope);
  const along = stretch === 1 ? ['', ''] : [' x 1/cos', ` x ${plain(stretch)}`];
  const whole = beamLength(member.beam);
  const lines: WorkingLine[] = [
    { heading: 'how long' },
    {
      symbol: 'needed',
      formula: `(half a bearing + whole length + half a bearing)${along[0]}`,
      numbers: `(${f.span(left)} + ${f.span(whole)} + ${f.span(right)})${along[1]}`,
      result: f.span(needed),
      note: 'each piece in one length from end to end; an overhang and a fixed end have no half bearing beyond them',
    },
  ];
  if (length === null) {
    const most = longest === null ? '' : `: the longest is ${f.span(longest)}`;
    return [...lines, { note: `none is stocked that is long enough${most}; weights are of what is needed` }];
  }
  return [
    ...lines,
    { symbol: 'to order', result: f.span(length), note: lengthNote(member, length === needed) },
    {
      symbol: 'cut off',
      formula: 'to order - needed',
      numbers: `${f.span(length)} - ${f.span(needed)}`,
      result: f.span(waste),
    },
    {
      symbol: 'waste',
      formula: '100 x cut off / to order',
      numbers: `100 x ${f.span(waste)} / ${f.span(length)}`,
      result: `${plain((100 * waste) / length)} %`,
    },
  ];
}

function lengthNote({ stock }: Asked['member'], cut: boolean): string {
  if (cut) return 'cut to length';
  return isSawn(stock.product)
    ? 'the shortest stocked length that does: of the yard list, else even feet (common practice, no source)'
    : 'the shortest stocked length that does';
}

function weightOf(
  f: Figures,
  member: Asked['member'],
  { needed, length, pieces, weight }: OrderLine,
): WorkingLine[] {
  const { section } = member;
  const each = sectionWeight(member, { ...section, plies: 1 });
  const ordered = length ?? needed;
  if (!Number.isFinite(each)) return [];
  return [
    { heading: 'how heavy' },
    ...weightLines(f, section.width * section.depth, each).map((line) => ({ ...line, note: 'of one piece' })),
    {
      symbol: 'a piece',
      formula: 'own weight x length',
      numbers: `${f.weight(each)} x ${f.span(ordered)}`,
      result: f.mass(weight),
    },
    {
      symbol: 'all pieces',
      formula: 'pieces x a piece',
      numbers: `${pieces} x ${f.mass(weight)}`,
      result: f.mass(pieces * weight),
    },
  ];
}

const FOOT = 12;

function feetLines(order: OrderLine): WorkingLine[] {
  const { boardFeet, pieces, needed, length } = order;
  if (boardFeet === null) return [];
  const feet = (length ?? needed) / FOOT;
  const a = boardFeet / pieces / feet;
  return [
    { heading: 'board feet' },
    {
      symbol: 'a foot of one piece',
      formula: 'nominal thickness x nominal depth / 12',
      numbers: `${plain(a * FOOT)} / 12`,
      result: plain(a),
      note: `of ${order.size}; a board foot is a foot of nominal 1 x 12`,
      clause: 'PS 20',
    },
    {
      symbol: 'all pieces',
      formula: 'pieces x length in ft x a foot of one piece',
      numbers: `${pieces} x ${plain(feet)} x ${plain(a)}`,
      result: plain(boardFeet),
    },
  ];
}

function priceLines(order: OrderLine): WorkingLine[] {
  const { price, rate, priceFrom, unpriced, pieces, boardFeet, needed, length } = order;
  const lines: WorkingLine[] = [{ heading: 'price' }];
  if (price === null || rate === null) return [...lines, { note: unpriced ?? 'no price' }];
  const feet = (length ?? needed) / FOOT;
  const source = priceFrom === 'yard' ? 'of the yard list' : 'of the prices typed beside it';
  const by = {
    piece: { formula: 'price of a piece', numbers: undefined },
    foot: { formula: 'price of a foot x length in ft', numbers: `${plain(rate.amount)} x ${plain(feet)}` },
    'board foot': {
      formula: 'price of a board foot x board feet of one piece',
      numbers: `${plain(rate.amount)} x ${plain((boardFeet ?? 0) / pieces)}`,
    },
  }[rate.per];
  return [
    ...lines,
    { symbol: `a ${rate.per}`, result: plain(rate.amount), note: source },
    {
      symbol: 'a piece as ordered',
      formula: by.formula,
      ...(by.numbers === undefined ? {} : { numbers: by.numbers }),
      result: plain(price),
    },
    {
      symbol: 'all pieces',
      formula: 'pieces x a piece',
      numbers: `${pieces} x ${plain(price)}`,
      result: plain(pieces * price),
    },
  ];
}
