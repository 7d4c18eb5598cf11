export * from './beam.ts';
export { beamFault, MOST_LOADS, MOST_SPANS } from './fault.ts';
export type { Extreme, Quantity, Response } from './response.ts';
export { type BeamSolution, solveBeam } from './solve.ts';
