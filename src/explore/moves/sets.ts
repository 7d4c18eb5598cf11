import type { Placed } from '../../loads/index.ts';
import { writeQuantity } from '../../quantity/index.ts';
import type { Bracing, Member } from '../../timber/member.ts';
import { stockSets } from '../rack/stock-set.ts';

/**
 * What to put on the command line as --set to get from one member to another that a move made of it: exactly the same
 * doubles are read back. Of what a move may change: lengths and places of loads and links, bearings and tie-downs, width of
 * floor, bracing, wood and section.
 */
export function setsBetween(from: Member, to: Member): string[] {
  return [
    ...to.beam.spans.flatMap((span, at) => lengthSet(`spans.${at}`, from.beam.spans[at], span)),
    ...lengthSet('overhangs.left', from.beam.overhangs.left, to.beam.overhangs.left),
    ...lengthSet('overhangs.right', from.beam.overhangs.right, to.beam.overhangs.right),
    ...to.loads.flatMap((load, at) => placeSets(`loads.${at}`, from.loads[at]!, load)),
    ...(to.links ?? []).flatMap((link, at) => placeSets(`links.${at}`, from.links![at]!, link)),
    ...widthSets(from, to),
    ...bearingSets(from.bearing, to.bearing),
    ...tieSets(from.tiedDown, to.tiedDown),
    ...bracingSet('bracing', from.bracing, to.bracing),
    ...bracingSet('bracingBottom', from.bracingBottom, to.bracingBottom),
    ...stockSets(from, to),
    ...lengthSet('section.width', from.section.width, to.section.width),
    ...lengthSet('section.depth', from.section.depth, to.section.depth),
    ...(from.section.plies === to.section.plies ? [] : [`section.plies=${to.section.plies}`]),
  ];
}

function length(value: number): string {
  return writeQuantity('length', value, 'us');
}

function lengthSet(key: string, from: number | undefined, to: number): string[] {
  return from === to ? [] : [`${key}=${length(to)}`];
}

function placeSets(key: string, from: Placed, to: Placed): string[] {
  if (to.type === 'point') return lengthSet(`${key}.at`, from.type === 'point' ? from.at : undefined, to.at);
  const was = from.type === 'line' ? from : null;
  return [...lengthSet(`${key}.from`, was?.from, to.from), ...lengthSet(`${key}.to`, was?.to, to.to)];
}

/** Spacing where it gives the width, else the width itself: the one set takes the other's place. */
function widthSets(from: Member, to: Member): string[] {
  if (to.spacing !== null) return lengthSet('spacing', from.spacing ?? undefined, to.spacing);
  return lengthSet('tributary', from.spacing === null ? from.tributary : undefined, to.tributary);
}

function bearingSets(from: readonly number[], to: readonly number[]): string[] {
  if (to.every((each, at) => each === from[at])) return [];
  const one = to.every((each) => each === to[0]);
  return one
    ? [`bearing=${length(to[0]!)}`]
    : to.flatMap((each, at) => lengthSet(`bearing.${at}`, from[at], each));
}

function tieSets(from: Member['tiedDown'], to: Member['tiedDown']): string[] {
  if (to === null || to === from) return [];
  const texts = to.map((each) => writeQuantity('pointLoad', each, 'us'));
  return [`tiedDown=${JSON.stringify(texts)}`];
}

function bracingSet(key: string, from: Bracing, to: Bracing): string[] {
  return from === to ? [] : [`${key}=${typeof to === 'number' ? length(to) : to}`];
}
