import type { WorkingLine } from '../../timber/workings/index.ts';
import { ROW } from '../drawing/drawing.ts';
import { safe, safeLine } from '../safe.ts';
import type { Block, Fact, Facts, Picture, Section, Verdict } from '../sheet.ts';
import type { Element, Pages, Style } from './pages.ts';
import { COLUMNS, columnOf, drawPicture } from './picture.ts';
import { tableBlock } from './table.ts';

const BLACK = '#000000';
const TITLE: Style = { size: 14, weight: 'bold', colour: BLACK };
/** Lines of a title in its own size. */
const MOST_TITLE = 2;
const HEADING: Style = { size: 11, weight: 'bold', colour: BLACK };
const SUBHEADING: Style = { size: 9, weight: 'bold', colour: BLACK };
const PART: Style = { size: 8, weight: 'bold', colour: '#222222' };
const TEXT: Style = { size: 9, weight: 'regular', colour: '#111111' };
const LINE: Style = { size: 8.5, weight: 'regular', colour: '#111111' };
const NOTE: Style = { size: 7.5, weight: 'regular', colour: '#333333' };
const VERDICT: Style = { size: 13, weight: 'bold', colour: BLACK };
const SENTENCE: Style = { size: 11, weight: 'bold', colour: BLACK };

/** A member or the job, from the top of a page. */
export function sectionPages(pages: Pages, parent: Element, section: Section): void {
  const element = pages.within(parent, 'Sect', { title: safe(section.title) });
  const title = safe(section.title);
  const lines = pages.faces.bold.lines(pages.faces.bold.shown(title), TITLE.size, pages.width);
  // What it comes to has to stand in the top quarter of the page, however long the name.
  paragraph(pages, element, 'H1', title, lines.length > MOST_TITLE ? HEADING : TITLE);
  pages.y += 2;
  for (const [at, block] of section.blocks.entries()) {
    // A heading stays with the picture that it heads.
    const next = section.blocks[at + 1];
    if (block.kind === 'heading' && next?.kind === 'picture') {
      pages.need(pictureSize(pages, next).whole + 4 * pages.leading(HEADING));
    }
    blockOn(pages, element, block);
  }
  element.end();
}

function blockOn(pages: Pages, parent: Element, block: Block): void {
  switch (block.kind) {
    case 'heading':
      pages.y += 8;
      // A heading stays with what it heads.
      pages.need(4 * pages.leading(HEADING));
      pages.mark(block.text);
      paragraph(pages, parent, 'H2', safe(block.text), HEADING);
      pages.y += 3;
      return;
    case 'verdict':
      verdict(pages, parent, block);
      return;
    case 'facts':
      factsBlock(pages, parent, block);
      return;
    case 'text':
      paragraph(pages, parent, 'P', safe(block.text), TEXT);
      pages.y += 4;
      return;
    case 'list':
      list(pages, parent, block.items);
      return;
    case 'table':
      tableBlock(pages, parent, block);
      return;
    case 'picture':
      picture(pages, parent, block);
      return;
    case 'workings':
      workings(pages, parent, block.title, block.lines);
      return;
  }
}

/** Where lines stand, points: how far in, how much further in after the first, how wide from there. */
interface Room {
  readonly indent?: number;
  readonly hanging?: number;
  readonly width?: number;
}

/** A text in lines, each of which may begin a page. */
function paragraph(
  pages: Pages,
  parent: Element,
  type: string,
  text: string,
  style: Style,
  room: Room = {},
): void {
  const { indent = 0, hanging = 0 } = room;
  const width = room.width ?? pages.width - indent;
  const element = pages.within(parent, type);
  const face = pages.faces[style.weight];
  const lines = face.lines(face.shown(text), style.size, width - hanging);
  for (const [at, line] of lines.entries()) {
    pages.need(pages.leading(style));
    const x = pages.left + indent + (at === 0 ? 0 : hanging);
    pages.marked(element, type, () => pages.put(line, x, pages.y, style));
    pages.y += pages.leading(style);
  }
  element.end();
}

/** The verdict in a box, its frame heavier where it fails; kept on one page. */
function verdict(pages: Pages, parent: Element, { passes, word, sentence, facts }: Verdict): void {
  const inset = 7;
  const width = pages.width - 2 * inset;
  const face = pages.faces.bold;
  const head = face.lines(face.shown(safe(sentence)), SENTENCE.size, width);
  const rest = factLines(pages, facts, width);
  const height =
    pages.leading(VERDICT) +
    head.length * pages.leading(SENTENCE) +
    rest.length * pages.leading(TEXT) +
    2 * inset;
  pages.need(height + 6);
  const top = pages.y;
  pages.artifact(() =>
    pages.doc
      .rect(pages.left + 1, top, pages.width - 2, height)
      .lineWidth(passes ? 0.8 : 2.4)
      .strokeColor(BLACK)
      .stroke(),
  );
  pages.y += inset;
  const x = pages.left + inset;
  const line = (type: string, texts: readonly string[], style: Style) => {
    if (texts.length === 0) return;
    const element = pages.within(parent, type);
    for (const text of texts) {
      pages.marked(element, type, () => pages.put(text, x, pages.y, style));
      pages.y += pages.leading(style);
    }
    element.end();
  };
  line('P', [word], VERDICT);
  line('P', head, SENTENCE);
  line('P', rest, TEXT);
  pages.y = top + height + 8;
}

/** "size: (2) 2x12    wood: ..." in lines, broken between two facts where that can be. */
function factLines(pages: Pages, facts: readonly Fact[], width: number): string[] {
  const face = pages.faces.regular;
  const lines: string[] = [];
  let line = '';
  for (const [label, value] of facts) {
    const fact = face.shown(`${label}: ${safe(value)}`);
    const longer = line === '' ? fact : `${line}     ${fact}`;
    if (line !== '' && face.width(longer, TEXT.size) > width) {
      lines.push(line);
      line = fact;
    } else line = longer;
  }
  if (line !== '') lines.push(line);
  return lines.flatMap((each) =>
    face.width(each, TEXT.size) > width ? face.lines(each, TEXT.size, width) : [each],
  );
}

/** Facts in two columns under their caption, a pair of them a row. */
function factsBlock(pages: Pages, parent: Element, { caption, facts }: Facts): void {
  pages.need(3 * pages.leading(PART));
  paragraph(pages, parent, 'P', safe(caption), PART);
  const column = pages.width / 2;
  const face = pages.faces.regular;
  const lines = facts.map(([label, value]) =>
    face.lines(face.shown(`${label}: ${safe(value)}`), LINE.size, column - GUTTER),
  );
  const short = lines.filter((each) => each.length <= MOST_BESIDE);
  const half = Math.ceil(short.length / 2);
  for (let row = 0; row < half; row += 1) {
    const pair = [short[row]!, short[row + half] ?? []];
    const high = Math.max(...pair.map((each) => each.length));
    for (let at = 0; at < high; at += 1) {
      pages.need(pages.leading(LINE));
      for (const [side, each] of pair.entries()) {
        const text = each[at];
        if (text === undefined) continue;
        const element = pages.within(parent, 'P');
        pages.marked(element, 'P', () => pages.put(text, pages.left + side * column, pages.y, LINE));
        element.end();
      }
      pages.y += pages.leading(LINE);
    }
  }
  // What takes many lines has the whole width.
  for (const [at, [label, value]] of facts.entries()) {
    if (lines[at]!.length > MOST_BESIDE) paragraph(pages, parent, 'P', `${label}: ${safe(value)}`, LINE);
  }
  pages.y += 4;
}

function list(pages: Pages, parent: Element, items: readonly string[]): void {
  const element = pages.within(parent, 'L');
  for (const item of items) {
    const entry = pages.within(element, 'LI');
    pages.need(pages.leading(TEXT));
    const label = pages.within(entry, 'Lbl');
    pages.marked(label, 'Lbl', () => pages.put('•', pages.left + 2, pages.y, TEXT));
    label.end();
    paragraph(pages, entry, 'LBody', safe(item), TEXT, { indent: 12 });
    entry.end();
    pages.y += 1;
  }
  element.end();
  pages.y += 4;
}

/** A picture with its caption in lines, as large as a page allows; sizes in points. */
function pictureSize(pages: Pages, { caption, draw }: Picture) {
  const drawing = draw(COLUMNS);
  const face = pages.faces.bold;
  const head = face.lines(face.shown(safe(caption)), PART.size, pages.width);
  const above = head.length * pages.leading(PART) + 2;
  const column = columnOf(drawing, pages, pages.bottom - pages.top - above);
  const height = drawing.rows * ROW * column;
  return { drawing, head, column, height, whole: above + height };
}

/** A drawing under its caption, on one page. */
function picture(pages: Pages, parent: Element, block: Picture): void {
  const { caption, says } = block;
  const { drawing, head, column, height, whole } = pictureSize(pages, block);
  pages.need(whole);
  for (const text of head) {
    const title = pages.within(parent, 'P');
    pages.marked(title, 'P', () => pages.put(text, pages.left, pages.y, PART));
    title.end();
    pages.y += pages.leading(PART);
  }
  const top = pages.y + 2;
  const left = pages.left + (pages.width - column * COLUMNS) / 2;
  const element = pages.within(parent, 'Figure', {
    alt: safe(`${caption}: ${says}`),
    bbox: [left, top, left + column * COLUMNS, top + height],
    placement: 'Block',
  } as never);
  pages.marked(element, 'Figure', () => drawPicture(drawing, pages, { left, top, column }));
  element.end();
  pages.y = top + height + 6;
}

/** Share of the width that a calculation takes; its clauses stand right of it. */
const CHAIN = 0.76;
const GUTTER = 10;
/** More lines than this do not stand beside others. */
const MOST_BESIDE = 3;
/** Points that a line stands in, and further in what goes on from it. */
const INDENT = 12;
const HANGING = 14;

function workings(pages: Pages, parent: Element, title: string, lines: readonly WorkingLine[]): void {
  pages.y += 4;
  pages.need(5 * pages.leading(LINE));
  paragraph(pages, parent, 'H3', safe(title), SUBHEADING);
  for (const line of lines) workingLine(pages, parent, safeLine(line));
  pages.y += 4;
}

function workingLine(pages: Pages, parent: Element, line: WorkingLine): void {
  if (line.heading !== undefined) {
    pages.y += 2;
    pages.need(3 * pages.leading(LINE));
    paragraph(pages, parent, 'P', line.heading, PART, { indent: INDENT / 2 });
    return;
  }
  const { symbol, formula, numbers, result, clause = '', note = '' } = line;
  const chain = [symbol, formula, numbers, result].filter((part) => part !== undefined).join(' = ');
  const width = pages.width * CHAIN;
  const face = pages.faces.regular;
  const beside = face.lines(face.shown(clause), NOTE.size, pages.width - width - GUTTER);
  // A source in many words goes under the line.
  const clauses = clause === '' || beside.length > MOST_BESIDE ? [] : beside;
  pages.need(Math.max(pages.leading(LINE), clauses.length * pages.leading(NOTE)));
  const { page } = pages.doc;
  const { y } = pages;
  // A reason goes right behind a value that has nothing else to show.
  const short = formula === undefined && numbers === undefined ? `${chain}   ${note}` : '';
  if (short !== '' && chain !== '' && face.width(short, LINE.size) <= width - INDENT) {
    paragraph(pages, parent, 'P', short, LINE, { indent: INDENT, width: pages.width });
  } else {
    const within = { indent: INDENT, hanging: HANGING, width: width - INDENT };
    if (chain !== '') paragraph(pages, parent, 'P', chain, LINE, within);
    const indent = chain === '' ? INDENT : INDENT + HANGING;
    if (note !== '') paragraph(pages, parent, 'P', note, NOTE, { indent, width: width - indent });
  }
  if (beside.length > MOST_BESIDE) {
    const indent = INDENT + HANGING;
    paragraph(pages, parent, 'P', clause, NOTE, { indent, width: width - indent });
  }
  if (clauses.length === 0) return;
  // Beside the first line; where that is a page back, beside the last.
  const top = pages.doc.page === page ? y : pages.y - pages.leading(NOTE);
  const element = pages.within(parent, 'P');
  for (const [at, text] of clauses.entries()) {
    const row = top + at * pages.leading(NOTE);
    pages.marked(element, 'P', () => pages.put(text, pages.left + width + GUTTER, row, NOTE));
  }
  element.end();
  pages.y = Math.max(pages.y, top + clauses.length * pages.leading(NOTE));
}
