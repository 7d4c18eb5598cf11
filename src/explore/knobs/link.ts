import type { Link } from '../../loads/index.ts';
import { showInches, showSpan } from '../../quantity/index.ts';
import { beamLength } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';
import { linkName, placeFault } from '../beam-edits/placed.ts';
import { endText } from '../links/index.ts';
import { type Knob, measureKnob, SCALES } from './knob.ts';

/** Shortest stretch that repeated reactions land on, and the least and most between them, in. */
const SHORTEST_RUN = 1;
const CLOSEST = 1;
const FARTHEST = 240;

/** Where the reactions of other members land: the place of one, or the spacing and the ends of repeated ones. */
export function linkKnobs(member: Member): Knob[] {
  const length = beamLength(member.beam);
  return (member.links ?? []).flatMap((link, index) =>
    link.type === 'point' ? [place(link, index, 'at', 0, length)] : lineKnobs(link, index, length),
  );
}

type Line = Link & { readonly type: 'line' };
type PlaceKey = 'at' | 'every' | 'from' | 'to';

function get(member: Member, index: number, key: PlaceKey): number {
  return (member.links![index] as unknown as Readonly<Record<string, number>>)[key]!;
}

function put(member: Member, index: number, key: PlaceKey, value: number): Member {
  const links = member.links!.map((old, at): Link => {
    if (at !== index) return old;
    if (key !== 'every' || old.type === 'point') return { ...old, [key]: value };
    // Typed, it follows the other member's spacing no more.
    const { bySpacing: _followed, ...link } = old;
    return { ...link, every: value };
  });
  return { ...member, links };
}

const WORDS: Readonly<Record<PlaceKey, string>> = {
  at: 'the place',
  every: 'the spacing',
  from: 'the start',
  to: 'the end',
};

/** The first knob of a link says whose reaction it is, the others stand under it. */
function labelOf(link: Link, key: PlaceKey): string {
  const first = key === (link.type === 'point' ? 'at' : 'every');
  return first ? `${link.member} ${endText(link.end)} ${key}` : `  ${key}`;
}

function place(link: Link, index: number, key: 'at' | 'from' | 'to', least: number, most: number): Knob {
  return measureKnob({
    key: `links.${index}.${key}`,
    label: labelOf(link, key),
    name: `${WORDS[key]} of ${linkName(index)}`,
    kind: 'length',
    scale: SCALES.span,
    least,
    most,
    get: (member) => get(member, index, key),
    put: (member, value) => put(member, index, key, value),
    show: showSpan,
    check: placeFault,
  });
}

function lineKnobs(link: Line, index: number, length: number): Knob[] {
  return [
    measureKnob({
      key: `links.${index}.every`,
      label: labelOf(link, 'every'),
      name: `${WORDS.every} of ${linkName(index)}`,
      kind: 'length',
      scale: SCALES.spacing,
      least: CLOSEST,
      most: FARTHEST,
      get: (member) => get(member, index, 'every'),
      put: (member, value) => put(member, index, 'every', value),
      show: showInches,
    }),
    place(link, index, 'from', 0, Math.max(link.from, link.to - SHORTEST_RUN)),
    place(link, index, 'to', Math.min(link.to, link.from + SHORTEST_RUN), length),
  ];
}
