// Random beams worked out by a general-purpose library that is not ours: continuous-beams.py made the fixture.
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import type { Beam, BeamLoad } from '../../src/statics/beam.ts';
import { solveBeam } from '../../src/statics/solve.ts';
import { comparedWith } from './compared.ts';

interface Probe {
  readonly x: number;
  readonly shear: number;
  readonly moment: number;
  readonly deflection: number;
}
interface Fixture {
  readonly source: string;
  readonly cases: readonly {
    readonly beam: Beam;
    readonly loads: readonly BeamLoad[];
    readonly reactions: readonly number[];
    readonly probes: readonly Probe[];
  }[];
}

const fixture: Fixture = JSON.parse(
  readFileSync(new URL('./continuous-beams.json', import.meta.url), 'utf8'),
);
const AGREEMENT = 1e-6;
const library = comparedWith(`${fixture.source}, a library for beams in general`);

describe(`beams worked out by ${fixture.source}`, () => {
  test('the fixture holds at least 40 beams, of every number of spans, with overhangs, fixed ends and cantilevers', () => {
    const { cases } = fixture;
    expect(cases.length).toBeGreaterThanOrEqual(40);
    expect(new Set(cases.map(({ beam }) => beam.spans.length))).toEqual(new Set([1, 2, 3, 4, 5, 6]));
    expect(cases.some(({ beam }) => beam.supports === 'cantilever')).toBe(true);
    expect(cases.some(({ beam }) => beam.fixed.left && beam.overhangs.left > 0)).toBe(true);
    expect(cases.some(({ beam }) => beam.fixed.right)).toBe(true);
  });

  test.each(fixture.cases.map((one, i) => [i + 1, one] as const))(
    'beam %i has the same reactions, shear, moment and deflection to 1e-6',
    (_, { beam, loads, reactions, probes }) => {
      const response = solveBeam(beam).respond(loads);
      const close = (ours: number, theirs: number, size: number) =>
        library.holds(ours, theirs, { within: AGREEMENT * size, size });
      const largest = (values: readonly number[]) => Math.max(...values.map(Math.abs));
      expect(response.reactions.length).toBe(reactions.length);
      for (const [i, reaction] of reactions.entries())
        close(response.reactions[i]!, reaction, largest(reactions));
      for (const probe of probes) {
        close(response.shearAt(probe.x), probe.shear, largest(probes.map((p) => p.shear)));
        close(response.momentAt(probe.x), probe.moment, largest(probes.map((p) => p.moment)));
        close(response.deflectionAt(probe.x), probe.deflection, largest(probes.map((p) => p.deflection)));
      }
    },
  );
});
