import { showInches } from '../../quantity/index.ts';
import {
  checkChange,
  mostPlies,
  shortSpecies,
  speciesOf,
  stockDepths,
  stockWidths,
} from '../../timber/index.ts';
import type { Member, Section } from '../../timber/member.ts';
import { changeStock, coversSize, gradesByStrength, withSpecies } from '../rack/choose-wood.ts';
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
    check: checkChange,
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
      return checked(member, fitted(member, put(member, next), key));
    },
    stepText: () => 'a size',
  };
}

/** A piece of another width: where that does not come in the depth at hand, in the nearest that it comes in. */
function fitted(before: Member, member: Member, key: 'width' | 'depth'): Member {
  if (key === 'depth') return member;
  const { depth } = before.section;
  const depths = stockDepths(member.stock, member.section.width);
  const wasStock = stockDepths(before.stock, before.section.width).includes(depth);
  if (!wasStock || depths.includes(depth) || depths.length === 0) return member;
  const nearest = depths.reduce((best, each) =>
    Math.abs(each - depth) < Math.abs(best - depth) ? each : best,
  );
  return withSection(member, { depth: nearest });
}

function withSection(member: Member, part: Partial<Section>): Member {
  return { ...member, section: { ...member.section, ...part } };
}

function checked(before: Member, member: Member): Turn {
  const fault = checkChange(member, before);
  return fault === null ? { member } : { fault };
}

export const sectionDepth = stockKnob('depth', 'depth', 1.5, 60);
export const sectionWidth = stockKnob('width', 'width', 0.75, 24);

/** Plies are of 2 in lumber and of LVL; what comes in one piece has one. */
const pliesChoice = choiceKnob({
  key: 'section.plies',
  label: 'plies',
  choices: (member) =>
    Array.from({ length: mostPlies(member.stock, member.section.width) }, (_, index) => index + 1),
  get: (member) => member.section.plies,
  put: (member, value) => withSection(member, { plies: value }),
  show: (value) => String(value),
  check: checkChange,
  stepText: 'one',
});

const alone = (knob: Knob, member: Member, turn: Turn): Turn =>
  'fault' in turn && member.section.plies === 1 && mostPlies(member.stock, member.section.width) === 1
    ? { fault: `${knob.label}: ${pieceWord(member)} comes in one piece` }
    : turn;

function pieceWord({ stock, section }: Member): string {
  const { product } = stock;
  return product === 'dimension lumber' ? `lumber ${showInches(section.width, 'us')} thick` : product;
}

export const plies: Knob = {
  ...pliesChoice,
  nudge: (member, direction, step, units) =>
    alone(pliesChoice, member, pliesChoice.nudge(member, direction, step, units)),
  enter: (member, text, units) => alone(pliesChoice, member, pliesChoice.enter(member, text, units)),
};

const gradeOptions = {
  key: 'stock.grade',
  label: 'grade',
  get: (member: Member) => member.stock.grade,
  put: (member: Member, value: string) => changeStock(member, { ...member.stock, grade: value }),
  show: (value: string) => value,
  check: checkChange,
  stepText: 'a grade',
};

/** By name any grade of the species; what is not made at this size is refused with its table. */
const byName = choiceKnob({ ...gradeOptions, choices: gradesByStrength });
/** By nudges those that are made at this size, from the weakest to the strongest. */
const bySize = choiceKnob({
  ...gradeOptions,
  choices: (member) => gradesByStrength(member).filter((each) => coversSize(member, each)),
});

/** A nudge up is a stronger grade. */
export const grade: Knob = unlessTyped({ ...byName, nudge: bySize.nudge });

export const species: Knob = unlessTyped(
  choiceKnob({
    key: 'stock.species',
    label: 'species',
    choices: (member) => speciesOf(member.stock.product),
    get: (member) => member.stock.species,
    put: withSpecies,
    show: shortSpecies,
    read: (text, _units, member) =>
      speciesOf(member.stock.product).find((name) => startsAlike(name, text)) ?? null,
    check: checkChange,
    stepText: 'a species',
  }),
);

/** Typed values are those of the wood they were read for: another name must not take them along. */
function unlessTyped(knob: Knob): Knob {
  const fault = ({ stock }: Member) =>
    stock.values === null
      ? null
      : `the values are typed, from ${stock.valuesFrom}: another ${knob.label} would not have them (y clears them)`;
  const guarded =
    <Rest extends unknown[]>(turn: (member: Member, ...rest: Rest) => Turn) =>
    (member: Member, ...rest: Rest): Turn => {
      const reason = fault(member);
      return reason === null ? turn(member, ...rest) : { fault: reason };
    };
  return { ...knob, nudge: guarded(knob.nudge), enter: guarded(knob.enter) };
}

/** True where a typed text begins a name, capitals and marks aside. */
function startsAlike(name: string, text: string): boolean {
  const plain = (each: string) => each.toLowerCase().replace(/[^a-z0-9]/g, '');
  return plain(text) !== '' && plain(name).startsWith(plain(text));
}
