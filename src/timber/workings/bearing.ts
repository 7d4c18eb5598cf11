import { BEARING_MORE } from '../factors/bearing-area.ts';
import { capacityLines } from './capacity.ts';
import { demandOf, SERVICE, type Write } from './check-demand.ts';
import { demandLines } from './demand.ts';
import { governsLines } from './governs.ts';
import { resultLines } from './result.ts';
import type { WorkingLine } from './workings.ts';

/** Bearing, with the length that would just do. */
export const bearing: Write = (work, check) => {
  const { figures: f, member, values, wood, prepared } = work;
  const demand = demandOf(work, 'bearing', 'reaction', 'R');
  const { b, Fcperp } = wood.at;
  const lb = prepared.bearingLength[check.place]!;
  const Cb = prepared.Cb[check.place]!;
  const more = f.size(BEARING_MORE);
  const helped = Cb !== 1 && member.typedFactors?.Cb === undefined;
  const needed = check.bearingNeeded!;
  const typed = member.typedFactors?.Cb?.value;
  const force = `${f.force(demand.value)}${f.forceBy}`;
  const bare = demand.value / (b * Fcperp);
  let need: WorkingLine = {
    formula: "R / (b Fc-perp' without Cb)",
    numbers: `${force} / (${f.size(b)} x ${f.stress(Fcperp)})`,
  };
  if (typed !== undefined) {
    need = {
      formula: "R / (b Fc-perp')",
      numbers: `${force} / (${f.size(b)} x ${f.stress(Fcperp * typed)})`,
    };
  } else if (needed < bare * (1 - 1e-9)) {
    need = { formula: `${need.formula} - ${more}`, numbers: `${need.numbers} - ${more}`, note: 'Cb counted' };
  }
  return [
    { heading: 'section' },
    { symbol: 'b', result: f.size(b) },
    { symbol: 'lb', result: f.size(lb), note: `bearing length at support ${check.place + 1}` },
    ...governsLines(work, 'bearing'),
    { heading: 'demand' },
    ...demandLines(work, demand),
    {
      symbol: 'fc-perp',
      formula: 'R / (b lb)',
      numbers: `${force} / (${f.size(b)} x ${f.size(lb)})`,
      result: f.stress(check.demand),
      clause: 'NDS 3.10.2',
    },
    { heading: 'capacity' },
    ...capacityLines(work, {
      symbol: 'Fc-perp',
      reference: values.Fcperp,
      factors: check.factors,
      formulas: helped
        ? { Cb: { formula: `(lb + ${more}) / lb`, numbers: `(${f.size(lb)} + ${more}) / ${f.size(lb)}` } }
        : {},
      adjusted: check.capacity,
      silent: [...SERVICE, 'CD'],
    }),
    { heading: 'bearing length that would just do' },
    { symbol: 'lb needed', ...need, result: f.size(needed), clause: 'NDS 3.10.2, 3.10.4' },
    ...resultLines(work, check),
  ];
};
