import { figuresOf, plain, ratioText, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { costOf, type Move, movesOf } from '../moves/index.ts';
import { BEST_WORD } from '../rack/best.ts';
import { refusedWord } from '../rack/refused-word.ts';
import type { Asked } from './about.ts';
import { costLines } from './change.ts';

/** The moves as they are listed, each with what it comes to and what it takes. */
export function moveLines({ member, units, ranking }: Asked): WorkingLine[] {
  const f = figuresOf(units);
  const { best, deepenOrWiden, moves } = movesOf(member, { ranking, units });
  const before = costOf(member, ranking);
  const { free, stock } = deepenOrWiden;
  const lines = (move: Move): WorkingLine[] => [
    { heading: `${move.kind}: ${move.label}` },
    {
      symbol: 'worst ratio after',
      result: ratioText(move.worst),
      note: move.refused === null ? governingText(move) : `not allowed, ${refusedWord(move.refused)}`,
    },
    ...costLines(f, before, move),
    ...(move.times === 1 ? [] : [{ symbol: 'times as many members', result: plain(move.times) }]),
  ];
  return [
    {
      note:
        `Each is the least change of its kind that passes, by the same checks of the changed member; ${BEST_WORD[best]} ` +
        'first, then those that come nearest to passing. What it takes is after less before. ' +
        'In the view of the moves, w on one of them shows every check of the changed member.',
    },
    { heading: '10 % more wood either way' },
    { note: 'a free size: depth, or width, 1.1 times what it is' },
    ...[
      free.deepen,
      free.widen,
      ...[stock.deepen, stock.widen].filter((move) => move !== null),
      ...moves,
    ].flatMap(lines),
  ];
}

function governingText({ governing, passes }: Move): string {
  const verdict = passes ? 'it passes' : 'it does not do it alone';
  return governing === null ? verdict : `${WORKINGS_WORD[governing]}; ${verdict}`;
}
