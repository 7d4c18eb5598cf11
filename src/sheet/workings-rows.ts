import type { WorkingLine } from '../timber/workings/index.ts';

/** A row of text, and what it is. */
export interface WorkingsRow {
  readonly text: string;
  readonly is: 'heading' | 'line' | 'note';
}

/** Lines stand in from their heading, what goes on from them stands in further. */
const INDENT = 2;
const HANGING = 6;
const GAP = 2;

/** A calculation as rows of at most `width` columns, broken between words; a blank row before each heading. */
export function workingsRows(lines: readonly WorkingLine[], width: number): WorkingsRow[] {
  const rows: WorkingsRow[] = [];
  for (const line of lines) {
    if (line.heading !== undefined) {
      if (rows.length > 0) rows.push({ text: '', is: 'line' });
      rows.push(...wrapText(line.heading, width).map((text): WorkingsRow => ({ text, is: 'heading' })));
    } else rows.push(...lineRows(line, width));
  }
  return rows;
}

function lineRows(line: WorkingLine, width: number): WorkingsRow[] {
  const { symbol, formula, numbers, result, clause = '', note = '' } = line;
  const parts = [symbol, formula, numbers, result].filter((part): part is string => part !== undefined);
  if (parts.length === 0) return noteRows(note, clause, width);
  // A reason goes right behind a value that has nothing else to show.
  const short = formula === undefined && numbers === undefined && note !== '';
  if (short) {
    const text = `${' '.repeat(INDENT)}${parts.join(' = ')}${' '.repeat(GAP)}${note}`;
    if (text.length + (clause === '' ? 0 : GAP + clause.length) <= width) {
      return [{ text: withClause(text, clause, width), is: 'line' }];
    }
  }
  const rows = chainRows(parts, width - INDENT).map((text) => ' '.repeat(INDENT) + text);
  const last = rows[rows.length - 1]!;
  const noted = wrapText(note, width - HANGING).map((text) => ' '.repeat(HANGING) + text);
  if (clause !== '') {
    if (last.length + GAP + clause.length <= width) rows[rows.length - 1] = withClause(last, clause, width);
    else noted.unshift(...clauseRows(clause, width));
  }
  return [
    ...rows.map((text): WorkingsRow => ({ text, is: 'line' })),
    ...noted.map((text): WorkingsRow => ({ text, is: 'note' })),
  ];
}

/** "a = b = c" on one row, or each " = " on its own, wrapped between words. */
function chainRows(parts: readonly string[], width: number): string[] {
  const whole = parts.join(' = ');
  if (whole.length <= width) return [whole];
  const head = parts.slice(0, 2).join(' = ');
  const rows = wrapText(head, width, HANGING - INDENT);
  for (const part of parts.slice(2)) {
    const last = rows[rows.length - 1]!;
    // The result stays beside its numbers where there is room.
    if (rows.length > 1 && last.length + 3 + part.length <= width)
      rows[rows.length - 1] = `${last} = ${part}`;
    else {
      const indent = HANGING - INDENT;
      rows.push(...wrapText(`= ${part}`, width - indent, GAP).map((text) => ' '.repeat(indent) + text));
    }
  }
  return rows;
}

function noteRows(note: string, clause: string, width: number): WorkingsRow[] {
  const rows = wrapText(note, width - INDENT).map((text) => ' '.repeat(INDENT) + text);
  if (clause !== '') {
    const last = rows[rows.length - 1] ?? '';
    if (rows.length > 0 && last.length + GAP + clause.length <= width)
      rows[rows.length - 1] = withClause(last, clause, width);
    else rows.push(...clauseRows(clause, width));
  }
  return rows.map((text): WorkingsRow => ({ text, is: 'line' }));
}

function clauseRows(clause: string, width: number): string[] {
  return wrapText(clause, width - HANGING).map((text) => text.padStart(width));
}

function withClause(text: string, clause: string, width: number): string {
  return clause === '' ? text : text + clause.padStart(width - text.length);
}

/** A text in lines of at most `width` columns; those after the first stand in. A word that is longer is cut. */
export function wrapText(text: string, width: number, hanging = 0): string[] {
  const lines: string[] = [];
  let line = '';
  const push = () => {
    if (line.trim() !== '') lines.push(line);
    line = ' '.repeat(hanging);
  };
  for (const word of text.split(' ').filter((each) => each !== '')) {
    const blank = line.trim() === '';
    if (!blank && line.length + 1 + word.length > width) push();
    const joined = line.trim() === '' ? line + word : `${line} ${word}`;
    if (joined.length <= width) {
      line = joined;
      continue;
    }
    let rest = word;
    while (line.length + rest.length > width) {
      const room = Math.max(1, width - line.length);
      line += rest.slice(0, room);
      rest = rest.slice(room);
      push();
    }
    line += rest;
  }
  if (line.trim() !== '') lines.push(line);
  return lines;
}
