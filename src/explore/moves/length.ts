import type { Placed } from '../../loads/index.ts';
import { showInches, showSpan } from '../../quantity/index.ts';
import { beamLength } from '../../statics/beam.ts';
import { woodOf } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import { reachFinder } from '../reach/reach.ts';
import { scaleLengths } from '../scale.ts';
import { type Ladder, rungs } from './ladder.ts';

/** To the quarter inch below the reach, so that what people are told to build passes; places to the sixteenth. */
const SPAN_STEP = 1 / 4;
const PLACE_STEP = 1 / 16;
/** Rounded places may take the reach a hair too far: so many steps shorter are tried. */
const SHORTER = 8;

/** All spans, overhangs and load places by one factor, down to what stands: the longest first. */
export function shorten(member: Member, only: readonly CheckId[] | null): Ladder {
  const longest = Math.max(...member.beam.spans);
  const reach = reachFinder(member, woodOf(member), only)(member.section);
  const members: Member[] = [];
  const most = Math.floor(Math.min(reach.span, longest - SPAN_STEP) / SPAN_STEP) * SPAN_STEP;
  for (let step = 0; step < SHORTER; step += 1) {
    const span = most - step * SPAN_STEP;
    if (span > 0) members.push(shortened(member, span / longest));
  }
  return rungs('shorten', 'length', members, ({ beam }, units) => showSpan(Math.max(...beam.spans), units));
}

/** `scaleLengths` with lengths that can be measured off, none longer than the factor makes it. */
function shortened(member: Member, factor: number): Member {
  const { beam, loads, links } = scaleLengths(member, factor);
  const down = (value: number) => Math.floor(value / PLACE_STEP + ROUNDING) * PLACE_STEP;
  const rounded = {
    ...beam,
    spans: beam.spans.map(down),
    overhangs: { left: down(beam.overhangs.left), right: down(beam.overhangs.right) },
  };
  const [was, whole] = [beamLength(member.beam), beamLength(rounded)];
  const place = (before: number, now: number) => (before === was ? whole : Math.min(whole, down(now)));
  const moved = <T extends Placed>(now: T, before: Placed): T => {
    if (now.type === 'point') return { ...now, at: place(before.type === 'point' ? before.at : 0, now.at) };
    const [from, to] = before.type === 'line' ? [before.from, before.to] : [0, 0];
    return { ...now, from: place(from, now.from), to: place(to, now.to) };
  };
  return {
    ...member,
    beam: rounded,
    loads: loads.map((load, at) => moved(load, member.loads[at]!)),
    ...(links === undefined ? {} : { links: links.map((link, at) => moved(link, member.links![at]!)) }),
  };
}

const ROUNDING = 1e-9;

/** Spacings that joists are laid out at, in; common practice, no source. */
const USUAL_SPACINGS = [24, 19.2, 16, 12, 8];
const WIDTH_STEP = 1;
/** More than so many times as many members is no move that anybody makes. */
const MOST_TIMES = 3;

/** Closer together: the next usual spacings, or of a girder so many inches less to carry. */
export function closer(member: Member): Ladder {
  const { spacing, tributary } = member;
  const carries = Object.values(member.area).some((load) => load > 0);
  if (spacing !== null) {
    const members = USUAL_SPACINGS.filter(
      (each) => carries && each < spacing && each * MOST_TIMES >= spacing,
    ).map((each) => ({
      ...member,
      spacing: each,
      tributary: each,
    }));
    return rungs('closer spacing', 'width', members, (changed, units) =>
      showInches(changed.tributary, units),
    );
  }
  const first = Math.ceil(tributary / WIDTH_STEP - 1 - ROUNDING) * WIDTH_STEP;
  const least = Math.max(WIDTH_STEP, tributary / MOST_TIMES);
  const count = carries ? Math.max(0, Math.floor((first - least) / WIDTH_STEP) + 1) : 0;
  return {
    kind: 'closer spacing',
    group: 'width',
    count,
    at: (step) => ({ ...member, tributary: first - step * WIDTH_STEP }),
    label: (changed, units) => showSpan(changed.tributary, units),
    monotone: true,
  };
}
