import { moneyText } from '../explore/buying/money.ts';
import { gradeWord, hasSize } from '../explore/rack/rack.ts';
import type { RankedSize } from '../explore/rack/ranked.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import type { Reach } from '../explore/reach/reach.ts';
import {
  showInches,
  showRatio,
  showSpan,
  showSpanDown,
  weightNumber,
  weightUnit,
} from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import type { TableColumn, TableRow } from './panels/table.ts';
import { memberOf, type State, unitsOf } from './state.ts';

/** The longest span of every size of the rack, and what stops it there. */
export interface ReachView {
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
  /** Index of the lit size, -1 where there is none, and of the one at hand. */
  readonly lit: number;
  readonly current: number;
}

export function reachView(state: State): ReachView {
  const member = memberOf(state);
  const units = unitsOf(state);
  const { rack, reaches } = answerOf(member, rankingOf(state.session));
  const mixed = rack.woods.length > 1;
  const priced = rack.sizes.some((each) => each.price !== null);
  const storey = member.headroom != null;
  const current = rack.sizes.findIndex(({ size }) => hasSize(member, size));
  const reachText = (reach: Reach | null) =>
    reach === null ? '' : reach.span === 0 ? 'none' : showSpanDown(reach.span, units);
  return {
    lit: rack.lit,
    current,
    columns: [
      { head: 'size', align: 'left' },
      ...(mixed ? [{ head: 'wood', align: 'left' } as const] : []),
      { head: weightUnit(units), align: 'right' },
      { head: 'reach', align: 'right' },
      { head: 'stopped there by', align: 'left' },
      { head: 'ratio now', align: 'right', spare: 3 },
      ...(priced ? [{ head: 'price', align: 'right', spare: 1 } as const] : []),
      ...(storey ? [{ head: 'clear', align: 'right', spare: 2 } as const] : []),
      { head: 'as a choice', align: 'left', spare: 4 },
    ],
    rows: rack.sizes.map((each, at): TableRow => {
      const reach = reaches.at(at);
      return {
        cells: [
          each.size.label,
          ...(mixed ? [gradeWord(each.size.stock)] : []),
          weightNumber(each.weight, units),
          reachText(reach),
          reach?.stops == null ? '' : CHECK_WORD[reach.stops],
          each.refused === null ? showRatio(each.worst) : '',
          ...(priced ? [each.price === null ? 'none' : moneyText(each.price)] : []),
          ...(storey ? [each.clear === null ? '' : showSpan(each.clear, units)] : []),
          choiceText(each, (over) => showInches(over, units)),
        ],
        style:
          at === current
            ? 'nowStrong'
            : at === rack.lit
              ? 'strong'
              : each.passes && each.inYard !== false
                ? 'plain'
                : 'quiet',
      };
    }),
  };
}

/** What keeps a size from being a choice, or makes it one of the few: empty where it is neither. */
function choiceText(each: RankedSize, inches: (over: number) => string): string {
  if (each.over > 0) return `over by ${inches(each.over)}`;
  if (each.refused !== null) return refusedWord(each.refused);
  if (each.inYard === false) return 'not in the yard';
  return each.nonDominated ? 'none lighter and shallower' : '';
}
