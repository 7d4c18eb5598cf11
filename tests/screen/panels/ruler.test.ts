import { describe, expect, it } from 'vitest';
import { drawRuler } from '../../../src/screen/panels/ruler.ts';
import type { RulerView, View } from '../../../src/screen/view.ts';
import { drawn } from './support.ts';
import { absent, failing } from './views.ts';

const ruler = (change: Partial<RulerView>, view: View = failing) =>
  drawn(80, 4, (...to) => drawRuler({ ...view, ruler: { ...view.ruler, ...change } }, ...to)).rows;

describe('the ruler', () => {
  it('stands now right of the wall when the member fails, with the depth at hand at the pointer', () => {
    expect(ruler({})).toEqual([
      '                               stands to 14.1 ┃   now 16.0',
      ' l/h    ── ¹ ──┊════════ bending² ════════════┃○══●═══════════════════┊≡≡ ³ ≡≡',
      '        4      5    6    7   8  9  10    12   ┃   16    20     25   30   35  40',
      ' stock                                  16 14 ┃   ▲12  10      8       6',
    ]);
  });

  it('stands now left of the wall when the member stands', () => {
    const [labels, zones] = ruler({ now: 12, ghost: null });
    expect(labels).toBe('                                  now 12.0    ┃ stands to 14.1');
    expect(zones!.indexOf('●')).toBeLessThan(zones!.indexOf('┃'));
  });

  it('keeps now and the wall apart and their figures in order, however near they are', () => {
    const [failLabels, fails] = ruler({ now: 14.12, standsTo: 14.11, ghost: null });
    expect(fails).toContain('┃●');
    expect(failLabels).toContain('stands to 14.1 ┃ now 14.2');
    const [passLabels, passes] = ruler({ now: 14.18, standsTo: 14.19, ghost: null });
    expect(passes).toContain('●┃');
    expect(passLabels).toContain('now 14.1 ┃ stands to 14.1');
  });

  it('reaches further when now lies outside the usual range', () => {
    expect(ruler({ now: 2.2, ghost: null })[2]).toMatch(/^ {8}2 .* 40$/);
    expect(ruler({ now: 57, ghost: null })[2]).toMatch(/^ {8}4 .* 60$/);
    expect(ruler({ now: 5000, ghost: null })[1]).toContain('»');
    expect(ruler({ now: 0, ghost: null })[1]).toContain('«');
  });

  it('says so when the wall lies off the axis or nowhere', () => {
    expect(ruler({ standsTo: 2.6 })[0]).toContain('« stands to 2.6');
    expect(ruler({ standsTo: 95 })[0]).toContain('stands to 95.0 »');
    expect(ruler({ standsTo: null })[0]).toContain('stands nowhere');
  });

  it('joins shear to deflection where bending governs nowhere', () => {
    const [, zones] = ruler({ shearToBending: 12.6, bendingToDeflection: 12.6, standsTo: null, ghost: null });
    expect(zones).toContain(' shear¹ ');
    expect(zones).not.toContain('═');
    expect(zones!.match(/┊/g)).toHaveLength(1);
  });

  it('gives the whole axis to the power that governs when nothing crosses, and to none when none does', () => {
    const none = { shearToBending: null, bendingToDeflection: null, standsTo: null, ghost: null };
    expect(ruler(none)[1]).toMatch(/^ l\/h {4}═+ bending² ═+●═+$/);
    expect(ruler(none, absent)[1]).toMatch(/^ l\/h {4}┄+●┄+$/);
  });

  it('draws no now that is not a number', () => {
    expect(ruler({ now: Number.NaN, ghost: null }).join('')).not.toMatch(/●|▲|NaN/);
  });
});
