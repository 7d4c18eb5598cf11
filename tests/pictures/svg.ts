import type { CellStyle, TerminalSession } from '../terminal/harness.ts';

/** A cell's size on the picture, in its own units: a common monospaced face at 15 is 9 wide. */
const WIDTH = 9;
const HEIGHT = 19;
const FONT_SIZE = 15;
/** Of a row's height, where letters stand. */
const BASELINE = 14;
const MARGIN = 12;
const GROUND = '#14171c';
/** What a terminal's own foreground is drawn in. */
const DEFAULT_INK = '#d6dae0';

/** The screen of a terminal as an SVG picture: text in its cells, colours and weight as the program set them. */
export function svgOf(session: TerminalSession, title: string): string {
  const rows = session.screen();
  const columns = Math.max(...rows.map((row) => row.length));
  const width = columns * WIDTH + 2 * MARGIN;
  const height = rows.length * HEIGHT + 2 * MARGIN;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" aria-label="${escaped(title)}">`,
    `<title>${escaped(title)}</title>`,
    `<rect width="100%" height="100%" rx="6" fill="${GROUND}"/>`,
    `<g font-family="DejaVu Sans Mono, Menlo, Consolas, monospace" font-size="${FONT_SIZE}" xml:space="preserve">`,
    ...rows.flatMap((row, y) => runsOf(session, row, y).map((run) => drawn(run, y))),
    '</g>',
    '</svg>',
    '',
  ].join('\n');
}

interface Run {
  readonly x: number;
  readonly text: string;
  readonly style: CellStyle;
}

/** Stretches of a row that look alike; blanks that show nothing are left out. */
function runsOf(session: TerminalSession, row: string, y: number): Run[] {
  const runs: Run[] = [];
  [...row].forEach((char, x) => {
    const style = session.styleAt(x, y);
    const last = runs.at(-1);
    if (last !== undefined && last.x + last.text.length === x && alike(last.style, style)) {
      runs[runs.length - 1] = { ...last, text: last.text + char };
    } else if (char !== ' ' || style.reverse) {
      runs.push({ x, text: char, style });
    }
  });
  return runs.map((run) => (run.style.reverse ? run : { ...run, text: run.text.trimEnd() }));
}

function alike(a: CellStyle, b: CellStyle): boolean {
  return a.foreground === b.foreground && a.bold === b.bold && a.dim === b.dim && a.reverse === b.reverse;
}

function drawn({ x, text, style }: Run, y: number): string {
  const left = MARGIN + x * WIDTH;
  const top = MARGIN + y * HEIGHT;
  const ink = style.foreground.startsWith('#') ? style.foreground : DEFAULT_INK;
  const bold = style.bold ? ' font-weight="bold"' : '';
  const dim = style.dim ? ' opacity="0.7"' : '';
  const box = style.reverse
    ? `<rect x="${left}" y="${top}" width="${text.length * WIDTH}" height="${HEIGHT}" fill="${ink}"/>`
    : '';
  // The length is given, so that a face of another width keeps the columns.
  return `${box}<text x="${left}" y="${top + BASELINE}" textLength="${text.length * WIDTH}" fill="${style.reverse ? GROUND : ink}"${bold}${dim}>${escaped(text)}</text>`;
}

function escaped(text: string): string {
  return text.replace(/[&<>"]/g, (char) => `&#${char.charCodeAt(0)};`);
}
