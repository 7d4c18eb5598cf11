import { describe, expect, it } from 'vitest';
import { handoversOf, type Segment } from '../../src/explore/handovers/handovers.ts';
import { sweepsOf } from '../../src/explore/handovers/sweep.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import type { HandoversMode } from '../../src/screen/mode.ts';
import { restOf } from '../../src/screen/rest.ts';
import { memberOf } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { rankingOf } from '../../src/session/index.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { afterEvents, atRest, pressing, stateOf } from '../support/state.ts';
import { ascii } from './panels/support.ts';

const onLive = () => ({ ...stateOf(), knob: 'area.live' });
/** Glulam over two spans and an overhang: sizes take turns along its first span. */
const onGirder = () =>
  stateOf([
    {
      spans: ['14 ft', '10 ft'],
      overhangs: { right: '4 ft' },
      tributary: '8 ft',
      spacing: undefined,
      stock: { product: 'glulam', species: 'Western species', grade: '24F-1.8E' },
      section: { width: '5.125 in', depth: '13.5 in', plies: 1 },
    },
  ]);
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

  it('follow the price where that counts as best, along the span too and for the section in hand', () => {
    const start = stateOf();
    const any = { product: null, species: null, grade: null };
    const prices = (
      [
        ['2x12', 1.6],
        ['2x14', 3],
        ['4x16', 9],
      ] as const
    ).map(([size, amount]) => ({ ...any, size, price: { amount, per: 'foot' as const } }));
    const session = { ...start.session, best: 'price' as const, prices };
    for (const knob of ['spans.0', 'section.depth', 'stock.grade']) {
      const state = atRest({ ...start, session, knob });
      const parts = /^span: (.+) is cheapest (?:from .+|up) to .+/.exec(viewOf(state).handover ?? '');
      const { sizes, lit } = rankedRack(memberOf(state), rankingOf(session));
      expect(parts?.[1], knob).toBe(sizes[lit]!.size.label);
    }
  });

  it('are not searched where nothing is lit', () => {
    expect(restOf({ ...stateOf([{ spans: ['90 ft'] }]), knob: 'area.live' })).toBeNull();
  });
});

describe('the strip of handovers', () => {
  framesAreKept({
    'handovers-span': (size) => atRest(pressing({ ...stateOf(), ...size }, 'H').state),
    'handovers-live': (size) => atRest(pressing({ ...onLive(), ...size }, 'H').state),
  });

  it('opens at once, is found after the frame and is what the core finds', () => {
    const open = pressing(stateOf(), 'H').state;
    expect(shown(open, 80, 24).join('\n')).toContain('being found');
    expect(restOf(open)).toEqual({ ms: 0 });
    const { strip } = atRest(open).mode as HandoversMode;
    const member = memberOf(open);
    const { put } = sweepsOf(member).find(({ key }) => key === 'spans.0')!;
    expect(strip!.groups.flat()).toEqual(handoversOf(member, put, strip!.from, strip!.to));
    expect(strip!.from).toBeLessThan(strip!.now);
    // The workings looked at on the way there do not get in the way of it, in other units either.
    const { state: begun } = afterEvents(open, { type: 'settle' }, { type: 'settle' });
    expect((begun.mode as HandoversMode).search).not.toBeNull();
    const back = atRest(pressing(begun, 'w', 'escape').state).mode as HandoversMode;
    expect(back.strip!.groups).toEqual(strip!.groups);
    const metric = atRest(pressing(begun, 'w', 'i', 'escape').state);
    const { groups, from, to } = (metric.mode as HandoversMode).strip!;
    expect(groups.flat()).toEqual(handoversOf(memberOf(metric), put, from, to));
  });

  it('is found a part at a time, says how far it has come, and Escape leaves it at once', () => {
    let state = pressing(onGirder(), 'H').state;
    const said = new Set<string>();
    for (let part = 0; (state.mode as HandoversMode).strip === null; part += 1) {
      expect(part).toBeLessThan(1000);
      said.add(/being found.*/.exec(shown(state, 80, 24).join('\n'))![0].trim());
      expect(pressing(state, 'escape').state.mode.name).toBe('explore');
      state = afterEvents(state, { type: 'settle' }).state;
    }
    const tenths = [10, 20, 30, 40, 50, 60, 70, 80, 90].map((percent) => `being found, ${percent} %`);
    const after = [...said].slice(1);
    expect([...said][0]).toBe('being found ...');
    expect(after.length).toBeGreaterThan(5);
    expect(tenths.filter((text) => said.has(text))).toEqual(after);
  });

  it('gives a line to neighbours too narrow to show, and counts them', () => {
    const state = atRest(pressing(onGirder(), 'H').state);
    const { strip } = state.mode as HandoversMode;
    const { groups, show } = strip!;
    const isNarrow = ({ from, to }: Segment) => show(from) === show(to);
    for (const group of groups) if (group.length > 1) expect(group.every(isNarrow)).toBe(true);
    // No two lines beside each other of stretches that show no width.
    const lines = groups.map((group) => group.every(isNarrow));
    expect(lines.some((narrow, at) => narrow && lines[at + 1])).toBe(false);
    const all = groups.flat();
    for (const [at, { from }] of all.entries()) expect(from).toBe(all[at - 1]?.to ?? strip!.from);
    const most = Math.max(...groups.map(({ length }) => length));
    expect(most).toBeGreaterThan(1);
    expect(shown(state, 120, 400).join('\n')).toContain(`${most} narrower ones: `);
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
