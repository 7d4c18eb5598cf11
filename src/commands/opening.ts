import { readdirSync } from 'node:fs';
import { homedir } from 'node:os';
import type { Keeper } from '../files/keeper.ts';
import type { FoundSession } from '../screen/open-explorer.tsx';
import type { Offers, Opened } from '../screen/state.ts';
import type { Session } from '../session/session.ts';
import { readText, sessionOf } from './load.ts';
import { BadInput } from './status.ts';

/** More files of a folder are not offered: their names can be typed. */
const MOST_FILES = 200;

/** What an empty start offers, and how it is opened; `keeperOf` takes a file that was read in keeping. */
export interface Opening {
  readonly offers: Offers;
  open(what: Opened): FoundSession;
}

export async function openingOf(keeperOf: (file: string, text: string) => Keeper): Promise<Opening> {
  const { SAMPLES } = await import('../session/samples.ts');
  const samples = SAMPLES.map(({ title, members }) => ({ title, members: members.length }));
  return {
    offers: { samples, files: filesHere() },
    open: (what) =>
      withFault(() => {
        if ('sample' in what) {
          const sample = SAMPLES[what.sample]!;
          return { ok: true, file: null, session: sessionOf(JSON.stringify(sample), '.'), keeper: null };
        }
        const file = what.file.replace(/^~(?=\/)/, homedir());
        const text = readText(file);
        const session: Session = sessionOf(text, file);
        return { ok: true, file, session, keeper: keeperOf(file, text) };
      }),
  };
}

function withFault(open: () => FoundSession): FoundSession {
  try {
    return open();
  } catch (error) {
    if (error instanceof BadInput) return { ok: false, fault: error.message };
    throw error;
  }
}

/** The session files of the folder at hand, by name; none where it may not be read. */
function filesHere(): string[] {
  try {
    return readdirSync('.', { withFileTypes: true })
      .filter((entry) => !entry.isDirectory() && entry.name.endsWith('.json') && !entry.name.startsWith('.'))
      .map(({ name }) => name)
      .sort()
      .slice(0, MOST_FILES);
  } catch {
    return [];
  }
}
