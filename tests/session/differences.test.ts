import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changed, differences, isEmpty, reversed } from '../../src/session/differences.ts';

/** Raw records as a session file may hold them: no key that is undefined, none with a dot. */
const raw = fc.dictionary(
  fc.constantFrom('spans', 'section', 'loads', 'area', 'note', 'bearing'),
  fc.oneof(
    fc.string(),
    fc.integer(),
    fc.array(fc.constantFrom('1 ft', '2 ft', '3 ft'), { maxLength: 4 }),
    fc.array(fc.record({ kind: fc.constantFrom('dead', 'live'), line: fc.constantFrom('1 plf', '2 plf') }), {
      maxLength: 4,
    }),
    fc.dictionary(fc.constantFrom('depth', 'width', 'plies'), fc.integer(), { maxKeys: 3 }),
  ),
);
/** Without the prototype-free objects of the generator, which nothing reads from a file. */
const plain = (value: unknown): unknown => JSON.parse(JSON.stringify(value));

describe('the difference of two records', () => {
  it('leads from the one to the other, and reversed back', () => {
    fc.assert(
      fc.property(raw, raw, (one, other) => {
        const [before, after] = [plain(one), plain(other)];
        const change = differences(before, after);
        expect(changed(before, change)).toEqual(after);
        expect(changed(after, reversed(change))).toEqual(before);
        expect(isEmpty(change)).toBe(
          JSON.stringify(before) === JSON.stringify(after) || isEmpty(differences(after, before)),
        );
      }),
    );
  });

  it('names a value by its path, and says so where it was not there', () => {
    const before = { spans: ['14 ft', '12 ft'], section: { depth: '9.25 in' } };
    const after = { spans: ['14 ft', '13 ft'], section: { depth: '9.25 in', plies: 2 } };
    expect(differences(before, after)).toEqual({
      from: { 'spans.1': '12 ft' },
      to: { 'spans.1': '13 ft', 'section.plies': 2 },
    });
  });

  it('is one entry where a list has one more or one less, wherever that stands', () => {
    const loads = [{ kind: 'dead' }, { kind: 'live' }, { kind: 'snow' }];
    expect(differences({ loads }, { loads: loads.toSpliced(1, 1) })).toEqual({
      from: { 'loads.1': { kind: 'live' } },
      to: {},
    });
    expect(differences({ loads: loads.slice(0, 2) }, { loads })).toEqual({
      from: {},
      to: { 'loads.2': { kind: 'snow' } },
    });
  });

  it('that leads nowhere, as after an edit by hand, gives nothing', () => {
    const change = { from: { 'loads.3.line': '1 plf' }, to: { 'loads.3.line': '2 plf' } };
    expect(changed({ loads: [] }, change)).toBeUndefined();
    expect(changed({ loads: 'none' }, change)).toBeUndefined();
    expect(changed({ loads: [] }, { from: {}, to: { 'loads.7': {} } })).toBeUndefined();
    expect(changed({}, { from: {}, to: { 'loads.x.y.z': 1 } })).toBeUndefined();
  });

  it('never reaches what every object has', () => {
    const change = { from: {}, to: { '__proto__.polluted': 1, 'constructor.prototype.polluted': 1 } };
    changed({}, change);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });
});
