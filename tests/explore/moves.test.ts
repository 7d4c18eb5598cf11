import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judge } from '../../src/explore/judge.ts';
import { type Move, movesOf } from '../../src/explore/moves/index.ts';
import type { Best } from '../../src/explore/rack/best.ts';
import { ratiosOf } from '../../src/explore/ratios.ts';
import { sectionWeight, standingDepth } from '../../src/timber/index.ts';
import { CHECK_IDS } from '../../src/timber/report.ts';
import { runs } from '../support/runs.ts';
import { memberOf } from '../support/session.ts';
import { anyPart, withSets } from './choice-members.ts';

const RUNS = { numRuns: runs(40) };
const kindsOf = (moves: readonly Move[]) => moves.map((move) => move.kind);

describe('moves of any member', () => {
  it('give exactly the ratios that the strings of their set give on the command line', () => {
    fc.assert(
      fc.property(anyPart, (part) => {
        const { moves, deepenOrWiden } = movesOf(memberOf(part));
        const { free } = deepenOrWiden;
        for (const move of [...moves, free.deepen, free.widen]) {
          if (move.refused !== null) continue;
          const set = withSets(part, move.set);
          expect([...ratiosOf(set)]).toEqual([...move.ratios]);
          expect(judge(ratiosOf(set)).worst).toBe(move.worst);
          expect(sectionWeight(set, set.section)).toBe(move.weight);
          expect(standingDepth(set.section)).toBe(move.depth);
        }
      }),
      RUNS,
    );
  });

  it('stand in order: those that pass by what they take, then the others by how near they come', () => {
    const anyBest = fc.constantFrom<Best>('weight', 'depth', 'boardFeet');
    fc.assert(
      fc.property(anyPart, anyBest, (part, best) => {
        const { moves } = movesOf(memberOf(part), { ranking: { best, shop: null } });
        const takes = (move: Move) =>
          best === 'depth'
            ? move.depth
            : ((best === 'weight' ? move.weight : move.boardFeet) ?? Infinity) * move.times;
        for (let at = 1; at < moves.length; at += 1) {
          const [a, b] = [moves[at - 1]!, moves[at]!];
          expect(Number(a.passes)).toBeGreaterThanOrEqual(Number(b.passes));
          if (a.passes && b.passes) expect(takes(a)).toBeLessThanOrEqual(takes(b));
          if (!a.passes && !b.passes) expect(a.worst).toBeLessThanOrEqual(b.worst);
        }
      }),
      RUNS,
    );
  });

  it('of two changes together stand only where neither change passes alone', () => {
    fc.assert(
      fc.property(anyPart, (part) => {
        const { moves } = movesOf(memberOf(part));
        for (const pair of moves.filter((move) => move.kind.includes(' + '))) {
          expect(pair.passes).toBe(true);
          for (const kind of pair.kind.split(' + ')) {
            if (kind === 'brace') continue;
            expect(moves.some((move) => move.kind === kind && move.passes)).toBe(false);
          }
        }
      }),
      RUNS,
    );
  });

  it('deepen and widen with the same 10 % more wood', () => {
    fc.assert(
      fc.property(anyPart, (part) => {
        const member = memberOf(part);
        const { free } = movesOf(member).deepenOrWiden;
        for (const move of [free.deepen, free.widen]) {
          const before = sectionWeight(member, member.section);
          if (Number.isFinite(move.weight)) expect(move.weight / before).toBeCloseTo(1.1, 5);
        }
        expect(free.widen.depth).toBe(standingDepth(member.section));
      }),
      RUNS,
    );
  });
});

describe('a member that fails in bending', () => {
  // (2) 2x12 DF-L No.2, 16 ft, 52 psf x 6 ft: bending 2.15.
  const { moves } = movesOf(memberOf({ spans: ['16 ft'] }));
  const by = (kind: string) => moves.find((move) => move.kind === kind)!;

  it('is helped by each kind of the issue that can', () => {
    expect(kindsOf(moves)).toEqual(
      expect.arrayContaining([
        'lightest',
        'deepen',
        'widen',
        'better grade',
        'other species',
        'other product',
        'closer spacing',
        'shorten',
      ]),
    );
    expect(kindsOf(moves)).not.toContain('longer bearing');
    expect(kindsOf(moves)).not.toContain('brace');
  });

  it('is told how much shorter: the quarter inch below its reach', () => {
    const shorter = by('shorten');
    expect(shorter.passes).toBe(true);
    expect(shorter.span! % 0.25).toBe(0);
    const longer = withSets({ spans: ['16 ft'] }, [`spans.0=${shorter.span! + 0.25} in`]);
    expect(judge(ratiosOf(longer)).passes).toBe(false);
  });

  it('is told how many more members a closer spacing takes', () => {
    const closer = by('closer spacing');
    expect(closer.passes).toBe(true);
    expect(closer.times).toBeCloseTo(72 / closer.member.tributary, 12);
    expect(closer.change.weight).toBe(0);
  });
});

describe('other kinds', () => {
  it('brace a slender joist as far apart as it may', () => {
    const part = {
      spans: ['12 ft'],
      tributary: '16 in',
      bracing: 'ends',
      section: { width: '1.5 in', depth: '11.25 in' },
    };
    const brace = movesOf(memberOf(part)).moves.find((move) => move.kind === 'brace')!;
    expect(brace.passes).toBe(true);
    const apart = brace.member.bracing as number;
    expect(apart).toBeGreaterThan(12);
    expect(judge(ratiosOf(withSets(part, [`bracing=${apart + 1} in`]))).passes).toBe(false);
  });

  it('lengthen a bearing that is crushed to the eighth of an inch that does, and no other bearing', () => {
    const part = { spans: ['8 ft'], tributary: '10 ft', bearing: ['1 in', '5.5 in'] };
    const member = memberOf(part);
    const { moves } = movesOf(member);
    const longer = moves.find((move) => move.kind === 'longer bearing')!;
    const at = CHECK_IDS.indexOf('bearing');
    expect(longer.ratios[at]).toBeLessThanOrEqual(1);
    expect(longer.member.bearing[1]).toBe(5.5);
    expect((longer.member.bearing[0]! * 8) % 1).toBe(0);
    const shorter = withSets(part, [`bearing.0=${longer.member.bearing[0]! - 0.125} in`]);
    expect(ratiosOf(shorter)[at]).toBeGreaterThan(1);
  });

  it('tie down what wind lifts', () => {
    const part = { use: 'roof', spans: ['12 ft'], area: { dead: '8 psf', snow: '20 psf', windUp: '40 psf' } };
    const tie = movesOf(memberOf(part)).moves.find((move) => move.kind === 'tie down')!;
    expect(tie.passes).toBe(true);
    expect(tie.set).toHaveLength(1);
    expect(tie.set[0]).toMatch(/^tiedDown=\["\d+ lb","\d+ lb"\]$/);
  });

  it('put two together where one does not do: braces and a longer bearing', () => {
    const part = {
      spans: ['11 ft'],
      tributary: '30 in',
      bracing: 'ends',
      bearing: '0.5 in',
      section: { width: '1.5 in', depth: '13.25 in' },
    };
    const { moves } = movesOf(memberOf(part));
    const pair = moves.find(
      (move) => move.kind === 'brace + longer bearing' || move.kind === 'longer bearing + brace',
    )!;
    expect(pair.passes).toBe(true);
    for (const set of pair.set) expect(judge(ratiosOf(withSets(part, [set]))).passes).toBe(false);
  });

  it('are none for a member that carries nothing, and for one whose values are typed name no other wood', () => {
    expect(movesOf(memberOf({ area: {} })).moves).toEqual([]);
    const typed = {
      spans: ['16 ft'],
      stock: {
        product: 'dimension lumber',
        species: 'Douglas Fir-Larch',
        grade: 'No.2',
        values: { Fb: '1000 psi' },
        valuesFrom: 'a report',
      },
    };
    const kinds = kindsOf(movesOf(memberOf(typed)).moves);
    for (const kind of ['better grade', 'other species', 'other product']) expect(kinds).not.toContain(kind);
  });

  it('leave out what is deeper than the limits', () => {
    const { moves } = movesOf(memberOf({ spans: ['16 ft'], maxDepth: '11.25 in' }));
    for (const move of moves) expect(move.depth).toBeLessThanOrEqual(11.25);
  });
});
