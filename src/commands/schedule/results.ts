import { judge } from '../../explore/judge.ts';
import type { Sized } from '../../explore/rack/sized.ts';
import { ratiosOf } from '../../explore/ratios.ts';
import { harmless, showRatio, toUnit, type Units, weightNumber, weightUnit } from '../../quantity/index.ts';
import { prepare, sizeLabel } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { woodName } from '../../timber/member-words.ts';
import { CHECK_IDS } from '../../timber/report.ts';
import { woodJson } from '../rack.ts';

/** What became of a row. */
export type Outcome =
  | { readonly is: 'bad'; readonly fault: string }
  | { readonly is: 'sized'; readonly sized: Sized; readonly own: Own | null };

/** The size that a row has already, judged as it is. */
export interface Own {
  readonly label: string;
  readonly passes: boolean;
  readonly governing: string | null;
  readonly ratio: number;
}

export function ownSize(member: Member): Own {
  const { passes, governing, worst } = judge(ratiosOf(member));
  const label = sizeLabel(member.section, member.stock.product);
  // What carries nothing does not pass.
  return { label, passes: passes && prepare(member).loaded, governing, ratio: worst };
}

const REACTION_UNIT = { us: 'lb', si: 'kN' } as const;
const REACTION_PLACES = { us: 0, si: 2 } as const;

interface ResultColumn {
  readonly head: (units: Units) => string;
  readonly says: string;
  readonly cell: (outcome: Outcome, units: Units) => string;
}

/** A cell of what was sized; empty in a bad row. */
function ofSized(cell: (sized: Sized, units: Units) => string) {
  return (outcome: Outcome, units: Units) => (outcome.is === 'sized' ? cell(outcome.sized, units) : '');
}

function ofOwn(cell: (own: Own) => string) {
  return (outcome: Outcome) => (outcome.is === 'sized' && outcome.own !== null ? cell(outcome.own) : '');
}

/** What is found out about each row, in the order of its columns. */
export const RESULT_COLUMNS: readonly ResultColumn[] = [
  result(
    'size',
    'the lightest stock size that passes',
    ofSized(({ lightest }) => lightest?.size.label ?? ''),
  ),
  {
    head: () => 'verdict',
    says: 'passes, or what is wrong: the figures are then those of the size that comes nearest',
    cell: verdictText,
  },
  result(
    'made of',
    'the wood of that size',
    ofSized(({ nearest }) => (nearest === null ? '' : woodName(nearest.size.stock))),
  ),
  {
    head: (units) => `weight (${weightUnit(units)})`,
    says: 'of that size',
    cell: ofSized(({ nearest }, units) => (nearest === null ? '' : weightNumber(nearest.weight, units))),
  },
  result(
    'governs',
    'the check with the largest ratio',
    ofSized(({ nearest }) => nearest?.governing ?? ''),
  ),
  result(
    'ratio',
    'that ratio: demand over capacity',
    ofSized(({ nearest }) => (nearest === null ? '' : showRatio(nearest.worst))),
  ),
  ...CHECK_IDS.map((id, at) =>
    result(
      `ratio ${id}`,
      'of that check',
      ofSized(({ nearest }) => {
        const ratio = nearest?.ratios[at] ?? Number.NaN;
        return Number.isNaN(ratio) ? '' : showRatio(ratio);
      }),
    ),
  ),
  reactions('max', 'largest reaction of each support, left to right'),
  reactions('min', 'smallest reaction of each support; below 0 it lifts'),
  result(
    'own size',
    'the size that the row has already',
    ofOwn(({ label }) => label),
  ),
  result(
    'own verdict',
    'whether that size passes',
    ofOwn((own) => (own.passes ? 'passes' : 'fails')),
  ),
  result(
    'own governs',
    'what governs it',
    ofOwn(({ governing }) => governing ?? ''),
  ),
  result(
    'own ratio',
    'its largest ratio',
    ofOwn(({ ratio }) => showRatio(ratio)),
  ),
  result(
    'assumed',
    'what nobody stated',
    ofSized(({ report }) => report.assumptions.join('; ')),
  ),
  result(
    'beware',
    'cautions',
    ofSized(({ report }) => report.cautions.map(({ text }) => text).join(' ')),
  ),
  result('fault', 'what is wrong with a bad row', (outcome) => (outcome.is === 'bad' ? outcome.fault : '')),
];

function result(head: string, says: string, cell: ResultColumn['cell']): ResultColumn {
  return { head: () => head, says, cell };
}

function reactions(which: 'max' | 'min', says: string): ResultColumn {
  return {
    head: (units) => `reactions ${which} (${REACTION_UNIT[units]})`,
    says,
    cell: ofSized(({ nearest, report }, units) => {
      if (nearest === null) return '';
      const number = (value: number) =>
        String(Number(toUnit('pointLoad', value, REACTION_UNIT[units]).toFixed(REACTION_PLACES[units])) + 0);
      return report
        .analysed()
        .reactions.map((reaction) => number(reaction[which]))
        .join('; ');
    }),
  };
}

function verdictText(outcome: Outcome): string {
  if (outcome.is === 'bad') return 'bad row';
  const { lightest, nearest, report } = outcome.sized;
  if (lightest !== null) return 'passes';
  if (nearest === null) return 'no stock size counts';
  if (report.cautions.some(({ id }) => id === 'unloaded')) return 'carries nothing';
  return `no size passes; nearest is ${nearest.size.label}`;
}

/** One row for other programs: lb, in, lb/in; ratios that nothing can meet are null. */
export function resultJson(line: number, name: string, outcome: Outcome): object {
  if (outcome.is === 'bad') return { line, name, fault: harmless(outcome.fault, outcome.fault.length) };
  const { lightest, nearest, report } = outcome.sized;
  const finite = (ratio: number) => (Number.isFinite(ratio) ? ratio : null);
  const figures =
    nearest === null
      ? {}
      : {
          section: {
            label: report.label,
            width: report.width,
            depth: report.depth,
            plies: report.plies,
            weight: report.weight,
          },
          ...woodJson(nearest.size.stock),
          governing: nearest.governing,
          ratios: Object.fromEntries(
            CHECK_IDS.flatMap((id, at) => {
              const ratio = nearest.ratios[at]!;
              return Number.isNaN(ratio) ? [] : [[id, finite(ratio)]];
            }),
          ),
          reactions: report
            .analysed()
            .reactions.map(({ at, byKind, max, min }) => ({ at, byKind, max, min })),
        };
  const { own } = outcome;
  return {
    line,
    name,
    passes: lightest !== null,
    lightest: lightest?.size.label ?? null,
    ...figures,
    ...(own === null ? {} : { own: { ...own, ratio: finite(own.ratio) } }),
    assumptions: report.assumptions,
    cautions: report.cautions,
  };
}
