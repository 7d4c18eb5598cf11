import fc from 'fast-check';
import type { AppliedLoad } from '../../../src/loads/loading.ts';
import { isRefusal, lookUp, refusal } from '../../../src/timber/index.ts';
import type { Member, Stock } from '../../../src/timber/member.ts';
import { member as anyMember } from '../../session/arbitrary-member.ts';
import { stockOf } from '../member-of.ts';

type Bought = { readonly stock: Stock; readonly section: Member['section'] };

const one = (width: number, depth: number, plies = 1) => ({ width, depth, plies, flat: false });
const OTHERS: readonly Bought[] = [
  { stock: stockOf('timber', 'Douglas Fir-Larch', 'No.1'), section: one(5.5, 15.5) },
  { stock: stockOf('timber', 'Douglas Fir-Larch', 'No.1'), section: { ...one(5.5, 11.5), flat: true } },
  { stock: stockOf('glulam', 'Western species', '24F-1.8E'), section: one(5.125, 18) },
  { stock: stockOf('glulam', 'Southern Pine', '24F-1.8E'), section: one(6.75, 33) },
  { stock: stockOf('LVL', '', '2.0E'), section: one(1.75, 14, 2) },
  { stock: stockOf('dimension lumber', 'Southern Pine', 'No.2'), section: one(3.5, 13.25) },
  {
    stock: {
      ...stockOf('custom', '', ''),
      values: { Fb: 2000, Fv: 200, Fcperp: 600, E: 1.7e6, Emin: 0.9e6, G: 0.5 },
      valuesFrom: 'report in hand',
    },
    section: one(2.7, 10.3),
  },
];

const TYPED: readonly NonNullable<Member['typedFactors']>[] = [
  { CF: { value: 1.17, reason: 'tested lot' }, Cr: { value: 1.1, reason: 'three together' } },
  { CL: { value: 0.9, reason: 'as the maker says' }, CV: { value: 0.95, reason: 'as the maker says' } },
  { CM: { value: 0.9, reason: 'damp, not wet' }, Cb: { value: 1.2, reason: 'plate' } },
];

/** A load so small that it has no five digits left is none. */
const felt = (load: number) => (Math.abs(load) < 1e-6 ? 0 : load);

function feltLoad(load: AppliedLoad): AppliedLoad {
  return load.type === 'point'
    ? { ...load, load: felt(load.load) }
    : { ...load, start: felt(load.start), end: felt(load.end) };
}

/** Members of every product that no rule forbids, with notches and typed factors among them. */
export const member: fc.Arbitrary<Member> = fc
  .record({
    base: anyMember,
    bought: fc.option(fc.constantFrom(...OTHERS), { nil: null }),
    typed: fc.option(fc.constantFrom(...TYPED), { nil: null, freq: 3 }),
    notch: fc.constantFrom(0, 0, 1),
    bare: fc.boolean(),
  })
  .map(({ base, bought, typed, notch, bare }): Member => {
    const { overhangs, supports, fixed } = base.beam;
    const may = supports === 'bearings' && overhangs.left === 0 && !fixed.left;
    const wood = bought === null ? base : { ...base, ...bought, incised: false };
    const dry = bought === null ? {} : { service: 'dry' as const };
    return {
      ...wood,
      ...dry,
      area: Object.fromEntries(
        Object.entries(base.area).map(([kind, load]) => [kind, felt(load)]),
      ) as Member['area'],
      tributary: felt(base.tributary),
      tiedDown: base.tiedDown?.map(felt) ?? null,
      spacing: base.spacing === null ? null : felt(base.spacing),
      loads: bare ? [] : base.loads.map(feltLoad),
      typedFactors: typed,
      notch: { left: may ? notch : 0, right: 0 },
    };
  })
  .filter((each) => refusal(each) === null && !isRefusal(lookUp(each.stock, each.section)));
