export * from './beam.ts';
export { combine, type Share } from './combine.ts';
export { beamFault, MOST_LOADS, MOST_SPANS } from './fault.ts';
export type { Extreme, Quantity, Response, Segment } from './response.ts';
export { type BeamSolution, solveBeam } from './solve.ts';
