import { copyFileSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join } from 'node:path';
import { spawn } from '@lydell/node-pty';

/** The terminal all benches are run in. */
export const COLUMNS = 120;
export const ROWS = 40;

/** Ink ends every frame with this, the end of a synchronized update. */
const FRAME_END = '\x1b[?2026l';
const RIGHT = '\x1b[C';
const LEFT = '\x1b[D';
/** A program that has not answered by then never will. */
const PATIENCE_MS = 15_000;
/** After this long without a byte the frame is taken to be whole. */
const QUIET_MS = 40;

const sleep = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** A program in a pseudo-terminal, watched byte by byte. */
export interface WatchedProgram {
  /** Milliseconds from start to the last byte of the first frame. */
  readonly start: number;
  /** Presses → or ←; milliseconds to the last byte it made the program write, and how many bytes. */
  press(key: 'right' | 'left'): Promise<{ readonly ms: number; readonly bytes: number }>;
  /** Presses → or ← without waiting. */
  send(key: 'right' | 'left'): void;
  /** Frames written so far. */
  frames(): number;
  quit(): Promise<void>;
}

function copyOf(file: string): string {
  const copy = join(mkdtempSync(join(tmpdir(), 'thrice-bench-')), basename(file));
  copyFileSync(file, copy);
  return copy;
}

/** Starts `node` with these arguments; resolves at its first frame. */
export async function watch(args: readonly string[]): Promise<WatchedProgram> {
  const { PATH = '', HOME = '' } = process.env;
  const env = {
    PATH,
    HOME,
    TERM: 'xterm-256color',
    COLORTERM: 'truecolor',
    LANG: 'C.UTF-8',
    COLORFGBG: '15;0',
  };
  const began = performance.now();
  // A killed program leaves a recovery journal, which the next would ask about.
  const own = args.map((arg) => (arg.endsWith('.json') ? copyOf(arg) : arg));
  const pty = spawn(process.execPath, own, { name: env.TERM, cols: COLUMNS, rows: ROWS, env });
  let written = '';
  let last = began;
  let ended = false;
  let wake = (): void => {};
  pty.onData((data) => {
    written += data;
    last = performance.now();
    wake();
  });
  pty.onExit(() => {
    ended = true;
    wake();
  });
  const more = (): Promise<void> =>
    new Promise((resolve, reject) => {
      const timer = setTimeout(() => reject(new Error(`${args.join(' ')}: no answer`)), PATIENCE_MS);
      wake = () => {
        clearTimeout(timer);
        if (ended) reject(new Error(`${args.join(' ')} ended early: ${written.slice(-500)}`));
        else resolve();
      };
    });
  const quiet = async (): Promise<void> => {
    while (performance.now() - last < QUIET_MS) await sleep(QUIET_MS / 4);
  };
  const send = (key: 'right' | 'left'): void => pty.write(key === 'right' ? RIGHT : LEFT);

  while (!written.includes(FRAME_END)) await more();
  const start = last - began;
  await quiet();

  return {
    start,
    async press(key) {
      const before = written.length;
      const from = performance.now();
      send(key);
      while (!written.slice(before).includes(FRAME_END)) await more();
      await quiet();
      return { ms: last - from, bytes: Buffer.byteLength(written.slice(before)) };
    },
    send,
    frames: () => written.split(FRAME_END).length - 1,
    async quit() {
      if (!ended) pty.kill('SIGKILL');
      while (!ended) await sleep(5);
    },
  };
}
