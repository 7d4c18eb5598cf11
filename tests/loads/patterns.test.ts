import { describe, expect, test } from 'vitest';
import { compileEffects } from '../../src/loads/compile.ts';
import { liftBit, type Pattern, patternName, snowCases } from '../../src/loads/patterns.ts';
import { beamFields } from '../../src/statics/beam.ts';
import { beam } from '../statics/beams.ts';
import { member, PSF } from './members.ts';

const bits = (...fields: number[]) => fields.reduce((mask, f) => mask | (1 << f), 0);

describe('snowCases', () => {
  // ASCE 7-16 §7.5.1, cases 1 to 3; the fields with the whole balanced load, half on the others.
  test.each([
    [1, [[0]]],
    [2, [[0, 1], [0], [1]]],
    [3, [[0, 1, 2], [0], [2], [1, 2], [0, 1]]],
    [4, [[0, 1, 2, 3], [0], [3], [1, 2, 3], [0, 1, 2], [0, 1], [1, 2], [2, 3]]],
  ])('on %i fields are balanced snow and the three partial cases, none given twice', (n, full) => {
    expect(snowCases(n).map((one) => one.full)).toEqual(full.map((fields) => bits(...fields)));
  });
});

describe('patternName', () => {
  const fields = beamFields(beam([100, 100, 100, 100], { left: 10, right: 10 }));
  const all = bits(0, 1, 2, 3, 4, 5);
  const loaded = { live: all, roofLive: all, snow: all };
  const name = (pattern: Partial<Pattern>, on = loaded) =>
    patternName({ live: -1, roofLive: -1, snow: -1, lifts: 0, ...pattern }, fields, on);

  test.each<readonly [Partial<Pattern>, string]>([
    [{}, 'all spans'],
    [{ live: bits(2) }, 'live on span 2'],
    [{ live: bits(1, 3) }, 'live on spans 1, 3'],
    [{ live: bits(1, 2, 3) }, 'live on spans 1 to 3'],
    [{ live: bits(0, 2) }, 'live on left overhang and span 2'],
    [{ live: bits(0, 2, 4, 5) }, 'live on left overhang, spans 2, 4 and right overhang'],
    [{ live: 0 }, 'no live'],
    [{ roofLive: bits(5) }, 'roof live on right overhang'],
    [{ snow: bits(0) }, 'snow full on left overhang, half elsewhere'],
    [{ live: bits(1), snow: bits(3, 4) }, 'live on span 1; snow full on spans 3, 4, half elsewhere'],
    [{ lifts: liftBit('live', 1) | liftBit('live', 3) }, 'carried live lifting spans 1, 3'],
    [{ live: bits(1), lifts: liftBit('snow', 0) }, 'live on span 1; carried snow lifting left overhang'],
  ])('says %o as "%s"', (pattern, words) => {
    expect(name(pattern)).toBe(words);
  });

  test('does not name fields that have no load of the kind anyway', () => {
    const part = { live: bits(1, 2), roofLive: 0, snow: 0 };
    expect(name({ live: bits(1, 4) }, part)).toBe('live on span 1');
    expect(name({ live: bits(1, 2) }, part)).toBe('all spans');
  });
});

describe('patterns of a member', () => {
  const area = { dead: 10 * PSF, live: 40 * PSF };

  test('put live load on one span for its own sagging, on both for the support between', () => {
    const effects = compileEffects(member({ spans: [144, 144] }, { area }), { heaviest: 0, deadFactor: 1 });
    const name = (list: typeof effects.sagging, place: number) =>
      effects.patterns[
        list.find((group) => group.duration === 1 && group.place === place)!.terms[0]!.pattern
      ];
    expect(name(effects.sagging, 0)).toBe('live on span 1');
    expect(name(effects.sagging, 1)).toBe('live on span 2');
    expect(name(effects.hogging, 0)).toBe('all spans');
    expect(effects.patterns[0]).toBe('all spans');
  });

  test('put half the snow off the overhang that steadies a span', () => {
    const on = member(
      { spans: [144], overhangs: { left: 0, right: 60 } },
      { area: { dead: 10 * PSF, snow: 30 * PSF } },
    );
    const effects = compileEffects(on, { heaviest: 0, deadFactor: 1 });
    const term = effects.sagging.find((group) => group.duration === 1.15 && group.place === 0)!.terms[0]!;
    expect(effects.patterns[term.pattern]).toBe('snow full on span 1, half elsewhere');
  });

  test('leave a simple span and a cantilever with the one pattern', () => {
    for (const supports of ['bearings', 'cantilever'] as const) {
      const on = member(
        { spans: [144], supports },
        { area: { live: 40 * PSF, roofLive: 20 * PSF, snow: 30 * PSF } },
      );
      expect(compileEffects(on, { heaviest: 1, deadFactor: 1 }).patterns).toEqual(['all spans']);
    }
  });
});
