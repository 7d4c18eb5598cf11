import type { CheckId } from './report.ts';

/** Checks as the screen and the tables name them. */
export const CHECK_WORD: Readonly<Record<CheckId, string>> = {
  shear: 'shear',
  bending: 'bending',
  'bending-hogging': 'hogging',
  'deflection-live': 'deflection',
  'deflection-total': 'total defl.',
  bearing: 'bearing',
  slenderness: 'slenderness',
  uplift: 'uplift',
  notch: 'notch',
};

/** The checks at the beginning of a sentence. */
export const CHECK_SUBJECT: Readonly<Record<CheckId, string>> = {
  shear: 'Shear',
  bending: 'Bending',
  'bending-hogging': 'Upward bending',
  'deflection-live': 'Live deflection',
  'deflection-total': 'Total deflection',
  bearing: 'Bearing',
  slenderness: 'Slenderness',
  uplift: 'Uplift',
  notch: 'The notch',
};
