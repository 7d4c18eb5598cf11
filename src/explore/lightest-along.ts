import type { Member } from '../timber/member.ts';
import type { Rack } from './rack.ts';
import type { Reach } from './reach.ts';

/**
 * From which span to which the lit size is the lightest that passes, and its neighbours on either side, as a
 * sentence; null where nothing is lit or nothing changes. A size is the lightest from where the last lighter
 * one stops reaching to its own reach.
 */
export function lightestAlong(
  member: Member,
  rack: Rack,
  reaches: readonly (Reach | null)[],
  show: (span: number) => string,
): string | null {
  const lit = rack.sizes[rack.lightest];
  const reach = reaches[rack.lightest];
  if (lit === undefined || reach == null || member.beam.spans.length !== 1) return null;
  let from = 0;
  let below: string | null = null;
  for (let at = 0; at < rack.lightest; at += 1) {
    const lighter = reaches[at];
    if (lighter != null && lighter.span > from) {
      from = lighter.span;
      below = rack.sizes[at]!.size.label;
    }
  }
  const above =
    rack.sizes.find((_, at) => at > rack.lightest && (reaches[at]?.span ?? 0) > reach.span)?.size.label ??
    null;
  const range = below === null ? `up to ${show(reach.span)}` : `from ${show(from)} to ${show(reach.span)}`;
  return [
    `${lit.size.label} is lightest ${range}`,
    below && `below, ${below}`,
    above === null ? 'above, none' : `above, ${above}`,
  ]
    .filter((part) => part !== null)
    .join('; ');
}
