import { areaToLine } from '../../loads/area-to-line.ts';
import { loadsOf } from '../../loads/carried.ts';
import { slopedLength } from '../../loads/slope.ts';
import { beamFields } from '../../statics/beam.ts';
import type { Member } from '../member.ts';

/** Acceleration of gravity, in/s². */
export const GRAVITY = 386.1;
/** (βl)²/2π of the first mode: simple span π²/2π, cantilever 1.8751²/2π. */
const MODE = { span: Math.PI / 2, overhang: 1.875104 ** 2 / (2 * Math.PI) } as const;

/**
 * First frequency, Hz, of the longest span under dead load alone (domain: f1 = (π/2)·sqrt(EI/(m·l⁴)), m = D/g).
 * Line and point loads, those of other members' reactions among them, count as spread over the span. Null where there is no dead load. Advice, not code.
 */
export function firstFrequency(member: Member, w: number, EI: number): number | null {
  const parts = frequencyParts(member, w);
  if (parts === null) return null;
  const { mode, dead, length } = parts;
  return mode * Math.sqrt((EI * GRAVITY) / (dead * length ** 4));
}

/** What it comes from: the number of the mode, dead load, lb/in, and length, in, of the longest span. */
export function frequencyParts(
  member: Member,
  w: number,
): { readonly mode: number; readonly dead: number; readonly length: number } | null {
  const fields = beamFields(member.beam);
  const spans = fields.some(({ kind }) => kind === 'span')
    ? fields.filter(({ kind }) => kind === 'span')
    : fields;
  const longest = spans.reduce((most, field) => (field.length > most.length ? field : most));
  const from = longest.start;
  const to = from + longest.length;
  let typed = 0;
  for (const load of loadsOf(member)) {
    if (load.kind !== 'dead') continue;
    if (load.type === 'point') typed += load.at >= from && load.at <= to ? load.load : 0;
    else typed += lineWithin(load, from, to);
  }
  const dead = areaToLine(member, 'dead') + typed / longest.length + (member.selfWeight ? w : 0);
  if (dead <= 0) return null;
  return { mode: MODE[longest.kind], dead, length: slopedLength(member.slope, longest.length) };
}

/** The part of a linearly varying load, lb, between two places. */
function lineWithin(
  load: { from: number; to: number; start: number; end: number },
  from: number,
  to: number,
): number {
  const a = Math.max(load.from, from);
  const b = Math.min(load.to, to);
  if (b <= a) return 0;
  const at = (x: number) => load.start + ((load.end - load.start) * (x - load.from)) / (load.to - load.from);
  return ((at(a) + at(b)) / 2) * (b - a);
}
