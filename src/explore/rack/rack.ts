import { Lately } from '../../quantity/lately.ts';
import {
  deadFactorOf,
  type Prepared,
  prepare,
  rackSizesOf,
  rate,
  refuserOf,
  type Size,
  sameStock,
  sectionWeight,
  shortWood,
  type Wood,
  withStock,
  woodOf,
  woodsOf,
} from '../../timber/index.ts';
import type { Member, Section, Stock } from '../../timber/member.ts';
import { type CheckId, roomForRatios } from '../../timber/report.ts';
import { type Judgement, judge } from '../judge.ts';
import { overLimit } from '../limits.ts';

/** One stock size under the loads of a member. */
export interface RackSize extends Judgement {
  readonly size: Size;
  /** lb/in */
  readonly weight: number;
  /** In the order of CHECK_IDS; empty where the size is refused. */
  readonly ratios: readonly number[];
  /** The rule that forbids the size, or the limit that it is over; null when it counts. */
  readonly refused: string | null;
}

export interface Rack {
  /** Lightest first; equal weights: shallower first, then fewer plies. */
  readonly sizes: readonly RackSize[];
  /** Index of the lightest size that passes; -1 when none does. */
  readonly lightest: number;
  /** The woods that stand on it together. */
  readonly woods: readonly Stock[];
}

const NO_RATIOS: readonly number[] = [];

/** The stock sizes of the member's woods under its loads, lightest first whatever the wood. */
export function rackOf(member: Member, only: readonly CheckId[] | null = null): Rack {
  const { woods, places } = shelfOf(member);
  const lots = lotsOf(member, woods);
  const sizes = places.map(({ size, at, weight }): RackSize => {
    const { refuse, prepared, wood } = lots[at]!;
    const section = sectionOf(member, size);
    const refused = refuse(section) ?? overLimit(member, section);
    if (refused !== null) return { size, weight, ratios: NO_RATIOS, refused, ...REFUSED };
    const ratios = roomForRatios();
    rate(prepared, wood, section, ratios);
    const { passes, governing, worst } = judge(ratios, only);
    return { size, weight, ratios, refused, passes: passes && prepared.loaded, governing, worst };
  });
  return { sizes, lightest: sizes.findIndex((each) => each.passes), woods };
}

const REFUSED: Judgement = { passes: false, governing: null, worst: Number.POSITIVE_INFINITY };

/** One wood of a rack, ready to be rated at any of its sizes. */
export interface Lot {
  /** The member made of it. */
  readonly member: Member;
  readonly wood: Wood;
  readonly prepared: Prepared;
  readonly refuse: (section: Section) => string | null;
}

/** Each wood of a rack; the search over loads is done once for all that take the same part of dead load in the total deflection. */
export function lotsOf(member: Member, woods: readonly Stock[]): Lot[] {
  const searched = new Map<number, Prepared>();
  return woods.map((stock): Lot => {
    const own = withStock(member, stock);
    const dead = deadFactorOf(own);
    const prepared = searched.get(dead) ?? prepare(own);
    searched.set(dead, prepared);
    return { member: own, wood: woodOf(own), prepared, refuse: refuserOf(own) };
  });
}

/** A size in its place on a rack, with the index of its wood. */
interface Place {
  readonly size: Size;
  readonly at: number;
  /** lb/in */
  readonly weight: number;
}

interface Shelf {
  readonly woods: readonly Stock[];
  readonly places: readonly Place[];
}

interface Kept extends Shelf {
  readonly rack: Member['rack'];
  readonly service: Member['service'];
}

const MOST_SHELVES = 64;
const SHELVES = new Lately<Stock, Kept>(MOST_SHELVES);

/** The order of a rack, which a nudge of span or load leaves as it is: kept until woods or moisture change. */
function shelfOf(member: Member): Shelf {
  const { stock, rack, service } = member;
  const known = SHELVES.get(stock);
  if (known !== undefined && known.rack === rack && known.service === service) return known;
  const woods = woodsOf(member);
  const places = woods.flatMap((wood, at) =>
    rackSizesOf(wood).map(
      (size): Place => ({
        size,
        at,
        weight: sectionWeight({ stock: wood, service }, { ...size, flat: false }),
      }),
    ),
  );
  places.sort(
    (a, b) =>
      a.weight - b.weight || a.size.depth - b.size.depth || a.size.plies - b.size.plies || a.at - b.at,
  );
  const kept = { woods, places, rack, service };
  SHELVES.set(stock, kept);
  return kept;
}

/** The section a member would have with a stock size; laid as it is now. */
export function sectionOf(member: Member, size: Size): Section {
  return { width: size.width, depth: size.depth, plies: size.plies, flat: member.section.flat };
}

/** True where the member has this stock size, in this wood. */
export function hasSize(member: Member, size: Size): boolean {
  const { width, depth, plies } = member.section;
  return (
    size.width === width &&
    size.depth === depth &&
    size.plies === plies &&
    sameStock(size.stock, member.stock)
  );
}

/** The member with a stock size, and the wood it is of, in place of its own. */
export function takeSize(member: Member, size: Size): Member {
  const own = sameStock(size.stock, member.stock) ? member : withStock(member, size.stock);
  return { ...own, section: sectionOf(member, size) };
}

/** The lightest size that passes; null when none does. */
export function lightestOf(member: Member): Size | null {
  const rack = rackOf(member);
  return rack.sizes[rack.lightest]?.size ?? null;
}

const NAMES = new WeakMap<readonly Stock[], Map<string, Stock | null>>();

/**
 * A size as a sentence names it: its label, and its wood where the rack holds the same label in another wood too:
 * "(2) 2x12", "(2) 2x12 HF No.2".
 */
export function sizeName(rack: Pick<Rack, 'woods' | 'sizes'>, size: Size): string {
  if (rack.woods.length < 2) return size.label;
  let owners = NAMES.get(rack.woods);
  if (owners === undefined) {
    owners = new Map();
    for (const { size: each } of rack.sizes) {
      const owner = owners.get(each.label);
      owners.set(each.label, owner === undefined || owner === each.stock ? each.stock : null);
    }
    NAMES.set(rack.woods, owners);
  }
  return owners.get(size.label) === null ? `${size.label} ${gradeWord(size.stock)}` : size.label;
}

/** The wood in short behind a label that tells the product already: "HF No.2", "24F-1.8E", "typical". */
export function gradeWord(stock: Stock): string {
  return shortWood(stock)
    .replace(/^(GL|LVL) /, '')
    .replace(/^typical .*/, 'typical');
}
