import { inDots } from '../drawing/in-dots.ts';
import { safe, safeLine } from '../safe.ts';
import type { Block, Fact, Section, Sheet } from '../sheet.ts';
import { workingsRows, wrapText } from '../workings-rows.ts';
import { textTable } from './text-table.ts';

/** Columns that every terminal and printer has. */
export const LINE = 80;

/** The sheet as plain text of at most 80 columns, its drawings in braille. */
export function writeText(sheet: Sheet): string {
  const lines = [
    ...wrapText(safe(sheet.title).toUpperCase(), LINE),
    ...factLines(sheet.titleBlock),
    ...sheet.sections.flatMap((section) => sectionLines(section, sheet)),
  ];
  return `${lines.map((each) => each.trimEnd()).join('\n')}\n`;
}

function sectionLines({ title, blocks }: Section, sheet: Sheet): string[] {
  const rule = '='.repeat(LINE);
  return [
    '',
    rule,
    ...wrapText(safe(title), LINE),
    ...runningLine(sheet),
    rule,
    ...blocks.flatMap(blockLines),
  ];
}

/** The title block in a line, to stand with each section. */
function runningLine({ titleBlock }: Sheet): string[] {
  return wrapText(titleBlock.map(([label, value]) => `${label} ${safe(value)}`).join('; '), LINE);
}

function factLines(facts: readonly Fact[]): string[] {
  const widest = Math.max(0, ...facts.map(([label]) => label.length));
  return facts.flatMap(([label, value]) => {
    const [first = '', ...rest] = wrapText(safe(value), LINE - widest - 2);
    return [`${label.padEnd(widest)}  ${first}`, ...rest.map((each) => ' '.repeat(widest + 2) + each)];
  });
}

function blockLines(block: Block): string[] {
  switch (block.kind) {
    case 'heading':
      return ['', block.text.toUpperCase(), '-'.repeat(block.text.length)];
    case 'verdict':
      return ['', ...wrapText(`${block.word}  ${safe(block.sentence)}`, LINE), ...factLines(block.facts)];
    case 'facts':
      return ['', ...wrapText(`${block.caption}:`, LINE), ...factLines(block.facts)];
    case 'text':
      return ['', ...wrapText(safe(block.text), LINE)];
    case 'list':
      return ['', ...block.items.flatMap((item) => wrapText(`- ${safe(item)}`, LINE, 2))];
    case 'table': {
      const rows = block.rows.map(({ cells }) => cells.map(safe));
      return ['', ...wrapText(`${block.caption}:`, LINE), ...textTable(block.columns, rows, LINE)];
    }
    case 'picture':
      return ['', ...wrapText(`${block.caption}:`, LINE), ...inDots(block.draw(LINE))];
    case 'workings':
      return [
        '',
        ...wrapText(`-- ${safe(block.title)}`, LINE, 3),
        ...workingsRows(block.lines.map(safeLine), LINE).map(({ text }) => text),
      ];
  }
}
