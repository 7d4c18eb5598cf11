import { isQuick } from '../explore/is-quick.ts';
import type { Judgement } from '../explore/judge.ts';
import { allCarriers, endText, type Landing, linksOf, whoLoses } from '../explore/links/index.ts';
import { showInches, showRatio, showSpan, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { sectionWeight, shortWood, sizeLabel, standingDepth, standingWidth } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import { MEMBERS_BINDINGS } from './members-keys.ts';
import type { MemberSort, MembersMode } from './mode.ts';
import type { Question } from './panels/prompt.ts';
import type { TableColumn, TableRow } from './panels/table.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import type { FootView } from './view.ts';

export interface MembersView {
  /** How many there are and what is listed of them. */
  readonly status: string;
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
  /** Index of the row in hand; -1 where nothing is listed. */
  readonly inHand: number;
  /** Who carries whom, of the member in hand; who loses what while it is asked whether it shall go. */
  readonly notes: readonly string[];
  readonly foot: readonly FootView[];
  /** What is typed, or asked; null while nothing is. */
  readonly question: Question | null;
}

/** Members worked out in one go, so that no key waits long; one that takes long counts as several. */
const AT_ONCE = 30;
const SLOW = 5;

/** The list with the next members worked out, those nearest to the one in hand first. */
export function withJudged(state: State, mode: MembersMode): MembersMode {
  const { members } = state.session;
  const { judged: known } = mode;
  const ranking = rankingOf(state.session);
  const nearest = members
    .map(({ member }, at) => ({ member, away: Math.abs(at - state.member) }))
    .filter(({ member }) => !known.has(member))
    .sort((a, b) => a.away - b.away);
  if (nearest.length === 0) return mode;
  // What is gone is let go.
  const judged = new Map(
    members.flatMap(({ member }) => (known.has(member) ? [[member, known.get(member)!] as const] : [])),
  );
  let room = AT_ONCE;
  for (const { member } of nearest) {
    if (room <= 0) break;
    room -= isQuick(member) ? 1 : SLOW;
    const { passes, governing, worst } = answerOf(member, ranking);
    judged.set(member, { passes, governing, worst });
  }
  return { ...mode, judged };
}

/** How many members are still to be worked out. */
export function unjudged(state: State, { judged }: MembersMode): number {
  return state.session.members.filter(({ member }) => !judged.has(member)).length;
}

/** The list with what a key has changed worked out; where much is, that waits until no key does. */
export function withChanged(state: State, mode: MembersMode): MembersMode {
  return unjudged(state, mode) > AT_ONCE ? mode : withJudged(state, mode);
}

/** Indices of the members that are listed, in the order of the list. */
export function listed(state: State, mode: MembersMode): number[] {
  const words = mode.filter.toLowerCase().split(/\s+/).filter(Boolean);
  const { members } = state.session;
  const found = members.flatMap(({ member }, at) => (holds(member, mode, words) ? [at] : []));
  const { sort } = mode;
  if (sort === 'file') return found;
  const of = (at: number) => members[at]!.member;
  if (sort === 'name') {
    const { compare } = new Intl.Collator('en', { numeric: true });
    return found.sort((a, b) => compare(of(a).name, of(b).name));
  }
  const key = new Map(found.map((at) => [at, SORT_KEY[sort](of(at), mode)]));
  return found.sort((a, b) => key.get(b)! - key.get(a)!);
}

/** The greatest first; what is not worked out yet last. */
const SORT_KEY: Readonly<
  Record<Exclude<MemberSort, 'file' | 'name'>, (member: Member, mode: MembersMode) => number>
> = {
  ratio: (member, { judged }) => judged.get(member)?.worst ?? Number.NEGATIVE_INFINITY,
  // Depth counts before width: no width is a thousandth as much.
  size: ({ section }) => standingDepth(section) + standingWidth(section) / 1000,
  weight: (member) => sectionWeight(member, member.section),
};

const SORT_WORD: Readonly<Record<MemberSort, string>> = {
  file: 'in the order of the file',
  name: 'by name',
  ratio: 'by ratio, the highest first',
  size: 'by depth, the deepest first',
  weight: 'by weight, the heaviest first',
};

function holds(member: Member, { judged }: MembersMode, words: readonly string[]): boolean {
  if (words.length === 0) return true;
  const text = [
    member.name,
    member.note,
    sizeOf(member),
    shortWood(member.stock),
    ...stands(judged.get(member)),
  ]
    .join(' ')
    .toLowerCase();
  return words.every((word) => text.includes(word));
}

function sizeOf({ section, stock }: Member): string {
  return sizeLabel(section, stock.product);
}

/** What governs, the ratio and the verdict; empty while it is not worked out. */
function stands(judgement: Judgement | undefined): readonly [string, string, string] {
  if (judgement === undefined) return ['', '', ''];
  const { governing, worst, passes } = judgement;
  const verdict = passes ? 'passes' : 'FAILS';
  if (governing === null) return ['nothing', '', verdict];
  return [CHECK_WORD[governing], showRatio(worst), verdict];
}

function columnsOf(units: Units): readonly TableColumn[] {
  return [
    { head: 'member', align: 'left', least: 8 },
    { head: 'note', align: 'left', spare: 1, least: 12 },
    { head: 'size', align: 'left', least: 17 },
    { head: 'wood', align: 'left', spare: 6, least: 10 },
    { head: 'spans', align: 'left', spare: 5, least: 8 },
    { head: weightUnit(units), align: 'right', spare: 4 },
    { head: 'governs', align: 'left', least: 11 },
    { head: 'ratio', align: 'right' },
    { head: '', align: 'left', least: 6 },
    { head: 'count', align: 'right', spare: 7 },
    { head: 'carries', align: 'left', spare: 3, least: 10 },
    { head: 'carried by', align: 'left', spare: 2, least: 10 },
  ];
}

const VERDICT = 8;

export function membersView(state: State, mode: MembersMode): MembersView {
  const { members } = state.session;
  const units = unitsOf(state);
  const order = listed(state, mode);
  const carriers = allCarriers(state.session);
  const rows = order.map((at) => rowOf(members[at]!.member, mode, carriers, units));
  const inHand = order.indexOf(state.member);
  return {
    status: statusOf(state, mode, order.length),
    columns: columnsOf(units),
    rows,
    inHand,
    notes: inHand < 0 ? [] : notesOf(state, mode, carriers),
    foot: MEMBERS_BINDINGS.filter(({ foot }) => foot !== '')
      .map(({ keys, foot }) => ({ keys, does: foot }))
      .concat({ keys: 'Esc', does: 'back' }),
    question: questionOf(state, mode),
  };
}

function rowOf(
  member: Member,
  { judged }: MembersMode,
  carriers: ReadonlyMap<string, readonly Landing[]>,
  units: Units,
): TableRow {
  const judgement = judged.get(member);
  const spans = member.beam.spans.map((span) => showSpan(span, units)).join(' + ');
  return {
    cells: [
      member.name,
      member.note,
      sizeOf(member),
      shortWood(member.stock),
      member.spacing === null ? spans : `${spans} @ ${showInches(member.spacing, units)}`,
      weightNumber(sectionWeight(member, member.section), units),
      ...stands(judgement),
      String(member.count),
      namesText(linksOf(member).map((link) => link.member)),
      namesText((carriers.get(member.name) ?? []).map(({ carrier }) => carrier)),
    ],
    style: 'plain',
    ...(judgement !== undefined && !judgement.passes ? { styles: { [VERDICT]: 'governs' } } : {}),
  };
}

/** More names than this are counted. */
const MOST_NAMES = 3;

function namesText(names: readonly string[]): string {
  const each = [...new Set(names)];
  const shown = each.slice(0, MOST_NAMES).join(', ');
  return each.length > MOST_NAMES ? `${shown} +${each.length - MOST_NAMES}` : shown;
}

function statusOf(state: State, mode: MembersMode, count: number): string {
  const { members } = state.session;
  const judgements = members.map(({ member }) => mode.judged.get(member));
  const failing = judgements.filter((each) => each !== undefined && !each.passes).length;
  const open = judgements.filter((each) => each === undefined).length;
  const total = `${members.length} ${members.length === 1 ? 'member' : 'members'}`;
  return [
    total,
    ...(open > 0 ? [`${open} still to work out`] : []),
    failing === 0
      ? open > 0
        ? 'none fails so far'
        : 'all pass'
      : `${failing} ${failing === 1 ? 'fails' : 'fail'}`,
    SORT_WORD[mode.sort],
    ...(mode.filter.trim() === '' ? [] : [`${count} with "${mode.filter.trim()}"`]),
  ].join('; ');
}

function notesOf(
  state: State,
  mode: MembersMode,
  carriers: ReadonlyMap<string, readonly Landing[]>,
): string[] {
  const member = memberOf(state);
  if (mode.asks?.of === 'delete') return whoLoses(state.session, member.name, unitsOf(state));
  const carries = linksOf(member).map((link) => `${link.member} ${endText(link.end)}`);
  const carried = (carriers.get(member.name) ?? []).map(
    ({ carrier, link }) => `${carrier} (${endText(link.end)})`,
  );
  return [`${member.name} carries ${counted(carries)}`, `it is carried by ${counted(carried)}`];
}

/** "J1 left end, J2 right end twice"; "no other" for none. */
function counted(texts: readonly string[]): string {
  if (texts.length === 0) return 'no other';
  const times = (text: string) => texts.filter((each) => each === text).length;
  return [...new Set(texts)]
    .map((text) => {
      const count = times(text);
      return count === 1 ? text : `${text} ${count === 2 ? 'twice' : `${count} times`}`;
    })
    .join(', ');
}

function questionOf(state: State, { asks }: MembersMode): MembersView['question'] {
  if (asks === null) return null;
  const { name } = memberOf(state);
  if (asks.of === 'delete')
    return { asks: `delete ${name}?`, told: 'Enter deletes it, Esc leaves it', isFault: false };
  const [asked, told] = {
    name: [`${name} shall be called`, 'Enter names it so, Esc leaves the old name'],
    count: [`how many of ${name}`, 'a whole number; buying goes by it'],
    note: [`note on ${name}`, 'what it is, where it stands; Enter writes it, Esc leaves the old note'],
    filter: [
      'filter',
      'words of the name, note, size, wood or what governs; Enter keeps the filter, Esc clears it',
    ],
  }[asks.of] as [string, string];
  return { asks: asked, told: asks.fault ?? told, isFault: asks.fault !== null };
}
