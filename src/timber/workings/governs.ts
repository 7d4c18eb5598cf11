import { type AloneEffects, effectsAlone } from '../../loads/alone.ts';
import type { Effects } from '../../loads/effects.ts';
import { explain } from '../checks/explain.ts';
import { governingTerm } from '../checks/governing-term.ts';
import { deadFactorOf, type Prepared, withEffects } from '../checks/prepare.ts';
import { rate } from '../checks/rate.ts';
import { CHECK_IDS, type CheckId, type CheckResult, roomForRatios } from '../report.ts';
import { factorText, ratioText } from './figures.ts';
import { measured } from './result.ts';
import { checkOf, heaviestOf, type Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** The checks under one combination alone. */
interface Rated {
  readonly prepared: Prepared;
  readonly ratios: readonly number[];
  readonly groups: Int32Array;
}

/** Which combination and pattern governs a check, and what comes next. */
export function governsLines(work: Work, id: CheckId): WorkingLine[] {
  const check = checkOf(work, id)!;
  const at = CHECK_IDS.indexOf(id);
  const governing = governingTerm(work.prepared, work.wood, at, work.groups[at]!).term.combination;
  const alone = aloneOf(work);
  let next: Rated | null = null;
  alone.rated.forEach((rival, combination) => {
    const ratio = rival.ratios[at]!;
    if (combination === governing || Number.isNaN(ratio)) return;
    if (next === null || ratio > next.ratios[at]!) next = rival;
  });
  const own = `${check.combination} governs at ${ratioText(check.ratio)}: ${asks(work, check)}`;
  const lines: WorkingLine[] = [
    { heading: 'what governs' },
    { note: check.pattern === '' ? own : `${own}; loads on ${onWords(check.pattern)}` },
  ];
  if (check.pattern !== '' && check.pattern !== 'all spans') {
    const ratio = ratedUnder(work, alone.effects.allSpans(governing)).ratios[at]!;
    const text = Number.isNaN(ratio) ? 'nothing at all' : ratioText(ratio);
    lines.push({ note: `with the same loads on all spans at once it is ${text}` });
  }
  if (next === null) lines.push({ note: 'no other combination asks anything of this check' });
  else lines.push({ note: nextText(work, check, explained(work, next, at)) });
  return lines;
}

interface Alone {
  readonly effects: AloneEffects;
  /** By combination. */
  readonly rated: readonly Rated[];
}

const KNOWN = new WeakMap<Work, Alone>();

/** Every combination alone, searched once for all checks of a member. */
function aloneOf(work: Work): Alone {
  const known = KNOWN.get(work);
  if (known !== undefined) return known;
  const { member } = work;
  const effects = effectsAlone(member, { heaviest: heaviestOf(work), deadFactor: deadFactorOf(member) });
  const alone = { effects, rated: effects.byCombination.map((each) => ratedUnder(work, each)) };
  KNOWN.set(work, alone);
  return alone;
}

/** All checks under other effects. The wood stands at the member's section. */
function ratedUnder(work: Work, effects: Effects): Rated {
  const prepared = withEffects(work.member, effects, heaviestOf(work));
  const ratios = roomForRatios();
  const groups = new Int32Array(CHECK_IDS.length);
  rate(prepared, work.wood, work.member.section, ratios, groups);
  return { prepared, ratios, groups };
}

function explained({ wood, units }: Work, { prepared, ratios, groups }: Rated, at: number): CheckResult {
  return explain(prepared, wood, at, ratios[at]!, groups[at]!, units);
}

function onWords(pattern: string): string {
  return pattern === 'all spans' ? pattern : `part of the spans: ${pattern}`;
}

/** "1486.1 psi of 900 psi, CD 1.0". */
function asks({ figures: f }: Work, check: CheckResult): string {
  const CD = check.factors.find(({ symbol }) => symbol === 'CD');
  const duration = CD === undefined ? '' : `, CD ${factorText(CD.value)}`;
  return `${measured(f, check, check.demand)} of ${measured(f, check, check.capacity)}${duration}`;
}

function nextText(work: Work, check: CheckResult, next: CheckResult): string {
  const text = `next comes ${next.combination} at ${ratioText(next.ratio)}: ${asks(work, next)}`;
  if (next.demand > check.demand && next.capacity > check.capacity)
    return `${text}; it asks more but may lean on more, for its load is shorter`;
  if (next.demand > check.demand * (1 + 1e-9)) return `${text}; it asks more elsewhere, of more capacity`;
  return check.demand === next.demand ? `${text}; it asks the same` : `${text}; it asks less`;
}
