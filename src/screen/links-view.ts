import type { Knob } from '../explore/knobs/knob.ts';
import { linkKnobs } from '../explore/knobs/link.ts';
import {
  borneText,
  carriedBy,
  carriersOf,
  couldCarry,
  endText,
  type Landing,
} from '../explore/links/index.ts';
import type { Link } from '../loads/index.ts';
import { showInches, showRatio, showSpan, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { sizeLabel } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import type { LinksMode } from './mode.ts';
import type { Question } from './panels/prompt.ts';
import type { TableColumn, TableRow } from './panels/table.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import { ALL_KEYS, type FootView } from './view.ts';

/** A line that can be taken in hand. */
export type LinkLine =
  /** A place or spacing of a link of the member. */
  | { readonly is: 'link'; readonly index: number; readonly knob: Knob }
  /** Where a reaction of the member lands. */
  | { readonly is: 'landing'; readonly landing: Landing }
  /** A member that it could carry, while that is asked for. */
  | { readonly is: 'choice'; readonly member: Member };

export interface LinksView {
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
  /** By row; null where it is a heading. */
  readonly lines: readonly (LinkLine | null)[];
  /** The row in hand; -1 where there is none. */
  readonly inHand: number;
  readonly foot: readonly FootView[];
  /** What is typed; null while nothing is. */
  readonly question: Question | null;
}

const COLUMNS: readonly TableColumn[] = [
  { head: 'member', align: 'left', least: 8 },
  { head: 'its', align: 'left', least: 9 },
  { head: 'lands', align: 'left', least: 8 },
  { head: '', align: 'right' },
  { head: 'brings', align: 'left', least: 14 },
  { head: 'stands at', align: 'left', least: 10 },
];

/** What the member in hand carries and what carries it; while a member is asked for, those it could carry. */
export function linksView(state: State, mode: LinksMode): LinksView {
  const list = mode.choosing ? choices(state) : lists(state);
  const at = list.lines.flatMap((line, row) => (line === null ? [] : [row]));
  const inHand = at[Math.min(mode.line, at.length - 1)] ?? -1;
  return {
    ...list,
    inHand,
    foot: footOf(mode, list.lines[inHand] ?? null),
    question: questionOf(state, mode),
  };
}

/** The lines that can be taken in hand. */
export function linesOf(view: LinksView): LinkLine[] {
  return view.lines.filter((line) => line !== null);
}

type List = Pick<LinksView, 'columns' | 'rows' | 'lines'>;

function lists(state: State): List {
  const member = memberOf(state);
  const units = unitsOf(state);
  const rows: TableRow[] = [];
  const lines: (LinkLine | null)[] = [];
  const add = (cells: readonly string[], line: LinkLine | null, of: Member | null = null) => {
    const fails = of !== null && !answerOf(of, rankingOf(state.session)).passes;
    const styles = fails ? { styles: { [COLUMNS.length - 1]: 'governs' as const } } : {};
    rows.push({ cells, style: line === null ? 'quiet' : 'plain', ...styles });
    lines.push(line);
  };
  const landings = carriedBy(state.session, member.name);
  add([`${member.name} carries`, landings.length === 0 ? 'no other' : ''], null);
  for (const knob of linkKnobs(member)) {
    const [, at, key] = knob.key.split('.') as [string, string, string];
    const index = Number(at);
    const { link } = landings[index]!;
    const first = key === 'at' || key === 'every';
    const value = knob.show(member, units);
    const line: LinkLine = { is: 'link', index, knob };
    if (!first) add(['', '', key, value, '', ''], line);
    else {
      const from = memberNamed(state, link.member);
      const stands = from === null ? '' : standsText(state, from);
      add(
        [link.member, endText(link.end), placeWord(link), value, borneText(link, units), stands],
        line,
        from,
      );
    }
  }
  const carriers = carriersOf(state.session, member.name);
  add([`${member.name} is carried by`, carriers.length === 0 ? 'no other' : ''], null);
  for (const landing of carriers) {
    const { carrier, link } = landing;
    const place = link.type === 'point' ? showSpan(link.at, units) : showInches(link.every, units);
    const on = memberNamed(state, carrier)!;
    add(
      [carrier, endText(link.end), placeWord(link), place, borneText(link, units), standsText(state, on)],
      { is: 'landing', landing },
      on,
    );
  }
  return { columns: COLUMNS, rows, lines };
}

function placeWord(link: Link): string {
  if (link.type === 'point') return 'at';
  return link.bySpacing ? 'its spacing' : 'every';
}

const CHOICE_COLUMNS: readonly TableColumn[] = [
  { head: 'member', align: 'left', least: 12 },
  { head: 'size', align: 'left', least: 18 },
  { head: 'spans', align: 'left', least: 20 },
  { head: 'stands at', align: 'left', least: 20 },
  { head: '', align: 'left', spare: 1 },
];

function choices(state: State): List {
  const units = unitsOf(state);
  const { name } = memberOf(state);
  const members = couldCarry(state.session, name);
  return {
    columns: CHOICE_COLUMNS,
    rows: [
      { cells: [`${name} shall carry`], style: 'strong' },
      ...members.map(
        (member): TableRow => ({
          style: 'plain',
          cells: [
            member.name,
            sizeLabel(member.section, member.stock.product),
            spansText(member, units),
            standsText(state, member),
            member.note,
          ],
        }),
      ),
    ],
    lines: [null, ...members.map((member): LinkLine => ({ is: 'choice', member }))],
  };
}

function spansText({ beam, spacing }: Member, units: Units): string {
  const spans = beam.spans.map((span) => showSpan(span, units)).join(' + ');
  return spacing === null ? spans : `${spans} every ${showInches(spacing, units)}`;
}

/** "0.84 bending", "1.20 bending, fails". */
function standsText(state: State, member: Member): string {
  const { passes, governing, worst } = answerOf(member, rankingOf(state.session));
  if (governing === null) return 'not checked';
  return `${showRatio(worst)} ${CHECK_WORD[governing]}${passes ? '' : ', fails'}`;
}

export function memberNamed(state: State, name: string): Member | null {
  return state.session.members.find(({ member }) => member.name === name)?.member ?? null;
}

function questionOf(state: State, { typing }: LinksMode): LinksView['question'] {
  if (typing === null) return null;
  const knob = linkKnobs(memberOf(state)).find(({ key }) => key === typing.knob);
  if (knob === undefined) return null;
  const { fault } = typing;
  return {
    asks: knob.label.trim(),
    told: fault ?? `as ${knob.hint(unitsOf(state))}`,
    isFault: fault !== null,
  };
}

function footOf({ choosing }: LinksMode, line: LinkLine | null): FootView[] {
  const back = { keys: 'Esc', does: 'back' };
  if (choosing) return [{ keys: '↑↓', does: 'choose' }, { keys: 'Enter', does: 'carry it' }, back, ALL_KEYS];
  const add = { keys: 'a', does: 'carry another' };
  if (line === null) return [back, add, ALL_KEYS];
  const own =
    line.is === 'link'
      ? [
          { keys: '←→', does: 'nudge' },
          { keys: 'Enter', does: 'type' },
          { keys: 'e', does: 'other end' },
          { keys: 'Delete', does: 'take out' },
          { keys: 't', does: 'once or repeated' },
        ]
      : [];
  const workings = { keys: 'w', does: 'workings' };
  return [back, add, ...own, { keys: 'g', does: 'go to it' }, workings, ALL_KEYS];
}
