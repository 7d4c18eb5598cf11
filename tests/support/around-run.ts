import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { COUNTED } from './tally.ts';

/** Around a whole run: names the file that counts go to, and tells their sums at its end. */
export default function setup(): () => void {
  const folder = mkdtempSync(join(tmpdir(), 'thrice-tally-'));
  // `npm run fuzz` names one file for all its rounds: each tells the sums so far.
  process.env.THRICE_TALLY ??= join(folder, 'counts');
  const file = process.env.THRICE_TALLY;
  return () => {
    const sums = tallied(file);
    if (sums !== '') console.log(sums);
    rmSync(folder, { recursive: true, force: true });
  };
}

/** "12 sessions fuzzed, 300 keys pressed": the sums of a file of counts. */
function tallied(file: string): string {
  const counts = linesOf(file).map((line) => JSON.parse(line) as Record<string, number>);
  const sums = COUNTED.map(
    (what) => [what, counts.reduce((sum, count) => sum + (count[what] ?? 0), 0)] as const,
  ).filter(([, sum]) => sum > 0);
  return sums.map(([what, sum]) => `${sum} ${what}`).join(', ');
}

function linesOf(file: string): string[] {
  try {
    return readFileSync(file, 'utf8').trim().split('\n');
  } catch {
    return [];
  }
}
