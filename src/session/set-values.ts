import { quoted } from '../quantity/index.ts';
import { nearestName } from '../timber/nearest-name.ts';
import { unknownKey } from './explain-issue.ts';
import { type Path, SessionFault } from './fault.ts';
import { readDocument, readText, withFaults } from './read.ts';
import { readJson } from './read-json.ts';
import { sessionSchema } from './schema.ts';
import { childSchema, isList, schemaAt } from './schema-walk.ts';
import type { SessionRead } from './session.ts';

/**
 * The session of a file's text with values of one member replaced, as `--set key=value` asks: each set is such a text,
 * `spans.0=16 ft` or `area.live=60 psf`. `member` names the member; null takes the only one and is refused where there
 * are several. Sets are laid on the raw document one after the other, then the whole is read: a fault names its path.
 */
export function readSessionWithSets(
  text: string,
  file: string,
  member: string | null,
  sets: readonly string[],
): SessionRead {
  return withFaults(file, () => {
    let document = readText(text);
    if (sets.length === 0) return readDocument(document);
    // A file that is bad by itself is told of before what was to be set in it.
    readDocument(document);
    for (const set of sets) document = setInDocument(document, member, set);
    return readDocument(document);
  });
}

/**
 * A raw document that has been read before, with one value of one member replaced; throws SessionFault. Text, numbers,
 * true and false, and lists or objects as JSON are taken as the key wants them. Of spacing and tributary width, the one
 * set takes the other's place.
 */
export function setInDocument(document: unknown, member: string | null, set: string): unknown {
  const cut = set.indexOf('=');
  if (cut <= 0)
    throw new SessionFault([], `--set ${quoted(set)} is not key=value; write --set spans.0="16 ft"`);
  const key = set.slice(0, cut).trim();
  const value = set.slice(cut + 1).trim();
  const top = document as { readonly members: readonly Record<string, unknown>[] };
  const index = memberIndex(top.members, member);
  const steps = splitKey(key);
  let record: unknown = withoutRival(top.members[index]!, steps[0]!);
  record = spreadBearing(record as Record<string, unknown>, steps);
  const members = [...top.members];
  members[index] = replaced(record, steps, 0, value, ['members', index]) as Record<string, unknown>;
  return { ...top, members };
}

function memberIndex(members: readonly Record<string, unknown>[], name: string | null): number {
  const names = members.map((one) => String(one.name));
  if (name === null) {
    if (members.length === 1) return 0;
    throw new SessionFault(
      [],
      `has ${members.length} members; say which one with --member NAME, as --member ${quoted(names[0]!)}`,
    );
  }
  const index = names.indexOf(name);
  if (index >= 0) return index;
  const near = nearestName(name.slice(0, 100), names);
  const shown = names.slice(0, 12).map(quoted).join(', ');
  throw new SessionFault(
    [],
    `no member ${quoted(name)}; ${near === null ? `there are ${shown}` : `the nearest is ${quoted(near)}`}`,
  );
}

/** "spans.0" and "spans[0]" alike. */
function splitKey(key: string): string[] {
  return key.replace(/\[(\d{1,4})\]/g, '.$1').split('.');
}

const RIVALS: Readonly<Record<string, string>> = { spacing: 'tributary', tributary: 'spacing' };

function withoutRival(record: Record<string, unknown>, key: string): Record<string, unknown> {
  const rival = Object.hasOwn(RIVALS, key) ? RIVALS[key]! : undefined;
  if (rival === undefined || !Object.hasOwn(record, rival)) return record;
  const { [rival]: _rival, ...rest } = record;
  return rest;
}

/** One bearing length for all supports becomes a list where one of them is set: `bearing.1=5.5 in`. */
function spreadBearing(record: Record<string, unknown>, steps: readonly string[]): Record<string, unknown> {
  if (steps[0] !== 'bearing' || steps.length !== 2 || Array.isArray(record.bearing)) return record;
  const supports = record.supports === 'cantilever' ? 1 : (record.spans as unknown[]).length + 1;
  return { ...record, bearing: new Array(supports).fill(record.bearing ?? DEFAULT_BEARING_TEXT) };
}

const DEFAULT_BEARING_TEXT = '3.5 in';

function replaced(node: unknown, steps: readonly string[], at: number, value: string, path: Path): unknown {
  const root = sessionSchema();
  if (at === steps.length) return valueFor(path, value);
  const step = steps[at]!;
  const schema = schemaAt(root, path)!;
  const child = childSchema(schema, step);
  if (child === undefined) {
    if (isList(schema))
      throw new SessionFault(path, `${quoted(step)} is not a place in the list; write .0 for the first`);
    throw unknownKey(path, step, root);
  }
  if (!isList(schema)) {
    const record = (node ?? {}) as Record<string, unknown>;
    const old = Object.hasOwn(record, step) ? record[step] : undefined;
    return { ...record, [step]: replaced(old, steps, at + 1, value, [...path, step]) };
  }
  const list = Array.isArray(node) ? node : [];
  const index = Number(step);
  if (index >= list.length) {
    const has =
      list.length === 1 ? 'one entry, .0' : list.length === 0 ? 'none' : `.0 to .${list.length - 1}`;
    throw new SessionFault([...path, index], `there is no such entry to set; the list has ${has}`);
  }
  return list.map((entry, i) =>
    i === index ? replaced(entry, steps, at + 1, value, [...path, index]) : entry,
  );
}

/** The text as it is where the key takes text, else what it means as JSON: 3, true, ["12 ft", "14 ft"]. */
function valueFor(path: Path, text: string): unknown {
  const schema = schemaAt(sessionSchema(), path)!;
  if (text === '') throw new SessionFault(path, 'nothing is given to set it to');
  if (accepts(schema, text)) return text;
  const meant = jsonValue(text);
  return meant === undefined ? text : meant;
}

type Schema = NonNullable<ReturnType<typeof schemaAt>>;

function accepts(schema: Schema, value: unknown): boolean {
  const outcome = schema._zod.run({ value, issues: [] }, { async: false });
  return !(outcome instanceof Promise) && outcome.issues.length === 0;
}

function jsonValue(text: string): unknown {
  if (!/^(?:[-\d.[{]|true$|false$)/.test(text)) return undefined;
  try {
    return readJson(text);
  } catch (fault) {
    if (fault instanceof SessionFault) return undefined;
    throw fault;
  }
}
