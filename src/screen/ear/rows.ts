import { glyphsOf } from '../draw/glyphs.ts';
import { drawState } from '../draw-state.ts';
import type { State } from '../state.ts';
import { sentence } from './spelled.ts';

/** Every view fits on it whole. */
const SHEET = { columns: 80, rows: 400 } as const;
/** Here the wood's choices and what they bring stand one below the other, as they are to be read. */
const WOOD_COLUMNS = 60;

/** Those that the views are read with. */
export const GLYPHS = glyphsOf('unicode');
/** Glyphs that mean something where they stand alone. */
const MARKS: readonly (readonly [string, string])[] = [
  [GLYPHS.hand, 'in hand:'],
  [GLYPHS.current, 'the size at hand:'],
  [GLYPHS.lightest, 'lit:'],
];
/** Lines, blocks, braille, shapes, a load's row of arrows: drawn, not read. */
const DRAWN = /[\u2500-\u25ff\u2800-\u28ff•]|(?:[↓↑] ?){3,}/gu;
/** What makes a cell worth saying: a word, a figure, a key. */
const WORTH = /[\p{L}\p{N}↑↓←→=$?{}[\]]/u;

interface Cell {
  readonly column: number;
  readonly text: string;
}

/** What a view shows, a sentence a row: the cells of a table parted by commas, drawings left out. */
export function rowWords(state: State): string[] {
  const columns = state.mode.name === 'wood' ? WOOD_COLUMNS : SHEET.columns;
  const { canvas } = drawState({ ...state, ...SHEET, columns }, GLYPHS);
  const sentences: Cell[][] = [];
  for (let y = 0; y < canvas.rows; y += 1) {
    const cells = cellsOf(canvas.text(y));
    const before = sentences.at(-1);
    if (before !== undefined && goesOn(before, cells)) {
      const last = before.pop()!;
      before.push({ ...last, text: `${last.text} ${cells[0]!.text}` });
    } else if (cells.length > 0) {
      sentences.push(cells);
    }
  }
  return sentences.map((cells) => sentence(cells.map(({ text }) => text).join(', ')));
}

function cellsOf(row: string): Cell[] {
  const words = MARKS.reduce((text, [glyph, word]) => text.replace(`${glyph} `, `${word} `), row);
  const read = words.replace(DRAWN, (drawn) => ' '.repeat(drawn.length));
  return [...read.matchAll(/\S+(?: \S+)*/g)]
    .map(({ index, 0: text }) => ({ column: index, text }))
    .filter(({ text }) => WORTH.test(text));
}

/** Text that was too long for its row goes on below in its own column. */
function goesOn(before: readonly Cell[], cells: readonly Cell[]): boolean {
  const last = before.at(-1)!;
  const [first] = cells;
  return (
    cells.length === 1 &&
    last.text.length >= LONG &&
    first!.column === last.column &&
    !TITLED.test(first!.text)
  );
}

/** Shorter text is not broken. */
const LONG = 36;
/** "source: ...": begins anew, however long the row above is. */
const TITLED = /^[\p{L} ]{2,20}: /u;
