import { showSpanDown, type Units } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';
import { chartRange } from '../curve.ts';
import type { Knob, NumberKnob } from '../knobs/knob.ts';
import { knobsOf } from '../knobs/knobs.ts';
import { type Sweep, sweepsOf } from './sweep.ts';

/** A knob that can be swept, with how its values are read. */
export interface Swept {
  readonly knob: Knob & { readonly number: NumberKnob };
  readonly sweep: Sweep;
}

/** The knob of this key where it is a number that sizes go by; for a choice and for the section itself the first span. */
export function sweptOf(member: Member, key: string): Swept | null {
  return sweptBy(member, key) ?? sweptBy(member, 'spans.0');
}

function sweptBy(member: Member, key: string): Swept | null {
  const knob = knobsOf(member).find((each) => each.key === key);
  if (knob === undefined || knob.number === null || key.startsWith('section.')) return null;
  const sweep = sweepsOf(member).find((each) => each.key === key);
  return sweep === undefined ? null : { knob: { ...knob, number: knob.number }, sweep };
}

/** A value of a swept knob in words; spans are never overstated. */
export function valueText({ knob, sweep }: Swept, value: number, units: Units): string {
  return knob.key.startsWith('spans.') ? showSpanDown(value, units) : sweep.show(value, units);
}

/** The stretch around its value now along which a knob's handovers are listed, base units. */
export function stretchOf(
  member: Member,
  { knob }: Swept,
  units: Units,
): { readonly from: number; readonly to: number; readonly now: number } {
  const { number } = knob;
  const now = number.get(member);
  const range = chartRange(now, number.axisUnit(units));
  return { from: Math.max(number.least, range.from), to: Math.min(number.most, range.to), now };
}
