import { glulamGroup, shortSpecies, shortWood, speciesOf } from '../../timber/index.ts';
import { type Member, PRODUCTS, type Product, type Stock } from '../../timber/member.ts';
import { changeStock, withProduct } from '../rack/choose-wood.ts';
import { offRack } from '../rack/rack-woods.ts';
import { flat, incised, repetitive, seasoned, service, temperature } from './condition.ts';
import { choiceKnob, type Knob } from './knob.ts';
import { NOTCHES } from './limit.ts';
import { grade, species } from './stock.ts';
import { FACTOR_KNOBS, type TypedKnob, valueKnobs } from './typed.ts';
import { UNBRACED_BOTTOM, UNBRACED_TOP } from './unbraced.ts';

/** Products in the words of the trade. */
export const PRODUCT_WORD: Readonly<Record<Product, string>> = {
  'dimension lumber': 'lumber',
  'machine stress rated': 'MSR',
  timber: 'timber',
  glulam: 'glulam',
  LVL: 'LVL',
  custom: 'custom',
};

/**
 * What is chosen of a wood: product, species, grade, the conditions it serves in, its reference values and where
 * typed ones were read, factors typed over the standard's, the woods on the rack with it. Unlike the knobs of the
 * explorer they may lead to a wood that a rule forbids or that lacks values: the caller says so before it is taken.
 */
export function woodKnobs(member: Member): (Knob | TypedKnob)[] {
  const { stock } = member;
  const named = stock.product === 'LVL' || stock.product === 'custom';
  return [
    product,
    ...(speciesOf(stock.product).length > 0 ? [{ ...species, show: showSpecies }] : []),
    named ? gradeName : { ...grade, show: (each: Member) => shortGrade(each.stock.grade) },
    service,
    temperature,
    incised,
    repetitive,
    seasoned,
    flat,
    { ...UNBRACED_TOP, label: 'top edge' },
    { ...UNBRACED_BOTTOM, label: 'bottom edge' },
    ...NOTCHES,
    ...valueKnobs(member),
    ...FACTOR_KNOBS,
    ...(member.rack ?? []).map(rackKnob),
  ];
}

/** A glulam of no stated species is of the western ones, unless its class is of Southern Pine alone. */
function showSpecies({ stock }: Member): string {
  return shortSpecies(stock.species || (stock.product === 'glulam' ? (glulamGroup(stock) ?? '') : ''));
}

const product = choiceKnob<Product>({
  key: 'stock.product',
  label: 'product',
  choices: () => PRODUCTS,
  get: (member) => member.stock.product,
  put: withProduct,
  show: (value) => PRODUCT_WORD[value],
  read: (text) => PRODUCTS.find((each) => each.toLowerCase().startsWith(text.trim().toLowerCase())) ?? null,
  stepText: 'a product',
});

/** A maker's product is called what its report calls it. */
const LONGEST_NAME = 60;
const gradeName: Knob = {
  key: 'stock.grade',
  label: 'grade',
  show: ({ stock }) => stock.grade || 'not named',
  nudge: () => ({ fault: 'type the grade as its report names it' }),
  enter(member, text) {
    const name = text.trim();
    if (name.length > LONGEST_NAME) return { fault: `a grade's name has ${LONGEST_NAME} characters at most` };
    return { member: changeStock(member, { ...member.stock, grade: name }) };
  },
  hint: () => 'as its report names it',
  stepText: () => 'none',
  number: null,
};

/** "Dense SS": the longest grades are select structural ones. */
export function shortGrade(name: string): string {
  return name.replace('Select Structural', 'SS');
}

function rackKnob(stock: Stock, index: number): TypedKnob {
  return {
    key: `rack.${index}`,
    label: 'on the rack',
    show: () => shortWood(stock),
    nudge: () => ({ fault: 'Delete takes it off the rack' }),
    enter: () => ({ fault: 'choose a wood above and press Space to put it on the rack' }),
    clear: (member) => offRack(member, stock),
    hint: () => '',
    stepText: () => 'none',
    number: null,
  };
}
