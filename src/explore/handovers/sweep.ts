import type { Placed } from '../../loads/index.ts';
import { type QuantityKind, showInches, type Units } from '../../quantity/index.ts';
import { beamLength } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';
import { placeFault } from '../beam-edits/placed.ts';
import { type Knob, measureKnob, SCALES } from '../knobs/knob.ts';
import { knobsOf } from '../knobs/knobs.ts';
import type { Put } from './along.ts';

/** A quantity that can be swept through a range, by its path in the session file. */
export interface Sweep {
  readonly key: string;
  readonly label: string;
  readonly kind: QuantityKind;
  readonly put: Put;
  /** Reads a typed end of the range; a bare number has the knob's own unit. */
  read(text: string, units: Units): { readonly value: number } | { readonly fault: string };
  show(value: number, units: Units): string;
}

/** Where the ends of a load or a link were not stated, they are those of the member. */
export interface LoadEnds {
  readonly to: boolean;
}

/**
 * What can be swept of a member: every knob that is a number but the section's own sizes, and the limits of depth and
 * width. A value taken is what the same key set in the session file would give: places of loads stay where they are
 * stated, and `stated` says of which loads, then links, the end is (all where absent).
 */
export function sweepsOf(member: Member, stated: readonly LoadEnds[] = []): Sweep[] {
  const asTributary = { ...member, spacing: null };
  const asSpacing = { ...member, spacing: member.spacing ?? member.tributary };
  const seen = new Set<string>();
  const knobs = [member, asTributary, asSpacing]
    .flatMap((each) => knobsOf(each).map((knob) => ({ knob, of: each })))
    .filter(({ knob }) => {
      if (knob.number === null || knob.key.startsWith('section.') || seen.has(knob.key)) return false;
      seen.add(knob.key);
      return true;
    });
  return [
    ...knobs.map(({ knob, of }) => sweepOf(knob, of, plainPut(knob, of, stated))),
    ...LIMITS.map((knob) => sweepOf(knob, member, knob.number!.put)),
  ];
}

function sweepOf(knob: Knob, member: Member, put: Put): Sweep {
  const { kind, get } = knob.number!;
  return {
    key: knob.key,
    label: knob.label.trim(),
    kind,
    put,
    read(text, units) {
      const turn = knob.enter(member, text, units);
      if ('fault' in turn) return turn;
      const value = get(turn.member);
      const changed = put(member, value);
      const fault = placeFault(changed);
      return fault === null ? { value } : { fault };
    },
    show: (value, units) => knob.show(knob.number!.put(member, value), units),
  };
}

const LENGTHS = /^(?:spans\.(\d+)|overhangs\.(left|right))$/;

/** Of a length of the beam the plain one, which moves nothing else; of all other knobs their own. */
function plainPut(knob: Knob, as: Member, stated: readonly LoadEnds[]): Put {
  const parts = LENGTHS.exec(knob.key);
  if (parts === null) {
    const { put } = knob.number!;
    return knob.key === 'tributary' || knob.key === 'spacing'
      ? (member, value) => put({ ...member, spacing: as.spacing }, value)
      : put;
  }
  const [, index, side] = parts;
  return (member, value) => {
    const { beam } = member;
    const changed =
      side === undefined
        ? { ...beam, spans: beam.spans.map((span, at) => (at === Number(index) ? value : span)) }
        : { ...beam, overhangs: { ...beam.overhangs, [side]: value } };
    const whole = beamLength(changed);
    const follow = <T extends Placed>(placed: T, at: number): T =>
      placed.type === 'line' && stated[at]?.to === false ? { ...placed, to: whole } : placed;
    const loads = member.loads.map(follow);
    const links = member.links?.map((link, at) => follow(link, loads.length + at));
    return { ...member, beam: changed, loads, ...(links === undefined ? {} : { links }) };
  };
}

const LIMITS: readonly Knob[] = (
  [
    ['maxDepth', 'depth limit', 60],
    ['maxWidth', 'width limit', 48],
  ] as const
).map(([key, label, most]) =>
  measureKnob({
    key,
    label,
    kind: 'length',
    scale: SCALES.section,
    least: 0.25,
    most,
    get: (member) => member[key] ?? most,
    put: (member, value) => ({ ...member, [key]: value }),
    show: showInches,
  }),
);
