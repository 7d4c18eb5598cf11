import { describe, expect, test } from 'vitest';
import { adjusted, prepare, reportMember, woodOf } from '../../../src/timber/index.ts';
import type { Member } from '../../../src/timber/member.ts';
import { memberOf, simpleSpan } from '../member-of.ts';

const of = (member: Member, duration: number, field: number) =>
  adjusted(prepare(member), woodOf(member), member.section, duration, field);

// Douglas Fir-Larch No.2: Fb 900, Fv 180, Fc-perp 625, E 1.6e6, Emin 0.58e6 psi (Supplement Table 4A, from memory).
describe('adjusted values', () => {
  const two = memberOf({ beam: { ...simpleSpan(0), spans: [100, 168] }, bracing: 'ends' });

  test('in bending are those of the field, as the check has them there', () => {
    const checks = reportMember(two).checks;
    const bending = checks.find(({ id }) => id === 'bending')!;
    expect(bending.place).toBe(1);
    expect(of(two, 1, 1)!.Fb).toBe(bending.capacity);
    // The shorter span is braced at less.
    expect(of(two, 1, 0)!.Fb).toBeGreaterThan(bending.capacity);
    expect(of(two, 1, 0)!.Fb).toBeLessThan(900);
    const hogging = checks.find(({ id }) => id === 'bending-hogging')!;
    expect(of(two, 1, 1)!.FbHogging).toBe(hogging.capacity);
  });

  test('without stability and volume where nothing bends that way at that duration', () => {
    const one = memberOf({ bracing: 'ends', section: { width: 1.5, depth: 9.25, plies: 1, flat: true } });
    expect(of(one, 1.6, 0)!.Fb).toBeCloseTo(900 * 1.1 * 1.2 * 1.6, 9);
    expect(of(one, 1, 0)!.FbHogging).toBeCloseTo(900 * 1.1 * 1.2, 9);
    expect(of(one, 1.15, 7)!.Fb).toBeCloseTo(900 * 1.1 * 1.2 * 1.15, 9);
  });

  test('of shear go with the duration, of bearing and stiffness they do not', () => {
    expect(of(two, 1.25, 0)).toMatchObject({ Fv: 225, Fcperp: 625, E: 1.6e6, Emin: 0.58e6 });
  });

  test('there are none of a size that the table does not cover', () => {
    expect(
      adjusted(prepare(two), woodOf(two), { width: 5.5, depth: 11.5, plies: 1, flat: false }, 1, 0),
    ).toBeNull();
  });
});
