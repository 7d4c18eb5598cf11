import { describe, expect, test } from 'vitest';
import { answerOf } from '../../src/screen/answer.ts';
import { verdictOf } from '../../src/screen/verdict-text.ts';
import { memberOf } from '../support/session.ts';

const verdict = (part: Readonly<Record<string, unknown>>) => {
  const member = memberOf(part);
  return verdictOf(member, answerOf(member), 'us');
};

describe('the verdict', () => {
  test('of a member that carries nothing asks for a load and offers no cures', () => {
    expect(verdict({ area: {} })).toEqual({
      passes: false,
      reason: 'It carries nothing but itself: give it a load.',
      cures: [],
    });
  });

  test('of one that fails says what stops it and a size that would do', () => {
    const { passes, reason, cures } = verdict({ spans: ['14 ft'] });
    expect(passes).toBe(false);
    expect(reason).toMatch(/^Bending stops it at \d+\.\d\d\.$/);
    expect(cures[0]).toMatch(/^Lightest cure: .*, 0\.\d\d\.$/);
  });

  test('of one that passes says what is nearest its limit', () => {
    const { passes, reason } = verdict({ spans: ['8 ft'] });
    expect(passes).toBe(true);
    expect(reason).toMatch(/^Everything passes; bending is nearest its limit at 0\.\d\d\.$/);
  });

  test('of one that passes keeps its ratio where the place is long: a narrow screen has no room for more', () => {
    const { reason } = verdict({
      spans: ['12 ft'],
      overhangs: { left: '0 ft', right: '4 ft' },
      bracingBottom: 'continuous',
      area: { dead: '10 psf', live: '40 psf' },
      section: { width: '1.5 in', depth: '9.25 in', plies: 3 },
      tributary: '4 ft',
    });
    expect(reason).toMatch(/ of the right overhang is nearest its limit at 0\.\d\d\.$/);
    expect(reason.length).toBeLessThanOrEqual(69);
  });

  test('of one that lifts names a tie-down that holds when it is typed as it is shown', () => {
    const uplift = { area: { dead: '8 psf', windUp: '31.37 psf' }, spans: ['14 ft'] };
    const member = memberOf(uplift);
    for (const units of ['us', 'si'] as const) {
      const [cure] = verdictOf(member, answerOf(member), units).cures;
      const shown = /^Tie it down for (.*)\.$/.exec(cure!)![1]!;
      const tied = memberOf({ ...uplift, tiedDown: [shown, shown] });
      const result = answerOf(tied).report.checks.find(({ id }) => id === 'uplift')!;
      expect(result.ratio).toBeLessThanOrEqual(1 + 1e-9);
      expect(result.ratio).toBeGreaterThan(0.99);
    }
  });
});
