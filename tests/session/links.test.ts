import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { linksOf, resolved } from '../../src/explore/links/index.ts';
import { movesOf } from '../../src/explore/moves/index.ts';
import { ratiosOf } from '../../src/explore/ratios.ts';
import type { Link } from '../../src/loads/index.ts';
import { readSessionWithSets } from '../../src/session/set-values.ts';
import { writeSession } from '../../src/session/write.ts';
import { beamLength } from '../../src/statics/index.ts';
import { member as anyMember } from './arbitrary-member.ts';
import { faultOf, rawMember, rawSession, sessionOf } from './documents.ts';

const JOIST = rawMember({ name: 'J1', spans: ['12 ft'], spacing: '16 in', area: { live: '40 psf' } });
const job = (links: unknown, more: Record<string, unknown> = {}, joist: Record<string, unknown> = {}) =>
  rawSession([{ ...JOIST, ...joist }, rawMember({ links, ...more })]);
const girder = (text: string) => sessionOf(text).members[1]!.member;
const once = (over: Record<string, unknown> = {}) => ({ member: 'J1', end: 'left', at: '5 ft', ...over });
const along = (over: Record<string, unknown> = {}) => ({
  member: 'J1',
  end: 'right',
  every: '16 in',
  ...over,
});

describe('links in a session file', () => {
  test('are read with what they bring, positions in inches, a whole member where no ends are given', () => {
    const { links } = girder(job([once(), along(), along({ end: 0, from: '2 ft', to: '10 ft' })]));
    expect(links).toMatchObject([
      { member: 'J1', end: 'left', type: 'point', at: 60 },
      { member: 'J1', end: 'right', type: 'line', every: 16, from: 0, to: 168 },
      { member: 'J1', end: 0, type: 'line', every: 16, from: 24, to: 120 },
    ]);
    expect(links!.map(({ bears }) => bears!.live!.max)).toEqual(
      [320, 320, 320].map((r) => expect.closeTo(r, 9)),
    );
  });

  test('are written as the user wrote them, and not what they bring', () => {
    const text = writeSession(
      sessionOf(job([once({ at: '1.5 m' }), along({ every: 'spacing' }), along({ to: "9'" })])),
    );
    const raw = JSON.parse(text).members[1].links;
    expect(raw).toEqual([once({ at: '1.5 m' }), along({ every: 'spacing' }), along({ to: "9'" })]);
    expect(writeSession(sessionOf(text))).toBe(text);
  });

  test('keep the text of their other values when one changes, and of all when another is taken out', () => {
    const session = sessionOf(
      job([once({ at: '1.5 m' }), along({ every: '400 mm', from: '2 ft' }), once({ end: 1 })]),
    );
    const [joist, held] = session.members;
    const change = (links: readonly Link[]) =>
      JSON.parse(
        writeSession({ ...session, members: [joist!, { ...held!, member: { ...held!.member, links } }] }),
      ).members[1].links;
    const [first, second, third] = linksOf(held!.member) as [Link, Link, Link];
    expect(change([first, { ...second, from: 36 } as Link, third])).toEqual([
      once({ at: '1.5 m' }),
      along({ every: '400 mm', from: '3 ft' }),
      once({ end: 1 }),
    ]);
    expect(change([second, third])).toEqual([along({ every: '400 mm', from: '2 ft' }), once({ end: 1 })]);
    expect(change([])).toEqual([]);
  });

  test('of any members come back to the last bit', () => {
    const part = fc.double({ min: 0, max: 1, noNaN: true });
    const anyLink = fc.record({
      end: fc.constantFrom('left' as const, 0),
      a: part,
      b: part,
      every: fc.double({ min: 1, max: 200, noNaN: true }),
      point: fc.boolean(),
    });
    fc.assert(
      fc.property(anyMember, anyMember, fc.array(anyLink, { maxLength: 4 }), (from, on, list) => {
        const whole = beamLength(on.beam);
        const links = list.map(({ end, a, b, every, point }): Link => {
          const named = { member: 'J1', end, bears: null };
          if (point || a === b) return { ...named, type: 'point', at: a * whole };
          return { ...named, type: 'line', every, from: Math.min(a, b) * whole, to: Math.max(a, b) * whole };
        });
        const members = [
          { member: { ...from, name: 'J1', combinations: 'ASCE 7-16' as const }, written: undefined },
          { member: { ...on, name: 'G1', combinations: 'ASCE 7-16' as const, links }, written: undefined },
        ];
        const session = resolved({
          title: '',
          units: 'us' as const,
          combinations: 'ASCE 7-16' as const,
          members,
        });
        const back = sessionOf(writeSession(session));
        expect(linksOf(back.members[1]!.member)).toEqual(linksOf(session.members[1]!.member));
      }),
      { numRuns: 60 },
    );
  });

  test('of a pin are read with what they bring', () => {
    const { name: _name, ...design } = rawMember({ links: [once({ at: '7 ft' })] });
    const session = sessionOf(job([once()], { pins: [{ design }] }));
    expect(session.members[1]!.pins![0]!.member.links).toMatchObject([
      { at: 84, bears: { live: { max: expect.closeTo(320, 9) } } },
    ]);
  });
});

describe('a link that cannot be', () => {
  const PATH = 'job.json: members[1].links[0]';
  test.each([
    [once({ member: 'G1' }), `${PATH}.member: "G1" cannot carry itself; name another member`],
    [once({ member: 'J7' }), `${PATH}.member: there is no member "J7"; the nearest is "J1"`],
    [
      once({ end: 2 }),
      `${PATH}.end: "J1" has no support 2; from the left they are 0 to 1, or "left" and "right"`,
    ],
    [once({ end: 'middle' }), `${PATH}.end: "middle" is not known here; write one of "left", "right"`],
    [once({ end: -1 }), `${PATH}.end: -1 is too small`],
    [once({ end: undefined }), `${PATH}.end: missing`],
    [once({ at: '15 ft' }), `${PATH}.at: 15 ft is off the member, which is 14'-0" long`],
    [
      once({ at: undefined }),
      `${PATH}: the link has neither at nor every; write "at": "5 ft" or "every": "16 in"`,
    ],
    [once({ every: '16 in' }), `${PATH}: both at and every are given; write two links`],
    [once({ from: '2 ft' }), `${PATH}.from: a link that lands once takes at instead of from and to`],
    [along({ every: '0 in' }), `${PATH}.every: "0 in" is out of range; it must be 1 in to 200 ft`],
    [along({ every: '-16 in' }), `${PATH}.every: "-16 in" is out of range`],
    [along({ every: 'often' }), `${PATH}.every: `],
    [along({ from: '6 ft', to: '6 ft' }), `${PATH}.to: the link must end to the right of where it begins`],
    [along({ to: '20 ft' }), `${PATH}.to: 20 ft is off the member`],
    [along({ evry: '16 in' }), `${PATH}.evry: unknown key; the nearest known name is "every"`],
  ])('%j is refused with its path, why, and the way out', (link, reason) => {
    expect(faultOf(job([JSON.parse(JSON.stringify(link))]))).toContain(reason);
  });

  test('to the right end of a cantilever is refused, and by a spacing that is not stated', () => {
    expect(faultOf(job([along()], {}, { supports: 'cantilever' }))).toBe(
      `${PATH}.end: "J1" is a cantilever, held at its left end alone; write "left"`,
    );
    expect(faultOf(job([along({ every: 'spacing' })], {}, { spacing: undefined }))).toBe(
      `${PATH}.every: "J1" states no spacing to go by; write how far apart, "16 in"`,
    );
  });

  test('in a circle is refused with the path of the circle, of two members and of many', () => {
    const two = job([once()], {}, { links: [{ member: 'G1', end: 'left', at: '1 ft' }] });
    expect(faultOf(two)).toBe(
      'job.json: members[1].links[0].member: the reactions run in a circle, J1 → G1 → J1; take one of these links out',
    );
    const ring = Array.from({ length: 30 }, (_, at) =>
      rawMember({ name: `B${at}`, links: [{ member: `B${(at + 29) % 30}`, end: 'left', at: '1 ft' }] }),
    );
    expect(faultOf(rawSession(ring))).toMatch(/circle, B\d+ → B\d+ → .*24 more → B\d+; take/);
  });

  test('is one too many beside the loads', () => {
    const loads = Array.from({ length: 60 }, () => ({ kind: 'dead', point: '1 lb', at: '1 ft' }));
    const text = job(
      Array.from({ length: 41 }, () => once()),
      { loads },
    );
    expect(faultOf(text)).toBe(
      'job.json: members[1].links: 101 loads and links together; a member takes at most 100',
    );
  });
});

describe('links set on the command line', () => {
  const text = job([once(), along()], { area: { live: '10 psf' } });
  const set = (...sets: string[]) => {
    const read = readSessionWithSets(text, 'job.json', 'G1', sets);
    if (!read.ok) throw new Error(read.fault);
    return read.session.members[1]!.member;
  };

  test('take a place, a spacing or a support', () => {
    expect(set('links.0.at=7 ft').links![0]).toMatchObject({ at: 84 });
    expect(set('links[1].every=2 ft', 'links.1.end=1').links![1]).toMatchObject({ every: 24, end: 1 });
    expect(set('links.1.every=spacing').links![1]).toMatchObject({ every: 16, bySpacing: true });
  });

  test('are told apart from what is not there', () => {
    const read = readSessionWithSets(text, 'job.json', 'G1', ['links.2.at=5 ft']);
    expect(read).toMatchObject({ ok: false, fault: expect.stringContaining('the list has .0 to .1') });
  });

  test('change what carries the member, as its own values do', () => {
    const read = readSessionWithSets(text, 'job.json', 'J1', ['spans.0=24 ft']);
    if (!read.ok) throw new Error(read.fault);
    expect(read.session.members[1]!.member.links![0]!.bears!.live!.max).toBeCloseTo(640, 9);
  });

  test('give exactly the ratios that a move of such a member promises', () => {
    const { moves } = movesOf(girder(text));
    const open = moves.filter((move) => move.refused === null);
    expect(open.length).toBeGreaterThan(0);
    for (const move of open) expect([...ratiosOf(set(...move.set))]).toEqual([...move.ratios]);
  });
});
