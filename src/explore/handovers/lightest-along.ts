import { beamFields } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';
import { BEST_WORD } from '../rack/best.ts';
import { type Rack, sizeName } from '../rack/rack.ts';
import type { RankedRack } from '../rack/ranked.ts';
import type { Reaches } from '../reach/reaches.ts';
import type { Around, Neighbour } from './handovers.ts';

/**
 * From which span to which the lit size is the best that passes, and its neighbours on either side, as a sentence;
 * null where nothing is lit, where several lengths move and one span would not say it, or where the order itself goes
 * with the span (prices: `aroundText` finds those). A size is the best from where the last better one stops reaching to
 * its own reach.
 */
export function lightestAlong(
  member: Member,
  rack: RankedRack,
  reaches: Reaches,
  show: (span: number) => string,
): string | null {
  const lit = rack.sizes[rack.lit];
  if (lit === undefined || rack.best === 'price') return null;
  if (beamFields(member.beam).length !== 1) return null;
  const reach = reaches.at(rack.lit);
  if (reach === null) return null;
  const beyond = (at: number, span: number) =>
    rack.sizes[at]!.inYard === false ? null : reaches.beyond(at, span);
  let from = 0;
  let below: string | null = null;
  // From the heaviest of the lighter ones, which are likely to reach the furthest; of equal reaches the lightest tells.
  for (let at = rack.lit - 1; at >= 0; at -= 1) {
    const further = beyond(at, from * JUST_BELOW)?.span ?? 0;
    if (further === 0 || further < from) continue;
    from = further;
    below = sizeName(rack, rack.sizes[at]!.size);
  }
  const next = rack.sizes.find((_, at) => at > rack.lit && beyond(at, reach.span) !== null);
  const above = next === undefined ? null : sizeName(rack, next.size);
  const range = below === null ? `up to ${show(reach.span)}` : `from ${show(from)} to ${show(reach.span)}`;
  return sentence(`${sizeName(rack, lit.size)} is ${BEST_WORD[rack.best]} ${range}`, below, above ?? 'none');
}

/** So that a size of just the same reach is looked at too. */
const JUST_BELOW = 1 - 1e-7;

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
