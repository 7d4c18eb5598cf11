import { existsSync } from 'node:fs';
import { setTimeout } from 'node:timers/promises';
import { type Keeper, openKeeper } from '../files/keeper.ts';
import { readSettings, withSettings } from '../files/settings.ts';
import { stateFolder } from '../files/state-folder.ts';
import { whyNot } from '../files/why.ts';
import { harmless } from '../quantity/index.ts';
import type { SheetAnswer } from '../screen/effect.ts';
import { openExplorer, type SheetWanted } from '../screen/open-explorer.tsx';
import { clipboardSequence } from '../screen/terminal/clipboard.ts';
import { openScreen } from '../screen/terminal/open.tsx';
import type { Session } from '../session/session.ts';
import { readText, sessionOf } from './load.ts';
import { openingOf } from './opening.ts';
import { writeSheetFile } from './sheet.ts';
import { BadInput, STATUS } from './status.ts';
import type { Streams } from './streams.ts';
import { openYard } from './yard-file.ts';

export interface ExploreOptions {
  /** Write neither the file nor a recovery journal. */
  readonly readOnly?: boolean;
}

/** `thrice [FILE]`: the explorer. */
export async function explore(
  file: string | null,
  { readOnly = false }: ExploreOptions,
  streams: Streams,
): Promise<number> {
  if (!process.stdin.isTTY || !process.stdout.isTTY) {
    throw new BadInput(
      'the explorer needs a terminal on stdin and stdout; without one use thrice check, rack, reach, moves, handovers, spans, order, schedule, sheet, diff or schema (thrice --help)',
    );
  }
  const { settings, fault } = readSettings();
  const env = withSettings(process.env, settings);
  const text = file === null ? '' : readText(file);
  const session = file === null ? null : sessionOf(text, file);
  const copy = (text: string): void => {
    const sequence = clipboardSequence(text, process.env);
    if (sequence !== null) process.stdout.write(sequence);
  };
  const readYard = (name: string, job: Session, at: string | null) => openYard(name, job, at, readText);
  const keeperOf = (file: string | null, text: string): Keeper =>
    openKeeper({
      file,
      text,
      readOnly,
      stateFolder: stateFolder(process.env),
      read: (journal) => readJournal(journal, file),
    });
  const keeper = keeperOf(file, text);
  const opening = file === null ? await openingOf(keeperOf) : null;
  const end = await openScreen(
    openExplorer({
      file,
      session,
      env,
      units: settings.units,
      told: fault,
      copy,
      keeper,
      opening,
      readYard,
      writeSheet,
    }),
    { env },
  ).finally(() => keeper.close());
  if (end.kind === 'failed') {
    streams.error(`thrice: stopped by a fault of its own: ${harmless(end.error.message, 200)}\n`);
    return STATUS.no;
  }
  if (end.kind === 'refused') throw new BadInput(end.fault);
  return STATUS.yes;
}

/** The session of a recovery journal; null where it cannot be read. */
function readJournal(text: string, file: string | null): Session | null {
  try {
    return sessionOf(text, file ?? '.');
  } catch (error) {
    if (error instanceof BadInput) return null;
    throw error;
  }
}

/** Long enough for the frame that says what is being done. */
const FRAME_MS = 40;

/** Writes a sheet that the explorer asks for; what is there already is written over only where that was asked for. */
async function writeSheet({ file, session, members, over }: SheetWanted): Promise<SheetAnswer['outcome']> {
  if (!over && existsSync(file)) return 'there';
  await setTimeout(FRAME_MS);
  const job = { session, members, units: session.units, only: null, date: null };
  try {
    const { fault } = await writeSheetFile(file, job, null);
    return fault === null ? 'written' : { fault };
  } catch (error) {
    return { fault: `${harmless(file)} ${whyNot(error)}` };
  }
}
