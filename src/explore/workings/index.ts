import type { Units } from '../../quantity/index.ts';
import { Lately } from '../../quantity/lately.ts';
import { refusal } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import {
  diagramLines,
  WORKINGS_WORD,
  type WorkingLine,
  type Workings,
  type WorkingsId,
  workingsIds,
  workingsOf,
} from '../../timber/workings/index.ts';
import { type About, ALONE, type Asked } from './about.ts';
import { buyingLines } from './buying.ts';
import { changeLines } from './change.ts';
import { chartLines } from './chart.ts';
import { exponentLines } from './exponents.ts';
import { givenLines } from './given.ts';
import { handoverLines } from './handovers.ts';
import { headroomLines } from './headroom.ts';
import { moveLines } from './moves.ts';
import { crossoverLines, spanToDepthLines } from './proportions.ts';
import { rackLines } from './rack.ts';
import { reachLines } from './reach.ts';
import { scatterLines } from './scatter.ts';

export { type About, ALONE } from './about.ts';

/** What explore makes of the checks, in the order of the pages. */
export const EXPLORED_IDS = [
  'change',
  'diagrams',
  'l/h',
  'crossovers',
  'exponents',
  'reach',
  'rack',
  'handovers',
  'moves',
  'charts',
  'scatter',
  'headroom',
  'buying',
  'given',
] as const;
export type ExploredId = (typeof EXPLORED_IDS)[number];

/** Everything whose workings can be asked for. */
export type PageId = WorkingsId | ExploredId;

interface Page {
  readonly word: string;
  /** Whether the member has it; absent: every member has. */
  applies?(asked: Asked): boolean;
  /** It stands also where a rule forbids the section. */
  readonly always?: true;
  lines(asked: Asked): WorkingLine[];
}

const PAGES: Readonly<Record<ExploredId, Page>> = {
  change: {
    word: 'what changes',
    applies: ({ before, member }) => before !== null && before !== member,
    lines: changeLines,
  },
  diagrams: {
    word: 'shear, moment and deflection at the cursor',
    applies: ({ place }) => place !== null,
    lines: ({ member, place, units }) => (place === null ? [] : diagramLines(member, place, units)),
  },
  'l/h': { word: 'span to depth, l/h', lines: spanToDepthLines },
  crossovers: { word: 'crossovers and what it stands to', lines: crossoverLines },
  exponents: { word: 'local exponents', lines: exponentLines },
  reach: { word: 'reach', lines: reachLines },
  rack: { word: 'rack and lit size', lines: rackLines },
  handovers: { word: 'handovers', lines: handoverLines },
  moves: { word: 'moves', lines: moveLines },
  charts: { word: 'charts and capacity', lines: chartLines },
  scatter: {
    word: 'scatter of stiffness',
    applies: (asked) => scatterLines(asked).length > 0,
    lines: scatterLines,
  },
  headroom: {
    word: 'headroom',
    applies: ({ member }) => member.headroom != null || member.maxDepth !== null,
    always: true,
    lines: headroomLines,
  },
  buying: { word: 'what to buy', always: true, lines: buyingLines },
  given: { word: 'what is given and assumed', always: true, lines: givenLines },
};

/** The pages that a member has: its checks, worst first, what they stand on, what explore makes of them. */
export function pageIds(member: Member, units: Units, about: About = ALONE): PageId[] {
  const asked = { ...about, member, units };
  const forbidden = refusal(member) !== null;
  const explored = EXPLORED_IDS.filter((id) => {
    const { applies, always } = PAGES[id];
    return (!forbidden || always === true) && (applies?.(asked) ?? true);
  });
  return [...workingsIds(member, units), ...explored];
}

/** The name of a page. */
export function pageWord(id: PageId): string {
  return isExplored(id) ? PAGES[id].word : WORKINGS_WORD[id];
}

interface Known extends About {
  readonly id: PageId;
  readonly units: Units;
  readonly page: Workings;
}

/** The member in hand and those it is held against. */
const MOST_MEMBERS = 16;
const KNOWN = new Lately<Member, Known[]>(MOST_MEMBERS);

/** The workings of a page; the same object for the same member, page, units and what else it goes by. */
export function pageOf(member: Member, id: PageId, units: Units, about: About = ALONE): Workings {
  const known = KNOWN.get(member) ?? [];
  KNOWN.set(member, known);
  const found = known.find((each) => each.id === id && each.units === units && isSame(each, about));
  if (found !== undefined) return found.page;
  const page = isExplored(id)
    ? { title: PAGES[id].word, lines: PAGES[id].lines({ ...about, member, units }) }
    : workingsOf(member, id, units);
  known.push({ ...about, id, units, page });
  if (known.length > MOST_KNOWN) known.shift();
  return page;
}

/** Of one member: as many as it has pages, so that turning them costs nothing. */
const MOST_KNOWN = 32;

function isSame(one: About, other: About): boolean {
  return (
    one.ranking === other.ranking &&
    one.knob === other.knob &&
    one.job === other.job &&
    one.before === other.before &&
    one.place?.at === other.place?.at &&
    one.place?.which === other.place?.which
  );
}

function isExplored(id: PageId): id is ExploredId {
  return (EXPLORED_IDS as readonly string[]).includes(id);
}
