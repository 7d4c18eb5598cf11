import { moneyText } from '../explore/buying/money.ts';
import { ratiosById } from '../explore/judge.ts';
import { type Move, type Moves, movesOf } from '../explore/moves/index.ts';
import { harmless, showInches, showRatio, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { sizeLabel } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { lengthsText, woodName } from '../timber/member-words.ts';
import type { CheckId } from '../timber/report.ts';
import { printAnswer } from './answer.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { beside, given, LINE, wrapped } from './prose.ts';
import { STATUS } from './status.ts';
import { table } from './table.ts';

/** `thrice moves FILE --member NAME`: the changes that would help, best first. Status 0 when a move passes. */
export function moves(file: string, options: SessionOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member } = theMember(loaded, file);
  const found = movesOf(member, {
    ranking: rankingOf(loaded.session),
    only: loaded.only,
    units: loaded.units,
  });
  printAnswer(loaded, member, options.json, print, {
    document: () => ({ ...movesJson(member, found, loaded.only), ...given(member).json }),
    lines: () => movesText(member, found, loaded.units),
  });
  return found.moves.some((move) => move.passes) ? STATUS.yes : STATUS.no;
}

function movesJson(member: Member, { best, deepenOrWiden, moves }: Moves, only: readonly CheckId[] | null) {
  const one = (move: Move) => moveJson(move, only);
  const orNull = (move: Move | null) => (move === null ? null : one(move));
  const { free, stock } = deepenOrWiden;
  return {
    member: member.name,
    best,
    deepenOrWiden: {
      free: { deepen: one(free.deepen), widen: one(free.widen) },
      stock: { deepen: orNull(stock.deepen), widen: orNull(stock.widen) },
    },
    moves: moves.map(one),
  };
}

function moveJson(move: Move, only: readonly CheckId[] | null) {
  const { kind, label, set, passes, governing, ratios, weight, boardFeet, depth, price, change, times } =
    move;
  const byId = Object.entries(ratiosById(ratios, only));
  return {
    kind,
    label,
    set,
    passes,
    governing,
    ratios: Object.fromEntries(byId.map(([id, ratio]) => [id, Number.isFinite(ratio) ? ratio : null])),
    weight,
    boardFeet,
    depth,
    price,
    change,
    members: times,
    ...(move.refused === null ? {} : { refused: move.refused }),
  };
}

function movesText(member: Member, { deepenOrWiden, moves, best }: Moves, units: Units): string[] {
  const { free, stock } = deepenOrWiden;
  const sides = [free.deepen, free.widen, stock.deepen, stock.widen].filter((move) => move !== null);
  const priced = moves.some((move) => move.price !== null);
  const lines = [
    ...beside([
      harmless(member.name),
      sizeLabel(member.section, member.stock.product),
      woodName(member.stock),
      lengthsText(member, units),
    ]),
    'deepen or widen: 10 % more wood either way, then the next stock size',
    ...moveTable(sides, false, units),
    '',
    `moves, ${best === 'boardFeet' ? 'least board feet' : `least ${best}`} first`,
  ];
  if (moves.length === 0) return [...lines, '  none'];
  return [
    ...lines,
    ...moveTable(moves, priced, units),
    '',
    // Not broken into lines, so that it can be copied.
    ...moves.map((move, at) => `${at + 1}. ${move.set.map(setText).join(' ')}`),
  ];
}

/** For a shell. */
function setText(set: string): string {
  return `--set '${set.replaceAll("'", `'\\''`)}'`;
}

/** What the table stands indented by. */
const INDENT = '  ';

function moveTable(moves: readonly Move[], priced: boolean, units: Units): string[] {
  const rows = table(
    [
      { head: '', align: 'right' },
      { head: 'move', align: 'left' },
      { head: 'ratio', align: 'right' },
      { head: weightUnit(units), align: 'right' },
      { head: 'depth', align: 'right' },
      ...(priced ? [{ head: 'price', align: 'right' } as const] : []),
    ],
    moves.map((move, at) => [
      `${at + 1}.`,
      move.kind,
      showRatio(move.worst),
      signed(move.change.weight, (value) => weightNumber(value, units)),
      signed(move.change.depth, (value) => showInches(value, units)),
      ...(priced ? [signed(move.change.price, moneyText)] : []),
    ]),
    INDENT,
  );
  const width = Math.max(...rows.map((row) => row.length));
  return rows.flatMap((row, at) => {
    const move = moves[at - 1];
    const to = move === undefined ? 'to' : toText(move);
    const beside = `${row.padEnd(width)}  ${to}`;
    // What it leads to stands below where there is no room beside.
    return beside.length <= LINE ? [beside] : [row, ...wrapped(to, `${INDENT}${INDENT}   to `)];
  });
}

function toText({ label, times, passes, refused }: Move): string {
  const to = times > 1 ? `${label}, ${times.toFixed(2)} x as many` : label;
  return passes ? to : `${to}: ${refused ?? 'fails'}`;
}

/** What a move adds or spares: "+1.4", "-2.1", "0" where it is the same, blank where it is not known. */
function signed(value: number | null, show: (value: number) => string): string {
  if (value === null) return '';
  const text = show(Math.abs(value));
  return Number(text.replace(/[^\d.]/g, '')) === 0 ? '0' : `${value < 0 ? '-' : '+'}${text}`;
}
