import type { Link } from '../loads/loading.ts';
import { type Units, writeQuantity } from '../quantity/index.ts';
import { keepEnd, keeper, keepRecords, present, type Raw } from './keep.ts';
import { BY_SPACING } from './schema.ts';

/** The `links` list of a member; undefined where there are none and the file had no list. */
export function writeLinks(
  links: readonly Link[],
  raw: unknown,
  before: readonly Link[] | undefined,
  units: Units,
): unknown {
  return keepRecords(raw, before?.map(asWritten), links.map(asWritten), (link, record, old) =>
    writeLink(link, record, old, units),
  );
}

/** What a link brings, or takes from the other member's spacing, is not written. */
export function asWritten(link: Link): Link {
  const own = { ...link, bears: null };
  return own.type === 'line' && own.bySpacing ? { ...own, every: 0 } : own;
}

function writeLink(link: Link, raw: unknown, old: Link | undefined, units: Units): Raw {
  const length = (value: number) => writeQuantity('length', value, units);
  const named = keeper<Pick<Link, 'member' | 'end'>>(raw, old, link);
  const from = { member: named('member', undefined), end: named('end', undefined) };
  if (link.type === 'point') {
    const of = keeper(raw, old?.type === 'point' ? old : undefined, link);
    return { ...from, at: of('at', undefined, length) };
  }
  const before = old?.type === 'line' ? old : undefined;
  const of = keeper(raw, before, link);
  return present({
    ...from,
    every: link.bySpacing ? BY_SPACING : of('every', undefined, length),
    from: keepEnd('from', raw, before, link, length),
    to: keepEnd('to', raw, before, link, length),
  });
}
