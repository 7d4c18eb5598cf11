import { existsSync } from 'node:fs';
import { dirname } from 'node:path';
import { whyNot } from '../files/why.ts';
import { writeWhole } from '../files/write-whole.ts';
import { harmless } from '../quantity/index.ts';
import { writeSession } from '../session/index.ts';
import type { Session } from '../session/session.ts';

/**
 * Writes a session to its file, whole or not at all. Gives null, or one line that says why it could not be kept.
 * `fresh` refuses to write over a file that is there.
 */
export function saveSession(file: string, session: Session, fresh: boolean): string | null {
  if (fresh && existsSync(file)) return `${harmless(file)} is there already: choose another name`;
  if (!existsSync(dirname(file))) return `not kept: the folder ${harmless(dirname(file))} is not there`;
  try {
    writeWhole(file, writeSession(session), { fresh });
    return null;
  } catch (error) {
    return `not kept: ${harmless(file)} ${whyNot(error)}`;
  }
}
