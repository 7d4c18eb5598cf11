import { readSession } from '../../src/session/read.ts';
import type { Session } from '../../src/session/session.ts';

/** A raw member that reads, with what a test needs laid over it. */
export function rawMember(over: Record<string, unknown> = {}): Record<string, unknown> {
  const member: Record<string, unknown> = {
    name: 'G1',
    spans: ['14 ft'],
    stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.2' },
    section: { width: '1.5 in', depth: '11.25 in', plies: 2 },
    ...over,
  };
  for (const key of Object.keys(member)) if (member[key] === undefined) delete member[key];
  return member;
}

export function rawSession(
  members: readonly unknown[] = [rawMember()],
  top: Record<string, unknown> = {},
): string {
  return JSON.stringify({ thrice: 1, ...top, members });
}

export function sessionOf(text: string): Session {
  const read = readSession(text, 'job.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

export function faultOf(text: string): string {
  const read = readSession(text, 'job.json');
  if (read.ok) throw new Error('the session was read');
  return read.fault;
}
