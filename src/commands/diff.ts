import { judge } from '../explore/judge.ts';
import { bestOf } from '../explore/rack/ranked.ts';
import { ratiosOf } from '../explore/ratios.ts';
import { harmless, showRatio } from '../quantity/index.ts';
import {
  type Comparison,
  compareSessions,
  type Difference,
  isSame,
  type MemberPair,
} from '../session/compare.ts';
import { rankingOf } from '../session/index.ts';
import type { Session } from '../session/session.ts';
import { prepare, sizeLabel } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import type { CheckId } from '../timber/report.ts';
import { load, unitsOf } from './load.ts';
import { closing, wrapped } from './prose.ts';
import { STATUS } from './status.ts';
import { table } from './table.ts';

export interface DiffOptions {
  readonly json?: boolean;
  readonly units?: string;
}

/** `thrice diff A B`: what changed from one session to another, and what came of it. Status 0 when nothing did. */
export function diff(
  before: string,
  after: string,
  options: DiffOptions,
  print: (text: string) => void,
): number {
  const one = load(before, {}).session;
  const other = load(after, {}).session;
  const found = compareSessions(one, other, unitsOf(options.units, other.units));
  const effects = found.pairs.map((pair) => effectOf(pair, one, other));
  const same = isSame(found) && effects.every((effect) => !effect.changed);
  if (options.json === true) {
    print(`${JSON.stringify(diffJson(found, effects, same), null, 2)}\n`);
  } else {
    print(`${[...diffTexts(found, effects, same), '', ...closing()].join('\n')}\n`);
  }
  return same ? STATUS.yes : STATUS.no;
}

/** What a member comes to. */
interface Figures {
  readonly size: string;
  readonly passes: boolean;
  readonly governing: CheckId | null;
  /** The largest ratio; null where nothing can meet it. */
  readonly ratio: number | null;
  /** The best size that passes. */
  readonly lit: string | null;
}

interface Effect {
  readonly before: Figures;
  readonly after: Figures;
  readonly changed: boolean;
}

function effectOf({ before, after }: MemberPair, one: Session, other: Session): Effect {
  const was = figuresOf(before.member, one);
  const is = figuresOf(after.member, other);
  const keys = Object.keys(was) as (keyof Figures)[];
  return { before: was, after: is, changed: keys.some((key) => was[key] !== is[key]) };
}

function figuresOf(member: Member, session: Session): Figures {
  const { passes, governing, worst } = judge(ratiosOf(member));
  return {
    size: sizeLabel(member.section, member.stock.product),
    passes: passes && prepare(member).loaded,
    governing,
    ratio: Number.isFinite(worst) ? worst : null,
    lit: bestOf(member, rankingOf(session))?.label ?? null,
  };
}

/** A member that is told of: its record changed, its name, or what it comes to. */
function isTold({ before, after, differences }: MemberPair, effect: Effect): boolean {
  return differences.length > 0 || before.member.name !== after.member.name || effect.changed;
}

function diffJson(found: Comparison, effects: readonly Effect[], same: boolean): object {
  return {
    thrice: 1,
    same,
    session: found.top.map(differenceJson),
    added: found.added.map(({ member }) => member.name),
    removed: found.removed.map(({ member }) => member.name),
    reordered: found.reordered,
    members: found.pairs.flatMap((pair, at) => {
      const { before, after } = effects[at]!;
      if (!isTold(pair, effects[at]!)) return [];
      const was = pair.before.member.name;
      const { name } = pair.after.member;
      return [
        {
          name,
          ...(was === name ? {} : { was }),
          changes: pair.differences.map(differenceJson),
          before,
          after,
        },
      ];
    }),
  };
}

/** A side that says nothing is null. */
function differenceJson({ path, from, to }: Difference): object {
  return { path, from: from ?? null, to: to ?? null };
}

function diffTexts(found: Comparison, effects: readonly Effect[], same: boolean): string[] {
  if (same) return ['no difference'];
  const lines: string[] = [];
  if (found.top.length > 0) lines.push('session', ...rows(changeRows(found.top)));
  for (const { member } of found.removed) lines.push(`removed   ${harmless(member.name)}`);
  for (const { member } of found.added) {
    lines.push(`added     ${harmless(member.name)}  ${sizeLabel(member.section, member.stock.product)}`);
  }
  if (found.reordered) lines.push('members stand in another order');
  for (const [at, pair] of found.pairs.entries()) {
    const effect = effects[at]!;
    if (!isTold(pair, effect)) continue;
    lines.push(titleOf(pair), ...rows([...changeRows(pair.differences), ...effectRows(effect)]));
    if (effectRows(effect).length === 0) lines.push(...asBefore(effect.after));
  }
  return lines;
}

function titleOf({ before, after, differences }: MemberPair): string {
  const [was, is] = [harmless(before.member.name), harmless(after.member.name)];
  if (was !== is) return `renamed   ${was} -> ${is}`;
  return differences.length > 0 ? `changed   ${is}` : `affected  ${is}`;
}

const INDENT = '  ';
/** Of a value that is a list or an object, or a long text. */
const LONGEST_VALUE = 60;
const NOTHING = 'not stated';

/** What, from what, to what. */
type Row = readonly [what: string, from: string, to: string];

function changeRows(differences: readonly Difference[]): Row[] {
  return differences.map(({ path, from, to }) => [harmless(path), valueText(from), valueText(to)]);
}

function valueText(value: unknown): string {
  if (value === undefined) return NOTHING;
  return harmless(typeof value === 'string' ? value : JSON.stringify(value), LONGEST_VALUE);
}

function effectRows({ before, after }: Effect): Row[] {
  const all: Row[] = [
    ['ratio', ratioText(before), ratioText(after)],
    ['verdict', verdictText(before), verdictText(after)],
    ['best size', before.lit ?? 'none', after.lit ?? 'none'],
  ];
  return all.filter(([, was, is]) => was !== is);
}

function asBefore(figures: Figures): string[] {
  return wrapped(`${verdictText(figures)} as before, ${ratioText(figures)}`, INDENT);
}

function ratioText({ ratio, governing }: Figures): string {
  return governing === null ? 'no load' : `${showRatio(ratio ?? Number.POSITIVE_INFINITY)} ${governing}`;
}

function verdictText({ passes }: Figures): string {
  return passes ? 'passes' : 'fails';
}

/** "what  from -> to", a line each. */
function rows(of: readonly Row[]): string[] {
  const [, ...lines] = table(
    [
      { head: '', align: 'left' },
      { head: '', align: 'left' },
    ],
    of.map(([what, from, to]) => [what, `${from} -> ${to}`]),
    INDENT,
  );
  return lines;
}
