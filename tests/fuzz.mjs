/**
 * npm run fuzz [-- MINUTES [FILE-OR-FOLDER ...]]: the property tests again and again, each round from a seed of chance.
 * Ends with status 1 at the first round that fails and says how to repeat it.
 */
import { spawnSync } from 'node:child_process';
import { randomInt } from 'node:crypto';
import { mkdtempSync, readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const [minutes = '10', ...within] = process.argv.slice(2);
if (!(Number(minutes) > 0)) {
  console.error(`"${minutes}" is not a number of minutes; an example: npm run fuzz -- 30 tests/statics`);
  process.exit(2);
}

const files = readdirSync(`${root}tests`, { recursive: true, encoding: 'utf8' })
  .filter(
    (file) =>
      /\.test\.tsx?$/.test(file) && readFileSync(`${root}tests/${file}`, 'utf8').includes('fast-check'),
  )
  .map((file) => `tests/${file}`)
  .filter((file) => within.length === 0 || within.some((part) => file.startsWith(part)));

/** A round takes all runs, beside whatever else the machine does. */
const PATIENCE_MS = 1_800_000;
// Each round tells the sums of all rounds so far.
const tally = join(mkdtempSync(join(tmpdir(), 'thrice-fuzz-')), 'counts');
const end = Date.now() + Number(minutes) * 60_000;
let rounds = 0;
while (Date.now() < end) {
  const seed = String(randomInt(2 ** 31));
  const { status } = spawnSync(
    'npx',
    ['vitest', 'run', '--reporter=dot', `--testTimeout=${PATIENCE_MS}`, ...files],
    {
      cwd: root,
      env: { ...process.env, THRICE_SEED: seed, THRICE_RUNS: '1', THRICE_TALLY: tally },
      stdio: 'inherit',
    },
  );
  if (status !== 0) {
    console.error(`failed from seed ${seed}; again: THRICE_SEED=${seed} THRICE_RUNS=1 npx vitest run FILE`);
    process.exit(1);
  }
  rounds += 1;
}
console.log(`${rounds} rounds of ${files.length} files, none failed`);
