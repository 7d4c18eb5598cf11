import { describe, expect, it } from 'vitest';
import type { Member } from '../../../src/timber/member.ts';
import {
  ratioText,
  type WorkingLine,
  type WorkingsId,
  workingsOf,
} from '../../../src/timber/workings/index.ts';
import { memberOf, NO_AREA, psf, simpleSpan, stockOf } from '../member-of.ts';

const one = (width: number, depth: number, plies = 1) => ({ width, depth, plies, flat: false });

function line(member: Member, id: WorkingsId, symbol: string, units: 'us' | 'si' = 'us'): WorkingLine {
  const found = workingsOf(member, id, units).lines.find((each) => each.symbol === symbol);
  if (found === undefined) throw new Error(`no line ${symbol}`);
  return found;
}

function notes(member: Member, id: WorkingsId): string {
  return workingsOf(member, id, 'us')
    .lines.map(({ note }) => note ?? '')
    .join('\n');
}

describe('the wet-service 2x8 of the CE 479 wood design example', () => {
  // CE 479 wood design example, university course notes, Fall 2006: No.1 Douglas Fir-Larch, wet, D+S,
  // Fb' = 1000 x 1.15 x 0.85 x 1.2 = 1173 psi, Fv' = 180 x 1.15 x 0.97 = 201 psi.
  const member = memberOf({
    stock: stockOf('dimension lumber', 'Douglas Fir-Larch', 'No.1'),
    section: one(1.5, 7.25),
    service: 'wet',
    area: { ...NO_AREA, dead: psf(15), snow: psf(30) },
  });

  it("reads Fb' from the reference value through every factor", () => {
    expect(line(member, 'bending', "Fb'")).toEqual({
      symbol: "Fb'",
      formula: 'Fb x CD x CM x CL x CF',
      numbers: '1000 psi x 1.15 x 0.85 x 1.0 x 1.2',
      result: '1173 psi',
      clause: 'NDS Table 4.3.1',
    });
    expect(line(member, 'bending', 'CF')).toEqual({
      symbol: 'CF',
      result: '1.2',
      note: 'nominal 8 in deep',
      clause: 'Table 4A',
    });
    expect(line(member, 'bending', 'CD')).toMatchObject({
      result: '1.15',
      note: 'snow is the shortest load in D+S',
      clause: 'NDS Table 2.3.2',
    });
  });

  it("reads Fv' the same way", () => {
    expect(line(member, 'shear', "Fv'")).toMatchObject({
      numbers: '180 psi x 1.15 x 0.97',
      result: '200.79 psi',
    });
  });

  it('says what governs and what comes next', () => {
    expect(notes(member, 'bending')).toMatch(/D\+S governs at .* CD 1\.15.*\nnext comes D at .* CD 0\.9/);
  });

  it('reads in SI as the same calculation', () => {
    expect(line(member, 'bending', "Fb'", 'si')).toMatchObject({
      numbers: '6.8948 MPa x 1.15 x 0.85 x 1.0 x 1.2',
      result: '8.0876 MPa',
    });
    expect(line(member, 'bending', 'CF', 'si').note).toBe('184.2 mm (nominal 8 in) deep');
  });
});

describe('the workings of a single check', () => {
  it('walk through CL by le, RB, FbE and F', () => {
    // AWC Structural Wood Design Solved Example Problems, example 1.1, from memory:
    // le = 1.37 lu + 3d = 375 in, RB = 21.6, FbE / Fb* = 1.07, CL = 0.84.
    const member = memberOf({
      beam: simpleSpan(240),
      stock: stockOf('dimension lumber', 'Hem-Fir', 'Select Structural'),
      section: one(3.5, 15.25),
      bracing: 'ends',
      selfWeight: false,
      area: NO_AREA,
      loads: [{ type: 'point', kind: 'live', at: 120, load: 2000 }],
    });
    expect(line(member, 'bending', 'le')).toMatchObject({
      formula: '1.37 lu + 3d',
      numbers: '1.37 x 240 in + 3 x 15.25 in',
      result: '374.55 in',
      clause: 'NDS Table 3.3.3',
    });
    expect(line(member, 'bending', 'RB').result).toMatch(/^21\.5/);
    expect(line(member, 'bending', 'F').result).toMatch(/^1\.0[67]/);
    expect(line(member, 'bending', 'CL').result).toMatch(/^0\.84/);
    expect(line(member, 'slenderness', 'ratio').numbers).toMatch(/^21\.5\d+ \/ 50$/);
  });

  it('give the closed formula of an even load on a simple span, and the analysis for any other', () => {
    const even = memberOf();
    expect(line(even, 'bending', 'M').formula).toBe('w l^2 / 8');
    expect(line(even, 'deflection-live', 'deflection').formula).toBe("5 w l^4 / (384 E' I)");
    const uneven = memberOf({ loads: [{ type: 'point', kind: 'live', at: 60, load: 850 }] });
    expect(line(uneven, 'bending', 'M').formula).toBe('dead + own weight + live');
    expect(line(uneven, 'bending', 'M').note).toMatch(/^from the analysis of the whole member, at \d+'-/);
  });

  it('take dead load by the state of the wood, and say the clause', () => {
    expect(notes(memberOf(), 'deflection-total')).toContain(
      'dead load counts 0.5 times, for seasoned wood kept dry: IBC Table 1604.3 note',
    );
    expect(notes(memberOf({ creep: 'Kcr', service: 'wet' }), 'deflection-total')).toContain(
      'dead load counts 2 times, Kcr of wood wet or not seasoned: NDS 3.5.2',
    );
  });

  it('show how Cb comes, and the bearing length that would just do', () => {
    // NDS 3.10.4: (3.5 + 0.375) / 3.5 = 1.107 at an inner support.
    const member = memberOf({
      beam: { ...simpleSpan(96), spans: [96, 96] },
      bearing: [3.5, 3.5, 3.5],
    });
    expect(line(member, 'bearing', 'Cb')).toMatchObject({
      numbers: '(3.5 in + 0.375 in) / 3.5 in',
      result: '1.1071',
      clause: 'NDS 3.10.4',
    });
    expect(line(member, 'bearing', 'lb needed').formula).toContain('- 0.375 in');
  });

  it('find the bearing length by a typed Cb where one is typed', () => {
    const typedFactors = { Cb: { value: 1.25, reason: 'plate' } };
    const member = memberOf({ typedFactors });
    expect(line(member, 'bearing', 'Cb')).toEqual({ symbol: 'Cb', result: '1.25', note: 'typed: plate' });
    const { numbers, result } = line(member, 'bearing', 'lb needed');
    // 625 psi x 1.25 worked by hand.
    expect(numbers).toContain('781.25 psi');
    expect(Number.parseFloat(result!)).toBeCloseTo(2239.08 / (3 * 781.25), 3);
  });

  it('name the glulam values by their sign, and leave out the greater of CL and CV', () => {
    const member = memberOf({
      beam: simpleSpan(384),
      stock: stockOf('glulam', 'Western species', '24F-1.8E'),
      section: one(6.75, 31.5),
    });
    expect(line(member, 'bending', "Fbx+'").formula).toBe('Fbx+ x CD x CV');
    expect(line(member, 'bending', 'CV').clause).toBe('NDS 5.3.6');
  });

  it('show the reduction of the live load with KLL and AT', () => {
    const member = memberOf({ liveReduction: { area: 600 * 144, KLL: 2 } });
    // ASCE 7 4.7.2 worked by hand: 0.25 + 15 / sqrt(1200) = 0.68301.
    expect(line(member, 'loads', 'L/Lo')).toMatchObject({
      numbers: 'max(0.5, 0.25 + 15 / sqrt(2 x 600 ft2))',
      result: '0.68301',
    });
    expect(line(member, 'bending', 'wL').numbers).toBe('40 psf x 6 ft x 0.68301');
  });

  it('say that a check does not apply, and which rule forbids a section', () => {
    expect(workingsOf(memberOf(), 'notch', 'us').lines).toEqual([{ note: 'does not apply to this member' }]);
    const deep = memberOf({ notch: { left: 5, right: 0 } });
    expect(workingsOf(deep, 'bending', 'us').lines[0]!.note).toContain('NDS 4.4.3');
  });

  it('never show a failing ratio as 1.000', () => {
    expect(line(memberOf(), 'bending', 'ratio')).toMatchObject({
      result: '1.651',
      note: 'more than 1: it fails',
    });
    expect(ratioText(1 + 1e-10)).toBe('1.000');
    expect(ratioText(1 + 2e-9)).toBe('1.000000002');
    expect(ratioText(1.0004)).toBe('1.0004');
    expect(ratioText(Number.POSITIVE_INFINITY)).toBe('untied');
  });
});
