/** What a number stands for. Base units: length in, areaLoad psi, lineLoad lb/in, pointLoad lb, stress psi, area in². */
export const QUANTITY_KINDS = [
  'length',
  'areaLoad',
  'lineLoad',
  'pointLoad',
  'stress',
  'area',
  'number',
] as const;
export type QuantityKind = (typeof QUANTITY_KINDS)[number];

/** US customary or SI, for what is shown and written; both are always read. */
export type Units = 'us' | 'si';

/** How faults call a kind. */
export const KIND_NAMES: Readonly<Record<QuantityKind, string>> = {
  length: 'a length',
  areaLoad: 'an area load',
  lineLoad: 'a line load',
  pointLoad: 'a point load',
  stress: 'a stress',
  area: 'an area',
  number: 'a number',
};

/** What would be right, for faults and hints. */
export const KIND_EXAMPLES: Readonly<Record<QuantityKind, string>> = {
  length: `14 ft, 14'-6 1/2", 9.25 in or 4.42 m`,
  areaLoad: '40 psf or 1.9 kPa',
  lineLoad: '600 plf or 8.8 kN/m',
  pointLoad: '1200 lb, 1.2 kip or 5 kN',
  stress: '900 psi or 6.2 MPa',
  area: '600 ft2 or 56 m2',
  number: '360',
};
