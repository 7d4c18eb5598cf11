import { execFileSync } from 'node:child_process';
import { defineConfig } from 'vitest/config';

const seed = seedOfProperties();
/** Of the runs of costly properties, see tests/support/runs.ts; `npm run fuzz` takes them all. */
const share = Number(process.env.THRICE_RUNS ?? 1 / 3);
// Vitest reads this file once in its main process.
console.log(
  `property tests start from seed ${seed}; costly ones take ${Math.round(100 * share)} % of their runs`,
);

/** Tests that put something in place of a module or of the environment, and those that start programs. */
const APART = [
  ...['files', 'package', 'pictures', 'terminal'].map((folder) => `tests/${folder}/**/*.test.{ts,tsx}`),
  'tests/screen/trail.test.ts',
];
const ALL = 'tests/**/*.test.{ts,tsx}';

const shared = {
  setupFiles: ['tests/support/seed.ts'],
  env: { THRICE_SEED: String(seed), THRICE_RUNS: String(share) },
  // Generous: property tests and pseudo-terminals share slow machines.
  testTimeout: 60_000,
};

export default defineConfig({
  test: {
    globalSetup: ['tests/support/around-run.ts'],
    projects: [
      // To load the program anew for every file would take longer than most of the tests do.
      { test: { ...shared, name: 'together', isolate: false, include: [ALL], exclude: APART } },
      { test: { ...shared, name: 'apart', include: APART } },
    ],
  },
});

/**
 * What property tests start from: THRICE_SEED where given, else the committed tree. So each change meets cases of its
 * own, and a tree that passed in one place passes in another. `npm run fuzz` goes on from seeds of chance.
 */
function seedOfProperties(): number {
  const given = process.env.THRICE_SEED;
  if (given !== undefined && /^-?\d+$/.test(given)) return Number(given) | 0;
  try {
    const tree = execFileSync('git', ['rev-parse', 'HEAD^{tree}'], {
      cwd: import.meta.dirname,
      encoding: 'utf8',
    });
    return Number.parseInt(tree.slice(0, 8), 16) | 0;
  } catch {
    return 1;
  }
}
