import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { basisOf } from '../../src/explore/diagrams/diagram-model.ts';
import { curves } from '../../src/loads/index.ts';
import { showMoment, showQuantity, showSmall, showSpan } from '../../src/quantity/index.ts';
import { GUTTER } from '../../src/screen/diagrams-view.ts';
import type { Glyphs } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { memberOf, type State, withMember } from '../../src/screen/state.ts';
import { beamLength } from '../../src/statics/index.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

type Part = Readonly<Record<string, unknown>>;

const SIMPLE: Part = {};
const GIRDER: Part = {
  spans: ['14 ft', '12 ft'],
  loads: [{ kind: 'snow', point: '1850 lb', at: '19 ft' }],
};
const OVERHANG: Part = { spans: ['12 ft'], overhangs: { left: '3 ft', right: '4 ft' } };
const CANTILEVER: Part = {
  spans: ['6 ft'],
  supports: 'cantilever',
  use: 'roof',
  area: { dead: '12 psf', snow: '30 psf', windUp: '40 psf' },
};
const MEMBERS = { simple: SIMPLE, girder: GIRDER, overhang: OVERHANG, cantilever: CANTILEVER };
const SIZES = [
  [80, 24],
  [120, 36],
] as const;

function opened(part: Part, columns = 80, rows = 24, more: Partial<State> = {}): State {
  return pressing(stateOf([part], { columns, rows, ...more }), 'v').state;
}

function shown(state: State, glyphs: Glyphs = unicode): string[] {
  return frame(drawState(state, glyphs).canvas);
}

/** What the core says the extremes are, in the words of the screen. */
function extremesOf(state: State, which: number | 'envelope' = 'envelope'): string[] {
  const member = memberOf(state);
  const { units } = state.session;
  const { weight, EI, deadFactor } = basisOf(member);
  const found = curves(member, weight, which, [0], deadFactor);
  const texts: string[] = [];
  for (const { highest, lowest } of [found.shear, found.moment, found.deflection]) {
    for (const extreme of [highest, lowest]) {
      if (extreme === null) continue;
      const { value } = extreme;
      let size = showQuantity('pointLoad', value, units);
      if (found.moment.highest === extreme || found.moment.lowest === extreme)
        size = showMoment(value, units);
      if (found.deflection.highest === extreme || found.deflection.lowest === extreme) {
        const text = showSmall(Math.abs(value) / EI!, units);
        size = value < 0 && Number.parseFloat(text) !== 0 ? `${text} up` : text;
      }
      const step = units === 'us' ? 1 : 10 / 25.4;
      texts.push(`${size} at ${showSpan(Math.round(extreme.at / step) * step, units)}`);
    }
  }
  return texts;
}

describe('the diagrams', () => {
  // Each frame is a file to be read: tests/screen/frames/diagrams-<member>-<columns>x<rows>.txt.
  for (const [name, part] of Object.entries(MEMBERS)) {
    for (const [columns, rows] of SIZES) {
      it(`of the ${name} beam read at ${columns}x${rows} as in their frame`, async () => {
        const text = `${shown(opened(part, columns, rows)).join('\n')}\n`;
        await expect(text).toMatchFileSnapshot(`./frames/diagrams-${name}-${columns}x${rows}.txt`);
      });
    }
  }

  it('read in ASCII as in their frame', async () => {
    const text = `${shown(opened(GIRDER), ascii).join('\n')}\n`;
    expect(text).toMatch(/^[\x20-\x7e\n]*$/);
    await expect(text).toMatchFileSnapshot('./frames/diagrams-ascii-80x24.txt');
  });

  it('label every extreme with the value and place that the core gives, in either unit, at every size', () => {
    for (const part of Object.values(MEMBERS)) {
      for (const [columns, rows] of [...SIZES, [60, 18], [160, 48]] as const) {
        for (const keys of [[], ['i']]) {
          const state = pressing(opened(part, columns, rows), ...keys).state;
          const text = shown(state).join('\n');
          const extremes = extremesOf(state);
          expect(extremes.length).toBeGreaterThanOrEqual(3);
          for (const extreme of extremes) expect(text).toContain(extreme);
        }
      }
    }
  });

  it('mark every extreme in its own column', () => {
    const state = opened(GIRDER);
    const member = memberOf(state);
    const { weight, deadFactor } = basisOf(member);
    const found = curves(member, weight, 'envelope', [0], deadFactor);
    const column = (at: number) => GUTTER + Math.round((at / beamLength(member.beam)) * (80 - GUTTER - 2));
    const wanted = [found.shear, found.moment, found.deflection]
      .flatMap(({ highest, lowest }) => [highest, lowest])
      .flatMap((extreme) => (extreme === null ? [] : [column(extreme.at)]));
    const beads = shown(state).flatMap((row) => [...row].flatMap((glyph, x) => (glyph === '•' ? [x] : [])));
    expect(beads.sort()).toEqual(wanted.sort());
  });

  it('name the combination and the spans that are loaded beside an extreme where there is room', () => {
    expect(shown(opened(OVERHANG, 160, 48)).join('\n')).toMatch(/ft-lb at .*, D\+L, live on span 1/);
    expect(shown(opened(OVERHANG)).join('\n')).not.toContain('live on span 1');
  });

  it('show the beam with its loads, supports and lengths', () => {
    const text = shown(opened(GIRDER)).join('\n');
    for (const part of ['own 8 + D 72 + L 240 plf', '1: S 1850 lb', '▲2', `14'-0"`, `12'-0"`]) {
      expect(text).toContain(part);
    }
    expect(shown(opened(CANTILEVER)).join('\n')).toMatch(/┃ ↑ .*Wup 240 plf/);
    const busy = opened({
      ...GIRDER,
      loads: Array.from({ length: 12 }, () => ({ kind: 'dead', line: '60 plf' })),
    });
    expect(shown(busy).join('\n')).toMatch(/\d+ more/);
  });

  it('come without deflection where the size is refused, and say so', () => {
    const state = stateOf();
    const refused = pressing(
      withMember(state, { ...memberOf(state), notch: { left: 6, right: 0 } }),
      'v',
    ).state;
    expect(shown(refused).join('\n')).toContain('no stiffness');
  });

  it('of any beam draw at any size without NaN, with every extreme labelled', () => {
    const length = fc.integer({ min: 3, max: 20 }).map((feet) => `${feet} ft`);
    const over = fc.constantFrom('0 ft', '2 ft', '5 ft');
    const load = fc.oneof(
      fc.record({
        kind: fc.constantFrom('dead', 'live', 'snow', 'windUp'),
        point: fc.constantFrom('0 lb', '500 lb', '3000 lb'),
        at: fc.constantFrom('0 ft', '1 ft', '3 ft'),
      }),
      fc.record({
        kind: fc.constantFrom('dead', 'live', 'roofLive'),
        line: fc.constantFrom('60 plf', ['0 plf', '90 plf']),
        from: fc.constantFrom('0 ft', '1 ft'),
        to: fc.constantFrom('2 ft', '3 ft'),
      }),
    );
    const part = fc.record({
      spans: fc.array(length, { minLength: 1, maxLength: 4 }),
      overhangs: fc.record({ left: over, right: over }),
      loads: fc.array(load, { maxLength: 5 }),
      tributary: fc.constantFrom('0 ft', '6 ft'),
      selfWeight: fc.boolean(),
      slope: fc.constantFrom('0:12', '4:12'),
    });
    const size = fc.constantFrom([60, 18], [80, 24], [101, 31], [160, 48]);
    const keys = fc.array(fc.constantFrom('left', 'right', '}', '[', ']', 'c', 'up', 'i'), { maxLength: 8 });
    fc.assert(
      fc.property(part, size, keys, fc.boolean(), (member, [columns, rows], pressed, plain) => {
        const state = pressing(opened(member, columns, rows), ...pressed).state;
        if (state.mode.name !== 'diagrams') throw new Error(state.mode.name);
        const text = shown(state, plain ? ascii : unicode).join('\n');
        expect(text).not.toMatch(/NaN|Infinity|undefined/);
        for (const extreme of extremesOf(state, state.mode.which)) expect(text).toContain(extreme);
        expect(state.mode.at).toBeGreaterThanOrEqual(0);
        expect(state.mode.at).toBeLessThanOrEqual(beamLength(memberOf(state).beam));
      }),
      { numRuns: 120 },
    );
  });
});

describe('the cursor', () => {
  const at = (state: State) => (state.mode.name === 'diagrams' ? state.mode.at : Number.NaN);

  it('begins where the check that governs is worst', () => {
    expect(at(opened(SIMPLE))).toBeCloseTo(84, 6);
    expect(at(opened(GIRDER))).toBeCloseTo(168, 6);
  });

  it('goes cell by cell, ten cells, and to the ends of the member, no further', () => {
    const start = pressing(opened(SIMPLE), 'home').state;
    const cell = 168 / (80 - GUTTER - 2);
    expect(at(start)).toBe(0);
    expect(at(pressing(start, 'right').state)).toBeCloseTo(cell, 9);
    expect(at(pressing(start, 'shift+right', '}', 'left').state)).toBeCloseTo(19 * cell, 9);
    expect(at(pressing(start, 'left', '{').state)).toBe(0);
    expect(at(pressing(start, 'end', 'right').state)).toBe(168);
  });

  it('stops at supports, loads and extremes in turn', () => {
    const places: number[] = [];
    let state = pressing(opened(GIRDER), 'home').state;
    for (let step = 0; step < 20; step += 1) {
      places.push(at(state));
      state = pressing(state, ']').state;
    }
    for (const place of [0, 168, 228, 312])
      expect(places.some((each) => Math.abs(each - place) < 1e-6)).toBe(true);
    expect(places.at(-1)).toBe(312);
    expect(at(pressing(state, '[').state)).toBeLessThan(312);
  });

  it('reads what the core says at its place, both sides of a jump', () => {
    const state = pressing(opened(GIRDER), 'home', ']', ']', ']').state;
    const member = memberOf(state);
    const { weight, deadFactor } = basisOf(member);
    const { shear, moment } = curves(member, weight, 'envelope', [at(state)], deadFactor);
    const gutter = shown(state).map((row) => row.slice(0, GUTTER).trim());
    const number = (text: string) => text.slice(0, text.indexOf(' '));
    for (const value of [shear.max[0]!, shear.min[0]!]) {
      expect(gutter).toContain(number(showQuantity('pointLoad', value, 'us')));
    }
    for (const value of [moment.max[0]!, moment.min[0]!]) {
      expect(gutter).toContain(number(showMoment(value, 'us')));
    }
    expect(shown(state).join('\n')).toContain(`▲ ${showSpan(at(state), 'us')}`);
  });
});

describe('the combinations', () => {
  it('are gone through one at a time and back to the envelope, either way', () => {
    const state = opened(GIRDER);
    const { combinations } = basisOf(memberOf(state));
    let now = state;
    for (const [index, { label }] of combinations.entries()) {
      now = pressing(now, index % 2 === 0 ? 'c' : 'down').state;
      expect(shown(now)[1]).toContain(`${label}, ${index + 1} of ${combinations.length}`);
    }
    now = pressing(now, 'c').state;
    expect(shown(now)[1]).toContain('envelope of 4 combinations, 4 load patterns');
    expect(shown(pressing(now, 'up').state)[1]).toContain(`${combinations.at(-1)!.label}, 4 of 4`);
  });

  it('one at a time are labelled with their own extremes', () => {
    const state = pressing(opened(GIRDER), 'c').state;
    const text = shown(state).join('\n');
    for (const extreme of extremesOf(state, 0)) expect(text).toContain(extreme);
    // Dead load alone is the first of ASCE 7 2.4.1.
    expect(text).toContain('D, 1 of 4');
    expect(text).toContain('deflection of 0.5D');
  });
});

describe('the way in and out', () => {
  it('is one key, and Esc, v or q back to where it was', () => {
    const state = stateOf([GIRDER], { knob: 'section.depth' });
    for (const key of ['escape', 'v', 'q', 'ctrl+c']) {
      const { state: back, effects } = pressing(state, 'v', 'right', 'c', key);
      expect(back.mode.name).toBe('explore');
      expect(back.knob).toBe('section.depth');
      expect(back.session).toBe(state.session);
      expect(effects).toEqual([]);
    }
  });

  it('shows what size is needed on a screen that is too small', () => {
    expect(shown(opened(SIMPLE, 40, 10))[0]).toContain('needs 60 x 18');
  });
});
