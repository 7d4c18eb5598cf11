import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crossovers } from '../../src/explore/crossovers.ts';
import { exponentsOf, IDEAL } from '../../src/explore/exponents.ts';
import { powersOf, standsTo } from '../../src/explore/powers.ts';
import { ratiosOf } from '../../src/explore/ratios.ts';
import { reportMember } from '../../src/timber/index.ts';
import type { CheckId } from '../../src/timber/report.ts';
import { memberOf } from '../support/session.ts';

const simple = fc.record({
  span: fc.double({ min: 48, max: 360, noNaN: true }),
  depth: fc.constantFrom(3.5, 5.5, 7.25, 9.25, 11.25, 13.25),
  plies: fc.integer({ min: 1, max: 4 }),
  tributary: fc.double({ min: 12, max: 240, noNaN: true }),
  dead: fc.double({ min: 1, max: 60, noNaN: true }),
  live: fc.double({ min: 10, max: 150, noNaN: true }),
});

function member(
  of: { span: number; depth: number; plies: number; tributary: number; dead: number; live: number },
  selfWeight = false,
) {
  return memberOf({
    spans: [`${of.span} in`],
    tributary: `${of.tributary} in`,
    area: { dead: `${of.dead} psf`, live: `${of.live} psf` },
    section: { width: '1.5 in', depth: `${of.depth} in`, plies: of.plies },
    selfWeight,
  });
}

const check = (report: ReturnType<typeof reportMember>, id: CheckId) =>
  report.checks.find((each) => each.id === id)!;

describe('the three powers of a uniform load on a simple span', () => {
  it('are shear 0.75 w/b (l/h), bending 0.75 w/b (l/h)^2 and deflection 0.15625 wd/(b E) (l/h)^3, to 1e-12', () => {
    // Textbook forms: fv = 1.5V/(bd) with V = wl/2, fb = M/S with M = wl²/8, Δ = 5wl⁴/384EI.
    fc.assert(
      fc.property(simple, (of) => {
        const report = reportMember(member(of));
        const b = 1.5 * of.plies;
        const proportion = of.span / of.depth;
        const w = ((of.dead + of.live) / 144) * of.tributary;
        const wd = (of.live / 144) * of.tributary;
        const E = 1.6e6;
        expect(check(report, 'shear').demand / (0.75 * (w / b) * proportion)).toBeCloseTo(1, 12);
        expect(check(report, 'bending').demand / (0.75 * (w / b) * proportion ** 2)).toBeCloseTo(1, 12);
        const sag = check(report, 'deflection-live').demand / of.span;
        expect(sag / (0.15625 * (wd / (b * E)) * proportion ** 3)).toBeCloseTo(1, 12);
      }),
    );
  });

  it('have a tenth of CV in the bending of a glulam: its length, depth and width each by the tenth root', () => {
    // NDS 5.3.6: CV = (21/L)^(1/10) (12/d)^(1/10) (5.125/b)^(1/10), under 1 here, on the integers of the law.
    const glulam = memberOf({
      spans: ['24 ft'],
      tributary: '8 ft',
      stock: { product: 'glulam', species: 'Western species', grade: '24F-1.8E' },
      section: { width: '6.75 in', depth: '18 in' },
      selfWeight: false,
    });
    const bending = exponentsOf(glulam).bending!;
    expect(bending.span).toBeCloseTo(2.1, 6);
    expect(bending.depth).toBeCloseTo(-1.9, 6);
    expect(bending.width).toBeCloseTo(-0.9, 6);
    expect(bending.load).toBeCloseTo(1, 6);
  });

  it('have the integers for local exponents where own weight is off', () => {
    fc.assert(
      fc.property(simple, (of) => {
        const exponents = exponentsOf(member(of));
        for (const [id, power] of [
          ['shear', 1],
          ['bending', 2],
          ['deflection-live', 3],
        ] as const) {
          for (const quantity of ['span', 'depth', 'width', 'load'] as const) {
            expect(exponents[id]![quantity]).toBeCloseTo(IDEAL[power][quantity], 7);
          }
        }
      }),
    );
  });

  it("cross at Fb'/Fv' and at 4.8 (w/wd) E'/(n Fb')", () => {
    fc.assert(
      fc.property(simple, (of) => {
        const one = member(of);
        const report = reportMember(one);
        const [shear, bending] = powersOf(ratiosOf(one)).map((power) => power.ratio!);
        const live = check(report, 'deflection-live');
        const met = crossovers(of.span / of.depth, shear!, bending!, live.ratio);
        const Fb = check(report, 'bending').capacity;
        const Fv = check(report, 'shear').capacity;
        expect(met.shearToBending! / (Fb / Fv)).toBeCloseTo(1, 10);
        expect(
          met.bendingToDeflection! / ((4.8 * ((of.dead + of.live) / of.live) * 1.6e6) / (360 * Fb)),
        ).toBeCloseTo(1, 10);
        expect(met.shearToDeflection).toBeCloseTo(
          Math.sqrt(met.shearToBending! * met.bendingToDeflection!),
          8,
        );
      }),
    );
  });

  it('has null crossovers where a check is absent', () => {
    expect(crossovers(15, 0, 1, 1)).toEqual({
      shearToBending: null,
      bendingToDeflection: 15,
      shearToDeflection: null,
    });
  });

  it('stands to the l/h at which its law gives 1', () => {
    expect(standsTo(16, 0.4, 1)).toBeCloseTo(40, 12);
    expect(16 * (standsTo(16, 1.28, 2) / 16) ** 1).toBeCloseTo(16 / Math.sqrt(1.28), 12);
    expect(standsTo(16, 0.64, 3)).toBeCloseTo(16 / 0.64 ** (1 / 3), 12);
  });
});

describe('local exponents', () => {
  it("are those of the contract's example member, own weight bending them", () => {
    // (2) 2x12 Douglas Fir-Larch No.2, 14 ft, 6 ft of 12 + 40 psf: own weight is 7.88 of 319.88 plf.
    const { span, depth, width, load } = exponentsOf(memberOf({})).bending!;
    expect(span).toBeCloseTo(2, 6);
    expect(depth).toBeCloseTo(-1.975, 3);
    expect(width).toBeCloseTo(-0.975, 3);
    expect(load).toBeCloseTo(0.975, 3);
  });

  it('agree with finite differences of the full check away from steps', () => {
    fc.assert(
      fc.property(simple, fc.constantFrom('ends', '30 in', 'continuous'), (of, bracing) => {
        const base = { ...of };
        const build = (part: Partial<typeof of>) => {
          const m = { ...base, ...part };
          return memberOf({
            spans: [`${m.span} in`],
            tributary: `${m.tributary} in`,
            area: { dead: `${m.dead} psf`, live: `${m.live} psf` },
            section: { width: '1.5 in', depth: `${m.depth} in`, plies: m.plies },
            bracing,
          });
        };
        const exponents = exponentsOf(build({}));
        const h = 1e-4;
        const at = (factor: number) => ratiosOf(build({ span: of.span * factor }))[1]!;
        const slope = Math.log(at(1 + h) / at(1 - h)) / Math.log((1 + h) / (1 - h));
        expect(Math.abs(exponents.bending!.span - slope)).toBeLessThan(1e-4);
      }),
      { numRuns: 50 },
    );
  });
});
