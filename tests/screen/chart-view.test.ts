import { describe, expect, it } from 'vitest';
import { capacityOf } from '../../src/explore/capacity.ts';
import { knobsOf } from '../../src/explore/knobs/knobs.ts';
import { ratiosOf } from '../../src/explore/ratios.ts';
import { crossoversOf } from '../../src/screen/chart-view.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { shown } from '../support/shown.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';
import { ascii } from './panels/support.ts';

const chart = (state: State) => viewOf(state).chart!;
const weight = (part = {}) => pressing(stateOf([part]), 'C').state;
const capacity = (part = {}) => pressing(stateOf([part]), 'C', 'C').state;

describe('the chart', () => {
  for (const [name, of] of Object.entries({ weight, capacity })) {
    it(`of ${name} stands as in its frames`, async () => {
      for (const [columns, rows] of [
        [100, 40],
        [120, 36],
        [160, 48],
      ] as const) {
        const text = `${shown(of({ spans: ['15 ft'] }), columns, rows).join('\n')}\n`;
        await expect(text).toMatchFileSnapshot(`./frames/chart-${name}-${columns}x${rows}.txt`);
      }
      const text = shown(of(), 120, 36, ascii).join('\n');
      expect(text).toMatch(/^[\x20-\x7e\n]*$/);
      expect(text).not.toContain('?  this size');
      await expect(`${text}\n`).toMatchFileSnapshot(`./frames/chart-${name}-ascii-120x36.txt`);
    });
  }

  it('goes round ratio, weight and capacity with one key, which changes nothing to undo', () => {
    const start = stateOf();
    expect(chart(start).title).toBe('ratio against span');
    expect(chart(weight()).title).toBe('weight against span');
    expect(chart(capacity()).title).toBe('capacity against span');
    const round = pressing(start, 'C', 'C', 'C').state;
    expect(chart(round)).toEqual(chart(start));
    expect(round.past).toEqual([]);
    expect(capacity().notice!.text).toContain('capacity');
    expect(pressing({ ...start, columns: 80 }, 'C').state.notice!.text).toContain('it needs 100 columns');
  });

  it('says something of every knob there is, in every quantity, logarithmic and even', () => {
    const start = stateOf([{ spans: ['14 ft', '12 ft'] }]);
    for (const { key, label } of knobsOf(memberOf(start))) {
      for (const keys of [[], ['C'], ['C', 'C'], ['L'], ['C', 'L'], ['C', 'C', 'L']]) {
        const state = pressing({ ...start, knob: key }, ...keys).state;
        const view = viewOf(state).chart;
        if (view === null) continue;
        const drawn = view.series.some(({ ratios }) => ratios.some((each) => Number.isFinite(each)));
        expect(drawn || (view.key ?? []).length > 0, `${key} ${keys}`).toBe(true);
        expect(view.title.includes(label.trim()) || view.title.includes('against span'), key).toBe(true);
      }
    }
  });

  it('of a choice is drawn against the span, and says so', () => {
    expect(chart({ ...stateOf(), knob: 'stock.grade' }).title).toBe(
      'ratio against span, grade being a choice',
    );
  });

  it('of weight has the size at hand and the lit one as they are now', () => {
    const { series, key } = chart(weight());
    const { rows, lightest, current } = viewOf(stateOf()).rack;
    const [own, best] = series.map(({ now }) => now!.toFixed(1));
    expect([own, best]).toEqual([rows[current]!.weight, rows[lightest]!.weight]);
    expect(key![0]).toContain(`now ${own}`);
  });

  it('of capacity meets what is asked where the member stops passing', () => {
    const state = capacity();
    const { series } = chart(state);
    const asked = series.find(({ power }) => power === 'limit')!;
    const lines = series.filter(({ power }) => power !== 'limit');
    const knob = knobsOf(memberOf(state)).find(({ key }) => key === 'spans.0')!.number!;
    const count = asked.ratios.length;
    // The axis goes from 5 to 25 ft around 14 ft.
    const [from, to] = [60, 300];
    for (let at = 0; at < count; at += 4) {
      const carries = Math.max(
        ...lines.map(({ ratios }) => ratios[at]!).filter((each) => !Number.isNaN(each)),
      );
      const turned = knob.put(memberOf(state), from + ((to - from) * at) / (count - 1));
      const worst = Math.max(...[...ratiosOf(turned)].filter((each) => !Number.isNaN(each)));
      expect(carries >= asked.ratios[at]!).toBe(worst <= 1);
    }
    const { factor } = capacityOf(memberOf(state));
    expect(chart(state).key![0]).toContain(`${factor.toFixed(2)} x the 312 plf asked`);
  });

  it('of capacity says so where there is nothing that could grow, and where own weight is too much', () => {
    expect(chart(capacity({ area: {} })).key![0]).toContain('carries no load');
    expect(chart(capacity({ spans: ['90 ft'] })).key![0]).toContain('own weight');
  });

  it('of a member that takes long shows no line of another state', () => {
    const start = capacity({ spans: ['14 ft', '12 ft', '13 ft'] });
    const nudged = pressing(start, 'right').state;
    expect(nudged.settled).toBe(false);
    expect(chart(nudged).series).toEqual([]);
    const { state } = afterEvents(nudged, { type: 'settle' });
    expect(chart(state).series.length).toBeGreaterThan(1);
    for (const keys of [['C'], ['C', 'C']]) {
      const fresh = pressing(nudged, ...keys).state;
      expect(chart(fresh).series).toEqual([]);
    }
  });
});

describe('crossovers on the chart', () => {
  it('stand where another power comes to be the largest, at what both come to there', () => {
    // x, x^2 / 2 meet at x = 2; x^2 / 2 and x^3 / 8 at 4.
    const at = Array.from({ length: 101 }, (_, index) => 1 + index / 20);
    const found = crossoversOf([at, at.map((x) => x ** 2 / 2), at.map((x) => x ** 3 / 8)]);
    expect(found).toHaveLength(2);
    const [first, second] = found;
    expect(1 + first![0] * 5).toBeCloseTo(2, 2);
    expect(first![1]).toBeCloseTo(2, 2);
    expect(1 + second![0] * 5).toBeCloseTo(4, 2);
    expect(second![1]).toBeCloseTo(8, 1);
  });

  it('are none where one power is the largest all along, or nothing is known', () => {
    expect(crossoversOf([[1, 2, 3], [0, 1, 2], []])).toEqual([]);
    expect(crossoversOf([[Number.NaN, Number.NaN], [Number.NaN, Number.NaN], []])).toEqual([]);
  });
});
