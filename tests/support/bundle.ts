import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

/** The program as `npm run build` makes it. */
export const BUNDLE: string = fileURLToPath(new URL('../../dist/thrice.js', import.meta.url));

/** Root may read and write everything: to be refused something, the program has to run as somebody else. */
const NOBODY = 65534;
const isRoot = process.getuid?.() === 0;

/** Node and its arguments that run the built program as somebody who is not root. */
export const PROGRAM_OF_NO_PRIVILEGE: readonly string[] = isRoot
  ? [
      process.execPath,
      '-e',
      `process.setgroups([]); process.setgid(${NOBODY}); process.setuid(${NOBODY}); import(${JSON.stringify(BUNDLE)})`,
      BUNDLE,
    ]
  : [process.execPath, BUNDLE];

interface Ran {
  readonly status: number | null;
  readonly out: string;
  readonly error: string;
}

/** Runs a program to its end, without a terminal. */
export function ran(program: readonly string[], cwd = '.', input = ''): Ran {
  const [file, ...args] = program;
  const { status, stdout, stderr } = spawnSync(file!, args, { cwd, input, encoding: 'utf8' });
  return { status, out: stdout, error: stderr };
}

/** Runs the built program to its end, without a terminal. */
export function bundled(...args: string[]): Ran {
  return ran([process.execPath, BUNDLE, ...args]);
}
