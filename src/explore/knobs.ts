import { KIND_WORD, LOAD_KINDS, type LoadKind } from '../loads/kinds.ts';
import type { AppliedLoad } from '../loads/loading.ts';
import { showInches, showQuantity, showSpan, type Units } from '../quantity/index.ts';
import { beamFault } from '../statics/index.ts';
import type { AssumedKey, Bracing, Member } from '../timber/member.ts';
import { choiceKnob, type Knob, measureKnob, SCALES, stepped } from './knob.ts';
import { grade, plies, sectionDepth, sectionWidth, species } from './stock-knobs.ts';

const FOOT = 12;
/** Longest length worth exploring; reach stops here too. */
export const LONGEST = 100 * FOOT;
const SHORTEST = 1 * FOOT;

/** Every knob of a member, in the order they are listed. */
export function knobsOf(member: Member): Knob[] {
  const { beam } = member;
  const several = beam.spans.length > 1;
  return [
    ...beam.spans.map((_, index) => spanKnob(index, several)),
    ...overhangKnobs(member),
    sectionDepth,
    sectionWidth,
    plies,
    ...AREA_KNOBS.filter(({ kind }) => isShownFirst(member, kind)).map(({ knob }) => knob),
    ...member.loads.flatMap((load, index) => loadKnobs(load, index)),
    member.spacing === null ? tributary : spacing,
    bearing,
    UNBRACED_TOP,
    LIMIT_LIVE,
    LIMIT_TOTAL,
    grade,
    species,
    ...AREA_KNOBS.filter(({ kind }) => !isShownFirst(member, kind)).map(({ knob }) => knob),
    UNBRACED_BOTTOM,
    ...CONDITION_KNOBS,
  ];
}

/** Load kinds of the everyday job: their knobs stand with the first ones even where they hold nothing. */
const EVERYDAY: readonly LoadKind[] = ['dead', 'live', 'roofLive', 'snow'];
const AREA_KNOBS = LOAD_KINDS.map((kind) => ({ kind, knob: areaKnob(kind) }));

function isShownFirst(member: Member, kind: LoadKind): boolean {
  return EVERYDAY.includes(kind) || member.area[kind] > 0;
}

function spanKnob(index: number, several: boolean): Knob {
  return measureKnob({
    key: `spans.${index}`,
    label: several ? `span ${index + 1}` : 'span',
    kind: 'length',
    scale: SCALES.span,
    least: SHORTEST,
    most: LONGEST,
    get: (member) => member.beam.spans[index]!,
    put: (member, value) => ({
      ...member,
      beam: { ...member.beam, spans: member.beam.spans.map((span, at) => (at === index ? value : span)) },
    }),
    show: showSpan,
    check: loadsFit,
  });
}

/** A load that the shortened member would no longer reach stops the nudge. */
function loadsFit(member: Member): string | null {
  return beamFault(member.beam, member.loads);
}

function overhangKnobs(member: Member): Knob[] {
  if (member.beam.supports === 'cantilever') return [];
  return (['left', 'right'] as const)
    .filter((side) => member.beam.overhangs[side] > 0)
    .map((side) =>
      measureKnob({
        key: `overhangs.${side}`,
        label: `overhang ${side}`,
        kind: 'length',
        scale: SCALES.span,
        least: 0,
        most: LONGEST,
        get: (member) => member.beam.overhangs[side],
        put: (member, value) => ({
          ...member,
          beam: { ...member.beam, overhangs: { ...member.beam.overhangs, [side]: value } },
        }),
        show: showSpan,
        check: loadsFit,
      }),
    );
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

/** Size and place of one line or point load. */
function loadKnobs(load: AppliedLoad, index: number): Knob[] {
  const letter = `${KIND_WORD[load.kind]} ${load.type} ${index + 1}`;
  const change = (member: Member, part: Partial<AppliedLoad>): Member => ({
    ...member,
    loads: member.loads.map((old, at) => (at === index ? ({ ...old, ...part } as AppliedLoad) : old)),
  });
  const place = (key: 'at' | 'from' | 'to', label: string): Knob =>
    measureKnob({
      key: `loads.${index}.${key}`,
      label: `  ${label}`,
      kind: 'length',
      scale: SCALES.span,
      least: 0,
      most: 6 * LONGEST,
      get: (member) => (member.loads[index] as unknown as Record<string, number>)[key]!,
      put: (member, value) => change(member, { [key]: value }),
      show: showSpan,
      check: loadsFit,
    });
  if (load.type === 'point') {
    return [
      measureKnob({
        key: `loads.${index}.point`,
        label: letter,
        kind: 'pointLoad',
        scale: SCALES.pointLoad,
        least: 0,
        most: 1e6,
        get: (member) => (member.loads[index] as { load: number }).load,
        put: (member, value) => change(member, { load: value }),
        show: (value, units) => showQuantity('pointLoad', value, units),
      }),
      place('at', 'at'),
    ];
  }
  const end = (key: 'start' | 'end', label: string): Knob =>
    measureKnob({
      key: `loads.${index}.line.${key === 'start' ? 0 : 1}`,
      label,
      kind: 'lineLoad',
      scale: SCALES.lineLoad,
      least: 0,
      most: 1e5,
      get: (member) => (member.loads[index] as { start: number; end: number })[key],
      put: (member, value) => change(member, { [key]: value }),
      show: (value, units) => showQuantity('lineLoad', value, units),
    });
  const uniform = load.start === load.end;
  const both: Knob = measureKnob({
    key: `loads.${index}.line`,
    label: letter,
    kind: 'lineLoad',
    scale: SCALES.lineLoad,
    least: 0,
    most: 1e5,
    get: (member) => (member.loads[index] as { start: number }).start,
    put: (member, value) => change(member, { start: value, end: value }),
    show: (value, units) => showQuantity('lineLoad', value, units),
  });
  return [
    ...(uniform ? [both] : [end('start', letter), end('end', '  at its end')]),
    place('from', 'from'),
    place('to', 'to'),
  ];
}

const tributary = measureKnob({
  key: 'tributary',
  label: 'tributary',
  kind: 'length',
  scale: SCALES.tributary,
  least: 0,
  most: LONGEST,
  get: (member) => member.tributary,
  put: (member, value) => ({ ...member, tributary: value }),
  show: showSpan,
});

const spacing = measureKnob({
  key: 'spacing',
  label: 'spacing',
  kind: 'length',
  scale: {
    us: { ...SCALES.tributary.us, normal: 4, coarse: 40, bare: 'in', hint: '16, 16", 19.2', stepText: '4"' },
    si: { ...SCALES.tributary.si, bare: 'mm', hint: '400, 400mm, 16"' },
  },
  least: 4,
  most: 20 * FOOT,
  get: (member) => member.spacing ?? member.tributary,
  put: (member, value) => ({ ...member, spacing: value, tributary: value }),
  show: showInches,
});

/** One length for all bearings. */
const bearing = measureKnob({
  key: 'bearing',
  label: 'bearing',
  kind: 'length',
  scale: SCALES.section,
  least: 0.5,
  most: 24,
  get: (member) => member.bearing[0]!,
  put: (member, value) => ({
    ...member,
    bearing: member.bearing.map(() => value),
    assumed: stated(member, 'bearing'),
  }),
  show: showInches,
});

/** What was assumed by default, less what is now stated. */
function stated(member: Member, key: AssumedKey): AssumedKey[] {
  return member.assumed.filter((each) => each !== key);
}

function longestField(member: Member): number {
  return Math.max(...member.beam.spans, member.beam.overhangs.left, member.beam.overhangs.right);
}

/** Unbraced length of an edge: held throughout, then lengths, then held at the supports only. */
function unbraced(key: 'bracing' | 'bracingBottom', label: string): Knob {
  const put = (member: Member, value: Bracing): Member => ({
    ...member,
    [key]: value,
    assumed: stated(member, key),
  });
  const show = (value: Bracing, units: Units) =>
    value === 'continuous' ? 'held' : value === 'ends' ? 'ends only' : showSpan(value, units);
  const words = choiceKnob<Bracing>({
    key,
    label,
    choices: () => ['continuous', 'ends'],
    get: (member) => member[key],
    put,
    show,
  });
  const lengths = measureKnob({
    key,
    label,
    kind: 'length',
    scale: SCALES.tributary,
    least: 1,
    most: LONGEST,
    get: (member) =>
      member[key] === 'continuous' ? 0 : member[key] === 'ends' ? longestField(member) : member[key],
    put,
    show: showSpan,
  });
  return {
    ...words,
    number: null,
    show: (member, units) => show(member[key], units),
    nudge(member, direction, step, units) {
      const now = member[key];
      const { unit } = SCALES.tributary[units];
      const by = SCALES.tributary[units][step];
      if (direction > 0) {
        if (now === 'ends') return { fault: `${label}: held at the supports only is the longest there is` };
        const next = stepped(now === 'continuous' ? 0 : now, by, unit);
        return { member: put(member, next >= longestField(member) ? 'ends' : next) };
      }
      if (now === 'continuous') return { fault: `${label}: held throughout is the shortest there is` };
      const next = stepped(now === 'ends' ? longestField(member) : now, -by, unit);
      return { member: put(member, next < unit ? 'continuous' : next) };
    },
    enter(member, text, units) {
      const word = text.trim().toLowerCase();
      if (word !== '' && 'held'.startsWith(word)) return { member: put(member, 'continuous') };
      if (word !== '' && 'ends only'.startsWith(word)) return { member: put(member, 'ends') };
      return lengths.enter(member, text, units);
    },
    hint: (units) => `held, ends, ${SCALES.tributary[units].hint}`,
    stepText: (units) => SCALES.tributary[units].stepText,
  };
}

const UNBRACED_TOP = unbraced('bracing', 'unbraced');
const UNBRACED_BOTTOM = unbraced('bracingBottom', 'unbraced below');

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

const CONDITION_KNOBS: readonly Knob[] = [
  choiceKnob({
    key: 'service',
    label: 'service',
    choices: () => ['dry', 'wet'] as const,
    get: (member) => member.service,
    put: (member, value) => ({ ...member, service: value, assumed: stated(member, 'service') }),
    show: (value) => value,
  }),
  choiceKnob({
    key: 'temperature',
    label: 'temperature',
    choices: () => ['normal', '100-125 F', '125-150 F'] as const,
    get: (member) => member.temperature,
    put: (member, value) => ({ ...member, temperature: value, assumed: stated(member, 'temperature') }),
    show: (value) => value,
  }),
  yesNo('incised', 'incised', (member, value) => ({ ...member, incised: value })),
  yesNo('repetitive', 'repetitive', (member, value) => ({ ...member, repetitive: value })),
  yesNo('seasoned', 'seasoned', (member, value) => ({
    ...member,
    seasoned: value,
    assumed: stated(member, 'seasoned'),
  })),
  yesNo('selfWeight', 'own weight', (member, value) => ({ ...member, selfWeight: value })),
  choiceKnob({
    key: 'shearAt',
    label: 'shear at',
    choices: () => ['support', 'd'] as const,
    get: (member) => member.shearAt,
    put: (member, value) => ({ ...member, shearAt: value }),
    show: (value) => (value === 'd' ? 'd from face' : 'support'),
  }),
  choiceKnob({
    key: 'creep',
    label: 'total takes',
    choices: () => ['half dead', 'Kcr'] as const,
    get: (member) => member.creep,
    put: (member, value) => ({ ...member, creep: value }),
    show: (value) => (value === 'Kcr' ? 'Kcr x dead' : 'half dead'),
  }),
];

function yesNo(
  key: 'incised' | 'repetitive' | 'seasoned' | 'selfWeight',
  label: string,
  put: (member: Member, value: boolean) => Member,
): Knob {
  return choiceKnob<boolean>({
    key,
    label,
    choices: () => [false, true],
    get: (member) => member[key],
    put,
    show: (value) => (value ? 'yes' : 'no'),
  });
}
