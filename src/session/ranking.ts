import type { Shop } from '../explore/buying/yard.ts';
import { BESTS, type Best, BY_WEIGHT, type Ranking } from '../explore/rack/best.ts';
import type { Session, YardList } from './session.ts';

const SHOPS = new WeakMap<object, { readonly prices: Session['prices']; readonly shop: Shop }>();
const RANKINGS = new WeakMap<Shop, Map<Best, Ranking>>();
const PLAIN = new Map<Best, Ranking>([['weight', BY_WEIGHT]]);

/** What counts as best in a session and what there is to buy; the same value while neither changes. */
export function rankingOf(session: Pick<Session, 'best' | 'yard' | 'prices'>): Ranking {
  const best = session.best ?? 'weight';
  const shop = shopOf(session.yard ?? null, session.prices);
  const known = shop === null ? PLAIN : (RANKINGS.get(shop) ?? new Map<Best, Ranking>());
  if (shop !== null) RANKINGS.set(shop, known);
  const ranking = known.get(best) ?? { best, shop };
  known.set(best, ranking);
  return ranking;
}

/** What may count as best in a session: price where something has one. */
export function bestChoices(session: Pick<Session, 'best' | 'yard' | 'prices'>): readonly Best[] {
  const { shop } = rankingOf(session);
  return BESTS.filter((each) => each !== 'price' || shop !== null);
}

/** A yard list whose file has not been read says nothing of what there is. */
function shopOf(yard: YardList | null, prices: Session['prices']): Shop | null {
  const rows = yard?.rows ?? null;
  const key = rows ?? prices;
  if (key === undefined || (rows === null && key.length === 0)) return null;
  const known = SHOPS.get(key);
  if (known !== undefined && known.prices === prices) return known.shop;
  const shop: Shop = { yard: rows, prices: prices ?? [] };
  SHOPS.set(key, { prices, shop });
  return shop;
}
