import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { makeSheet } from '../../../src/sheet/content/make-sheet.ts';
import { writeText } from '../../../src/sheet/write/text.ts';
import { member as anyMember } from '../../session/arbitrary-member.ts';
import { BOATHOUSE, SAMPLES } from '../../support/samples.ts';
import { CROWDED, jobAt, textOf } from '../support.ts';

/** What every terminal and printer has. */
const COLUMNS = 80;

describe('the sheet as text', () => {
  test.each([...SAMPLES.map(({ file }) => file), CROWDED])(
    'has no line over 80 columns: %s',
    async (file) => {
      for (const line of (await textOf(jobAt(file), 'txt')).split('\n')) {
        expect(line.length, line).toBeLessThanOrEqual(COLUMNS);
      }
    },
  );

  test('of any member has no line over 80 columns, and no number that is none', () => {
    fc.assert(
      fc.property(anyMember, fc.constantFrom('us' as const, 'si' as const), (member, units) => {
        const job = { ...jobAt(BOATHOUSE.file), units, members: [{ member, written: undefined }] };
        const text = writeText(makeSheet(job));
        for (const line of text.split('\n')) expect(line.length, line).toBeLessThanOrEqual(COLUMNS);
        expect(text).not.toMatch(/\bNaN\b|\bundefined\b|\[object/);
      }),
      { numRuns: 25 },
    );
  });
});
