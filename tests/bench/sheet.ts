import { spawnSync } from 'node:child_process';
import { mkdtempSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { FLOOR_BEAM } from '../support/session.ts';
import { median } from './median.ts';

const PROGRAM = 'dist/thrice.js';
const MEMBERS = 50;
const ROUNDS = 3;
const FORMATS = ['pdf', 'html', 'md', 'txt'] as const;

/** Beams of one to three spans with a few typed loads, as jobs have them. */
function members(count: number): object[] {
  const lengths = ['12 ft', '14 ft', '10 ft'];
  return Array.from({ length: count }, (_, at) => ({
    ...FLOOR_BEAM,
    name: `B${at + 1}`,
    spans: lengths.slice(0, 1 + (at % 3)),
    loads: [{ kind: 'snow', point: `${500 + 10 * at} lb`, at: '5 ft' }],
  }));
}

/** Seconds that the built program takes from its start to its end. */
function seconds(...args: string[]): number {
  const began = performance.now();
  const { status, stderr } = spawnSync(process.execPath, [PROGRAM, ...args], {
    encoding: 'utf8',
    stdio: ['ignore', 'ignore', 'pipe'],
  });
  if (status === null || status > 1 || stderr !== '') throw new Error(stderr);
  return (performance.now() - began) / 1000;
}

/** The sheet of a job of 50 members in every format, beside checking them. */
export function run(): void {
  const folder = mkdtempSync(join(tmpdir(), 'thrice-bench-'));
  const file = join(folder, 'job.json');
  writeFileSync(file, JSON.stringify({ thrice: 1, title: 'Bench', members: members(MEMBERS) }));
  const often = (...args: string[]) => median(Array.from({ length: ROUNDS }, () => seconds(...args)));
  const beside = often('check', file, '--json');
  console.log('sheet');
  for (const format of FORMATS) {
    const out = join(folder, `job.${format}`);
    const took = often('sheet', file, '-o', out);
    const size = Math.round(statSync(out).size / 1000);
    const aim = format === 'pdf' ? ' (aim: 5 s)' : '';
    console.log(
      `  ${MEMBERS} members to ${format}: ${took.toFixed(2)} s${aim}, ${(took / beside).toFixed(1)}x of check --json, ${size} kB`,
    );
  }
}
