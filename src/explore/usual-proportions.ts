import type { Member } from '../timber/member.ts';

/** A stretch of l/h that is usual. */
export interface Band {
  readonly label: string;
  /** 0: from the beginning of the axis. */
  readonly from: number;
  readonly to: number;
  readonly source: string;
}

const PRACTICE = 'common practice, no source';

/** Usual l/h of timber. */
const TIMBER_BANDS: readonly Band[] = [
  { label: 'joists', from: 16, to: 24, source: PRACTICE },
  { label: 'girders', from: 10, to: 16, source: PRACTICE },
  { label: 'glulam', from: 14, to: 20, source: PRACTICE },
];

/** Largest l/h of concrete beams whose deflection is not calculated (ACI 318-19 Table 9.3.1.1, from memory). */
const CONCRETE = { simple: 16, oneEndContinuous: 18.5, bothEndsContinuous: 21, cantilever: 8 } as const;

/** What is usual of timber, and of concrete under the same supports. */
export function usualBands(member: Member): Band[] {
  const source = 'ACI 318 Table 9.3.1.1, from memory';
  return [...TIMBER_BANDS, { label: 'concrete', from: 0, to: concreteLimit(member), source }];
}

/** By the supports of the member as a whole; of several spans the end ones decide. */
function concreteLimit({ beam }: Member): number {
  if (beam.supports === 'cantilever') return CONCRETE.cantilever;
  if (beam.fixed.left && beam.fixed.right) return CONCRETE.bothEndsContinuous;
  const continuous = beam.spans.length > 1 || beam.fixed.left || beam.fixed.right;
  return continuous ? CONCRETE.oneEndContinuous : CONCRETE.simple;
}
