import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addOverhang, addSpan, type Edit, removeAt } from '../../../src/explore/beam-edits/edit-beam.ts';
import { placeFault } from '../../../src/explore/beam-edits/placed.ts';
import { sweepsOf } from '../../../src/explore/handovers/sweep.ts';
import { knobsOf } from '../../../src/explore/knobs/knobs.ts';
import { scaleLengths } from '../../../src/explore/scale.ts';
import type { Link } from '../../../src/loads/index.ts';
import type { Member } from '../../../src/timber/member.ts';
import { memberOf } from '../../support/session.ts';

/** A beam with loads of 1 lb and 1 lb/in, and a link wherever a load is. */
function twinOf(spans: string[], places: readonly (readonly [number, number])[]): Member {
  const length = memberOf({ spans }).beam.spans.reduce((sum, span) => sum + span, 0);
  const loads = places.map(([a, b]) =>
    a === b
      ? { kind: 'live', point: '1 lb', at: `${a * length} in` }
      : {
          kind: 'live',
          line: '12 plf',
          from: `${Math.min(a, b) * length} in`,
          to: `${Math.max(a, b) * length} in`,
        },
  );
  const member = memberOf({ spans, loads });
  const named = { member: 'J1', end: 'left', bears: null } as const;
  const links = member.loads.map(
    (load): Link =>
      load.type === 'point'
        ? { ...named, type: 'point', at: load.at }
        : { ...named, type: 'line', every: 16, from: load.from, to: load.to },
  );
  return { ...member, links };
}

const place = (of: Member['loads'][number] | Link) => (of.type === 'point' ? [of.at] : [of.from, of.to]);

const part = fc.integer({ min: 0, max: 8 }).map((n) => n / 8);
const anyTwin = fc
  .tuple(
    fc.array(fc.constantFrom('10 ft', '14 ft'), { minLength: 1, maxLength: 3 }),
    fc.array(
      fc.oneof(
        part.map((a) => [a, a] as const),
        fc.tuple(part, part),
      ),
      { minLength: 1, maxLength: 4 },
    ),
  )
  .map(([spans, places]) => twinOf(spans, places));

const taken = (member: Member, edit: Edit) => ('fault' in edit ? member : edit.member);
const nudge = (key: string, direction: 1 | -1) => (member: Member) => {
  const turn = knobsOf(member)
    .find((knob) => knob.key === key)
    ?.nudge(member, direction, 'coarse', 'us');
  return turn === undefined || 'fault' in turn ? member : turn.member;
};
const EDITS: readonly ((member: Member) => Member)[] = [
  nudge('spans.0', 1),
  nudge('spans.0', -1),
  nudge('spans.1', -1),
  nudge('overhangs.left', 1),
  (member) => taken(member, addSpan(member)),
  (member) => taken(member, addOverhang(member, 'left', 'us')),
  (member) => taken(member, addOverhang(member, 'right', 'us')),
  (member) => taken(member, removeAt(member, 'spans.0', 'span')),
  (member) => taken(member, removeAt(member, 'overhangs.left', 'overhang')),
  (member) => taken(member, removeAt(member, 'overhangs.right', 'overhang')),
  (member) => scaleLengths(member, 1.25),
];

describe('the places of links', () => {
  it('go exactly as those of loads that stand there, whatever is done to the beam', () => {
    fc.assert(
      fc.property(anyTwin, fc.array(fc.constantFrom(...EDITS), { maxLength: 6 }), (twin, edits) => {
        const member = edits.reduce((now, edit) => edit(now), twin);
        expect(member.links!.map(place)).toEqual(member.loads.map(place));
        expect(placeFault(member)).toBeNull();
      }),
      { numRuns: 300 },
    );
  });

  it('stop a nudge that would leave them beyond the end, by name', () => {
    const member = { ...twinOf(['14 ft'], [[1, 1]]), loads: [] };
    const span = knobsOf(member).find(({ key }) => key === 'spans.0')!;
    expect(span.nudge(member, -1, 'normal', 'us')).toEqual({
      fault: `link 1 reaches 14'-0" and would be left beyond the end: move it first`,
    });
  });

  it('are knobs of their own, held to the member', () => {
    const member = twinOf(
      ['14 ft'],
      [
        [0.5, 0.5],
        [0, 1],
      ],
    );
    const knob = (key: string) => knobsOf(member).find((each) => each.key === key)!;
    expect(
      knobsOf(member)
        .filter(({ key }) => key.startsWith('links.'))
        .map(({ key }) => key),
    ).toEqual(['links.0.at', 'links.1.every', 'links.1.from', 'links.1.to']);
    expect(knob('links.0.at').label).toBe('J1 left end at');
    expect(knob('links.0.at').enter(member, '15', 'us')).toEqual({
      fault: `the place of link 1 runs from 0'-0" to 14'-0"`,
    });
    expect(knob('links.1.every').enter(member, '0', 'us')).toHaveProperty('fault');
    const wider = knob('links.1.every').nudge(member, 1, 'normal', 'us');
    expect('member' in wider && wider.member.links![1]).toMatchObject({ every: 20, from: 0, to: 168 });
  });

  it('are typed over where the spacing of the other member gave them', () => {
    const twin = twinOf(['14 ft'], [[0, 1]]);
    const member = { ...twin, links: [{ ...twin.links![0]!, bySpacing: true } as Link] };
    const turn = knobsOf(member)
      .find(({ key }) => key === 'links.0.every')!
      .enter(member, '19.2', 'us');
    expect('member' in turn && turn.member.links![0]).not.toHaveProperty('bySpacing');
    expect('member' in turn && turn.member.links![0]).toMatchObject({ every: 19.2 });
  });

  it('stay where they are stated when a span is swept, and follow its end where none is', () => {
    const member = {
      ...twinOf(
        ['14 ft'],
        [
          [0, 0.5],
          [0, 1],
        ],
      ),
      loads: [],
    };
    const to = (stated: readonly { to: boolean }[]) =>
      sweepsOf(member, stated)
        .find(({ key }) => key === 'spans.0')!
        .put(member, 240)
        .links!.map((link) => (link.type === 'line' ? link.to : 0));
    expect(to([])).toEqual([84, 168]);
    expect(to([{ to: true }, { to: false }])).toEqual([84, 240]);
  });
});
