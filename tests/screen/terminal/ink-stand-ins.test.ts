import xterm from '@xterm/headless';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import InkOutput from '../../../node_modules/ink/build/output.js';
import inkSanitizeAnsi from '../../../node_modules/ink/build/sanitize-ansi.js';
import lineUpdate from '../../../src/screen/terminal/ink-line-update.ts';
import Output from '../../../src/screen/terminal/ink-output.ts';
import sanitizeAnsi from '../../../src/screen/terminal/ink-sanitize.ts';
import { runs } from '../../support/runs.ts';
import { anyRow, ownRow } from './rows-of-any-kind.ts';

test('the stand-in for sanitizeAnsi takes from any text what Ink takes', () => {
  fc.assert(
    fc.property(anyRow, (text) => {
      expect(sanitizeAnsi(text)).toBe(inkSanitizeAnsi(text));
    }),
    { numRuns: 1000 },
  );
});

const asIs = (line: string): string => line;
const bold = (line: string): string => `\x1b[1m${line}\x1b[22m`;
const write = fc.record({
  // Mostly whole rows, as the program draws; at times a text beside or over another, or off the grid.
  x: fc.oneof(
    { weight: 5, arbitrary: fc.constant(0) },
    { weight: 1, arbitrary: fc.integer({ min: -2, max: 12 }) },
  ),
  y: fc.integer({ min: -1, max: 6 }),
  text: fc.oneof({ weight: 5, arbitrary: ownRow }, { weight: 1, arbitrary: anyRow }),
  transformers: fc.constantFrom<((line: string) => string)[]>([asIs], [bold], [bold, asIs], []),
});
const frame = fc.record({
  width: fc.integer({ min: 1, max: 60 }),
  height: fc.integer({ min: 1, max: 5 }),
  writes: fc.array(write, { maxLength: 7 }),
  clip: fc.option(fc.record({ x1: fc.nat(4), x2: fc.nat(20), y1: fc.nat(2), y2: fc.nat(5) })),
});

test('the stand-in for the output grid prints any frame as Ink does', () => {
  fc.assert(
    fc.property(frame, ({ width, height, writes, clip }) => {
      const ours = new Output({ width, height });
      const theirs = new InkOutput({ width, height });
      for (const output of [ours, theirs]) {
        if (clip !== null) output.clip(clip);
        for (const { x, y, text, transformers } of writes) output.write(x, y, text, { transformers });
        if (clip !== null) output.unclip();
      }
      expect(ours.get()).toEqual(theirs.get());
    }),
    { numRuns: 500 },
  );
});

test('a short text anywhere in the grid, alone or beside another, is printed as Ink prints it', () => {
  const short = ownRow.filter((row) => row.length < 20);
  const place = fc.record({ x: fc.nat(12), y: fc.nat(1), text: short });
  fc.assert(
    fc.property(fc.array(place, { minLength: 1, maxLength: 3 }), (writes) => {
      const size = { width: 40, height: 2 };
      const ours = new Output(size);
      const theirs = new InkOutput(size);
      for (const { x, y, text } of writes) {
        for (const output of [ours, theirs]) output.write(x, y, text, { transformers: [asIs] });
      }
      expect(ours.get()).toEqual(theirs.get());
    }),
    { numRuns: 500 },
  );
});

test('a frame of one styled row a line is printed as Ink prints it', () => {
  fc.assert(
    fc.property(fc.array(ownRow, { minLength: 1, maxLength: 8 }), (rows) => {
      const size = { width: 1000, height: rows.length };
      const ours = new Output(size);
      const theirs = new InkOutput(size);
      for (const [y, row] of rows.entries()) {
        for (const output of [ours, theirs]) output.write(0, y, row, { transformers: [asIs] });
      }
      expect(ours.get()).toEqual(theirs.get());
    }),
    { numRuns: runs(500) },
  );
});

const COLUMNS = 40;

/** The cells of a terminal's first row after it was told to write this. */
async function cellsAfter(...writes: readonly string[]): Promise<readonly string[]> {
  const terminal = new xterm.Terminal({ cols: COLUMNS, rows: 3, allowProposedApi: true });
  for (const text of writes) await new Promise<void>((resolve) => terminal.write(text, resolve));
  const line = terminal.buffer.active.getLine(0)!;
  const cells = Array.from({ length: COLUMNS }, (_, x) => {
    const cell = line.getCell(x)!;
    const looks = [cell.isBold(), cell.isDim(), cell.isUnderline(), cell.isInverse()]
      .map(Boolean)
      .map(Number);
    return `${cell.getChars() || ' '} ${cell.getFgColorMode()} ${cell.getFgColor()} ${cell.getBgColor()} ${looks.join('')}`;
  });
  terminal.dispose();
  return cells;
}

/** Rows as Ink hands them to its line update: reduced, blanks at their end trimmed, within the terminal. */
const printedRow = fc.tuple(ownRow, fc.integer({ min: 1, max: COLUMNS })).map(([row, width]) => {
  const output = new InkOutput({ width: 1000, height: 1 });
  output.write(0, 0, row, { transformers: [] });
  const clipped = new InkOutput({ width, height: 1 });
  clipped.clip({ x1: 0, x2: width, y1: undefined, y2: undefined });
  clipped.write(0, 0, output.get().output, { transformers: [] });
  return clipped.get().output;
});

test('updating only the cells that changed leaves the row as writing it anew would', async () => {
  await fc.assert(
    fc.asyncProperty(printedRow, printedRow, fc.nat(COLUMNS - 1), async (previous, next, column) => {
      const cursor = `\x1b[${column + 1}G`;
      const updated = await cellsAfter(previous, cursor, lineUpdate(previous, next, COLUMNS));
      expect(updated).toEqual(await cellsAfter(next));
    }),
    { numRuns: 120 },
  );
});

test('a row whose bead moves by two cells is updated in a few bytes', () => {
  const row = (bead: number): string =>
    `\x1b[34m${'━'.repeat(bead)}●\x1b[39m${'─'.repeat(60 - bead)}  0.40  +0.03`;
  expect(lineUpdate(row(20), row(22), 120).length).toBeLessThan(30);
});
