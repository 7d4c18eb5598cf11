import type { Knob } from '../explore/knobs/knob.ts';
import { woodKnobs } from '../explore/knobs/wood.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { nearestSection } from '../explore/rack/choose-wood.ts';
import { COMBINATION_SETS } from '../loads/loading.ts';
import { checkStock } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { textFault, withCombinations } from './edit-members.ts';
import { newMember, USUAL_STOCK } from './new-member.ts';
import { bestChoices } from './ranking.ts';
import { MAX_SHEET_ENTRY, MAX_TITLE, PAPERS, type Session, type SheetKeys } from './session.ts';

/** The session with a setting changed, or why it cannot be, with the way out. */
export type Changed = { readonly session: Session } | { readonly fault: string };

/** One thing that is set for the whole session. */
export interface JobSetting {
  /** Its path in the session file. */
  readonly key: string;
  readonly label: string;
  readonly part: 'session' | 'new members' | 'title block';
  /** Empty where nothing is stated. */
  show(session: Session): string;
  /** What it does, or what holds where nothing is stated. */
  readonly about: string;
  /** The next of its choices, or the one before; absent where it is typed alone. */
  turn?(session: Session, by: 1 | -1): Changed;
  /** What was typed; absent where it is chosen alone. */
  enter?(session: Session, text: string): Changed;
  /** Back to nothing stated; absent where it always stands. */
  clear?(session: Session): Session;
}

/** Everything that is set for the whole session, in the order of its file. */
export function jobSettings(): readonly JobSetting[] {
  return SETTINGS;
}

function choice<T extends string>(
  part: JobSetting['part'],
  [key, label, about]: readonly [key: string, label: string, about: string],
  choices: (session: Session) => readonly T[],
  get: (session: Session) => T,
  put: (session: Session, value: T) => Session,
  word: (value: T) => string = (value) => value,
): JobSetting {
  return {
    key,
    label,
    about,
    part,
    show: (session) => word(get(session)),
    turn(session, by) {
      const all = choices(session);
      const next = all[(all.indexOf(get(session)) + by + all.length) % all.length]!;
      return { session: put(session, next) };
    },
  };
}

function titleEntry(key: Exclude<keyof SheetKeys, 'paper'>, label: string, about: string): JobSetting {
  return {
    key: `sheet.${key}`,
    label,
    about,
    part: 'title block',
    show: ({ sheet }) => sheet?.[key] ?? '',
    enter(session, text) {
      const fault = textFault(text, MAX_SHEET_ENTRY);
      return fault === null ? { session: withSheet(session, key, text) } : { fault };
    },
    clear: (session) => withSheet(session, key, undefined),
  };
}

/** The order of the entries in the file. */
const SHEET_KEYS = [
  'firm',
  'job',
  'jobNumber',
  'by',
  'checkedBy',
  'revision',
  'date',
  'paper',
] as const satisfies readonly (keyof SheetKeys)[];

/** A title block in which nothing is filled in is none. */
function withSheet<K extends keyof SheetKeys>(session: Session, key: K, value: SheetKeys[K]): Session {
  const { sheet: before, ...rest } = session;
  const after = { ...before, [key]: value };
  const stated = SHEET_KEYS.filter((each) => after[each] !== undefined);
  if (stated.length === 0) return rest;
  return { ...rest, sheet: Object.fromEntries(stated.map((each) => [each, after[each]])) };
}

/** A member to choose the wood on: of any size that the wood comes in. */
function sampleOf(session: Session): Member {
  const FOOT = 12;
  const stock = session.stock ?? USUAL_STOCK;
  const member = newMember('floor', [12 * FOOT], FOOT);
  return { ...member, stock, section: nearestSection(stock, member.section) };
}

function wood(key: 'product' | 'species' | 'grade', about: string): JobSetting {
  const path = `stock.${key}`;
  const knobOf = (member: Member): Knob | undefined => woodKnobs(member).find((knob) => knob.key === path);
  const turned = (
    session: Session,
    turn: (knob: Knob, member: Member) => ReturnType<Knob['nudge']>,
  ): Changed => {
    const member = sampleOf(session);
    const knob = knobOf(member);
    if (knob === undefined) return { fault: `${member.stock.product} has no ${key} to choose` };
    const change = turn(knob, member);
    if ('fault' in change) return change;
    const fault = checkStock(change.member);
    return fault === null ? { session: { ...session, stock: change.member.stock } } : { fault };
  };
  return {
    key: path,
    label: key,
    about,
    part: 'new members',
    show(session) {
      const member = sampleOf(session);
      return knobOf(member)?.show(member, session.units) ?? '';
    },
    turn: (session, by) => turned(session, (knob, member) => knob.nudge(member, by, 'normal', session.units)),
    enter: (session, text) => turned(session, (knob, member) => knob.enter(member, text, session.units)),
    clear({ stock: _stock, ...session }) {
      return session;
    },
  };
}

/** The yard list; it is read where files may be, so what is typed is no business of this. */
export const YARD_SETTING = 'yard';

const SETTINGS: readonly JobSetting[] = [
  {
    key: 'title',
    label: 'title',
    about: 'what the session is called',
    part: 'session',
    show: ({ title }) => title,
    enter(session, text) {
      const fault = textFault(text, MAX_TITLE);
      return fault === null ? { session: { ...session, title: text } } : { fault };
    },
    clear: (session) => ({ ...session, title: '' }),
  },
  choice(
    'session',
    ['units', 'units', 'what figures are shown in; the file keeps what was typed'],
    () => ['us', 'si'],
    ({ units }) => units,
    (session, units) => ({ ...session, units }),
    (units) => (units === 'us' ? 'inches and pounds' : 'SI'),
  ),
  choice(
    'session',
    ['combinations', 'combinations', 'the edition whose load combinations every member is checked by'],
    () => COMBINATION_SETS,
    ({ combinations }) => combinations,
    withCombinations,
  ),
  choice(
    'session',
    ['best', 'best', 'what counts as best: rack, lit size, moves and handovers follow it'],
    bestChoices,
    ({ best }) => best ?? 'weight',
    (session, best) => ({ ...session, best }),
    (best) => BEST_WORD[best],
  ),
  {
    key: YARD_SETTING,
    label: 'yard list',
    about: 'a CSV file of what there is to buy; $ shows what it comes to',
    part: 'session',
    show({ yard }) {
      if (yard == null) return '';
      const lines = yard.rows === null ? '' : `${yard.rows.length} lines`;
      return yard.file === null ? `${lines} in the session` : [yard.file, lines].filter(Boolean).join(', ');
    },
    clear: (session) => ({ ...session, yard: null }),
  },
  wood('product', 'the wood that members added from now on begin with'),
  wood('species', 'typed by the beginning of its name too'),
  wood('grade', 'a stronger one to the right'),
  titleEntry('firm', 'firm', 'at the head of every page of the sheet'),
  titleEntry('job', 'job', 'the title of the session where none is stated'),
  titleEntry('jobNumber', 'job number', ''),
  titleEntry('by', 'by', 'who made the calculation'),
  titleEntry('checkedBy', 'checked by', ''),
  titleEntry('revision', 'revision', ''),
  titleEntry('date', 'date', 'as it shall stand there; no clock fills it in'),
  choice(
    'title block',
    ['sheet.paper', 'paper', 'by the units: Letter with inches, A4 with SI'],
    () => ['', ...PAPERS],
    ({ sheet }) => sheet?.paper ?? '',
    (session, paper) => withSheet(session, 'paper', paper === '' ? undefined : paper),
    (paper) => paper || 'by the units',
  ),
];
