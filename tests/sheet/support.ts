import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';
import { readSession } from '../../src/session/index.ts';
import type { Paper } from '../../src/session/session.ts';
import type { Job } from '../../src/sheet/asked.ts';
import type { Format } from '../../src/sheet/format.ts';
import { sheetBytes } from '../../src/sheet/index.ts';
import { sessionText } from '../support/session.ts';

/** Long names, a hundred loads, six spans, SI, and texts that mean something in HTML, Markdown and spreadsheets. */
export const CROWDED = fileURLToPath(new URL('crowded.json', import.meta.url));

export function jobOf(text: string, part: Partial<Job> = {}): Job {
  const read = readSession(text, 'test.json');
  if (!read.ok) throw new Error(read.fault);
  const { session } = read;
  return { session, members: session.members, units: session.units, only: null, date: null, ...part };
}

/** The job of members laid over a simple floor beam, with further keys of the session. */
export function jobWith(members: readonly Readonly<Record<string, unknown>>[], top: object = {}): Job {
  return jobOf(JSON.stringify({ ...JSON.parse(sessionText(...members)), ...top }));
}

export function jobAt(file: string): Job {
  return jobOf(readFileSync(file, 'utf8'));
}

export async function bytesOf(job: Job, format: Format, paper: Paper | null = null): Promise<Uint8Array> {
  return (await sheetBytes(job, { format, paper })).bytes;
}

export async function textOf(job: Job, format: Exclude<Format, 'pdf'>): Promise<string> {
  return new TextDecoder().decode(await bytesOf(job, format));
}

/** A run of text on a page, points from its lower left corner. */
export interface Item {
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly size: number;
}

export interface Page {
  readonly width: number;
  readonly height: number;
  /** In the order in which they are read. */
  readonly items: readonly Item[];
}

/** What a reader of its own finds in a PDF. */
export async function readPdf(bytes: Uint8Array) {
  const document = await getDocument({ data: Uint8Array.from(bytes), useSystemFonts: false, verbosity: 0 })
    .promise;
  const pages: Page[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const [, , width, height] = page.view as [number, number, number, number];
    const { items } = await page.getTextContent();
    pages.push({
      width,
      height,
      items: items.flatMap((item) =>
        !('str' in item) || item.str.trim() === ''
          ? []
          : [
              {
                text: item.str,
                x: item.transform[4] as number,
                y: item.transform[5] as number,
                width: item.width,
                size: item.height,
              },
            ],
      ),
    });
  }
  const outline = ((await document.getOutline()) ?? []).map(({ title, items }) => ({
    title,
    items: items.map((item: { title: string }) => item.title),
  }));
  const info = (await document.getMetadata()).info as Record<string, unknown>;
  const marked = await document.getMarkInfo();
  return { pages, outline, info, marked, document };
}
