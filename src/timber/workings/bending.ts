import { governingTerm } from '../checks/governing-term.ts';
import { BENDING, HOGGING } from '../checks/rate.ts';
import { sizeRule } from '../checks/wood.ts';
import { TIMBER_DEPTH } from '../factors/size.ts';
import { BASE_DEPTH, BASE_LENGTH, BASE_WIDTH, volumeRoot, WIDEST } from '../factors/volume.ts';
import { CHECK_IDS } from '../report.ts';
import { pieceWidth } from '../standing.ts';
import { capacityLines } from './capacity.ts';
import { demandOf, SERVICE, type Write } from './check-demand.ts';
import { demandLines } from './demand.ts';
import { governsLines } from './governs.ts';
import { resultLines } from './result.ts';
import { sectionLines } from './section.ts';
import { type Edge, isUnbraced, stabilityLines } from './stability.ts';
import type { Work } from './work.ts';

/** The formulas behind CF of timbers and CV. */
function bendingFormulas(work: Work, edge: Edge) {
  const { figures: f, member, wood } = work;
  const { at, rules } = wood;
  const formulas: Record<string, { formula: string; numbers: string }> = {};
  const wide = pieceWidth(at, member.stock.product);
  const typed = member.typedFactors ?? {};
  const { grade } = wood.candidates[at.row]!;
  if (sizeRule(member.stock, grade) === 'timber' && wide > TIMBER_DEPTH && typed.CF === undefined) {
    const numbers = `(${f.size(TIMBER_DEPTH)} / ${f.size(wide)})^(1/9)`;
    formulas.CF = { formula: `(${f.size(TIMBER_DEPTH)} / d)^(1/9)`, numbers };
  }
  if (rules.volume === 'none' || typed.CV !== undefined) return formulas;
  const depth = [`(${f.size(BASE_DEPTH)} / `, ')^(1/'];
  const x = volumeRoot(rules.volume);
  const part = (base: string, value: string) => `(${base} / ${value})^(1/${x})`;
  if (rules.volume === 'LVL') {
    formulas.CV = {
      formula: `min(1, ${depth[0]}d${depth[1]}${x}))`,
      numbers: `min(1, ${part(f.size(BASE_DEPTH), f.size(at.d))})`,
    };
    return formulas;
  }
  const L = governingTerm(work.prepared, wood, edge.hogging ? HOGGING : BENDING, edge.group).length;
  const width = Math.min(at.flat ? at.depth : at.width, WIDEST);
  const [length, deep, broad] = [f.span(BASE_LENGTH * FOOT), f.size(BASE_DEPTH), f.size(BASE_WIDTH)];
  formulas.CV = {
    formula: `min(1, ${part(length, 'L')} ${part(deep, 'd')} ${part(broad, 'b')})`,
    numbers: `min(1, ${part(length, f.span(L))} x ${part(deep, f.size(at.d))} x ${part(broad, f.size(width))})`,
  };
  return formulas;
}

const FOOT = 12;

/** Bending, sagging or hogging. */
export const bending =
  (hogging: boolean): Write =>
  (work, check) => {
    const { figures: f, prepared, values, wood, member } = work;
    const id = hogging ? 'bending-hogging' : 'bending';
    const demand = demandOf(work, id, 'moment', 'M');
    const edge: Edge = {
      set: hogging ? prepared.hogging : prepared.sagging,
      group: work.groups[CHECK_IDS.indexOf(id)]!,
      hogging,
    };
    const glulam = member.stock.product === 'glulam';
    let symbol = 'Fb';
    if (glulam) symbol = hogging ? 'Fbx-' : 'Fbx+';
    const reference = hogging ? values.FbNeg : values.Fb;
    const unbraced = isUnbraced(work, edge) && member.typedFactors?.CL === undefined;
    return [
      ...sectionLines(work, ['modulus']),
      ...governsLines(work, id),
      { heading: 'demand' },
      ...demandLines(work, demand),
      {
        symbol: 'fb',
        formula: 'M / S',
        numbers: `${f.moment(demand.value)}${f.momentBy} / ${f.modulus(wood.at.modulus)}`,
        result: f.stress(check.demand),
        clause: 'NDS 3.3.2',
      },
      ...(unbraced ? stabilityLines(work, edge, symbol, reference, check.factors) : []),
      { heading: 'capacity' },
      ...capacityLines(work, {
        symbol,
        reference,
        factors: check.factors,
        formulas: bendingFormulas(work, edge),
        adjusted: check.capacity,
        silent: [...SERVICE, 'Cr'],
      }),
      ...resultLines(work, check, `${symbol}'`),
    ];
  };
