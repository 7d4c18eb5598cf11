import type { AppliedLoad, Placed } from '../../loads/index.ts';
import type { LoadKind } from '../../loads/kinds.ts';
import { KIND_WORD, LOAD_KINDS } from '../../loads/kinds.ts';
import { fromUnit, type Units } from '../../quantity/index.ts';
import { beamFields, beamLength, MOST_LOADS, MOST_SPANS, supportPlaces } from '../../statics/index.ts';
import { checkStock } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { cutOut } from './cut-out.ts';
import { placedOn, placeFault, withPlaces } from './placed.ts';
import { resized, same } from './resize-field.ts';

/** What an edit of the beam gives: the changed member and the knob to take in hand, or why it stays as it was. */
export type Edit = { readonly member: Member; readonly knob: string } | { readonly fault: string };

export type Side = 'left' | 'right';

/** Nothing leaves here that cannot be worked out, nor with a rule broken that held before (a notch at an overhang). */
function settled(before: Member, member: Member, knob: string): Edit {
  const fault = placeFault(member) ?? (checkStock(before) === null ? checkStock(member) : null);
  return fault === null ? { member, knob } : { fault };
}

/** Another span at the right as long as the last; an overhang there and what it carries move out with the support. */
export function addSpan(member: Member): Edit {
  const { beam } = member;
  if (beam.supports === 'cantilever') return { fault: 'a cantilever has one span: put it on bearings first' };
  if (beam.spans.length >= MOST_SPANS) return { fault: `a member has at most ${MOST_SPANS} spans` };
  const support = supportPlaces(beam).at(-1)!;
  const whole = beamLength(beam);
  const length = beam.spans.at(-1)!;
  const beyond = (x: number) => x > support && !same(x, support);
  const move = <T extends Placed>(load: T): T => {
    if (load.type === 'point') return beyond(load.at) ? { ...load, at: load.at + length } : load;
    const follows = beyond(load.to) || (same(load.from, 0) && same(load.to, whole));
    const begins = beyond(load.from) || (same(load.from, support) && beyond(load.to));
    return { ...load, from: load.from + (begins ? length : 0), to: load.to + (follows ? length : 0) };
  };
  const changed: Member = {
    ...withPlaces(member, move),
    beam: { ...beam, spans: [...beam.spans, length] },
    bearing: [...member.bearing, member.bearing.at(-1)!],
    tiedDown: member.tiedDown && [...member.tiedDown, 0],
  };
  return settled(member, changed, `spans.${beam.spans.length}`);
}

/** What a new overhang has of the span beside it, as decks have (common practice, no source). */
const OVERHANG_SHARE = 1 / 4;
const OVERHANG_STEP: Readonly<Record<Units, number>> = { us: 3, si: fromUnit('length', 50, 'mm') };

/** An overhang of a quarter of the span beside it. */
export function addOverhang(member: Member, side: Side, units: Units): Edit {
  const { beam } = member;
  if (beam.supports === 'cantilever') {
    return { fault: 'a cantilever has no overhangs: lengthen its span, which is free' };
  }
  if (beam.overhangs[side] > 0) return { fault: `there is an overhang at the ${side} already` };
  const step = OVERHANG_STEP[units];
  const span = side === 'left' ? beam.spans[0]! : beam.spans.at(-1)!;
  const length = Math.max(1, Math.round((span * OVERHANG_SHARE) / step)) * step;
  return settled(member, resized(member, side, length), `overhangs.${side}`);
}

/** One arm held against rotation at its left end in place of two bearings, or the other way round. */
export function setSupports(member: Member, supports: 'bearings' | 'cantilever'): Edit {
  const { beam } = member;
  if (beam.supports === supports) return { member, knob: 'spans.0' };
  if (supports === 'cantilever') {
    if (beam.spans.length > 1) return { fault: `a cantilever has one span, not ${beam.spans.length}` };
    if (beam.overhangs.left > 0 || beam.overhangs.right > 0) {
      return { fault: 'a cantilever has no overhangs: take them out first' };
    }
  }
  const per = <T>(list: readonly T[], other: T): T[] =>
    supports === 'cantilever' ? [list[0]!] : [list[0]!, other];
  const changed: Member = {
    ...member,
    beam: { ...beam, supports, fixed: { left: false, right: false } },
    bearing: per(member.bearing, member.bearing[0]!),
    tiedDown: member.tiedDown && per(member.tiedDown, 0),
  };
  return settled(member, changed, 'spans.0');
}

/** An end bearing held against rotation too, or let go. */
export function setFixed(member: Member, side: Side, fixed: boolean): Edit {
  const { beam } = member;
  if (beam.supports === 'cantilever') {
    return { fault: `a cantilever is held at its left end and free at its right` };
  }
  const changed = { ...member, beam: { ...beam, fixed: { ...beam.fixed, [side]: fixed } } };
  return settled(member, changed, `fixed.${side}`);
}

/** Sizes that new loads begin with: round figures to be typed over (common practice, no source). */
const NEW_POINT: Readonly<Record<Units, number>> = { us: 1000, si: fromUnit('pointLoad', 5, 'kN') };
const NEW_LINE: Readonly<Record<Units, number>> = {
  us: fromUnit('lineLoad', 100, 'plf'),
  si: fromUnit('lineLoad', 1.5, 'kN/m'),
};

/** Where a new load goes. */
export type NewLoad = 'point' | 'whole line' | 'partial line' | 'tapered line';

/**
 * A load of one kind at its usual size. A point load stands in the middle of the field of the knob in hand, on an
 * overhang or a cantilever at its free end; a partial line covers that field, half of it where there is no other.
 */
export function addLoad(member: Member, what: NewLoad, kind: LoadKind, inHand: string, units: Units): Edit {
  if (placedOn(member).length >= MOST_LOADS)
    return { fault: `a member carries at most ${MOST_LOADS} loads: take one out first` };
  const { beam } = member;
  const fields = beamFields(beam);
  const field = fields[fieldInHand(member, inHand)]!;
  const end = field.start + field.length;
  const size = what === 'point' ? NEW_POINT[units] : NEW_LINE[units];
  const line = (from: number, to: number, start = size): AppliedLoad => {
    return { type: 'line', kind, from, to, start, end: size };
  };
  let load: AppliedLoad;
  if (what === 'point') {
    const isLeft = field.start === 0 && beam.supports === 'bearings';
    const tip = isLeft ? 0 : end;
    load = {
      type: 'point',
      kind,
      at: field.kind === 'overhang' ? tip : field.start + field.length / 2,
      load: size,
    };
  } else if (what === 'whole line') load = line(0, beamLength(beam));
  else if (what === 'tapered line') load = line(field.start, end, 0);
  else load = line(field.start, fields.length === 1 ? field.start + field.length / 2 : end);
  const changed = { ...member, loads: [...member.loads, load] };
  return settled(member, changed, `loads.${member.loads.length}.${what === 'point' ? 'point' : 'line'}`);
}

/** Least design wind pressure on components, either way: 16 psf, 0.77 kN/m² (ASCE 7-16 30.2.2, from memory). */
const NEW_WIND: Readonly<Record<Units, number>> = {
  us: fromUnit('areaLoad', 16, 'psf'),
  si: fromUnit('areaLoad', 0.77, 'kPa'),
};

/** Wind on the area that the member carries. */
export function addWind(member: Member, kind: 'wind' | 'windUp', units: Units): Edit {
  const changed = { ...member, area: { ...member.area, [kind]: NEW_WIND[units] } };
  return settled(member, changed, `area.${kind}`);
}

/** Index of the field that a knob is about: its own span or overhang, that of its load or link, else the first span. */
export function fieldInHand(member: Member, knob: string): number {
  const { beam } = member;
  const fields = beamFields(beam);
  const leading = beam.supports === 'bearings' && beam.overhangs.left > 0 ? 1 : 0;
  const [group, part] = knob.split('.');
  if (group === 'spans') return Math.min(fields.length - 1, leading + Number(part));
  if (group === 'overhangs') return part === 'left' ? 0 : fields.length - 1;
  const list: readonly Placed[] | undefined =
    group === 'loads' ? member.loads : group === 'links' ? member.links : undefined;
  const load = list?.[Number(part)];
  if (load === undefined) return leading;
  const at = load.type === 'point' ? load.at : (load.from + load.to) / 2;
  const found = fields.findIndex((field) => at <= field.start + field.length);
  return found < 0 ? fields.length - 1 : found;
}

/** Takes out what a knob stands for: a load, a link, a span, an overhang, a tie-down, the hold of a fixed end, an area load. */
export function removeAt(member: Member, knob: string, label: string): Edit {
  const [group, part] = knob.split('.') as [string, string];
  switch (group) {
    case 'loads':
      return removeLoad(member, Number(part));
    case 'links':
      return removeLink(member, Number(part));
    case 'spans':
      return removeSpan(member, Number(part));
    case 'overhangs':
      return removeOverhang(member, part as Side);
    case 'fixed':
      return member.beam.fixed[part as Side]
        ? setFixed(member, part as Side, false)
        : { fault: `the ${part} end is not held against rotation` };
    case 'tiedDown':
      return removeTieDown(member, Number(part));
    case 'area':
      return removeArea(member, part as LoadKind);
    default:
      return { fault: `Delete takes out a span, overhang or load; ${label} can only be changed` };
  }
}

function removeLoad(member: Member, index: number): Edit {
  const loads = member.loads.filter((_, at) => at !== index);
  const next = Math.min(index, loads.length - 1);
  return settled(member, { ...member, loads }, next < 0 ? 'spans.0' : `loads.${next}.kind`);
}

function removeLink(member: Member, index: number): Edit {
  const links = (member.links ?? []).filter((_, at) => at !== index);
  const next = Math.min(index, links.length - 1);
  return settled(member, { ...member, links }, next < 0 ? 'spans.0' : `links.${next}`);
}

/** Closes the member up: what stood in the span goes, what stood beyond it moves in. */
function removeSpan(member: Member, index: number): Edit {
  const { beam } = member;
  if (beam.spans.length === 1) return { fault: 'the last span stays: a member needs at least one' };
  const places = supportPlaces(beam);
  // At the left end its own support goes, elsewhere the one at the span's right.
  const gone = index === 0 ? 0 : index + 1;
  const without = <T>(list: readonly T[]): T[] => list.filter((_, at) => at !== gone);
  const spans = beam.spans.filter((_, at) => at !== index);
  const changed: Member = {
    ...member,
    beam: { ...beam, spans },
    ...withoutStretch(member, places[index]!, places[index + 1]!),
    bearing: without(member.bearing),
    tiedDown: member.tiedDown && without(member.tiedDown),
  };
  return settled(member, changed, `spans.${Math.min(index, spans.length - 1)}`);
}

function withoutStretch(
  { beam, links, loads }: Member,
  from: number,
  to: number,
): Pick<Member, 'loads' | 'links'> {
  const cut = <T extends Placed>(list: readonly T[]) => cutOut(list, from, to, beamLength(beam));
  return links === undefined ? { loads: cut(loads) } : { loads: cut(loads), links: cut(links) };
}

function removeOverhang(member: Member, side: Side): Edit {
  const { beam } = member;
  const whole = beamLength(beam);
  const places = supportPlaces(beam);
  const [from, to] = side === 'left' ? [0, places[0]!] : [places.at(-1)!, whole];
  const changed: Member = {
    ...member,
    beam: { ...beam, overhangs: { ...beam.overhangs, [side]: 0 } },
    ...withoutStretch(member, from, to),
  };
  return settled(member, changed, side === 'left' ? 'spans.0' : `spans.${beam.spans.length - 1}`);
}

function removeTieDown(member: Member, index: number): Edit {
  if (!(member.tiedDown?.[index] ?? 0))
    return { fault: `support ${index + 1} is untied: there is no tie-down to take off` };
  const tiedDown = member.tiedDown!.map((force, at) => (at === index ? 0 : force));
  const changed = { ...member, tiedDown: tiedDown.some((force) => force > 0) ? tiedDown : null };
  return settled(member, changed, `tiedDown.${index}`);
}

function removeArea(member: Member, kind: LoadKind): Edit {
  if (!LOAD_KINDS.includes(kind) || member.area[kind] === 0) {
    return { fault: `there is no ${KIND_WORD[kind] ?? kind} load on the area to take off` };
  }
  return settled(member, { ...member, area: { ...member.area, [kind]: 0 } }, `area.${kind}`);
}
