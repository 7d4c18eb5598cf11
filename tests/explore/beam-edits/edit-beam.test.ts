import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addLoad,
  addOverhang,
  addSpan,
  addWind,
  type Edit,
  removeAt,
  setFixed,
  setSupports,
} from '../../../src/explore/beam-edits/edit-beam.ts';
import { curveOf } from '../../../src/explore/curve.ts';
import { knobsOf } from '../../../src/explore/knobs/knobs.ts';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { LOAD_KINDS } from '../../../src/loads/kinds.ts';
import { readSession, writeSession } from '../../../src/session/index.ts';
import { beamFault, supportPlaces } from '../../../src/statics/index.ts';
import type { Member } from '../../../src/timber/member.ts';
import { CHECK_IDS } from '../../../src/timber/report.ts';
import { memberOf } from '../../support/session.ts';

const FOOT = 12;

function done(edit: Edit): { member: Member; knob: string } {
  if ('fault' in edit) throw new Error(edit.fault);
  return edit;
}

function nudged(
  member: Member,
  key: string,
  direction: 1 | -1,
  times = 1,
): { member: Member; fault: string | null } {
  let now = member;
  for (let i = 0; i < times; i += 1) {
    const turn = knobsOf(now)
      .find((knob) => knob.key === key)!
      .nudge(now, direction, 'normal', 'us');
    if ('fault' in turn) return { member: now, fault: turn.fault };
    now = turn.member;
  }
  return { member: now, fault: null };
}

const WALL = { kind: 'dead', line: '60 plf', from: '0 ft', to: '14 ft' };
const POST = { kind: 'snow', point: '850 lb', at: '5 ft' };

describe('adding', () => {
  it('a span gives another as long as the last, with a bearing like the last, and takes it in hand', () => {
    const { member, knob } = done(
      addSpan(memberOf({ bearing: ['1.5 in', '5.5 in'], tiedDown: ['0 lb', '9 lb'] })),
    );
    expect(member.beam.spans).toEqual([168, 168]);
    expect(member.bearing).toEqual([1.5, 5.5, 5.5]);
    expect(member.tiedDown).toEqual([0, 9, 0]);
    expect(knob).toBe('spans.1');
  });

  it('a span carries a load that runs over all on to the new end, and moves the overhang with what is on it', () => {
    const { member } = done(addSpan(memberOf({ loads: [WALL, POST] })));
    expect(member.loads[0]).toMatchObject({ from: 0, to: 28 * FOOT });
    expect(member.loads[1]).toMatchObject({ at: 5 * FOOT });
    const tip = { kind: 'live', point: '200 lb', at: '16 ft' };
    const onOverhang = done(addSpan(memberOf({ overhangs: { right: '2 ft' }, loads: [tip, WALL] }))).member;
    expect(onOverhang.loads[0]).toMatchObject({ at: 30 * FOOT });
    // It ends at the support, not at the member's end: it covers the span that it covered.
    expect(onOverhang.loads[1]).toMatchObject({ to: 14 * FOOT });
  });

  it('stops at six spans, a hundred loads and one overhang a side, with the reason', () => {
    const six = memberOf({ spans: Array(6).fill('8 ft') });
    expect(addSpan(six)).toEqual({ fault: 'a member has at most 6 spans' });
    const full = memberOf({ loads: Array(100).fill(POST) });
    expect(addLoad(full, 'point', 'dead', 'spans.0', 'us')).toEqual({
      fault: 'a member carries at most 100 loads: take one out first',
    });
    expect(addOverhang(memberOf({ overhangs: { left: '2 ft' } }), 'left', 'us')).toHaveProperty('fault');
    expect(addOverhang(memberOf({ supports: 'cantilever' }), 'left', 'us')).toHaveProperty('fault');
  });

  it('an overhang of a quarter of its span at the left moves every load along with the supports', () => {
    const { member, knob } = done(addOverhang(memberOf({ loads: [POST, WALL] }), 'left', 'us'));
    expect(member.beam.overhangs.left).toBe(3.5 * FOOT);
    expect(member.loads[0]).toMatchObject({ at: 8.5 * FOOT });
    // A load over all still runs over all.
    expect(member.loads[1]).toMatchObject({ from: 0, to: 17.5 * FOOT });
    expect(knob).toBe('overhangs.left');
  });

  it('a point load puts it at mid-span of the span in hand, at the tip of an overhang, and takes its size in hand', () => {
    const two = memberOf({ spans: ['14 ft', '10 ft'], overhangs: { left: '2 ft', right: '3 ft' } });
    const at = (knob: string) => done(addLoad(two, 'point', 'live', knob, 'us')).member.loads[0];
    expect(at('spans.0')).toMatchObject({ kind: 'live', load: 1000, at: 9 * FOOT });
    expect(at('spans.1')).toMatchObject({ at: 21 * FOOT });
    expect(at('overhangs.left')).toMatchObject({ at: 0 });
    expect(at('overhangs.right')).toMatchObject({ at: 29 * FOOT });
    expect(at('section.depth')).toMatchObject({ at: 9 * FOOT });
    expect(
      done(addLoad(memberOf({ supports: 'cantilever' }), 'point', 'live', 'spans.0', 'us')).member.loads[0],
    ).toMatchObject({ at: 14 * FOOT });
    expect(done(addLoad(two, 'point', 'live', 'spans.0', 'us')).knob).toBe('loads.0.point');
  });

  it('line loads run over all, over the span in hand, or rise along it', () => {
    const two = memberOf({ spans: ['14 ft', '10 ft'] });
    const line = (what: 'whole line' | 'partial line' | 'tapered line', member = two) =>
      done(addLoad(member, what, 'snow', 'spans.1', 'us')).member.loads[0];
    expect(line('whole line')).toMatchObject({ from: 0, to: 24 * FOOT });
    expect(line('partial line')).toMatchObject({ from: 14 * FOOT, to: 24 * FOOT });
    expect(line('tapered line')).toMatchObject({ start: 0, end: 100 / 12 });
    expect(line('partial line', memberOf())).toMatchObject({ from: 0, to: 7 * FOOT });
  });
});

describe('supports', () => {
  it('become a cantilever with one bearing and come back with two', () => {
    const arm = done(setSupports(memberOf({ bearing: ['4 in', '5 in'] }), 'cantilever')).member;
    expect(arm.bearing).toEqual([4]);
    expect(done(setSupports(arm, 'bearings')).member.bearing).toEqual([4, 4]);
  });

  it('of several spans or with an overhang become no cantilever, and a cantilever has no other fixed end', () => {
    expect(setSupports(memberOf({ spans: ['8 ft', '8 ft'] }), 'cantilever')).toHaveProperty('fault');
    expect(setSupports(memberOf({ overhangs: { left: '2 ft' } }), 'cantilever')).toHaveProperty('fault');
    expect(setFixed(memberOf({ supports: 'cantilever' }), 'right', true)).toHaveProperty('fault');
  });

  it('do not take an overhang where a notch stands that it would forbid, and name the clause', () => {
    const notched = memberOf({ notch: { left: '1 in' } });
    expect(addOverhang(notched, 'left', 'us')).toMatchObject({ fault: expect.stringContaining('NDS') });
  });
});

describe('removing', () => {
  it('a span closes the member up over what stood in it', () => {
    const three = memberOf({
      spans: ['10 ft', '8 ft', '12 ft'],
      bearing: ['1 in', '2 in', '3 in', '4 in'],
      loads: [
        { kind: 'live', point: '1 kip', at: '5 ft' },
        { kind: 'live', point: '1 kip', at: '14 ft' },
        { kind: 'live', point: '1 kip', at: '20 ft' },
        { kind: 'snow', line: ['0 plf', '80 plf'], from: '6 ft', to: '14 ft' },
        { kind: 'dead', line: '60 plf', from: '0 ft', to: '30 ft' },
      ],
    });
    const { member, knob } = done(removeAt(three, 'spans.1', 'span 2'));
    expect(member.beam.spans).toEqual([120, 144]);
    expect(member.bearing).toEqual([1, 2, 4]);
    expect(member.loads.map((load) => (load.type === 'point' ? load.at : [load.from, load.to]))).toEqual([
      60,
      144,
      [72, 120],
      [0, 264],
    ]);
    // The rising load is cut where the span began: half way up.
    expect(member.loads[2]).toMatchObject({ start: 0, end: 80 / 12 / 2 });
    expect(knob).toBe('spans.1');
  });

  it('the first span takes its own support away, the last its own', () => {
    const two = memberOf({ spans: ['10 ft', '8 ft'], bearing: ['1 in', '2 in', '3 in'] });
    expect(done(removeAt(two, 'spans.0', '')).member.bearing).toEqual([2, 3]);
    expect(done(removeAt(two, 'spans.1', '')).member.bearing).toEqual([1, 2]);
  });

  it('the last span is refused, and so is what can only be changed', () => {
    expect(removeAt(memberOf(), 'spans.0', 'span')).toEqual({
      fault: 'the last span stays: a member needs at least one',
    });
    expect(removeAt(memberOf(), 'section.depth', 'depth')).toMatchObject({
      fault: expect.stringContaining('depth can only be changed'),
    });
  });

  it('an overhang takes the loads on it and cuts those that reach over it', () => {
    const tips = [0, 16].map((at) => ({ kind: 'live', point: '200 lb', at: `${at} ft` }));
    const both = memberOf({
      spans: ['12 ft'],
      overhangs: { left: '2 ft', right: '2 ft' },
      loads: [...tips, { kind: 'dead', line: '60 plf' }],
    });
    const left = done(removeAt(both, 'overhangs.left', '')).member;
    expect(left.loads).toMatchObject([{ at: 14 * FOOT }, { from: 0, to: 14 * FOOT }]);
    const none = done(removeAt(left, 'overhangs.right', '')).member;
    expect(none.loads).toMatchObject([{ from: 0, to: 12 * FOOT }]);
  });

  it('a load puts the next one in hand, the last one the span', () => {
    const two = memberOf({ loads: [POST, WALL] });
    const one = done(removeAt(two, 'loads.0.at', ''));
    expect(one.member.loads).toEqual([two.loads[1]]);
    expect(one.knob).toBe('loads.0.kind');
    expect(done(removeAt(one.member, 'loads.0.kind', '')).knob).toBe('spans.0');
  });

  it('takes a tie-down off, and an area load', () => {
    const tied = memberOf({ tiedDown: ['0 lb', '900 lb'] });
    expect(done(removeAt(tied, 'tiedDown.1', '')).member.tiedDown).toBeNull();
    expect(done(removeAt(memberOf(), 'area.live', '')).member.area.live).toBe(0);
    expect(removeAt(memberOf(), 'area.snow', '')).toMatchObject({ fault: expect.stringContaining('snow') });
  });
});

describe('the knobs of a beam', () => {
  it('stop a nudge of the span where a load would leave the member, and say which load in the units at hand', () => {
    const { member, fault } = nudged(memberOf({ loads: [{ ...POST, at: '12 ft' }] }), 'spans.0', -1, 99);
    expect(member.beam.spans[0]).toBe(12 * FOOT);
    expect(fault).toBe(`point load 1 reaches 12'-0" and would be left beyond the end: move it first`);
    const wall = nudged(memberOf({ loads: [{ ...WALL, from: '2 ft', to: '13 ft' }] }), 'spans.0', -1, 99);
    expect(wall.member.beam.spans[0]).toBe(13 * FOOT);
    expect(wall.fault).toContain('line load 1');
  });

  it('stop a load at the ends of the member', () => {
    expect(nudged(memberOf({ loads: [POST] }), 'loads.0.at', 1, 99)).toMatchObject({
      member: { loads: [{ at: 14 * FOOT }] },
      fault: expect.stringContaining('the place of point load 1 runs from'),
    });
    expect(nudged(memberOf({ loads: [WALL] }), 'loads.0.from', 1, 99).member.loads[0]).toMatchObject({
      from: 14 * FOOT - 1,
    });
  });

  it('carry along what stands beyond a span that grows', () => {
    const two = memberOf({
      spans: ['10 ft', '8 ft'],
      loads: [
        { ...POST, at: '14 ft' },
        { ...POST, at: '3 ft' },
        { kind: 'live', line: '40 plf', from: '10 ft', to: '18 ft' },
      ],
    });
    const { member } = nudged(two, 'spans.0', 1, 4);
    expect(member.loads).toMatchObject([{ at: 15 * FOOT }, { at: 3 * FOOT }, { from: 132, to: 228 }]);
    expect(nudged(member, 'spans.0', -1, 4).member.loads).toEqual(two.loads);
    // The line over the last span goes with its end.
    expect(nudged(two, 'spans.1', 1, 4).member.loads[2]).toMatchObject({ from: 120, to: 228 });
  });

  it('list a tie-down for each support that lifts, and for no other', () => {
    const keys = (member: Member) =>
      knobsOf(member)
        .map((knob) => knob.key)
        .filter((key) => /^tied/.test(key));
    expect(keys(memberOf())).toEqual([]);
    const canopy = memberOf({ spans: ['12 ft'], overhangs: { right: '3 ft' } });
    expect(keys(canopy)).toEqual([]);
    const long = memberOf({ spans: ['6 ft'], overhangs: { right: '6 ft' } });
    expect(keys(long)).toEqual(['tiedDown.0']);
    const tied = nudged(long, 'tiedDown.0', 1, 4).member;
    expect(tied.tiedDown).toEqual([1000, 0]);
  });

  it('take one bearing for all or one for each', () => {
    const bearing = (text: string) =>
      knobsOf(memberOf())
        .find((knob) => knob.key === 'bearing')!
        .enter(memberOf(), text, 'us');
    expect(bearing('5.5')).toMatchObject({ member: { bearing: [5.5, 5.5] } });
    expect(bearing('3.5, 5 1/2')).toMatchObject({ member: { bearing: [3.5, 5.5] } });
    expect(bearing('3.5, 5.5, 3.5')).toMatchObject({ fault: expect.stringContaining('2 supports') });
    const { member } = nudged(memberOf({ bearing: ['3.5 in', '5.5 in'] }), 'bearing', 1);
    expect(member.bearing).toEqual([4, 6]);
    expect(nudged(member, 'bearing.1', 1).member.bearing).toEqual([4, 6.5]);
  });

  it('take a slope as 4:12, 4 or level', () => {
    const slope = (text: string) =>
      knobsOf(memberOf())
        .find(({ key }) => key === 'slope')!
        .enter(memberOf(), text, 'us');
    expect(slope('4:12')).toMatchObject({ member: { slope: 4 / 12 } });
    expect(slope('4')).toMatchObject({ member: { slope: 4 / 12 } });
    expect(slope('1:3')).toMatchObject({ member: { slope: 4 / 12 } });
    expect(slope('level')).toMatchObject({ member: { slope: 0 } });
    expect(slope('30:12')).toHaveProperty('fault');
    expect(slope('x:12')).toHaveProperty('fault');
  });
});

describe('a curve along a span', () => {
  it('has no value where a load would be left off the member', () => {
    const member = memberOf({ loads: [{ ...POST, at: '12 ft' }] });
    const span = knobsOf(member).find(({ key }) => key === 'spans.0')!.number!;
    const { ratios } = curveOf(member, span, 10 * FOOT, 14 * FOOT, 5);
    expect(ratios[1].map(Number.isNaN)).toEqual([true, true, false, false, false]);
  });
});

/** One thing a person may do to a beam; the numbers pick among what there is. */
type Act = { readonly what: number; readonly which: number; readonly kind: (typeof LOAD_KINDS)[number] };

function acted(member: Member, { what, which, kind }: Act, units: 'us' | 'si'): Edit {
  const knobs = knobsOf(member);
  const knob = knobs[which % knobs.length]!;
  const edits: (() => Edit)[] = [
    () => addSpan(member),
    () => addOverhang(member, which % 2 === 0 ? 'left' : 'right', units),
    () => setSupports(member, which % 2 === 0 ? 'cantilever' : 'bearings'),
    () => setFixed(member, which % 2 === 0 ? 'left' : 'right', which % 3 === 0),
    () => addLoad(member, 'point', kind, knob.key, units),
    () => addLoad(member, 'whole line', kind, knob.key, units),
    () => addLoad(member, 'partial line', kind, knob.key, units),
    () => addLoad(member, 'tapered line', kind, knob.key, units),
    () => addWind(member, which % 2 === 0 ? 'wind' : 'windUp', units),
    () => removeAt(member, knob.key, knob.label),
    () => {
      const turn = knob.nudge(member, which % 2 === 0 ? 1 : -1, which % 3 === 0 ? 'coarse' : 'normal', units);
      return 'fault' in turn ? turn : { ...turn, knob: knob.key };
    },
  ];
  return edits[what % edits.length]!();
}

describe('any run of edits and nudges', () => {
  it('leaves a member that the core takes and works out without NaN, and that reads back from its file', () => {
    const act = fc.record({ what: fc.nat(30), which: fc.nat(60), kind: fc.constantFrom(...LOAD_KINDS) });
    fc.assert(
      fc.property(
        fc.array(act, { maxLength: 40 }),
        fc.constantFrom('us' as const, 'si' as const),
        (acts, units) => {
          let member = memberOf();
          for (const each of acts) {
            const edit = acted(member, each, units);
            if ('fault' in edit) {
              expect(edit.fault).not.toBe('');
              continue;
            }
            ({ member } = edit);
            expect(beamFault(member.beam, member.loads)).toBeNull();
            const supports = supportPlaces(member.beam).length;
            expect(member.bearing).toHaveLength(supports);
            if (member.tiedDown !== null) expect(member.tiedDown).toHaveLength(supports);
            const keys = knobsOf(member).map((knob) => knob.key);
            expect(keys).toContain(edit.knob.startsWith('tiedDown') ? 'bearing' : edit.knob);
            expect(new Set(keys).size).toBe(keys.length);
          }
          const ratios = ratiosOf(member);
          // NaN says that a check does not apply; shear, bending and deflection always do, but under no load at all.
          const powers = [CHECK_IDS.indexOf('shear'), CHECK_IDS.indexOf('deflection-total')];
          for (const at of powers) expect(ratios[at], JSON.stringify(member)).not.toBeNaN();
          const session = {
            title: '',
            units,
            combinations: member.combinations,
            members: [{ member, written: undefined }],
          };
          const read = readSession(writeSession(session), 'x.json');
          expect(read.ok ? '' : read.fault).toBe('');
        },
      ),
      { numRuns: 150 },
    );
  });
});
