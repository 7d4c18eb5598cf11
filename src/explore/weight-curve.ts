import { sectionWeight } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { placeFault } from './beam-edits/placed.ts';
import { alongOf } from './handovers/along.ts';
import type { NumberKnob } from './knobs/knob.ts';
import type { Ranking } from './rack/best.ts';

/** Weights along a knob, lb/in; NaN where there is none. */
export interface WeightCurve {
  /** Of the member's own size. */
  readonly own: readonly number[];
  /** Of the best size that passes and can be had. */
  readonly best: readonly number[];
}

/** The weights of a member's own size and of the best that passes, at equal steps of a knob from `from` to `to` (base units). */
export function weightCurve(
  member: Member,
  knob: NumberKnob,
  ranking: Ranking,
  from: number,
  to: number,
  samples: number,
): WeightCurve {
  const along = alongOf(member, knob.put, ranking);
  const weights = along.sizes.map((size) =>
    sectionWeight({ ...member, stock: size.stock }, { ...size, flat: false }),
  );
  const own: number[] = [];
  const best: number[] = [];
  for (let at = 0; at < samples; at += 1) {
    const value = from + ((to - from) * at) / (samples - 1);
    const turned = knob.put(member, value);
    const fits = placeFault(turned) === null;
    own.push(fits ? sectionWeight(turned, turned.section) : Number.NaN);
    best.push(fits ? (weights[along.read(value).lit] ?? Number.NaN) : Number.NaN);
  }
  return { own, best };
}
