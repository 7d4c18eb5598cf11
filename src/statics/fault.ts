import { type Beam, type BeamLoad, beamLength } from './beam.ts';

/** A member has at most this many spans (the session file's limit). */
export const MOST_SPANS = 6;
/** And carries at most this many loads. */
export const MOST_LOADS = 100;

/** Why a beam or its loads cannot be worked out, in plain words, or null when they can. Lengths in inches. */
export function beamFault(beam: Beam, loads: readonly BeamLoad[]): string | null {
  const { spans, overhangs, fixed } = beam;
  if (spans.length < 1) return 'a member needs at least one span';
  if (spans.length > MOST_SPANS) return `a member has at most ${MOST_SPANS} spans, not ${spans.length}`;
  for (const [i, span] of spans.entries()) {
    if (!(Number.isFinite(span) && span > 0)) return `span ${i + 1} must be longer than zero`;
  }
  for (const side of ['left', 'right'] as const) {
    if (!(Number.isFinite(overhangs[side]) && overhangs[side] >= 0)) {
      return `the ${side} overhang must be zero or more`;
    }
  }
  if (beam.supports === 'cantilever') {
    if (spans.length > 1) return `a cantilever has one span, not ${spans.length}`;
    if (overhangs.left > 0 || overhangs.right > 0)
      return 'a cantilever has no overhangs: its span is the free arm';
    if (fixed.right)
      return 'the right end of a cantilever is free; use bearings with both ends fixed instead';
  }
  if (loads.length > MOST_LOADS) return `a member carries at most ${MOST_LOADS} loads, not ${loads.length}`;
  const length = beamLength(beam);
  for (const [i, load] of loads.entries()) {
    const fault = loadFault(load, length);
    if (fault) return `load ${i + 1} ${fault}`;
  }
  return null;
}

/** A load typed to the member's end may exceed it by rounding of its units. */
const OVERRUN = 1e-9;

function loadFault(load: BeamLoad, length: number): string | null {
  const on = (x: number) => x >= 0 && x <= length * (1 + OVERRUN);
  if (load.type === 'point') {
    if (!Number.isFinite(load.load)) return 'has no finite size';
    return on(load.at) ? null : `stands at ${show(load.at)} in, off the member (0 to ${show(length)} in)`;
  }
  if (!(Number.isFinite(load.start) && Number.isFinite(load.end))) return 'has no finite size';
  if (!on(load.from) || !on(load.to)) {
    return `runs from ${show(load.from)} to ${show(load.to)} in, off the member (0 to ${show(length)} in)`;
  }
  if (!(load.from < load.to)) {
    return `runs from ${show(load.from)} to ${show(load.to)} in: its start must be left of its end`;
  }
  return null;
}

function show(x: number): string {
  return String(Math.round(x * 1000) / 1000);
}
