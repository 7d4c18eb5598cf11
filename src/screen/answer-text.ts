import { linksOf } from '../explore/links/index.ts';
import { KIND_WORD, LOAD_KINDS } from '../loads/kinds.ts';
import { showQuantity, showRatio, showSpan } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { shortWood, sizeLabel } from '../timber/index.ts';
import { answerOf } from './answer.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import { verdictOf } from './verdict-text.ts';

/** The answer in three lines for a message: what it is, what stops it, what would do. */
export function answerText(state: State): readonly [string, string, string] {
  const member = memberOf(state);
  const units = unitsOf(state);
  const answer = answerOf(member, rankingOf(state.session));
  const { passes, reason, cures } = verdictOf(member, answer, units);
  const spans = member.beam.spans.map((span) => showSpan(span, units)).join(' + ');
  const loads = LOAD_KINDS.filter((kind) => member.area[kind] > 0).map(
    (kind) => `${KIND_WORD[kind]} ${showQuantity('areaLoad', member.area[kind], units)}`,
  );
  const others = member.loads.length === 0 ? [] : [`${member.loads.length} more loads`];
  const names = [...new Set(linksOf(member).map((link) => link.member))];
  const carried = names.length === 0 ? [] : [`carries ${names.join(', ')}`];
  const what = [
    `${sizeLabel(member.section, member.stock.product)} ${shortWood(member.stock)}`,
    `span ${spans}`,
    member.spacing === null
      ? `tributary ${showSpan(member.tributary, units)}`
      : `spacing ${showQuantity('length', member.spacing, units)}`,
    ...loads,
    ...others,
    ...carried,
  ];
  const powers = answer.powers.flatMap(({ name, ratio }) =>
    ratio === null ? [] : [`${name} ${showRatio(ratio)}`],
  );
  const name = member.note === '' ? member.name : `${member.name} ${member.note}`;
  return [
    `${name}: ${what.join(', ')}`,
    `${passes ? 'PASSES' : 'FAILS'}. ${reason} (${powers.join(', ')})`,
    [...cures, 'ASD, NDS 2018; preliminary, a licensed professional decides.'].join(' '),
  ];
}
