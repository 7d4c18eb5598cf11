import { explainChecks } from '../../timber/index.ts';
import {
  type Figures,
  figuresOf,
  plain,
  ratioLine,
  ratioText,
  WORKINGS_WORD,
  type WorkingLine,
  weightLines,
} from '../../timber/workings/index.ts';
import { pieceLength } from '../buying/buying.ts';
import { powersOf } from '../powers.ts';
import { BEST_WORD } from '../rack/best.ts';
import { hasSize, type Lot, lotsOf, sectionOf, sizeName } from '../rack/rack.ts';
import { type RankedRack, type RankedSize, rankedRack } from '../rack/ranked.ts';
import { refusedWord } from '../rack/refused-word.ts';
import type { Asked } from './about.ts';

/** How the rack is made and its lit size found, and the ratios and costs of every size on it. */
export function rackLines({ member, units, ranking }: Asked): WorkingLine[] {
  const f = figuresOf(units);
  const rack = rankedRack(member, ranking);
  const word = BEST_WORD[rack.best];
  const current = rack.sizes.find(({ size }) => hasSize(member, size));
  const lit = rack.sizes[rack.lit];
  const lots = lotsOf(member, rack.woods);
  return [
    {
      note:
        'Every stock size of the woods on the rack under the same loads, each with its own weight and its own factors, by ' +
        `the same checks; ${word} first. The lit size is the first of them that passes and can be had. Take a size with x, ` +
        'or by its depth and width, then w shows all its workings.',
    },
    {
      symbol: 'size at hand',
      result: current === undefined ? 'not on the rack' : sizeName(rack, current.size),
    },
    lit === undefined
      ? { note: 'no size passes: none is lit' }
      : {
          symbol: 'lit',
          result: sizeName(rack, lit.size),
          note: `${f.weight(lit.weight)}, worst ratio ${ratioText(lit.worst)}${governingText(lit)}`,
        },
    ...rack.sizes.flatMap((each) => sizeLines(f, rack, each, lots[rack.woods.indexOf(each.size.stock)]!)),
    ...(ranking.shop === null
      ? []
      : [{ note: `prices are those of pieces for ${f.span(pieceLength(member))}: see what to buy` }]),
  ];
}

function governingText({ governing }: RankedSize): string {
  return governing === null ? '' : `, ${WORKINGS_WORD[governing]}`;
}

function sizeLines(f: Figures, rack: RankedRack, each: RankedSize, lot: Lot): WorkingLine[] {
  const { size, weight, refused, governing, worst, passes, nonDominated, inYard, price, clear } = each;
  const lines: WorkingLine[] = [{ heading: sizeName(rack, size) }];
  if (Number.isFinite(weight)) lines.push(...weightLines(f, size.width * size.depth * size.plies, weight));
  if (size.boardFeet !== null) lines.push({ symbol: 'board feet a foot', result: plain(size.boardFeet) });
  if (price !== null) lines.push({ symbol: 'price of a member', result: plain(price) });
  if (clear !== null) lines.push({ symbol: 'clear height below it', result: f.size(clear) });
  if (refused !== null) return [...lines, { note: `not a choice: ${refusedWord(refused)}` }];
  const { checks } = explainChecks(lot.prepared, lot.wood, sectionOf(lot.member, size), f.units);
  const shown = new Set([...powersOf(each.ratios).map(({ check }) => check), governing]);
  for (const check of checks) {
    if (!shown.has(check.id)) continue;
    const { clause: _clause, ...line } = ratioLine(f, check);
    lines.push({ ...line, symbol: WORKINGS_WORD[check.id] });
  }
  const says = [
    passes
      ? 'passes'
      : governing === null
        ? ''
        : `${WORKINGS_WORD[governing]} at ${ratioText(worst)} stops it`,
    nonDominated ? 'none that passes is as light and as shallow' : '',
    inYard === false ? 'not in the yard' : '',
  ].filter((text) => text !== '');
  return says.length === 0 ? lines : [...lines, { note: says.join('; ') }];
}
