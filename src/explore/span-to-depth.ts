import { beamFields } from '../statics/beam.ts';
import { governingField, standingDepth } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';

/** Length that l/h of a field goes by, in: its own, or twice that of an overhang. */
export function fieldSpan(member: Member, field: number): number {
  const { kind, length } = beamFields(member.beam)[field]!;
  return kind === 'overhang' ? 2 * length : length;
}

/** Key of the knob of a field: "spans.1", "overhangs.left". */
export function fieldKey(member: Member, field: number): string {
  const { beam } = member;
  const leading = beam.supports === 'bearings' && beam.overhangs.left > 0 ? 1 : 0;
  const span = field - leading;
  if (span < 0) return 'overhangs.left';
  return span < beam.spans.length ? `spans.${span}` : 'overhangs.right';
}

/** l/h of a member: with several spans that of the span where the worst of the three powers stands. */
export function spanToDepthOf(member: Member): number {
  const only =
    member.beam.spans.length === 1 && member.beam.overhangs.left === 0 && member.beam.overhangs.right === 0;
  const field = only ? 0 : governingField(member);
  return fieldSpan(member, field) / standingDepth(member.section);
}
