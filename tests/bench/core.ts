import { rackOf } from '../../src/explore/rack/rack.ts';
import { prepare, rackSizesOf, rate, type Size, woodOf } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { roomForRatios } from '../../src/timber/report.ts';
import { memberOf } from '../support/session.ts';
import { median } from './median.ts';

const ROUNDS = 9;
const ROUND_MS = 150;

/** The member both are timed on: a simple span, D + L, top edge held at the ends only, so that CL is worked out too. */
const MEMBER = memberOf({ bracing: 'ends' });

/** Rates of one loop over the sizes of a rack, a second. */
function perSecond(count: number, loop: () => void): number {
  const began = performance.now();
  let loops = 0;
  while (performance.now() - began < ROUND_MS) {
    loop();
    loops += 1;
  }
  return (loops * count) / ((performance.now() - began) / 1000);
}

let sink = 0;

/** The same checks of the same member, written out for this one case with nothing looked up. */
function plainLoop(member: Member, sizes: readonly Size[], CFs: readonly number[]): () => void {
  const l = member.beam.spans[0]!;
  const dead = member.area.dead * member.tributary;
  const live = member.area.live * member.tributary;
  const [Fb, Fv, Fcperp, E, Emin, G] = [900, 180, 625, 1.6e6, 580000, 0.5];
  const moisture = 15;
  const density = (62.4 / 1728) * (G / (1 + 0.009 * G * moisture)) * (1 + moisture / 100);
  const durations = [0.9, 1];
  return () => {
    for (let at = 0; at < sizes.length; at += 1) {
      const { width, depth: d, plies } = sizes[at]!;
      const b = width * plies;
      const own = density * b * d;
      const Cr = plies >= 3 ? 1.15 : 1;
      const RB = Math.sqrt(((l / d < 7 ? 2.06 * l : 1.63 * l + 3 * d) * d) / (b * b));
      let shear = 0;
      let bending = 0;
      for (let c = 0; c < 2; c += 1) {
        const w = dead + own + (c === 1 ? live : 0);
        const CD = durations[c]!;
        shear = Math.max(shear, (0.75 * w * l) / (b * d) / (Fv * CD));
        const star = Fb * CFs[at]! * Cr * CD;
        const F = (1.2 * Emin) / (RB * RB) / star;
        const half = (1 + F) / 1.9;
        const CL = d > b ? half - Math.sqrt(half * half - F / 0.95) : 1;
        bending = Math.max(bending, (0.75 * w * l * l) / (b * d * d) / (star * CL));
      }
      const bend = (5 * l ** 4) / (384 * E * ((b * d ** 3) / 12));
      const liveRatio = (bend * live) / (l / 360);
      const totalRatio = (bend * (0.5 * (dead + own) + live)) / (l / 240);
      const bearing = ((dead + own + live) * l) / 2 / (b * 3.5) / Fcperp;
      sink += shear + bending + liveRatio + totalRatio + bearing + RB / 50;
    }
  };
}

/** Member checks a second beside the plain loop, and the rack of one grade in milliseconds. */
export async function run(): Promise<void> {
  const sizes = rackSizesOf(MEMBER.stock);
  const prepared = prepare(MEMBER);
  const wood = woodOf(MEMBER);
  const ratios = roomForRatios();
  const sections = sizes.map(({ width, depth, plies }) => ({ width, depth, plies, flat: false }));
  const ours = (): void => {
    for (const section of sections) {
      rate(prepared, wood, section, ratios);
      sink += ratios[1]!;
    }
  };
  const plain = plainLoop(
    MEMBER,
    sizes,
    sizes.map(() => 1),
  );
  const [own, fixed, racks]: [number[], number[], number[]] = [[], [], []];
  for (let round = 0; round < ROUNDS; round += 1) {
    own.push(perSecond(sizes.length, ours));
    fixed.push(perSecond(sizes.length, plain));
    racks.push(1000 / perSecond(1, () => (sink += rackOf({ ...MEMBER }).lightest)));
  }
  const share = median(own.map((rate, round) => rate / fixed[round]!));
  console.log(
    `member checks a second: ${Math.round(median(own) / 1000)} thousand, plain loop ${Math.round(median(fixed) / 1000)} thousand, ratio ${share.toFixed(2)} (aim 0.25)`,
  );
  console.log(`rack of one grade, ${sizes.length} sizes: ${median(racks).toFixed(3)} ms (aim 1 ms)`);
  if (!Number.isFinite(sink)) throw new Error('the loops gave no numbers');
}
