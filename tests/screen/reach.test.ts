import { describe, expect, it } from 'vitest';
import { rackOf } from '../../src/explore/rack/rack.ts';
import { reachesOf } from '../../src/explore/reach/reaches.ts';
import { showSpanDown } from '../../src/quantity/index.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import type { Session } from '../../src/session/session.ts';
import { CHECK_WORD } from '../../src/timber/words.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const ANY = { product: null, species: null, grade: null };
/** A yard of three sizes, each at a price of its own. */
const YARD: NonNullable<Session['yard']> = {
  file: null,
  rows: [
    { ...ANY, size: '2x12', lengths: [192, 240], price: { amount: 20, per: 'piece' } },
    { ...ANY, size: '2x14', lengths: [192], price: { amount: 3, per: 'foot' } },
    { ...ANY, size: '4x16', lengths: [120], price: { amount: 1, per: 'piece' } },
  ],
};
function inYard(): State {
  const state = stateOf();
  const session = { ...state.session, yard: YARD };
  return { ...state, session, kept: session };
}

describe('the reach table', () => {
  framesAreKept({
    'reach-simple': (size) => pressing({ ...stateOf(), ...size }, 'e').state,
    'reach-yard': (size) => pressing({ ...inYard(), ...size }, 'e').state,
  });

  it('tells the longest span of every size and what stops it there', () => {
    const state = pressing(stateOf([{}], { columns: 100, rows: 60 }), 'e').state;
    const member = memberOf(state);
    const rack = rackOf(member);
    const reaches = reachesOf(member, rack);
    const text = shown(state, 100, 60);
    for (const [at, { size }] of rack.sizes.entries()) {
      const row = text.find((line) => line.slice(5).startsWith(`${size.label} `))!;
      expect(row).toContain(showSpanDown(reaches[at]!.span, 'us'));
      expect(row).toContain(CHECK_WORD[reaches[at]!.stops!]);
    }
  });

  it('opens at the lit size, scrolls to both ends and no further, and comes back with Escape', () => {
    const open = pressing(stateOf([{}], { columns: 80, rows: 24 }), 'e').state;
    expect(shown(open, 80, 24).join('\n')).toContain('◆ (3) 2x12');
    const end = pressing(open, 'end').state;
    expect(shown(end, 80, 24).join('\n')).toContain('(4) 2x14');
    expect(pressing(end, 'down').state.mode).toEqual(end.mode);
    expect(shown(pressing(end, 'home').state, 80, 24).join('\n')).toContain(' 2x4 ');
    expect(pressing(end, 'escape').state.mode.name).toBe('explore');
  });

  it('says what the yard does not have, and the price of what it has', () => {
    const text = shown(pressing(inYard(), 'e').state, 120, 60).join('\n');
    expect(text).toMatch(/\(3\) 2x12 .* 60\.00/);
    // Two pieces of 16 ft at 3 a foot.
    expect(text).toMatch(/\(2\) 2x14 .* 96\.00/);
    expect(text).toMatch(/ 4x14 .* none {2}not in the yard/);
    // 4x16 is stocked, but none as long as the beam.
    expect(text).toMatch(/ 4x16 .* not in the yard/);
  });

  it('stands at 60 x 18 and in ASCII', () => {
    const text = shown(pressing(inYard(), 'e').state, 60, 18, ascii);
    expect(text.join('')).toMatch(/^[\x20-\x7e]*$/);
    for (const row of text) expect(row.length).toBeLessThanOrEqual(60);
  });
});

describe('what counts as best', () => {
  const litRow = (state: State) => shown(state, 120, 36).find((row) => row.includes('◆'))!;

  it('goes round with one key, and the rack and the lit size follow', () => {
    const start = stateOf();
    expect(litRow(start)).toContain('lightest');
    const shallow = pressing(start, 'f').state;
    expect(shallow.session.best).toBe('depth');
    expect(litRow(shallow)).toContain('shallowest');
    expect(pressing(shallow, 'f').state.session.best).toBe('boardFeet');
    // Without prices there is no cheapest.
    expect(pressing(shallow, 'f', 'f').state.session.best).toBe('weight');
    expect(pressing(inYard(), 'f', 'f', 'f').state.session.best).toBe('price');
    expect(litRow(pressing(inYard(), 'f', 'f', 'f').state)).toMatch(/\(3\) 2x12.*cheapest/);
  });

  it('is undone with one key and decides what x takes', () => {
    const start = stateOf([{ spans: ['12 ft'] }]);
    const shallow = pressing(start, 'f').state;
    expect(pressing(shallow, 'u').state.session).toBe(start.session);
    const depth = (state: State) => memberOf(pressing(state, 'x').state).section.depth;
    expect(depth(shallow)).toBeLessThan(depth(start));
  });

  it('marks on the rack the sizes that none lighter is as shallow as, whatever counts as best', () => {
    const marked = (state: State) =>
      shown(state, 120, 60)
        .filter((row) => row.includes('◊') || row.includes('◆'))
        .map((row) => row.slice(4, 13).trim());
    const start = stateOf([{ spans: ['12 ft'] }], { rows: 60 });
    const sizes = rackOf(memberOf(start)).sizes.filter((each) => each.passes);
    const beaten = (one: (typeof sizes)[number]) =>
      sizes.some(
        (other) =>
          other.weight <= one.weight + 1e-9 &&
          other.size.depth <= one.size.depth &&
          (other.weight < one.weight - 1e-9 || other.size.depth < one.size.depth),
      );
    const front = sizes.filter((each) => !beaten(each)).map(({ size }) => size.label);
    expect(front.length).toBeGreaterThan(1);
    expect(marked(start).sort()).toEqual(front.sort());
  });
});

describe('sizes that the yard lacks', () => {
  it('say so on the rack, are dimmed and never lit', () => {
    const state = inYard();
    const { canvas } = drawState({ ...state, columns: 120, rows: 36 }, unicode);
    const row = frame(canvas).findIndex((text) => text.includes(' 4x16 '));
    expect(frame(canvas)[row]).toContain('not in yard');
    const style = (y: number) => canvas.styles[y * 120 + 6];
    const has = frame(canvas).findIndex((text) => text.includes(' (4) 2x12 '));
    expect(style(row)).not.toBe(style(has));
  });
});
