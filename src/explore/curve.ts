import { governingField, prepareResized } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { placeFault } from './beam-edits/placed.ts';
import type { Knob, NumberKnob } from './knobs/knob.ts';
import { powersOf } from './powers.ts';
import { ratiosLike } from './ratios.ts';
import { fieldKey } from './span-to-depth.ts';

/** Ratios of the three powers along a knob, at equal steps from `from` to `to` (base units). */
export interface Curve {
  readonly from: number;
  readonly to: number;
  /** One list a power, exponents 1, 2, 3; NaN where a check does not apply or a load would be off the member. */
  readonly ratios: readonly [readonly number[], readonly number[], readonly number[]];
}

export function curveOf(member: Member, knob: NumberKnob, from: number, to: number, samples: number): Curve {
  const along: [number[], number[], number[]] = [[], [], []];
  const ratios = ratiosLike(member);
  for (let at = 0; at < samples; at += 1) {
    const value = from + ((to - from) * at) / (samples - 1);
    const turned = knob.put(member, value);
    // At lengths that leave a load off the member there is nothing to draw.
    const fits = placeFault(turned) === null;
    const powers = fits ? powersOf(ratios(turned, (prepared) => prepareResized(prepared, turned))) : null;
    for (const [index, list] of along.entries()) list.push(powers?.[index]?.ratio ?? Number.NaN);
  }
  return { from, to, ratios: along };
}

/** The knob of the length that l/h goes by: what a chart is drawn against where the knob in hand is a choice. */
export function spanKnob(member: Member, knobs: readonly Knob[]): Knob {
  const key = fieldKey(member, governingField(member));
  return knobs.find((knob) => knob.key === key) ?? knobs[0]!;
}

/** Steps between the marks of an axis, in its units, and ten times, a hundred times those. */
const ROUND_STEPS = [1, 2, 4, 5];
/** Marks of an axis beside its first: its steps. */
const STEPS = 4;

/**
 * The stretch of a knob that a chart shows: five round marks, `unit` and its round multiples apart. The value
 * lies between the second and the fourth, and the stretch stays as it is while it does, so that a nudge moves
 * only the beads.
 */
export function chartRange(value: number, unit: number): { from: number; to: number } {
  const amount = value / unit;
  if (!(amount > 0)) return { from: 0, to: STEPS * 10 * unit };
  let step = 0;
  const decade = 10 ** Math.floor(Math.log10(amount / 2));
  for (const round of ROUND_STEPS) if (2 * round * decade <= amount * (1 + 1e-9)) step = round * decade;
  return { from: step * unit, to: (1 + STEPS) * step * unit };
}
