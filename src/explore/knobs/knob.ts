import { parseQuantity, type QuantityKind, tidyQuantity, type Units } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';

/** How far one nudge goes. */
export type Step = 'fine' | 'normal' | 'coarse';

/** What a nudge or an entry gives: the changed member, or the reason why it stays as it was. */
export type Turn = { readonly member: Member } | { readonly fault: string };

/** A quantity that can be nudged. Its key is its path in the session file. */
export interface Knob {
  readonly key: string;
  readonly label: string;
  show(member: Member, units: Units): string;
  /** `direction` +1 is longer, more, stronger, the next in the list. */
  nudge(member: Member, direction: 1 | -1, step: Step, units: Units): Turn;
  /** Takes a typed value; a bare number has the knob's own unit. */
  enter(member: Member, text: string, units: Units): Turn;
  /** Examples of what can be typed. */
  hint(units: Units): string;
  /** What one normal nudge is: `3"`, "one size". */
  stepText(units: Units): string;
  /** Number behind the knob in base units, for charts and searches; null where it is a choice. */
  readonly number: NumberKnob | null;
}

export interface NumberKnob {
  readonly kind: QuantityKind;
  get(member: Member): number;
  put(member: Member, value: number): Member;
  readonly least: number;
  readonly most: number;
  /** What the marks of its axis are round multiples of, base units. */
  axisUnit(units: Units): number;
}

interface Scale {
  /** Base units in one display unit. */
  readonly unit: number;
  readonly fine: number;
  readonly normal: number;
  readonly coarse: number;
  /** Unit of a bare typed number. */
  readonly bare: string;
  readonly hint: string;
  readonly stepText: string;
  /** Base units that marks of an axis are multiples of; the display unit where absent. */
  readonly axis?: number;
}

export interface MeasureOptions {
  readonly key: string;
  readonly label: string;
  readonly kind: QuantityKind;
  readonly scale: Readonly<Record<Units, Scale>>;
  readonly least: number;
  readonly most: number;
  /** What the range is said of; the label where absent. */
  readonly name?: string;
  get(member: Member): number;
  put(member: Member, value: number): Member;
  show(value: number, units: Units): string;
  /** Why the changed member cannot be; null when it can. */
  check?(changed: Member, before: Member, units: Units): string | null;
}

const FOOT = 12;
const MM = 1 / 25.4;
const PSF = 1 / 144;
const KPA = 1000 / 6894.757293168361;
const PLF = 1 / 12;
const KN = 1000 / 4.4482216152605;
const KN_M = KN / (1000 * MM);

/** Steps and bare units of each sort of quantity; coarse is ten nudges. */
export const SCALES = {
  span: {
    us: {
      unit: 1,
      fine: 1,
      normal: 3,
      coarse: 30,
      bare: 'ft',
      hint: `14-6, 14'6", 14.5, 4.4m`,
      stepText: '3"',
      axis: FOOT,
    },
    si: {
      unit: MM,
      fine: 10,
      normal: 50,
      coarse: 500,
      bare: 'm',
      hint: `4.4, 4400mm, 14'6"`,
      stepText: '50 mm',
      axis: 1000 * MM,
    },
  },
  tributary: {
    us: {
      unit: 1,
      fine: 1,
      normal: 6,
      coarse: 60,
      bare: 'ft',
      hint: `6, 5-4, 64", 1.6m`,
      stepText: '6"',
      axis: FOOT,
    },
    si: {
      unit: MM,
      fine: 10,
      normal: 100,
      coarse: 1000,
      bare: 'm',
      hint: `1.6, 1600mm, 5'4"`,
      stepText: '100 mm',
      axis: 1000 * MM,
    },
  },
  spacing: {
    us: {
      unit: 1,
      fine: 1,
      normal: 4,
      coarse: 40,
      bare: 'in',
      hint: '16, 16", 19.2',
      stepText: '4"',
      axis: FOOT,
    },
    si: {
      unit: MM,
      fine: 10,
      normal: 100,
      coarse: 1000,
      bare: 'mm',
      hint: '400, 400mm, 16"',
      stepText: '100 mm',
      axis: 1000 * MM,
    },
  },
  section: {
    us: {
      unit: 1,
      fine: 0.25,
      normal: 0.5,
      coarse: 5,
      bare: 'in',
      hint: `11.25, 11-1/4", 285mm`,
      stepText: '1/2"',
    },
    si: {
      unit: MM,
      fine: 5,
      normal: 10,
      coarse: 100,
      bare: 'mm',
      hint: `285, 285mm, 11-1/4"`,
      stepText: '10 mm',
    },
  },
  areaLoad: {
    us: {
      unit: PSF,
      fine: 1,
      normal: 5,
      coarse: 50,
      bare: 'psf',
      hint: '50, 50psf, 2.4kPa',
      stepText: '5 psf',
    },
    si: {
      unit: KPA,
      fine: 0.05,
      normal: 0.25,
      coarse: 2.5,
      bare: 'kPa',
      hint: '2.4, 2.4kPa, 50psf',
      stepText: '0.25 kPa',
    },
  },
  lineLoad: {
    us: {
      unit: PLF,
      fine: 5,
      normal: 25,
      coarse: 250,
      bare: 'plf',
      hint: '600, 600plf, 8.8kN/m',
      stepText: '25 plf',
    },
    si: {
      unit: KN_M,
      fine: 0.1,
      normal: 0.5,
      coarse: 5,
      bare: 'kN/m',
      hint: '8.8, 8.8kN/m, 600plf',
      stepText: '0.5 kN/m',
    },
  },
  pointLoad: {
    us: {
      unit: 1,
      fine: 50,
      normal: 250,
      coarse: 2500,
      bare: 'lb',
      hint: '1200, 1.2kip, 5kN',
      stepText: '250 lb',
    },
    si: { unit: KN, fine: 0.25, normal: 1, coarse: 10, bare: 'kN', hint: '5, 5kN, 1200lb', stepText: '1 kN' },
  },
  limit: {
    us: { unit: 1, fine: 10, normal: 60, coarse: 600, bare: '', hint: '360, l/360', stepText: '60' },
    si: { unit: 1, fine: 10, normal: 60, coarse: 600, bare: '', hint: '360, l/360', stepText: '60' },
  },
} as const satisfies Record<string, Record<Units, Scale>>;

/** A step taken in display units, so that ten steps up and down give back the very number. */
export function stepped(value: number, by: number, unit: number): number {
  const digits = 1e6;
  return (Math.round((value / unit + by) * digits) / digits) * unit;
}

/** A knob on a measured quantity. */
export function measureKnob(options: MeasureOptions): Knob {
  const { key, label, kind, scale, least, most, get, put, show, check } = options;
  const turn = (member: Member, value: number, units: Units): Turn => {
    const changed = put(member, value);
    const fault = check?.(changed, member, units) ?? null;
    return fault === null ? { member: changed } : { fault };
  };
  const name = options.name ?? label;
  const range = (units: Units) => `${name} runs from ${show(least, units)} to ${show(most, units)}`;
  return {
    key,
    label,
    show: (member, units) => show(get(member), units),
    nudge(member, direction, step, units) {
      const now = get(member);
      const { unit } = scale[units];
      const moved = tidyQuantity(kind, stepped(now, direction * scale[units][step], unit), units);
      const next = Math.min(most, Math.max(least, moved));
      // A value outside the range may still be brought towards it, never further out.
      if (next === now || next > now !== direction > 0) return { fault: range(units) };
      return turn(member, next, units);
    },
    enter(member, text, units) {
      const parsed = parseQuantity(
        kind,
        text.replace(/^\s*l\s*\/\s*/i, kind === 'number' ? '' : '$&'),
        scale[units].bare || undefined,
      );
      if (!parsed.ok) return { fault: parsed.fault };
      if (parsed.value < least || parsed.value > most) return { fault: range(units) };
      return turn(member, parsed.value, units);
    },
    hint: (units) => scale[units].hint,
    stepText: (units) => scale[units].stepText,
    number: { kind, get, put, least, most, axisUnit: (units) => scale[units].axis ?? scale[units].unit },
  };
}

export interface ChoiceOptions<T> {
  readonly key: string;
  readonly label: string;
  /** From the least to the most; may depend on the member (the grades of its species). */
  choices(member: Member): readonly T[];
  get(member: Member): T;
  put(member: Member, choice: T): Member;
  show(choice: T, units: Units): string;
  /** Reads a typed choice that is not on the list; null when it cannot be one. */
  read?(text: string, units: Units, member: Member): T | null;
  /** Why the changed member cannot be; null when it can. */
  check?(changed: Member, before: Member): string | null;
  readonly stepText?: string;
}

/** A knob on a list of choices; typing takes a choice by its name or the beginning of it. */
export function choiceKnob<T>(options: ChoiceOptions<T>): Knob {
  const { key, label, choices, get, put, show, read, check } = options;
  const turn = (member: Member, choice: T): Turn => {
    const changed = put(member, choice);
    const fault = check?.(changed, member) ?? null;
    return fault === null ? { member: changed } : { fault };
  };
  return {
    key,
    label,
    show: (member, units) => show(get(member), units),
    nudge(member, direction, step, units) {
      const list = choices(member);
      const now = list.indexOf(get(member));
      if (step === 'coarse') {
        const end = direction > 0 ? list.length - 1 : 0;
        return now === end ? endFault(label, list, direction, show, units) : turn(member, list[end]!);
      }
      const next = now + direction;
      if (now < 0) return turn(member, list[direction > 0 ? 0 : list.length - 1]!);
      if (next < 0 || next >= list.length) return endFault(label, list, direction, show, units);
      return turn(member, list[next]!);
    },
    enter(member, text, units) {
      const wanted = plain(text);
      const list = choices(member);
      const found =
        list.find((choice) => plain(show(choice, units)) === wanted) ??
        list.find((choice) => wanted !== '' && plain(show(choice, units)).startsWith(wanted));
      if (found !== undefined) return turn(member, found);
      const own = read?.(text, units, member) ?? null;
      if (own !== null) return turn(member, own);
      return { fault: `${label} is one of ${list.map((choice) => show(choice, units)).join(', ')}` };
    },
    hint: () => 'the name or its beginning',
    stepText: () => options.stepText ?? 'one on',
    number: null,
  };
}

function plain(text: string): string {
  return text.toLowerCase().replace(/[^a-z0-9.+-]/g, '');
}

function endFault<T>(
  label: string,
  list: readonly T[],
  direction: 1 | -1,
  show: (choice: T, units: Units) => string,
  units: Units,
): Turn {
  const end = list[direction > 0 ? list.length - 1 : 0];
  return {
    fault:
      end === undefined
        ? `${label} has no other choice here`
        : `${show(end, units)} is the ${direction > 0 ? 'last' : 'first'} ${label}`,
  };
}
