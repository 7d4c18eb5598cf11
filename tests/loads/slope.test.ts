import { describe, expect, test } from 'vitest';
import { kindAnalysis } from '../../src/loads/analysis.ts';
import { areaToLine, planLoad } from '../../src/loads/area-to-line.ts';
import { compileEffects } from '../../src/loads/compile.ts';
import { slopedLength } from '../../src/loads/slope.ts';
import { member, PSF } from './members.ts';

// The conventions of domain §2. A 3:4 slope has cos = 4/5, so that every figure is round.
const slope = 3 / 4;
const l = 160;

describe('a sloped member', () => {
  test('is as much longer than on plan as its cosine is below one', () => {
    expect(slopedLength(slope, l)).toBeCloseTo(200, 12);
    expect(slopedLength(0, l)).toBe(l);
  });

  test('has dead load along the slope turned to plan by its cosine, snow and live as on plan', () => {
    const loading = member(
      { spans: [l] },
      { slope, area: { dead: 12 * PSF, snow: 30 * PSF, live: 20 * PSF } },
    );
    expect(areaToLine(loading, 'dead')).toBeCloseTo((12 * PSF * 72) / 0.8, 12);
    expect(areaToLine(loading, 'snow')).toBeCloseTo(30 * PSF * 72, 12);
    expect(areaToLine(loading, 'live')).toBeCloseTo(20 * PSF * 72, 12);
  });

  test('has typed dead line loads turned likewise, but not point loads or other kinds', () => {
    const line = { type: 'line', from: 0, to: 10, start: 4, end: 8 } as const;
    expect(planLoad({ ...line, kind: 'dead' }, slope)).toMatchObject({ start: 5, end: 10 });
    expect(planLoad({ ...line, kind: 'snow' }, slope)).toMatchObject({ start: 4, end: 8 });
    expect(planLoad({ type: 'point', at: 5, load: 100, kind: 'dead' }, slope)).toMatchObject({ load: 100 });
  });

  test('carries its own weight per length of slope, so 1/cos more on plan', () => {
    const loading = member({ spans: [l] }, { slope, selfWeight: true });
    const effects = compileEffects(loading, { heaviest: 4, deadFactor: 1 });
    const shear = effects.shear[0]!.terms[0]!;
    expect(shear.perWeight).toBeCloseTo(l / 0.8 / 2, 9);
  });

  test('deflects square to itself as the normal part of its loads bends the sloped length', () => {
    const loading = member({ spans: [l] }, { slope, area: { snow: 30 * PSF } });
    const w = 30 * PSF * 72;
    // Per length of slope the load is w cos, its part square to the slope w cos²; the length is l/cos.
    const expected = (5 * w * 0.8 ** 2 * (l / 0.8) ** 4) / 384;
    const effects = compileEffects(loading, { heaviest: 0, deadFactor: 1 });
    expect(effects.deflectionLive[0]!.terms[0]!.base / expected).toBeCloseTo(1, 12);
    expect(kindAnalysis(loading, 0)[0]!.deflection / expected).toBeCloseTo(1, 12);
    expect(effects.sagging.find((g) => g.duration === 1.15)!.terms[0]!.base).toBeCloseTo((w * l ** 2) / 8, 6);
  });
});
