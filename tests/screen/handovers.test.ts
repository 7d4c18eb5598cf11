import { describe, expect, it } from 'vitest';
import { handoversOf } from '../../src/explore/handovers/handovers.ts';
import { sweepsOf } from '../../src/explore/handovers/sweep.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { restOf } from '../../src/screen/rest.ts';
import { type HandoversMode, memberOf, type State } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const shown = (state: State, columns: number, rows: number, glyphs = unicode) =>
  frame(drawState({ ...state, columns, rows }, glyphs).canvas);
/** The state once nothing is left to work out. */
function atRest(state: State): State {
  let now = state;
  for (let step = 0; restOf(now) !== null; step += 1) {
    if (step > 4) throw new Error('it never comes to rest');
    now = afterEvents(now, { type: 'settle' }).state;
  }
  return now;
}
const onLive = () => ({ ...stateOf(), knob: 'area.live' });
const PSF = 1 / 144;

describe('the handovers beside the rack', () => {
  it('tell of the knob in hand from where to where the lit size is best, as the rack at either side says', () => {
    const state = atRest(onLive());
    const text = viewOf(state).handover!;
    const parts = /^live: (.+) is lightest from ([\d.]+) psf to ([\d.]+) psf; below, (.+); above, (.+)$/.exec(
      text,
    )!;
    const litAt = (live: number) => {
      const member = memberOf(state);
      const { sizes, lit } = rankedRack({ ...member, area: { ...member.area, live: live * PSF } });
      return sizes[lit]!.size.label;
    };
    const [from, to] = [Number(parts[2]), Number(parts[3])];
    expect([litAt(from - 0.2), litAt(from + 0.2), litAt(to - 0.2), litAt(to + 0.2)]).toEqual([
      parts[4],
      parts[1],
      parts[1],
      parts[5],
    ]);
  });

  it('are searched after the frame, once no key came for longer than a held key takes', () => {
    const state = onLive();
    expect(viewOf(state).handover).toBeNull();
    expect(restOf(state)!.ms).toBeGreaterThan(33);
    expect(restOf(atRest(state))).toBeNull();
  });

  it('are never shown of another state: a nudge, another knob or another measure takes them away', () => {
    const state = atRest(onLive());
    for (const keys of [['right'], ['down'], ['f']]) {
      const next = pressing(state, ...keys).state;
      expect(viewOf(next).handover, keys.join()).toBeNull();
      expect(viewOf(atRest(next)).handover).not.toBe(viewOf(state).handover);
    }
    expect(viewOf(pressing(state, 'right', 'left').state).handover).toBeNull();
  });

  it('of the span are there at once, and nothing is searched for a choice', () => {
    expect(viewOf(stateOf()).handover).toMatch(/is lightest (from|up to)/);
    expect(restOf(stateOf())).toBeNull();
    expect(restOf({ ...stateOf(), knob: 'stock.grade' })).toBeNull();
  });

  it('are not searched where nothing is lit', () => {
    expect(restOf({ ...stateOf([{ spans: ['90 ft'] }]), knob: 'area.live' })).toBeNull();
  });
});

describe('the strip of handovers', () => {
  for (const [name, from] of Object.entries({
    'handovers-span': () => stateOf(),
    'handovers-live': onLive,
  })) {
    for (const [columns, rows] of [
      [80, 24],
      [120, 36],
    ] as const) {
      it(`shows ${name} at ${columns}x${rows} as in its frame`, async () => {
        const state = atRest(pressing({ ...from(), columns, rows }, 'H').state);
        const text = `${shown(state, columns, rows).join('\n')}\n`;
        await expect(text).toMatchFileSnapshot(`./frames/${name}-${columns}x${rows}.txt`);
      });
    }
  }

  it('opens at once, is found after the frame and is what the core finds', () => {
    const open = pressing(stateOf(), 'H').state;
    expect(shown(open, 80, 24).join('\n')).toContain('being found');
    expect(restOf(open)).toEqual({ ms: 0 });
    const { strip } = atRest(open).mode as HandoversMode;
    const member = memberOf(open);
    const { put } = sweepsOf(member).find(({ key }) => key === 'spans.0')!;
    expect(strip!.segments).toEqual(handoversOf(member, put, strip!.from, strip!.to));
    expect(strip!.from).toBeLessThan(strip!.now);
  });

  it('goes along the span where the knob in hand is a choice', () => {
    const state = atRest(pressing({ ...stateOf(), knob: 'stock.grade' }, 'H').state);
    expect((state.mode as HandoversMode).strip!.label).toBe('span');
  });

  it('scrolls no further than its ends, stands in ASCII at 60 x 18 and closes with Escape', () => {
    const state = atRest(pressing({ ...stateOf(), columns: 60, rows: 18 }, 'H').state);
    const end = pressing(state, 'end').state;
    expect(pressing(end, 'down').state.mode).toEqual(end.mode);
    for (const each of [state, end]) {
      const text = shown(each, 60, 18, ascii);
      expect(text.join('')).toMatch(/^[\x20-\x7e]*$/);
      for (const row of text) expect(row.length).toBeLessThanOrEqual(60);
    }
    expect(pressing(end, 'escape').state.mode.name).toBe('explore');
  });
});
