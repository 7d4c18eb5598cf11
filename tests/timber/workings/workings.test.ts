import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isRefusal, lookUp, reportMember } from '../../../src/timber/index.ts';
import type { Member } from '../../../src/timber/member.ts';
import type { CheckResult } from '../../../src/timber/report.ts';
import { applied } from '../../../src/timber/workings/capacity.ts';
import { ratioText, workingsIds, workingsOf } from '../../../src/timber/workings/index.ts';
import { member } from './any-member.ts';
import { evaluate, leading, meet, widened } from './evaluate.ts';

const UNITS = ['us', 'si'] as const;
const RUNS = { numRuns: 60 };

describe('the workings of any member', () => {
  it('end with the demand and capacity of the report and its very ratio, in US and in SI', () => {
    fc.assert(
      fc.property(member, fc.constantFrom(...UNITS), (each, units) => {
        for (const check of reportMember(each).checks) {
          const last = workingsOf(each, check.id, units).lines.at(-1)!;
          expect(last.symbol).toBe('ratio');
          expect(last.result).toBe(ratioText(check.ratio));
          expect(last.clause).toBe(check.clause);
          if (units === 'us') {
            const [demand, capacity] = last.numbers!.split(' / ').map((text) => leading(text)!);
            expect(meet(demand!, widened(check.demand, 1e-12)), `${check.id} ${last.numbers}`).toBe(true);
            expect(meet(capacity!, widened(check.capacity, 1e-12)), `${check.id} ${last.numbers}`).toBe(true);
          }
          if (!Number.isFinite(check.ratio)) continue;
          // Three decimals and more.
          const printed = [Number(last.result) - 5.1e-4, Number(last.result) + 5.1e-4] as const;
          expect(meet(evaluate(last.numbers!), printed), `${check.id} ${last.numbers}`).toBe(true);
        }
      }),
      RUNS,
    );
  });

  it('hold no line whose numbers do not work out to its result', () => {
    fc.assert(
      fc.property(member, fc.constantFrom(...UNITS), (each, units) => {
        for (const id of workingsIds(each, units)) {
          for (const { symbol, numbers, result } of workingsOf(each, id, units).lines) {
            if (numbers === undefined || symbol === 'ratio') continue;
            const shown = leading(result!);
            expect(shown, `${id} ${symbol} ${result}`).not.toBeNull();
            const worked = evaluate(numbers);
            expect(meet(worked, shown!), `${id}: ${symbol} = ${numbers} = ${result}`).toBe(true);
          }
        }
      }),
      RUNS,
    );
  });

  it('name every factor of the report with its value, its reason and its clause', () => {
    fc.assert(
      fc.property(member, (each) => {
        for (const check of reportMember(each).checks) {
          const { lines } = workingsOf(each, check.id, 'us');
          for (const { symbol, value, reason } of check.factors) {
            const line = lines.find(
              (one) => one.symbol === symbol && [one.note, one.clause].filter(Boolean).join(', ') === reason,
            );
            expect(line, `${check.id} ${symbol}: ${reason}`).toBeDefined();
            expect(meet(leading(line!.result!)!, widened(value, 1e-12)), `${symbol} ${line!.result}`).toBe(
              true,
            );
          }
        }
      }),
      RUNS,
    );
  });

  it('have factors that make the capacity of the report out of the reference value', () => {
    fc.assert(
      fc.property(member, (each) => {
        for (const check of reportMember(each).checks) {
          const reference = referenceOf(each, check);
          if (reference === null) continue;
          const product = applied(check.factors).reduce((value, factor) => value * factor.value, reference);
          expect(product / check.capacity, `${check.id}`).toBeCloseTo(1, 9);
        }
      }),
      RUNS,
    );
  });

  it('show no inch, foot, pound or degree Fahrenheit in SI but in the names of nominal sizes', () => {
    fc.assert(
      fc.property(member, (each) => {
        for (const id of workingsIds(each, 'si')) {
          for (const line of workingsOf(each, id, 'si').lines) {
            const text = Object.values(line)
              .join(' | ')
              .replace(/nominal \d+ in|in\d? nominal/g, '');
            expect(text, id).not.toMatch(/\d (in\d?|ft\d?|psi|psf|plf|lb|ft-lb|F)\b|'-/);
          }
        }
      }),
      RUNS,
    );
  });
});

/** The reference value behind a capacity that is a stress; null for the others. */
function referenceOf({ stock, section }: Member, { id }: CheckResult): number | null {
  const values = lookUp(stock, section);
  if (isRefusal(values)) return null;
  switch (id) {
    case 'shear':
      return values.Fv;
    case 'bending':
      return values.Fb;
    case 'bending-hogging':
      return values.FbNeg;
    case 'bearing':
      return values.Fcperp;
    default:
      return null;
  }
}
