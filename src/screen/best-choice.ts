import { BEST_WORD } from '../explore/rack/best.ts';
import { bestChoices, rankingOf } from '../session/index.ts';
import { refused, type State, withSession } from './state.ts';

/** The state with the next measure counting as best; price alone is passed over where nothing has one. */
export function nextBest(state: State): State {
  const { best } = rankingOf(state.session);
  const choices = bestChoices(state.session);
  const next = choices[(choices.indexOf(best) + 1) % choices.length]!;
  if (next === best) return refused(state, 'there is nothing else to choose by');
  const text = `best is now the ${WORD[next]}; rack, lit size, moves and handovers follow`;
  return {
    ...withSession(state, { ...state.session, best: next }),
    ghost: state.ghost,
    notice: { text, refusal: false },
  };
}

const WORD = { ...BEST_WORD, boardFeet: 'least wood (board feet)' } as const;
