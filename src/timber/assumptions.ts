import type { LiveReduction } from '../loads/loading.ts';
import {
  HEAVY_LIVE_LOAD,
  LEAST_INFLUENCE_AREA,
  liveReductionFactor,
  reductionBar,
  SQ_IN_PER_SQ_FT,
} from '../loads/reduction.ts';
import { showQuantity, type Units } from '../quantity/index.ts';
import { FARTHEST_APART, REPETITIVE_PLIES } from './factors/repetitive.ts';
import { temperatureIn } from './factors/temperature.ts';
import { feetIn, inchesIn } from './factors/wording.ts';
import { borneText, linkText } from './link-words.ts';
import type { AssumedKey, Bracing, Member } from './member.ts';

/** Sentences on what the checks take for given: what nobody stated, that the top edge is held, what others bring. */
export function assumptionsOf(member: Member, units: Units = 'us'): string[] {
  const sentences: string[] = [];
  const { assumed } = member;
  // Stated or not, everything hangs on it: a floor that is not nailed down holds no edge.
  if (member.bracing === 'continuous' || assumed.includes('bracing'))
    sentences.push(edge('top', member.bracing, units));
  if (assumed.includes('bracingBottom')) sentences.push(edge('bottom', member.bracingBottom, units));
  for (const key of ['bearing', 'seasoned', 'service', 'temperature'] as const) {
    if (assumed.includes(key)) sentences.push(SENTENCE[key](member, units));
  }
  if (couldBeRepetitive(member)) sentences.push('not counted as repetitive, Cr 1');
  // Without area loads the width carries nothing.
  if (assumed.includes('tributary') && Object.values(member.area).some((load) => load > 0)) {
    sentences.push(`tributary width ${feetIn(member.tributary, units)}`);
  }
  if (member.slope !== 0) {
    sentences.push(
      'spans, live, snow and wind on plan; dead load along the slope; deflection square to it, over its length',
    );
  }
  if (member.liveReduction !== null) sentences.push(reduction(member.area.live, member.liveReduction, units));
  for (const link of member.links ?? []) {
    sentences.push(`carries ${linkText(link, units)}: ${borneText(link, units)}`);
  }
  return sentences;
}

/** Whether Cr is left out of a row of boards near enough to share load: nobody has stated that they do (NDS 4.3.9). */
function couldBeRepetitive({ stock: { product }, spacing, section, repetitive }: Member): boolean {
  const isBoard = product === 'dimension lumber' || product === 'machine stress rated';
  const isNear = spacing !== null && spacing <= FARTHEST_APART;
  return isBoard && isNear && section.plies < REPETITIVE_PLIES && !repetitive;
}

/** What became of the floor live-load reduction that was asked for. */
function reduction(live: number, asked: LiveReduction, units: Units): string {
  const { KLL, area } = asked;
  const served = `KLL ${KLL}, AT ${showQuantity('area', area, units)}`;
  switch (reductionBar(live, asked)) {
    case 'heavy': {
      const most = showQuantity('areaLoad', HEAVY_LIVE_LOAD / SQ_IN_PER_SQ_FT, units);
      return `floor live load not reduced: over ${most}, ASCE 7 4.7.3`;
    }
    case 'small': {
      const least = showQuantity('area', LEAST_INFLUENCE_AREA * SQ_IN_PER_SQ_FT, units);
      return `floor live load not reduced: ${served}, KLL AT under ${least}, ASCE 7 4.7.2`;
    }
    case null: {
      const part = round(liveReductionFactor(live, asked));
      return `floor live load taken at ${part} of it: ${served}, ASCE 7 4.7`;
    }
  }
}

function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}

const SENTENCE: Readonly<
  Record<
    Exclude<AssumedKey, 'bracing' | 'bracingBottom' | 'tributary'>,
    (member: Member, units: Units) => string
  >
> = {
  bearing: (member, units) => `bearings ${bearings(member, units)} long`,
  seasoned: (member) => (member.seasoned ? 'wood seasoned when built in' : 'wood not seasoned when built in'),
  service: (member) => (member.service === 'dry' ? 'dry in service' : 'wet in service'),
  temperature: (member, units) => `${temperatureIn(member.temperature, units)} in service`,
};

/** "3.5 in", "3.5, 5.5 in": each length once. */
function bearings({ bearing }: Member, units: Units): string {
  const texts = [...new Set(bearing.map((length) => inchesIn(length, units)))];
  const unit = texts[0]?.slice(texts[0].indexOf(' ')) ?? '';
  return texts.map((text) => text.slice(0, -unit.length)).join(', ') + unit;
}

function edge(name: string, bracing: Bracing, units: Units): string {
  if (bracing === 'continuous') return `${name} edge held throughout`;
  if (bracing === 'ends') return `${name} edge held at the supports only`;
  return `${name} edge held every ${inchesIn(bracing, units)}`;
}
