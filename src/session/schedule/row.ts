import { harmless, parseQuantity, quoted } from '../../quantity/index.ts';
import { rackSizesOf, type Size } from '../../timber/index.ts';
import { PRODUCTS, type Stock } from '../../timber/member.ts';
import { type Path, SessionFault } from '../fault.ts';
import { readUnlinked } from '../read.ts';
import { readJson } from '../read-json.ts';
import { FORMAT } from '../schema.ts';
import type { SessionMember } from '../session.ts';
import { type CellKind, SCHEDULE_COLUMNS } from './columns.ts';
import { unguarded } from './guard.ts';
import type { HeadColumn, ScheduleHead } from './head.ts';
import { readLoadsCell } from './loads-cell.ts';

export type RowRead =
  | { readonly ok: true; readonly member: SessionMember; readonly sized: boolean }
  | { readonly ok: false; readonly fault: string };

type Raw = Record<string, unknown>;

/** What a decoder puts for bytes that are no text. */
const REPLACEMENT = '\uFFFD';

/**
 * What a row says of other rows: nothing, where each is sized by itself; or, where all of them become one session, links
 * that are left to be resolved there.
 */
export type RowLinks = 'refused' | 'unresolved';

/**
 * A row of a beam schedule as a member, by the same rules as the session file. An empty cell says nothing. Without width
 * and depth (`sized` false) the member has some stock size of its wood, to be chosen. `otherwise` is its name where the
 * row gives none. The fault is one line that names the column, what is wrong and what would be right.
 */
export function readScheduleRow(
  head: ScheduleHead,
  cells: readonly string[],
  otherwise: string,
  links: RowLinks = 'refused',
): RowRead {
  try {
    const record: Raw = {};
    if (cells.some((cell) => cell.includes(REPLACEMENT)))
      throw new SessionFault([], 'is not UTF-8 text; save the schedule as UTF-8');
    for (const column of head.columns) putCell(record, column, cells[column.at] ?? '');
    checkStray(head, cells);
    const sized = record.section !== undefined;
    checkLinks(record, links, sized);
    const { combinations, ...member } = withDefaults(record, otherwise);
    const document = {
      thrice: FORMAT,
      ...(combinations === undefined ? {} : { combinations }),
      members: [member],
    };
    return { ok: true, member: readUnlinked(document).members[0]!, sized };
  } catch (fault) {
    if (fault instanceof SessionFault) return { ok: false, fault: faultText(head, cells, fault) };
    throw fault;
  }
}

function putCell(record: Raw, { column, unit }: HeadColumn, cell: string): void {
  const text = unguarded(cell).replace(/[\t\r\n]+/g, ' ');
  if (text.trim() === '') return;
  const value = cellValue(column.kind, text, unit, column.path, column.example);
  let node = record;
  for (const step of column.path.slice(0, -1)) {
    node[step] ??= {};
    node = node[step] as Raw;
  }
  node[column.path.at(-1)!] = value;
}

function cellValue(
  kind: CellKind,
  text: string,
  unit: string | undefined,
  path: Path,
  example: string,
): unknown {
  const plain = text.trim();
  switch (kind.is) {
    case 'text':
      return text;
    case 'word':
      return plain;
    case 'number': {
      const digits = plain.replace(/^l ?\/ ?/i, '');
      if (!/^\d+(?:\.\d*)?$|^\.\d+$/.test(digits))
        throw new SessionFault(path, `${quoted(plain)} is not a number; write ${example}`);
      return Number(digits);
    }
    case 'flag': {
      const flag = FLAGS.get(plain.toLowerCase());
      if (flag === undefined)
        throw new SessionFault(path, `${quoted(plain)} is neither yes nor no; write ${example}`);
      return flag;
    }
    case 'quantity':
      return withUnit(kind, plain, unit);
    case 'bracing':
      return withUnit({ of: 'length' }, plain, unit);
    case 'quantities': {
      const list = plain
        .split(';')
        .map((part) => part.trim())
        .filter((part) => part !== '')
        .map((part) => withUnit(kind, part, unit));
      return kind.alone && list.length === 1 ? list[0] : list;
    }
    case 'loads':
      return readLoadsCell(plain, path);
    case 'json':
      return readJsonCell(plain, path, example);
  }
}

function readJsonCell(text: string, path: Path, example: string): unknown {
  try {
    return readJson(text);
  } catch (fault) {
    if (!(fault instanceof SessionFault)) throw fault;
    throw new SessionFault(path, `${quoted(text)} is not JSON; write ${example}`);
  }
}

const FLAGS: ReadonlyMap<string, boolean> = new Map([
  ['yes', true],
  ['y', true],
  ['true', true],
  ['1', true],
  ['no', false],
  ['n', false],
  ['false', false],
  ['0', false],
]);

/** A bare number has the unit of its head; what has one of its own keeps it, and what is neither is left to be refused. */
function withUnit(
  { of }: { readonly of: Parameters<typeof parseQuantity>[0] },
  text: string,
  unit: string | undefined,
): string {
  if (unit === undefined || parseQuantity(of, text).ok) return text;
  return parseQuantity(of, text, unit).ok ? `${text} ${unit}` : text;
}

/** A value that stands under no head would be lost. */
function checkStray(head: ScheduleHead, cells: readonly string[]): void {
  const known = new Set([...head.columns.map(({ at }) => at), ...head.results]);
  const stray = cells.findIndex((cell, at) => cell.trim() !== '' && !known.has(at));
  if (stray < 0) return;
  throw new SessionFault(
    [],
    `${quoted(cells[stray]!)} stands in column ${stray + 1}, which has no head; is a separator inside a cell without quotes?`,
  );
}

function checkLinks(record: Raw, links: RowLinks, sized: boolean): void {
  if (record.links === undefined) return;
  if (links === 'refused') {
    const way = 'write its reactions under loads, or make a session of the rows (--session)';
    throw new SessionFault(['links'], `a row is sized by itself and follows no other; ${way}`);
  }
  if (!sized) throw new SessionFault([], 'a row with links needs the size it has: width and depth');
}

const DEFAULT_PRODUCT = 'dimension lumber';
/** A dressed 2x12 (PS 20), where the wood has no stock sizes. */
const SOME_SECTION = { width: '1.5 in', depth: '11.25 in' };

function withDefaults(record: Raw, otherwise: string): Raw {
  const stock: Raw = { product: DEFAULT_PRODUCT, ...(record.stock as Raw | undefined) };
  return { name: otherwise, ...record, stock, section: record.section ?? someSection(stock) };
}

/** Deepest sizes by wood: a schedule has thousands of rows and a few woods. */
const DEEPEST = new Map<string, Raw>();
const MOST_WOODS = 500;

/** The deepest stock size of a wood: the one that a notch forbids last. */
function someSection({ product, species, grade }: Raw): Raw {
  const stock = PRODUCTS.find((one) => one === product);
  if (stock === undefined) return SOME_SECTION;
  const key = JSON.stringify([product, species, grade]);
  const known = DEEPEST.get(key);
  if (known !== undefined) return known;
  if (DEEPEST.size >= MOST_WOODS) DEEPEST.clear();
  const found = deepestOf({
    product: stock,
    species: String(species ?? ''),
    grade: String(grade ?? ''),
    values: null,
    valuesFrom: null,
  });
  DEEPEST.set(key, found);
  return found;
}

function deepestOf(stock: Stock): Raw {
  let deepest: Size | null = null;
  for (const size of rackSizesOf(stock)) if (deepest === null || size.depth > deepest.depth) deepest = size;
  if (deepest === null) return SOME_SECTION;
  return { width: `${deepest.width} in`, depth: `${deepest.depth} in`, plies: deepest.plies };
}

const FAULT_LENGTH = 400;

/** The column that the fault is about, then what is wrong; where its cell is empty, what may stand there. */
function faultText(head: ScheduleHead, cells: readonly string[], fault: SessionFault): string {
  const path = fault.path[0] === 'members' ? fault.path.slice(2) : fault.path;
  const about = SCHEDULE_COLUMNS.find((column) => isWithin(path, column.path));
  if (about === undefined) return harmless(fault.message, FAULT_LENGTH);
  const column = head.columns.find((one) => one.column === about);
  const label = harmless(column?.label ?? about.head);
  const given = column !== undefined && (cells[column.at] ?? '').trim() !== '';
  return given
    ? harmless(`${label}: ${fault.message}`, FAULT_LENGTH)
    : `${label} is empty; write ${about.example}`;
}

/** Whether a path leads to a place or into it. */
function isWithin(path: Path, place: Path): boolean {
  return place.every((step, at) => path[at] === step);
}
