import type { Link } from '../../loads/index.ts';
import type { Member } from '../../timber/member.ts';

/** The members of a job as links see them; a session is one. */
export interface Job {
  readonly members: readonly JobMember[];
}

export interface JobMember {
  readonly member: Member;
  /** Designs of the member that were set aside; their links are links of the job. */
  readonly pins?: readonly { readonly member: Member }[];
}

const NONE: readonly Link[] = [];

/** The links of a member; none where it has no list. */
export function linksOf(member: Member): readonly Link[] {
  return member.links ?? NONE;
}

/** Whether two members say the same and differ at most in what others bring them. */
export function differsInBorneOnly(one: Member, other: Member): boolean {
  if (one === other) return true;
  const [mine, theirs] = [linksOf(one), linksOf(other)];
  return (
    mine.length === theirs.length &&
    mine.every((link, at) => isSameLink(link, theirs[at]!)) &&
    (Object.keys({ ...one, ...other }) as (keyof Member)[]).every(
      (key) => key === 'links' || one[key] === other[key],
    )
  );
}

function isSameLink(one: Link, other: Link): boolean {
  const [mine, theirs] = [one, other] as readonly Readonly<Record<string, unknown>>[];
  return Object.keys(mine!).every(
    (key) => key === 'bears' || (key === 'every' && mine!.bySpacing === true) || mine![key] === theirs![key],
  );
}

/** The job with every member and every design set aside put through `change`; the same object where nothing changes. */
export function mapMembers<J extends Job>(job: J, change: (member: Member, name: string) => Member): J {
  const members = job.members.map((one) => {
    const member = change(one.member, one.member.name);
    const pins = one.pins?.map((pin) => {
      const changed = change(pin.member, one.member.name);
      return changed === pin.member ? pin : { ...pin, member: changed };
    });
    const same = member === one.member && (pins ?? []).every((pin, at) => pin === one.pins![at]);
    if (same) return one;
    return { ...one, member, ...(pins === undefined ? {} : { pins }) };
  });
  return members.every((one, at) => one === job.members[at]) ? job : { ...job, members };
}
