import { type LumberRow, lumberRows, OF_SPECIES, type SizeClass } from './row.ts';
import { DF_L, HEM_FIR, SPF } from './species.ts';

const ANY: SizeClass = {
  text: '2 in and less thick, 2 in and wider',
  thickness: [0, 2],
  depth: [2, Infinity],
  shape: null,
};

/** Machine stress rated lumber (Table 4C). Fb, Ft, Fv, Fcperp, Fc, E, Emin, G. */
export const MACHINE_STRESS_RATED: readonly LumberRow[] = lumberRows('NDS Supplement 2018 Table 4C', [
  [DF_L, '1650f-1.5E', ANY, 1650, 1020, 180, 625, 1700, 1.5e6, 0.76e6, 0.5, OF_SPECIES],
  [DF_L, '1800f-1.6E', ANY, 1800, 1175, 180, 625, 1750, 1.6e6, 0.81e6, 0.5, OF_SPECIES],
  [DF_L, '2100f-1.8E', ANY, 2100, 1575, 180, 625, 1875, 1.8e6, 0.91e6, 0.5, OF_SPECIES],
  [DF_L, '2400f-2.0E', ANY, 2400, 1925, 180, 625, 1975, 2e6, 1.02e6, 0.5, OF_SPECIES],
  [HEM_FIR, '1650f-1.5E', ANY, 1650, 1020, 150, 405, 1700, 1.5e6, 0.76e6, 0.43, OF_SPECIES],
  [HEM_FIR, '1800f-1.6E', ANY, 1800, 1175, 150, 405, 1750, 1.6e6, 0.81e6, 0.43, OF_SPECIES],
  [HEM_FIR, '2100f-1.8E', ANY, 2100, 1575, 150, 405, 1875, 1.8e6, 0.91e6, 0.43, OF_SPECIES],
  [HEM_FIR, '2400f-2.0E', ANY, 2400, 1925, 150, 405, 1975, 2e6, 1.02e6, 0.43, OF_SPECIES],
  [SPF, '1650f-1.5E', ANY, 1650, 1020, 135, 425, 1700, 1.5e6, 0.76e6, 0.42, OF_SPECIES],
  [SPF, '1800f-1.6E', ANY, 1800, 1175, 135, 425, 1750, 1.6e6, 0.81e6, 0.42, OF_SPECIES],
  [SPF, '2100f-1.8E', ANY, 2100, 1575, 135, 425, 1875, 1.8e6, 0.91e6, 0.42, OF_SPECIES],
  [SPF, '2400f-2.0E', ANY, 2400, 1925, 135, 425, 1975, 2e6, 1.02e6, 0.42, OF_SPECIES],
]);
