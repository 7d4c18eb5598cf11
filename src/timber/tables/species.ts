/** Names of species groups as the NDS Supplement writes them. */
export const DF_L = 'Douglas Fir-Larch';
export const DF_L_NORTH = 'Douglas Fir-Larch (North)';
export const DF_SOUTH = 'Douglas Fir-South';
export const HEM_FIR = 'Hem-Fir';
export const HEM_FIR_NORTH = 'Hem-Fir (North)';
export const SPF = 'Spruce-Pine-Fir';
export const SPF_SOUTH = 'Spruce-Pine-Fir (South)';
export const CEDARS = 'Western Cedars';
export const SP = 'Southern Pine';

/** Glulam of any softwood but Southern Pine: its widths and its volume factor go by these two groups. */
export const WESTERN = 'Western species';

/** The trade's short names; a species that is not here is written out. */
export const SHORT_SPECIES: Readonly<Record<string, string>> = {
  [DF_L]: 'DF-L',
  [DF_L_NORTH]: 'DF-L(N)',
  [DF_SOUTH]: 'DF-S',
  [HEM_FIR]: 'HF',
  [HEM_FIR_NORTH]: 'HF(N)',
  [SPF]: 'SPF',
  [SPF_SOUTH]: 'SPF-S',
  [CEDARS]: 'WC',
  [SP]: 'SP',
};
