/** Load kinds (ASCE 7) and the duration each brings. `wind` is downward, `windUp` upward, both given positive. */
export const LOAD_KINDS = ['dead', 'live', 'roofLive', 'snow', 'rain', 'wind', 'windUp'] as const;
export type LoadKind = (typeof LOAD_KINDS)[number];

/** Load duration factor CD by kind (NDS Table 2.3.2; rain as snow). The shortest duration of a combination governs. */
export const LOAD_DURATION: Readonly<Record<LoadKind, number>> = {
  dead: 0.9,
  live: 1.0,
  snow: 1.15,
  rain: 1.15,
  roofLive: 1.25,
  wind: 1.6,
  windUp: 1.6,
};

/** The letters that combinations are written with (ASCE 7 §2.2). */
export const KIND_LETTER: Readonly<Record<LoadKind, string>> = {
  dead: 'D',
  live: 'L',
  roofLive: 'Lr',
  snow: 'S',
  rain: 'R',
  wind: 'W',
  windUp: 'Wup',
};

/** The kinds in words. */
export const KIND_WORD: Readonly<Record<LoadKind, string>> = {
  dead: 'dead',
  live: 'live',
  roofLive: 'roof live',
  snow: 'snow',
  rain: 'rain',
  wind: 'wind',
  windUp: 'wind up',
};
