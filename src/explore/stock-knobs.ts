import { showInches } from '../quantity/index.ts';
import { checkStock, gradesOf, shortSpecies, speciesOf, stockDepths, stockWidths } from '../timber/index.ts';
import type { Member, Section } from '../timber/member.ts';
import { choiceKnob, type Knob, measureKnob, SCALES, type Turn } from './knob.ts';

/** Stock values of one section dimension for the stock as it is, from the least to the most. */
function stockOf(member: Member, key: 'width' | 'depth'): number[] {
  return key === 'width' ? stockWidths(member.stock) : stockDepths(member.stock, member.section.width);
}

/** Arrows step through the stock sizes; fine nudges and typed values are free. */
function stockKnob(key: 'width' | 'depth', label: string, least: number, most: number): Knob {
  const put = (member: Member, value: number): Member => withSection(member, { [key]: value });
  const free = measureKnob({
    key: `section.${key}`,
    label,
    kind: 'length',
    scale: SCALES.section,
    least,
    most,
    get: (member) => member.section[key],
    put,
    show: showInches,
    check: checkStock,
  });
  return {
    ...free,
    nudge(member, direction, step, units) {
      if (step === 'fine' || stockOf(member, key).length === 0)
        return free.nudge(member, direction, step, units);
      const now = member.section[key];
      const further = stockOf(member, key).filter((value) => (direction > 0 ? value > now : value < now));
      if (direction < 0) further.reverse();
      const next = step === 'coarse' ? further.at(-1) : further[0];
      if (next === undefined) {
        return {
          fault: `${showInches(now, units)} is the ${direction > 0 ? 'largest' : 'smallest'} stock ${label} here; [ and ] go off stock`,
        };
      }
      return checked(put(member, next));
    },
    stepText: () => 'a size',
  };
}

function withSection(member: Member, part: Partial<Section>): Member {
  return { ...member, section: { ...member.section, ...part } };
}

function checked(member: Member): Turn {
  const fault = checkStock(member);
  return fault === null ? { member } : { fault };
}

export const sectionDepth = stockKnob('depth', 'depth', 1.5, 60);
export const sectionWidth = stockKnob('width', 'width', 0.75, 24);

/** Most plies side by side. */
const MOST_PLIES = 4;

export const plies: Knob = choiceKnob({
  key: 'section.plies',
  label: 'plies',
  choices: () => Array.from({ length: MOST_PLIES }, (_, index) => index + 1),
  get: (member) => member.section.plies,
  put: (member, value) => withSection(member, { plies: value }),
  show: (value) => String(value),
  check: checkStock,
  stepText: 'one',
});

/** The tables run from the best grade down; a nudge up is a better grade. */
export const grade: Knob = choiceKnob({
  key: 'stock.grade',
  label: 'grade',
  choices: (member) => [...gradesOf(member.stock.product, member.stock.species)].reverse(),
  get: (member) => member.stock.grade,
  put: (member, value) => ({ ...member, stock: { ...member.stock, grade: value } }),
  show: (value) => value,
  check: checkStock,
  stepText: 'a grade',
});

export const species: Knob = choiceKnob({
  key: 'stock.species',
  label: 'species',
  choices: (member) => speciesOf(member.stock.product),
  get: (member) => member.stock.species,
  put: (member, value) => ({
    ...member,
    stock: { ...member.stock, species: value, grade: gradeIn(member, value) },
  }),
  show: shortSpecies,
  read: (text, _units, member) =>
    speciesOf(member.stock.product).find((name) => startsAlike(name, text)) ?? null,
  check: checkStock,
  stepText: 'a species',
});

/** True where a typed text begins a name, capitals and marks aside. */
function startsAlike(name: string, text: string): boolean {
  const plain = (each: string) => each.toLowerCase().replace(/[^a-z0-9]/g, '');
  return plain(text) !== '' && plain(name).startsWith(plain(text));
}

/** The same grade in another species; where it has none, one that joins it ("No.1/No.2"), else its first. */
function gradeIn(member: Member, into: string): string {
  const { product, grade: now } = member.stock;
  const grades = gradesOf(product, into);
  const parts = (text: string) => text.split('/');
  return (
    grades.find((each) => each === now) ??
    grades.find((each) => parts(each).some((part) => parts(now).includes(part))) ??
    grades[0]!
  );
}
