import type { AssumedKey, Member } from '../../timber/member.ts';

/** What was assumed by default, less what is now stated. */
export function stated(member: Member, key: AssumedKey): AssumedKey[] {
  return member.assumed.filter((each) => each !== key);
}
