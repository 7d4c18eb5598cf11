import type { Cure } from '../explore/cures.ts';
import { costOf } from '../explore/moves/index.ts';
import { BEST_WORD, type Best } from '../explore/rack/best.ts';
import { sizeName } from '../explore/rack/rack.ts';
import { measureOf } from '../explore/rack/ranked.ts';
import {
  fromUnit,
  showInches,
  showQuantity,
  showRatio,
  showSpanDown,
  toUnit,
  type Units,
  weightNumber,
  weightUnit,
} from '../quantity/index.ts';
import type { Size } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { checkAndPlace, isPlain, patternText } from '../timber/place-words.ts';
import { PASS_LIMIT } from '../timber/report.ts';
import { CHECK_SUBJECT } from '../timber/words.ts';
import type { Answer } from './answer.ts';
import type { VerdictView } from './view.ts';

/**
 * The sentence of the meeting: what stops the member and the nearest cures, or what it still has in hand. Where it is
 * not `settled` the best size alone is named, and the other cures follow.
 */
export function verdictOf(member: Member, answer: Answer, units: Units, settled = true): VerdictView {
  const passes = answer.report.passes;
  const cures = () => (passes ? spareOf(member, answer, units) : curesText(member, answer, units, settled));
  return { passes, reason: reasonOf(member, answer, passes), cures: isUnloaded(answer) ? [] : cures() };
}

function reasonOf(member: Member, answer: Answer, passes: boolean): string {
  if (isUnloaded(answer)) return 'It carries nothing but itself: give it a load.';
  const { governing } = answer;
  if (governing === null) return 'Nothing could be checked.';
  const result = answer.report.checks.find((each) => each.id === governing);
  const name = (begins: boolean) =>
    result === undefined ? CHECK_SUBJECT[governing] : checkAndPlace(member, result, begins);
  const ratio = showRatio(answer.worst);
  if (passes) {
    const nearest = `is nearest its limit at ${ratio}.`;
    const sentence = `Everything passes; ${name(false)} ${nearest}`;
    // The word before it says that everything passes.
    return sentence.length <= MOST_REASON ? sentence : `${name(true)} ${nearest}`;
  }
  if (!Number.isFinite(answer.worst)) return `${name(true)} stops it: it is untied.`;
  const sentence = `${name(true)} stops it at ${ratio}`;
  const pattern = result === undefined ? '' : patternText(result);
  return `${sentence}${sentence.length + pattern.length <= MOST_REASON ? pattern : ''}.`;
}

/** Cells that the reason has on the smallest screen of two columns; which spans are loaded is told elsewhere too. */
const MOST_REASON = 66;

function isUnloaded(answer: Answer): boolean {
  return answer.report.cautions.some((each) => each.id === 'unloaded');
}

/** An uplift that nothing holds is cured by holding it: a member heavy enough is no answer. Says what is next. */
function tieText(member: Member, answer: Answer, units: Units): string[] {
  const result = answer.report.checks.find((each) => each.id === 'uplift');
  if (result === undefined) return [];
  const rest = answer.report.checks.filter((each) => each !== result && each.ratio > PASS_LIMIT);
  const next = rest.sort((a, b) => b.ratio - a.ratio)[0];
  const then =
    next && `Then ${lowered(checkAndPlace(member, next, true))} stops it at ${showRatio(next.ratio)}.`;
  return [`Tie it down for ${tieShown(result.demand, units)}.`, ...(then ? [then] : [])];
}

/** A force that would hold when typed as it is shown: rounded up to 1 lb, 0.01 kN. */
function tieShown(force: number, units: Units): string {
  const [unit, step] = units === 'us' ? (['lb', 1] as const) : (['kN', 0.01] as const);
  const steps = Math.ceil(toUnit('pointLoad', force, unit) / step - HAIR);
  return showQuantity('pointLoad', fromUnit('pointLoad', steps * step, unit), units);
}

/** Parts of a step that are arithmetic's, not a force. */
const HAIR = 1e-9;

function raised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function lowered(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

function curesText(member: Member, answer: Answer, units: Units, settled: boolean): string[] {
  if (answer.governing === 'uplift' && !Number.isFinite(answer.worst)) return tieText(member, answer, units);
  const lightest = answer.rack.sizes[answer.rack.lit];
  const name = (size: Size | null | undefined) => (size == null ? '' : sizeName(answer.rack, size));
  const lit = name(lightest?.size);
  const sentences = [
    lightest === undefined
      ? noSizeText(answer)
      : `${raised(BEST_WORD[answer.rack.best])} cure: ${lit}, ${showRatio(lightest.worst)}.`,
  ];
  if (!settled) return sentences;
  const by = (kind: Cure['kind']) => answer.cures.find((cure) => cure.kind === kind && cure.passes);
  const shorten = by('shorten');
  const deepen = by('deepen');
  const ply = by('add a ply');
  const widen = by('widen');
  if (shorten?.span != null) sentences.push(shortenText(member, shorten.span, units));
  const others = [
    deepen !== undefined && name(deepen.size) !== lit
      ? `deepen: ${name(deepen.size)}, ${showRatio(deepen.worst)}`
      : '',
    ply !== undefined && name(ply.size) !== lit
      ? `a ply more: ${name(ply.size)}, ${showRatio(ply.worst)}`
      : '',
    widen !== undefined && name(widen.size) !== lit
      ? `widen: ${name(widen.size)}, ${showRatio(widen.worst)}`
      : '',
  ].filter((text) => text !== '');
  if (others.length > 0) sentences.push(`Or ${others.join('; ')}.`);
  return sentences;
}

/** With several lengths all shrink in step, and the longest span is named. */
function shortenText(member: Member, span: number, units: Units): string {
  const to = showSpanDown(span, units);
  const arm = member.beam.supports === 'cantilever';
  return isPlain(member) || arm ? `Or shorten to ${to}.` : `Or shorten all, the longest span to ${to}.`;
}

function noSizeText({ rack }: Answer): string {
  if (rack.sizes.length === 0) return 'This wood has no stock sizes.';
  return rack.woods.length > 1
    ? 'No stock size of these woods passes.'
    : 'No stock size of this wood passes.';
}

/** What the best size would spare of what the user wants least of. */
function spareOf(member: Member, answer: Answer, units: Units): string[] {
  const { rack, ranking } = answer;
  const lit = rack.sizes[rack.lit];
  if (lit === undefined) return [];
  const [now, then] = [measureOf(rack.best, costOf(member, ranking)), measureOf(rack.best, lit)];
  const [better, least] = SPARE[rack.best];
  if (now === null || then === null) return [];
  if (!(now - then > 1e-9 * then)) return [least];
  const saving = `${spareText(rack.best, now - then, units)} less`;
  return [`${better} would do: ${sizeName(rack, lit.size)}, ${showRatio(lit.worst)}, ${saving}.`];
}

const SPARE: Readonly<Record<Best, readonly [string, string]>> = {
  weight: ['Lighter', 'No lighter size does.'],
  depth: ['Shallower', 'No shallower size does.'],
  boardFeet: ['Less wood', 'No size does with less wood.'],
  price: ['Cheaper', 'No cheaper size does.'],
};

function spareText(best: Best, amount: number, units: Units): string {
  switch (best) {
    case 'weight':
      return `${weightNumber(amount, units)} ${weightUnit(units)}`;
    case 'depth':
      return showInches(amount, units);
    case 'boardFeet':
      return `${amount.toFixed(1)} bd ft/ft`;
    case 'price':
      return amount.toFixed(2);
  }
}
