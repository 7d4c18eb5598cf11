import { loadsOf } from '../loads/index.ts';
import { prepareLoaded, prepareScaled } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_IDS, type CheckId, type CheckResult } from '../timber/report.ts';
import { ratiosLike } from './ratios.ts';
import { scaleLengths, scaleLoads } from './scale.ts';

/** d ln(ratio) / d ln(quantity), at the member as it is. */
export interface Exponents {
  /** All spans, overhangs and load positions together. */
  readonly span: number;
  /** Depth and width vary freely, not by stock. */
  readonly depth: number;
  readonly width: number;
  /** All applied loads together, own weight apart. */
  readonly load: number;
}

export const EXPONENT_QUANTITIES = ['span', 'depth', 'width', 'load'] as const;

/** Ideal exponents of the three powers (a uniform load on a simple span, no size effects, no own weight). */
export const IDEAL: Readonly<Record<1 | 2 | 3, Exponents>> = {
  1: { span: 1, depth: -1, width: -1, load: 1 },
  2: { span: 2, depth: -2, width: -1, load: 1 },
  3: { span: 3, depth: -3, width: -1, load: 1 },
};

/** Relative step of the two-sided difference: its error is of the order of its square. */
export const STEP = 1e-5;
/** One-sided slopes further apart than this stand on the two sides of a step of some factor. */
const STEP_APART = 0.05;

/** Ratios of all checks, in the order of CHECK_IDS, a step below a quantity, as it is, and a step above. */
export interface Runs {
  readonly below: readonly number[];
  readonly here: readonly number[];
  readonly above: readonly number[];
}

/** The runs of the checks that the local exponents come from. */
export function exponentRuns(member: Member): Readonly<Record<keyof Exponents, Runs>> {
  const ratios = ratiosLike(member);
  const here = ratios(member);
  const around = (at: (factor: number) => readonly number[]): Runs => ({
    below: at(1 - STEP),
    here,
    above: at(1 + STEP),
  });
  const grown = (key: 'width' | 'depth') => (by: number) =>
    ratios({ ...member, section: { ...member.section, [key]: member.section[key] * by } });
  const upright = !member.section.flat;
  return {
    span: around((by) => {
      const scaled = scaleLengths(member, by);
      return ratios(scaled, (prepared) => prepareScaled(prepared, scaled, by));
    }),
    depth: around(grown(upright ? 'depth' : 'width')),
    width: around(grown(upright ? 'width' : 'depth')),
    load: around((by) => {
      const scaled = scaleLoads(member, by);
      return ratios(scaled, (prepared) => prepareLoaded(prepared, scaled, by));
    }),
  };
}

/** Local exponents of every check that applies. */
export function exponentsOf(member: Member): Partial<Record<CheckId, Exponents>> {
  const runs = exponentRuns(member);
  const slopes = {
    span: slopesOf(runs.span),
    depth: slopesOf(runs.depth),
    width: slopesOf(runs.width),
    load: slopesOf(runs.load),
  };
  const exponents: Partial<Record<CheckId, Exponents>> = {};
  CHECK_IDS.forEach((id, at) => {
    const own = {
      span: slopes.span[at]!,
      depth: slopes.depth[at]!,
      width: slopes.width[at]!,
      load: slopes.load[at]!,
    };
    if (EXPONENT_QUANTITIES.every((quantity) => Number.isFinite(own[quantity]))) exponents[id] = own;
  });
  return exponents;
}

function slopesOf(runs: Runs): number[] {
  return Array.from(runs.here, (_, at) => slopeAt(runs, at).slope);
}

/** A slope on logarithmic axes, and the runs that it is taken between; NaN where the check applies on neither side. */
export interface Slope {
  readonly slope: number;
  readonly from: 'below' | 'here';
  readonly to: 'here' | 'above';
}

/**
 * The slope of a check: between the runs on both sides, or of one side alone, where a factor steps on the other or the
 * check does not apply there.
 */
export function slopeAt({ below, here, above }: Runs, at: number): Slope {
  const left = Math.log(here[at]! / below[at]!) / -Math.log1p(-STEP);
  const right = Math.log(above[at]! / here[at]!) / Math.log1p(STEP);
  const ofLeft: Slope = { slope: left, from: 'below', to: 'here' };
  const ofRight: Slope = { slope: right, from: 'here', to: 'above' };
  if (!Number.isFinite(left) || !Number.isFinite(right)) return Number.isFinite(left) ? ofLeft : ofRight;
  if (Math.abs(left - right) < STEP_APART) return { slope: (left + right) / 2, from: 'below', to: 'above' };
  return Math.abs(left) < Math.abs(right) ? ofLeft : ofRight;
}

/** A local exponent this close to its ideal value is called whole. */
const WHOLE_WITHIN = 0.005;

/** Why the local exponents of a check are not the ideal ones, in words; "whole" where they are. */
export function whyNotWhole(
  member: Member,
  power: 1 | 2 | 3,
  exponents: Exponents,
  check: CheckResult,
): string {
  const ideal = IDEAL[power];
  if (EXPONENT_QUANTITIES.every((quantity) => Math.abs(exponents[quantity] - ideal[quantity]) < WHOLE_WITHIN))
    return 'whole';
  const causes: string[] = [];
  const factor = (symbol: string) => check.factors.find((each) => each.symbol === symbol)?.value ?? 1;
  if (member.selfWeight && Math.abs(exponents.load - 1) >= WHOLE_WITHIN) causes.push('own weight');
  if (factor('CL') < 1) causes.push('CL');
  if (factor('CV') < 1) causes.push('CV');
  if (member.stock.product === 'timber' && factor('CF') < 1) causes.push('size factor');
  if (power === 1 && member.shearAt === 'd') causes.push('shear at d');
  if (loadsOf(member).some((load) => load.type === 'point')) causes.push('point loads');
  if (power === 3 && member.limits.liveMax !== null) causes.push('limit as a length');
  return causes.length > 0 ? causes.join(', ') : 'loads not alike';
}
