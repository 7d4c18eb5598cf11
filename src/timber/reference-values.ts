/** Reference design values of a piece, psi; G and COV without unit. No adjustment factor is in them. */
export interface DesignValues {
  readonly Fb: number;
  /** Bending with the bottom of a glulam in compression and its top in tension; equal to Fb of other products. */
  readonly FbNeg: number;
  readonly Fv: number;
  readonly Fcperp: number;
  readonly E: number;
  readonly Emin: number;
  /** Emin about the weak axis, for lateral stability. */
  readonly EyMin: number;
  readonly G: number;
  /** Coefficient of variation of E (NDS Appendix F); null where it was not typed. */
  readonly COV: number | null;
  readonly source: string;
  readonly status: string;
}

/** Why there are no values. */
export interface Refusal {
  /** One line, with the nearest known name or the clause. */
  readonly refused: string;
}

/** Whether a look-up was refused. */
export function isRefusal(found: object): found is Refusal {
  return 'refused' in found;
}
