import { afterEach, describe, expect, test, vi } from 'vitest';
import { FORMATS } from '../../src/sheet/format.ts';
import { bytesOf, CROWDED, jobAt, jobWith, readPdf } from './support.ts';

afterEach(() => vi.useRealTimers());

describe.each(FORMATS)('the bytes of a sheet as %s', (format) => {
  test('are the same for the same session, whatever the clock says', async () => {
    vi.useFakeTimers({ toFake: ['Date'] });
    vi.setSystemTime(new Date('2026-01-05T08:00:00Z'));
    const first = await bytesOf(jobAt(CROWDED), format);
    vi.setSystemTime(new Date('2031-11-23T21:30:00Z'));
    const again = await bytesOf(jobAt(CROWDED), format);
    expect(Buffer.compare(Buffer.from(first), Buffer.from(again))).toBe(0);
  });

  test('differ where the date given differs', async () => {
    const job = jobWith([{}]);
    const one = await bytesOf({ ...job, date: '2026-03-01' }, format);
    const other = await bytesOf({ ...job, date: '2026-03-02' }, format);
    expect(Buffer.compare(Buffer.from(one), Buffer.from(other))).not.toBe(0);
  });
});

describe('the date of a PDF', () => {
  const datesOf = async (date: string | null, top: object = {}) => {
    const { info } = await readPdf(await bytesOf({ ...jobWith([{}], top), date }, 'pdf'));
    return [info.CreationDate, info.ModDate];
  };

  test('is that which was given, and none where none was', async () => {
    expect(await datesOf('2026-03-01')).toEqual(['D:20260301000000Z', undefined]);
    expect(await datesOf(null)).toEqual([undefined, undefined]);
    expect(await datesOf('spring of 2026')).toEqual([undefined, undefined]);
    expect(await datesOf('2026-02-31')).toEqual([undefined, undefined]);
  });

  test('stands in the title block, and one that is given stands before it', async () => {
    expect(await datesOf(null, { sheet: { date: '2025-07-08' } })).toEqual(['D:20250708000000Z', undefined]);
    expect(await datesOf('2026-03-01', { sheet: { date: '2025-07-08' } })).toEqual([
      'D:20260301000000Z',
      undefined,
    ]);
  });
});
