import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Comparison, compareSessions, isSame } from '../../src/session/compare.ts';
import { writeSession } from '../../src/session/write.ts';
import { member } from './arbitrary-member.ts';
import { rawMember, rawSession, sessionOf } from './documents.ts';

function comparedTexts(before: string, after: string): Comparison {
  return compareSessions(sessionOf(before), sessionOf(after), 'us');
}

const compared = (before: readonly object[], after: readonly object[]) =>
  comparedTexts(rawSession(before), rawSession(after));

const [one, two] = [rawMember({ name: 'G1' }), rawMember({ name: 'J1', spans: ['9 ft'] })];
const names = (members: Comparison['added']) => members.map(({ member }) => member.name);

describe('two sessions', () => {
  test('are the same by value, whatever the units and spaces of their files', () => {
    const found = compared(
      [rawMember({ spans: ['14 ft'], area: { live: '40 psf' }, selfWeight: true })],
      [rawMember({ spans: ['168 in'], area: { live: '40psf', dead: '0 psf' } })],
    );
    expect(isSame(found)).toBe(true);
  });

  test('differ in what was added and what was removed', () => {
    const found = compared(
      [one, two],
      [one, rawMember({ name: 'B9', spans: ['20 ft'], use: 'roof', bracing: 'ends', slope: '4:12' })],
    );
    expect([names(found.added), names(found.removed)]).toEqual([['B9'], ['J1']]);
    expect(isSame(found)).toBe(false);
  });

  test('a member of another name and little else is renamed', () => {
    const found = compared([one, two], [rawMember({ ...two, name: 'J2', spans: ['10 ft'] }), one]);
    expect([found.added, found.removed, found.reordered]).toEqual([[], [], true]);
    expect(found.pairs.map(({ before, after }) => [before.member.name, after.member.name])).toEqual([
      ['J1', 'J2'],
      ['G1', 'G1'],
    ]);
    expect(found.pairs[0]!.differences).toEqual([{ path: 'spans.0', from: '9 ft', to: '10 ft' }]);
  });

  test('tell which value was what, in the units asked for', () => {
    const before = rawSession([rawMember({ bracing: '4 ft' })]);
    const after = rawSession([
      rawMember({ spans: ['4.2 m'], section: { width: '1.5 in', depth: '9.25 in' } }),
    ]);
    expect(compareSessions(sessionOf(before), sessionOf(after), 'si').pairs[0]!.differences).toEqual([
      { path: 'spans.0', from: '4.2672 m', to: '4.2 m' },
      { path: 'section.depth', from: '285.75 mm', to: '234.95 mm' },
      { path: 'section.plies', from: 2, to: undefined },
      { path: 'bracing', from: '1.2192 m', to: undefined },
    ]);
  });

  test('tell what changed at the top', () => {
    const found = comparedTexts(
      rawSession([one], { title: 'Boathouse', units: 'us' }),
      rawSession([one], { units: 'si', combinations: 'ASCE 7-22', best: 'depth' }),
    );
    expect(found.top).toEqual([
      { path: 'title', from: 'Boathouse', to: undefined },
      { path: 'units', from: 'us', to: 'si' },
      { path: 'combinations', from: undefined, to: 'ASCE 7-22' },
      { path: 'best', from: undefined, to: 'depth' },
    ]);
  });

  test('a session is the same as itself, and as itself written anew', () => {
    fc.assert(
      fc.property(fc.array(member, { minLength: 1, maxLength: 3 }), (list) => {
        const { combinations } = list[0]!;
        const members = list.map((each, at) => ({
          member: { ...each, name: `G${at}`, combinations },
          written: undefined,
        }));
        const session = sessionOf(writeSession({ title: '', units: 'us', combinations, members }));
        const si = sessionOf(
          writeSession({ title: '', units: 'us', combinations, members: session.members }),
        );
        expect(isSame(compareSessions(session, session, 'si'))).toBe(true);
        expect(isSame(compareSessions(session, si, 'us'))).toBe(true);
      }),
      { numRuns: 100 },
    );
  });

  test('back is the same as there, with the sides changed', () => {
    fc.assert(
      fc.property(member, member, (a, b) => {
        const of = (each: typeof a) =>
          sessionOf(
            writeSession({
              title: '',
              units: 'us',
              combinations: 'ASCE 7-16',
              members: [{ member: { ...each, name: 'G1', combinations: 'ASCE 7-16' }, written: undefined }],
            }),
          );
        const [there, back] = [compareSessions(of(a), of(b), 'us'), compareSessions(of(b), of(a), 'us')];
        const turned = there.pairs[0]!.differences.map(({ path, from, to }) => ({
          path,
          from: to,
          to: from,
        }));
        const sorted = (each: readonly { path: string }[]) =>
          each.toSorted((x, y) => (x.path < y.path ? -1 : 1));
        expect(sorted(back.pairs[0]!.differences)).toEqual(sorted(turned));
      }),
      { numRuns: 100 },
    );
  });
});
