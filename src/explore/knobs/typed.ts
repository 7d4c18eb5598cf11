import { parseQuantity, showStress, type Units } from '../../quantity/index.ts';
import { isRefusal, lookUp } from '../../timber/index.ts';
import {
  FACTOR_SYMBOLS,
  type FactorSymbol,
  type Member,
  type Stock,
  type StockValue,
} from '../../timber/member.ts';
import { changeStock } from '../rack/choose-wood.ts';
import type { Knob, Turn } from './knob.ts';

/** A knob whose typed value can be taken back. */
export interface TypedKnob extends Knob {
  /** The member without what was typed; null where nothing was. */
  clear(member: Member): Member | null;
}

/** Without unit, with the bounds of the session file. */
const PLAIN: Readonly<Partial<Record<StockValue, readonly [least: number, most: number]>>> = {
  G: [0.1, 1.5],
  COV: [0, 0.5],
};

/** The values that a product's checks need, in the order they are read from a report. */
function valuesOf(product: Stock['product']): readonly StockValue[] {
  return product === 'glulam'
    ? ['Fb', 'FbNeg', 'Fv', 'Fcperp', 'E', 'Emin', 'EyMin', 'G', 'COV']
    : ['Fb', 'Fv', 'Fcperp', 'E', 'Emin', 'G', 'COV'];
}

/** One knob a reference value, then where the typed ones were read. */
export function valueKnobs(member: Member): TypedKnob[] {
  return [...valuesOf(member.stock.product).map(valueKnob), READ_IN];
}

function valueKnob(key: StockValue): TypedKnob {
  const plain = PLAIN[key];
  const show = (value: number, units: Units) =>
    plain === undefined ? showStress(value, units) : String(Math.round(value * 1000) / 1000);
  return {
    key: `stock.values.${key}`,
    label: `value ${key}`,
    show({ stock, section }, units) {
      const typed = stock.values?.[key];
      if (typed !== undefined) return `${show(typed, units)} typed`;
      const found = lookUp(stock, section);
      const value = isRefusal(found) ? null : found[key];
      return value === null ? 'not typed' : show(value, units);
    },
    nudge: () => ({ fault: `${key} is a value of a table or a report: type it, with its unit` }),
    enter(member, text, units) {
      const parsed = parseQuantity(
        plain === undefined ? 'stress' : 'number',
        text,
        plain !== undefined ? undefined : units === 'us' ? 'psi' : 'MPa',
      );
      if (!parsed.ok) return { fault: parsed.fault };
      const [least, most] = plain ?? [1, 1e8];
      if (parsed.value < least || parsed.value > most) {
        return { fault: `${key} runs from ${show(least, units)} to ${show(most, units)}` };
      }
      const values = { ...member.stock.values, [key]: parsed.value };
      return { member: changeStock(member, { ...member.stock, values }) };
    },
    clear(member) {
      if (member.stock.values?.[key] === undefined) return null;
      const { [key]: _gone, ...rest } = member.stock.values;
      const none = Object.keys(rest).length === 0;
      const { valuesFrom } = member.stock;
      return changeStock(member, {
        ...member.stock,
        values: none ? null : rest,
        valuesFrom: none ? null : valuesFrom,
      });
    },
    hint: (units) => (plain === undefined ? (units === 'us' ? '2600, 18MPa' : '18, 2600psi') : '0.5'),
    stepText: () => 'none',
    number: null,
  };
}

/** Where the typed values were read: a report's number and date, a table. */
const READ_IN: TypedKnob = {
  key: 'stock.valuesFrom',
  label: 'read in',
  show: ({ stock }) => stock.valuesFrom ?? (stock.values === null ? 'table' : 'not said'),
  nudge: () => ({ fault: 'type where the values were read: the report or the table' }),
  enter: (member, text) =>
    text.trim() === ''
      ? { fault: 'say where the values were read: the report or the table' }
      : { member: changeStock(member, { ...member.stock, valuesFrom: text.trim() }) },
  clear: (member) =>
    member.stock.valuesFrom === null
      ? null
      : changeStock(member, { ...member.stock, values: null, valuesFrom: null }),
  hint: () => 'the report or table and its date',
  stepText: () => 'none',
  number: null,
};

/** A typed factor and its reason in one line: "0.95 blocked at mid-span". */
const FACTOR_TEXT = /^\s*(\d+(?:\.\d*)?|\.\d+)\s*[,;:]?\s*(.*?)\s*$/;
/** The session file's bounds. */
const LEAST_FACTOR = 0.01;
const MOST_FACTOR = 10;

/** One knob an adjustment factor: the standard's until one is typed over it, with its reason. */
export const FACTOR_KNOBS: readonly TypedKnob[] = FACTOR_SYMBOLS.map(
  (symbol): TypedKnob => ({
    key: `factors.${symbol}`,
    label: `factor ${symbol}`,
    show({ typedFactors }) {
      const typed = typedFactors?.[symbol];
      return typed === undefined ? 'by the rule' : `${typed.value} typed`;
    },
    nudge: () => ({ fault: `${symbol} follows its rule: type a value and the reason to set it` }),
    enter: (member, text) => enterFactor(member, symbol, text),
    clear(member) {
      if (member.typedFactors?.[symbol] === undefined) return null;
      const { [symbol]: _gone, ...rest } = member.typedFactors;
      return { ...member, typedFactors: Object.keys(rest).length === 0 ? null : rest };
    },
    hint: () => '0.95 and the reason',
    stepText: () => 'none',
    number: null,
  }),
);

function enterFactor(member: Member, symbol: FactorSymbol, text: string): Turn {
  const parts = FACTOR_TEXT.exec(text);
  if (parts === null) return { fault: `${symbol} is a number and its reason: 0.95 blocked at mid-span` };
  const value = Number(parts[1]);
  if (!(value >= LEAST_FACTOR && value <= MOST_FACTOR)) {
    return { fault: `${symbol} runs from ${LEAST_FACTOR} to ${MOST_FACTOR}` };
  }
  const reason = parts[2]!;
  if (reason === '') return { fault: `a typed ${symbol} needs its reason: ${parts[1]} blocked at mid-span` };
  return { member: { ...member, typedFactors: { ...member.typedFactors, [symbol]: { value, reason } } } };
}
