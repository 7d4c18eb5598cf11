import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { newMember } from '../../src/session/new-member.ts';
import type { Session } from '../../src/session/session.ts';
import { writeSession } from '../../src/session/write.ts';
import type { Member } from '../../src/timber/member.ts';
import { SAMPLES } from '../support/samples.ts';
import { member } from './arbitrary-member.ts';
import { rawMember, rawSession, sessionOf } from './documents.ts';

const members = (session: Session) => session.members.map((one) => one.member);
const sessions = fc
  .record({
    title: fc.constantFrom('', 'Boathouse'),
    units: fc.constantFrom('us' as const, 'si' as const),
    combinations: fc.constantFrom('ASCE 7-16' as const, 'ASCE 7-22' as const),
    list: fc.array(member, { minLength: 1, maxLength: 3 }),
  })
  .map(
    ({ list, ...top }): Session => ({
      ...top,
      members: list.map((one, i) => ({
        member: { ...one, name: `G${i}`, combinations: top.combinations },
        written: undefined,
      })),
    }),
  );

describe('reading what was written', () => {
  test('gives every value of any session back, to the last bit', () => {
    fc.assert(
      fc.property(sessions, (session) => {
        const back = sessionOf(writeSession(session));
        expect(members(back)).toEqual(members(session));
        expect(back).toMatchObject({
          title: session.title,
          units: session.units,
          combinations: session.combinations,
        });
      }),
      { numRuns: 200 },
    );
  });

  test('and writing it again gives the same text', () => {
    fc.assert(
      fc.property(sessions, (session) => {
        const text = writeSession(session);
        expect(writeSession(sessionOf(text))).toBe(text);
      }),
      { numRuns: 100 },
    );
  });

  test('gives any changed member back, whatever the file said of it before', () => {
    fc.assert(
      fc.property(sessions, member, (session, changed) => {
        const read = sessionOf(writeSession(session));
        const { written, member: old } = read.members[0]!;
        const now = { ...changed, name: old.name, combinations: old.combinations };
        const text = writeSession({ ...read, members: [{ member: now, written }, ...read.members.slice(1)] });
        expect(members(sessionOf(text))).toEqual([now, ...members(read).slice(1)]);
      }),
      { numRuns: 200 },
    );
  });
});

describe("the user's own text", () => {
  const odd = rawMember({
    spans: ['168 in', `4 m`],
    bearing: `3 1/2"`,
    tributary: '72.0 in',
    area: { live: '0.040 ksf', dead: '12psf' },
    loads: [
      { kind: 'dead', line: '60 lb/ft' },
      { kind: 'snow', point: '0.85 kip', at: `5'` },
      { kind: 'live', line: ['5 lb/in', '60 plf'], from: '0 in', to: '2 ft' },
    ],
    overhangs: {},
    limits: { live: 360 },
    flat: false,
  });
  const text = rawSession([odd], { units: 'us' });
  const write = (change: (member: Member) => Member, over = text) => {
    const session = sessionOf(over);
    const { member, written } = session.members[0]!;
    return JSON.parse(writeSession({ ...session, members: [{ member: change(member), written }] }));
  };

  test('stays where nothing has changed, and what was absent stays absent', () => {
    expect(write((member) => member)).toEqual(JSON.parse(text));
  });

  test('stays beside the one value that changed', () => {
    const changed = write((member) => ({
      ...member,
      beam: { ...member.beam, spans: [180, member.beam.spans[1]!] },
      area: { ...member.area, snow: 25 / 144 },
    }));
    expect(changed.members[0]).toEqual({
      ...odd,
      spans: ['15 ft', '4 m'],
      area: { live: '0.040 ksf', dead: '12psf', snow: '25 psf' },
    });
  });

  test('of a load stays when another load before it is taken out or one of its own values changes', () => {
    const without = write((member) => ({ ...member, loads: member.loads.slice(1) }));
    expect(without.members[0].loads).toEqual((odd.loads as unknown[]).slice(1));
    const moved = write((member) => ({
      ...member,
      loads: member.loads.map((load) => (load.type === 'point' ? { ...load, at: 72 } : load)),
    }));
    expect(moved.members[0].loads[1]).toEqual({ kind: 'snow', point: '0.85 kip', at: '6 ft' });
    expect(moved.members[0].loads[0]).toEqual({ kind: 'dead', line: '60 lb/ft' });
  });

  test('of spacing gives way to a tributary width of its own, and the other way round', () => {
    const spaced = rawSession([rawMember({ spacing: '16 in' })]);
    const wide = write((member) => ({ ...member, spacing: null, tributary: 72 }), spaced).members[0];
    expect(wide).not.toHaveProperty('spacing');
    expect(wide.tributary).toBe('6 ft');
    const back = write((member) => ({ ...member, spacing: 24, tributary: 24 })).members[0];
    expect(back).not.toHaveProperty('tributary');
    expect(back.spacing).toBe('24 in');
  });

  test('keeps title, units and combinations as they were stated, and follows a change of units', () => {
    const session = sessionOf(
      rawSession(undefined, { title: 'Job', units: 'us', combinations: 'ASCE 7-16' }),
    );
    expect(JSON.parse(writeSession(session))).toMatchObject({
      title: 'Job',
      units: 'us',
      combinations: 'ASCE 7-16',
    });
    expect(JSON.parse(writeSession({ ...session, units: 'si', title: 'Hut' }))).toMatchObject({
      title: 'Hut',
      units: 'si',
    });
    expect(Object.keys(JSON.parse(writeSession(sessionOf(rawSession()))))).toEqual(['thrice', 'members']);
  });

  test('stays exactly where a value is set that nobody had stated: it is written though it is the default', () => {
    const braced = write((member) => ({
      ...member,
      assumed: member.assumed.filter((key) => key !== 'bracing'),
    }));
    expect(braced.members[0].bracing).toBe('continuous');
  });
});

describe('the text of a file', () => {
  test('is terse for a new member: only what is not the default', () => {
    const one = newMember('floor', [180], 48, 'G1');
    const session: Session = {
      title: '',
      units: 'us',
      combinations: 'ASCE 7-16',
      members: [{ member: one, written: undefined }],
    };
    expect(writeSession(session)).toBe(`{
  "thrice": 1,
  "members": [
    {
      "name": "G1",
      "spans": ["15 ft"],
      "tributary": "4 ft",
      "area": { "dead": "12 psf", "live": "40 psf" },
      "stock": { "product": "dimension lumber", "species": "Douglas Fir-Larch", "grade": "No.2" },
      "section": { "width": "1.5 in", "depth": "9.25 in" }
    }
  ]
}
`);
  });

  test.each(SAMPLES)('of the sample $title is written back letter for letter', ({ file }) => {
    const text = readFileSync(file, 'utf8');
    expect(writeSession(sessionOf(text))).toBe(text);
  });
});
