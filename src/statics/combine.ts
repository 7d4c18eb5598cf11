import { type Response, responseOf } from './response.ts';
import type { BeamSolution } from './solve.ts';
import { zeros } from './zeros.ts';

/** A response and how many times it counts. */
export interface Share {
  readonly response: Response;
  readonly factor: number;
}

/** The response to loads that are so many times others: their numbers added up. All must stand on the same grid. */
export function combine(solution: BeamSolution, shares: readonly [Share, ...Share[]]): Response {
  const { grid, states } = shares[0].response;
  const data = zeros(states.data.length);
  const reactions = zeros(states.reactions.length);
  for (const { response, factor } of shares) {
    if (response.grid.count !== grid.count)
      throw new RangeError('responses on different grids cannot be added');
    const other = response.states;
    for (let i = 0; i < data.length; i++) data[i]! += factor * other.data[i]!;
    for (let i = 0; i < reactions.length; i++) reactions[i]! += factor * other.reactions[i]!;
  }
  return responseOf(solution, grid, { data, reactions });
}
