import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { SAMPLES } from '../support/samples.ts';
import { bytesOf, CROWDED, type Item, jobAt, jobWith, type Page, readPdf } from './support.ts';

/** Points: A4 is 210 x 297 mm, Letter 8.5 x 11 in. */
const A4 = [(210 / 25.4) * 72, (297 / 25.4) * 72] as const;
const LETTER = [8.5 * 72, 11 * 72] as const;
/** White on every side, points: what every printer leaves. */
const WHITE = 28;
/** A reader measures a text with kerning and rounding of its own. */
const SLACK = 1;

/** What a text covers: from its base line up, as high as a capital letter. */
function boxOf({ x, y, width, size }: Item) {
  return { left: x, right: x + width, foot: y, top: y + 0.7 * size };
}

function expectOnPage(pages: readonly Page[]): void {
  for (const [at, { width, height, items }] of pages.entries()) {
    for (const item of items) {
      const { left, right, foot, top } = boxOf(item);
      const of = `${JSON.stringify(item.text)} on page ${at + 1}`;
      expect(left, of).toBeGreaterThanOrEqual(WHITE - SLACK);
      expect(right, of).toBeLessThanOrEqual(width - WHITE + SLACK);
      expect(foot, of).toBeGreaterThanOrEqual(WHITE - SLACK);
      expect(top, of).toBeLessThanOrEqual(height - WHITE / 2);
    }
  }
}

function expectApart(pages: readonly Page[]): void {
  for (const [at, { items }] of pages.entries()) {
    const boxes = items.map(boxOf);
    for (const [index, one] of boxes.entries()) {
      for (const [other, box] of boxes.slice(index + 1).entries()) {
        const wide = Math.min(one.right, box.right) - Math.max(one.left, box.left);
        const high = Math.min(one.top, box.top) - Math.max(one.foot, box.foot);
        const of = `${items[index]!.text} and ${items[index + 1 + other]!.text}, page ${at + 1}`;
        expect(wide > SLACK && high > 0.2, of).toBe(false);
      }
    }
  }
}

const LIBRARY = SAMPLES.find(({ title }) => title === 'Village library in the old mill')!;
const FILES = [LIBRARY.file, CROWDED];

describe.each(FILES)('the pages of %s', (file) => {
  test('have every text on the paper and none over another, on A4 and on Letter', async () => {
    for (const [paper, [width, height]] of [
      ['A4', A4],
      ['Letter', LETTER],
    ] as const) {
      const { pages } = await readPdf(await bytesOf(jobAt(file), 'pdf', paper));
      for (const page of pages) {
        expect(page.width).toBeCloseTo(width, 1);
        expect(page.height).toBeCloseTo(height, 1);
      }
      expectOnPage(pages);
      expectApart(pages);
    }
  });

  test('are numbered, and each says the title block', async () => {
    const job = jobAt(file);
    const sheet = { ...job.session.sheet, firm: job.session.sheet?.firm ?? 'Larch and Line' };
    const { pages } = await readPdf(await bytesOf({ ...job, session: { ...job.session, sheet } }, 'pdf'));
    for (const [at, { items }] of pages.entries()) {
      expect(items.map(({ text }) => text)).toContain(`${at + 1} of ${pages.length}`);
      const head = items
        .filter(({ y }) => y > pages[0]!.height - 90)
        .map(({ text }) => text)
        .join(' ');
      expect(head).toContain(`firm: ${sheet.firm}`);
    }
  });

  test('have a bookmark for the job and for each member, and what governs in the top quarter of its first page', async () => {
    const job = jobAt(file);
    const { pages, outline, document } = await readPdf(await bytesOf(job, 'pdf'));
    expect(outline.length).toBe(1 + job.members.length);
    const entries = await document.getOutline();
    for (const [at, { member }] of job.members.entries()) {
      const entry = entries[at + 1]!;
      expect(entry.title.startsWith(member.name)).toBe(true);
      const page = pages[await document.getPageIndex((entry.dest as never[])[0])]!;
      const quarter = page.items.filter(({ y }) => y >= 0.75 * page.height).map(({ text }) => text);
      expect(
        quarter.some((text) => text === 'PASSES' || text === 'FAILS'),
        member.name,
      ).toBe(true);
      expect(quarter.join(' '), member.name).toMatch(
        /governs at \d+\.\d\d|governs, |untied|nothing but itself/,
      );
    }
  });
});

describe('a PDF', () => {
  test('is tagged, in its language, and shows its title', async () => {
    const { document, marked, info } = await readPdf(await bytesOf(jobWith([{}]), 'pdf'));
    expect(marked).toMatchObject({ Marked: true });
    expect(info).toMatchObject({ Title: 'Test: calculation sheet', Language: 'en' });
    expect(await document.getViewerPreferences()).toMatchObject({ DisplayDocTitle: true });
    const trees = [2, 3].map(async (page) => (await document.getPage(page)).getStructTree());
    const tree = await Promise.all(trees);
    const roles = JSON.stringify(tree).match(/"role":"\w+"/g)!;
    for (const role of ['H1', 'H2', 'P', 'Table', 'TR', 'TH', 'TD', 'Figure']) {
      expect(roles, role).toContain(`"role":"${role}"`);
    }
    expect(JSON.stringify(tree)).toMatch(/"alt":"Sketch to scale/);
  });

  test('has every sign that timber needs in its fonts', async () => {
    const signs = 'Δ ² ³ ⊥ ≤ ′ ½ × − Fc⊥ f′ Łódź Ährenkranz Ωμ';
    const { pages } = await readPdf(await bytesOf(jobWith([{ note: signs }]), 'pdf'));
    expect(pages[1]!.items.map(({ text }) => text)).toContain(signs);
  });

  test('shows a box for a sign that its fonts lack, and keeps the rest of the text', async () => {
    const { pages } = await readPdf(await bytesOf(jobWith([{ note: 'beam 梁 of 🏗 oak' }]), 'pdf'));
    expect(pages[1]!.items.map(({ text }) => text)).toContain('beam □ of □ oak');
  });

  test('of names of any length and letters keeps every text on the paper and apart', async () => {
    const text = (most: number) =>
      fc
        .array(fc.constantFrom('W', 'i', 'beam', ' ', '-', 'Ü', '梁', '/', '.', 'mmmmmmmmmm'), {
          minLength: 1,
          maxLength: most,
        })
        .map((parts) => parts.join('').slice(0, most))
        .filter((each) => each.trim() !== '');
    await fc.assert(
      fc.asyncProperty(
        text(60),
        text(500),
        text(120),
        fc.constantFrom('A4', 'Letter'),
        async (name, note, firm, paper) => {
          const job = jobWith([{ name, note, pins: undefined }], {
            title: note.slice(0, 300),
            sheet: { firm, job: firm, by: firm },
          });
          const { pages } = await readPdf(await bytesOf(job, 'pdf', paper as 'A4'));
          expectOnPage(pages);
          expectApart(pages);
        },
      ),
      { numRuns: 8 },
    );
  });
});
