import { describe, expect, test } from 'vitest';
import { lightestOf, rackOf } from '../../../src/explore/rack/rack.ts';
import { sized } from '../../../src/explore/rack/sized.ts';
import { CHECK_IDS } from '../../../src/timber/report.ts';
import { memberOf } from '../../support/session.ts';

describe('a member that is sized', () => {
  test('has the lightest size that passes, and the report of that size', () => {
    const member = memberOf({ spans: ['13 ft'] });
    const { lightest, nearest, report } = sized(member, 'us');
    expect(lightest!.size).toEqual(lightestOf(member));
    expect(nearest).toBe(lightest);
    expect(report.label).toBe(lightest!.size.label);
    for (const { id, ratio } of report.checks) expect(ratio).toBe(lightest!.ratios[CHECK_IDS.indexOf(id)]);
  });

  test('has the size with the least worst ratio where none passes', () => {
    const member = memberOf({ spans: ['40 ft'] });
    const { lightest, nearest, report } = sized(member, 'us');
    expect(lightest).toBeNull();
    const worst = rackOf(member).sizes.filter(({ refused }) => refused === null);
    expect(nearest!.worst).toBe(Math.min(...worst.map((size) => size.worst)));
    expect(report.label).toBe(nearest!.size.label);
  });

  test('is told by its other checks where one is met by no size', () => {
    // Light floor on unequal spans: the short one lifts, and nothing ties it down.
    const member = memberOf({ spans: ['16 ft', '5 ft'], area: { dead: '5 psf', live: '60 psf' } });
    const { lightest, nearest } = sized(member, 'us');
    expect(lightest).toBeNull();
    expect(nearest!.governing).toBe('uplift');
    const others = (ratios: readonly number[]) =>
      Math.max(...ratios.filter((ratio) => Number.isFinite(ratio)));
    const allowed = rackOf(member).sizes.filter(({ refused }) => refused === null);
    expect(others(nearest!.ratios)).toBe(Math.min(...allowed.map(({ ratios }) => others(ratios))));
  });

  test('has none where every size is over what is allowed', () => {
    const { lightest, nearest, member } = sized(memberOf({ maxDepth: '2 in' }), 'us');
    expect([lightest, nearest]).toEqual([null, null]);
    expect(member.section.depth).toBe(11.25);
  });
});
