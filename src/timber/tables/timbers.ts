import { type LumberRow, lumberRows, MEMORY, type SizeClass } from './row.ts';
import { DF_L, HEM_FIR, SP } from './species.ts';

const BEAMS: SizeClass = {
  text: '5 in and thicker, depth more than 2 in over width',
  thickness: [5, Infinity],
  depth: [5, Infinity],
  shape: 'beams & stringers',
};
const POSTS: SizeClass = {
  text: '5x5 in and larger, depth not more than 2 in over width',
  thickness: [5, Infinity],
  depth: [5, Infinity],
  shape: 'posts & timbers',
};
const ALL: SizeClass = {
  text: '5x5 in and larger',
  thickness: [5, Infinity],
  depth: [5, Infinity],
  shape: null,
};

/** Visually graded timbers (Table 4D). Fb, Ft, Fv, Fcperp, Fc, E, Emin, G. */
export const TIMBERS: readonly LumberRow[] = lumberRows('NDS Supplement 2018 Table 4D', [
  [DF_L, 'Dense Select Structural', BEAMS, 1900, 1100, 170, 730, 1300, 1.7e6, 0.62e6, 0.5, MEMORY],
  [DF_L, 'Select Structural', BEAMS, 1600, 950, 170, 625, 1100, 1.6e6, 0.58e6, 0.5, MEMORY],
  [DF_L, 'Dense No.1', BEAMS, 1550, 775, 170, 730, 1100, 1.7e6, 0.62e6, 0.5, MEMORY],
  [DF_L, 'No.1', BEAMS, 1350, 675, 170, 625, 925, 1.6e6, 0.58e6, 0.5, MEMORY],
  [DF_L, 'No.2', BEAMS, 875, 425, 170, 625, 600, 1.3e6, 0.47e6, 0.5, MEMORY],
  [DF_L, 'Dense Select Structural', POSTS, 1750, 1150, 170, 730, 1350, 1.7e6, 0.62e6, 0.5, MEMORY],
  [DF_L, 'Select Structural', POSTS, 1500, 1000, 170, 625, 1150, 1.6e6, 0.58e6, 0.5, MEMORY],
  [DF_L, 'Dense No.1', POSTS, 1400, 950, 170, 730, 1200, 1.7e6, 0.62e6, 0.5, MEMORY],
  [DF_L, 'No.1', POSTS, 1200, 825, 170, 625, 1000, 1.6e6, 0.58e6, 0.5, MEMORY],
  [DF_L, 'No.2', POSTS, 750, 475, 170, 625, 700, 1.3e6, 0.47e6, 0.5, MEMORY],
  [HEM_FIR, 'Select Structural', BEAMS, 1300, 750, 140, 405, 925, 1.3e6, 0.47e6, 0.43, MEMORY],
  [HEM_FIR, 'No.1', BEAMS, 1050, 525, 140, 405, 750, 1.3e6, 0.47e6, 0.43, MEMORY],
  [HEM_FIR, 'No.2', BEAMS, 675, 350, 140, 405, 500, 1.1e6, 0.4e6, 0.43, MEMORY],
  [HEM_FIR, 'Select Structural', POSTS, 1200, 800, 140, 405, 975, 1.3e6, 0.47e6, 0.43, MEMORY],
  [HEM_FIR, 'No.1', POSTS, 975, 650, 140, 405, 850, 1.3e6, 0.47e6, 0.43, MEMORY],
  [HEM_FIR, 'No.2', POSTS, 575, 375, 140, 405, 575, 1.1e6, 0.4e6, 0.43, MEMORY],
  [SP, 'Select Structural', ALL, 1500, 1000, 165, 375, 950, 1.5e6, 0.55e6, 0.55, MEMORY],
  [SP, 'No.1', ALL, 1350, 900, 165, 375, 825, 1.5e6, 0.55e6, 0.55, MEMORY],
  [SP, 'No.2', ALL, 850, 550, 165, 375, 525, 1.2e6, 0.44e6, 0.55, MEMORY],
]);
