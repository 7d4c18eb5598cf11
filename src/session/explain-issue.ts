import type * as z from 'zod/mini';
import { quoted } from '../quantity/index.ts';
import { nearestName } from '../timber/nearest-name.ts';
import { type Path, SessionFault } from './fault.ts';
import { childSchema, keysOf, schemaAt } from './schema-walk.ts';

/** No known name is longer; more of a wrong one need not be compared. */
const LONGEST_KEY = 80;

type Issue = z.core.$ZodIssue;

/** The issue most worth telling: an unknown key explains a missing one, so it comes first. */
export function explainIssues(
  issues: readonly Issue[],
  document: unknown,
  root: z.core.$ZodType,
): SessionFault {
  const issue = issues.find((one) => one.code === 'unrecognized_keys') ?? issues[0]!;
  return explain(issue, issue.path as Path, document, root);
}

function explain(issue: Issue, path: Path, document: unknown, root: z.core.$ZodType): SessionFault {
  const found = valueAt(document, path);
  switch (issue.code) {
    case 'unrecognized_keys':
      return unknownKey(path, issue.keys[0]!, root);
    case 'invalid_union': {
      // A list is judged as the list it means to be, anything else as the single value.
      const branch = issue.errors[Array.isArray(found) ? issue.errors.length - 1 : 0]!;
      const inner = branch[0]!;
      return explain(inner, [...path, ...(inner.path as Path)], document, root);
    }
    case 'invalid_type':
      return new SessionFault(path, typeMessage(issue.expected, found, path));
    case 'invalid_value':
      return new SessionFault(path, valueMessage(issue.values, found, path));
    case 'too_small':
    case 'too_big':
      return new SessionFault(path, sizeMessage(issue, found));
    default:
      return new SessionFault(path, issue.message);
  }
}

/** The refusal of a key, by what may stand in its place. */
export function unknownKey(path: Path, key: string, root: z.core.$ZodType): SessionFault {
  const full = [...path, key];
  const here = schemaAt(root, path);
  const known = keysOf(here);
  if (here === undefined || known.length === 0)
    return new SessionFault(full, 'unknown key; a single value stands here');
  const holder = known.find((one) => keysOf(childSchema(here, one)).includes(key));
  const near = holder === undefined ? nearestName(key.slice(0, LONGEST_KEY), known) : `${holder}.${key}`;
  const hint = near === null ? `known here: ${known.join(', ')}` : `the nearest known name is "${near}"`;
  return new SessionFault(full, `unknown key; ${hint}`);
}

const TYPE_NAMES: Readonly<Record<string, string>> = {
  string: 'a text in double quotes (a quantity with its unit, such as "14 ft")',
  number: 'a number without quotes',
  int: 'a whole number without quotes',
  boolean: 'true or false, without quotes',
  object: 'an object in { }',
  array: 'a list in [ ]',
  tuple: 'a list in [ ]',
};

function typeMessage(expected: string, found: unknown, path: Path): string {
  const wanted = TYPE_NAMES[expected] ?? expected;
  const key = path[path.length - 1];
  if (found === undefined) return `missing; write ${EXAMPLES[String(key)] ?? wanted}`;
  const example = typeof key === 'string' && EXAMPLES[key] !== undefined ? `, like ${EXAMPLES[key]}` : '';
  return `${described(found)} stands where ${wanted} is expected${example}`;
}

/** What would be right, for keys that are often forgotten or written without a unit. */
const EXAMPLES: Readonly<Record<string, string>> = {
  thrice: '"thrice": 1',
  members: '"members": [ { ... } ]',
  name: '"name": "G1"',
  spans: '"spans": ["14 ft"]',
  stock: '"stock": { "product": "dimension lumber", "species": "Douglas Fir-Larch", "grade": "No.2" }',
  product: '"product": "dimension lumber"',
  section: '"section": { "width": "1.5 in", "depth": "11.25 in", "plies": 2 }',
  width: '"width": "1.5 in"',
  depth: '"depth": "11.25 in"',
  kind: '"kind": "dead"',
  plies: '"plies": 2',
  area: '"area": { "dead": "12 psf", "live": "40 psf" }',
  tributary: '"tributary": "6 ft"',
  rack: '"rack": [ { "product": "LVL", "grade": "typical 2.0E" } ]',
  factors: '"factors": { "CL": { "value": 0.95, "reason": "..." } }',
  reason: '"reason": "why it has this value"',
  links: '"links": [ { "member": "J1", "end": "right", "every": "16 in" } ]',
  member: '"member": "J1"',
  end: '"end": "right"',
  loads: '"loads": [ { "kind": "snow", "point": "850 lb", "at": "5 ft" } ]',
};

function valueMessage(values: readonly unknown[], found: unknown, path: Path): string {
  if (path.length === 1 && path[0] === 'thrice') {
    return found === undefined
      ? 'missing; a session begins with "thrice": 1'
      : `this version reads format 1; ${described(found)} is another`;
  }
  const known = values.map((value) => (typeof value === 'string' ? `"${value}"` : String(value)));
  if (found === undefined) return `missing; write one of ${known.join(', ')}`;
  const near =
    typeof found === 'string'
      ? nearestName(
          found.slice(0, LONGEST_KEY),
          values.filter((v) => typeof v === 'string'),
        )
      : null;
  const hint = near === null ? `write one of ${known.join(', ')}` : `the nearest known one is "${near}"`;
  return `${described(found)} is not known here; ${hint}`;
}

function sizeMessage(issue: z.core.$ZodIssueTooSmall | z.core.$ZodIssueTooBig, found: unknown): string {
  const small = issue.code === 'too_small';
  const bound = small ? `at least ${issue.minimum}` : `at most ${issue.maximum}`;
  if (Array.isArray(found)) return `${found.length} entries; it takes ${bound}`;
  if (typeof found === 'string') {
    return found === '' ? 'is empty; write a text' : `${found.length} characters; it takes ${bound}`;
  }
  return `${described(found)} is too ${small ? 'small' : 'large'}; it must be ${bound}`;
}

function described(found: unknown): string {
  if (found === null) return 'null';
  if (Array.isArray(found)) return 'a list';
  if (typeof found === 'object') return 'an object';
  return typeof found === 'string' ? quoted(found) : String(found);
}

function valueAt(document: unknown, path: Path): unknown {
  let value = document;
  for (const step of path) {
    if (value === null || typeof value !== 'object' || !Object.hasOwn(value, step)) return undefined;
    value = (value as Record<string | number, unknown>)[step];
  }
  return value;
}
