import { carriedBy, carriersOf, endText, type Job, type Landing } from '../explore/links/index.ts';
import { harmless, showInches, showSpan, type Units } from '../quantity/index.ts';
import { wrapped } from './prose.ts';

/** What a member carries of others and what carries it, for --json; nothing where there is none. In, lb. */
export function linksJson(job: Job, name: string): { carries?: object[]; carriedBy?: object[] } {
  const carries = carriedBy(job, name);
  const carriers = carriersOf(job, name);
  return {
    ...(carries.length === 0
      ? {}
      : {
          carries: carries.map(({ link }) => ({
            member: link.member,
            end: link.end,
            ...placeJson(link),
            byKind: link.bears,
          })),
        }),
    ...(carriers.length === 0
      ? {}
      : {
          carriedBy: carriers.map(({ carrier, link }) => ({
            member: carrier,
            end: link.end,
            ...placeJson(link),
          })),
        }),
  };
}

function placeJson(link: Landing['link']): object {
  if (link.type === 'point') return { at: link.at };
  return { every: link.every, from: link.from, to: link.to };
}

/** "carried by: G1 (right end every 16")", in lines; none where nothing carries it. */
export function carriersText(job: Job, name: string, units: Units, indent: string): string[] {
  const carriers = carriersOf(job, name).map(({ carrier, link }) => {
    const place =
      link.type === 'point' ? `at ${showSpan(link.at, units)}` : `every ${showInches(link.every, units)}`;
    return `${harmless(carrier)} (${endText(link.end)} ${place})`;
  });
  return carriers.length === 0 ? [] : wrapped(`carried by: ${carriers.join(', ')}`, indent);
}
