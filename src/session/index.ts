export { newMember, newSession } from './new-member.ts';
export { rankingOf } from './ranking.ts';
export { readSession } from './read.ts';
export { schemaJson } from './schema-json.ts';
export type { Session, SessionMember, SessionRead } from './session.ts';
export { readSessionWithSets } from './set-values.ts';
export { startingLoads, USUAL_LOADS, type UsualLoad } from './usual-loads.ts';
export { sessionDocument, writeSession } from './write.ts';
