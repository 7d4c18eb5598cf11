import type { Paper } from '../../session/session.ts';
import type { Sheet } from '../sheet.ts';
import { sectionPages } from './blocks.ts';
import { Pages } from './pages.ts';

/**
 * The sheet as a tagged PDF: a section from the top of a page, bookmarks, the title block and "3 of 12" on every page,
 * the fonts in it. The same sheet gives the same bytes.
 */
export async function writePdf(sheet: Sheet, paper: Paper): Promise<Uint8Array> {
  const { title, titleBlock, date, sections } = sheet;
  const pages = new Pages(title, titleBlock, date, paper);
  const root = pages.root();
  for (const [at, section] of sections.entries()) {
    pages.turn(at === 0 ? root : null);
    pages.begin(section.id, section.title);
    sectionPages(pages, root, section);
  }
  root.end();
  return pages.finish();
}
