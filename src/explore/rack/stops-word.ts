import { showInches, type Units } from '../../quantity/index.ts';
import { CHECK_WORD } from '../../timber/words.ts';
import type { RankedSize } from './ranked.ts';
import { refusedWord } from './refused-word.ts';

/** What stops a size of the rack, or keeps it from being a choice, in a word or two; empty where nothing does. */
export function stopsWord({ refused, passes, governing, over, inYard }: RankedSize, units: Units): string {
  if (over > 0) return `over by ${showInches(over, units)}`;
  if (passes && inYard === false) return 'not in yard';
  if (refused !== null) return refusedWord(refused);
  return passes || governing === null ? '' : CHECK_WORD[governing];
}
