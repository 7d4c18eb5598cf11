import { showSpan, type Units } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';
import { type Edit, type Side, setFixed, setSupports } from '../beam-edits/edit-beam.ts';
import { placeFault } from '../beam-edits/placed.ts';
import { type FieldKey, resized, resizeFault } from '../beam-edits/resize-field.ts';
import { choiceKnob, type Knob, measureKnob, SCALES, type Turn } from './knob.ts';

const FOOT = 12;
/** Longest length worth exploring; reach stops here too. */
export const LONGEST = 100 * FOOT;
const SHORTEST = 1 * FOOT;
/** An overhang of no length is taken out, not nudged away. */
const SHORTEST_OVERHANG = 1;

/** Overhangs and spans as they lie, from left to right. */
export function lengthKnobs(member: Member): Knob[] {
  const { beam } = member;
  const several = beam.spans.length > 1;
  const single = beam.supports === 'cantilever' ? 'cantilever' : 'span';
  const overhang = (side: Side) =>
    beam.supports === 'bearings' && beam.overhangs[side] > 0
      ? [fieldKnob(side, `overhangs.${side}`, `overhang ${side}`, SHORTEST_OVERHANG)]
      : [];
  return [
    ...overhang('left'),
    ...beam.spans.map((_, index) =>
      fieldKnob(index, `spans.${index}`, several ? `span ${index + 1}` : single, SHORTEST),
    ),
    ...overhang('right'),
  ];
}

/** A load that the shortened member would no longer reach stops the nudge. */
function fieldKnob(field: FieldKey, key: string, label: string, least: number): Knob {
  const get = ({ beam }: Member) => (typeof field === 'number' ? beam.spans[field]! : beam.overhangs[field]);
  return measureKnob({
    key,
    label,
    kind: 'length',
    scale: SCALES.span,
    least,
    most: LONGEST,
    get,
    put: (member, value) => resized(member, field, value),
    show: showSpan,
    check: (after, before, units) =>
      resizeFault(before, field, get(after), (length) => showSpan(length, units)) ?? placeFault(after),
  });
}

/** How the member is held at its ends, and its slope. */
export function endKnobs(member: Member): Knob[] {
  const { beam } = member;
  const couldBeArm = beam.spans.length === 1 && beam.overhangs.left === 0 && beam.overhangs.right === 0;
  return [
    ...(couldBeArm ? [SUPPORTS] : []),
    ...(beam.supports === 'bearings' ? [FIXED_LEFT, FIXED_RIGHT] : []),
    SLOPE,
  ];
}

/** A choice that is made by an edit of the beam: its refusal is the knob's. */
function editKnob<T extends string | boolean>(options: {
  readonly key: string;
  readonly label: string;
  readonly choices: readonly T[];
  get(member: Member): T;
  edit(member: Member, choice: T): Edit;
  show(choice: T): string;
}): Knob {
  const knob = choiceKnob<T>({
    ...options,
    choices: () => options.choices,
    put: (member, choice) => {
      const edit = options.edit(member, choice);
      return 'fault' in edit ? member : edit.member;
    },
  });
  // The knob takes the very edit that `a` and Delete make; where that is refused nothing has changed.
  const reasoned = (turn: Turn, member: Member): Turn => {
    if ('fault' in turn || turn.member !== member) return turn;
    const other = options.choices.find((choice) => choice !== options.get(member))!;
    const edit = options.edit(member, other);
    return 'fault' in edit ? edit : turn;
  };
  return {
    ...knob,
    nudge: (member, ...by) => reasoned(knob.nudge(member, ...by), member),
    enter: (member, ...by) => reasoned(knob.enter(member, ...by), member),
  };
}

const SUPPORTS = editKnob({
  key: 'supports',
  label: 'stands on',
  choices: ['bearings', 'cantilever'] as const,
  get: (member) => member.beam.supports,
  edit: setSupports,
  show: (choice) => choice,
});

function fixedKnob(side: Side): Knob {
  return editKnob<boolean>({
    key: `fixed.${side}`,
    label: `${side} end`,
    choices: [false, true],
    get: (member) => member.beam.fixed[side],
    edit: (member, fixed) => setFixed(member, side, fixed),
    show: (fixed) => (fixed ? 'fixed' : 'turns'),
  });
}

const FIXED_LEFT = fixedKnob('left');
const FIXED_RIGHT = fixedKnob('right');

/** A slope is spoken of as the rise in a run of twelve. */
const RUN = 12;
/** The session file's steepest, 24 in 12. */
const STEEPEST = 24;
const NO_FRACTION = 1e6;
const RISE = {
  unit: 1,
  fine: 0.5,
  normal: 1,
  coarse: 10,
  bare: '',
  hint: '4:12, 4 for 4:12',
  stepText: '1:12',
};

const rises = measureKnob({
  key: 'slope',
  label: 'slope',
  kind: 'number',
  scale: { us: RISE, si: RISE },
  least: 0,
  most: STEEPEST,
  get: (member) => Math.round(member.slope * RUN * NO_FRACTION) / NO_FRACTION,
  put: (member, rise) => ({ ...member, slope: rise / RUN }),
  show: (rise) => (rise === 0 ? 'level' : `${Math.round(rise * 100) / 100}:${RUN}`),
});

const SLOPE: Knob = {
  ...rises,
  enter(member, text, units: Units) {
    if (/^\s*level\s*$/i.test(text)) return { member: { ...member, slope: 0 } };
    const parts = /^([^:]*):([^:]*)$/.exec(text);
    if (parts === null) return rises.enter(member, text, units);
    const [rise, run] = [Number(parts[1]), Number(parts[2])];
    if (!(rise >= 0 && run > 0)) return { fault: `"${text.trim()}" is no slope: write 4:12` };
    return rises.enter(member, String((rise * RUN) / run), units);
  },
};
