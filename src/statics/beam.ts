/**
 * A prismatic beam and what loads it, as plain values. Knows no wood and no load kinds.
 * Positions run from the left end of the whole member, overhang included. Downward loads are positive.
 */
export interface Beam {
  /** Spans between bearing centres, left to right, in. One to six. */
  readonly spans: readonly number[];
  /** Lengths beyond the end bearings, in; 0 where there is none. */
  readonly overhangs: { readonly left: number; readonly right: number };
  /** `cantilever`: one span, held against rotation at its left end, free at its right end. */
  readonly supports: 'bearings' | 'cantilever';
  /** End bearings also held against rotation. */
  readonly fixed: { readonly left: boolean; readonly right: boolean };
}

/** A load that varies linearly from `start` at `from` to `end` at `to`; lb/in and in. */
export interface LineLoad {
  readonly type: 'line';
  readonly from: number;
  readonly to: number;
  readonly start: number;
  readonly end: number;
}

/** A concentrated load, lb, at a place, in. */
export interface PointLoad {
  readonly type: 'point';
  readonly at: number;
  readonly load: number;
}

export type BeamLoad = LineLoad | PointLoad;

/** A stretch of the member that is judged as one: an overhang, a span, or the one arm of a cantilever. */
export interface Field {
  readonly kind: 'span' | 'overhang';
  /** Left end, in from the member's left end. */
  readonly start: number;
  /** in */
  readonly length: number;
}

/** Whole length of the member, in. */
export function beamLength(beam: Beam): number {
  return beam.overhangs.left + beam.spans.reduce((sum, span) => sum + span, 0) + beam.overhangs.right;
}

/** The fields of a beam, left to right. A cantilever's one span is an overhang field. */
export function beamFields(beam: Beam): Field[] {
  if (beam.supports === 'cantilever') return [{ kind: 'overhang', start: 0, length: beam.spans[0]! }];
  const fields: Field[] = [];
  let start = 0;
  const add = (kind: Field['kind'], length: number) => {
    if (length > 0) fields.push({ kind, start, length });
    start += length;
  };
  add('overhang', beam.overhangs.left);
  for (const span of beam.spans) add('span', span);
  add('overhang', beam.overhangs.right);
  return fields;
}

/** Places of the supports, in from the member's left end. A cantilever has one, at 0. */
export function supportPlaces(beam: Beam): number[] {
  if (beam.supports === 'cantilever') return [0];
  const places = [beam.overhangs.left];
  for (const span of beam.spans) places.push(places[places.length - 1]! + span);
  return places;
}
