import { type Borne, borneBy, type Link, type LinkEnd, LOAD_KINDS } from '../../loads/index.ts';
import { sectionWeight } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { type Job, linksOf, mapMembers } from './job.ts';

const BORNE = new WeakMap<Member, readonly Borne[]>();

/** What each support of a member bears by kind, own weight in dead; the same object for the same member. */
export function borneOf(member: Member): readonly Borne[] {
  const known = BORNE.get(member);
  if (known !== undefined) return known;
  const weight = member.selfWeight ? sectionWeight(member, member.section) : 0;
  const borne = borneBy(member, Number.isFinite(weight) ? weight : 0);
  BORNE.set(member, borne);
  return borne;
}

/** The support of a member that `end` means, by its index from the left; null where there is none. */
export function supportOf({ beam }: Member, end: LinkEnd): number | null {
  const last = beam.supports === 'cantilever' ? 0 : beam.spans.length;
  if (end === 'left') return 0;
  if (end === 'right') return last > 0 ? last : null;
  return end <= last ? end : null;
}

/**
 * The job with what every link brings worked out, from the members that carry nothing of others upward. A member whose
 * links bring what they did stays the same object, and so does the job. A link that leads nowhere, or in a circle,
 * brings nothing: see `linkFault`.
 */
export function resolved<J extends Job>(job: J): J {
  if (
    job.members.every(
      ({ member, pins = [] }) => !hasLinks(member) && !pins.some((pin) => hasLinks(pin.member)),
    )
  )
    return job;
  const byName = new Map(job.members.map(({ member }) => [member.name, member]));
  const settled = new Map<string, Member>();
  const open = new Set<string>();
  const settle = (name: string): Member | null => {
    const known = settled.get(name);
    if (known !== undefined) return known;
    const member = byName.get(name);
    if (member === undefined || open.has(name)) return null;
    open.add(name);
    const done = withBorne(member, settle);
    open.delete(name);
    settled.set(name, done);
    return done;
  };
  return mapMembers(job, (member, name) =>
    byName.get(name) === member ? settle(name)! : withBorne(member, settle),
  );
}

function hasLinks(member: Member): boolean {
  return linksOf(member).length > 0;
}

function withBorne(member: Member, settle: (name: string) => Member | null): Member {
  if (!hasLinks(member)) return member;
  const links = linksOf(member).map((link): Link => {
    const from = settle(link.member);
    const support = from === null ? null : supportOf(from, link.end);
    const bears = from === null || support === null ? null : borneOf(from)[support]!;
    const every = link.type === 'line' && link.bySpacing ? (from?.spacing ?? link.every) : null;
    const same =
      sameBorne(link.bears, bears) && (link.type === 'point' || every === null || every === link.every);
    if (same) return link;
    return link.type === 'line' && every !== null ? { ...link, bears, every } : { ...link, bears };
  });
  return links.every((link, at) => link === member.links![at]) ? member : { ...member, links };
}

function sameBorne(one: Borne | null, other: Borne | null): boolean {
  if (one === other) return true;
  if (one === null || other === null) return false;
  return LOAD_KINDS.every(
    (kind) => one[kind]?.max === other[kind]?.max && one[kind]?.min === other[kind]?.min,
  );
}
