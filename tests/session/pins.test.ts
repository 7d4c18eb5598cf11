import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Pin } from '../../src/session/session.ts';
import { writeSession } from '../../src/session/write.ts';
import { member } from './arbitrary-member.ts';
import { faultOf, rawMember, rawSession, sessionOf } from './documents.ts';

const { name: _name, ...DESIGN } = rawMember({ section: { width: '3.5 in', depth: '11 1/4"' } });
const withPins = (...pins: unknown[]) => rawSession([rawMember({ note: 'deck', count: 3, pins })]);

describe('pins', () => {
  it('are read as whole designs that are called what their member is', () => {
    const [one] = sessionOf(withPins({ note: 'wider', design: DESIGN })).members;
    expect(one!.pins).toHaveLength(1);
    expect(one!.pins![0]).toMatchObject({
      note: 'wider',
      member: { name: 'G1', note: 'deck', count: 3, section: { width: 3.5, depth: 11.25, plies: 1 } },
    });
  });

  it('keep the text that the user wrote', () => {
    const text = writeSession(sessionOf(withPins({ design: DESIGN }, { note: 'b', design: DESIGN })));
    expect(text).toContain(String.raw`"depth": "11 1/4\""`);
    expect(writeSession(sessionOf(text))).toBe(text);
  });

  it('of any design are given back to the last bit, and are gone once all are dropped', () => {
    fc.assert(
      fc.property(fc.array(member, { minLength: 1, maxLength: 6 }), (designs) => {
        const session = sessionOf(rawSession());
        const { member: own } = session.members[0]!;
        const pins = designs.map(
          (each, at): Pin => ({
            note: at === 0 ? '' : `no. ${at}`,
            member: {
              ...each,
              name: own.name,
              note: own.note,
              count: own.count,
              combinations: own.combinations,
            },
            written: undefined,
          }),
        );
        const text = writeSession({ ...session, members: [{ ...session.members[0]!, pins }] });
        const back = sessionOf(text);
        expect(back.members[0]!.pins!.map(({ note, member: each }) => [note, each])).toEqual(
          pins.map(({ note, member: each }) => [note, each]),
        );
        expect(writeSession(back)).toBe(text);
        const without = writeSession({ ...back, members: [{ ...back.members[0]!, pins: [] }] });
        expect(sessionOf(without).members[0]!.pins).toEqual([]);
      }),
      { numRuns: 60 },
    );
  });

  it('are left out of a file whose members have none', () => {
    expect(writeSession(sessionOf(rawSession()))).not.toContain('pins');
  });

  it('are refused with their path where a design is none', () => {
    const at = (pin: unknown) => faultOf(withPins({ design: DESIGN }, pin));
    expect(at({ design: { ...DESIGN, name: 'G2' } })).toContain('members[0].pins[1].design.name');
    expect(at({ note: 'x' })).toContain('members[0].pins[1].design');
    expect(at({ design: { ...DESIGN, spans: ['14'] } })).toContain('members[0].pins[1].design.spans');
    expect(at({ design: { ...DESIGN, pins: [] } })).toContain('members[0].pins[1].design.pins');
    expect(at({ design: { ...DESIGN, notch: { left: '12 in' } } })).toContain(
      'members[0].pins[1].design.notch.left',
    );
    expect(
      at({ design: { ...DESIGN, stock: { product: 'timber', species: 'Pine', grade: 'No.2' } } }),
    ).toContain('members[0].pins[1].design.stock');
    expect(faultOf(withPins(...Array(7).fill({ design: DESIGN })))).toContain('members[0].pins');
  });
});
