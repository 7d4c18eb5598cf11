import type { Product } from './member.ts';
import { DIMENSION_LUMBER } from './tables/dimension-lumber.ts';
import { MACHINE_STRESS_RATED } from './tables/machine-stress-rated.ts';
import type { LumberRow } from './tables/row.ts';
import { SOUTHERN_PINE } from './tables/southern-pine.ts';
import { TIMBERS } from './tables/timbers.ts';

const LUMBER: readonly LumberRow[] = [...DIMENSION_LUMBER, ...SOUTHERN_PINE];

/** All rows of the tables of a sawn product; none for the others. */
export function rowsOf(product: Product): readonly LumberRow[] {
  if (product === 'dimension lumber') return LUMBER;
  if (product === 'machine stress rated') return MACHINE_STRESS_RATED;
  return product === 'timber' ? TIMBERS : [];
}
