import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { run } from '../../src/commands/program.ts';
import { readSession } from '../../src/session/index.ts';
import type { Member } from '../../src/timber/member.ts';

/** A simple floor beam as a session file writes it; tests change what they are about. */
export const FLOOR_BEAM = {
  name: 'B1',
  use: 'floor',
  spans: ['14 ft'],
  tributary: '6 ft',
  area: { dead: '12 psf', live: '40 psf' },
  stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.2' },
  section: { width: '1.5 in', depth: '11.25 in', plies: 2 },
};

type Part = Readonly<Record<string, unknown>>;

/** Text of a session of these members, each laid over FLOOR_BEAM. */
export function sessionText(...members: Part[]): string {
  const named = members.map((member, index) => ({ ...FLOOR_BEAM, name: `B${index + 1}`, ...member }));
  return JSON.stringify({ thrice: 1, title: 'Test', members: named });
}

/** A member, FLOOR_BEAM with this laid over it. */
export function memberOf(part: Part = {}): Member {
  const read = readSession(sessionText(part), 'test.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session.members[0]!.member;
}

/** A session file in a folder of its own. */
export function sessionFile(text: string): string {
  const file = join(mkdtempSync(join(tmpdir(), 'thrice-test-')), 'session.json');
  writeFileSync(file, text);
  return file;
}

/** Runs a command in this process. */
export async function command(...args: string[]): Promise<{ status: number; out: string; error: string }> {
  let out = '';
  let error = '';
  const status = await run(args, '0.0.0', {
    out: (text) => {
      out += text;
    },
    error: (text) => {
      error += text;
    },
  });
  return { status, out, error };
}
