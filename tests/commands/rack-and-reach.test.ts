import { describe, expect, test } from 'vitest';
import { command, sessionFile, sessionText } from '../support/session.ts';
import { G1 } from './g1.ts';

const FILE = sessionFile(sessionText(G1));

interface SizeDocument {
  readonly label: string;
  readonly width: number;
  readonly depth: number;
  readonly plies: number;
  readonly weight: number;
  readonly boardFeet: number;
  readonly passes: boolean;
  readonly governing: string | null;
  readonly ratios: Readonly<Record<string, number>>;
  readonly refused?: string;
  readonly span?: number;
  readonly stops?: string | null;
}

interface RackDocument {
  readonly member: string;
  readonly lightest: string | null;
  readonly sizes: readonly SizeDocument[];
  readonly notChecked?: readonly string[];
}

async function documentOf(...args: string[]): Promise<RackDocument> {
  return JSON.parse((await command(...args, '--json')).out) as RackDocument;
}

/** What to set so that the member has a size of the rack. */
function sets(size: SizeDocument): string[] {
  return [
    `section.width=${size.width / size.plies} in`,
    `section.depth=${size.depth} in`,
    `section.plies=${size.plies}`,
  ].flatMap((each) => ['--set', each]);
}

describe('rack', () => {
  test('lists every size of dimension lumber once, lightest first', async () => {
    const { member, sizes } = await documentOf('rack', FILE);
    expect(member).toBe('G1');
    // The contract: 2x4 to 2x14 in one to four plies, 3x4 to 3x14 and 4x4 to 4x16 single.
    const depths = ['4', '6', '8', '10', '12', '14'];
    const labels = [
      ...['', '(2) ', '(3) ', '(4) '].flatMap((plies) => depths.map((depth) => `${plies}2x${depth}`)),
      ...depths.map((depth) => `3x${depth}`),
      ...[...depths, '16'].map((depth) => `4x${depth}`),
    ];
    expect(sizes.map((size) => size.label).sort()).toEqual(labels.sort());
    const weights = sizes.map((size) => size.weight);
    expect(weights).toEqual([...weights].sort((a, b) => a - b));
  });

  test('marks the lightest that passes, and says what stops the others', async () => {
    const { lightest, sizes } = await documentOf('rack', FILE);
    const passing = sizes.filter((size) => size.passes);
    expect(lightest).toBe(passing[0]!.label);
    for (const size of sizes) {
      const worst = Math.max(...Object.values(size.ratios));
      expect(size.ratios[size.governing!]).toBe(worst);
      expect(size.passes).toBe(worst <= 1 + 1e-9);
    }
    const { out, status } = await command('rack', FILE);
    expect(status).toBe(0);
    expect(out).toMatch(new RegExp(`^\\* +${lightest!.replace(/[()]/g, '\\$&')} .*lightest$`, 'm'));
    expect(out).toContain(`lightest that passes: ${lightest}`);
    expect(out).toMatch(/^ +2x4 .*deflection$/m);
  });

  test('gives each size the ratios that check gives the member with it', async () => {
    const { sizes } = await documentOf('rack', FILE);
    for (const size of sizes.filter((_, index) => index % 6 === 0)) {
      const { out } = await command('check', FILE, ...sets(size), '--json');
      const [member] = JSON.parse(out).members;
      expect(member.section.label).toBe(size.label);
      for (const { id, ratio } of member.checks) expect(ratio).toBeCloseTo(size.ratios[id]!, 9);
    }
  });

  test('gives width of the whole member, and board feet a foot', async () => {
    const { sizes } = await documentOf('rack', FILE);
    const size = sizes.find(({ label }) => label === '(2) 2x12')!;
    // Two times 2 x 12 / 12 (domain rule: nominal thickness x nominal depth / 12).
    expect(size).toMatchObject({
      width: 3,
      depth: 11.25,
      boardFeet: 4,
      product: 'dimension lumber',
      species: 'Douglas Fir-Larch',
      grade: 'No.2',
    });
    expect(size.weight).toBeCloseTo(0.656, 3);
  });

  test('says so with status 1 when nothing passes', async () => {
    const { status, out } = await command('rack', FILE, '--set', 'spans.0=40 ft');
    expect(status).toBe(1);
    expect(out).toContain('no size passes');
    expect((await documentOf('rack', FILE, '--set', 'spans.0=40 ft')).lightest).toBeNull();
  });

  test('with --only looks for the lightest by these checks alone, and says so first', async () => {
    const all = await documentOf('rack', FILE);
    const shear = await documentOf('rack', FILE, '--only', 'shear');
    const at = (document: RackDocument, label: string | null) =>
      document.sizes.findIndex((size) => size.label === label);
    expect(at(shear, shear.lightest)).toBeLessThan(at(all, all.lightest));
    expect(shear.notChecked).toContain('bending');
    expect((await command('rack', FILE, '--only', 'shear')).out.split('\n')[1]).toMatch(
      /^NOT CHECKED: bending/,
    );
  });

  test('lists what is deeper or wider than the member may be as refused, never as the lightest', async () => {
    const limits = ['--set', 'spans.0=12 ft', '--set', 'maxDepth=9.5 in', '--set', 'maxWidth=4.5 in'];
    const { sizes, lightest } = await documentOf('rack', FILE, ...limits);
    for (const size of sizes) {
      const over = size.depth > 9.5 || size.width > 4.5;
      expect(size.refused !== undefined).toBe(over);
      if (over) expect(size).toMatchObject({ passes: false, ratios: {} });
    }
    expect(lightest).toBe(sizes.find((size) => size.passes)!.label);
  });
});

describe('reach', () => {
  test('gives the span up to which each size passes: there it does, and an inch on it does not', async () => {
    const { sizes } = await documentOf('reach', FILE);
    for (const size of sizes.filter((_, index) => index % 9 === 0)) {
      const at = async (span: number) =>
        (await command('check', FILE, ...sets(size), '--set', `spans.0=${span} in`)).status;
      expect(await at(Math.floor(size.span! * 100) / 100)).toBe(0);
      expect(await at(size.span! + 1)).toBe(1);
    }
  });

  test('names the check that stops each size there', async () => {
    const { sizes } = await documentOf('reach', FILE);
    for (const size of sizes.filter((_, index) => index % 9 === 0)) {
      const { out } = await command(
        'check',
        FILE,
        ...sets(size),
        '--set',
        `spans.0=${size.span! + 1} in`,
        '--json',
      );
      expect(JSON.parse(out).members[0].governing).toBe(size.stops);
    }
  });

  test('has the status of the member as it is, and shows people spans rounded down', async () => {
    const { status, out } = await command('reach', FILE);
    expect(status).toBe(0);
    const { sizes } = await documentOf('reach', FILE);
    const size = sizes.find(({ label }) => label === '(2) 2x12')!;
    const shown = out.match(/^ +\(2\) 2x12 .* (\d+)'-(\d+)(?: (\d)\/(\d))?" +bending$/m)!;
    const [, feet, inches, over = '0', under = '1'] = shown;
    const span = Number(feet) * 12 + Number(inches) + Number(over) / Number(under);
    expect(span).toBeLessThanOrEqual(size.span!);
    expect(size.span! - span).toBeLessThan(0.25);
    expect((await command('reach', FILE, '--set', 'spans.0=40 ft')).status).toBe(1);
  });
});
