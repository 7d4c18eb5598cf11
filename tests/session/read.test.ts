import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readSession } from '../../src/session/read.ts';
import { ASSUMED_KEYS } from '../../src/timber/member.ts';
import { faultOf, rawMember, rawSession, sessionOf } from './documents.ts';

const memberOf = (over: Record<string, unknown>) =>
  sessionOf(rawSession([rawMember(over)])).members[0]!.member;
const memberFault = (over: Record<string, unknown>) => faultOf(rawSession([rawMember(over)]));

describe('a session that is right', () => {
  test('gets the defaults of the contract where nothing is said', () => {
    const session = sessionOf(rawSession());
    expect(session).toMatchObject({ title: '', units: 'us', combinations: 'ASCE 7-16' });
    expect(session.members[0]!.member).toEqual({
      name: 'G1',
      note: '',
      use: 'floor',
      count: 1,
      beam: {
        spans: [168],
        overhangs: { left: 0, right: 0 },
        supports: 'bearings',
        fixed: { left: false, right: false },
      },
      bearing: [3.5, 3.5],
      spacing: null,
      tributary: 72,
      area: { dead: 0, live: 0, roofLive: 0, snow: 0, rain: 0, wind: 0, windUp: 0 },
      loads: [],
      selfWeight: true,
      combinations: 'ASCE 7-16',
      liveReduction: null,
      slope: 0,
      stock: {
        product: 'dimension lumber',
        species: 'Douglas Fir-Larch',
        grade: 'No.2',
        values: null,
        valuesFrom: null,
      },
      section: { width: 1.5, depth: 11.25, plies: 2, flat: false },
      maxDepth: null,
      maxWidth: null,
      service: 'dry',
      temperature: 'normal',
      incised: false,
      repetitive: false,
      seasoned: true,
      bracing: 'continuous',
      bracingBottom: 'ends',
      shearAt: 'support',
      notch: { left: 0, right: 0 },
      tiedDown: null,
      limits: { live: 360, total: 240, liveMax: null },
      creep: 'half dead',
      rack: null,
      typedFactors: null,
      assumed: [...ASSUMED_KEYS],
    });
  });

  test('is read with every key of the contract', () => {
    const session = sessionOf(
      rawSession(
        [
          rawMember({
            note: 'carries the loft joists',
            use: 'roof-ceiling',
            count: 3,
            spans: ['14 ft', '3 m'],
            overhangs: { left: '0 ft', right: '2 ft' },
            supports: 'bearings',
            fixed: { left: true, right: false },
            bearing: ['3.5 in', '5.5 in', '90 mm'],
            spacing: '16 in',
            area: { dead: '12 psf', live: '1.9 kPa', windUp: '10 psf' },
            loads: [
              { kind: 'dead', line: '60 plf', from: '0 ft', to: '8 ft' },
              { kind: 'live', line: ['0 plf', '90 plf'], from: '8 ft', to: '14 ft' },
              { kind: 'snow', point: '850 lb', at: '5 ft' },
              { kind: 'rain', line: '1.5 kN/m' },
            ],
            selfWeight: false,
            liveReduction: { area: '600 ft2', KLL: 2 },
            slope: '4:12',
            flat: false,
            maxDepth: '14 in',
            maxWidth: '6 in',
            service: 'wet',
            temperature: '100-125 F',
            incised: true,
            repetitive: true,
            seasoned: false,
            bracing: '4 ft',
            bracingBottom: 'continuous',
            shearAt: 'd',
            tiedDown: ['0 lb', '900 lb', '4 kN'],
            limits: { live: 480, liveMax: '0.5 in' },
            creep: 'Kcr',
          }),
        ],
        { title: 'Job', units: 'si', combinations: 'ASCE 7-22' },
      ),
    );
    const { member } = session.members[0]!;
    const metre = 10_000 / 254;
    expect(session).toMatchObject({ title: 'Job', units: 'si', combinations: 'ASCE 7-22' });
    expect(member).toMatchObject({
      use: 'roof-ceiling',
      count: 3,
      combinations: 'ASCE 7-22',
      beam: {
        spans: [168, 3 * metre],
        overhangs: { left: 0, right: 24 },
        fixed: { left: true, right: false },
      },
      spacing: 16,
      tributary: 16,
      selfWeight: false,
      liveReduction: { area: 600 * 144, KLL: 2 },
      slope: 4 / 12,
      maxDepth: 14,
      maxWidth: 6,
      bracing: 48,
      bracingBottom: 'continuous',
      limits: { live: 480, total: 180, liveMax: 0.5 },
      assumed: [],
    });
    expect(member.bearing).toEqual([3.5, 5.5, 900 / 254]);
    expect(member.area.dead).toBe(12 / 144);
    // 1 kPa = 0.1450377 psi (NIST SP 811, from memory)
    expect(member.area.live).toBeCloseTo(1.9 * 0.1450377, 6);
    expect(member.loads).toEqual([
      { type: 'line', kind: 'dead', from: 0, to: 96, start: 5, end: 5 },
      { type: 'line', kind: 'live', from: 96, to: 168, start: 0, end: 7.5 },
      { type: 'point', kind: 'snow', at: 60, load: 850 },
      {
        type: 'line',
        kind: 'rain',
        from: 0,
        to: 168 + 3 * metre + 24,
        start: expect.closeTo(8.565, 3),
        end: expect.closeTo(8.565, 3),
      },
    ]);
    expect(member.tiedDown![2]).toBeCloseTo(899.2, 1);
  });

  test.each([
    ['floor', 360, 240],
    ['roof-plaster', 360, 240],
    ['roof-ceiling', 240, 180],
    ['roof', 180, 120],
  ])('takes the limits of its use, %s: l/%d and l/%d', (use, live, total) => {
    expect(memberOf({ use }).limits).toEqual({ live, total, liveMax: null });
  });

  test('counts timbers as unseasoned unless stated', () => {
    const timber = {
      stock: { product: 'timber', species: 'Douglas Fir-Larch', grade: 'No.1' },
      section: { width: '5.5 in', depth: '11.5 in' },
    };
    expect(memberOf(timber).seasoned).toBe(false);
    expect(memberOf({ ...timber, seasoned: true }).seasoned).toBe(true);
  });

  test('lists as assumed the keys that nobody stated, and only those', () => {
    for (const [key, value] of [
      ['bearing', '3.5 in'],
      ['bracing', 'continuous'],
      ['bracingBottom', 'ends'],
      ['seasoned', true],
      ['service', 'dry'],
      ['temperature', 'normal'],
    ] as const) {
      expect(memberOf({ [key]: value }).assumed).toEqual(ASSUMED_KEYS.filter((one) => one !== key));
    }
  });

  test('may have a position that overshoots the end by the rounding of another unit, and is cut to the end', () => {
    const member = memberOf({
      spans: ['4.2 m', '3.1 m'],
      loads: [{ kind: 'dead', point: '1 kN', at: '7.3 m' }],
    });
    const whole = member.beam.spans[0]! + member.beam.spans[1]!;
    expect((member.loads[0] as { at: number }).at).toBeLessThanOrEqual(whole);
  });
});

describe('what is not a session document', () => {
  test.each([
    ['', 'is empty'],
    [' \n ', 'is empty'],
    ['{"thrice": 1, "members": [', 'ends before the JSON is complete'],
    ['{"thrice": 1, "members": [{"name": "G1', 'ends before the JSON is complete'],
    ['not json', 'not JSON at line 1, column 1'],
    ['{\n  "thrice": 1,\n  oops\n}', 'line 3, column 3'],
    ['{"thrice": 1, "thrice": 1}', '"thrice" is given twice'],
    ['{"thrice": 1, "__proto__": {}}', '"__proto__" is not allowed'],
    [`{"thrice": ${'['.repeat(100)}${']'.repeat(100)}}`, 'nested deeper'],
    [`${'['.repeat(200_000)}`, 'nested deeper'],
    ['\uFEFF{"thrice": 1}', 'byte order mark'],
    ['{"thrice": 1}\0', 'NUL'],
    ['{"title": "\uFFFD"}', 'not UTF-8'],
    ['[]', 'a session is an object'],
    ['null', 'a session is an object'],
    ['"text"', 'a session is an object'],
    ['{}', 'thrice: missing; a session begins with "thrice": 1'],
    ['{"thrice": 2, "members": []}', 'this version reads format 1'],
    ['{"thrice": "1", "members": []}', 'this version reads format 1'],
    ['{"thrice": 1}', 'members: missing'],
    ['{"thrice": 1, "members": []}', 'members: 0 entries; it takes at least 1'],
    ['{"thrice": 1, "members": {}}', 'members: an object stands where a list'],
    ['{"thrice": 1, "members": [3]}', 'members[0]: 3 stands where an object'],
    ['{"thrice": 1, "members": [null]}', 'members[0]: null stands where an object'],
    ['{} {}', 'something follows'],
    ['{"thrice": 1e999}', 'too large'],
    ['{"thrice": 01}', 'expected "," or "}"'],
    ['{"a": "\\x"}', 'unknown escape'],
    ['{"a": "line\nbreak"}', 'not closed'],
    ["{'a': 1}", 'key in double quotes'],
    ['{"a": NaN}', 'unexpected "NaN"'],
    ['{"a": 1,}', 'key in double quotes'],
    ['[1,]', 'unexpected "]"'],
  ])('%j is refused in one line that says why', (text, reason) => {
    const fault = faultOf(text);
    expect(fault).toContain(reason);
    expect(fault.startsWith('job.json: ')).toBe(true);
    expect(fault).not.toMatch(/\n/);
  });

  test('more than 16 MiB of UTF-8 is refused, also where the characters are fewer', () => {
    expect(faultOf(' '.repeat(16 * 1024 * 1024 + 1))).toContain('16 MiB');
    expect(faultOf(`"${'é'.repeat(9 * 1024 * 1024)}"`)).toContain('16 MiB');
  });

  test('more than 500 members, 6 spans or 100 loads are refused', () => {
    const members = Array.from({ length: 501 }, (_, i) => rawMember({ name: `G${i}` }));
    expect(faultOf(rawSession(members))).toContain('members: 501 entries; it takes at most 500');
    expect(sessionOf(rawSession(members.slice(1))).members).toHaveLength(500);
    expect(memberFault({ spans: new Array(7).fill('10 ft') })).toContain(
      'members[0].spans: 7 entries; it takes at most 6',
    );
    expect(memberFault({ spans: [] })).toContain('members[0].spans: 0 entries');
    const loads = new Array(101).fill({ kind: 'dead', line: '1 plf' });
    expect(memberFault({ loads })).toContain('members[0].loads: 101 entries; it takes at most 100');
  });
});

describe('a bad value', () => {
  test.each<[Record<string, unknown>, string]>([
    [{ name: undefined }, 'members[0].name: missing'],
    [{ name: '' }, 'members[0].name: is empty'],
    [{ name: '  ' }, 'members[0].name: is blank'],
    [{ name: 7 }, 'members[0].name: 7 stands where a text'],
    [{ name: 'x'.repeat(61) }, 'members[0].name: 61 characters'],
    [{ name: 'a\u001b[31m' }, 'members[0].name: "a\\u{1b}[31m" holds control'],
    [{ note: 'a\u202eb' }, 'members[0].note: "a\\u{202e}b" holds control'],
    [{ spans: undefined }, 'members[0].spans: missing; write "spans": ["14 ft"]'],
    [{ spans: '14 ft' }, 'members[0].spans: "14 ft" stands where a list in [ ] is expected'],
    [{ spans: [14] }, 'members[0].spans[0]: 14 stands where a text'],
    [{ spans: ['14'] }, 'members[0].spans[0]: "14" is not a length: it has no unit'],
    [{ spans: ['14 ft', '12 psf'] }, 'members[0].spans[1]: "12 psf" is not a length'],
    [{ spans: ['0 ft'] }, 'members[0].spans[0]: "0 ft" is out of range; it must be 1 in to 200 ft'],
    [{ spans: ['-3 ft'] }, 'out of range'],
    [{ spans: ['9999999 ft'] }, 'out of range'],
    [{ spans: [''] }, 'members[0].spans[0]: a length is missing'],
    [{ stock: undefined }, 'members[0].stock: missing'],
    [{ section: undefined }, 'members[0].section: missing'],
    [{ section: { width: '1.5 in' } }, 'members[0].section.depth: missing'],
    [{ section: { width: '0 in', depth: '9.25 in' } }, 'members[0].section.width: "0 in" is out of range'],
    [{ section: { width: '1.5 in', depth: '61 in' } }, 'members[0].section.depth: "61 in" is out of range'],
    [
      { section: { width: '1.5 in', depth: '9.25 in', plies: 0 } },
      'members[0].section.plies: 0 is too small',
    ],
    [
      { section: { width: '1.5 in', depth: '9.25 in', plies: 5 } },
      'members[0].section.plies: 5 is too large',
    ],
    [
      { section: { width: '1.5 in', depth: '9.25 in', plies: 1.5 } },
      'members[0].section.plies: 1.5 stands where a whole number',
    ],
    [
      { section: { width: '1.5 in', depth: '9.25 in', plies: '2' } },
      'members[0].section.plies: "2" stands where',
    ],
    [{ use: 'flor' }, 'members[0].use: "flor" is not known here; the nearest known one is "floor"'],
    [{ use: 'zzzzzzzzzzzz' }, 'write one of "floor", "roof-plaster", "roof-ceiling", "roof"'],
    [{ service: 'damp' }, 'members[0].service'],
    [{ count: 0 }, 'members[0].count: 0 is too small'],
    [{ tributary: '-1 ft' }, 'members[0].tributary: "-1 ft" is out of range'],
    [{ tributary: '4 ft', spacing: '16 in' }, 'members[0].spacing: both spacing and tributary are given'],
    [{ area: { dead: '-5 psf' } }, 'members[0].area.dead: "-5 psf" is out of range'],
    [
      { area: { dead: '12 plf' } },
      'members[0].area.dead: "12 plf" is not an area load: "plf" measures a line load',
    ],
    [{ area: { ded: '12 psf' } }, 'members[0].area.ded: unknown key; the nearest known name is "dead"'],
    [{ bearing: ['3.5 in'] }, 'members[0].bearing: 1 given for 2 supports'],
    [{ bearing: ['3.5 in', '3.5'] }, 'members[0].bearing[1]: "3.5" is not a length'],
    [{ bearing: 3.5 }, 'members[0].bearing: 3.5 stands where a text'],
    [{ tiedDown: ['900 lb'] }, 'members[0].tiedDown: 1 given for 2 supports'],
    [
      { supports: 'cantilever', spans: ['4 ft', '5 ft'] },
      'members[0].spans: a cantilever has one span, and 2 are given',
    ],
    [
      { supports: 'cantilever', overhangs: { right: '1 ft' } },
      'members[0].overhangs: a cantilever has no overhangs',
    ],
    [{ supports: 'cantilever', fixed: { right: true } }, 'members[0].fixed.right'],
    [{ loads: [{ kind: 'dead' }] }, 'members[0].loads[0]: the load has neither line nor point'],
    [{ loads: [{ kind: 'dead', line: '5 plf', point: '5 lb' }] }, 'members[0].loads[0]: both line and point'],
    [
      { loads: [{ kind: 'dead', line: '5 plf', from: '9 ft', to: '3 ft' }] },
      'members[0].loads[0].to: the load must end',
    ],
    [
      { loads: [{ kind: 'dead', line: '5 plf', to: '15 ft' }] },
      'members[0].loads[0].to: 15 ft is off the member',
    ],
    [
      { loads: [{ kind: 'dead', line: '5 plf', at: '5 ft' }] },
      'members[0].loads[0].at: a line load takes from',
    ],
    [{ loads: [{ kind: 'dead', point: '5 lb' }] }, 'members[0].loads[0].at: missing'],
    [
      { loads: [{ kind: 'dead', point: '5 lb', at: '-1 ft' }] },
      'members[0].loads[0].at: "-1 ft" is out of range',
    ],
    [
      { loads: [{ kind: 'dead', point: '5 lb', at: '1 ft', to: '2 ft' }] },
      'members[0].loads[0].to: a point load',
    ],
    [{ loads: [{ kind: 'dead', line: ['1 plf'] }] }, 'members[0].loads[0].line'],
    [
      { loads: [{ kind: 'dead', line: ['1 plf', '2 psf'] }] },
      'members[0].loads[0].line[1]: "2 psf" is not a line load',
    ],
    [
      { loads: [{ kind: 'ded', line: '1 plf' }] },
      'members[0].loads[0].kind: "ded" is not known here; the nearest known one is "dead"',
    ],
    [{ notch: { left: '12 in' } }, 'members[0].notch.left: 12 in is not less than the depth'],
    [{ slope: 'steep' }, 'members[0].slope: "steep" is not a slope'],
    [{ slope: '4:0' }, 'members[0].slope: "4:0" is not a slope'],
    [{ bracing: 'none' }, 'members[0].bracing: "none" is not "continuous", "ends" or a length'],
    [{ bracing: '0 ft' }, 'members[0].bracing: "0 ft" is out of range'],
    [{ limits: { live: '360' } }, 'members[0].limits.live: "360" stands where a number'],
    [{ limits: { live: 0 } }, 'members[0].limits.live: 0 is too small'],
    [{ selfWeight: 'yes' }, 'members[0].selfWeight: "yes" stands where true or false'],
    [{ liveReduction: { area: '600 ft2', KLL: 5 } }, 'members[0].liveReduction.KLL: 5 is too large'],
    [
      { stock: { product: 'dimension lumbar', species: 'x', grade: 'y' } },
      'members[0].stock.product: "dimension lumbar" is not known here; the nearest known one is "dimension lumber"',
    ],
    [
      { stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch' } },
      'members[0].stock.grade: missing',
    ],
    [
      { stock: { product: 'dimension lumber', species: 'Duglas Fir-Larch', grade: 'No.2' } },
      'Douglas Fir-Larch',
    ],
    [{ stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No2' } }, 'No.2'],
    [{ stock: { product: 'custom', species: '', grade: '' } }, 'members[0].stock.values: missing'],
    [{ stock: { product: 'custom', values: { Fb: '900 psi' } } }, 'members[0].stock.valuesFrom: missing'],
    [
      { stock: { product: 'custom', values: { Fbb: '900 psi' }, valuesFrom: 'x' } },
      'members[0].stock.values.Fbb: unknown key; the nearest known name is "Fb"',
    ],
    [
      { spasn: ['14 ft'], spans: undefined },
      'members[0].spasn: unknown key; the nearest known name is "spans"',
    ],
    [{ plies: 2 }, 'members[0].plies: unknown key; the nearest known name is "section.plies"'],
    [{ qqqqqqqqqqqqqqqqqqqqqqqqqqqq: 1 }, 'unknown key; known here: name, note'],
    [{ constructor: 1 }, 'members[0].constructor: unknown key'],
    [{ 'a\u001b': 1 }, 'members[0].a\\u{1b}: unknown key'],
  ])('%j is refused with its path and the reason', (over, reason) => {
    const fault = memberFault(over);
    expect(fault).toContain(reason);
    expect(fault).not.toMatch(/[\u0000-\u001f\u202e]/);
  });

  test('two members of one name are refused, both named', () => {
    expect(faultOf(rawSession([rawMember(), rawMember()]))).toBe(
      'job.json: members[1].name: "G1" is also the name of members[0]; names must differ',
    );
  });

  test('the file name in a fault is harmless', () => {
    const read = readSession('', 'a\u001b[2J\nb.json');
    expect(read).toEqual({ ok: false, fault: expect.stringContaining('a\\u{1b}[2J\\u{a}b.json: is empty') });
  });
});

test('any JSON at all is read or refused in one harmless line, and never throws', () => {
  fc.assert(
    fc.property(fc.json({ maxDepth: 4 }), (text) => {
      const read = readSession(text, 'job.json');
      if (!read.ok) expect(read.fault).not.toMatch(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u);
    }),
  );
});

test('a good document with any one value replaced by anything is read or refused, and never throws', () => {
  const full = rawMember({
    area: { dead: '12 psf' },
    bearing: ['3 in', '3 in'],
    overhangs: { left: '1 ft' },
    loads: [{ kind: 'dead', line: ['1 plf', '2 plf'], from: '0 ft', to: '3 ft' }],
    limits: { live: 360 },
    liveReduction: { area: '600 ft2', KLL: 2 },
  });
  const places: (readonly (string | number)[])[] = [];
  const walk = (value: unknown, path: readonly (string | number)[]) => {
    places.push(path);
    if (value === null || typeof value !== 'object') return;
    for (const [key, entry] of Object.entries(value)) walk(entry, [...path, key]);
  };
  walk({ thrice: 1, members: [full] }, []);
  fc.assert(
    fc.property(fc.constantFrom(...places.slice(1)), fc.jsonValue(), (path, value) => {
      const document = JSON.parse(JSON.stringify({ thrice: 1, members: [full] }));
      let node = document;
      for (const step of path.slice(0, -1)) node = node[step];
      node[path[path.length - 1]!] = value;
      const text = JSON.stringify(document);
      if (text.includes('"__proto__"') || text.includes('\uFFFD')) return;
      const read = readSession(text, 'job.json');
      if (!read.ok) expect(read.fault).toMatch(/^job\.json: .+: .+/);
    }),
    { numRuns: 500 },
  );
});
