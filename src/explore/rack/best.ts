import type { Shop } from '../buying/yard.ts';

/** What counts as best, and so what the user wants least of. */
export const BESTS = ['weight', 'depth', 'boardFeet', 'price'] as const;
export type Best = (typeof BESTS)[number];

/** What the rack is ordered by, and what there is to buy. */
export interface Ranking {
  readonly best: Best;
  /** The yard list and prices; null where none is given. */
  readonly shop: Shop | null;
}

/** The lightest first, whatever the yard has: how it stands where a session says nothing. */
export const BY_WEIGHT: Ranking = { best: 'weight', shop: null };

/** What the best size is called. */
export const BEST_WORD = {
  weight: 'lightest',
  depth: 'shallowest',
  boardFeet: 'least wood',
  price: 'cheapest',
} as const satisfies Record<Best, string>;
export type BestWord = (typeof BEST_WORD)[Best];
