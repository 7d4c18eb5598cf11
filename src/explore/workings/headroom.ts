import { sizeLabel, standingDepth } from '../../timber/index.ts';
import type { Headroom } from '../../timber/member.ts';
import { type Figures, figuresOf, sumText, type WorkingLine } from '../../timber/workings/index.ts';
import { clearHeight, depthLeft, depthLimit, overDepth } from '../headroom.ts';
import { sizeName } from '../rack/rack.ts';
import { rankedRack } from '../rack/ranked.ts';
import type { Asked } from './about.ts';

/** The depth that a storey leaves, what is over it, and the clear height below every size. */
export function headroomLines({ member, units, ranking }: Asked): WorkingLine[] {
  const f = figuresOf(units);
  const { headroom, maxDepth, section, stock } = member;
  const d = standingDepth(section);
  const lines: WorkingLine[] = headroom == null ? [] : storeyLines(f, headroom);
  if (maxDepth !== null) lines.push({ symbol: 'depth limit', result: f.size(maxDepth), note: 'as typed' });
  const limit = depthLimit(member);
  lines.push(
    { heading: 'the size at hand' },
    { symbol: 'd', result: f.size(d), note: `${sizeLabel(section, stock.product)} as it stands` },
  );
  if (headroom != null) lines.push(clearLine(f, headroom, d));
  const over = overDepth(member, section);
  lines.push(
    over > 0
      ? {
          symbol: 'over by',
          formula: 'd - depth left',
          numbers: `${f.size(d)} - ${f.size(limit)}`,
          result: f.size(over),
        }
      : { note: 'not deeper than what is left: it fits' },
  );
  if (headroom == null) return lines;
  const rack = rankedRack(member, ranking);
  lines.push({ heading: 'clear height below each size of the rack' });
  for (const { size, depth, over: by } of rack.sizes) {
    lines.push({
      ...clearLine(f, headroom, depth),
      symbol: sizeName(rack, size),
      ...(by > 0 ? { note: `over by ${f.size(by)}` } : {}),
    });
  }
  return lines;
}

function storeyLines(f: Figures, headroom: Headroom): WorkingLine[] {
  const { clear } = headroom;
  const taken = takenBy(f, headroom);
  return [
    { heading: 'the storey, as stated' },
    { symbol: 'floor to floor', result: f.size(headroom.floorToFloor) },
    ...taken.map(({ name, text }) => ({ symbol: name, result: text })),
    {
      note:
        headroom.beam === 'dropped'
          ? 'a dropped beam: the joists lie on it and take their height'
          : 'a flush beam: the joists hang beside it and take no height of their own',
    },
    { symbol: 'clear height wanted', result: f.size(clear) },
    {
      symbol: 'depth left',
      formula: ['floor to floor', ...taken.map(({ name }) => name), 'clear height wanted'].join(' - '),
      numbers: differenceText(f.size(headroom.floorToFloor), [
        ...taken.map(({ text }) => text),
        f.size(clear),
      ]),
      result: f.size(depthLeft(headroom)),
    },
  ];
}

/** What takes height beside the beam and the room below. */
function takenBy(f: Figures, { floor, joists, ceiling, beam }: Headroom): { name: string; text: string }[] {
  return [
    { name: 'floor', text: f.size(floor) },
    ...(beam === 'dropped' ? [{ name: 'joists', text: f.size(joists) }] : []),
    { name: 'ceiling', text: f.size(ceiling) },
  ];
}

function clearLine(f: Figures, headroom: Headroom, depth: number): WorkingLine {
  const taken = takenBy(f, headroom);
  return {
    symbol: 'clear height',
    formula: ['floor to floor', ...taken.map(({ name }) => name), 'd'].join(' - '),
    numbers: differenceText(f.size(headroom.floorToFloor), [...taken.map(({ text }) => text), f.size(depth)]),
    result: f.size(clearHeight(headroom, depth)),
  };
}

function differenceText(first: string, less: readonly string[]): string {
  return sumText([first, ...less.map((text) => `-${text}`)]);
}
