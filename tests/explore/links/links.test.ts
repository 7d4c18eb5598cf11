import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  allCarriers,
  borneOf,
  borneText,
  carriedBy,
  carriersOf,
  couldCarry,
  type Job,
  linkFault,
  linkText,
  renamed,
  resolved,
  whoLoses,
  withLink,
  withNextEnd,
  withOtherRepeat,
  withoutMember,
} from '../../../src/explore/links/index.ts';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { reachFinder } from '../../../src/explore/reach/reach.ts';
import { scaleLengths, scaleLoads } from '../../../src/explore/scale.ts';
import { type AppliedLoad, kindAnalysis, type Link, reactionRange } from '../../../src/loads/index.ts';
import { readSession } from '../../../src/session/index.ts';
import { sectionWeight, woodOf } from '../../../src/timber/index.ts';
import type { Member } from '../../../src/timber/member.ts';
import { sessionText } from '../../support/session.ts';

type Part = Readonly<Record<string, unknown>>;

/** A joist of one span that carries 12 psf dead and 40 psf live at 16 in, without own weight. */
const JOIST = { name: 'J1', spans: ['12 ft'], tributary: undefined, spacing: '16 in', selfWeight: false };
const GIRDER = { name: 'G1', spans: ['14 ft'], area: {}, selfWeight: false };

function jobOf(...parts: Part[]): Job {
  const read = readSession(sessionText(...parts), 'test.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

function named(job: Job, name: string): Member {
  return job.members.find(({ member }) => member.name === name)!.member;
}

/** Largest moment of one kind's whole load, lb.in. */
function momentOf(member: Member, kind: 'dead' | 'live'): number {
  return kindAnalysis(member, 0).find((each) => each.kind === kind)!.momentMax;
}

describe('what a link brings', () => {
  it('is w l / 2 of a simple joist by kind, over the spacing where it is repeated', () => {
    // AISC Manual Table 3-23 case 1: R = w l / 2 = 40 psf x 16/12 ft x 12 ft / 2 = 320 lb, of 12 psf 96 lb.
    const job = jobOf(JOIST, { ...GIRDER, links: [{ member: 'J1', end: 'right', every: '16 in' }] });
    const [link] = named(job, 'G1').links!;
    expect(link!.bears!.live!.max).toBeCloseTo(320, 9);
    expect(link!.bears!.live!.min).toBeCloseTo(320, 9);
    expect(link!.bears!.dead!.max).toBeCloseTo(96, 9);
    // M = w l² / 8 with w = 320 lb / 16 in.
    expect(momentOf(named(job, 'G1'), 'live')).toBeCloseTo(((320 / 16) * 168 ** 2) / 8, 6);
  });

  it('of joists from both sides adds up, each over the stretch that it lands on', () => {
    const sides = [
      { member: 'J1', end: 'right', every: '16 in' },
      { member: 'J1', end: 'left', every: '16 in', from: '0 ft', to: '7 ft' },
    ];
    const job = jobOf(JOIST, { ...GIRDER, links: sides });
    // By moments about the right end: 20 lb/in over 14 ft, and again over the left 7 ft.
    const left = (20 * 168) / 2 + 20 * 84 * (1 - 42 / 168);
    const live = kindAnalysis(named(job, 'G1'), 0).find(({ kind }) => kind === 'live')!;
    expect(live.reactions[0]).toBeCloseTo(left, 6);
  });

  it('stands once where it lands: P a b / l under it', () => {
    const job = jobOf(JOIST, { ...GIRDER, links: [{ member: 'J1', end: 'left', at: '5 ft' }] });
    expect(momentOf(named(job, 'G1'), 'live')).toBeCloseTo((320 * 60 * 108) / 168, 6);
  });

  it('takes own weight of the carried member for dead load', () => {
    const job = jobOf(
      { ...JOIST, area: {}, selfWeight: true },
      { ...GIRDER, links: [{ member: 'J1', end: 'left', at: '5 ft' }] },
    );
    const joist = named(job, 'J1');
    const own = sectionWeight(joist, joist.section) * 144;
    expect(named(job, 'G1').links![0]!.bears).toEqual({
      dead: { max: expect.closeTo(own / 2, 9), min: expect.closeTo(own / 2, 9) },
    });
  });

  it('goes by its own patterns on two equal spans: 7/16 and -1/16 w l at the ends, 5/4 w l between', () => {
    // AISC Manual Table 3-23: two equal spans, both loaded (3/8, 10/8, 3/8) and one loaded (7/16, 5/8, -1/16).
    const job = jobOf(
      { ...JOIST, spans: ['12 ft', '12 ft'] },
      { ...GIRDER, links: [0, 1, 'right'].map((end) => ({ member: 'J1', end, at: '5 ft' })) },
    );
    const whole = 40 * (16 / 12) * 12;
    const live = named(job, 'G1').links!.map(({ bears }) => bears!.live!);
    expect(live[0]!.max).toBeCloseTo((7 / 16) * whole, 6);
    expect(live[0]!.min).toBeCloseTo((-1 / 16) * whole, 6);
    expect(live[1]!.max).toBeCloseTo((5 / 4) * whole, 6);
    expect(live[1]!.min).toBeCloseTo(0, 6);
    expect(live[2]).toEqual({ max: expect.closeTo(live[0]!.max, 6), min: expect.closeTo(live[0]!.min, 6) });
    // Dead load has no patterns: 3/8 w l.
    expect(named(job, 'G1').links![0]!.bears!.dead!.max).toBeCloseTo((3 / 8) * 12 * (16 / 12) * 12, 6);
  });

  it('lifts what carries it by its smallest and presses by its largest, never both at once', () => {
    const job = jobOf(
      { ...JOIST, spans: ['12 ft', '12 ft'], area: { live: '40 psf' } },
      { ...GIRDER, links: [{ member: 'J1', end: 'right', at: '5 ft' }] },
    );
    const whole = 40 * (16 / 12) * 12;
    const [left] = reactionRange(named(job, 'G1'), 0);
    expect(left!.max).toBeCloseTo((7 / 16) * whole * (108 / 168), 6);
    expect(left!.min).toBeCloseTo((-1 / 16) * whole * (108 / 168), 6);
  });

  it('is not reduced by the area of the carried member, nor by that of what carries it', () => {
    const liveReduction = { area: '2000 ft2', KLL: 2 };
    const links = [{ member: 'J1', end: 'right', every: '16 in' }];
    const job = jobOf({ ...JOIST, liveReduction }, { ...GIRDER, liveReduction, links });
    expect(named(job, 'G1').links![0]!.bears!.live!.max).toBeCloseTo(320, 9);
    expect(momentOf(named(job, 'G1'), 'live')).toBeCloseTo(((320 / 16) * 168 ** 2) / 8, 6);
  });

  it('stands on plan: of a sloped member what a level one of its loads on plan brings, on one the same', () => {
    const links = [{ member: 'J1', end: 'right', every: '16 in' }];
    const sloped = named(jobOf(JOIST, { ...GIRDER, slope: '12:12', links }), 'G1');
    const level = named(jobOf(JOIST, { ...GIRDER, links }), 'G1');
    const reactions = (member: Member) => kindAnalysis(member, 0).map((each) => each.reactions[0]!);
    reactions(level).forEach((value, at) => {
      expect(reactions(sloped)[at]).toBeCloseTo(value, 6);
    });
  });

  it('is wind up where the carried member is lifted, and an even part of its wind', () => {
    const job = jobOf(
      { ...JOIST, area: { windUp: '16 psf' } },
      { ...GIRDER, links: [{ member: 'J1', end: 'right', every: '16 in' }] },
    );
    // 16 psf x 12 ft / 2 = 96 plf upward, times 0.6 (ASCE 7 2.4.1) over 14 ft.
    const [left] = reactionRange(named(job, 'G1'), 0);
    expect(left!.min).toBeCloseTo((-0.6 * 96 * 14) / 2, 6);
  });

  it('follows the spacing that the carried member stands at where that is asked for', () => {
    const links = [{ member: 'J1', end: 'right', every: 'spacing' }];
    const at = (spacing: string) => named(jobOf({ ...JOIST, spacing }, { ...GIRDER, links }), 'G1');
    // Wider spacing brings more at fewer places: the same along the girder.
    expect(momentOf(at('24 in'), 'live')).toBeCloseTo(momentOf(at('12 in'), 'live'), 6);
    expect(at('24 in').links![0]).toMatchObject({ every: 24, bySpacing: true });
  });

  it('passes through a chain: what the lowest beam bears is all that stands on it', () => {
    const at = (member: string) => [{ member, end: 'left', at: '5 ft' }];
    const job = jobOf(
      JOIST,
      { ...GIRDER, links: at('J1') },
      { ...GIRDER, name: 'G2', links: at('G1') },
      { ...GIRDER, name: 'C1', spans: ['6 ft'], supports: 'cantilever', links: at('G2') },
    );
    // A lever of 108/168 at each of the two girders.
    expect(borneOf(named(job, 'C1'))[0]!.live!.max).toBeCloseTo(320 * (108 / 168) ** 2, 9);
  });
});

/** Forces that only press, as the typed loads that they come to. */
function asTyped({ links = [], loads }: Member): AppliedLoad[] {
  const carried = links.flatMap((link) =>
    (['dead', 'live', 'snow'] as const).flatMap((kind): AppliedLoad[] => {
      const force = link.bears?.[kind]?.max ?? 0;
      if (force === 0) return [];
      if (link.type === 'point') return [{ type: 'point', kind, at: link.at, load: force }];
      const line = force / link.every;
      return [{ type: 'line', kind, from: link.from, to: link.to, start: line, end: line }];
    }),
  );
  return [...loads, ...carried];
}

const anyLinks = fc.array(
  fc.oneof(
    fc.record({ at: fc.integer({ min: 0, max: 168 }).map((inches) => `${inches} in`) }),
    fc
      .record({
        every: fc.integer({ min: 12, max: 48 }),
        from: fc.integer({ min: 0, max: 80 }),
        run: fc.integer({ min: 10, max: 80 }),
      })
      .map(({ every, from, run }) => ({
        every: `${every} in`,
        from: `${from} in`,
        to: `${from + run} in`,
      })),
  ),
  { minLength: 1, maxLength: 4 },
);

describe('a member that carries others', () => {
  it('stands exactly as with the typed loads that its links come to, wherever they land', () => {
    fc.assert(
      fc.property(anyLinks, fc.constantFrom('left', 'right'), (places, end) => {
        const links = places.map((place) => ({ member: 'J1', end, ...place }));
        const area = { dead: '12 psf', live: '40 psf', snow: '20 psf' };
        const member = named(jobOf({ ...JOIST, area }, { ...GIRDER, area, selfWeight: true, links }), 'G1');
        const { links: _links, ...rest } = member;
        const typed: Member = { ...rest, loads: asTyped(member) };
        const ratios = ratiosOf(member);
        ratiosOf(typed).forEach((ratio, at) => {
          if (Number.isNaN(ratio)) expect(ratios[at]).toBeNaN();
          else expect(ratios[at]! / ratio).toBeCloseTo(1, 9);
        });
      }),
      { numRuns: 40 },
    );
  });

  it('adds up: each link alone brings its own part of every reaction', () => {
    fc.assert(
      fc.property(anyLinks, (places) => {
        const links = places.map((place) => ({ member: 'J1', end: 'left', ...place }));
        const live = (some: object[]) =>
          kindAnalysis(named(jobOf(JOIST, { ...GIRDER, links: some }), 'G1'), 0).find(
            ({ kind }) => kind === 'live',
          )!.reactions;
        const parts = links.map((link) => live([link]));
        live(links).forEach((reaction, support) => {
          const sum = parts.reduce((total, part) => total + part[support]!, 0);
          expect(Math.abs(reaction - sum)).toBeLessThan(1e-9 * (1 + sum));
        });
      }),
      { numRuns: 40 },
    );
  });

  it('moves what lands on it with its length, and keeps its size', () => {
    const member = named(
      jobOf(JOIST, { ...GIRDER, links: [{ member: 'J1', end: 'left', at: '7 ft' }] }),
      'G1',
    );
    const longer = scaleLengths(member, 2);
    expect(longer.links![0]).toMatchObject({ type: 'point', at: 168 });
    // P l / 4: twice the length, twice the moment; twice the load as well.
    expect(momentOf(longer, 'live')).toBeCloseTo(2 * momentOf(member, 'live'), 6);
    expect(momentOf(scaleLoads(member, 2), 'live')).toBeCloseTo(2 * momentOf(member, 'live'), 6);
    const { span } = reachFinder(member, woodOf(member))(member.section);
    const ratios = ratiosOf(scaleLengths(member, span / 168));
    expect(Math.max(...Array.from(ratios).filter((ratio) => !Number.isNaN(ratio)))).toBeCloseTo(1, 6);
  });
});

/** Three members that stand on each other; the order is theirs to be changed. */
const THREE = [
  JOIST,
  { ...GIRDER, links: [{ member: 'J1', end: 'right', every: 'spacing' }] },
  { ...GIRDER, name: 'G2', links: [{ member: 'G1', end: 'left', at: '5 ft' }] },
];

describe('the links of a job', () => {
  it('bring the same whatever order the members stand in', () => {
    const bears = (job: Job) => named(job, 'G2').links![0]!.bears;
    const first = bears(jobOf(...THREE));
    for (const order of [
      [2, 1, 0],
      [1, 2, 0],
      [2, 0, 1],
    ]) {
      expect(bears(jobOf(...order.map((at) => THREE[at]!)))).toEqual(first);
    }
  });

  it('leave every member that bears what it did the same object, and make anew those below a change alone', () => {
    const job = jobOf(...THREE, { ...GIRDER, name: 'G3' });
    expect(resolved(job)).toBe(job);
    const members = job.members.map((one) =>
      one.member.name === 'G1'
        ? { ...one, member: { ...one.member, note: 'longer', beam: { ...one.member.beam, spans: [180] } } }
        : one,
    );
    const after = resolved({ ...job, members });
    expect(after.members[0]).toBe(job.members[0]);
    expect(after.members[3]).toBe(job.members[3]);
    expect(named(after, 'G2')).not.toBe(named(job, 'G2'));
    expect(named(after, 'G2').links![0]!.bears!.live!.max).toBeCloseTo((20 * 168 * (180 - 84)) / 180, 6);
  });

  it('say who carries whom, and who loses what', () => {
    const job = jobOf(...THREE);
    expect(carriersOf(job, 'J1').map(({ carrier, index }) => [carrier, index])).toEqual([['G1', 0]]);
    expect(carriedBy(job, 'G2').map(({ link }) => link.member)).toEqual(['G1']);
    expect(carriersOf(job, 'G2')).toEqual([]);
    const all = allCarriers(job);
    for (const { member } of job.members)
      expect(all.get(member.name) ?? []).toEqual(carriersOf(job, member.name));
    expect(whoLoses(job, 'J1', 'us')).toEqual(['G1 loses J1 right end every 16": D 72, L 240 plf']);
    expect(whoLoses(job, 'G1', 'si')).toEqual([
      `G2 loses G1 left end at 1.524 m: D ${((6 * 84 * 4.4482216152605) / 1000).toFixed(2)}, L ${((20 * 84 * 4.4482216152605) / 1000).toFixed(2)} kN`,
    ]);
  });

  it('name a renamed member by its new name, and lose a deleted one, in pins too', () => {
    const pinned = THREE.map((part, at) => {
      const { name: _name, ...design } = part;
      return at === 1 ? { ...part, pins: [{ design: { ...FLOOR, ...design } }] } : part;
    });
    const job = jobOf(...pinned);
    const other = resolved(renamed(job, 'J1', 'F1'));
    expect(linkFault(other)).toBeNull();
    expect(other.members.map(({ member }) => member.name)).toEqual(['F1', 'G1', 'G2']);
    expect(named(other, 'G1').links![0]).toEqual({ ...named(job, 'G1').links![0], member: 'F1' });
    expect(other.members[1]!.pins![0]!.member.links![0]).toMatchObject({
      member: 'F1',
      bears: named(job, 'G1').links![0]!.bears,
    });
    const without = resolved(withoutMember(job, 'J1'));
    expect(linkFault(without)).toBeNull();
    expect(named(without, 'G1').links).toEqual([]);
    expect(without.members[0]!.pins![0]!.member.links).toEqual([]);
    // The girder bears nothing any more, and so does what carries it.
    expect(named(without, 'G2').links![0]!.bears).toEqual({});
  });

  it('tell a circle by its path, along which each stands on the next', () => {
    const job = jobOf(...THREE);
    const closing: Link = { member: 'G2', end: 'left', type: 'point', at: 60, bears: null };
    const members = job.members.map((one, at) =>
      at === 0 ? { ...one, member: { ...one.member, links: [closing] } } : one,
    );
    const circle = { ...job, members };
    expect(linkFault(circle)!.text).toContain('J1 → G1 → G2 → J1');
    // Whoever works it out all the same comes to an end.
    expect(() => resolved(circle)).not.toThrow();
  });

  it('can be offered: every member but those that carry the one in hand, and not itself', () => {
    const job = jobOf(...THREE, { ...GIRDER, name: 'G3' });
    const names = (carrier: string) => couldCarry(job, carrier).map(({ name }) => name);
    expect(names('J1')).toEqual(['G3']);
    expect(names('G1')).toEqual(['J1', 'G3']);
    expect(names('G2')).toEqual(['J1', 'G1', 'G3']);
    expect(names('G3')).toEqual(['J1', 'G1', 'G2']);
  });
});

const FLOOR = {
  stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.2' },
  section: { width: '1.5 in', depth: '11.25 in', plies: 2 },
};

describe('a new link', () => {
  const job = jobOf({ ...JOIST, spans: ['12 ft', '12 ft'] }, GIRDER, { ...GIRDER, name: 'G2' });
  const [joist, girder, other] = ['J1', 'G1', 'G2'].map((name) => named(job, name)) as [
    Member,
    Member,
    Member,
  ];

  it('lands along the whole member where the other stands at a spacing, else in the middle', () => {
    const along = withLink(girder, joist);
    const once = withLink(girder, other);
    if ('fault' in along || 'fault' in once) throw new Error('refused');
    expect(along.member.links).toMatchObject([
      { member: 'J1', every: 16, bySpacing: true, from: 0, to: 168 },
    ]);
    expect(along.knob).toBe('links.0.every');
    expect(once.member.links).toMatchObject([{ member: 'G2', end: 'left', at: 84 }]);
  });

  it('takes the supports of the other in turn, and lands once or repeated', () => {
    const edit = withLink(girder, joist);
    if ('fault' in edit) throw new Error('refused');
    let { member } = edit;
    const ends = [0, 1, 2].map(() => {
      member = withNextEnd(member, 0, joist);
      return member.links![0]!.end;
    });
    expect(ends).toEqual([1, 'right', 'left']);
    const once = withOtherRepeat(member, 0, joist);
    expect(once.links).toMatchObject([{ type: 'point', at: 84 }]);
    expect(withOtherRepeat(once, 0, joist).links).toMatchObject([{ every: 16, bySpacing: true }]);
    expect(withOtherRepeat(once, 0, other).links![0]).not.toHaveProperty('bySpacing');
  });
});

describe('a link in words', () => {
  const bears = {
    dead: { max: 115.4, min: 115.4 },
    live: { max: 320, min: -40 },
    windUp: { max: -64, min: -64 },
  };
  const at: Link = { member: 'J1', end: 1, type: 'point', at: 60, bears };

  it('says whose reaction lands where, and what it brings up and down', () => {
    expect(linkText(at, 'us')).toBe(`J1 support 2 at 5'-0"`);
    expect(linkText({ ...at, end: 'left', type: 'line', every: 16, from: 0, to: 90 }, 'us')).toBe(
      'J1 left end every 16"',
    );
    expect(borneText(at, 'us')).toBe('D 115, L 320 to -40, Wup -64 lb');
    expect(borneText({ ...at, bears: {} }, 'us')).toBe('nothing');
    expect(borneText({ ...at, bears: null }, 'us')).toBe('nothing');
  });
});
