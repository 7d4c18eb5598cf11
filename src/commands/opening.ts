import { closeSync, openSync, readdirSync, readSync, statSync } from 'node:fs';
import { homedir } from 'node:os';
import type { Keeper } from '../files/keeper.ts';
import type { Opened } from '../screen/effect.ts';
import type { Offers } from '../screen/mode.ts';
import type { FoundSession } from '../screen/open-explorer.tsx';
import type { Session } from '../session/session.ts';
import { readText, sessionOf } from './load.ts';
import { BadInput } from './status.ts';

/** More files of a folder are not looked at: their names can be typed. */
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
    return readdirSync('.')
      .filter((name) => name.endsWith('.json') && !name.startsWith('.'))
      .sort()
      .slice(0, MOST_FILES)
      .filter(isSession);
  } catch {
    return [];
  }
}

/** The key that every session begins with stands within so many bytes. */
const HEAD = 1024;

/** By its first bytes; a pipe or a device is not looked into. */
function isSession(name: string): boolean {
  try {
    if (!statSync(name).isFile()) return false;
    const head = new Uint8Array(HEAD);
    const file = openSync(name, 'r');
    try {
      return Buffer.from(head.subarray(0, readSync(file, head))).includes('"thrice"');
    } finally {
      closeSync(file);
    }
  } catch {
    return false;
  }
}
