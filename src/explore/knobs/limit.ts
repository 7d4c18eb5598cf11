import { parseQuantity, showInches, showQuantity, type Units } from '../../quantity/index.ts';
import { beamLength } from '../../statics/beam.ts';
import { checkChange, standingDepth, standingWidth } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { choiceKnob, type Knob, measureKnob, SCALES, type Turn } from './knob.ts';

const FOOT = 12;

/** Notches at the ends, what counts as a choice, and how much of the floor live load counts. */
export function limitKnobs(member: Member): Knob[] {
  return [...NOTCHES, MAX_DEPTH, MAX_WIDTH, LIVE_REDUCTION, ...(member.liveReduction === null ? [] : [KLL])];
}

const DEEPEST_NOTCH = 12;
const NOTCH_SCALE = {
  us: {
    ...SCALES.section.us,
    fine: 0.0625,
    normal: 0.25,
    coarse: 1,
    hint: '1, 3/4", 20mm',
    stepText: '1/4"',
  },
  si: { ...SCALES.section.si, fine: 1, normal: 5, coarse: 25, hint: '20, 20mm, 3/4"', stepText: '5 mm' },
};

/** On the tension face at an end; one that is too deep for the product is refused with its clause. */
export const NOTCHES: readonly Knob[] = (['left', 'right'] as const).map((side) =>
  measureKnob({
    key: `notch.${side}`,
    label: `notch ${side}`,
    kind: 'length',
    scale: NOTCH_SCALE,
    least: 0,
    most: DEEPEST_NOTCH,
    get: (member) => member.notch[side],
    put: (member, value) => ({ ...member, notch: { ...member.notch, [side]: value } }),
    show: (value, units) => (value === 0 ? 'none' : showInches(value, units)),
    check: checkChange,
  }),
);

interface Bound {
  readonly key: 'maxDepth' | 'maxWidth';
  readonly label: string;
  readonly least: number;
  readonly most: number;
  now(member: Member): number;
}

/** A bound that may be none: none is more than any, and a nudge down from it begins at what stands there now. */
function bound({ key, label, least, most, now }: Bound): Knob {
  const put = (member: Member, value: number | null): Member => ({ ...member, [key]: value });
  const lengths = measureKnob({
    key,
    label,
    kind: 'length',
    scale: SCALES.section,
    least,
    most,
    get: (member) => member[key] ?? now(member),
    put,
    show: showInches,
  });
  return {
    ...lengths,
    number: null,
    show: (member, units) => (member[key] === null ? 'none' : showInches(member[key], units)),
    nudge(member, direction, step, units) {
      if (member[key] !== null) {
        const turn = lengths.nudge(member, direction, step, units);
        return 'fault' in turn && direction > 0 ? { member: put(member, null) } : turn;
      }
      if (direction > 0) return { fault: `${label}: none is the most there is` };
      return { member: put(member, Math.min(most, Math.max(least, now(member)))) };
    },
    enter: (member, text, units) =>
      isNone(text) ? { member: put(member, null) } : lengths.enter(member, text, units),
    hint: (units) => `none, ${SCALES.section[units].hint}`,
  };
}

function isNone(text: string): boolean {
  return /^\s*(none|no|off|-)\s*$/i.test(text);
}

const MAX_DEPTH = bound({
  key: 'maxDepth',
  label: 'max depth',
  least: 1.5,
  most: 60,
  now: (member) => standingDepth(member.section),
});

const MAX_WIDTH = bound({
  key: 'maxWidth',
  label: 'max width',
  least: 0.75,
  most: 24,
  now: (member) => standingWidth(member.section),
});

const AREA = {
  us: { unit: FOOT ** 2, fine: 5, normal: 25, coarse: 250, bare: 'ft2', hint: '600, 600ft2, 56m2' },
  si: { unit: (1000 / 25.4) ** 2, fine: 0.5, normal: 2.5, coarse: 25, bare: 'm2', hint: '56, 56m2, 600ft2' },
};
const LEAST_AREA = FOOT ** 2;
/** Far beyond where the reduction has reached its half. */
const MOST_AREA = 2e4 * FOOT ** 2;
/** Interior beams (ASCE 7 Table 4.7-1): what a reduction begins with. */
const USUAL_KLL = 2;

/** Tributary area AT of the floor live-load reduction (ASCE 7 4.7); none: the load counts whole. */
const LIVE_REDUCTION: Knob = {
  key: 'liveReduction.area',
  label: 'live reduced, AT',
  show: ({ liveReduction }, units) =>
    liveReduction === null ? 'no' : showQuantity('area', liveReduction.area, units),
  nudge(member, direction, step, units): Turn {
    const { liveReduction } = member;
    const { unit, [step]: by } = AREA[units];
    if (liveReduction === null) {
      if (direction < 0) return { fault: 'live reduced: the load counts whole already' };
      return areaPut(member, Math.max(LEAST_AREA, member.tributary * beamLength(member.beam)));
    }
    const next = (Math.round((liveReduction.area / unit) * 1e6) / 1e6 + direction * by) * unit;
    if (next < LEAST_AREA) return { member: { ...member, liveReduction: null } };
    if (next > MOST_AREA)
      return { fault: `live reduced, AT: at most ${showQuantity('area', MOST_AREA, units)}` };
    return areaPut(member, next);
  },
  enter(member, text, units: Units): Turn {
    if (isNone(text)) return { member: { ...member, liveReduction: null } };
    const parsed = parseQuantity('area', text, AREA[units].bare);
    if (!parsed.ok) return { fault: parsed.fault };
    const { value } = parsed;
    if (value < LEAST_AREA || value > MOST_AREA) {
      const [least, most] = [LEAST_AREA, MOST_AREA].map((area) => showQuantity('area', area, units));
      return { fault: `live reduced, AT: runs from ${least} to ${most}, or none` };
    }
    return areaPut(member, value);
  },
  hint: (units) => `none, ${AREA[units].hint}`,
  stepText: (units) => `${AREA[units].normal} ${AREA[units].bare}`,
  number: null,
};

function areaPut(member: Member, area: number): Turn {
  const KLL = member.liveReduction?.KLL ?? USUAL_KLL;
  return { member: { ...member, liveReduction: { area, KLL } } };
}

/** Live-load element factor (ASCE 7 Table 4.7-1): 2 for interior beams, 1 for cantilevers and the like. */
const KLL: Knob = choiceKnob<number>({
  key: 'liveReduction.KLL',
  label: 'KLL',
  choices: () => [1, 2],
  get: (member) => member.liveReduction?.KLL ?? USUAL_KLL,
  put: (member, value) => ({
    ...member,
    liveReduction: member.liveReduction === null ? null : { ...member.liveReduction, KLL: value },
  }),
  show: (value) => String(value),
});
