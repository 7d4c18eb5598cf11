import { type ChildProcess, spawn, spawnSync } from 'node:child_process';
import { once } from 'node:events';
import { createWriteStream, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { median } from './median.ts';

/** A long schedule, so that the start of threads counts for little, and a short one to hold its memory against. */
const MANY = 100_000;
const FEW = 10_000;
/** One core and two are timed one after the other so often: they are to meet the same machine. */
const ROUNDS = 2;

const WOODS = ['Douglas Fir-Larch,No.2', 'Hem-Fir,No.2', 'Spruce-Pine-Fir,No.1/No.2', 'Southern Pine,No.2'];
const HEAD =
  'name,span (ft),tributary (ft),dead (psf),live (psf),snow (psf),species,grade,bracing,bearing (in),loads';

/** Beams such as a schedule holds: one in ten of two spans, one in seven with a point load, one in three with snow. */
function row(at: number): string {
  return [
    `B${at}`,
    at % 10 === 0 ? `${8 + (at % 6)}; ${7 + (at % 5)}` : 6 + ((at * 7) % 13) + (at % 4) / 4,
    2 + (at % 6),
    10 + (at % 8),
    [30, 40, 50, 60][at % 4],
    at % 3 === 0 ? 25 : '',
    WOODS[at % 4],
    at % 2 === 0 ? 'continuous' : 'ends',
    [3, 3.5, 5.5][at % 3],
    at % 7 === 0 ? 'snow 850 lb at 5 ft' : '',
  ].join(',');
}

async function schedule(folder: string, rows: number): Promise<string> {
  const file = join(folder, `${rows}.csv`);
  const to = createWriteStream(file);
  to.write(`${HEAD}\n`);
  for (let at = 0; at < rows; at += 1) {
    if (!to.write(`${row(at)}\n`)) await once(to, 'drain');
  }
  to.end();
  await once(to, 'finish');
  return file;
}

interface Run {
  readonly seconds: number;
  /** Of resident memory, MB; NaN where the system does not tell. */
  readonly peak: number;
}

const WATCH_MS = 50;

/** What keeps a program and all of its threads to one core, where the system has it. */
const ONE_CORE = spawnSync('taskset', ['--version']).status === 0 ? ['taskset', '-c', '0'] : [];

async function sized(file: string, threads: 1 | 2): Promise<Run> {
  const began = performance.now();
  // The engine's own helpers (collector, compiler) would use the other core too.
  const [command, ...args] = [
    ...(threads === 1 ? ONE_CORE : []),
    process.execPath,
    ...['dist/thrice.js', 'schedule', file, '-o', `${file}.out.csv`, '--threads', String(threads)],
  ];
  const program = spawn(command!, args, { stdio: 'ignore' });
  let peak = Number.NaN;
  const watch = setInterval(() => {
    peak = peakOf(program) ?? peak;
  }, WATCH_MS);
  await once(program, 'exit');
  clearInterval(watch);
  return { seconds: (performance.now() - began) / 1000, peak };
}

/** The most that the system has given it so far: VmHWM of Linux. */
function peakOf({ pid }: ChildProcess): number | null {
  try {
    const found = /^VmHWM:\s+(\d+) kB/m.exec(readFileSync(`/proc/${pid}/status`, 'utf8'));
    return found === null ? null : Number(found[1]) / 1024;
  } catch {
    return null;
  }
}

/** Rows a second over the whole rack of dimension lumber, on one core and on two; memory of a long schedule beside a short one. */
export async function run(): Promise<void> {
  const folder = mkdtempSync(join(tmpdir(), 'thrice-rows-'));
  try {
    const many = await schedule(folder, MANY);
    const [one, two]: [Run[], Run[]] = [[], []];
    for (let round = 0; round < ROUNDS; round += 1) {
      one.push(await sized(many, 1));
      two.push(await sized(many, 2));
    }
    const rate = Math.round(MANY / median(one.map(({ seconds }) => seconds)));
    const ratio = median(two.map(({ seconds }, round) => one[round]!.seconds / seconds));
    console.log(
      `schedule of ${MANY} rows: ${rate} rows a second on one core (aim 1000), two cores ${ratio.toFixed(2)}x (aim 1.7)`,
    );
    const few = (await sized(await schedule(folder, FEW), 2)).peak;
    const most = median(two.map(({ peak }) => peak));
    console.log(
      `peak memory: ${Math.round(few)} MB at ${FEW} rows, ${Math.round(most)} MB at ${MANY}: ${(most / few).toFixed(2)}x (aim 1.1)`,
    );
  } finally {
    rmSync(folder, { recursive: true });
  }
}
