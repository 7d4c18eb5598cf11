import { existsSync } from 'node:fs';
import { dirname } from 'node:path';
import writeFileAtomic from 'write-file-atomic';
import { harmless } from '../quantity/index.ts';
import { writeSession } from '../session/index.ts';
import type { Session } from '../session/session.ts';

/**
 * Writes a session to its file, whole or not at all (a temporary file, then a rename). Gives null, or one
 * line that says why it could not be kept. `fresh` refuses to write over a file that is there.
 */
export function saveSession(file: string, session: Session, fresh: boolean): string | null {
  if (fresh && existsSync(file)) return `${harmless(file)} is there already: choose another name`;
  if (!existsSync(dirname(file))) return `not kept: the folder ${harmless(dirname(file))} is not there`;
  try {
    writeFileAtomic.sync(file, writeSession(session));
    return null;
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    // Without a code it is no answer of the system but a fault of this program's own.
    const why = code === undefined ? message : code;
    return `not kept: ${harmless(file)} ${WHY[why] ?? `could not be written (${harmless(why)})`}`;
  }
}

const WHY: Readonly<Record<string, string>> = {
  EACCES: 'may not be written (permission denied)',
  EPERM: 'may not be written (permission denied)',
  EROFS: 'is on a read-only disk',
  ENOSPC: 'does not fit: the disk is full',
  EISDIR: 'is a folder',
  ENAMETOOLONG: 'has too long a name',
};
