import { mkdirSync, writeFileSync } from 'node:fs';
import { basename } from 'node:path';
import { afterAll, expect } from 'vitest';

/** What was compared with a published source in one test file: kept for the record in the contributor guide. */
export interface Compared {
  readonly source: string;
  /** Figures compared. */
  readonly values: number;
  /** The largest deviation of ours, as a share of the published figure. */
  readonly worst: number;
}

/** Where each test file leaves what it compared, for tests/published/record.mjs. */
const KEPT = new URL('../../node_modules/.cache/thrice-record/', import.meta.url);

interface Closeness {
  /** The largest difference allowed, in the figure's own unit. */
  readonly within: number;
  /** What the deviation is measured by where that is not the published figure itself. */
  readonly size?: number;
  readonly what?: string;
}

/** Comparisons with one published source. Call it once a source and test file, outside the tests. */
export function comparedWith(source: string) {
  let values = 0;
  let worst = 0;

  afterAll(() => {
    const { testPath } = expect.getState();
    mkdirSync(KEPT, { recursive: true });
    const compared: Compared = { source, values, worst };
    const file = `${basename(testPath!)} ${source}`.replace(/[^A-Za-z0-9.]+/g, '-');
    writeFileSync(new URL(`${file}.json`, KEPT), JSON.stringify(compared));
  });

  return {
    /** A figure of ours beside the published one. */
    holds(ours: number, published: number, { within, size = Math.abs(published), what }: Closeness): void {
      const off = Math.abs(ours - published);
      expect(off, `${what ?? 'ours'}: ${ours}, published: ${published}`).toBeLessThanOrEqual(within);
      values += 1;
      worst = Math.max(worst, size > 0 ? off / size : 0);
    },
    /** So many figures that another assertion has found equal, digit for digit. */
    held(figures: number): void {
      values += figures;
    },
  };
}
