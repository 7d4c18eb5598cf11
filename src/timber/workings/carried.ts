import { KIND_LETTER, KIND_WORD, LOAD_KINDS } from '../../loads/kinds.ts';
import type { Link } from '../../loads/loading.ts';
import { linkText } from '../link-words.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** The reactions of other members that a member carries, kind by kind: where they come from and what they come to. */
export function carriedLines(work: Work): WorkingLine[] {
  const { links = [] } = work.member;
  return links.flatMap((link) => [
    { heading: linkText(link, work.units) },
    ...LOAD_KINDS.flatMap((kind) => {
      const borne = link.bears?.[kind];
      if (borne === undefined) return [];
      const symbol = KIND_LETTER[kind];
      const least = borne.min < borne.max ? [amount(work, link, symbol, borne.min, 'at the least')] : [];
      const most = least.length > 0 ? 'at the most' : '';
      return [amount(work, link, symbol, borne.max, [KIND_WORD[kind], most].join(' ').trim()), ...least];
    }),
  ]);
}

function amount({ figures: f }: Work, link: Link, symbol: string, force: number, note: string): WorkingLine {
  if (link.type === 'point') return { symbol, result: f.force(force), note };
  return {
    symbol: `w${symbol}`,
    formula: 'reaction / spacing',
    numbers: `${f.force(force)} / ${f.span(link.every)}`,
    result: f.line(force / link.every),
    note,
  };
}
