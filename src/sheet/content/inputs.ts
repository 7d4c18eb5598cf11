import { KIND_WORD, type Link, type LoadKind } from '../../loads/index.ts';
import type { Units } from '../../quantity/index.ts';
import { borneText, linkText } from '../../timber/link-words.ts';
import type { Member } from '../../timber/member.ts';
import type { Block, Fact, Facts } from '../sheet.ts';
import { left, right } from './columns.ts';

/** Keys that stand elsewhere on the sheet. */
const ELSEWHERE = ['name', 'note', 'loads', 'links', 'pins', 'trail', 'rack'];

/** What the keys of the session file are called, by their path; others are named by the words in them. */
const WORDS: Readonly<Record<string, string>> = {
  count: 'pieces',
  'overhangs.left': 'overhang, left',
  'overhangs.right': 'overhang, right',
  'fixed.left': 'left end held against rotation',
  'fixed.right': 'right end held against rotation',
  bearing: 'bearing length',
  tributary: 'tributary width',
  'area.dead': 'area load, dead',
  'area.live': 'area load, live',
  'area.roofLive': 'area load, roof live',
  'area.snow': 'area load, snow',
  'area.rain': 'area load, rain',
  'area.wind': 'area load, wind',
  'area.windUp': 'area load, wind up',
  selfWeight: 'own weight counted',
  'liveReduction.area': 'live-load reduction, area AT',
  'liveReduction.KLL': 'live-load reduction, KLL',
  'stock.valuesFrom': 'typed values read from',
  'section.width': 'width of a ply',
  'section.depth': 'depth',
  'section.plies': 'plies',
  flat: 'laid flat',
  maxDepth: 'deepest choice',
  maxWidth: 'widest choice',
  repetitive: 'repetitive member',
  bracing: 'top edge held',
  bracingBottom: 'bottom edge held',
  shearAt: 'shear taken at',
  tiedDown: 'tied down for',
  'limits.live': 'live deflection limit, l over',
  'limits.total': 'total deflection limit, l over',
  'limits.liveMax': 'live deflection at most',
  creep: 'dead load in total deflection',
};

/** What the user put in, in the user's own words and units, as the session file has it. */
export function inputBlocks(record: object, { links = [] }: Member, units: Units): Block[] {
  const facts: Facts = {
    kind: 'facts',
    caption: 'Inputs as they were written; what is not listed has its default',
    facts: entriesOf(record, ''),
  };
  const { loads = [] } = record as { readonly loads?: readonly LoadRecord[] };
  return [facts, ...loadTable(loads), ...linkTable(links, units)];
}

function entriesOf(record: object, path: string): Fact[] {
  return Object.entries(record).flatMap(([key, value]): Fact[] => {
    const here = path === '' ? key : `${path}.${key}`;
    if (ELSEWHERE.includes(here)) return [];
    if (value !== null && typeof value === 'object' && !Array.isArray(value)) return entriesOf(value, here);
    const text = valueText(value);
    return text === '' ? [] : [[WORDS[here] ?? wordsOf(here), text]];
  });
}

/** "floor to floor" of "headroom.floorToFloor"; a symbol (Fb, CD) stays as it is. */
function wordsOf(path: string): string {
  return path
    .split('.')
    .map((step) =>
      /^[a-z]/.test(step) ? step.replace(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`) : step,
    )
    .join(', ');
}

/** A value of the session file in one line. */
export function valueText(value: unknown): string {
  if (Array.isArray(value)) return value.map(valueText).join(', ');
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (value !== null && typeof value === 'object') {
    return entriesOf(value, '')
      .map(([key, text]) => `${key} ${text}`)
      .join(', ');
  }
  return String(value);
}

/** A load as the session file has it. */
interface LoadRecord {
  readonly kind: LoadKind;
  readonly line?: string | readonly [string, string];
  readonly from?: string;
  readonly to?: string;
  readonly point?: string;
  readonly at?: string;
}

function loadTable(loads: readonly LoadRecord[]): Block[] {
  if (loads.length === 0) return [];
  return [
    {
      kind: 'table',
      caption: 'Typed loads, numbered as in the sketch',
      columns: [right('no.'), left('kind'), left('load'), left('from the left end')],
      rows: loads.map((load, at) => ({
        cells: [String(at + 1), KIND_WORD[load.kind], sizeOf(load), placeOf(load)],
      })),
    },
  ];
}

function sizeOf({ line, point }: LoadRecord): string {
  if (point !== undefined) return point;
  if (typeof line === 'string') return line;
  return line === undefined ? '' : `${line[0]} to ${line[1]}`;
}

function placeOf({ at, from, to, point }: LoadRecord): string {
  if (point !== undefined) return `at ${at ?? 'the left end'}`;
  if (from === undefined && to === undefined) return 'all along';
  return `${from ?? 'the left end'} to ${to ?? 'the right end'}`;
}

/** Where loads come from that are reactions of other members. */
function linkTable(links: readonly Link[], units: Units): Block[] {
  if (links.length === 0) return [];
  return [
    {
      kind: 'table',
      caption: 'Carried: reactions of other members of this job',
      columns: [left('reaction of'), left('brings, largest by kind')],
      rows: links.map((link) => ({ cells: [linkText(link, units), borneText(link, units)] })),
    },
  ];
}
