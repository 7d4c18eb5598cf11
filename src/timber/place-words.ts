import { beamFields, supportPlaces } from '../statics/index.ts';
import type { Member } from './member.ts';
import type { CheckId, CheckResult } from './report.ts';
import { CHECK_SUBJECT, CHECK_WORD } from './words.ts';

/** "span 2", "the span", "the left overhang", "the arm": a field of a member by its index. */
export function placeName(member: Member, field: number): string {
  const fields = beamFields(member.beam);
  if (member.beam.supports === 'cantilever') return 'the arm';
  const found = fields[field];
  if (found === undefined) return 'the span';
  if (found.kind === 'overhang') return field === 0 ? 'the left overhang' : 'the right overhang';
  if (member.beam.spans.length === 1) return 'the span';
  return `span ${field + (fields[0]!.kind === 'overhang' ? 0 : 1)}`;
}

/** A plain span: what happens there needs no place. */
export function isPlain(member: Member): boolean {
  return member.beam.supports === 'bearings' && beamFields(member.beam).length === 1;
}

const NEAR = 1e-6;

/** Index of the support at a place; -1 where there is none. */
function supportAt(member: Member, at: number): number {
  return supportPlaces(member.beam).findIndex((place) => Math.abs(place - at) < NEAR);
}

/** "support 2", "the fixed end". */
export function supportName(member: Member, support: number): string {
  const { beam } = member;
  const last = supportPlaces(beam).length - 1;
  const fixed =
    beam.supports === 'cantilever' ||
    (support === 0 ? beam.fixed.left : support === last && beam.fixed.right);
  return fixed ? 'the fixed end' : `support ${support + 1}`;
}

const AT_SUPPORTS: readonly CheckId[] = ['bearing', 'uplift', 'notch'];

/**
 * Where on the member a check is worst, as it follows the check's word: "over support 2", "in span 1",
 * "of the right overhang"; empty where the member is a plain span and there is only one place to speak of.
 */
export function placeOf(member: Member, result: CheckResult): string {
  if (AT_SUPPORTS.includes(result.id)) {
    const symmetric = isPlain(member) && result.id === 'bearing';
    return symmetric ? '' : `at ${supportName(member, result.place)}`;
  }
  if (isPlain(member) && !member.beam.fixed.left && !member.beam.fixed.right) return '';
  const support = supportAt(member, result.at);
  if (result.id === 'shear')
    return support < 0 ? `in ${placeName(member, result.place)}` : `at ${supportName(member, support)}`;
  if (result.id === 'bending' || result.id === 'bending-hogging') {
    if (support < 0) return `in ${placeName(member, result.place)}`;
    const name = supportName(member, support);
    return name === 'the fixed end' ? `at ${name}` : `over ${name}`;
  }
  const name = placeName(member, result.place);
  return result.id === 'slenderness' ? `in ${name}` : `of ${name}`;
}

/** The check and where it is worst, to begin a sentence: "Bending over support 2", "Shear"; in its midst with a small letter. */
export function checkAndPlace(member: Member, result: CheckResult, begins: boolean): string {
  const place = placeOf(member, result);
  const words = begins ? CHECK_SUBJECT : CHECK_WORD;
  // Over a support, or at a fixed end, it is plain which way the beam bends.
  const id = result.id === 'bending-hogging' && /^(over|at) /.test(place) ? 'bending' : result.id;
  const word = id === 'bending-hogging' && !begins ? 'upward bending' : words[id];
  return place === '' ? word : `${word} ${place}`;
}

/** ", live on span 1" where the worst is not under all loads at once; empty otherwise. */
export function patternText({ pattern }: CheckResult): string {
  return pattern === '' || pattern === 'all spans' ? '' : `, ${pattern}`;
}

/** Length that l/h goes by, in words: "span 2", "twice the right overhang"; null for a plain span. */
export function measureName(member: Member, field: number): string | null {
  if (isPlain(member)) return null;
  const name = placeName(member, field);
  return beamFields(member.beam)[field]?.kind === 'overhang' ? `twice ${name}` : name;
}
