import { copyFileSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, onTestFinished } from 'vitest';
import { BOATHOUSE, SAMPLES } from '../support/samples.ts';
import type { Twin } from '../support/twin.ts';
import { type OpenOptions, open, type TerminalSession } from './harness.ts';

/** On the last row whatever else has room there. */
const FOOT = '? keys';

/** A copy of a sample session, in a folder of its own, that a test may change. */
export function sampleCopy(sample = BOATHOUSE.file): string {
  const file = join(mkdtempSync(join(tmpdir(), 'thrice-explorer-')), 'job.json');
  copyFileSync(sample, file);
  return file;
}

/** The built explorer in a terminal, closed when the test ends. */
export function started(args: readonly string[], options: OpenOptions = {}): TerminalSession {
  const session = open({ ...options, args });
  onTestFinished(() => session.close());
  return session;
}

/** The same, on a session file and with its first frame drawn; a sample is opened as a copy, nothing is left beside it. */
export async function opened(file: string, options: OpenOptions = {}): Promise<TerminalSession> {
  const isSample = SAMPLES.some((sample) => sample.file === file);
  const session = started([isSample ? sampleCopy(file) : file], options);
  await session.until(FOOT);
  return session;
}

/** Waits until the terminal holds exactly what the twin would show, and fails with the difference. */
export async function agrees(session: TerminalSession, twin: Twin): Promise<string[]> {
  const wanted = twin.screen();
  try {
    await session.until((rows) => rows.every((row, y) => row === wanted[y]), 5_000);
  } catch {
    expect(session.screen()).toEqual(wanted);
  }
  return wanted;
}
