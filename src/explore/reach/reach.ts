import { prepare, prepareScaled, rate, type Wood } from '../../timber/index.ts';
import type { Member, Section } from '../../timber/member.ts';
import { type CheckId, PASS_LIMIT, roomForRatios } from '../../timber/report.ts';
import { judge } from '../judge.ts';
import { scaleLengths } from '../scale.ts';
import { followsLaws, lengthByLaw } from './reach-by-law.ts';

const FOOT = 12;
/** Shortest and longest single span that reach looks at, in. */
export const REACH_FROM = 1 * FOOT;
export const REACH_TO = 100 * FOOT;

export interface Reach {
  /** Longest span of the member, in, up to which every shorter one passes; 0 where even 1 ft fails. */
  readonly span: number;
  /** The check that stops it; null at the cap. */
  readonly stops: CheckId | null;
}

/** Lengths tried before the place is narrowed: close enough that no pass and fail hides between two of them. */
const LENGTHS_TRIED = 25;
/** Those and a few asked for beside them; a length on the way to one section's reach is never met again. */
const LENGTHS_KEPT = 32;
/** The answer is within this share of the true length, on the safe side. */
const CLOSE = 1e-9;

/** The reach of a section, of the finder's wood or another. */
export interface ReachFinder {
  (section: Section, of?: Wood): Reach;
  /** Whether the section passes at one longest span, in: where it does not, its reach is shorter. */
  passes(section: Section, span: number, of?: Wood): boolean;
}

/**
 * Finds reaches of sections under the loads of one member. All spans, overhangs and load positions move by
 * one factor; bearings and typed unbraced lengths keep their size. Lengths that every section is tried at are
 * kept, so that asking for a whole rack prepares each of them once. Sections of another wood may be asked for too, where it
 * takes the same part of dead load in the total deflection.
 */
export function reachFinder(member: Member, wood: Wood, only: readonly CheckId[] | null = null): ReachFinder {
  const longest = Math.max(...member.beam.spans);
  const here = prepare(member);
  const preparedAt = new Map<number, ReturnType<typeof prepare>>();
  const ratios = roomForRatios();
  let asked = wood;
  const prepareAt = (span: number) =>
    preparedAt.get(span) ?? prepareScaled(here, scaleLengths(member, span / longest), span / longest);
  const worstAt = (section: Section, span: number) => {
    rate(prepareAt(span), asked, section, ratios);
    return judge(ratios, only);
  };
  /** The same at a length that other sections will be tried at too. */
  const worstAtShared = (section: Section, span: number) => {
    if (preparedAt.size < LENGTHS_KEPT) preparedAt.set(span, prepareAt(span));
    return worstAt(section, span);
  };
  const lawful = new Map<Wood, boolean>();
  const byLaw = (of: Wood): boolean => {
    const known = lawful.get(of) ?? followsLaws(here, member, of);
    lawful.set(of, known);
    return known;
  };
  const find = (section: Section, of: Wood = wood): Reach => {
    if (byLaw(of)) {
      rate(here, of, section, ratios);
      const { factor, stops } = lengthByLaw(ratios, only);
      const span = factor * longest;
      if (span >= REACH_TO) return { span: REACH_TO, stops: null };
      return span >= REACH_FROM ? { span, stops } : { span: 0, stops };
    }
    asked = of;
    let from = REACH_FROM;
    let low = worstAtShared(section, from);
    if (!low.passes) return { span: 0, stops: low.governing };
    const growth = (REACH_TO / REACH_FROM) ** (1 / (LENGTHS_TRIED - 1));
    for (let at = 1; at < LENGTHS_TRIED; at += 1) {
      const to = at === LENGTHS_TRIED - 1 ? REACH_TO : REACH_FROM * growth ** at;
      const high = worstAtShared(section, to);
      if (!high.passes) return narrowed(section, from, low.worst, to, high.worst);
      from = to;
      low = high;
    }
    return { span: REACH_TO, stops: null };
  };
  const passes = (section: Section, span: number, of: Wood = wood): boolean => {
    if (byLaw(of)) return find(section, of).span >= span;
    asked = of;
    return worstAtShared(section, span).passes;
  };
  return Object.assign(find, { passes });

  /** Between a length that passes and one that fails: the ratio is nearly a power law, so its logarithm is a line. */
  function narrowed(
    section: Section,
    pass: number,
    passRatio: number,
    fail: number,
    failRatio: number,
  ): Reach {
    let [low, lowWorst, high, highWorst] = [pass, passRatio, fail, failRatio];
    let stops = worstAt(section, fail).governing;
    for (let round = 0; round < 200 && high - low > CLOSE * high; round += 1) {
      const span = guess(low, lowWorst, high, highWorst, round);
      const here = worstAt(section, span);
      if (here.passes) [low, lowWorst] = [span, here.worst];
      else [high, highWorst, stops] = [span, here.worst, here.governing];
    }
    return { span: low, stops };
  }
}

/** A place between two lengths where the ratio should be 1: along the line on logarithmic axes, or half way. */
function guess(low: number, lowWorst: number, high: number, highWorst: number, round: number): number {
  const middle = Math.sqrt(low * high);
  if (round % 3 === 2 || !(lowWorst > 0) || !Number.isFinite(highWorst)) return middle;
  const share = Math.log(PASS_LIMIT / lowWorst) / Math.log(highWorst / lowWorst);
  const along = low * (high / low) ** share;
  // Step a hair past the place, to either side in turn, so that both ends close in on it.
  const nudged = along * (1 + (round % 2 === 0 ? 0.4 : -0.4) * CLOSE);
  return nudged > low && nudged < high ? nudged : middle;
}
