import type { Link } from '../../loads/index.ts';
import type { Units } from '../../quantity/index.ts';
import { borneText, linkText } from '../../timber/link-words.ts';
import { type Job, linksOf, mapMembers } from './job.ts';

/** One link of a job: where a reaction lands. */
export interface Landing {
  /** Name of the member that carries it. */
  readonly carrier: string;
  /** Its index in the carrier's list. */
  readonly index: number;
  readonly link: Link;
}

/** Where the reactions of a member land, in the order of the job: who carries it. */
export function carriersOf(job: Job, name: string): Landing[] {
  return job.members.flatMap(({ member }) => landingsOn(member).filter(({ link }) => link.member === name));
}

/** Where the reactions of every member land that some member carries, by its name: `carriersOf` of all of them at once. */
export function allCarriers(job: Job): ReadonlyMap<string, readonly Landing[]> {
  const carriers = new Map<string, Landing[]>();
  for (const { member } of job.members) {
    for (const landing of landingsOn(member)) {
      const { member: name } = landing.link;
      const others = carriers.get(name);
      if (others === undefined) carriers.set(name, [landing]);
      else others.push(landing);
    }
  }
  return carriers;
}

/** The reactions of other members that land on a member: whom it carries. */
export function carriedBy(job: Job, name: string): Landing[] {
  const found = job.members.find(({ member }) => member.name === name);
  return found === undefined ? [] : landingsOn(found.member);
}

function landingsOn(member: Job['members'][number]['member']): Landing[] {
  return linksOf(member).map((link, index) => ({ carrier: member.name, index, link }));
}

/**
 * Who loses what when a member is deleted, a sentence a link: "G1 loses J1 right end every 16": D 120, L 320 plf".
 * None where nothing carries it.
 */
export function whoLoses(job: Job, name: string, units: Units): string[] {
  return carriersOf(job, name).map(
    ({ carrier, link }) => `${carrier} loses ${linkText(link, units)}: ${borneText(link, units)}`,
  );
}

/** The job with a member called otherwise, in its own record and in every link to it. */
export function renamed<J extends Job>(job: J, from: string, to: string): J {
  return mapMembers(job, (member) => {
    const links = linksOf(member).map((link) => (link.member === from ? { ...link, member: to } : link));
    const changed = linksOf(member).some((link) => link.member === from) ? { ...member, links } : member;
    return member.name === from ? { ...changed, name: to } : changed;
  });
}

/** The job without a member and without every link to it. */
export function withoutMember<J extends Job>(job: J, name: string): J {
  const left = { ...job, members: job.members.filter(({ member }) => member.name !== name) };
  return mapMembers(left, (member) =>
    linksOf(member).some((link) => link.member === name)
      ? { ...member, links: linksOf(member).filter((link) => link.member !== name) }
      : member,
  );
}
