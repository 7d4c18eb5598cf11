import { describe, expect, test } from 'vitest';
import { carriedLoads, liftsOf, loadsOf } from '../../src/loads/carried.ts';
import type { Borne, Link } from '../../src/loads/loading.ts';
import { member } from './members.ts';

const at = (bears: Borne | null): Link => ({ type: 'point', member: 'J1', end: 'left', at: 50, bears });
const every = (bears: Borne): Link => ({
  type: 'line',
  member: 'J1',
  end: 'left',
  every: 16,
  from: 20,
  to: 120,
  bears,
});
const BORNE: Borne = {
  dead: { max: 300, min: 300 },
  live: { max: 800, min: -120 },
  snow: { max: 400, min: -60 },
  windUp: { max: -250, min: -250 },
};

describe('what a link brings', () => {
  test('is the largest of each kind where it lands, wind upward given positive', () => {
    expect(carriedLoads(at(BORNE), member({}))).toEqual([
      { type: 'point', kind: 'dead', at: 50, load: 300 },
      { type: 'point', kind: 'live', at: 50, load: 800 },
      { type: 'point', kind: 'snow', at: 50, load: 400 },
      { type: 'point', kind: 'windUp', at: 50, load: 250 },
    ]);
  });

  test('is divided by the spacing where it repeats, and dead load lies on plan', () => {
    const bears = { dead: { max: 320, min: 320 }, live: { max: 800, min: 0 } };
    const ends = { from: 20, to: 120 };
    expect(carriedLoads(every(bears), member({}))).toEqual([
      { type: 'line', kind: 'dead', ...ends, start: 20, end: 20 },
      { type: 'line', kind: 'live', ...ends, start: 50, end: 50 },
    ]);
    // A 3:4 slope is 5/4 as long as its plan.
    expect(carriedLoads(every(bears), member({}, { slope: 0.75 }))).toEqual([
      { type: 'line', kind: 'dead', ...ends, start: 16, end: 16 },
      { type: 'line', kind: 'live', ...ends, start: 50, end: 50 },
    ]);
  });

  test('is nothing while it has not been worked out, or where it only lifts', () => {
    expect(carriedLoads(at(null), member({}))).toEqual([]);
    expect(carriedLoads(at({ live: { max: -50, min: -120 } }), member({}))).toEqual([]);
    expect(carriedLoads(at({ dead: { max: 0, min: 0 } }), member({}))).toEqual([]);
    // Dead load may pull.
    expect(carriedLoads(at({ dead: { max: -40, min: -40 } }), member({}))).toMatchObject([{ load: -40 }]);
  });

  test('stands beside the loads typed', () => {
    const typed = { type: 'point', kind: 'live', at: 9, load: 70 } as const;
    const plain = member({}, { loads: [typed] });
    expect(loadsOf(plain)).toBe(plain.loads);
    const carrying = member({}, { loads: [typed], links: [at({ live: { max: 8, min: 0 } })] });
    expect(loadsOf(carrying)).toEqual([typed, { type: 'point', kind: 'live', at: 50, load: 8 }]);
    expect(loadsOf(member({}, { loads: [typed], links: [] }))).toEqual([typed]);
  });
});

describe('what a link lifts with', () => {
  test('is what its smallest reaction is below nothing, of kinds that come in patterns', () => {
    const two = member({ spans: [100, 100] }, { links: [at(BORNE)] });
    expect(liftsOf(two)).toEqual([
      { type: 'point', kind: 'live', at: 50, load: -120 },
      // Half the snow stays elsewhere while it lifts (ASCE 7 7.5, partial loading).
      { type: 'point', kind: 'snow', at: 50, load: -60 - 200 },
    ]);
    // On one field alone there is no partial snow.
    expect(liftsOf(member({ spans: [100] }, { links: [at(BORNE)] }))).toMatchObject([
      { kind: 'live', load: -120 },
      { kind: 'snow', load: -60 - 400 },
    ]);
    expect(
      liftsOf(member({ spans: [100] }, { links: [at({ snow: { max: -30, min: -60 } })] })),
    ).toMatchObject([{ kind: 'snow', load: -60 }]);
  });

  test('is nothing where reactions only press, or are not known', () => {
    expect(liftsOf(member({}))).toEqual([]);
    expect(liftsOf(member({}, { links: [] }))).toEqual([]);
    expect(liftsOf(member({}, { links: [at(null), at({ live: { max: 9, min: 0 } })] }))).toEqual([]);
    expect(liftsOf(member({}, { links: [at({ wind: { max: -9, min: -9 } })] }))).toEqual([]);
  });
});
