import type { Link } from '../../loads/index.ts';
import { quoted } from '../../quantity/index.ts';
import { nearestName } from '../../timber/nearest-name.ts';
import { type Job, linksOf } from './job.ts';
import { supportOf } from './resolved.ts';

/** What is wrong with a link of a job, and where it stands. */
export interface LinkFault {
  /** Indices of the member, of its pin (null: the design at hand) and of the link. */
  readonly member: number;
  readonly pin: number | null;
  readonly link: number;
  readonly key: 'member' | 'end' | 'every';
  readonly text: string;
}

/**
 * The first link that cannot be: to a member that is not there, to the member itself, to a support it does not have, by
 * a spacing it does not state, or in a circle. Where links land is seen by `placeFault`.
 */
export function linkFault(job: Job): LinkFault | null {
  const names = job.members.map(({ member }) => member.name);
  const byName = new Map(job.members.map(({ member }) => [member.name, member]));
  for (const [index, { member, pins = [] }] of job.members.entries()) {
    for (const [at, { links = [] }] of [member, ...pins.map((pin) => pin.member)].entries()) {
      for (const [link, each] of links.entries()) {
        const fault = faultOf(each, member.name, byName, names);
        if (fault !== null) return { member: index, pin: at === 0 ? null : at - 1, link, ...fault };
      }
    }
  }
  return circleIn(job);
}

function faultOf(
  link: Link,
  carrier: string,
  byName: ReadonlyMap<string, Job['members'][number]['member']>,
  names: readonly string[],
): Pick<LinkFault, 'key' | 'text'> | null {
  const { member: name, end } = link;
  if (name === carrier)
    return { key: 'member', text: `${quoted(name)} cannot carry itself; name another member` };
  const from = byName.get(name);
  if (from === undefined) {
    const near = nearestName(name, names);
    const known =
      near === null
        ? `there are ${names.slice(0, MOST_NAMES).map(quoted).join(', ')}`
        : `the nearest is ${quoted(near)}`;
    return { key: 'member', text: `there is no member ${quoted(name)}; ${known}` };
  }
  if (link.type === 'line' && link.bySpacing && from.spacing === null) {
    return { key: 'every', text: `${quoted(name)} states no spacing to go by; write how far apart, "16 in"` };
  }
  if (supportOf(from, end) !== null) return null;
  if (from.beam.supports === 'cantilever') {
    const text = `${quoted(name)} is a cantilever, held at its left end alone; write "left"`;
    return { key: 'end', text };
  }
  const last = from.beam.spans.length;
  const text = `${quoted(name)} has no support ${end}; from the left they are 0 to ${last}, or "left" and "right"`;
  return { key: 'end', text };
}

const MOST_NAMES = 12;

/** The first link, in the order of the job, that closes a circle of reactions. */
function circleIn(job: Job): LinkFault | null {
  const index = new Map(job.members.map(({ member }, at) => [member.name, at]));
  const done = new Set<number>();
  const path: number[] = [];
  const visit = (at: number): LinkFault | null => {
    if (done.has(at)) return null;
    path.push(at);
    for (const [link, { member: name }] of linksOf(job.members[at]!.member).entries()) {
      const next = index.get(name)!;
      const from = path.indexOf(next);
      if (from >= 0) {
        // Along the path each carries the next: the reactions run the other way.
        const between = path.slice(from + 1).reverse();
        const circle = [name, ...between.map((each) => job.members[each]!.member.name), name];
        const text = `the reactions run in a circle, ${circleText(circle)}; take one of these links out`;
        return { member: at, pin: null, link, key: 'member', text };
      }
      const found = visit(next);
      if (found !== null) return found;
    }
    path.pop();
    done.add(at);
    return null;
  };
  for (let at = 0; at < job.members.length; at += 1) {
    const found = visit(at);
    if (found !== null) return found;
  }
  return null;
}

/** More names than this are not all shown. */
const MOST_STEPS = 8;

/** "J1 → G1 → J1" */
function circleText(names: readonly string[]): string {
  const shown =
    names.length > MOST_STEPS
      ? [...names.slice(0, MOST_STEPS - 2), `${names.length - MOST_STEPS + 1} more`, names.at(-1)!]
      : names;
  return shown.join(' → ');
}
