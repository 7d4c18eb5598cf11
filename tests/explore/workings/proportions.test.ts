import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crossovers } from '../../../src/explore/crossovers.ts';
import { powersOf } from '../../../src/explore/powers.ts';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { spanToDepthOf } from '../../../src/explore/span-to-depth.ts';
import { PROPORTION_IDS, pageIds, pageOf } from '../../../src/explore/workings/index.ts';
import { memberOf, simpleSpan } from '../../timber/member-of.ts';
import { member } from '../../timber/workings/any-member.ts';
import { evaluate, leading, meet } from '../../timber/workings/evaluate.ts';

const PROPORTIONS = ['l/h', 'crossovers', 'exponents'] as const;

describe('the workings of proportions', () => {
  it('work out line by line for any member', () => {
    fc.assert(
      fc.property(member, fc.constantFrom('us' as const, 'si' as const), (each, units) => {
        for (const id of PROPORTIONS) {
          for (const { symbol, numbers, result } of pageOf(each, id, units).lines) {
            for (const text of [numbers, result]) expect(text ?? '').not.toMatch(/NaN|Infinity/);
            if (numbers === undefined) continue;
            expect(
              meet(evaluate(numbers), leading(result!)!),
              `${id} ${symbol} = ${numbers} = ${result}`,
            ).toBe(true);
          }
        }
      }),
      { numRuns: 60 },
    );
  });

  it('end the crossovers in those of the screen', () => {
    const each = memberOf();
    const [shear, bending, deflection] = powersOf(ratiosOf(each)).map(({ ratio }) => ratio!);
    const found = crossovers(spanToDepthOf(each), shear!, bending!, deflection!);
    const { lines } = pageOf(each, 'crossovers', 'us');
    const shown = (symbol: string) => Number(lines.find((line) => line.symbol === symbol)!.result);
    expect(shown('shear to bending')).toBeCloseTo(found.shearToBending!, 3);
    expect(shown('bending to deflection')).toBeCloseTo(found.bendingToDeflection!, 3);
    // Fb'/Fv' of a uniform load on a simple span: 900 / 180.
    expect(shown('shear to bending')).toBe(5);
  });

  it('lead from the power law to the reach, where the worst ratio is 1', () => {
    const each = memberOf({ beam: simpleSpan(168) });
    const { lines } = pageOf(each, 'reach', 'us');
    const of = (symbol: string) => lines.find((line) => line.symbol === symbol)!;
    expect(of('worst ratio there').result).toBe('1.000');
    expect(of('worst ratio there').note).toBe('any longer bending stops it');
    // 14 ft x 1.651^(-1/2) by hand: 10.895 ft.
    expect(Number.parseFloat(of('by the power law alone').result!)).toBeCloseTo(10.895, 2);
    expect(Number.parseFloat(of('reach').result!)).toBeCloseTo(10.895, 0);
  });

  it('name the lit size and what stops the lighter ones', () => {
    const { lines } = pageOf(memberOf(), 'rack', 'us');
    const at = lines.findIndex(({ symbol }) => symbol === 'lit');
    expect(lines[at]!.note).toContain('worst ratio 0.');
    expect(lines.slice(at + 2).length).toBeGreaterThan(3);
    for (const { note } of lines.slice(at + 2)) expect(note).not.toBe('');
  });

  it('are pages of every member that no rule forbids, and of no other', () => {
    expect(pageIds(memberOf(), 'us')).toEqual(expect.arrayContaining([...PROPORTION_IDS]));
    expect(pageIds(memberOf({ notch: { left: 5, right: 0 } }), 'us')).toEqual(['design values']);
  });
});
