import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parse } from 'parse5';
import { describe, expect, test } from 'vitest';
import { BOATHOUSE } from '../support/samples.ts';
import { elements, textIn } from './html-tree.ts';
import { CROWDED, jobAt, readPdf, textOf } from './support.ts';

/** The browser of this machine; null where it has none. */
const BROWSER = ['chromium', 'chromium-browser', 'google-chrome'].find(
  (name) => spawnSync(name, ['--version']).status === 0,
);
if (BROWSER === undefined) console.warn('no Chromium on the PATH: the HTML sheet is not tried in a browser');

const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
/** What a sheet forbids every script, which the checker is. */
const POLICY = /<meta http-equiv="Content-Security-Policy"[^>]*>/;

function browse(...args: string[]) {
  const profile = mkdtempSync(join(tmpdir(), 'thrice-browser-'));
  const own = ['--headless=new', '--no-sandbox', '--disable-gpu', `--user-data-dir=${profile}`];
  return spawnSync(BROWSER!, [...own, '--enable-logging=stderr', ...args], {
    encoding: 'utf8',
    maxBuffer: 1 << 28,
    timeout: 60_000,
  });
}

function page(html: string): string {
  const file = join(mkdtempSync(join(tmpdir(), 'thrice-page-')), 'sheet.html');
  writeFileSync(file, html);
  return file;
}

describe.skipIf(BROWSER === undefined)('in a browser (where there is one) the HTML sheet of', () => {
  test.each([BOATHOUSE.file, CROWDED])('%s has no fault that axe-core finds', async (file) => {
    const html = await textOf(jobAt(file), 'html');
    const checker = `<script>${AXE.replaceAll('</script', '<\\/script')}</script>
      <script>axe.run(document).then(({ violations, passes }) => {
        const list = violations.map(({ id, nodes }) => id + ': ' + nodes[0].html);
        document.title = 'axe ' + JSON.stringify({ list, passes: passes.length });
      });</script>`;
    const tried = html.replace(POLICY, '').replace('</body>', () => `${checker}</body>`);
    const { stdout } = browse('--virtual-time-budget=20000', '--dump-dom', `file://${page(tried)}`);
    const title = textIn(elements(parse(stdout), 'title')[0]!);
    const { list, passes } = JSON.parse(title.slice('axe '.length)) as { list: string[]; passes: number };
    expect(list).toEqual([]);
    expect(passes).toBeGreaterThan(20);
  });

  test.each([BOATHOUSE.file, CROWDED])('%s loads without an error and prints whole', async (file) => {
    const html = await textOf(jobAt(file), 'html');
    const at = page(html);
    const pdf = `${at}.pdf`;
    const { stderr } = browse(`--print-to-pdf=${pdf}`, `file://${at}`);
    expect(stderr).not.toMatch(/CONSOLE|Refused to/);
    const { pages } = await readPdf(readFileSync(pdf));
    const squeezed = (text: string) => text.replace(/\s+/g, '');
    const printed = squeezed(pages.flatMap(({ items }) => items.map(({ text }) => text)).join(''));
    // Breaks of lines and pages fall anywhere: words are looked for one by one, headings as they are.
    const headings = ['h2', 'h3', 'h4'].flatMap((name) => elements(parse(html), name));
    for (const heading of headings) expect(printed).toContain(squeezed(textIn(heading)));
    for (const { width, items } of pages) {
      for (const item of items) expect(item.x + item.width, item.text).toBeLessThanOrEqual(width);
    }
  });
});
