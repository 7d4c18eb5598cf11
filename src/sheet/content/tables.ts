import type { Checked } from '../../explore/checked.ts';
import { checkedMember } from '../../explore/checked.ts';
import { powersOf } from '../../explore/powers.ts';
import { BEST_WORD } from '../../explore/rack/best.ts';
import { gradeWord, hasSize } from '../../explore/rack/rack.ts';
import { rankedRack } from '../../explore/rack/ranked.ts';
import { stopsWord } from '../../explore/rack/stops-word.ts';
import { KIND_LETTER, LOAD_KINDS } from '../../loads/index.ts';
import { showQuantity, showRatio, showSpan, weightNumber, weightUnit } from '../../quantity/index.ts';
import { rankingOf } from '../../session/index.ts';
import type { SessionMember } from '../../session/session.ts';
import { lengthsText, measuredText, placeText, woodName } from '../../timber/member-words.ts';
import { CHECK_IDS, PASS_LIMIT } from '../../timber/report.ts';
import { CHECK_WORD } from '../../timber/words.ts';
import { factorText } from '../../timber/workings/figures.ts';
import { WORKINGS_WORD } from '../../timber/workings/index.ts';
import type { Job } from '../asked.ts';
import type { Block, Row } from '../sheet.ts';
import { left, right } from './columns.ts';
import { ratioOf } from './member-facts.ts';

const ALL_SPANS = 'all spans';

/** Every check in a line: demand, capacity, ratio, what brings it and where. */
export function checkTable({ units }: Job, { checks, governing }: Checked): Block[] {
  if (checks.length === 0) return [];
  // On a single span there are no patterns to tell apart.
  const patterns = checks.some(({ pattern }) => pattern !== '' && pattern !== ALL_SPANS);
  const rows = [...checks]
    .sort((a, b) => CHECK_IDS.indexOf(a.id) - CHECK_IDS.indexOf(b.id))
    .map((each): Row => {
      const governs = each.id === governing;
      return {
        cells: [
          WORKINGS_WORD[each.id],
          measuredText(each, each.demand, units),
          measuredText(each, each.capacity, units),
          showRatio(each.ratio),
          each.ratio > PASS_LIMIT ? 'FAILS' : governs ? 'governs' : 'passes',
          each.combination,
          ...(patterns ? [each.pattern] : []),
          placeText(each, units),
          each.clause,
        ],
        strong: governs,
        check: each.id,
      };
    });
  const columns = [
    left('check'),
    right('demand'),
    right('capacity'),
    right('ratio'),
    left('verdict'),
    left('loads'),
    ...(patterns ? [left('pattern')] : []),
    left('at'),
    left('clause'),
  ];
  return [{ kind: 'table', caption: 'Checks', columns, rows }];
}

/** The adjustment factors with their reasons, each once, with the checks that it stands in. */
export function factorTable({ checks }: Checked): Block[] {
  const found = new Map<string, { readonly cells: readonly string[]; readonly checks: string[] }>();
  for (const check of checks) {
    for (const { symbol, value, reason } of check.factors) {
      const key = `${symbol} ${value} ${reason}`;
      const factor = found.get(key) ?? { cells: [symbol, factorText(value), reason], checks: [] };
      factor.checks.push(WORKINGS_WORD[check.id]);
      found.set(key, factor);
    }
  }
  if (found.size === 0) return [];
  return [
    {
      kind: 'table',
      caption: 'Adjustment factors; those not listed are 1',
      columns: [left('factor'), right('value'), left('reason'), left('in')],
      rows: [...found.values()].map((each) => ({ cells: [...each.cells, each.checks.join(', ')] })),
    },
  ];
}

export function reactionTable({ units }: Job, { report }: Checked): Block[] {
  const { reactions } = report.analysed();
  const kinds = LOAD_KINDS.filter((kind) => reactions.some(({ byKind }) => byKind[kind] !== undefined));
  const force = (value: number) => showQuantity('pointLoad', value, units);
  return [
    {
      kind: 'table',
      caption:
        'Reactions: each kind’s whole load on all spans without factors (own weight in D), then largest and smallest of all combinations and patterns',
      columns: [
        left('support'),
        left('at'),
        ...kinds.map((kind) => right(KIND_LETTER[kind])),
        right('largest'),
        right('smallest'),
      ],
      rows: reactions.map(({ support, at, byKind, max, min }) => ({
        cells: [
          `R${support + 1}`,
          showSpan(at, units),
          ...kinds.map((kind) => force(byKind[kind] ?? 0)),
          force(max),
          min < 0 ? `${force(min)} (uplift)` : force(min),
        ],
      })),
    },
  ];
}

/** Sizes on either side of the one chosen. */
const AROUND = 4;

/** The rack around the chosen size, and the best size wherever that is. */
export function rackTable({ session, units }: Job, { member }: Checked): Block[] {
  const ranking = rankingOf(session);
  const rack = rankedRack(member, ranking);
  const { sizes, lit, best, woods } = rack;
  if (sizes.length === 0) return [];
  const chosen = sizes.findIndex(({ size }) => hasSize(member, size));
  const middle = chosen >= 0 ? chosen : Math.max(lit, 0);
  const shown = sizes
    .map((size, at) => ({ size, at }))
    .filter(({ at }) => Math.abs(at - middle) <= AROUND || at === lit);
  const columns = [
    left('size'),
    ...(woods.length > 1 ? [left('wood')] : []),
    right(weightUnit(units)),
    right('shear'),
    right('bending'),
    right('deflection'),
    right('worst'),
    left('what stops it'),
    left(''),
  ];
  const rows = shown.map(({ size: each, at }): Row => {
    const powers = each.refused === null ? powersOf(each.ratios) : [];
    const mark = [at === chosen ? 'chosen' : '', at === lit ? BEST_WORD[best] : ''].filter(
      (word) => word !== '',
    );
    return {
      cells: [
        each.size.label,
        ...(woods.length > 1 ? [gradeWord(each.size.stock)] : []),
        weightNumber(each.weight, units),
        ...[0, 1, 2].map((power) => {
          const ratio = powers[power]?.ratio ?? null;
          return ratio === null ? '' : showRatio(ratio);
        }),
        each.refused === null ? showRatio(each.worst) : '',
        stopsWord(each, units),
        mark.join(', '),
      ],
      strong: at === chosen || at === lit,
    };
  });
  const all = chosen < 0 ? 'the chosen size is none of them' : `${sizes.length} in all`;
  return [
    { kind: 'heading', text: 'Stock sizes' },
    {
      kind: 'table',
      caption: `Stock sizes around the chosen one, ${BEST_WORD[best]} first (${all})`,
      columns,
      rows,
    },
  ];
}

/** The designs set aside, beside the one at hand. */
export function pinTable(job: Job, { pins = [] }: SessionMember, checked: Checked): Block[] {
  if (pins.length === 0) return [];
  const row = (name: string, each: Checked): Row => ({
    cells: [
      name,
      each.report.label,
      woodName(each.member.stock),
      lengthsText(each.member, job.units),
      weightNumber(each.report.weight, job.units),
      ratioOf(each),
      each.governing === null ? '' : CHECK_WORD[each.governing],
      each.passes ? 'passes' : 'FAILS',
    ],
  });
  const notes = pins.flatMap(({ note }, at) => (note === '' ? [] : [`pin ${at + 1}: ${note}`]));
  return [
    { kind: 'heading', text: 'Designs compared' },
    {
      kind: 'table',
      caption: 'Designs set aside, beside the one at hand',
      columns: [
        left('design'),
        left('size'),
        left('wood'),
        left('lengths'),
        right(weightUnit(job.units)),
        right('ratio'),
        left('governs'),
        left('verdict'),
      ],
      rows: [
        row('this one', checked),
        ...pins.map((pin, at) => row(`pin ${at + 1}`, checkedMember(pin.member, job.only, job.units))),
      ],
    },
    ...(notes.length === 0 ? [] : [{ kind: 'list' as const, items: notes }]),
  ];
}
