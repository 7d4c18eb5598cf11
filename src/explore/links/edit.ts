import type { Link, LinkEnd } from '../../loads/index.ts';
import { beamFields, beamLength, MOST_LOADS } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';
import type { Edit } from '../beam-edits/edit-beam.ts';
import { type Job, linksOf } from './job.ts';
import { allCarriers } from './who.ts';

/** Between repeated reactions of members whose own spacing nobody stated, in (common practice, no source). */
const USUAL_SPACING = 16;

/** The members that one could carry, in the order of the job: all but itself and those that carry it, however far down. */
export function couldCarry(job: Job, carrier: string): Member[] {
  const carriers = allCarriers(job);
  const below = new Set([carrier]);
  // A set gives out what is added while it is walked.
  for (const name of below) for (const landing of carriers.get(name) ?? []) below.add(landing.carrier);
  return job.members.map(({ member }) => member).filter(({ name }) => !below.has(name));
}

/**
 * A member that carries the left end of another too: along its whole length where that stands at a spacing, else once,
 * in the middle of its first span, on a cantilever at the free end.
 */
export function withLink(member: Member, from: Member): Edit {
  const links = linksOf(member);
  if (links.length + member.loads.length >= MOST_LOADS)
    return { fault: `a member carries at most ${MOST_LOADS} loads: take one out first` };
  const whole = beamLength(member.beam);
  const named = { member: from.name, end: 'left', bears: null } as const;
  const link: Link =
    from.spacing === null
      ? { ...named, type: 'point', at: usualPlace(member) }
      : { ...named, type: 'line', every: from.spacing, bySpacing: true, from: 0, to: whole };
  const key = link.type === 'point' ? 'at' : 'every';
  return { member: { ...member, links: [...links, link] }, knob: `links.${links.length}.${key}` };
}

function usualPlace({ beam }: Member): number {
  if (beam.supports === 'cantilever') return beamLength(beam);
  const span = beamFields(beam).find(({ kind }) => kind === 'span')!;
  return span.start + span.length / 2;
}

/** The member with another reaction of the same source in a link: its supports from left to right, then the first again. */
export function withNextEnd(member: Member, index: number, from: Member): Member {
  const last = from.beam.supports === 'cantilever' ? 0 : from.beam.spans.length;
  const ends: LinkEnd[] = Array.from({ length: last + 1 }, (_, at): LinkEnd => {
    if (at === 0) return 'left';
    return at === last ? 'right' : at;
  });
  const { end } = linksOf(member)[index]!;
  const now = end === 'right' ? last : end === 'left' ? 0 : end;
  return withChanged(member, index, (link) => ({ ...link, end: ends[(now + 1) % ends.length]! }));
}

/** A reaction that lands once repeated over the whole member, or the other way round. */
export function withOtherRepeat(member: Member, index: number, from: Member): Member {
  return withChanged(member, index, ({ member: name, end, bears, ...place }): Link => {
    const named = { member: name, end, bears };
    if (place.type === 'line') return { ...named, type: 'point', at: usualPlace(member) };
    const along = { ...named, type: 'line', from: 0, to: beamLength(member.beam) } as const;
    return from.spacing === null
      ? { ...along, every: USUAL_SPACING }
      : { ...along, every: from.spacing, bySpacing: true };
  });
}

function withChanged(member: Member, index: number, change: (link: Link) => Link): Member {
  return { ...member, links: linksOf(member).map((link, at) => (at === index ? change(link) : link)) };
}
