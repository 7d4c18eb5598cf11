import { KIND_WORD, LOAD_KINDS, type LoadKind } from '../../loads/kinds.ts';
import { showInches, showQuantity, showSpan } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';
import { endKnobs, LONGEST, lengthKnobs } from './beam.ts';
import { CONDITION_KNOBS } from './condition.ts';
import { headroomKnobs } from './headroom.ts';
import { type Knob, measureKnob, SCALES } from './knob.ts';
import { limitKnobs } from './limit.ts';
import { linkKnobs } from './link.ts';
import { loadKnobs } from './load.ts';
import { stated } from './stated.ts';
import { grade, plies, sectionDepth, sectionWidth, species } from './stock.ts';
import { bearingKnobs, supportKnobs } from './support.ts';
import { UNBRACED_BOTTOM, UNBRACED_TOP } from './unbraced.ts';

const FOOT = 12;

/**
 * Every knob of a member in the order it is spoken of: how long, how deep, what it carries, what it stands on, how it
 * is braced, how stiff it must be, of what wood; then what is seldom touched.
 */
export function knobsOf(member: Member): Knob[] {
  return [
    ...lengthKnobs(member),
    sectionDepth,
    sectionWidth,
    plies,
    ...AREA_KNOBS.filter(({ kind }) => isShownFirst(member, kind)).map(({ knob }) => knob),
    member.spacing === null ? tributary : spacing,
    ...loadKnobs(member),
    ...linkKnobs(member),
    ...supportKnobs(member),
    UNBRACED_TOP,
    LIMIT_LIVE,
    LIMIT_TOTAL,
    grade,
    species,
    ...endKnobs(member),
    ...bearingKnobs(member),
    ...AREA_KNOBS.filter(({ kind }) => !isShownFirst(member, kind)).map(({ knob }) => knob),
    UNBRACED_BOTTOM,
    ...CONDITION_KNOBS,
    ...limitKnobs(member),
    ...headroomKnobs(member),
  ];
}

/** Load kinds of the everyday job: their knobs stand with the first ones even where they hold nothing. */
const EVERYDAY: readonly LoadKind[] = ['dead', 'live', 'roofLive', 'snow'];
const AREA_KNOBS = LOAD_KINDS.map((kind) => ({ kind, knob: areaKnob(kind) }));

function isShownFirst(member: Member, kind: LoadKind): boolean {
  return EVERYDAY.includes(kind) || member.area[kind] > 0;
}

function areaKnob(kind: LoadKind): Knob {
  const PSF = 1 / 144;
  return measureKnob({
    key: `area.${kind}`,
    label: KIND_WORD[kind],
    kind: 'areaLoad',
    scale: SCALES.areaLoad,
    least: 0,
    most: 1000 * PSF,
    get: (member) => member.area[kind],
    put: (member, value) => ({ ...member, area: { ...member.area, [kind]: value } }),
    show: (value, units) => showQuantity('areaLoad', value, units),
  });
}

const tributary = measureKnob({
  key: 'tributary',
  label: 'tributary',
  kind: 'length',
  scale: SCALES.tributary,
  least: 0,
  most: LONGEST,
  get: (member) => member.tributary,
  put: (member, value) => ({ ...member, tributary: value, assumed: stated(member, 'tributary') }),
  show: showSpan,
});

const spacing = measureKnob({
  key: 'spacing',
  label: 'spacing',
  kind: 'length',
  scale: SCALES.spacing,
  least: 4,
  most: 20 * FOOT,
  get: (member) => member.spacing ?? member.tributary,
  put: (member, value) => ({
    ...member,
    spacing: value,
    tributary: value,
    assumed: stated(member, 'tributary'),
  }),
  show: showInches,
});

/** Stricter is more: a nudge to the right takes the limit from l/360 to l/420. */
function limit(which: 'live' | 'total'): Knob {
  return measureKnob({
    key: `limits.${which}`,
    label: `limit ${which}`,
    kind: 'number',
    scale: SCALES.limit,
    least: 60,
    most: 2000,
    get: (member) => member.limits[which],
    put: (member, value) => ({ ...member, limits: { ...member.limits, [which]: value } }),
    show: (value) => `l/${value}`,
  });
}

const LIMIT_LIVE = limit('live');
const LIMIT_TOTAL = limit('total');
