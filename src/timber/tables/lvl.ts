/** Reference design values of laminated veneer lumber, joist-wise, psi; G without unit. */
export interface LvlRow {
  readonly grade: string;
  /** At a depth of 12 in. */
  readonly Fb: number;
  readonly Fv: number;
  readonly Fcperp: number;
  readonly E: number;
  readonly Emin: number;
  readonly G: number;
  readonly source: string;
  readonly status: string;
}

/**
 * LVL values are the maker's own, so no standard lists them. This one set is typical of what makers publish and
 * is marked as such wherever it is used; the values of the report in hand are typed over it.
 */
export const LVL: readonly LvlRow[] = [
  {
    grade: 'typical 2.0E',
    Fb: 2600,
    Fv: 285,
    Fcperp: 750,
    E: 2.0e6,
    Emin: 1.02e6,
    G: 0.5,
    source: 'typical LVL, not a product: type the values of the maker’s report',
    status: 'common practice, no source',
  },
];
