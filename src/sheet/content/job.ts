import type { Checked } from '../../explore/checked.ts';
import type { SheetKeys } from '../../session/session.ts';
import { CAUTIONS } from '../../timber/index.ts';
import { lengthsText, woodName } from '../../timber/member-words.ts';
import { CHECK_IDS } from '../../timber/report.ts';
import { CHECK_WORD } from '../../timber/words.ts';
import { WORKINGS_WORD } from '../../timber/workings/index.ts';
import type { Job } from '../asked.ts';
import type { Block, Fact, Row, Section } from '../sheet.ts';
import { left, right } from './columns.ts';
import { ratioOf, unloaded } from './member-facts.ts';

/** The entries of a title block, in the order in which they stand. */
export const TITLE_BLOCK: readonly (readonly [keyof SheetKeys, string])[] = [
  ['firm', 'firm'],
  ['job', 'job'],
  ['jobNumber', 'job number'],
  ['by', 'by'],
  ['checkedBy', 'checked by'],
  ['revision', 'revision'],
  ['date', 'date'],
];

/** The first page: every member in a line, then what all of them stand on. */
export function jobSection(job: Job, checked: readonly Checked[], ids: readonly string[]): Section {
  const failing = checked.filter(({ passes }) => !passes);
  const several = checked.length > 1;
  const blocks: Block[] = [
    {
      kind: 'verdict',
      passes: failing.length === 0,
      word: failing.length === 0 ? (several ? 'ALL PASS' : 'PASSES') : several ? 'NOT ALL PASS' : 'FAILS',
      sentence: verdictOf(checked.length, failing),
      facts: [],
    },
    ...notChecked(job),
    memberTable(job, checked, ids),
    { kind: 'heading', text: 'Basis of design' },
    { kind: 'list', items: basisOf(job, checked) },
    { kind: 'heading', text: 'Assumptions' },
    {
      kind: 'list',
      items: shared(checked, ({ report }) => report.assumptions, 'none beside the basis of design'),
    },
    { kind: 'heading', text: 'Cautions' },
    {
      kind: 'list',
      items: [
        ...CAUTIONS.map(({ text }) => text),
        ...shared(checked, ({ report }) => report.cautions.map(({ text }) => text), null),
      ],
    },
  ];
  return { id: 'job', title: job.session.title || 'Untitled job', blocks };
}

function verdictOf(count: number, failing: readonly Checked[]): string {
  if (failing.length === 0) return count === 1 ? 'Every check passes.' : `All ${count} members pass.`;
  const names = failing.slice(0, MOST_NAMES).map(({ member }) => member.name);
  const more = failing.length - names.length;
  const list = `${names.join(', ')}${more > 0 ? ` and ${more} more` : ''}`;
  return count === 1 ? `${list} fails.` : `${failing.length} of ${count} members fail: ${list}.`;
}

/** Names that a sentence takes. */
const MOST_NAMES = 12;

/** What was left out of the checks, where something was. */
function notChecked({ only }: Job): Block[] {
  if (only === null) return [];
  const left = CHECK_IDS.filter((id) => !only.includes(id));
  if (left.length === 0) return [];
  const names = left.map((id) => WORKINGS_WORD[id]).join(', ');
  return [{ kind: 'text', text: `NOT CHECKED: ${names}. Only the checks asked for are in this sheet.` }];
}

function memberTable({ units }: Job, checked: readonly Checked[], ids: readonly string[]): Block {
  return {
    kind: 'table',
    caption: 'Members',
    columns: [
      left('member'),
      right('pieces'),
      left('size'),
      left('wood'),
      left('lengths'),
      right('ratio'),
      left('governs'),
      left('verdict'),
    ],
    rows: checked.map(
      (each, at): Row => ({
        cells: [
          each.member.name,
          String(each.member.count),
          each.report.label,
          woodName(each.member.stock),
          lengthsText(each.member, units),
          ratioOf(each),
          each.governing === null ? 'nothing checked' : CHECK_WORD[each.governing],
          unloaded(each) ? 'no load' : each.passes ? 'passes' : 'FAILS',
        ],
        strong: !each.passes,
        leadsTo: ids[at]!,
      }),
    ),
  };
}

function basisOf({ session }: Job, checked: readonly Checked[]): string[] {
  const sources = [...new Set(checked.map(({ report }) => `${report.source} (${report.status})`))];
  return [
    'Allowable stress design (ASD) by NDS 2018; wood and its adjustment factors as listed for each member.',
    `Load combinations: ${session.combinations} 2.4.1, with load patterns over several spans.`,
    'Deflection limits: IBC Table 1604.3, or as typed for the member.',
    'Linear elastic beams of constant section; every number is that of the program’s checks.',
    ...sources.map((source) => `Design values: ${source}.`),
  ];
}

/** Sentences with the members that they hold for, where they do not hold for all. */
function shared(
  checked: readonly Checked[],
  of: (each: Checked) => readonly string[],
  none: string | null,
): string[] {
  const names = new Map<string, string[]>();
  for (const each of checked) {
    for (const text of of(each)) names.set(text, [...(names.get(text) ?? []), each.member.name]);
  }
  const items = [...names].map(([text, members]) =>
    members.length === checked.length ? text : `${text} (${members.join(', ')})`,
  );
  return items.length === 0 && none !== null ? [none] : items;
}

/** What somebody filled in, and the date that the sheet is given. */
export function titleFacts(keys: SheetKeys, title: string, date: string | null): Fact[] {
  const filled = { ...keys, job: keys.job || title, date: date ?? '' };
  return TITLE_BLOCK.flatMap(([key, label]): Fact[] => {
    const value = filled[key];
    return value === undefined || value.trim() === '' ? [] : [[label, value]];
  });
}
