import type { Cure } from '../explore/cures.ts';
import { showRatio, showSpanDown, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';
import type { Answer } from './answer.ts';
import type { VerdictView } from './view.ts';
import { CHECK_SUBJECT, CHECK_WORD } from './words.ts';

/** The sentence of the meeting: what stops the member and the nearest cures, or what it still has in hand. */
export function verdictOf(member: Member, answer: Answer, units: Units): VerdictView {
  const passes = answer.report.passes;
  return {
    passes,
    reason: reasonOf(answer, passes),
    cures: passes ? spareOf(answer, units) : curesText(member, answer, units),
  };
}

function reasonOf(answer: Answer, passes: boolean): string {
  const unloaded = answer.report.cautions.find((each) => each.id === 'unloaded');
  if (unloaded !== undefined) return 'It carries nothing but itself: give it a load.';
  if (answer.governing === null) return 'Nothing could be checked.';
  if (passes)
    return `Everything passes; ${CHECK_WORD[answer.governing]} is nearest its limit at ${showRatio(answer.worst)}.`;
  const subject = CHECK_SUBJECT[answer.governing];
  return Number.isFinite(answer.worst)
    ? `${subject} stops it at ${showRatio(answer.worst)}.`
    : `${subject} stops it: no tie-down is stated.`;
}

function curesText(member: Member, answer: Answer, units: Units): string[] {
  const by = (kind: Cure['kind']) => answer.cures.find((cure) => cure.kind === kind && cure.passes);
  const lightest = by('lightest');
  const shorten = by('shorten');
  const deepen = by('deepen');
  const ply = by('add a ply');
  const widen = by('widen');
  const lit = lightest?.size?.label;
  const sentences = [
    lightest === undefined
      ? 'No stock size of this wood passes.'
      : `Lightest cure: ${lit}, ${showRatio(lightest.worst)}.`,
  ];
  if (shorten?.span != null) sentences.push(`Or shorten to ${showSpanDown(shorten.span, units)}.`);
  const others = [
    deepen !== undefined && deepen.size?.label !== lit
      ? `deepen: ${deepen.size!.label}, ${showRatio(deepen.worst)}`
      : '',
    ply !== undefined && ply.size?.label !== lit
      ? `a ply more: ${ply.size!.label}, ${showRatio(ply.worst)}`
      : '',
    widen !== undefined && widen.size?.label !== lit
      ? `widen: ${widen.size!.label}, ${showRatio(widen.worst)}`
      : '',
  ].filter((text) => text !== '');
  if (others.length > 0) sentences.push(`Or ${others.join('; ')}.`);
  if (member.beam.spans.length === 0) return [];
  return sentences;
}

function spareOf(answer: Answer, units: Units): string[] {
  const lightest = answer.cures.find((cure) => cure.kind === 'lightest');
  const lit = answer.rack.sizes[answer.rack.lightest];
  if (lightest === undefined || lit === undefined) return [];
  const saving = answer.report.weight - lit.weight;
  return saving > 1e-9 * lit.weight
    ? [
        `Lighter would do: ${lit.size.label}, ${showRatio(lit.worst)}, ${weightNumber(saving, units)} ${weightUnit(units)} less.`,
      ]
    : ['No lighter size does.'];
}
