import { CHECKED, type LumberRow, lumberRows, type SizeClass } from './row.ts';
import { SP } from './species.ts';

const TO_4: SizeClass = { text: '2-4 in thick, 2-4 in wide', thickness: [2, 4], depth: [2, 4], shape: null };
const TO_6: SizeClass = { text: '2-4 in thick, 5-6 in wide', thickness: [2, 4], depth: [5, 6], shape: null };
const AT_8: SizeClass = { text: '2-4 in thick, 8 in wide', thickness: [2, 4], depth: [8, 8], shape: null };
const AT_10: SizeClass = {
  text: '2-4 in thick, 10 in wide',
  thickness: [2, 4],
  depth: [10, 10],
  shape: null,
};
/** Deeper than 12 in takes this row and CF 0.9 (Table 4B, size factor note). */
const FROM_12: SizeClass = {
  text: '2-4 in thick, 12 in wide',
  thickness: [2, 4],
  depth: [12, Infinity],
  shape: null,
};

/** Visually graded Southern Pine dimension lumber (Table 4B): the size effect is in the rows. Fb, Ft, Fv, Fcperp, Fc, E, Emin, G. */
export const SOUTHERN_PINE: readonly LumberRow[] = lumberRows('NDS Supplement 2018 Table 4B', [
  [SP, 'Select Structural', TO_4, 2350, 1650, 175, 565, 1900, 1.8e6, 0.66e6, 0.55, CHECKED],
  [SP, 'Select Structural', TO_6, 2100, 1450, 175, 565, 1800, 1.8e6, 0.66e6, 0.55, CHECKED],
  [SP, 'Select Structural', AT_8, 1950, 1350, 175, 565, 1700, 1.8e6, 0.66e6, 0.55, CHECKED],
  [SP, 'Select Structural', AT_10, 1700, 1150, 175, 565, 1650, 1.8e6, 0.66e6, 0.55, CHECKED],
  [SP, 'Select Structural', FROM_12, 1600, 1100, 175, 565, 1650, 1.8e6, 0.66e6, 0.55, CHECKED],
  [SP, 'No.1', TO_4, 1500, 1000, 175, 565, 1650, 1.6e6, 0.58e6, 0.55, CHECKED],
  [SP, 'No.1', TO_6, 1350, 875, 175, 565, 1550, 1.6e6, 0.58e6, 0.55, CHECKED],
  [SP, 'No.1', AT_8, 1250, 800, 175, 565, 1500, 1.6e6, 0.58e6, 0.55, CHECKED],
  [SP, 'No.1', AT_10, 1050, 700, 175, 565, 1450, 1.6e6, 0.58e6, 0.55, CHECKED],
  [SP, 'No.1', FROM_12, 1000, 650, 175, 565, 1400, 1.6e6, 0.58e6, 0.55, CHECKED],
  [SP, 'No.2', TO_4, 1100, 675, 175, 565, 1450, 1.4e6, 0.51e6, 0.55, CHECKED],
  [SP, 'No.2', TO_6, 1000, 600, 175, 565, 1400, 1.4e6, 0.51e6, 0.55, CHECKED],
  [SP, 'No.2', AT_8, 925, 550, 175, 565, 1350, 1.4e6, 0.51e6, 0.55, CHECKED],
  [SP, 'No.2', AT_10, 800, 475, 175, 565, 1300, 1.4e6, 0.51e6, 0.55, CHECKED],
  [SP, 'No.2', FROM_12, 750, 450, 175, 565, 1250, 1.4e6, 0.51e6, 0.55, CHECKED],
  [SP, 'No.3', TO_4, 650, 400, 175, 565, 850, 1.3e6, 0.47e6, 0.55, CHECKED],
  [SP, 'No.3', TO_6, 575, 350, 175, 565, 800, 1.3e6, 0.47e6, 0.55, CHECKED],
  [SP, 'No.3', AT_8, 525, 325, 175, 565, 775, 1.3e6, 0.47e6, 0.55, CHECKED],
  [SP, 'No.3', AT_10, 475, 275, 175, 565, 750, 1.3e6, 0.47e6, 0.55, CHECKED],
  [SP, 'No.3', FROM_12, 450, 250, 175, 565, 725, 1.3e6, 0.47e6, 0.55, CHECKED],
]);
