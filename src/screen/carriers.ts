import { differsInBorneOnly, linksOf } from '../explore/links/index.ts';
import { showRatio } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import type { State } from './state.ts';

/** Members looked at in one go, so that no key waits long. */
const AT_ONCE = 25;
/** Members named before "and more". */
const MOST_TOLD = 2;

/** The state after an event, its carriers to be looked at where what they bear changed. */
export function watching(before: State, after: State): State {
  const linked = after.session.members.some(({ member }) => linksOf(member).length > 0);
  if (before.session === after.session || !linked) return after;
  const first = before.watch?.before ?? before.session;
  return { ...after, watch: { before: first, seen: 0, told: [] } };
}

/** The state with the next carriers looked at; once all are, with what became of them on the foot line. */
export function watched(state: State): State {
  const { watch, ...rest } = state;
  if (watch === undefined) return state;
  const was = new Map(watch.before.members.map(({ member }) => [member.name, member]));
  const { members } = state.session;
  const told = [...watch.told];
  let { seen } = watch;
  for (let looked = 0; seen < members.length && looked < AT_ONCE; seen += 1) {
    const { member } = members[seen]!;
    const before = was.get(member.name);
    if (before === undefined || before === member || !differsInBorneOnly(before, member)) continue;
    looked += 1;
    const text = verdictChange(state, before, member);
    if (text !== null) told.push(text);
  }
  if (seen < members.length) return { ...state, watch: { ...watch, seen, told } };
  if (told.length === 0) return rest;
  const more = told.length - MOST_TOLD;
  const all = more > 0 ? [...told.slice(0, MOST_TOLD), `and ${more} more`] : told;
  const notice = [...(state.notice === null ? [] : [state.notice.text]), ...all].join('; ');
  return { ...rest, notice: { text: notice, refusal: false } };
}

/** "G1 now fails: bending 1.04"; null where it stands as it stood. */
function verdictChange(state: State, before: Member, now: Member): string | null {
  const ranking = rankingOf(state.session);
  const { passes, governing, worst } = answerOf(now, ranking);
  if (answerOf(before, ranking).passes === passes) return null;
  if (passes) return `${now.name} passes again`;
  return `${now.name} now fails: ${governing === null ? 'nothing to check' : `${CHECK_WORD[governing]} ${showRatio(worst)}`}`;
}
