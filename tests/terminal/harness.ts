import { execFileSync } from 'node:child_process';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type IPty, spawn } from '@lydell/node-pty';
import xterm from '@xterm/headless';
import { keyBytes } from './key-bytes.ts';

/** The bundle that `npm run build` makes. */
export const BUNDLE: string = fileURLToPath(new URL('../../dist/thrice.js', import.meta.url));

export interface OpenOptions {
  /** Default: node and the bundle. The first is the program, the rest its leading arguments. */
  readonly program?: readonly string[];
  readonly args?: readonly string[];
  readonly columns?: number;
  readonly rows?: number;
  /** Added to a small, fixed environment; undefined takes a variable away. */
  readonly env?: Readonly<Record<string, string | undefined>>;
  readonly cwd?: string;
}

/** How a cell looks. */
export interface CellStyle {
  readonly char: string;
  readonly bold: boolean;
  readonly dim: boolean;
  readonly underline: boolean;
  readonly reverse: boolean;
  /** "default", "palette 12" or "#7db7ff". */
  readonly foreground: string;
}

/** What a program left behind when it ended. */
export interface Ending {
  readonly code: number;
  /** The alternate screen is left, the cursor shows, bracketed paste is off. */
  readonly screenRestored: boolean;
  /** The line discipline echoes and edits again, as `stty` tells. */
  readonly modesRestored: boolean;
}

type Predicate = (screen: readonly string[]) => boolean;

export interface TerminalSession {
  /** Presses keys by name, in one write: 'right', 'enter', 'shift+left', 'ctrl+c', 'page down', or a character. */
  press(...keys: readonly string[]): void;
  /** Sends bytes as they are, in one write. */
  write(bytes: string): void;
  /** Sends a text as a terminal in bracketed paste mode does. */
  paste(text: string): void;
  /** The rows in sight, top first, blanks at their ends trimmed. */
  screen(): string[];
  /** The rows in sight as one text. */
  text(): string;
  styleAt(x: number, y: number): CellStyle;
  /** Cell of the cursor, and whether it shows. */
  cursor(): { readonly x: number; readonly y: number; readonly shown: boolean };
  onAlternateScreen(): boolean;
  /** Waits until the screen is as said; throws with the screen after `ms`. */
  until(wanted: Predicate | RegExp | string, ms?: number): Promise<string[]>;
  /** Waits until nothing has been written for `quietMs`. */
  settle(quietMs?: number): Promise<string[]>;
  resize(columns: number, rows: number): void;
  /** Everything the program has written so far. */
  written(): string;
  /** Process id of the program itself. */
  pid(): number;
  /** Sends a signal to the program itself. */
  signal(name: NodeJS.Signals): void;
  /** Waits for the program to end by itself. */
  exit(ms?: number): Promise<Ending>;
  /** Ends the program if it still runs. */
  close(): Promise<void>;
}

const DEFAULT_SIZE = { columns: 80, rows: 24 };
/** Generous: tests share their machine. */
const PATIENCE_MS = 10_000;
const LOOK_EVERY_MS = 10;
const QUIET_MS = 80;
/** The shell around the program prints this, then what stty says. */
const ENDED = '\x1b]7337;ended\x07';
const WRAPPER = `"$@"; code=$?; printf '\\033]7337;ended\\007'; stty -a; exit $code`;

const sleep = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Nothing of the machine's own environment decides how the program looks; above all not CI, NO_COLOR. */
function childEnv(added: OpenOptions['env']): Record<string, string> {
  const { PATH = '', HOME = '', TMPDIR } = process.env;
  const env = {
    PATH,
    HOME,
    TMPDIR,
    // What the program keeps of its own stays out of this machine's home, and of the next test.
    XDG_STATE_HOME: added?.XDG_STATE_HOME ?? mkdtempSync(join(tmpdir(), 'thrice-state-')),
    TERM: 'xterm-256color',
    LANG: 'C.UTF-8',
    ...added,
  };
  return Object.fromEntries(
    Object.entries(env).filter((pair): pair is [string, string] => pair[1] !== undefined),
  );
}

/** Follows the private modes a program sets (cursor 25, paste 2004), which xterm does not tell. */
function watchModes(terminal: xterm.Terminal): ReadonlySet<number> {
  const CURSOR = 25;
  const modes = new Set<number>([CURSOR]);
  for (const [final, set] of [['h', true] as const, ['l', false] as const]) {
    terminal.parser.registerCsiHandler({ prefix: '?', final }, (parameters) => {
      for (const mode of parameters.flat()) {
        if (set) modes.add(mode);
        else modes.delete(mode);
      }
      return false;
    });
  }
  return modes;
}

function matcher(wanted: Predicate | RegExp | string): Predicate {
  if (typeof wanted === 'function') return wanted;
  if (typeof wanted === 'string') return (rows) => rows.join('\n').includes(wanted);
  return (rows) => wanted.test(rows.join('\n'));
}

/** Starts a program in a real pseudo-terminal; a headless xterm keeps its screen and answers its queries. */
export function open(options: OpenOptions = {}): TerminalSession {
  const { program = [process.execPath, BUNDLE], args = [], cwd } = options;
  let { columns, rows } = { ...DEFAULT_SIZE, ...options };
  const terminal = new xterm.Terminal({ cols: columns, rows, allowProposedApi: true, scrollback: 200 });
  const modes = watchModes(terminal);
  const env = childEnv(options.env);
  const pty: IPty = spawn('/bin/sh', ['-c', WRAPPER, 'sh', ...program, ...args], {
    // node-pty would set TERM to this, whatever env says.
    name: env.TERM,
    cols: columns,
    rows,
    cwd: cwd ?? process.cwd(),
    env,
  });

  let written = '';
  let shown = 0;
  let lastData = performance.now();
  let code: number | null = null;
  pty.onData((data) => {
    written += data;
    lastData = performance.now();
    const end = written.indexOf(ENDED);
    const visible = end === -1 ? written.length : end;
    terminal.write(written.slice(shown, visible));
    shown = Math.max(shown, visible);
  });
  pty.onExit(({ exitCode }) => {
    code = exitCode;
  });
  terminal.onData((answer) => pty.write(answer));

  const flushed = (): Promise<void> => new Promise((resolve) => terminal.write('', resolve));
  const screen = (): string[] => {
    const { active } = terminal.buffer;
    // After a narrowing xterm keeps the cells beyond its edge: they are not in sight.
    return Array.from(
      { length: rows },
      (_, y) =>
        active
          .getLine(active.viewportY + y)
          ?.translateToString(true, 0, columns)
          .trimEnd() ?? '',
    );
  };
  const failure = (what: string): Error =>
    new Error(
      `${what}; the screen is\n${screen()
        .map((row) => `  |${row}`)
        .join('\n')}`,
    );

  const programPid = (): number => {
    const children = execFileSync('pgrep', ['-P', String(pty.pid)], { encoding: 'utf8' });
    return Number(children.trim().split('\n')[0]);
  };

  return {
    press: (...keys) => pty.write(keys.map(keyBytes).join('')),
    write: (bytes) => pty.write(bytes),
    paste: (text) => pty.write(`\x1b[200~${text}\x1b[201~`),
    screen,
    text: () => screen().join('\n'),
    styleAt(x, y) {
      const { active } = terminal.buffer;
      const cell = active.getLine(active.viewportY + y)?.getCell(x);
      if (cell === undefined) throw new Error(`no cell at ${x}, ${y}`);
      const number = cell.getFgColor();
      const palette = cell.isFgPalette() ? `palette ${number}` : `#${number.toString(16).padStart(6, '0')}`;
      return {
        char: cell.getChars(),
        bold: cell.isBold() !== 0,
        dim: cell.isDim() !== 0,
        underline: cell.isUnderline() !== 0,
        reverse: cell.isInverse() !== 0,
        foreground: cell.isFgDefault() ? 'default' : palette,
      };
    },
    cursor() {
      const { active } = terminal.buffer;
      return { x: active.cursorX, y: active.cursorY, shown: modes.has(25) };
    },
    onAlternateScreen: () => terminal.buffer.active.type === 'alternate',
    async until(wanted, ms = PATIENCE_MS) {
      const matches = matcher(wanted);
      const deadline = performance.now() + ms;
      for (;;) {
        await flushed();
        const rowsNow = screen();
        if (matches(rowsNow)) return rowsNow;
        if (performance.now() > deadline) throw failure(`waited ${ms} ms in vain for ${wanted}`);
        await sleep(LOOK_EVERY_MS);
      }
    },
    async settle(quietMs = QUIET_MS) {
      const from = performance.now();
      while (performance.now() - Math.max(lastData, from) < quietMs) await sleep(LOOK_EVERY_MS);
      await flushed();
      return screen();
    },
    resize(toColumns, toRows) {
      columns = toColumns;
      rows = toRows;
      terminal.resize(columns, rows);
      pty.resize(columns, rows);
    },
    written: () => written,
    pid: programPid,
    signal: (name) => {
      process.kill(programPid(), name);
    },
    async exit(ms = PATIENCE_MS) {
      const deadline = performance.now() + ms;
      while (code === null) {
        if (performance.now() > deadline) throw failure(`did not end within ${ms} ms`);
        await sleep(LOOK_EVERY_MS);
      }
      await flushed();
      const stty = written.slice(written.indexOf(ENDED) + ENDED.length);
      return {
        code,
        screenRestored: terminal.buffer.active.type === 'normal' && modes.has(25) && !modes.has(2004),
        modesRestored: /\sicanon\b/.test(stty) && /\secho\b/.test(stty) && /\sisig\b/.test(stty),
      };
    },
    async close() {
      if (code === null) pty.kill('SIGKILL');
      while (code === null) await sleep(LOOK_EVERY_MS);
      terminal.dispose();
    },
  };
}
