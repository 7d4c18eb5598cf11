/**
 * `npm run record` runs the comparisons with published sources and writes into the contributor guide what they
 * compared; `npm run record -- --check` ends with status 1 where the guide says otherwise.
 */
import { spawnSync } from 'node:child_process';
import { readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const KEPT = new URL('../../node_modules/.cache/thrice-record/', import.meta.url);
const GUIDE = new URL('../../DEVELOPERS.md', import.meta.url);
const BEGIN = '<!-- record: made by npm run record -->\n';
const END = '<!-- end of record -->\n';

/** Smaller deviations are those of floating point, which differ between machines. */
const ROUNDING = 1e-9;

rmSync(KEPT, { recursive: true, force: true });
const { status } = spawnSync('npx', ['vitest', 'run', '--reporter=dot', 'tests/published'], {
  cwd: fileURLToPath(new URL('../../', import.meta.url)),
  stdio: ['ignore', 'ignore', 'inherit'],
});
if (status !== 0) {
  console.error('the comparisons themselves fail: npx vitest run tests/published');
  process.exit(1);
}

const compared = new Map();
for (const file of readdirSync(KEPT)) {
  const { source, values, worst } = JSON.parse(readFileSync(new URL(file, KEPT), 'utf8'));
  const before = compared.get(source) ?? { values: 0, worst: 0 };
  compared.set(source, { values: before.values + values, worst: Math.max(before.worst, worst) });
}

const rows = [...compared].sort(([a], [b]) => a.localeCompare(b, 'en'));
const total = rows.reduce((sum, [, { values }]) => sum + values, 0);
const table = aligned([
  ['source', 'values', 'worst deviation'],
  ...rows.map(([source, { values, worst }]) => [source, String(values), deviation(worst)]),
  ['all', String(total), ''],
]);

const guide = readFileSync(GUIDE, 'utf8');
const [before, rest] = guide.split(BEGIN);
const [, after] = (rest ?? '').split(END);
if (after === undefined) throw new Error('DEVELOPERS.md has no place for the record');
const written = `${before}${BEGIN}\n${table}\n${END}${after}`;

if (!process.argv.includes('--check')) {
  writeFileSync(GUIDE, written);
} else if (written !== guide) {
  console.error(`DEVELOPERS.md does not hold what the tests compared; npm run record writes it:\n${table}`);
  process.exit(1);
}
console.log(`${total} published values of ${rows.length} sources compared`);

function deviation(worst) {
  if (worst === 0) return 'none';
  if (worst < ROUNDING) return 'rounding';
  return `${(100 * worst).toPrecision(2)} %`;
}

function aligned(cells) {
  const widths = cells[0].map((_, column) => Math.max(...cells.map((row) => row[column].length)));
  const line = (row) => `| ${row.map((cell, column) => cell.padEnd(widths[column])).join(' | ')} |\n`;
  return [cells[0], widths.map((width) => '-'.repeat(width)), ...cells.slice(1)].map(line).join('');
}
