import { liftsOf, loadsOf, reactionRange } from '../../loads/index.ts';
import { parseQuantity, showInches, showQuantity, type Units } from '../../quantity/index.ts';
import { beamFields, supportPlaces } from '../../statics/index.ts';
import { sectionWeight } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { type Knob, measureKnob, SCALES, type Turn } from './knob.ts';

const SHORTEST = 0.5;
const LONGEST = 24;

const isBetween = (length: number) => length >= SHORTEST && length <= LONGEST;

function withBearing(member: Member, bearing: readonly number[]): Member {
  return { ...member, bearing, assumed: member.assumed.filter((each) => each !== 'bearing') };
}

/** The bearings as one: a nudge moves each of them as far; one typed length is for all, a list one for each. */
const all = measureKnob({
  key: 'bearing',
  label: 'bearing',
  kind: 'length',
  scale: SCALES.section,
  least: SHORTEST,
  most: LONGEST,
  get: (member) => member.bearing[0]!,
  put: (member, value) => {
    const by = value - member.bearing[0]!;
    return withBearing(
      member,
      member.bearing.map((length) => Math.min(LONGEST, Math.max(SHORTEST, length + by))),
    );
  },
  show: showInches,
});

const BEARING: Knob = {
  ...all,
  show: ({ bearing }, units) => {
    const [least, most] = [Math.min(...bearing), Math.max(...bearing)];
    return least === most ? showInches(least, units) : 'by support';
  },
  enter(member, text, units) {
    const list = text
      .split(/[,;]/)
      .map((part) => part.trim())
      .filter((part) => part !== '');
    if (list.length > 1) return enterList(member, list, units);
    const turn = all.enter(member, text, units);
    if ('fault' in turn) return turn;
    return {
      member: withBearing(
        member,
        member.bearing.map(() => turn.member.bearing[0]!),
      ),
    };
  },
  hint: (units) =>
    `${SCALES.section[units].hint}; or one for each: ${units === 'us' ? '3.5, 5.5' : '90, 140'}`,
};

function enterList(member: Member, list: readonly string[], units: Units): Turn {
  const count = member.bearing.length;
  if (list.length !== count) {
    return {
      fault: `${list.length} lengths for ${count} support${count === 1 ? '' : 's'}: one for each, or one for all`,
    };
  }
  const bearing: number[] = [];
  for (const text of list) {
    const parsed = parseQuantity('length', text, SCALES.section[units].bare);
    if (!parsed.ok) return { fault: parsed.fault };
    if (!isBetween(parsed.value)) {
      return { fault: `bearing runs from ${showInches(SHORTEST, units)} to ${showInches(LONGEST, units)}` };
    }
    bearing.push(parsed.value);
  }
  return { member: withBearing(member, bearing) };
}

function bearingAt(support: number): Knob {
  return measureKnob({
    key: `bearing.${support}`,
    label: `bearing ${support + 1}`,
    kind: 'length',
    scale: SCALES.section,
    least: SHORTEST,
    most: LONGEST,
    get: (member) => member.bearing[support]!,
    put: (member, value) =>
      withBearing(
        member,
        member.bearing.map((length, at) => (at === support ? value : length)),
      ),
    show: showInches,
  });
}

/** The force that holds one support down. */
function tieDown(support: number): Knob {
  return measureKnob({
    key: `tiedDown.${support}`,
    label: `tie-down ${support + 1}`,
    kind: 'pointLoad',
    scale: SCALES.pointLoad,
    least: 0,
    most: 1e6,
    get: (member) => member.tiedDown?.[support] ?? 0,
    put: (member, value) => ({
      ...member,
      tiedDown: supportPlaces(member.beam).map((_, at) =>
        at === support ? value : (member.tiedDown?.[at] ?? 0),
      ),
    }),
    show: (value, units) => (value === 0 ? 'untied' : showQuantity('pointLoad', value, units)),
  });
}

/** The bearings as one, and the tie-downs of the supports that lift. */
export function supportKnobs(member: Member): Knob[] {
  const lifted = liftedSupports(member);
  return [BEARING, ...lifted.flatMap((lifts, support) => (lifts ? [tieDown(support)] : []))];
}

/** Each bearing by itself, where there is more than one. */
export function bearingKnobs(member: Member): Knob[] {
  return member.bearing.length < 2 ? [] : member.bearing.map((_, support) => bearingAt(support));
}

/** A reaction this small against the largest is no uplift but rounding. */
const NO_UPLIFT = 1e-9;
const KNOWN = new WeakMap<Member, readonly boolean[]>();

/** Which supports turn upward in some combination, or have a tie-down stated. */
function liftedSupports(member: Member): readonly boolean[] {
  const known = KNOWN.get(member);
  if (known !== undefined) return known;
  const stated = supportPlaces(member.beam).map((_, at) => (member.tiedDown?.[at] ?? 0) > 0);
  const lifts = couldLift(member) ? upliftsOf(member) : [];
  const lifted = stated.map((is, at) => is || (lifts[at] ?? false));
  KNOWN.set(member, lifted);
  return lifted;
}

/** Under nothing but downward loads a single span presses on both its supports. */
function couldLift(member: Member): boolean {
  const { beam, area } = member;
  const upward = [...loadsOf(member), ...liftsOf(member)].some((load) =>
    load.kind === 'windUp' ? true : (load.type === 'point' ? load.load : Math.min(load.start, load.end)) < 0,
  );
  return upward || area.windUp > 0 || beamFields(beam).length > 1;
}

function upliftsOf(member: Member): boolean[] {
  const weight = member.selfWeight ? sectionWeight(member, member.section) : 0;
  const ranges = reactionRange(member, Number.isFinite(weight) ? weight : 0);
  const largest = Math.max(...ranges.map(({ max, min }) => Math.max(max, -min)));
  return ranges.map(({ min }) => min < -NO_UPLIFT * largest);
}
