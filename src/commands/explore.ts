import { harmless } from '../quantity/index.ts';
import { openExplorer } from '../screen/open-explorer.tsx';
import { clipboardSequence } from '../screen/terminal/clipboard.ts';
import { openScreen } from '../screen/terminal/open.tsx';
import { load } from './load.ts';
import { saveSession } from './save.ts';
import { BadInput, STATUS } from './status.ts';
import type { Streams } from './streams.ts';

/** `thrice [FILE]`: the explorer. */
export async function explore(file: string | null, streams: Streams): Promise<number> {
  if (!process.stdin.isTTY || !process.stdout.isTTY) {
    throw new BadInput(
      'the explorer needs a terminal on stdin and stdout; without one use thrice check, rack, reach, moves, handovers, spans, order or schema (thrice --help)',
    );
  }
  const session = file === null ? null : load(file, {}).session;
  const copy = (text: string): void => {
    const sequence = clipboardSequence(text, process.env);
    if (sequence !== null) process.stdout.write(sequence);
  };
  const end = await openScreen(openExplorer({ file, session, env: process.env, copy, save: saveSession }));
  if (end.kind === 'failed') {
    streams.error(`thrice: stopped by a fault of its own: ${harmless(end.error.message, 200)}\n`);
    return STATUS.no;
  }
  if (end.kind === 'refused') throw new BadInput(end.fault);
  return STATUS.yes;
}
