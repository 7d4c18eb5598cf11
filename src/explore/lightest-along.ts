import { beamFields } from '../statics/index.ts';
import type { Member } from '../timber/member.ts';
import { BEST_WORD } from './best.ts';
import type { Around, Neighbour } from './handovers.ts';
import { type Rack, sizeName } from './rack.ts';
import type { RankedRack } from './ranked.ts';
import type { Reach } from './reach.ts';

/**
 * From which span to which the lit size is the best that passes, and its neighbours on either side, as a sentence;
 * null where nothing is lit, where several lengths move and one span would not say it, or where the order itself goes
 * with the span (prices: `aroundText` finds those). A size is the best from where the last better one stops reaching to
 * its own reach.
 */
export function lightestAlong(
  member: Member,
  rack: RankedRack,
  reaches: readonly (Reach | null)[],
  show: (span: number) => string,
): string | null {
  const lit = rack.sizes[rack.lit];
  const reach = reaches[rack.lit];
  if (lit === undefined || reach == null || rack.best === 'price') return null;
  if (beamFields(member.beam).length !== 1) return null;
  const spanOf = (at: number) => (rack.sizes[at]!.inYard === false ? 0 : (reaches[at]?.span ?? 0));
  let from = 0;
  let below: string | null = null;
  for (let at = 0; at < rack.lit; at += 1) {
    if (spanOf(at) > from) {
      from = spanOf(at);
      below = sizeName(rack, rack.sizes[at]!.size);
    }
  }
  const next = rack.sizes.find((_, at) => at > rack.lit && spanOf(at) > reach.span);
  const above = next === undefined ? null : sizeName(rack, next.size);
  const range = below === null ? `up to ${show(reach.span)}` : `from ${show(from)} to ${show(reach.span)}`;
  return sentence(`${sizeName(rack, lit.size)} is ${BEST_WORD[rack.best]} ${range}`, below, above ?? 'none');
}

/** The same for any knob, from its neighbours; null where nothing is lit. `show` writes a value of the knob. */
export function aroundText(
  rack: RankedRack,
  { size, below, above }: Around,
  show: (value: number) => string,
): string | null {
  if (size === null) return null;
  const head = `${sizeName(rack, size)} is ${BEST_WORD[rack.best]}`;
  if (below === null && above === null) return `${head} throughout`;
  const from = below === null ? '' : ` from ${show(below.at)}`;
  const to = above === null ? '' : ` ${below === null ? 'up to' : 'to'} ${show(above.at)}`;
  const name = (neighbour: Neighbour | null) => neighbour && nameOf(rack, neighbour);
  return sentence(`${head}${from}${to}`, name(below), name(above));
}

function nameOf(rack: Pick<Rack, 'woods' | 'sizes'>, { size }: Neighbour): string {
  return size === null ? 'none' : sizeName(rack, size);
}

function sentence(head: string, below: string | null, above: string | null): string {
  const parts = [head, below && `below, ${below}`, above && `above, ${above}`];
  return parts.filter((part) => part !== null).join('; ');
}
