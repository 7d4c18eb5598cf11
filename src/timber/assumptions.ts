import { liveReductionFactor } from '../loads/reduction.ts';
import type { AssumedKey, Bracing, Member } from './member.ts';

/** Sentences on what the checks take for given: what nobody stated, and that the top edge is held. */
export function assumptionsOf(member: Member): string[] {
  const sentences: string[] = [];
  const { assumed } = member;
  // Stated or not, everything hangs on it: a floor that is not nailed down holds no edge.
  if (member.bracing === 'continuous' || assumed.includes('bracing'))
    sentences.push(edge('top', member.bracing));
  if (assumed.includes('bracingBottom')) sentences.push(edge('bottom', member.bracingBottom));
  for (const key of ['bearing', 'seasoned', 'service', 'temperature'] as const) {
    if (assumed.includes(key)) sentences.push(SENTENCE[key](member));
  }
  if (member.slope !== 0) {
    sentences.push(
      'spans, live, snow and wind on plan; dead load along the slope; deflection square to it, over its length',
    );
  }
  const reduced = liveReductionFactor(member.area.live, member.liveReduction);
  if (member.liveReduction !== null) {
    const { KLL, area } = member.liveReduction;
    const served = Math.round(area / SQUARE_FOOT);
    sentences.push(
      `floor live load taken at ${round(reduced)} of it: KLL ${KLL}, AT ${served} ft2, ASCE 7 4.7`,
    );
  }
  return sentences;
}

const SQUARE_FOOT = 144;

function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}

const SENTENCE: Readonly<
  Record<Exclude<AssumedKey, 'bracing' | 'bracingBottom'>, (member: Member) => string>
> = {
  bearing: (member) => `bearings ${[...new Set(member.bearing)].join(', ')} in long`,
  seasoned: (member) => (member.seasoned ? 'wood seasoned when built in' : 'wood not seasoned when built in'),
  service: (member) => (member.service === 'dry' ? 'dry in service' : 'wet in service'),
  temperature: (member) =>
    member.temperature === 'normal' ? 'at most 100 F in service' : `${member.temperature} in service`,
};

function edge(name: string, bracing: Bracing): string {
  if (bracing === 'continuous') return `${name} edge held throughout`;
  if (bracing === 'ends') return `${name} edge held at the supports only`;
  return `${name} edge held every ${bracing} in`;
}
