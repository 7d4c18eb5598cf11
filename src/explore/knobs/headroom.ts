import { fromUnit, showInches, showSpan, type Units } from '../../quantity/index.ts';
import type { Headroom, Member } from '../../timber/member.ts';
import { LONGEST } from './beam.ts';
import { choiceKnob, type Knob, measureKnob, SCALES } from './knob.ts';

/**
 * A storey to begin with: common practice, no source; the clear height is the least of a habitable room (IRC R305.1,
 * from memory).
 */
const USUAL: Readonly<Record<Units, Headroom>> = {
  us: { floorToFloor: 108, clear: 84, floor: 1.5, joists: 9.25, ceiling: 0.625, beam: 'dropped' },
  si: {
    floorToFloor: mm(2750),
    clear: mm(2150),
    floor: mm(40),
    joists: mm(235),
    ceiling: mm(15),
    beam: 'dropped',
  },
};

function mm(amount: number): number {
  return fromUnit('length', amount, 'mm');
}

/** The member in a storey to be typed over; as it is where it stands in one already. */
export function withHeadroom(member: Member, units: Units): Member {
  return member.headroom == null ? { ...member, headroom: USUAL[units] } : member;
}

/** The knobs of the storey that a member stands in; none where none is stated (`withHeadroom` states one). */
export function headroomKnobs(member: Member): readonly Knob[] {
  return member.headroom == null ? [] : KNOBS;
}

type Height = Exclude<keyof Headroom, 'beam'>;

function heightKnob(key: Height, label: string, tall: boolean): Knob {
  return measureKnob({
    key: `headroom.${key}`,
    label,
    kind: 'length',
    scale: tall ? SCALES.span : SCALES.section,
    least: 0,
    most: LONGEST,
    get: ({ headroom }) => headroom?.[key] ?? 0,
    put: (member, value) =>
      member.headroom == null ? member : { ...member, headroom: { ...member.headroom, [key]: value } },
    show: tall ? showSpan : showInches,
  });
}

const KNOBS: readonly Knob[] = [
  heightKnob('floorToFloor', 'floor to floor', true),
  heightKnob('clear', 'clear wanted', true),
  heightKnob('floor', 'floor above', false),
  heightKnob('joists', 'joists', false),
  heightKnob('ceiling', 'ceiling', false),
  choiceKnob<Headroom['beam']>({
    key: 'headroom.beam',
    label: 'beam is',
    choices: () => ['dropped', 'flush'],
    get: ({ headroom }) => headroom?.beam ?? 'dropped',
    put: (member, value) =>
      member.headroom == null ? member : { ...member, headroom: { ...member.headroom, beam: value } },
    show: (value) => value,
  }),
];
