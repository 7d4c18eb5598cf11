import { describe, expect, it } from 'vitest';
import { drawState } from '../../src/screen/draw-state.ts';
import { movesNow } from '../../src/screen/moves-view.ts';
import { restOf } from '../../src/screen/rest.ts';
import type { State } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { atRest, pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

/** A beam that fails, on a screen wide enough for the moves. */
const failing = () => stateOf([{ spans: ['16 ft'] }], { columns: 160, rows: 48 });
const rows = (state: State) => viewOf(state).moves?.rows.map(({ cells }) => cells) ?? null;

describe('the moves beside the gauges', () => {
  it('stand there at 160x48 as in the frame', async () => {
    for (const [name, glyphs] of [
      ['moves-beside', unicode],
      ['moves-beside-ascii', ascii],
    ] as const) {
      const text = `${frame(drawState(atRest(failing()), glyphs).canvas).join('\n')}\n`;
      await expect(text).toMatchFileSnapshot(`./frames/${name}-160x48.txt`);
    }
  });

  it('are those of the view of the moves, in its order, whatever counts as best', () => {
    for (const keys of [[], ['f'], ['f', 'f']]) {
      const state = atRest(pressing(failing(), ...keys).state);
      const { moves } = movesNow(state);
      expect(moves.length).toBeGreaterThan(5);
      expect(rows(state)!.map(([, label]) => label)).toEqual(moves.map(({ label }) => label));
      for (const [at, { kind }] of moves.entries()) expect(kind.endsWith(rows(state)![at]![0]!)).toBe(true);
      const listed = pressing(state, 'm').state;
      const first = frame(drawState(listed, unicode).canvas).find((row) => row.includes('►'))!;
      expect(first).toContain(moves[0]!.label);
    }
  });

  it('are searched after the frame, once no key came for longer than a held key takes', () => {
    const state = failing();
    expect(rows(state)).toBeNull();
    expect(restOf(state)!.ms).toBeGreaterThan(33);
    expect(restOf(atRest(state))).toBeNull();
  });

  it('are never those of another state: a nudge, another measure, other units or member take them away', () => {
    const two = stateOf([{ spans: ['16 ft'] }, { spans: ['17 ft'] }], { columns: 160, rows: 48 });
    const state = atRest(two);
    expect(rows(state)).not.toBeNull();
    for (const key of ['right', 'f', 'i', 'tab', 'x']) {
      const next = pressing(state, key).state;
      expect(rows(next), key).toBeNull();
      expect(rows(atRest(next)), key).not.toEqual(rows(state));
    }
    expect(rows(pressing(state, 'down').state)).toEqual(rows(state));
  });

  it('are not searched on a narrower screen', () => {
    const narrow = { ...failing(), columns: 159 };
    expect(restOf(narrow)).toBeNull();
    expect(rows(narrow)).toBeNull();
  });

  it('say so where no change helps', () => {
    const none = atRest(stateOf([{ area: {} }], { columns: 160, rows: 48 }));
    expect(frame(drawState(none, unicode).canvas).join('\n')).toContain('No change of this member helps.');
  });
});
