import type { Paper } from '../session/session.ts';
import type { Job } from './asked.ts';
import { makeSheet } from './content/make-sheet.ts';
import type { Format } from './format.ts';
import type { Sheet } from './sheet.ts';
import { writeHtml } from './write/html.ts';
import { writeMarkdown } from './write/markdown.ts';
import { writeText } from './write/text.ts';

/** How the sheet of a job is written. */
export interface SheetOptions {
  readonly format: Format;
  /** Stands in place of the session's; null leaves that one, or the one usual with the units. */
  readonly paper: Paper | null;
}

/** The calculation sheet of a job, written. The same job gives the same bytes, whatever the clock says. */
export async function sheetBytes(
  job: Job,
  { format, paper }: SheetOptions,
): Promise<{ readonly bytes: Uint8Array; readonly passes: boolean }> {
  const sheet = makeSheet(job);
  const on = paper ?? job.session.sheet?.paper ?? (job.units === 'us' ? 'Letter' : 'A4');
  return { bytes: await written(sheet, format, on), passes: sheet.passes };
}

async function written(sheet: Sheet, format: Format, on: Paper): Promise<Uint8Array> {
  switch (format) {
    case 'pdf': {
      const { writePdf } = await import('./pdf/write-pdf.ts');
      return writePdf(sheet, on);
    }
    case 'html':
      return utf8(writeHtml(sheet, on));
    case 'md':
      return utf8(writeMarkdown(sheet));
    case 'txt':
      return utf8(writeText(sheet));
  }
}

function utf8(text: string): Uint8Array {
  return new TextEncoder().encode(text);
}
