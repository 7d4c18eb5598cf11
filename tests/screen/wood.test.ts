import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { woodKnobs } from '../../src/explore/knobs/wood.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import type { WoodMode } from '../../src/screen/mode.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { rankingOf } from '../../src/session/index.ts';
import { checkStock } from '../../src/timber/index.ts';
import { framesAreKept } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const MIXED = {
  spans: ['16 ft'],
  rack: [
    { product: 'glulam', species: 'Western species', grade: '24F-1.8E' },
    { product: 'LVL', grade: 'typical 2.0E' },
  ],
};

const keys = (text: string) => [...text];
const wood = (state: State) => state.mode as WoodMode;
const open = (part: Record<string, unknown> = {}, ...pressed: string[]) =>
  pressing(stateOf([part]), 'y', ...pressed).state;
/** Down to the line of this key. */
const at = (state: State, key: string): State => {
  const lines = woodKnobs(wood(state).draft).map((knob) => knob.key);
  return pressing(state, ...Array<string>(lines.indexOf(key) - lines.indexOf(wood(state).knob)).fill('down'))
    .state;
};

const text = (state: State, columns: number, rows: number, glyphs = unicode) =>
  `${frame(drawState({ ...state, columns, rows }, glyphs).canvas).join('\n')}\n`;

describe('the wood view', () => {
  const views = {
    'wood-product': () => open(MIXED),
    'wood-grade': () => open(MIXED, 'right', 'right', 'right', 'down', 'down'),
    'wood-custom': () => open(MIXED, ...keys('custom'), 'enter'),
    'wood-typing': () => pressing(at(open(MIXED), 'factors.CL'), ...keys('0.9'), 'enter').state,
    'wood-forbidden': () => open({ service: 'wet' }, ...keys('LVL'), 'enter'),
  };
  framesAreKept(views);

  it('stands in 60 x 18 cells and in ASCII, with nothing beyond the edge', async () => {
    await expect(text(open(MIXED), 60, 18)).toMatchFileSnapshot('./frames/wood-product-60x18.txt');
    expect(text(open(MIXED), 80, 24, ascii)).toMatch(/^[\x20-\x7e\n]*$/);
  });

  it('shows values and stresses in SI where the session does', () => {
    const shown = text(pressing(stateOf([{}]), 'i', 'y').state, 120, 36);
    expect(shown).toContain('MPa; E and Emin in GPa');
    // 900 psi is 6.21 MPa and 1.6e6 psi 11.03 GPa.
    expect(shown).toMatch(/lumber .* 6\.21 .* 11\.03/);
  });

  it('takes nothing with Escape and everything, in one step to undo, with Enter', () => {
    const chosen = open({}, 'right', 'right', 'right');
    expect(wood(chosen).draft.stock.product).toBe('glulam');
    const back = pressing(chosen, 'escape').state;
    expect([back.mode.name, memberOf(back).stock.product]).toEqual(['explore', 'dimension lumber']);
    const taken = pressing(chosen, 'enter').state;
    expect(memberOf(taken).stock).toMatchObject({ product: 'glulam', species: 'Western species' });
    expect(memberOf(pressing(taken, 'u').state)).toBe(memberOf(chosen));
  });

  it('comes back to what was chosen of a product before', () => {
    const state = open({}, 'right', 'right', 'right', 'left', 'left', 'left');
    expect(wood(state).draft.stock).toBe(memberOf(state).stock);
    expect(wood(state).draft.section).toEqual(memberOf(state).section);
  });

  it('says where the last product is and does not go round', () => {
    const state = open({}, 'left');
    expect(wood(state).fault).toContain('lumber is the first product');
    expect(wood(open({}, 'shift+right', 'right')).fault).toContain('custom is the last product');
  });

  it('shows the clause of a wood that a rule forbids, and takes it only once the rule is met', () => {
    const forbidden = open({ service: 'wet' }, ...keys('LVL'), 'enter');
    expect(text(forbidden, 80, 24)).toContain('NDS 8.1.4');
    const refused = pressing(forbidden, 'enter').state;
    expect(wood(refused).fault).toContain('NDS 8.1.4');
    const dry = pressing(at(refused, 'service'), 'left', 'enter').state;
    expect(memberOf(dry)).toMatchObject({ service: 'dry', stock: { product: 'LVL' } });
  });

  it('refuses a condition that forbids the wood at hand, with the clause', () => {
    const glulam = {
      stock: { product: 'glulam', species: 'Western species', grade: '24F-1.8E' },
      section: { width: '5.125 in', depth: '12 in' },
    };
    const press = (key: string) => wood(pressing(at(open(glulam), key), 'right').state).fault;
    expect(press('incised')).toContain('NDS 5.3');
    expect(press('flat')).toContain('Table 5A');
  });

  it('asks for all the values of a custom wood and where they were read', () => {
    let state = open({}, ...keys('custom'), 'enter');
    const take = () => wood(pressing(state, 'enter').state).fault;
    const values = { Fb: '1200', Fv: '150psi', Fcperp: '3.5MPa', E: '1400000', Emin: '500000', G: '0.45' };
    expect(take()).toContain('typed values: Fb, Fv, Fcperp, E, Emin, G');
    const type = (key: string, value: string) => {
      state = pressing(
        at({ ...state, mode: { ...wood(state), knob: 'stock.product' } }, key),
        ...keys(value),
        'enter',
      ).state;
      expect(wood(state).fault).toBeNull();
    };
    type('stock.values.Fb', values.Fb);
    expect(take()).toContain('where they were read');
    type('stock.valuesFrom', 'tests of 2019, sheet 4');
    for (const [key, value] of Object.entries(values)) {
      type(`stock.values.${key}`, value);
      if (key !== 'G') expect(take()).toContain('G (stock.values)');
    }
    state = pressing(state, 'enter').state;
    expect(memberOf(state).stock).toMatchObject({
      product: 'custom',
      values: { Fb: 1200, Fv: 150, G: 0.45 },
      valuesFrom: 'tests of 2019, sheet 4',
    });
    expect(checkStock(memberOf(state))).toBeNull();
  });

  it('types a value over the table, tells it as typed, and clears it with Delete', () => {
    const typed = pressing(at(open(), 'stock.values.Fb'), ...keys('1000'), 'enter').state;
    expect(wood(pressing(typed, 'enter').state).fault).toContain('where they were read');
    const read = pressing(at(typed, 'stock.valuesFrom'), ...keys('stamp'), 'enter').state;
    expect(text(read, 120, 36)).toContain('Fb from stamp');
    expect(memberOf(pressing(read, 'enter').state).stock.values).toEqual({ Fb: 1000 });
    const cleared = pressing(read, 'delete').state;
    expect(wood(cleared).draft.stock).toMatchObject({ values: null, valuesFrom: null });
  });

  it('types a factor with its reason, never without one, and clears it with Delete', () => {
    const line = at(open(), 'factors.CL');
    const alone = pressing(line, ...keys('0.9'), 'enter').state;
    expect(wood(alone)).toMatchObject({
      edit: { text: '0.9' },
      fault: expect.stringContaining('needs its reason'),
    });
    const whole = pressing(alone, ...keys(' blocked once'), 'enter').state;
    expect(wood(whole).draft.typedFactors).toEqual({ CL: { value: 0.9, reason: 'blocked once' } });
    expect(text(whole, 120, 36)).toContain('CL 0.9   typed: blocked once');
    const taken = pressing(whole, 'enter').state;
    expect(text(taken, 120, 36)).toContain('CL 0.9 is typed: blocked once');
    const cleared = pressing(at(pressing(taken, 'y').state, 'factors.CL'), 'backspace', 'enter').state;
    expect(memberOf(cleared).typedFactors).toBeNull();
  });

  it('refuses what is no factor and keeps the text', () => {
    const line = at(open(), 'factors.CD');
    for (const typed of ['x', '0 nothing', '99 too much']) {
      const state = pressing(line, ...keys(typed), 'enter').state;
      expect(wood(state).fault).not.toBeNull();
      expect(wood(state).edit?.text).toBe(typed);
    }
  });

  it('puts woods on the rack with Space, the first in company of the own one, and takes them off', () => {
    const two = open({}, 'right', 'right', 'right', ' ', 'right', ' ');
    const products = (state: State) => wood(state).draft.rack?.map(({ product }) => product);
    expect(products(two)).toEqual(['dimension lumber', 'glulam', 'LVL']);
    expect(products(pressing(two, ' ').state)).toEqual(['dimension lumber', 'glulam']);
    const line = at(two, 'rack.1');
    expect(products(pressing(line, 'delete').state)).toEqual(['dimension lumber', 'LVL']);
    const taken = pressing(two, 'shift+left', 'enter').state;
    expect(memberOf(taken).stock.product).toBe('dimension lumber');
    expect(text(taken, 120, 36)).toContain('3 woods');
  });

  it('does not put on the rack what has no sizes to stand there', () => {
    expect(wood(open({}, 'shift+right', ' ')).fault).toContain('custom');
  });

  it('leaves no rack where nothing but the own wood is on it', () => {
    expect(memberOf(pressing(open({}, ' '), 'enter').state).rack).toBeNull();
  });

  it('scrolls what the wood brings, and no further than its end', () => {
    const first = text(open(MIXED), 80, 24);
    const down = pressing({ ...open(MIXED), columns: 80, rows: 24 }, 'pagedown').state;
    expect(text(down, 80, 24)).not.toBe(first);
    const end = pressing(down, ...Array<string>(30).fill('pagedown')).state;
    expect(text(end, 80, 24)).toContain('Assumed: at most 100 F in service');
    expect(text(pressing(end, ...Array<string>(30).fill('pageup')).state, 80, 24)).toBe(first);
  });

  it('whatever is pressed takes only a wood that no rule forbids, and draws at any size', () => {
    const press = fc.constantFrom(
      ...['up', 'down', 'left', 'right', 'shift+left', 'shift+right', 'enter', 'escape', 'delete', ' ', 'y'],
      ...['pagedown', '1', '9', 'g', '0.9 x'],
    );
    fc.assert(
      fc.property(fc.array(press, { maxLength: 60 }), fc.integer({ min: 0, max: 12 }), (pressed, jump) => {
        const start = pressing(stateOf([MIXED]), 'y', ...Array<string>(jump).fill('down')).state;
        const { state } = pressing(
          start,
          ...pressed.flatMap((each) => (each === '0.9 x' ? keys(each) : [each])),
        );
        expect(checkStock(memberOf(state))).toBeNull();
        for (const [columns, rows] of [
          [60, 18],
          [80, 24],
          [160, 48],
        ] as const) {
          for (const row of text(state, columns, rows).split('\n'))
            expect(row.length).toBeLessThanOrEqual(columns);
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('what counts as best', () => {
  it('is followed by the wood view: it names the lit size of the rack', () => {
    for (const [best, word] of [
      [undefined, 'Lightest'],
      ['depth', 'Shallowest'],
      ['boardFeet', 'Least wood'],
    ] as const) {
      const start = stateOf([{ spans: ['12 ft'] }]);
      const session = { ...start.session, ...(best === undefined ? {} : { best }) };
      const state = pressing({ ...start, session }, 'y').state;
      const { sizes, lit } = rankedRack(memberOf(state), rankingOf(session));
      expect(text(state, 120, 36)).toContain(`${word} that passes: ${sizes[lit]!.size.label},`);
    }
  });

  it('says where the yard has nothing that passes', () => {
    const start = stateOf([{ spans: ['12 ft'] }]);
    const yard = { file: null, rows: [] };
    const state = pressing({ ...start, session: { ...start.session, yard } }, 'y').state;
    expect(text(state, 120, 36)).toContain('The yard has no size that passes.');
  });
});

describe('the lit size of a rack of several woods', () => {
  it('is put in the beam with its wood by x', () => {
    const state = pressing(stateOf([MIXED]), 'x').state;
    expect(memberOf(state)).toMatchObject({ stock: { product: 'LVL' }, section: { width: 1.75, plies: 1 } });
    expect(memberOf(pressing(state, 'u').state).stock.product).toBe('dimension lumber');
  });
});
