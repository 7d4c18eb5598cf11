export {
  freeName,
  fullFault,
  nameFault,
  readCount,
  textFault,
  toldName,
  withDuplicate,
  withMemberAfter,
  withMemberAt,
} from './edit-members.ts';
export { MEMBER_KINDS, type MemberKind, memberOfKind } from './member-kinds.ts';
export { newMember, newSession, USUAL_STOCK } from './new-member.ts';
export { bestChoices, rankingOf } from './ranking.ts';
export { readSession } from './read.ts';
export { schemaJson } from './schema-json.ts';
export type { Session, SessionMember, SessionRead } from './session.ts';
export { readSessionWithSets } from './set-values.ts';
export { startingLoads, USUAL_LOADS, type UsualLoad } from './usual-loads.ts';
export { sessionDocument, writeSession } from './write.ts';
