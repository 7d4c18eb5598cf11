import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Link } from '../../../src/loads/index.ts';
import { beamLength } from '../../../src/statics/index.ts';
import { reportMember } from '../../../src/timber/index.ts';
import type { Member } from '../../../src/timber/member.ts';
import { ratioText, workingsIds, workingsOf } from '../../../src/timber/workings/index.ts';
import { runs } from '../../support/runs.ts';
import { member } from './any-member.ts';
import { evaluate, leading, meet } from './evaluate.ts';

/** Members that carry others, which press and lift by their own patterns. */
const carrier = member.chain((on) => {
  const whole = beamLength(on.beam);
  const force = fc.integer({ min: -300, max: 1500 });
  const link = fc
    .record({
      a: fc.integer({ min: 0, max: 10 }),
      b: fc.integer({ min: 0, max: 10 }),
      dead: force,
      one: force,
      other: force,
    })
    .map(({ a, b, dead, one, other }): Link => {
      const bears = {
        dead: { max: dead, min: dead },
        live: { max: Math.max(one, other), min: Math.min(one, other) },
      };
      const named = { member: 'J1', end: 'left', bears } as const;
      if (a === b) return { ...named, type: 'point', at: (a / 10) * whole };
      const [from, to] = [Math.min(a, b), Math.max(a, b)].map((each) => (each / 10) * whole) as [
        number,
        number,
      ];
      return { ...named, type: 'line', every: 16, from, to };
    });
  return fc.array(link, { minLength: 1, maxLength: 3 }).map((links): Member => ({ ...on, links }));
});

describe('the workings of a member that carries others', () => {
  it('work out line by line and end with the ratio of the report', () => {
    fc.assert(
      fc.property(carrier, fc.constantFrom('us' as const, 'si' as const), (each, units) => {
        for (const check of reportMember(each).checks) {
          expect(workingsOf(each, check.id, units).lines.at(-1)!.result).toBe(ratioText(check.ratio));
        }
        for (const id of workingsIds(each, units)) {
          for (const { symbol, numbers, result } of workingsOf(each, id, units).lines) {
            if (numbers === undefined || symbol === 'ratio') continue;
            expect(
              meet(evaluate(numbers), leading(result!)!),
              `${id}: ${symbol} = ${numbers} = ${result}`,
            ).toBe(true);
          }
        }
      }),
      { numRuns: runs(60) },
    );
  });

  it('name the source of every part, the least beside the most where patterns turn it', () => {
    const bears = { live: { max: 320, min: -40 } };
    const links: Link[] = [{ member: 'J1', end: 'right', bears, type: 'line', every: 16, from: 0, to: 168 }];
    const [on] = fc.sample(member, { numRuns: 1, seed: 1 }) as [Member];
    const { lines } = workingsOf({ ...on, links }, 'loads', 'us');
    const at = lines.findIndex(({ heading }) => heading === 'J1 right end every 16"');
    expect(lines.slice(at + 1, at + 3)).toMatchObject([
      { symbol: 'wL', numbers: '320 lb / 1.3333 ft', result: '240 plf', note: 'live at the most' },
      { symbol: 'wL', numbers: '-40 lb / 1.3333 ft', result: '-30 plf', note: 'at the least' },
    ]);
  });
});
