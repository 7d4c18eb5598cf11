import { describe, expect, test } from 'vitest';
import { command, sessionFile, sessionText } from '../support/session.ts';
import { G1 } from './g1.ts';

const FILE = sessionFile(sessionText(G1));

/** Parsed JSON of a command; the shape is what the test is about. */
// biome-ignore lint/suspicious/noExplicitAny: any document
async function jsonOf(...args: string[]): Promise<any> {
  const { out, error } = await command(...args, '--json');
  expect(error).toBe('');
  return JSON.parse(out);
}

/** Within half a unit of the last decimal that the source prints. */
const printed = (value: number, decimals: number) => ({
  asymmetricMatch: (other: number) => Math.abs(other - value) <= 0.5 * 10 ** -decimals,
  toString: () => 'printed',
  toAsymmetricMatcher: () => `${value} to ${decimals} decimals`,
});

describe('check --json', () => {
  // Every figure below: the session format's own example.
  test("gives the figures of the session format's own example", async () => {
    const document = await jsonOf('check', FILE);
    expect(document).toMatchObject({
      thrice: 1,
      members: [
        {
          name: 'G1',
          section: { label: '(2) 2x12', width: 3, depth: 11.25, plies: 2, weight: printed(0.656, 3) },
          passes: false,
          governing: 'bending',
          spanToDepth: printed(14.93, 2),
          crossovers: {
            shearToBending: printed(5, 1),
            bendingToDeflection: printed(31.6, 1),
            shearToDeflection: printed(12.6, 1),
          },
          advice: [{ id: 'frequency', value: printed(10.1, 1), unit: 'Hz', suggested: 15 }],
          reactions: [
            {
              at: 0,
              byKind: { dead: printed(559.1, 1), live: printed(1680, 1) },
              max: printed(2239.1, 1),
              min: printed(559.1, 1),
            },
            { at: 168, max: printed(2239.1, 1), min: printed(559.1, 1) },
          ],
          analysis: {
            live: {
              shear: printed(1680, 1),
              momentMax: printed(70560, 1),
              momentMin: printed(0, 1),
              deflection: printed(0.364, 3),
            },
          },
        },
      ],
    });
    const [member] = document.members;
    const bending = member.checks.find((each: { id: string }) => each.id === 'bending');
    expect(bending).toEqual({
      id: 'bending',
      ratio: printed(1.651, 3),
      demand: printed(1486.1, 1),
      capacity: printed(900, 1),
      unit: 'psi',
      combination: 'D+L',
      pattern: 'all spans',
      span: 0,
      at: printed(84, 1),
      clause: 'NDS 3.3',
      factors: { CD: 1, CF: 1, CL: 1 },
      exponents: {
        span: printed(2, 3),
        depth: printed(-1.975, 3),
        width: printed(-0.975, 3),
        load: printed(0.975, 3),
      },
    });
    expect(member.assumptions).toContain('top edge held throughout');
  });

  test('lists each check once, and none that does not apply', async () => {
    const [member] = (await jsonOf('check', FILE)).members;
    expect(member.checks.map((each: { id: string }) => each.id)).toEqual([
      'shear',
      'bending',
      'deflection-live',
      'deflection-total',
      'bearing',
    ]);
  });

  test('gives the same numbers whatever units people are shown', async () => {
    expect(await jsonOf('check', FILE, '--units', 'si')).toEqual(await jsonOf('check', FILE));
  });

  test('gives an unmeetable ratio as null, as JSON has no infinity', async () => {
    const file = sessionFile(sessionText({ area: { dead: '5 psf', windUp: '40 psf' } }));
    const [member] = (await jsonOf('check', file)).members;
    const uplift = member.checks.find((each: { id: string }) => each.id === 'uplift');
    expect(uplift.ratio).toBeNull();
    expect(member).toMatchObject({ passes: false, governing: 'uplift' });
  });
});

describe('check for people', () => {
  test('says pass or fail, each check, and the status follows', async () => {
    const failing = await command('check', FILE);
    expect(failing.status).toBe(1);
    expect(failing.out).toMatch(/^FAILS +G1 +\(2\) 2x12/m);
    expect(failing.out).toMatch(/^> bending +1486 psi +900 psi +1\.65 +D\+L/m);
    const passing = await command('check', FILE, '--set', 'spans.0=10 ft');
    expect(passing.status).toBe(0);
    expect(passing.out).toMatch(/^PASSES +G1/m);
  });

  test('counts the failing ones of several members', async () => {
    const file = sessionFile(sessionText({}, { spans: ['8 ft'] }, { spans: ['16 ft'] }));
    expect((await command('check', file)).out).toContain('2 of 3 members fail');
    expect((await command('check', file, '--member', 'B2')).status).toBe(0);
  });

  test('ends with the assumptions and the caution', async () => {
    const { out } = await command('check', FILE);
    expect(out).toContain('assumed: top edge held throughout');
    expect(out).toContain('licensed professional decide');
  });

  test('never shows a failing ratio as 1.00', async () => {
    // Found by halving: a span at which bending is over its limit by less than a thousandth.
    let [passes, fails] = [10, 14];
    while (fails - passes > 1e-4) {
      const middle = (passes + fails) / 2;
      if ((await command('check', FILE, '--set', `spans.0=${middle.toFixed(6)} ft`)).status === 0)
        passes = middle;
      else fails = middle;
    }
    const { out } = await command('check', FILE, '--set', `spans.0=${fails.toFixed(6)} ft`);
    expect(out).toMatch(/^FAILS/m);
    expect(out).toMatch(/^> bending .* 1\.01 /m);
  });
});

describe('--set, --member, --units and --only', () => {
  test('--set replaces values before the run, as if the file had held them', async () => {
    const set = await jsonOf(
      'check',
      FILE,
      ...['spans.0=16 ft', 'section.depth=13.25 in', 'area.live=60 psf'].flatMap((each) => ['--set', each]),
    );
    const written = sessionFile(
      sessionText({
        ...G1,
        spans: ['16 ft'],
        section: { width: '1.5 in', depth: '13.25 in', plies: 2 },
        area: { dead: '12 psf', live: '60 psf' },
      }),
    );
    expect(set).toEqual(await jsonOf('check', written));
  });

  test('--member picks one, and --set goes to it alone', async () => {
    const file = sessionFile(sessionText({}, {}));
    const document = await jsonOf('check', file, '--member', 'B2', '--set', 'spans.0=8 ft');
    expect(document.members).toMatchObject([{ name: 'B2', passes: true }]);
  });

  test('--units shows people the other units', async () => {
    const { out } = await command('check', FILE, '--units', 'si');
    // 1486.1 psi of the example are 10.25 MPa: 1 MPa is 145.04 psi.
    expect(out).toMatch(/bending +10\.25 MPa/);
    expect(out).not.toContain('psi');
  });

  test('--only drops the other checks and heads the output with what was not checked', async () => {
    const shear = await command('check', FILE, '--only', 'shear');
    expect(shear.status).toBe(0);
    const lines = shear.out.split('\n');
    expect(lines[1]).toMatch(/^NOT CHECKED: bending,/);
    expect(shear.out).not.toMatch(/^[> ] bending /m);
    const document = await jsonOf('check', FILE, '--only', 'shear,bearing');
    expect(document.notChecked).toEqual(
      expect.arrayContaining(['bending', 'deflection-live', 'deflection-total', 'uplift']),
    );
    expect(document.notChecked).not.toContain('shear');
    expect(document.members[0]).toMatchObject({ passes: true, governing: 'shear' });
    expect(document.members[0].checks.map((each: { id: string }) => each.id)).toEqual(['shear', 'bearing']);
  });

  test('--only with every check leaves nothing to say', async () => {
    const all =
      'shear,bending,bending-hogging,deflection-live,deflection-total,bearing,slenderness,uplift,notch';
    expect(await jsonOf('check', FILE, '--only', all)).toEqual(await jsonOf('check', FILE));
  });
});
