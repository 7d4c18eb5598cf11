import { kindAnalysis, type LoadKind, reactionRange } from '../../loads/index.ts';
import { supportPlaces } from '../../statics/beam.ts';
import type { Member } from '../member.ts';
import type { Analysed, KindAnalysis, Reaction } from '../report.ts';

/** Analyses a member of own weight `w`, lb/in, and stiffness `EI`, lb.in². */
export function analyse(member: Member, w: number, EI: number): Analysed {
  const kinds = kindAnalysis(member, w);
  const ranges = reactionRange(member, w);
  const analysis: Partial<Record<LoadKind, KindAnalysis>> = {};
  for (const { kind, shear, momentMax, momentMin, deflection } of kinds) {
    analysis[kind] = { shear, momentMax, momentMin, deflection: deflection / EI };
  }
  const reactions = supportPlaces(member.beam).map((at, support): Reaction => {
    const byKind: Partial<Record<LoadKind, number>> = {};
    for (const { kind, reactions } of kinds) byKind[kind] = reactions[support]!;
    return { support, at, byKind, ...ranges[support]! };
  });
  return { reactions, analysis };
}
