import { lineLoadOf } from '../checks/line-load.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** How plies share a load, and what their fastening has to pass on. No check: statics and common practice, no source. */
export function plyLines({ figures: f, member, wood }: Work): WorkingLine[] {
  const { plies } = member.section;
  const { b } = wood.at;
  const load = lineLoadOf(member);
  return [
    { symbol: 'plies', result: String(plies) },
    {
      symbol: 'b',
      formula: 'plies x width',
      numbers: `${plies} x ${f.size(b / plies)}`,
      result: f.size(b),
      note: 'counted as one section: like plies of one wood bend alike and share the load evenly',
    },
    { symbol: 'w', result: f.line(load), note: 'the load at a glance: see loads and own weight' },
    {
      symbol: 'share of a ply',
      formula: 'w / plies',
      numbers: `${f.line(load)} / ${plies}`,
      result: f.line(load / plies),
    },
    { heading: 'what the fastening passes on' },
    {
      note: 'Loaded from above over its whole width every ply takes its share itself: the fastening only keeps them together.',
    },
    {
      symbol: 'across the first joint',
      formula: 'w (plies - 1) / plies',
      numbers: `${f.line(load)} x (${plies} - 1) / ${plies}`,
      result: f.line((load * (plies - 1)) / plies),
      note: 'all of the load hung on one outer ply: what the others take has to cross the first joint',
    },
    {
      note: 'Advice by statics, common practice, no clause: nails, screws and bolts are not checked; the maker or the local code has a schedule.',
    },
  ];
}
