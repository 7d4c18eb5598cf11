import type { Combination } from '../../loads/effects.ts';
import type { LoadKind } from '../../loads/kinds.ts';
import { LOAD_DURATION } from '../../loads/kinds.ts';

const NAME: Readonly<Record<LoadKind, string>> = {
  dead: 'dead',
  live: 'floor live',
  roofLive: 'roof live',
  snow: 'snow',
  rain: 'rain',
  wind: 'wind',
  windUp: 'wind',
};

/** Why CD has its value: the shortest duration in the combination (NDS 2.3.2). */
export function loadDurationReason(combination: Combination): string {
  for (const kind of Object.keys(combination.factors) as LoadKind[]) {
    if (combination.factors[kind] && LOAD_DURATION[kind] === combination.duration) {
      return `${NAME[kind]} is the shortest load in ${combination.label}, NDS Table 2.3.2`;
    }
  }
  return `${combination.label}, NDS Table 2.3.2`;
}
