import type { Placed } from '../../loads/index.ts';
import { type Beam, beamLength, supportPlaces } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';
import { placedOn, withPlaces } from './placed.ts';

/** A stretch of the beam by its key: a span by its index, an overhang by its side. */
export type FieldKey = number | 'left' | 'right';

/** Places that were summed in another unit are one when nearer than this, in. */
const HAIR = 1e-6;

export function same(a: number, b: number): boolean {
  return Math.abs(a - b) <= HAIR;
}

/** Where lines over whole spans begin and end: the member's ends and its supports, in, left to right. */
function edgesOf(beam: Beam): number[] {
  return [0, ...supportPlaces(beam), beamLength(beam)];
}

function fieldOf(beam: Beam, key: FieldKey): { readonly start: number; readonly length: number } {
  if (key === 'left') return { start: 0, length: beam.overhangs.left };
  if (key === 'right') {
    return { start: beamLength(beam) - beam.overhangs.right, length: beam.overhangs.right };
  }
  const before = beam.spans.slice(0, key).reduce((sum, span) => sum + span, beam.overhangs.left);
  return { start: before, length: beam.spans[key]! };
}

/**
 * The member with one span or overhang of another length, in. What stands beyond it moves along; a load in it keeps
 * its distance from the support at its left (in a left overhang, at its right); a line load that ran over the whole
 * field to the member's end still does. Look at `resizeFault` before: a load may be left beyond the field.
 */
export function resized(member: Member, key: FieldKey, length: number): Member {
  const { beam } = member;
  const { start, length: now } = fieldOf(beam, key);
  const by = length - now;
  const move =
    key === 'left' ? movedFromLeft(beam, by, now === 0) : movedFromRight(beam, start + now, by, now === 0);
  return { ...withPlaces(member, move), beam: withLength(beam, key, length) };
}

function withLength(beam: Beam, key: FieldKey, length: number): Beam {
  if (typeof key === 'number') {
    return { ...beam, spans: beam.spans.map((span, at) => (at === key ? length : span)) };
  }
  return { ...beam, overhangs: { ...beam.overhangs, [key]: length } };
}

type Move = <T extends Placed>(load: T) => T;

/** The left end moves out by `by`: all places, which are counted from it, grow. */
function movedFromLeft(beam: Beam, by: number, isNew: boolean): Move {
  const whole = beamLength(beam);
  const edges = edgesOf(beam);
  return (load) => {
    // Never below zero by the rounding of a sum.
    const moved = (x: number) => (same(x + by, 0) ? 0 : x + by);
    if (load.type === 'point') return { ...load, at: moved(load.at) };
    const ends = isNew ? same(load.to, whole) : edges.some((edge) => same(edge, load.to));
    const follows = same(load.from, 0) && ends;
    return { ...load, from: follows ? 0 : moved(load.from), to: moved(load.to) };
  };
}

/** Everything from `end` on moves by `by`; at the member's own end only lines over whole fields follow it. */
function movedFromRight(beam: Beam, end: number, by: number, isNew: boolean): Move {
  const last = same(end, beamLength(beam));
  const edges = edgesOf(beam);
  const moved = (x: number) => (x < end - HAIR ? x : x + by);
  return (load) => {
    if (load.type === 'point') return last ? load : { ...load, at: moved(load.at) };
    if (!last) return { ...load, from: moved(load.from), to: moved(load.to) };
    const begins = isNew ? same(load.from, 0) : edges.some((edge) => same(edge, load.from));
    return same(load.to, end) && begins ? { ...load, to: load.to + by } : load;
  };
}

/**
 * Why a field cannot have this length, in: a load that stands in it would be left beyond its end. Null when it can.
 * `show` writes a length for people.
 */
export function resizeFault(
  member: Member,
  key: FieldKey,
  length: number,
  show: (length: number) => string,
): string | null {
  const { beam } = member;
  const { start, length: now } = fieldOf(beam, key);
  if (length >= now) return null;
  const end = start + now;
  const after = placedOn(resized(member, key, length));
  // A load that comes to stand on an inner support would go with it from then on.
  const inner = key !== 'left' && !same(end, beamLength(beam));
  const most = start + length + (inner ? -HAIR : HAIR);
  for (const [index, { placed: load, name }] of placedOn(member).entries()) {
    const changed = after[index]!.placed;
    const places =
      load.type === 'point'
        ? [[load.at, changed.type === 'point' ? changed.at : 0] as const]
        : [
            [load.from, changed.type === 'line' ? changed.from : 0] as const,
            [load.to, changed.type === 'line' ? changed.to : 0] as const,
          ];
    for (const [was, is] of places) {
      const off =
        key === 'left' ? is < -HAIR : was > start + HAIR && same(was, is) && is > most && was < end + HAIR;
      if (off) return `${name} reaches ${show(was)} and would be left beyond the end: move it first`;
    }
  }
  return null;
}
