import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crossovers } from '../../../src/explore/crossovers.ts';
import { powersOf } from '../../../src/explore/powers.ts';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { spanToDepthOf } from '../../../src/explore/span-to-depth.ts';
import { pageOf } from '../../../src/explore/workings/index.ts';
import { memberOf } from '../../timber/member-of.ts';
import { member } from '../../timber/workings/any-member.ts';
import { evaluate, meet, printed } from '../../timber/workings/evaluate.ts';

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
              meet(evaluate(numbers), printed(result!)),
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
});
