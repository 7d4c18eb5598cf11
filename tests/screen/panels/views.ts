import type { View } from '../../../src/screen/view.ts';

/** Views made by hand. Their figures are plausible, not checked: what is tested is where they stand. */

const ROWS: View['rack']['rows'] = (
  [
    ['(2) 2x8', '5.0', 0.63, 3.12, 2.41, 'bending', `8'-5"`],
    ['(3) 2x6', '5.8', 0.55, 3.56, 3.65, 'deflection', `7'-10"`],
    ['4x10', '6.4', 0.41, 1.71, 0.8, 'bending', `11'-5"`],
    ['(2) 2x10', '6.4', 0.5, 1.92, 1.16, 'bending', `10'-9"`],
    ['(4) 2x6', '7.7', 0.41, 2.67, 2.74, 'deflection', `9'-2"`],
    ['3x14', '7.7', 0.41, 1.11, 0.47, 'bending', `14'-3"`],
    ['(2) 2x12', '7.8', 0.4, 1.28, 0.64, 'bending', `13'-3"`],
    ['4x12', '9.1', 0.34, 1.1, 0.55, 'bending', `14'-3"`],
    ['(2) 2x14', '9.2', 0.34, 0.93, 0.39, '', `15'-6"`],
    ['(3) 2x10', '9.7', 0.33, 1.27, 0.77, 'bending', `13'-3"`],
    ['(4) 2x8', '10.1', 0.31, 1.56, 1.2, 'bending', `12'-0"`],
    ['4x14', '10.8', 0.29, 0.8, 0.34, '', `16'-9"`],
    ['(3) 2x12', '11.7', 0.27, 0.87, 0.43, '', `16'-1"`],
    ['4x16', '12.4', 0.26, 0.61, 0.22, '', `19'-2"`],
    ['(4) 2x10', '12.9', 0.25, 0.97, 0.58, '', `15'-2"`],
    ['(3) 2x14', '13.8', 0.23, 0.63, 0.26, '', `18'-10"`],
    ['(4) 2x12', '15.7', 0.2, 0.65, 0.32, '', `18'-6"`],
    ['(4) 2x14', '18.4', 0.17, 0.47, 0.2, '', `21'-8"`],
  ] as const
).map(([label, weight, shear, bending, deflection, stops, reach]) => ({
  label,
  weight,
  ratios: [shear, bending, deflection] as const,
  passes: stops === '',
  stops,
  reach,
}));

/** Sampled from 8 to 22 ft: each power as it follows the span from its ratio at 15 ft. */
function series(power: 1 | 2 | 3, at15: number): { power: 1 | 2 | 3; ratios: number[] } {
  const ratios: number[] = [];
  for (let step = 0; step <= 56; step += 1) ratios.push(at15 * ((8 + step / 4) / 15) ** power);
  return { power, ratios };
}

/** A deck girder that bending stops, after a few nudges of its span. */
export const failing: View = {
  title: {
    session: 'Boathouse at Alder Cove',
    member: 'G1 deck girder',
    method: 'ASD, NDS 2018, dry',
    position: '2 of 7',
    kept: 'kept',
  },
  verdict: {
    passes: false,
    reason: 'Bending stops it at 1.28.',
    cures: ['Lightest cure: (2) 2x14, 0.93.', `Or shorten to 13'-3".`],
  },
  knobs: (
    [
      ['span', `15'-0"`],
      ['depth', '11 1/4"'],
      ['width', '1 1/2"'],
      ['plies', '2'],
      ['dead', '12 psf'],
      ['live', '40 psf'],
      ['roof live', '0 psf'],
      ['snow', '0 psf'],
      ['tributary', `4'-0"`],
      ['bearing', '3 1/2"'],
      ['unbraced', 'held'],
      ['limit live', 'l/360'],
      ['limit total', 'l/240'],
      ['grade', 'No.2'],
      ['species', 'DF-L'],
      ['service', 'dry'],
    ] as const
  ).map(([label, value]) => ({ label, value, fault: null })),
  knob: 0,
  gauges: [
    {
      label: 'shear',
      power: 1,
      ratio: 0.4,
      ghost: 0.37,
      nudge: 0.03,
      governs: false,
      demand: 'fv 72 of 180 psi, D+L',
      alone: 'alone, to l/h 40.0',
    },
    {
      label: 'bending',
      power: 2,
      ratio: 1.28,
      ghost: 1.12,
      nudge: 0.16,
      governs: true,
      demand: 'fb 1151 of 900 psi, D+L',
      alone: 'alone, to l/h 14.1',
    },
    {
      label: 'deflection',
      power: 3,
      ratio: 0.64,
      ghost: 0.52,
      nudge: 0.12,
      governs: false,
      demand: '0.32 of 0.50 in, live, l/360',
      alone: 'alone, to l/h 18.6',
    },
  ],
  others: [
    { label: 'bearing', ratio: 0.25, governs: false },
    { label: 'slenderness', ratio: 0.22, governs: false },
  ],
  load: '216 plf',
  exponents: [
    { label: 'shear', power: 1, local: [1, -0.96, -0.96, 0.96], why: 'own weight' },
    { label: 'bending', power: 2, local: [2, -1.96, -0.96, 0.96], why: 'own weight' },
    { label: 'deflection', power: 3, local: [3, -3, -1, 1], why: 'whole' },
  ],
  ruler: {
    now: 16,
    ghost: 14.9,
    standsTo: 14.1,
    shearToBending: 5,
    bendingToDeflection: 31.6,
    stock: [
      { label: '6', spanToDepth: 32.7 },
      { label: '8', spanToDepth: 24.8 },
      { label: '10', spanToDepth: 19.5 },
      { label: '12', spanToDepth: 16 },
      { label: '14', spanToDepth: 13.6 },
      { label: '16', spanToDepth: 11.8 },
    ],
  },
  rack: { wood: 'DF-L No.2', weightUnit: 'lb/ft', rows: ROWS, current: 6, lightest: 8 },
  handover: `(2) 2x14 is lightest from 14'-4" to 15'-6"; below, 3x14; above, 4x14`,
  chart: {
    title: 'ratio against span',
    series: [series(1, 0.4), series(2, 1.28), series(3, 0.64)],
    now: 0.5,
    labels: [`8'-0"`, `11'-6"`, `15'-0"`, `18'-6"`, `22'-0"`],
  },
  cures: [
    { kind: 'deepen', label: '(2) 2x14', ratio: 0.93, passes: true, cost: '+1.4 lb/ft' },
    { kind: 'a ply more', label: '(3) 2x12', ratio: 0.87, passes: true, cost: '+3.9 lb/ft' },
    { kind: 'widen', label: '4x12', ratio: 1.1, passes: false, cost: '+1.3 lb/ft' },
    { kind: 'shorten', label: `13'-3"`, ratio: 1, passes: true, cost: `1'-9" less` },
  ],
  remarks: [
    'assumed: top edge held throughout, seasoned',
    'preliminary sizing: local code and a licensed professional decide',
  ],
  foot: [
    { keys: '↑↓', does: 'knob' },
    { keys: '←→', does: 'nudge 3"' },
    { keys: 'Shift', does: 'x10' },
    { keys: 'Enter', does: 'type' },
    { keys: 'u', does: 'undo' },
    { keys: 'm', does: 'moves' },
    { keys: 'w', does: 'workings' },
    { keys: 'p', does: 'pin' },
    { keys: 's', does: 'keep' },
    { keys: '?', does: 'keys' },
  ],
  notice: null,
  entry: null,
};

/** The same girder once deepened. */
export const passing: View = {
  ...failing,
  title: { ...failing.title, kept: 'not kept' },
  verdict: { passes: true, reason: 'Bending is nearest, at 0.93.', cures: [`It would reach 15'-6".`] },
  knob: 1,
  gauges: [
    { ...failing.gauges[0]!, ratio: 0.34, ghost: 0.4, nudge: -0.06 },
    { ...failing.gauges[1]!, ratio: 0.93, ghost: 1.28, nudge: -0.35 },
    { ...failing.gauges[2]!, ratio: 0.39, ghost: 0.64, nudge: -0.25 },
  ],
  ruler: { ...failing.ruler, now: 13.6, ghost: 16 },
  rack: { ...failing.rack, current: 8 },
  cures: [{ kind: 'lighten', label: '4x12', ratio: 1.1, passes: false, cost: '−0.1 lb/ft' }],
};

/** Nothing known but a span and a depth. */
export const absent: View = {
  title: { session: 'untitled', member: '', method: '', position: '', kept: 'not kept' },
  verdict: { passes: false, reason: 'It carries nothing yet.', cures: [] },
  knobs: failing.knobs.slice(0, 2),
  knob: 0,
  gauges: failing.gauges.map((gauge) => ({
    ...gauge,
    ratio: null,
    ghost: null,
    nudge: null,
    governs: false,
    demand: '',
    alone: '',
  })),
  others: [],
  load: '',
  exponents: [],
  ruler: {
    now: 16,
    ghost: null,
    standsTo: null,
    shearToBending: null,
    bendingToDeflection: null,
    stock: [],
  },
  rack: { wood: 'DF-L No.2', weightUnit: 'lb/ft', rows: [], current: -1, lightest: -1 },
  handover: null,
  chart: null,
  cures: [],
  remarks: [],
  foot: failing.foot.slice(-1),
  notice: null,
  entry: null,
};

/** So much load that no size of the rack passes; two gauges are off their scale, and so is the wall. */
export const nothingPasses: View = {
  ...failing,
  verdict: {
    passes: false,
    reason: 'Bending stops it at 12.8.',
    cures: ['Nothing on the rack passes; (4) 2x14 comes nearest, 2.21.'],
  },
  gauges: [
    { ...failing.gauges[0]!, ratio: 4, ghost: null, nudge: null },
    { ...failing.gauges[1]!, ratio: 12.8, ghost: 1.12, nudge: 11.68 },
    { ...failing.gauges[2]!, ratio: 0.2, ghost: null, nudge: null },
  ],
  others: [
    { label: 'bearing', ratio: 2.5, governs: false },
    { label: 'slenderness', ratio: 0.22, governs: false },
    { label: 'uplift', ratio: 0.1, governs: false },
  ],
  ruler: { ...failing.ruler, standsTo: 3.1 },
  rack: {
    ...failing.rack,
    lightest: -1,
    rows: ROWS.map((row, index) =>
      index % 4 === 3
        ? { ...row, ratios: [null, null, null], passes: false, stops: 'NDS 4.3.1', reach: '' }
        : { ...row, passes: false, stops: 'bending', reach: `3'-1"` },
    ),
  },
  handover: null,
};

/** Names as long and as hostile as a file may hold, and the labels of laminated veneer lumber. */
export const longNames: View = {
  ...failing,
  title: {
    session: 'The long restoration of the boathouse, the slipway and the lamp room at Alder Cove, phase two',
    member:
      'Ridge 梁 \u001b[31mgirder\u0007 over the\u200b lamp room e\u0301te\u0301 \u{1f6a3} and the whole of the north gallery',
    method: 'ASD, NDS 2018, wet',
    position: '120 of 500',
    kept: 'not kept',
  },
  verdict: {
    passes: false,
    reason: 'Deflection under live load stops it at 1.01.',
    cures: ['Lightest cure: (3) LVL 1-3/4x11-7/8, 0.93.', `Or shorten to 113'-3 1/2".`],
  },
  knobs: failing.knobs.map((knob, index) =>
    index === 3
      ? {
          label: 'distance of the second point load',
          value: `114'-11 15/16"`,
          fault: 'it must stand on the member',
        }
      : knob,
  ),
  knob: 3,
  rack: {
    ...failing.rack,
    wood: 'LVL 2.0E typical set, custom values',
    rows: ROWS.map((row, index) => ({
      ...row,
      label: `(${1 + (index % 4)}) LVL 1-3/4x11-7/8`,
      stops: row.stops === 'bending' ? 'slenderness' : row.stops,
    })),
  },
};

/** A span being typed, and refused. */
export const typing: View = {
  ...failing,
  entry: { text: '14-x', cursor: 4, fault: '"14-x" is not a length', hint: `span: 14-6, 14'6", 4.4m` },
};

/** The size at hand far up the rack from the lit one. */
export const farFromLit: View = {
  ...failing,
  knob: 13,
  rack: { ...failing.rack, current: 0, lightest: 15 },
  notice: { text: 'kept in boathouse.json', style: 'strong' },
};
