import type { Units } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';
import { CHECK_IDS } from '../../timber/report.ts';
import {
  type Figures,
  figuresOf,
  plain,
  WORKINGS_WORD,
  type WorkingLine,
} from '../../timber/workings/index.ts';
import { knobsOf } from '../knobs/knobs.ts';
import { type Cost, costOf } from '../moves/index.ts';
import { timesAsMany } from '../moves/move.ts';
import { ratiosOf } from '../ratios.ts';
import type { Asked } from './about.ts';

/** What a design is beside another, the one before: what was changed, and every ratio and cost after less before. */
export function changeLines({ member, before, units, ranking }: Asked): WorkingLine[] {
  if (before === null) return [];
  const f = figuresOf(units);
  const [was, is] = [ratiosOf(before), ratiosOf(member)];
  const lines: WorkingLine[] = [{ heading: 'what is another' }, ...differences(before, member, units)];
  lines.push({ heading: 'ratios: after less before' });
  CHECK_IDS.forEach((id, at) => {
    const [old, now] = [was[at]!, is[at]!];
    if (Number.isNaN(old) && Number.isNaN(now)) return;
    lines.push({ symbol: WORKINGS_WORD[id], ...differenceOf(old, now, plain, 'untied') });
  });
  return [
    ...lines,
    { heading: 'what it takes: after less before' },
    ...costLines(f, costOf(before, ranking), costOf(member, ranking)),
    ...timesLines(f, before, member),
    { note: 'The other pages show how each figure after comes about.' },
  ];
}

/** Every knob that reads otherwise. */
function differences(before: Member, after: Member, units: Units): WorkingLine[] {
  const shown = (member: Member) =>
    new Map(
      knobsOf(member).map((knob) => [knob.key, { label: knob.label.trim(), text: knob.show(member, units) }]),
    );
  const [was, is] = [shown(before), shown(after)];
  const lines = [...new Set([...is.keys(), ...was.keys()])].flatMap((key): WorkingLine[] => {
    const [old, now] = [was.get(key), is.get(key)];
    if (old?.text === now?.text) return [];
    return [
      {
        symbol: (now ?? old)!.label,
        result: now?.text || 'none',
        note: `before: ${old?.text || 'none'}`,
      },
    ];
  });
  return lines.length > 0 ? lines : [{ note: 'nothing that a knob shows' }];
}

/** Weight, depth, board feet and price, after less before. */
export function costLines(f: Figures, before: Cost, after: Cost): WorkingLine[] {
  const line = (symbol: string, key: keyof Cost, show: (value: number) => string): WorkingLine[] => {
    const [old, now] = [before[key], after[key]];
    return old === null || now === null ? [] : [{ symbol, ...differenceOf(old, now, show, '') }];
  };
  return [
    ...line('own weight', 'weight', f.weight),
    ...line('depth', 'depth', f.size),
    ...line('board feet a foot', 'boardFeet', plain),
    ...line('price of a member', 'price', plain),
  ];
}

/** Closer members are more members. */
function timesLines(f: Figures, before: Member, after: Member): WorkingLine[] {
  const times = timesAsMany(before, after);
  if (times === 1) return [];
  return [
    {
      symbol: 'times as many members',
      formula: 'width of floor before / after',
      numbers: `${f.span(before.tributary)} / ${f.span(after.tributary)}`,
      result: plain(times),
    },
  ];
}

function differenceOf(
  before: number,
  after: number,
  show: (value: number) => string,
  endless: string,
): Pick<WorkingLine, 'numbers' | 'result' | 'note'> {
  if (Number.isFinite(before) && Number.isFinite(after)) {
    return { numbers: `${show(after)} - ${show(before)}`, result: show(after - before) };
  }
  const text = (value: number) =>
    Number.isNaN(value) ? 'does not apply' : value === Number.POSITIVE_INFINITY ? endless : show(value);
  return { result: text(after), note: `before: ${text(before)}` };
}
