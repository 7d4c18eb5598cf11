import { linkFault, resolved } from '../explore/links/index.ts';
import type { CombinationSet } from '../loads/loading.ts';
import { quoted } from '../quantity/index.ts';
import type { Member, Stock } from '../timber/member.ts';
import { stockFault, stockNameFault } from '../timber/refusal.ts';
import { explainIssues } from './explain-issue.ts';
import { faultLine, type Path, SessionFault } from './fault.ts';
import { readPins } from './pins.ts';
import { readPrices, readYard } from './read-buying.ts';
import { readJson } from './read-json.ts';
import { readMember, readStock } from './read-member.ts';
import { FORMAT, type SessionFile, sessionSchema } from './schema.ts';
import type { Session, SessionMember, SessionRead } from './session.ts';
import { isTooLarge } from './too-large.ts';
import { readTrail } from './trail.ts';

/**
 * The session that a file's text holds. `file` is only named in the fault, which is one line: file, path, what is wrong,
 * what would be right. The first fault found is told.
 */
export function readSession(text: string, file: string): SessionRead {
  return withFaults(file, () => readDocument(readText(text)));
}

/** Runs a reading, and turns its fault into a line. */
export function withFaults(file: string, run: () => Session): SessionRead {
  try {
    return { ok: true, session: run() };
  } catch (fault) {
    if (fault instanceof SessionFault)
      return { ok: false, fault: faultLine(file, fault.path, fault.message) };
    throw fault;
  }
}

/** The raw document of a file's text; throws SessionFault. */
export function readText(text: string): unknown {
  if (isTooLarge(text)) throw new SessionFault([], 'larger than 16 MiB, the most that is read');
  if (text.startsWith('\uFEFF'))
    throw new SessionFault([], 'begins with a byte order mark; save it as UTF-8 without one');
  if (text.includes('\0')) throw new SessionFault([], 'holds NUL characters; a session is JSON in UTF-8');
  if (text.includes('\uFFFD')) throw new SessionFault([], 'is not UTF-8 throughout; save it as UTF-8');
  if (text.trim() === '')
    throw new SessionFault([], 'is empty; a session begins with { "thrice": 1, "members": [');
  return readJson(text);
}

/** The session of a raw document, with what its links bring; throws SessionFault. */
export function readDocument(document: unknown): Session {
  const session = readUnlinked(document);
  const fault = linkFault(session);
  if (fault !== null) {
    const { member, pin, link, key, text } = fault;
    const design = pin === null ? [] : ['pins', pin, 'design'];
    throw new SessionFault(['members', member, ...design, 'links', link, key], text);
  }
  return resolved(session);
}

/** The session of a raw document, its links not looked at. */
export function readUnlinked(document: unknown): Session {
  if (document === null || typeof document !== 'object' || Array.isArray(document)) {
    throw new SessionFault([], 'a session is an object: { "thrice": 1, "members": [ ... ] }');
  }
  const schema = sessionSchema();
  const parsed = schema.safeParse(document);
  if (!parsed.success) throw explainIssues(parsed.error.issues, document, schema);
  const file = parsed.data;
  checkNames(file);
  const combinations = file.combinations ?? 'ASCE 7-16';
  const raw = document as { readonly members: readonly unknown[] };
  const { members: _members, ...top } = raw;
  return {
    title: file.title ?? '',
    units: file.units ?? 'us',
    combinations,
    ...(file.best === undefined ? {} : { best: file.best }),
    ...(file.yard === undefined ? {} : { yard: readYard(file.yard) }),
    ...(file.prices === undefined ? {} : { prices: readPrices(file.prices) }),
    ...(file.stock === undefined ? {} : { stock: readNamedStock(file.stock, ['stock']) }),
    ...(file.sheet === undefined ? {} : { sheet: file.sheet }),
    members: file.members.map((_, i) => readOne(file, raw.members[i], i, combinations)),
    written: top,
  };
}

function readOne(
  file: SessionFile,
  written: unknown,
  index: number,
  combinations: CombinationSet,
): SessionMember {
  const path: Path = ['members', index];
  const member = readMember(file.members[index]!, combinations, path);
  const fault = stockFault(member);
  if (fault !== null) {
    const key = fault.path === 'wet' ? 'service' : fault.path;
    const reason = fault.reason.startsWith(`${fault.path}: `)
      ? fault.reason.slice(fault.path.length + 2)
      : fault.reason;
    throw new SessionFault([...path, ...key.split('.')], reason);
  }
  for (const [at, stock] of (member.rack ?? []).entries()) checkNamed(stock, [...path, 'rack', at]);
  const pins = readPins(file.members[index]!, written, combinations, path);
  const trail = readTrail(file.members[index]!.trail);
  return {
    member,
    written,
    ...(pins === undefined ? {} : { pins }),
    ...(trail === undefined ? {} : { trail }),
  };
}

function readNamedStock(file: NonNullable<SessionFile['stock']>, path: Path): Stock {
  const stock = readStock(file, path);
  checkNamed(stock, path);
  return stock;
}

/** Throws SessionFault where no table has the wood. */
function checkNamed(stock: Stock, path: Path): void {
  const unknown = stockNameFault(stock);
  if (unknown === null) return;
  throw new SessionFault([...path, unknown.path.slice('stock.'.length)], unknown.reason);
}

/** The member that a raw record says, as the only one of a session; null where it cannot be read. */
export function readOneMember(record: unknown, combinations: CombinationSet): Member | null {
  try {
    return readUnlinked({ thrice: FORMAT, combinations, members: [record] }).members[0]!.member;
  } catch (fault) {
    if (fault instanceof SessionFault) return null;
    throw fault;
  }
}

function checkNames(file: SessionFile): void {
  const seen = new Map<string, number>();
  for (const [index, { name }] of file.members.entries()) {
    const first = seen.get(name);
    if (first !== undefined) {
      const message = `${quoted(name)} is also the name of members[${first}]; names must differ`;
      throw new SessionFault(['members', index, 'name'], message);
    }
    seen.set(name, index);
  }
}
