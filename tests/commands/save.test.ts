import {
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeEach, describe, expect, test } from 'vitest';
import { saveSession } from '../../src/commands/save.ts';
import { readSession } from '../../src/session/index.ts';
import type { Session } from '../../src/session/session.ts';
import { sessionText } from '../support/session.ts';

function sessionOf(text: string): Session {
  const read = readSession(text, 'job.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

const session = sessionOf(sessionText({ name: 'G1' }));
let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'thrice-save-'));
});

describe('keeping a session', () => {
  test('writes the whole file, which reads back the same, and leaves nothing beside it', () => {
    const file = join(folder, 'job.json');
    expect(saveSession(file, session, true)).toBeNull();
    expect(sessionOf(readFileSync(file, 'utf8')).members[0]!.member).toEqual(session.members[0]!.member);
    expect(readdirSync(folder)).toEqual(['job.json']);
  });

  test('writes over its own file but not, as a new one, over one that is there', () => {
    const file = join(folder, 'job.json');
    writeFileSync(file, 'mine');
    expect(saveSession(file, session, true)).toBe(`${file} is there already: choose another name`);
    expect(readFileSync(file, 'utf8')).toBe('mine');
    expect(saveSession(file, session, false)).toBeNull();
    expect(readFileSync(file, 'utf8')).toContain('"G1"');
  });

  test('writes through a link, and keeps who may read the file', () => {
    const file = join(folder, 'job.json');
    const link = join(folder, 'link.json');
    writeFileSync(file, 'old', { mode: 0o640 });
    symlinkSync(file, link);
    expect(saveSession(link, session, false)).toBeNull();
    expect(readFileSync(file, 'utf8')).toContain('"G1"');
    expect(statSync(file).mode & 0o777).toBe(0o640);
  });

  test('says why not in one harmless line when the folder is gone or the name is one of a folder', () => {
    const file = join(folder, 'sub\u001b[31m', 'job.json');
    expect(saveSession(file, session, false)).toMatch(/^not kept: the folder .*\\u\{1b\}\[31m is not there$/);
    expect(saveSession(folder, session, false)).toMatch(/^not kept: .* is a folder$/);
    expect(saveSession(join(folder, `${'n'.repeat(300)}.json`), session, true)).toMatch(/too long a name$/);
    rmSync(folder, { recursive: true });
    expect(saveSession(join(folder, 'job.json'), session, true)).toMatch(/is not there$/);
  });
});
