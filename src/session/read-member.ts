import { LOAD_KINDS } from '../loads/kinds.ts';
import type { AppliedLoad, CombinationSet, Link } from '../loads/loading.ts';
import { parseQuantity, type QuantityKind, showSpan } from '../quantity/index.ts';
import { type Beam, beamLength, supportPlaces } from '../statics/beam.ts';
import {
  ASSUMED_KEYS,
  type AssumedKey,
  type Bracing,
  FACTOR_SYMBOLS,
  type FactorSymbol,
  type Headroom,
  LIMITS_BY_USE,
  type Member,
  STOCK_VALUES,
  type Stock,
  type StockValue,
  type TypedFactors,
} from '../timber/member.ts';
import { seasonedByDefault } from '../timber/with-stock.ts';
import { type Path, SessionFault } from './fault.ts';
import { BY_SPACING, type LinkFile, type LoadFile, type MemberFile, readSlope } from './schema.ts';
import { MAX_LOADS } from './session.ts';

/** Defaults (contract, "Session file"); in. */
export const DEFAULT_BEARING = 3.5;
export const DEFAULT_TRIBUTARY = 72;
/** Stands for the spacing of another member until that is known, in. */
const UNKNOWN_SPACING = 16;
/** Slack for positions that were summed in another unit, in. */
const HAIR = 1e-6;

/**
 * A member record that fits the schema as a Member in base units, every default filled in. Throws SessionFault where its
 * values contradict each other; `path` is where the record stands.
 */
export function readMember(file: MemberFile, combinations: CombinationSet, path: Path): Member {
  const beam = readBeam(file, path);
  const use = file.use ?? 'floor';
  const stock = readStock(file.stock, [...path, 'stock']);
  const spacing = file.spacing === undefined ? null : length(file.spacing);
  if (spacing !== null && file.tributary !== undefined) {
    throw new SessionFault(
      [...path, 'spacing'],
      'both spacing and tributary are given; leave one of them out',
    );
  }
  return {
    name: file.name,
    note: file.note ?? '',
    use,
    count: file.count ?? 1,
    beam,
    bearing: readBearing(file, beam, path),
    spacing,
    tributary: spacing ?? (file.tributary === undefined ? DEFAULT_TRIBUTARY : length(file.tributary)),
    area: Object.fromEntries(
      LOAD_KINDS.map((kind) => [
        kind,
        file.area?.[kind] === undefined ? 0 : read('areaLoad', file.area[kind]),
      ]),
    ) as Member['area'],
    loads: (file.loads ?? []).map((load, i) => readLoad(load, beamLength(beam), [...path, 'loads', i])),
    ...readLinks(file, beamLength(beam), path),
    selfWeight: file.selfWeight ?? true,
    combinations,
    liveReduction:
      file.liveReduction === undefined
        ? null
        : { area: read('area', file.liveReduction.area), KLL: file.liveReduction.KLL },
    slope: file.slope === undefined ? 0 : readSlope(file.slope),
    stock,
    rack: file.rack?.map((one, i) => readRackWood(one, [...path, 'rack', i])) ?? null,
    section: {
      width: length(file.section.width),
      depth: length(file.section.depth),
      plies: file.section.plies ?? 1,
      flat: file.flat ?? false,
    },
    maxDepth: file.maxDepth === undefined ? null : length(file.maxDepth),
    maxWidth: file.maxWidth === undefined ? null : length(file.maxWidth),
    ...readHeadroom(file),
    service: file.service ?? 'dry',
    temperature: file.temperature ?? 'normal',
    incised: file.incised ?? false,
    repetitive: file.repetitive ?? false,
    seasoned: file.seasoned ?? seasonedByDefault(stock),
    bracing: readBracing(file.bracing ?? 'continuous'),
    bracingBottom: readBracing(file.bracingBottom ?? 'ends'),
    shearAt: file.shearAt ?? 'support',
    notch: readNotch(file, path),
    tiedDown: readTiedDown(file, beam, path),
    limits: {
      live: file.limits?.live ?? LIMITS_BY_USE[use].live,
      total: file.limits?.total ?? LIMITS_BY_USE[use].total,
      liveMax: file.limits?.liveMax === undefined ? null : length(file.limits.liveMax),
    },
    creep: file.creep ?? 'half dead',
    typedFactors: readFactors(file),
    assumed: assumedKeys(file),
  };
}

/** A quantity that the schema has already accepted. */
function read(kind: QuantityKind, text: string): number {
  const parsed = parseQuantity(kind, text);
  if (!parsed.ok) throw new SessionFault([], parsed.fault);
  return parsed.value;
}

function length(text: string): number {
  return read('length', text);
}

function readBeam(file: MemberFile, path: Path): Beam {
  const supports = file.supports ?? 'bearings';
  const beam: Beam = {
    spans: file.spans.map(length),
    overhangs: {
      left: file.overhangs?.left === undefined ? 0 : length(file.overhangs.left),
      right: file.overhangs?.right === undefined ? 0 : length(file.overhangs.right),
    },
    supports,
    fixed: { left: file.fixed?.left ?? false, right: file.fixed?.right ?? false },
  };
  if (supports === 'cantilever') {
    if (beam.spans.length > 1) {
      throw new SessionFault(
        [...path, 'spans'],
        `a cantilever has one span, and ${beam.spans.length} are given`,
      );
    }
    if (beam.overhangs.left > 0 || beam.overhangs.right > 0) {
      throw new SessionFault(
        [...path, 'overhangs'],
        'a cantilever has no overhangs; its span is the free length',
      );
    }
    if (beam.fixed.right) {
      throw new SessionFault(
        [...path, 'fixed', 'right'],
        'the right end of a cantilever is free; write false',
      );
    }
  }
  return beam;
}

function readBearing(file: MemberFile, beam: Beam, path: Path): number[] {
  const supports = supportPlaces(beam).length;
  if (!Array.isArray(file.bearing)) {
    const one = file.bearing === undefined ? DEFAULT_BEARING : length(file.bearing);
    return new Array<number>(supports).fill(one);
  }
  const list = file.bearing.map(length);
  if (list.length !== supports) {
    throw new SessionFault([...path, 'bearing'], countMessage(list.length, supports));
  }
  return list;
}

function readTiedDown(file: MemberFile, beam: Beam, path: Path): number[] | null {
  if (file.tiedDown === undefined) return null;
  const supports = supportPlaces(beam).length;
  if (file.tiedDown.length !== supports) {
    throw new SessionFault([...path, 'tiedDown'], countMessage(file.tiedDown.length, supports));
  }
  return file.tiedDown.map((text) => read('pointLoad', text));
}

function countMessage(given: number, supports: number): string {
  return `${given} given for ${supports} ${supports === 1 ? 'support' : 'supports'}; write one for each`;
}

type PlaceKey = 'from' | 'to' | 'at';

/** Reads the places of a load or a link on a member `whole` long. */
function placesOf(file: Readonly<Partial<Record<PlaceKey, string | undefined>>>, whole: number, path: Path) {
  return (key: PlaceKey, otherwise: number): number => {
    const text = file[key];
    if (text === undefined) return otherwise;
    const at = length(text);
    if (at > whole + HAIR) {
      throw new SessionFault(
        [...path, key],
        `${text} is off the member, which is ${showSpan(whole, 'us')} long`,
      );
    }
    return Math.min(at, whole);
  };
}

function readLinks(file: MemberFile, whole: number, path: Path): { links?: Link[] } {
  if (file.links === undefined) return {};
  const count = file.links.length + (file.loads?.length ?? 0);
  if (count > MAX_LOADS) {
    const text = `${count} loads and links together; a member takes at most ${MAX_LOADS}`;
    throw new SessionFault([...path, 'links'], text);
  }
  return { links: file.links.map((link, i) => readLink(link, whole, [...path, 'links', i])) };
}

/** A link as it stands; what it brings is known once all members are read. */
function readLink(link: LinkFile, whole: number, path: Path): Link {
  const { member, end } = link;
  const named = { member, end, bears: null };
  const place = placesOf(link, whole, path);
  if (link.at !== undefined && link.every !== undefined) {
    throw new SessionFault(path, 'both at and every are given; write two links');
  }
  if (link.every !== undefined) {
    const [from, to] = [place('from', 0), place('to', whole)];
    if (from >= to)
      throw new SessionFault([...path, 'to'], 'the link must end to the right of where it begins');
    return link.every === BY_SPACING
      ? { ...named, type: 'line', every: UNKNOWN_SPACING, bySpacing: true, from, to }
      : { ...named, type: 'line', every: length(link.every), from, to };
  }
  const stray = link.from !== undefined ? 'from' : link.to !== undefined ? 'to' : null;
  if (stray !== null)
    throw new SessionFault([...path, stray], 'a link that lands once takes at instead of from and to');
  if (link.at === undefined) {
    const text = 'the link has neither at nor every; write "at": "5 ft" or "every": "16 in"';
    throw new SessionFault(path, text);
  }
  return { ...named, type: 'point', at: place('at', 0) };
}

function readLoad(load: LoadFile, whole: number, path: Path): AppliedLoad {
  const { kind } = load;
  const place = placesOf(load, whole, path);
  if (load.line !== undefined && load.point !== undefined) {
    throw new SessionFault(path, 'both line and point are given; write two loads');
  }
  if (load.line !== undefined) {
    if (load.at !== undefined)
      throw new SessionFault([...path, 'at'], 'a line load takes from and to instead of at');
    const from = place('from', 0);
    const to = place('to', whole);
    if (from >= to)
      throw new SessionFault([...path, 'to'], 'the load must end to the right of where it begins');
    const [start, end] = typeof load.line === 'string' ? [load.line, load.line] : load.line;
    return { type: 'line', kind, from, to, start: read('lineLoad', start), end: read('lineLoad', end) };
  }
  if (load.point === undefined) {
    throw new SessionFault(
      path,
      'the load has neither line nor point; write "line": "60 plf" or "point": "850 lb"',
    );
  }
  const stray = load.from !== undefined ? 'from' : load.to !== undefined ? 'to' : null;
  if (stray !== null)
    throw new SessionFault([...path, stray], 'a point load takes at instead of from and to');
  if (load.at === undefined) throw new SessionFault([...path, 'at'], 'missing; write "at": "5 ft"');
  return { type: 'point', kind, at: place('at', 0), load: read('pointLoad', load.point) };
}

/** A wood that fits the schema; throws SessionFault where it names none. */
export function readStock(file: MemberFile['stock'], path: Path): Stock {
  const named = file.product !== 'custom' && file.product !== 'LVL';
  if (named && file.grade === undefined) {
    throw new SessionFault([...path, 'grade'], 'missing; write "grade": "No.2" or what is stamped on it');
  }
  if (named && file.product !== 'glulam' && file.species === undefined) {
    throw new SessionFault(
      [...path, 'species'],
      'missing; write "species": "Douglas Fir-Larch" or what it is',
    );
  }
  if (file.product === 'custom' && file.values === undefined) {
    throw new SessionFault(
      [...path, 'values'],
      'missing; a custom product needs "values": { "Fb": "2600 psi", ... }',
    );
  }
  if (file.values !== undefined && file.valuesFrom === undefined) {
    throw new SessionFault([...path, 'valuesFrom'], 'missing; say where the values were read');
  }
  return {
    product: file.product,
    species: file.species ?? '',
    grade: file.grade ?? '',
    values: file.values === undefined ? null : readValues(file.values),
    valuesFrom: file.valuesFrom ?? null,
  };
}

/** A wood of the rack; one without stock sizes has nothing to show there. */
function readRackWood(file: MemberFile['stock'], path: Path): Stock {
  if (file.product === 'custom') {
    throw new SessionFault([...path, 'product'], 'a custom product has no stock sizes to stand on the rack');
  }
  return readStock(file, path);
}

function readHeadroom({ headroom }: MemberFile): { headroom?: Headroom } {
  if (headroom === undefined) return {};
  const part = (text: string | undefined) => (text === undefined ? 0 : length(text));
  return {
    headroom: {
      floorToFloor: length(headroom.floorToFloor),
      clear: length(headroom.clear),
      floor: part(headroom.floor),
      joists: part(headroom.joists),
      ceiling: part(headroom.ceiling),
      beam: headroom.beam ?? 'dropped',
    },
  };
}

function readFactors({ factors }: MemberFile): TypedFactors | null {
  if (factors === undefined) return null;
  const typed: Partial<Record<FactorSymbol, { value: number; reason: string }>> = {};
  for (const symbol of FACTOR_SYMBOLS) {
    const given = factors[symbol];
    if (given !== undefined) typed[symbol] = { value: given.value, reason: given.reason };
  }
  return Object.keys(typed).length === 0 ? null : typed;
}

function readValues(file: NonNullable<MemberFile['stock']['values']>): Stock['values'] {
  const values: Partial<Record<StockValue, number>> = {};
  for (const key of STOCK_VALUES) {
    const given: string | number | undefined = file[key];
    if (given !== undefined) values[key] = typeof given === 'number' ? given : read('stress', given);
  }
  return values;
}

function readBracing(text: string): Bracing {
  return text === 'continuous' || text === 'ends' ? text : length(text);
}

function readNotch(file: MemberFile, path: Path): Member['notch'] {
  const depth = length(file.section.depth);
  const end = (key: 'left' | 'right'): number => {
    const text = file.notch?.[key];
    const notch = text === undefined ? 0 : length(text);
    if (notch >= depth) {
      throw new SessionFault(
        [...path, 'notch', key],
        `${text} is not less than the depth, ${file.section.depth}`,
      );
    }
    return notch;
  };
  return { left: end('left'), right: end('right') };
}

function assumedKeys(file: MemberFile): AssumedKey[] {
  const given = file as Readonly<Record<string, unknown>>;
  return ASSUMED_KEYS.filter(
    (key) => given[key] === undefined && !(key === 'tributary' && file.spacing !== undefined),
  );
}
