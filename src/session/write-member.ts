import { LOAD_KINDS } from '../loads/kinds.ts';
import { type QuantityKind, type Units, writeQuantity } from '../quantity/index.ts';
import {
  type AssumedKey,
  type Bracing,
  FACTOR_SYMBOLS,
  LIMITS_BY_USE,
  type Member,
} from '../timber/member.ts';
import { seasonedByDefault } from '../timber/with-stock.ts';
import { group, keep, keeper, keepList, present, type Raw, rawAt } from './keep.ts';
import { DEFAULT_BEARING, DEFAULT_TRIBUTARY } from './read-member.ts';
import { readSlope } from './schema.ts';
import { writeLinks } from './write-links.ts';
import { writeLoads } from './write-loads.ts';
import { writeStock } from './write-stock.ts';

/**
 * A member as the raw record to write, keys in the contract's order. `raw` is the record that it was read from and
 * `before` what that was read as (both undefined for a new member): unchanged values keep the user's text, absent ones
 * that still have their default stay absent.
 */
export function writeMember(member: Member, raw: unknown, before: Member | undefined, units: Units): Raw {
  const text = (kind: QuantityKind) => (value: number) => writeQuantity(kind, value, units);
  const length = text('length');
  const lengthOrNone = (value: number | null) => (value === null ? undefined : length(value));
  const bracing = (value: Bracing) => (typeof value === 'number' ? length(value) : value);
  const under = (key: string) => rawAt(raw, key);
  const { beam, section } = member;
  const of = keeper(raw, before, member);
  /** A value that is assumed by default is left out while it is assumed, and written once somebody has stated it. */
  const stated = <K extends AssumedKey>(key: K, otherwise: Member[K], write?: (now: Member[K]) => unknown) =>
    member.assumed.includes(key) && member[key] === otherwise ? undefined : of(key, undefined, write);
  const ofBeam = keeper(raw, before?.beam, beam);
  const overhang = keeper(under('overhangs'), before?.beam.overhangs, beam.overhangs);
  const fixed = keeper(under('fixed'), before?.beam.fixed, beam.fixed);
  const ofArea = keeper(under('area'), before?.area, member.area);
  const ofSection = keeper(under('section'), before?.section, section);
  const notch = keeper(under('notch'), before?.notch, member.notch);
  const limit = keeper(under('limits'), before?.limits, member.limits);
  const usual = LIMITS_BY_USE[member.use];

  return present({
    name: of('name', undefined),
    note: of('note', ''),
    use: of('use', 'floor'),
    count: of('count', 1),
    spans: keepList(under('spans'), before?.beam.spans, beam.spans, length),
    overhangs: group(under('overhangs'), {
      left: overhang('left', 0, length),
      right: overhang('right', 0, length),
    }),
    supports: ofBeam('supports', 'bearings'),
    fixed: group(under('fixed'), { left: fixed('left', false), right: fixed('right', false) }),
    bearing: writeBearing(member, under('bearing'), before, length),
    ...writeWidth(member, raw, before, length),
    area: group(
      under('area'),
      Object.fromEntries(LOAD_KINDS.map((kind) => [kind, ofArea(kind, 0, text('areaLoad'))])),
    ),
    loads: writeLoads(member.loads, under('loads'), before?.loads, units),
    links: writeLinks(member.links ?? [], under('links'), before?.links, units),
    selfWeight: of('selfWeight', true),
    liveReduction: writeLiveReduction(member, under('liveReduction'), before, text('area')),
    slope: of('slope', 0, slopeText),
    stock: writeStock(member.stock, under('stock'), before?.stock, text('stress')),
    rack:
      member.rack == null
        ? undefined
        : keepList(under('rack'), before?.rack, member.rack, (stock) =>
            writeStock(stock, undefined, undefined, text('stress')),
          ),
    section: present({
      width: ofSection('width', undefined, length),
      depth: ofSection('depth', undefined, length),
      plies: ofSection('plies', 1),
    }),
    flat: keep(under('flat'), before?.section.flat, section.flat, false),
    maxDepth: of('maxDepth', null, lengthOrNone),
    maxWidth: of('maxWidth', null, lengthOrNone),
    headroom: writeHeadroom(member, under('headroom'), before, length),
    service: stated('service', 'dry'),
    temperature: stated('temperature', 'normal'),
    incised: of('incised', false),
    repetitive: of('repetitive', false),
    seasoned: stated('seasoned', seasonedByDefault(member.stock)),
    bracing: stated('bracing', 'continuous', bracing),
    bracingBottom: stated('bracingBottom', 'ends', bracing),
    shearAt: of('shearAt', 'support'),
    notch: group(under('notch'), { left: notch('left', 0, length), right: notch('right', 0, length) }),
    tiedDown:
      member.tiedDown === null
        ? undefined
        : keepList(under('tiedDown'), before?.tiedDown, member.tiedDown, text('pointLoad')),
    limits: group(under('limits'), {
      live: limit('live', usual.live),
      total: limit('total', usual.total),
      liveMax: limit('liveMax', null, lengthOrNone),
    }),
    creep: of('creep', 'half dead'),
    factors: writeFactors(member, under('factors'), before),
  });
}

/** One length where all supports have the same and the file had no list, else one for each. */
function writeBearing(
  member: Member,
  raw: unknown,
  before: Member | undefined,
  length: (value: number) => string,
): unknown {
  const { bearing } = member;
  const first = bearing[0]!;
  if (member.assumed.includes('bearing') && bearing.every((one) => one === DEFAULT_BEARING)) return undefined;
  if (Array.isArray(raw) || bearing.some((one) => one !== first)) {
    return keepList(raw, before?.bearing, bearing, length);
  }
  return keep(raw, before?.bearing[0], first, undefined, length);
}

/** Spacing where it gives the tributary width, else the tributary width; never both. */
function writeWidth(
  member: Member,
  raw: unknown,
  before: Member | undefined,
  length: (value: number) => string,
): Raw {
  const { spacing, tributary } = member;
  if (spacing !== null && spacing === tributary) {
    return { spacing: keep(rawAt(raw, 'spacing'), before?.spacing ?? undefined, spacing, undefined, length) };
  }
  if (member.assumed.includes('tributary') && tributary === DEFAULT_TRIBUTARY) return {};
  return { tributary: keep(rawAt(raw, 'tributary'), before?.tributary, tributary, undefined, length) };
}

function writeHeadroom(
  { headroom }: Member,
  raw: unknown,
  before: Member | undefined,
  length: (value: number) => string,
): unknown {
  if (headroom == null) return undefined;
  const of = keeper(raw, before?.headroom ?? undefined, headroom);
  return present({
    floorToFloor: of('floorToFloor', undefined, length),
    clear: of('clear', undefined, length),
    floor: of('floor', 0, length),
    joists: of('joists', 0, length),
    ceiling: of('ceiling', 0, length),
    beam: of('beam', 'dropped'),
  });
}

/** Typed factors in the order of NDS Table 4.3.1, each as the user wrote it while it is unchanged. */
function writeFactors(member: Member, raw: unknown, before: Member | undefined): unknown {
  const typed = member.typedFactors ?? null;
  if (typed === null) return undefined;
  const of = keeper(raw, before?.typedFactors ?? undefined, typed);
  const entries = FACTOR_SYMBOLS.map((symbol) => [
    symbol,
    typed[symbol] === undefined ? undefined : of(symbol, undefined),
  ]);
  return present(Object.fromEntries(entries));
}

function writeLiveReduction(
  member: Member,
  raw: unknown,
  before: Member | undefined,
  area: (value: number) => string,
): unknown {
  const { liveReduction } = member;
  if (liveReduction === null) return undefined;
  const of = keeper(raw, before?.liveReduction ?? undefined, liveReduction);
  return { area: of('area', undefined, area), KLL: of('KLL', undefined) };
}

/** "4:12" where the rise in 12 is short, else whatever reads back exactly. */
function slopeText(slope: number): string {
  const inTwelve = `${Number((slope * 12).toFixed(4))}:12`;
  return readSlope(inTwelve) === slope ? inTwelve : `${writeQuantity('number', slope, 'us')}:1`;
}
