import type { BeamLoad } from '../statics/beam.ts';
import type { LoadKind } from './kinds.ts';
import type { AppliedLoad, Loading } from './loading.ts';
import { liveReductionFactor } from './reduction.ts';
import { slopeStretch } from './slope.ts';

/**
 * Line load over the whole member that a kind's area load brings, lb/in on plan, as given (wind up positive):
 * area x tributary width, live reduced where asked, dead turned from the slope to plan.
 */
export function areaToLine(loading: Loading, kind: LoadKind): number {
  const line = loading.area[kind] * loading.tributary;
  if (line === 0) return 0;
  if (kind === 'live') return line * liveReductionFactor(loading.area.live, loading.liveReduction);
  if (kind === 'dead') return line * slopeStretch(loading.slope);
  return line;
}

/** Sign of a kind's load: wind up is given positive and acts upward. */
export function kindSign(kind: LoadKind): 1 | -1 {
  return kind === 'windUp' ? -1 : 1;
}

/** A typed load as the plan beam feels it: downward positive, dead line loads turned from the slope to plan. */
export function planLoad(load: AppliedLoad, slope: number): BeamLoad {
  const factor =
    kindSign(load.kind) * (load.kind === 'dead' && load.type === 'line' ? slopeStretch(slope) : 1);
  if (factor === 1) return load;
  if (load.type === 'point') return { type: 'point', at: load.at, load: factor * load.load };
  return { type: 'line', from: load.from, to: load.to, start: factor * load.start, end: factor * load.end };
}
