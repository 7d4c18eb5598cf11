import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { type Session, writeSession } from '../../src/session/index.ts';
import { member } from '../session/arbitrary-member.ts';
import { SAMPLES } from './samples.ts';

/** Text of a session that may be: up to three members of any sort. */
export const anySessionText: fc.Arbitrary<string> = fc
  .record({
    units: fc.constantFrom('us' as const, 'si' as const),
    combinations: fc.constantFrom('ASCE 7-16' as const, 'ASCE 7-22' as const),
    list: fc.array(member, { minLength: 1, maxLength: 3 }),
  })
  .map(({ list, ...top }): Session => {
    const members = list.map((one, at) => ({
      member: { ...one, name: `G${at + 1}`, combinations: top.combinations },
      written: undefined,
    }));
    return { title: 'Any', ...top, members };
  })
  .map(writeSession);

type Step = string | number;
interface Place {
  readonly parent: Record<Step, unknown> | unknown[];
  readonly key: Step;
}

/** Every value of a document but the document itself, with where it stands. */
function placesOf(value: unknown): Place[] {
  if (value === null || typeof value !== 'object') return [];
  const parent = value as Record<Step, unknown> | unknown[];
  const keys: Step[] = Array.isArray(parent) ? [...parent.keys()] : Object.keys(parent);
  return keys.flatMap((key) => [{ parent, key }, ...placesOf((parent as Record<Step, unknown>)[key])]);
}

/** Values that a slip, a broken program or somebody hostile writes. */
export const anyValue: fc.Arbitrary<unknown> = fc.oneof(
  fc.constantFrom<unknown>(
    null,
    true,
    0,
    -1,
    1e-300,
    1e300,
    2 ** 53,
    '',
    '0 ft',
    '-0 in',
    '1e-9 in',
    '1e308 ft',
    '1e999 psf',
    'NaN psf',
    'Infinity ft',
    '-5 psf',
    '40 psf',
    '14 ft',
    '3/0 in',
    '4:0',
    '1.5 m',
    'steel',
    [],
    [[]],
    ['14 ft', '14 ft', '14 ft', '14 ft', '14 ft', '14 ft', '14 ft'],
    {},
    { '': {} },
  ),
  fc.double(),
  fc.jsonValue({ maxDepth: 2 }),
);

/** One slip in a document: a value of another type or size, one left out, one given again, one under a wrong key. */
const anySlip = fc.record({
  where: fc.nat(),
  what: fc.constantFrom('replace', 'leave out', 'repeat', 'misspell', 'swap'),
  value: anyValue,
  other: fc.nat(),
});

type Slip = typeof anySlip extends fc.Arbitrary<infer T> ? T : never;

function slipped(document: unknown, { where, what, value, other }: Slip): void {
  const places = placesOf(document);
  if (places.length === 0) return;
  const at = (index: number) => places[index % places.length]!;
  const { parent, key } = at(where);
  const record = parent as Record<Step, unknown>;
  switch (what) {
    case 'replace':
      record[key] = value;
      return;
    case 'leave out':
      if (Array.isArray(parent)) parent.splice(Number(key), 1);
      else delete record[key];
      return;
    case 'repeat':
      if (Array.isArray(parent)) parent.push(structuredClone(record[key]));
      else record[`${key}2`] = structuredClone(record[key]);
      return;
    case 'misspell':
      if (!Array.isArray(parent)) record[`${String(key).slice(1)}x`] = record[key];
      return;
    case 'swap':
      record[key] = structuredClone((at(other).parent as Record<Step, unknown>)[at(other).key]);
  }
}

/** Text of a sample session with one to four slips in it. */
export const anySlippedSample: fc.Arbitrary<string> = fc
  .tuple(fc.constantFrom(...SAMPLES), fc.array(anySlip, { minLength: 1, maxLength: 4 }))
  .map(([{ file }, slips]) => {
    const document = JSON.parse(readFileSync(file, 'utf8'));
    for (const slip of slips) slipped(document, slip);
    return JSON.stringify(document);
  });

/** Bytes that are no session, or one that was cut, doubled or hit on its way. */
export const anyBytes: fc.Arbitrary<Uint8Array> = fc.oneof(
  fc.uint8Array({ maxLength: 400 }),
  fc.string({ unit: 'binary', maxLength: 200 }).map((text) => Buffer.from(text)),
  fc
    .tuple(
      fc.constantFrom(...SAMPLES),
      fc.double({ min: 0, max: 1, noNaN: true }),
      fc.uint8Array({ maxLength: 8 }),
      fc.boolean(),
    )
    .map(([{ file }, part, hit, cut]) => {
      const whole = readFileSync(file);
      const at = Math.floor(part * whole.length);
      return Buffer.concat([whole.subarray(0, at), hit, cut ? Buffer.alloc(0) : whole.subarray(at)]);
    }),
);
