import { describe, expect, it } from 'vitest';
import { scatterRemarks } from '../../src/screen/scatter-text.ts';
import { memberOf } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii, unicode } from './panels/support.ts';

const CUSTOM = {
  stock: {
    product: 'custom',
    values: {
      Fb: '2000 psi',
      Fv: '200 psi',
      Fcperp: '500 psi',
      E: '1500000 psi',
      Emin: '700000 psi',
      G: 0.5,
    },
    valuesFrom: 'report',
  },
};

describe('the scatter of stiffness', () => {
  it('stands on the deflection gauge alone as a band from the 95th to the 5th percentile of E', () => {
    const [shear, bending, deflection] = viewOf(stateOf()).gauges;
    expect([shear!.band, bending!.band]).toEqual([null, null]);
    // NDS Appendix F, from memory: COV 0.25 of visually graded lumber, percentiles at 1 ± 1.645 COV.
    expect(deflection!.band![0]).toBeCloseTo(deflection!.ratio! / 1.41125, 9);
    expect(deflection!.band![1]).toBeCloseTo(deflection!.ratio! / 0.58875, 9);
  });

  it('is drawn with both ends about the bead, in either glyph set', () => {
    for (const [glyphs, bead] of [
      [unicode, '●'],
      [ascii, '@'],
    ] as const) {
      const row = shown(stateOf(), 120, 36, glyphs).find(
        (text) => text.includes('deflection') && text.includes(bead),
      )!;
      expect(row.indexOf('[')).toBeGreaterThan(0);
      expect(row.indexOf('[')).toBeLessThan(row.indexOf(bead, row.indexOf('[')));
      expect(row.indexOf(']')).toBeGreaterThan(row.indexOf(bead, row.indexOf('[')));
    }
  });

  it('tells the share over the limit and what it assumes on one key, and no more on the next', () => {
    const on = pressing(stateOf(), 'z').state;
    const text = shown(on, 80, 24).join('\n');
    expect(text).toMatch(
      / \d+(\.\d)? % of members over the deflection limit: E normal, COV 0\.25 \(NDS App\. F\)/,
    );
    expect(shown(pressing(on, 'z').state, 80, 24).join('\n')).not.toContain('% of members');
    expect(on.past).toEqual([]);
  });

  it('is half of the members where the mean is just at the limit', () => {
    expect(scatterRemarks(memberOf(stateOf()), 1)[0]).toContain('50 % of members over');
  });

  it('is said to be unknown where nobody has stated it', () => {
    const state = pressing(stateOf([CUSTOM]), 'z').state;
    expect(viewOf(state).gauges[2]!.band).toBeNull();
    expect(shown(state, 80, 24).join('\n')).toContain('nobody has stated a COV of E');
  });
});
