import { beamFields } from '../statics/beam.ts';
import { kindSign } from './area-to-line.ts';
import { LOAD_KINDS, type LoadKind } from './kinds.ts';
import type { AppliedLoad, Link, Loading } from './loading.ts';
import { PARTIAL_SNOW, SPAN_BY_SPAN } from './patterns.ts';
import { slopeStretch } from './slope.ts';

/** Kinds whose reaction depends on the pattern: only they can lift as well as press. */
export const LIFTING_KINDS: readonly LoadKind[] = [...SPAN_BY_SPAN, 'snow'];

const NONE: readonly AppliedLoad[] = [];

/**
 * Everything that presses on a member beside its area loads: the loads typed on it and the largest that its links
 * bring by kind, which take part in its patterns with the span they lie on. Positive as typed loads are.
 */
export function loadsOf(loading: Loading): readonly AppliedLoad[] {
  const { links = [], loads } = loading;
  if (links.length === 0) return loads;
  return [...loads, ...links.flatMap((link) => carriedLoads(link, loading))];
}

/** What one link brings at its largest, a load a kind; none while that has not been worked out. */
export function carriedLoads(link: Link, loading: Loading): AppliedLoad[] {
  return LOAD_KINDS.flatMap((kind) => {
    const borne = link.bears?.[kind];
    if (borne === undefined) return [];
    const force = LIFTING_KINDS.includes(kind) ? Math.max(0, borne.max) : borne.max;
    return force === 0 ? [] : [placed(link, kind, kindSign(kind) * force, loading)];
  });
}

/**
 * What its links lift a member with where their patterns turn a reaction upward: negative loads that are there or not
 * whatever else is, each as much as takes the reaction from the least that the member's own patterns leave of it down
 * to its smallest. Reactions that only press need none.
 */
export function liftsOf(loading: Loading): readonly AppliedLoad[] {
  const { links = [] } = loading;
  if (links.length === 0) return NONE;
  const leastSnow = beamFields(loading.beam).length > 1 ? PARTIAL_SNOW : 1;
  return links.flatMap((link) =>
    LIFTING_KINDS.flatMap((kind) => {
      const borne = link.bears?.[kind];
      if (borne === undefined || borne.min >= 0) return [];
      const left = kind === 'snow' ? leastSnow * Math.max(0, borne.max) : 0;
      return [placed(link, kind, borne.min - left, loading)];
    }),
  );
}

/** A force, lb, where its link lands. Repeated ones are spread on plan, so that nothing of them lies along the slope. */
function placed(link: Link, kind: LoadKind, force: number, { slope }: Loading): AppliedLoad {
  if (link.type === 'point') return { type: 'point', kind, at: link.at, load: force };
  const line = force / link.every / (kind === 'dead' ? slopeStretch(slope) : 1);
  return { type: 'line', kind, from: link.from, to: link.to, start: line, end: line };
}
