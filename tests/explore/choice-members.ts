import fc from 'fast-check';
import { readSession } from '../../src/session/index.ts';
import { readSessionWithSets } from '../../src/session/set-values.ts';
import type { Member } from '../../src/timber/member.ts';
import { sessionText } from '../support/session.ts';

/** Members as session files write them: one to three spans, overhangs, loads, woods, bracing, bearings. */
export const anyPart: fc.Arbitrary<Record<string, unknown>> = fc
  .record({
    spans: fc.array(fc.integer({ min: 72, max: 260 }), { minLength: 1, maxLength: 3 }),
    overhang: fc.constantFrom(0, 0, 0, 30),
    width: fc.oneof(
      fc.integer({ min: 12, max: 160 }).map((n) => ({ tributary: `${n} in` })),
      fc.constantFrom(12, 16, 19.2, 24, 32).map((n) => ({ tributary: undefined, spacing: `${n} in` })),
    ),
    dead: fc.integer({ min: 5, max: 30 }),
    live: fc.integer({ min: 0, max: 80 }),
    snow: fc.constantFrom(0, 0, 30, 60),
    windUp: fc.constantFrom(0, 0, 0, 40),
    loads: fc.array(
      fc.constantFrom(
        { kind: 'live', point: '900 lb', at: '4 ft' },
        { kind: 'dead', line: '60 plf' },
        { kind: 'snow', line: ['0 plf', '90 plf'], from: '1 ft', to: '6 ft' },
      ),
      { maxLength: 2 },
    ),
    wood: fc.constantFrom(
      {
        stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.2' },
        section: { width: '1.5 in', depth: '9.25 in', plies: 2 },
      },
      {
        stock: { product: 'dimension lumber', species: 'Southern Pine', grade: 'No.1' },
        section: { width: '1.5 in', depth: '11.25 in', plies: 1 },
      },
      {
        stock: { product: 'glulam', grade: '24F-1.8E' },
        section: { width: '3.125 in', depth: '10.5 in' },
      },
      {
        stock: { product: 'timber', species: 'Douglas Fir-Larch', grade: 'No.1' },
        section: { width: '5.5 in', depth: '9.5 in' },
      },
    ),
    bracing: fc.constantFrom('continuous', 'ends', '6 ft'),
    bearing: fc.constantFrom('3.5 in', '1.5 in'),
    count: fc.integer({ min: 1, max: 5 }),
  })
  .map(({ spans, overhang, width, dead, live, snow, windUp, loads, wood, bracing, bearing, count }) => ({
    spans: spans.map((span) => `${span} in`),
    ...(overhang > 0 ? { overhangs: { right: `${overhang} in` } } : {}),
    ...width,
    area: { dead: `${dead} psf`, live: `${live} psf`, snow: `${snow} psf`, windUp: `${windUp} psf` },
    loads,
    ...wood,
    bracing,
    bearing,
    count,
  }));

/** The member of a part with sets laid on it, as the command line does. */
export function withSets(part: Record<string, unknown>, sets: readonly string[]): Member {
  const text = sessionText(part);
  const read = sets.length === 0 ? readSession(text, 'test') : readSessionWithSets(text, 'test', 'B1', sets);
  if (!read.ok) throw new Error(read.fault);
  return read.session.members[0]!.member;
}
