import { inDots } from '../drawing/in-dots.ts';
import { safe, safeLine } from '../safe.ts';
import type { Block, Fact, Row, Section, Sheet, Table } from '../sheet.ts';
import { workingsRows } from '../workings-rows.ts';
import { LINE } from './text.ts';

/** The sheet as Markdown (CommonMark with tables), its drawings in braille. */
export function writeMarkdown(sheet: Sheet): string {
  const lines = [
    `# ${escaped(sheet.title)}`,
    '',
    ...factLines(sheet.titleBlock),
    ...sheet.sections.flatMap((section) => sectionLines(section, sheet)),
  ];
  return `${lines
    .join('\n')
    .replace(/\n{3,}/g, '\n\n')
    .trimEnd()}\n`;
}

function sectionLines({ id, title, blocks }: Section, { titleBlock }: Sheet): string[] {
  const running = titleBlock.map(([label, value]) => `${label} ${escaped(value)}`).join('; ');
  return [
    '',
    '---',
    '',
    `<a id="${id}"></a>`,
    '',
    `## ${escaped(title)}`,
    '',
    ...(running === '' ? [] : [running, '']),
    ...blocks.flatMap(blockLines),
  ];
}

function factLines(facts: readonly Fact[]): string[] {
  return [...facts.map(([label, value]) => `- ${label}: ${escaped(value)}`), ''];
}

function blockLines(block: Block): string[] {
  switch (block.kind) {
    case 'heading':
      return ['', `### ${escaped(block.text)}`, ''];
    case 'verdict':
      return [`**${block.word}** ${escaped(block.sentence)}`, '', ...factLines(block.facts)];
    case 'facts':
      return [`${escaped(block.caption)}:`, '', ...factLines(block.facts)];
    case 'text':
      return [escaped(block.text), ''];
    case 'list':
      return [...block.items.map((item) => `- ${escaped(item)}`), ''];
    case 'table':
      return tableLines(block);
    case 'picture':
      return [`${escaped(block.caption)}:`, '', ...fenced(inDots(block.draw(LINE)))];
    case 'workings':
      return [
        `#### ${escaped(block.title)}`,
        '',
        ...fenced(workingsRows(block.lines.map(safeLine), LINE).map(({ text }) => text)),
      ];
  }
}

function tableLines({ caption, columns, rows }: Table): string[] {
  const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |`;
  const cell = ({ strong, leadsTo }: Row, text: string, at: number): string => {
    const written = escaped(text);
    if (written === '') return '';
    const led = at === 0 && leadsTo !== undefined ? `[${written}](#${leadsTo})` : written;
    return strong === true ? `**${led}**` : led;
  };
  return [
    `${escaped(caption)}:`,
    '',
    line(columns.map(({ head }) => head)),
    line(columns.map(({ align }) => (align === 'right' ? '---:' : '---'))),
    ...rows.map((row) => line(row.cells.map((text, at) => cell(row, text, at)))),
    '',
  ];
}

/** Lines that nothing is read into: the fence is longer than any within. */
function fenced(lines: readonly string[]): string[] {
  const longest = Math.max(2, ...lines.flatMap((line) => line.match(/`+/g) ?? []).map((run) => run.length));
  const fence = '`'.repeat(longest + 1);
  return [`${fence}text`, ...lines, fence, ''];
}

/**
 * A text of which Markdown reads nothing: every mark that CommonMark or its tables give a meaning is escaped, `<` and
 * `&` as entities, since some readers take HTML before they take a backslash. A leading number with a point is no list.
 */
function escaped(text: string): string {
  return safe(text)
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/[\\`*_{}[\]#|~$]/g, (mark) => `\\${mark}`)
    .replace(/!(?=\\\[)/g, '\\!')
    .replace(/(https?|ftp|mailto)(:)/gi, '$1&#58;')
    .replace(/\b(www)(\.)/gi, '$1&#46;')
    .replace(/@/g, '&#64;')
    .replace(/^(\d{1,9})([.)])(?=\s|$)/, '$1\\$2')
    .replace(/^([-+=])/, '\\$1')
    .trim();
}
