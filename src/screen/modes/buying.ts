import { offerOf } from '../../explore/buying/offer.ts';
import { withPiecePrice, withWoodPrice } from '../../explore/buying/typed-prices.ts';
import type { YardRow } from '../../explore/buying/yard.ts';
import { doubleIn } from '../../explore/buying/yard-fault.ts';
import { takeSize } from '../../explore/rack/rack.ts';
import { rankingOf } from '../../session/index.ts';
import { MAX_YARD, type Session } from '../../session/session.ts';
import {
  readPriceText,
  readYardText,
  type Typed,
  writePriceText,
  writeYardText,
} from '../../session/yard-text.ts';
import { checkStock, shortSpecies, shortWood, woodsOf } from '../../timber/index.ts';
import { isTooSmall } from '../arrange.ts';
import { nextBest } from '../best-choice.ts';
import { type BuyingAction, buyingActionOf } from '../buying-keys.ts';
import {
  type BuyingChoice,
  buyingView,
  choiceInHand,
  choicesOf,
  pieceName,
  purchaseOf,
} from '../buying-view.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { type Step, still, type YardAnswer } from '../effect.ts';
import { redo, undo } from '../history.ts';
import { startsEntry } from '../keys.ts';
import { drawTooSmall } from '../layout.ts';
import { type BuyingMode, type BuyingQuestion, EXPLORE } from '../mode.ts';
import { drawBuying } from '../panels/buying.ts';
import { memberOf, refused, type State, unitsOf, withMember, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';
import { openedWorkings } from './workings.ts';

/** What each size takes to buy, with the prices and the yard list that it goes by. */
export const buying: ModeRules<BuyingMode> = {
  press: (state, mode, key) =>
    mode.asks === null ? still(press(state, mode, key)) : type(state, mode, mode.asks, key),
  paste(state, mode, text) {
    const { asks } = mode;
    if (asks !== null) return asking(state, mode, { ...asks, edit: inserted(asks.edit, text), fault: null });
    return /[0-9]/.test(text) ? askPrice(state, mode, text) : state;
  },
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const screen = { title: titleOf(state), notice: state.notice };
    const place = drawBuying(screen, buyingView(state, mode), canvas, glyphs);
    if (place === null || mode.asks === null) return null;
    return { ...place, value: mode.asks.edit.text, cursor: mode.asks.edit.cursor };
  },
};

/** The sizes of the member in hand, its own chosen. */
export function openBuying(state: State): State {
  return { ...state, mode: { name: 'buying', size: null, asks: null }, notice: null };
}

function press(state: State, mode: BuyingMode, press: KeyPress): State {
  const closes = isCancel(press) || (press.name === 'char' && !press.ctrl && /^[$q]$/.test(press.char ?? ''));
  if (closes) return { ...state, mode: EXPLORE, notice: null };
  const choices = choicesOf(state);
  const line = scrolled(choiceInHand(state, mode), press, choices.length - 1);
  if (line !== null) return { ...state, mode: { ...mode, size: choices[line]!.size }, notice: null };
  if (startsEntry(press)) return askPrice(state, mode, press.char ?? '');
  const action = buyingActionOf(press);
  return action === null ? state : act(state, mode, action);
}

function inHand(state: State, mode: BuyingMode): BuyingChoice {
  return choicesOf(state)[choiceInHand(state, mode)]!;
}

function act(state: State, mode: BuyingMode, action: BuyingAction): State {
  switch (action) {
    case 'take':
      return take(state, inHand(state, mode));
    case 'price':
      return askPrice(state, mode, null);
    case 'wood-price':
      return ask(state, mode, 'wood price', '');
    case 'drop-price':
      return dropPrice(state, inHand(state, mode));
    case 'line':
      return askLine(state, mode);
    case 'load':
      return ask(state, mode, 'file', state.session.yard?.file ?? '');
    case 'no-list':
      return withoutList(state);
    case 'best':
      return nextBest(state);
    case 'undo':
      return undo(state);
    case 'redo':
      return redo(state);
    case 'workings':
      return openedWorkings(state);
    case 'units': {
      const units = unitsOf(state) === 'us' ? 'si' : 'us';
      return withSession(state, { ...state.session, units });
    }
  }
}

function take(state: State, { size, member }: BuyingChoice): State {
  if (size === null) return { ...state, mode: EXPLORE };
  const fault = checkStock(member);
  if (fault !== null) return refused(state, fault);
  const before = memberOf(state);
  return {
    ...withMember(state, takeSize(before, size)),
    ghost: { knob: 'rack', member: before },
    mode: EXPLORE,
  };
}

function asking(state: State, mode: BuyingMode, asks: BuyingQuestion): State {
  return { ...state, mode: { ...mode, asks }, notice: null };
}

function ask(state: State, mode: BuyingMode, of: BuyingQuestion['of'], text: string): State {
  return asking(state, mode, { of, edit: editOf(text), fault: null });
}

/** A price of the piece in hand; what the yard list prices, or does not have, is typed as its line. */
function askPrice(state: State, mode: BuyingMode, text: string | null): State {
  const { inYard, line, rate } = purchaseOf(state, inHand(state, mode));
  if (inYard === false || (line !== null && line.price !== null)) return askLine(state, mode);
  return ask(state, mode, 'price', text ?? (rate === null ? '' : writePriceText(rate)));
}

/** The line that the piece in hand is bought from, or is in, or a new one. */
function yardLineOf(state: State, choice: BuyingChoice): YardRow | null {
  const { shop } = rankingOf(state.session);
  const { member } = choice;
  const rows = shop === null ? null : offerOf(shop, { ...member.section, stock: member.stock }).rows;
  return purchaseOf(state, choice).line ?? rows?.[0] ?? null;
}

function askLine(state: State, mode: BuyingMode): State {
  const choice = inHand(state, mode);
  const line = yardLineOf(state, choice);
  const { size, stock } = choice.line;
  const text =
    line === null
      ? `${[size, shortSpecies(stock.species), stock.grade].join('; ')}; `
      : writeYardText(line, unitsOf(state));
  return ask(state, mode, 'line', text);
}

function type(state: State, mode: BuyingMode, asks: BuyingQuestion, press: KeyPress): Step {
  const closed: State = { ...state, mode: { ...mode, asks: null } };
  if (isCancel(press)) return still(closed);
  if (press.name !== 'enter') {
    const edit = edited(asks.edit, press);
    return still(edit === null ? state : asking(state, mode, { ...asks, edit, fault: null }));
  }
  const text = asks.edit.text.trim();
  const faulty = (fault: string) => still(asking(state, mode, { ...asks, fault }));
  const taken = <T>(typed: Typed<T>, then: (value: T) => State): Step =>
    typed.ok ? still(then(typed.value)) : faulty(typed.fault);
  const choice = inHand(state, mode);
  const { stock } = choice.member;
  if (text === '' && asks.of !== 'line') return still(closed);
  switch (asks.of) {
    case 'file': {
      const { session, file } = state;
      return { state, effects: [{ do: 'read-yard', name: text, session, file }] };
    }
    case 'price':
      return taken(readPriceText(text), (price) => {
        const prices = withPiecePrice(pricesOf(state), { ...choice.member.section, stock }, price);
        return told(withPrices(closed, prices), `${pieceName(choice)}: ${writePriceText(price)}`);
      });
    case 'wood price':
      return taken(readPriceText(text), (price) => {
        const prices = withWoodPrice(pricesOf(state), stock, price);
        return told(withPrices(closed, prices), `${shortWood(stock)}: ${writePriceText(price)}`);
      });
    case 'line': {
      const before = yardLineOf(state, choice);
      if (text === '') {
        if (before === null) return still(closed);
        const what = `${before.size} is out of the yard list`;
        return still(withLines(closed, linesWith(state, before, null), what));
      }
      const product = before?.product ?? (stock.product === 'custom' ? 'custom' : null);
      const woods = state.session.members.flatMap(({ member }) => woodsOf(member));
      const read = readYardText(text, product, unitsOf(state), woods);
      if (!read.ok) return faulty(read.fault);
      const rows = linesWith(state, before, read.value);
      const fault = listFault(rows);
      return fault === null
        ? still(withLines(closed, rows, `in the yard list: ${read.value.size}`))
        : faulty(fault);
    }
  }
}

function pricesOf(state: State): NonNullable<Session['prices']> {
  return state.session.prices ?? [];
}

function withPrices(state: State, prices: NonNullable<Session['prices']>): State {
  return withSession(state, { ...state.session, prices });
}

function told(state: State, text: string): State {
  return { ...state, notice: { text, refusal: false } };
}

function dropPrice(state: State, choice: BuyingChoice): State {
  const { priced } = purchaseOf(state, choice);
  if (priced === null) return refused(state, 'no typed price stands here; y shows its line in the yard list');
  const prices = pricesOf(state).filter((row) => row !== priced);
  return told(
    withPrices(state, prices),
    `dropped: ${priced.size ?? 'any size'}, ${writePriceText(priced.price)}`,
  );
}

/** The lines of the yard list with one changed, added or taken out. */
function linesWith(state: State, before: YardRow | null, after: YardRow | null): readonly YardRow[] {
  const rows = state.session.yard?.rows ?? [];
  if (before === null) return after === null ? rows : [...rows, after];
  return rows.flatMap((row) => (row !== before ? [row] : after === null ? [] : [after]));
}

/** Why these lines may not be a list; null where they may. */
function listFault(rows: readonly YardRow[]): string | null {
  if (rows.length > MAX_YARD) return `the list has ${MAX_YARD} lines, the most that are kept`;
  const double = doubleIn(rows);
  if (double === null) return null;
  const { size } = rows[double.at]!;
  return `${size} of this wood and length is in the list already; choose its size, y shows its line`;
}

/** From the first change on the lines of a list stand in the session itself; without lines there is no list. */
function withLines(state: State, rows: readonly YardRow[], what: string): State {
  const file = state.session.yard?.file ?? null;
  const moved = file === null ? '' : `; the lines of ${file} now stand in the session`;
  const yard = rows.length === 0 ? null : { file: null, rows };
  return told(withSession(state, { ...state.session, yard }), `${what}${moved}`);
}

function withoutList(state: State): State {
  if (state.session.yard == null) return refused(state, 'there is no yard list');
  const next = withSession(state, { ...state.session, yard: null });
  return told(next, 'no yard list any more; u brings it back');
}

/** The state with a yard list that was read; a fault stays with the name that was typed, and the list that was. */
export function withYardAnswer(state: State, answer: YardAnswer): State {
  const { mode } = state;
  if (!answer.ok) {
    return mode.name === 'buying' && mode.asks !== null
      ? asking(state, mode, { ...mode.asks, fault: answer.fault })
      : refused(state, answer.fault);
  }
  const { file, rows } = answer;
  const next = withSession(state, { ...state.session, yard: { file, rows } });
  const text = `read ${file}: ${rows.length} ${rows.length === 1 ? 'line' : 'lines'}`;
  return told(mode.name === 'buying' ? { ...next, mode: { ...mode, asks: null } } : next, text);
}
