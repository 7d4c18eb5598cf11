import { MEMORY } from './row.ts';
import { SP } from './species.ts';

/** Reference design values of one stress class of glulam, psi, bending about the strong axis; G without unit. */
export interface GlulamRow {
  readonly grade: string;
  /** The species group that the class is made of alone; null: western species or Southern Pine. */
  readonly only: string | null;
  /** Tension side of the layup in tension (Fbx+). */
  readonly Fb: number;
  /** Compression side of the layup in tension (Fbx-). */
  readonly FbNeg: number;
  readonly Fcperp: number;
  readonly Fv: number;
  /** Apparent, about the strong axis. */
  readonly E: number;
  readonly Emin: number;
  /** About the weak axis. */
  readonly Ey: number;
  /** About the weak axis: lateral stability. */
  readonly EyMin: number;
  readonly G: number;
  readonly source: string;
  readonly status: string;
}

const SP_CLASS = 'from memory; Fcperp may be 805';

type GlulamLine = readonly [
  grade: string,
  only: string | null,
  Fb: number,
  FbNeg: number,
  Fcperp: number,
  Fv: number,
  E: number,
  Emin: number,
  Ey: number,
  EyMin: number,
  G: number,
  status: string,
];

const LINES: readonly GlulamLine[] = [
  ['16F-1.3E', null, 1600, 925, 315, 195, 1.3e6, 0.69e6, 1.1e6, 0.58e6, 0.42, MEMORY],
  ['20F-1.5E', null, 2000, 1100, 425, 195, 1.5e6, 0.79e6, 1.2e6, 0.63e6, 0.42, MEMORY],
  ['24F-1.7E', null, 2400, 1450, 500, 210, 1.7e6, 0.9e6, 1.3e6, 0.69e6, 0.42, MEMORY],
  ['24F-1.8E', null, 2400, 1450, 650, 265, 1.8e6, 0.95e6, 1.6e6, 0.85e6, 0.5, MEMORY],
  ['26F-1.9E', null, 2600, 1950, 650, 265, 1.9e6, 1.0e6, 1.6e6, 0.85e6, 0.5, MEMORY],
  ['28F-2.1E SP', SP, 2800, 2300, 740, 300, 2.1e6, 1.11e6, 1.7e6, 0.9e6, 0.55, SP_CLASS],
  ['30F-2.1E SP', SP, 3000, 2400, 740, 300, 2.1e6, 1.11e6, 1.7e6, 0.9e6, 0.55, SP_CLASS],
];

/** Structural glued laminated softwood (Table 5A). Fb, FbNeg, Fcperp, Fv, E, Emin, Ey, EyMin, G. */
export const GLULAM: readonly GlulamRow[] = LINES.map(
  ([grade, only, Fb, FbNeg, Fcperp, Fv, E, Emin, Ey, EyMin, G, status]) => ({
    grade,
    only,
    Fb,
    FbNeg,
    Fcperp,
    Fv,
    E,
    Emin,
    Ey,
    EyMin,
    G,
    source: 'NDS Supplement 2018 Table 5A',
    status,
  }),
);
