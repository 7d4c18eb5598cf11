export { borneText, endText, linkText } from '../../timber/link-words.ts';
export { couldCarry, withLink, withNextEnd, withOtherRepeat } from './edit.ts';
export { differsInBorneOnly, type Job, type JobMember, linksOf } from './job.ts';
export { type LinkFault, linkFault } from './link-fault.ts';
export { borneOf, resolved, supportOf } from './resolved.ts';
export { allCarriers, carriedBy, carriersOf, type Landing, renamed, whoLoses, withoutMember } from './who.ts';
