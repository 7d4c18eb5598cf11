import { fieldOfPiece } from '../../src/statics/grid.ts';
import { M0, M1, Q0, Q1, S0, STRIDE, V0, Y0 } from '../../src/statics/piece.ts';
import type { Response } from '../../src/statics/response.ts';
import type { BeamSolution } from '../../src/statics/solve.ts';

/** A piece of a response as polynomials: coefficients of 1, t, t² ... with t from `from`, in; at EI = 1. */
export interface Segment {
  readonly from: number;
  readonly to: number;
  /** Index of the field it lies in. */
  readonly field: number;
  readonly shear: readonly number[];
  readonly moment: readonly number[];
  readonly slope: readonly number[];
  readonly deflection: readonly number[];
}

/** The polynomials that the numbers at the left ends of the pieces stand for (see src/statics/piece.ts). */
export function segmentsOf({ grid, states: { data } }: Response): Segment[] {
  return Array.from({ length: grid.count }, (_, p) => {
    const [q0, q1, v, m, s, y] = [Q0, Q1, V0, M0, S0, Y0].map((which) => data[STRIDE * p + which]!) as [
      number,
      number,
      number,
      number,
      number,
      number,
    ];
    return {
      from: grid.edges[p]!,
      to: grid.edges[p + 1]!,
      field: fieldOfPiece(grid, p),
      shear: [v, -q0, -q1 / 2],
      moment: [m, v, -q0 / 2, -q1 / 6],
      slope: [s, -m, -v / 2, q0 / 6, q1 / 24],
      deflection: [y, s, -m / 2, -v / 6, q0 / 24, q1 / 120],
    };
  });
}

/** What each fixed end adds to the beam's moment on passing it from left to right, lb.in; 0 where it is not held. */
export function fixedMoments({ beam, fields }: BeamSolution, { grid, states: { data } }: Response) {
  const cantilever = beam.supports === 'cantilever';
  const leading = !cantilever && fields[0]!.kind === 'overhang' ? 1 : 0;
  const atStart = (f: number) => (f < fields.length ? data[STRIDE * grid.first[f]! + M0]! : 0);
  const atEnd = (f: number) => (f < 0 ? 0 : data[STRIDE * (grid.first[f + 1]! - 1) + M1]!);
  const last = leading + beam.spans.length - 1;
  return {
    left: cantilever || beam.fixed.left ? atStart(leading) - atEnd(leading - 1) : 0,
    right: beam.fixed.right ? atStart(last + 1) - atEnd(last) : 0,
  };
}
