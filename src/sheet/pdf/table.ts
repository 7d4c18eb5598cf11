import { safe } from '../safe.ts';
import type { Row, Table } from '../sheet.ts';
import { columnWidths } from '../write/column-widths.ts';
import type { Element, Pages, Style } from './pages.ts';

const SIZE = 8;
const GAP = 8;
const PADDING = 2;
/** A word wider than this, in sizes, does not keep its column from giving way. */
const LONG_WORD = 8;

const PLAIN: Style = { size: SIZE, weight: 'regular', colour: '#111111' };
const STRONG: Style = { size: SIZE, weight: 'bold', colour: '#000000' };

/** A row broken into lines, cell by cell. */
interface Broken {
  readonly cells: readonly (readonly string[])[];
  readonly height: number;
}

/** A table under its caption; its heads stand again on each page that it goes on to. */
export function tableBlock(pages: Pages, parent: Element, table: Table): void {
  const { columns } = table;
  const heads = columns.map(({ head }) => head);
  const rows = table.rows.map((row) => row.cells.map(safe));
  const widths = widthsOf(pages, columns, table.rows, rows);
  const lefts = widths.map((_, at) => widths.slice(0, at).reduce((x, each) => x + each + GAP, pages.left));
  const leading = pages.leading(PLAIN);
  const broken = (cells: readonly string[], style: Style): Broken => {
    const lines = cells.map((cell, at) =>
      pages.faces[style.weight].lines(pages.faces[style.weight].shown(cell), SIZE, widths[at]!),
    );
    return { cells: lines, height: Math.max(...lines.map((each) => each.length)) };
  };

  const head = broken(heads, STRONG);
  const first = rows.length === 0 ? null : broken(rows[0]!, styleOf(table.rows[0]!));
  const caption = pages.faces.bold.lines(pages.faces.bold.shown(safe(table.caption)), SIZE, pages.width);
  pages.need(leading * (caption.length + head.height + (first?.height ?? 0)) + 4 * PADDING);
  const element = pages.within(parent, 'Table');
  const title = pages.within(element, 'Caption');
  for (const text of caption) {
    pages.marked(title, 'Caption', () => pages.put(text, pages.left, pages.y, STRONG));
    pages.y += leading;
  }
  title.end();
  pages.y += PADDING;

  /** Lines `from` to `to` of a row's cells; `cells` are their elements, none where it is for the eye alone. */
  const slice = (row: Broken, style: Style, from: number, to: number, cells: readonly Element[] | null) => {
    for (const [at, lines] of row.cells.entries()) {
      const draw = () => {
        for (let line = from; line < Math.min(to, lines.length); line += 1) {
          const text = lines[line]!;
          const wide = pages.faces[style.weight].width(text, SIZE);
          const x = columns[at]!.align === 'right' ? lefts[at]! + widths[at]! - wide : lefts[at]!;
          pages.put(text, x, pages.y + (line - from) * leading, style);
        }
      };
      if (lines.slice(from, to).join('') === '') continue;
      if (cells === null) draw();
      else pages.marked(cells[at]!, 'TD', draw);
    }
    pages.y += (to - from) * leading;
  };
  const ruled = (thickness: number, colour?: string) => {
    pages.artifact(() => pages.rule(pages.y + PADDING / 2, thickness, colour));
    pages.y += 2 * PADDING;
  };

  const headRow = pages.within(element, 'TR');
  const headCells = heads.map(() => pages.within(headRow, 'TH', { scope: 'Column' } as never));
  slice(head, STRONG, 0, head.height, headCells);
  headRow.end();
  ruled(0.6);
  for (const [index, row] of table.rows.entries()) {
    const style = styleOf(row);
    const lines = broken(rows[index]!, style);
    const rowElement = pages.within(element, 'TR');
    const cells = row.cells.map((_, at) =>
      at === 0 ? pages.within(rowElement, 'TH', { scope: 'Row' } as never) : pages.within(rowElement, 'TD'),
    );
    const link = row.leadsTo === undefined ? null : pages.within(cells[0]!, 'Link');
    const owners = link === null ? cells : [link, ...cells.slice(1)];
    for (let done = 0; done < lines.height; ) {
      const whole = lines.height * leading + 2 * PADDING;
      // A row that fits on a page is not torn.
      const least = done === 0 && whole < pages.bottom - pages.top - 60 ? whole : leading + 2 * PADDING;
      if (pages.need(least)) {
        pages.artifact(() => slice(head, STRONG, 0, head.height, null));
        ruled(0.6);
      }
      const fit = Math.max(1, Math.floor((pages.bottom - pages.y - 2 * PADDING) / leading));
      const to = Math.min(lines.height, done + fit);
      const top = pages.y;
      slice(lines, style, done, to, owners);
      if (done === 0 && link !== null) {
        const place = [lefts[0]!, top, widths[0]!, pages.y - top] as const;
        pages.leadTo(link, row.leadsTo!, place, row.cells[0]!);
      }
      done = to;
    }
    rowElement.end();
    ruled(0.4, '#bbbbbb');
  }
  element.end();
  pages.y += 6;
}

function styleOf({ strong }: Row): Style {
  return strong === true ? STRONG : PLAIN;
}

function widthsOf(
  pages: Pages,
  columns: Table['columns'],
  of: readonly Row[],
  rows: readonly (readonly string[])[],
): number[] {
  const wishes = columns.map(({ head }, at) => {
    const words = [head, ...rows.map((row) => row[at]!)];
    const face = (index: number) =>
      pages.faces[index === 0 || of[index - 1]!.strong === true ? 'bold' : 'regular'];
    const wide = (text: string, index: number) => face(index).width(face(index).shown(text), SIZE);
    const wanted = Math.max(...words.map(wide)) + 0.5;
    const longest = Math.max(
      ...words.flatMap((text, index) => text.split(' ').map((word) => wide(word, index))),
    );
    // A figure stays beside its unit.
    const least = columns[at]!.align === 'right' ? wanted : longest + 0.5;
    return { wanted, least: Math.min(LONG_WORD * SIZE, least) };
  });
  return columnWidths(wishes, pages.width - GAP * (columns.length - 1));
}
