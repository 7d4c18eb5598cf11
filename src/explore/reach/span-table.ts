import type { Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import { rackOf } from '../rack/rack.ts';
import type { Reach } from './reach.ts';
import { reachesOf } from './reaches.ts';

/** Longest spans of the stock sizes of a grade at several spacings. */
export interface SpanTable {
  /** in */
  readonly spacings: readonly number[];
  readonly rows: readonly {
    readonly size: Size;
    /** lb/in */
    readonly weight: number;
    /** By spacing; null where the size is refused. */
    readonly reaches: readonly (Reach | null)[];
  }[];
}

/** The span table of the member's own wood under its loads, the tributary width equal to each spacing in turn. */
export function spanTable(
  member: Member,
  spacings: readonly number[],
  only: readonly CheckId[] | null = null,
): SpanTable {
  const columns = spacings.map((spacing) => {
    const at = { ...member, rack: null, spacing, tributary: spacing };
    const rack = rackOf(at, only);
    return { rack, reaches: reachesOf(at, rack, only) };
  });
  const rows = (columns[0]?.rack.sizes ?? []).map(({ size, weight }, row) => ({
    size,
    weight,
    // The order of a rack goes by weight and is the same at each spacing.
    reaches: columns.map(({ reaches }) => reaches[row] ?? null),
  }));
  return { spacings, rows };
}
