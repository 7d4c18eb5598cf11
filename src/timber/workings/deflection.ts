import type { CheckResult } from '../report.ts';
import { capacityLines } from './capacity.ts';
import { demandOf, SERVICE, type Write } from './check-demand.ts';
import { demandLines } from './demand.ts';
import { plain } from './figures.ts';
import { governsLines } from './governs.ts';
import { resultLines } from './result.ts';
import { sectionLines } from './section.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** Live or total deflection. */
export const deflection =
  (id: 'deflection-live' | 'deflection-total'): Write =>
  (work, check) => {
    const { member, values, wood, prepared } = work;
    const demand = demandOf(work, id, 'deflection', 'deflection');
    const live = id === 'deflection-live';
    const dead = live
      ? `without dead load: of ${demand.combination.label} its variable part, ${demand.combination.variable}`
      : deadText(work, demand.deadFactor);
    const index = prepared.fields[demand.place]!;
    return [
      ...sectionLines(work, ['inertia']),
      { heading: 'stiffness' },
      ...capacityLines(work, {
        symbol: 'E',
        reference: values.E,
        factors: check.factors,
        adjusted: wood.at.E,
        silent: [...SERVICE, 'CD'],
      }),
      ...governsLines(work, id),
      { heading: 'demand' },
      { note: dead },
      ...demandLines(work, demand),
      { heading: 'limit' },
      limitLine(work, check, live ? member.limits.live : member.limits.total, index.kind === 'overhang'),
      ...resultLines(work, check),
    ];
  };

function deadText({ member }: Work, factor: number): string {
  const state =
    member.seasoned && member.service === 'dry' ? 'seasoned wood kept dry' : 'wood wet or not seasoned';
  return member.creep === 'Kcr'
    ? `dead load counts ${plain(factor)} times, Kcr of ${state}: NDS 3.5.2`
    : `dead load counts ${plain(factor)} times, for ${state}: IBC Table 1604.3 note`;
}

function limitLine(work: Work, check: CheckResult, n: number, overhang: boolean): WorkingLine {
  const { figures: f, member, prepared } = work;
  const most = check.id === 'deflection-live' ? member.limits.liveMax : null;
  const limit = prepared[check.id === 'deflection-live' ? 'liveLimit' : 'totalLimit'][check.place]!;
  // A stated length that is the lesser hides the span's own limit.
  const { length } = prepared.fields[check.place]!;
  const sloped = length * Math.sqrt(1 + member.slope ** 2) * (overhang ? 2 : 1);
  const part = `${f.size(sloped)} / ${plain(n)}`;
  const notes = [
    overhang ? 'l twice the length of the overhang, IBC Table 1604.3 note' : '',
    member.slope === 0 ? '' : 'l along the slope',
  ].filter((text) => text !== '');
  return {
    symbol: 'limit',
    formula: most === null ? `l / ${plain(n)}` : `min(l / ${plain(n)}, ${f.size(most)})`,
    numbers: most === null ? part : `min(${part}, ${f.size(most)})`,
    result: f.size(limit),
    clause: 'IBC Table 1604.3',
    ...(notes.length > 0 ? { note: notes.join('; ') } : {}),
  };
}
