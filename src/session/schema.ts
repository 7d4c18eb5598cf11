import * as z from 'zod/mini';
import { BESTS } from '../explore/rack/best.ts';
import { LOAD_KINDS } from '../loads/kinds.ts';
import { COMBINATION_SETS } from '../loads/loading.ts';
import { isHarmful, parseQuantity, type QuantityKind, quoted } from '../quantity/index.ts';
import { FACTOR_SYMBOLS, PRODUCTS, STOCK_VALUES } from '../timber/member.ts';
import { prices, yard } from './schema-buying.ts';
import { sheet } from './schema-sheet.ts';
import { trail } from './schema-trail.ts';
import {
  MAX_COUNT,
  MAX_LOADS,
  MAX_MEMBERS,
  MAX_NAME,
  MAX_PINS,
  MAX_RACK,
  MAX_SPANS,
  MAX_TITLE,
} from './session.ts';

/** The format's version, the value of the key `thrice`. */
export const FORMAT = 1;

export const USES = ['floor', 'roof-plaster', 'roof-ceiling', 'roof'] as const;
export const TEMPERATURES = ['normal', '100-125 F', '125-150 F'] as const;

/** Bounds that keep a slip of the finger out; no code clause. Lengths in, loads lb, lb/in, psi. */
const FEET = 12;
const LONGEST = 200 * FEET;
const DEEPEST = 60;
const LONGEST_BEARING = 48;
const HEAVIEST_AREA = 2000 / 144;
const HEAVIEST_LINE = 1e6 / FEET;
const HEAVIEST_POINT = 1e7;
const MAX_PLIES = 4;
const MAX_LIMIT = 10_000;
const LEAST_FACTOR = 0.01;
const MOST_FACTOR = 10;
const SLOPE = /^(\d+(?:\.\d+)?|\.\d+) ?: ?(\d+(?:\.\d+)?|\.\d+)$/;
const STEEPEST = 2;

export type SessionFile = z.infer<ReturnType<typeof build>>;
export type MemberFile = SessionFile['members'][number];
/** A member's record without what it is called. */
export type DesignFile = NonNullable<MemberFile['pins']>[number]['design'];
export type LoadFile = NonNullable<MemberFile['loads']>[number];
export type LinkFile = NonNullable<MemberFile['links']>[number];

/** What stands for the distance of repeated reactions that follows the spacing of their member. */
export const BY_SPACING = 'spacing';

let built: ReturnType<typeof build> | undefined;

/** The shape of a session document. Built when first asked for: it costs a millisecond that `--help` need not pay. */
export function sessionSchema(): ReturnType<typeof build> {
  built ??= build();
  return built;
}

/** Rise over run of "4:12"; NaN where it is not written so. */
export function readSlope(text: string): number {
  const parts = SLOPE.exec(text.trim());
  return parts === null ? Number.NaN : Number(parts[1]) / Number(parts[2]);
}

function build() {
  return z.strictObject({
    thrice: z.literal(FORMAT),
    title: z.optional(text(0, MAX_TITLE)),
    units: z.optional(z.enum(['us', 'si'])),
    combinations: z.optional(z.enum(COMBINATION_SETS)),
    best: z.optional(z.enum(BESTS)),
    yard: z.optional(yard(PARTS)),
    prices: z.optional(prices(PARTS)),
    stock: z.optional(
      stock().register(z.globalRegistry, { description: 'the wood that new members begin with' }),
    ),
    sheet: z.optional(sheet(PARTS)),
    members: z.array(memberWithPins(member())).check(z.minLength(1), z.maxLength(MAX_MEMBERS)),
  });
}

const text = shared(makeText);
const quantity = shared(makeQuantity);

/** What the schemas of other files are put together from. */
export const PARTS = {
  text,
  length: (least: number, most: number, words: string) => quantity('length', least, most, words),
};

function memberWithPins(one: ReturnType<typeof member>) {
  return z.extend(one, {
    pins: z.optional(
      z
        .array(
          z.strictObject({
            note: z.optional(text(0, MAX_TITLE)),
            design: z.omit(one, { name: true, note: true, count: true }),
          }),
        )
        .check(z.maxLength(MAX_PINS))
        .register(z.globalRegistry, {
          description: 'designs of this member that were set aside to compare, each with a note',
        }),
    ),
    trail: z.optional(trail(PARTS)),
  });
}

function member() {
  const span = quantity('length', 1, LONGEST, '1 in to 200 ft');
  const anyPlace = z.optional(
    quantity('length', 0, (MAX_SPANS + 2) * LONGEST, '0 ft to the length of the member'),
  );
  const size = quantity('length', 0.25, DEEPEST, '1/4 in to 60 in');
  const bearing = quantity('length', 0.25, LONGEST_BEARING, '1/4 in to 48 in');
  const width = quantity('length', 0, LONGEST, '0 ft to 200 ft');
  const notch = quantity('length', 0, DEEPEST, '0 in to 60 in');
  const anyArea = z.optional(quantity('areaLoad', 0, HEAVIEST_AREA, '0 psf to 2000 psf'));
  const line = quantity('lineLoad', -HEAVIEST_LINE, HEAVIEST_LINE, 'at most 1000000 plf');
  const point = quantity('pointLoad', -HEAVIEST_POINT, HEAVIEST_POINT, 'at most 10000 kip');
  const tie = quantity('pointLoad', 0, HEAVIEST_POINT, '0 lb to 10000 kip');
  const flag = z.optional(z.boolean());
  const anySize = z.optional(size);
  const anyWidth = z.optional(width);
  const limit = z.optional(z.number().check(z.minimum(1), z.maximum(MAX_LIMIT)));
  const held = z.optional(bracing());
  const wood = stock();
  /** Something of each end, either of which may be left out. */
  const ends = <T extends z.ZodMiniType>(of: T) => z.optional(z.strictObject({ left: of, right: of }));

  return z.strictObject({
    name: text(1, MAX_NAME),
    note: z.optional(text(0, MAX_TITLE)),
    use: z.optional(z.enum(USES)),
    count: z.optional(z.int().check(z.minimum(1), z.maximum(MAX_COUNT))),
    spans: z.array(span).check(z.minLength(1), z.maxLength(MAX_SPANS)),
    overhangs: ends(anyWidth),
    supports: z.optional(z.enum(['bearings', 'cantilever'])),
    fixed: ends(flag),
    bearing: z.optional(z.union([bearing, z.array(bearing)])),
    tributary: anyWidth,
    spacing: z.optional(quantity('length', 1, LONGEST, '1 in to 200 ft')),
    area: z.optional(z.strictObject(each(LOAD_KINDS, () => anyArea))),
    loads: z.optional(
      z
        .array(
          z.strictObject({
            kind: z.enum(LOAD_KINDS),
            line: z.optional(z.union([line, z.tuple([line, line])])),
            from: anyPlace,
            to: anyPlace,
            point: z.optional(point),
            at: anyPlace,
          }),
        )
        .check(z.maxLength(MAX_LOADS)),
    ),
    links: z.optional(
      z.array(link()).check(z.maxLength(MAX_LOADS)).register(z.globalRegistry, {
        description:
          'loads that are reactions of other members: once at a place, or one every so far between two places',
      }),
    ),
    selfWeight: flag,
    liveReduction: z.optional(
      z.strictObject({
        area: quantity('area', 0, 1e6 * FEET ** 2, '0 ft2 to 1000000 ft2'),
        KLL: z.number().check(z.minimum(1), z.maximum(2)),
      }),
    ),
    slope: z.optional(slope()),
    stock: wood,
    rack: z.optional(
      z.array(wood).check(z.minLength(1), z.maxLength(MAX_RACK)).register(z.globalRegistry, {
        description: "woods that stand on the rack together; the member's own is always among them",
      }),
    ),
    section: z.strictObject({
      width: size,
      depth: size,
      plies: z.optional(z.int().check(z.minimum(1), z.maximum(MAX_PLIES))),
    }),
    flat: flag,
    maxDepth: anySize,
    maxWidth: anySize,
    headroom: z.optional(headroom()),
    service: z.optional(z.enum(['dry', 'wet'])),
    temperature: z.optional(z.enum(TEMPERATURES)),
    incised: flag,
    repetitive: flag,
    seasoned: flag,
    bracing: held,
    bracingBottom: held,
    shearAt: z.optional(z.enum(['support', 'd'])),
    notch: ends(z.optional(notch)),
    tiedDown: z.optional(z.array(tie)),
    limits: z.optional(
      z.strictObject({
        live: limit,
        total: limit,
        liveMax: z.optional(quantity('length', 0.001, DEEPEST, '0.001 in to 60 in')),
      }),
    ),
    creep: z.optional(z.enum(['half dead', 'Kcr'])),
    factors: z.optional(factors()),
  });
}

/** A load that is the reaction of another member. */
function link() {
  const place = z.optional(
    quantity('length', 0, (MAX_SPANS + 2) * LONGEST, '0 ft to the length of the member'),
  );
  return z.strictObject({
    member: text(1, MAX_NAME),
    end: z
      .union([z.enum(['left', 'right']), z.int().check(z.minimum(0), z.maximum(MAX_SPANS))])
      .register(z.globalRegistry, {
        description: 'which of its supports: "left", "right", or one by its index from the left, 0 the first',
      }),
    at: place,
    every: z.optional(every()),
    from: place,
    to: place,
  });
}

function every() {
  return z
    .string()
    .check(
      z.check<string>(({ value, issues }) => {
        if (value !== BY_SPACING) inBounds('length', value, 1, LONGEST, '1 in to 200 ft', issues);
      }),
    )
    .register(z.globalRegistry, {
      description: 'how far apart they land: "16 in", or "spacing" for the spacing of the member itself',
    });
}

/** What a storey is made up of, and so the depth that it leaves a beam. */
function headroom() {
  const height = quantity('length', 0, LONGEST, '0 ft to 200 ft');
  const part = z.optional(height);
  return z
    .strictObject({
      floorToFloor: height,
      clear: height,
      floor: part,
      joists: part,
      ceiling: part,
      beam: z.optional(z.enum(['dropped', 'flush'])),
    })
    .register(z.globalRegistry, {
      description:
        'the storey: floor to floor, clear height wanted, deck and finishes above the joists, the joists that a dropped beam carries, the ceiling below it',
    });
}

function stock() {
  const stress = z.optional(quantity('stress', 1, 1e8, 'at least 1 psi'));
  const values = each(STOCK_VALUES, () => stress);
  return z.strictObject({
    product: z.enum(PRODUCTS),
    species: z.optional(text(0, MAX_NAME)),
    grade: z.optional(text(0, MAX_NAME)),
    values: z.optional(
      z.strictObject({
        ...values,
        G: z.optional(z.number().check(z.minimum(0.1), z.maximum(1.5))),
        COV: z.optional(z.number().check(z.minimum(0), z.maximum(0.5))),
      }),
    ),
    valuesFrom: z.optional(text(1, MAX_TITLE)),
  });
}

/** Adjustment factors typed over the standard's. */
function factors() {
  const typed = () =>
    z.optional(
      z.strictObject({
        value: z.number().check(z.minimum(LEAST_FACTOR), z.maximum(MOST_FACTOR)),
        reason: text(1, MAX_TITLE),
      }),
    );
  return z.strictObject(each(FACTOR_SYMBOLS, typed)).register(z.globalRegistry, {
    description: 'adjustment factors typed over those of the standard, each with the reason for its value',
  });
}

/** A text that can be printed on one line. */
function makeText(least: number, most: number) {
  return z.string().check(
    z.minLength(least),
    z.maxLength(most),
    z.check<string>(({ value, issues }) => {
      if (isHarmful(value)) {
        issues.push(custom(value, `${quoted(value)} holds control or invisible characters; leave them out`));
      } else if (least > 0 && value.trim() === '') {
        issues.push(custom(value, 'is blank; write a text'));
      }
    }),
  );
}

/** A quantity with its unit, as text, within bounds in base units. */
function makeQuantity(kind: QuantityKind, least: number, most: number, words: string) {
  return z
    .string()
    .check(z.check<string>(({ value, issues }) => inBounds(kind, value, least, most, words, issues)))
    .register(z.globalRegistry, { description: `${DESCRIPTIONS[kind]}; ${words}` });
}

/** A schema is never changed: one of each kind and bounds serves everywhere. */
function shared<A extends readonly (string | number)[], S>(make: (...of: A) => S): (...of: A) => S {
  const known = new Map<string, S>();
  return (...of) => {
    const key = of.join('|');
    const made = known.get(key) ?? make(...of);
    known.set(key, made);
    return made;
  };
}

const DESCRIPTIONS: Readonly<Record<QuantityKind, string>> = {
  length: `a length with its unit: "14 ft", "14'-6 1/2\\"", "9.25 in", "4.42 m", "140 mm"`,
  areaLoad: 'an area load with its unit: "40 psf", "1.9 kPa"',
  lineLoad: 'a line load with its unit: "600 plf", "8.8 kN/m"',
  pointLoad: 'a force with its unit: "1200 lb", "1.2 kip", "5 kN"',
  stress: 'a stress with its unit: "900 psi", "11 MPa"',
  area: 'an area with its unit: "600 ft2", "56 m2"',
  number: 'a number',
};

function bracing() {
  return z
    .string()
    .check(
      z.check<string>(({ value, issues }) => {
        if (value === 'continuous' || value === 'ends') return;
        if (!/\d/.test(value)) {
          issues.push(custom(value, `${quoted(value)} is not "continuous", "ends" or a length like 4 ft`));
        } else inBounds('length', value, 1, LONGEST, '1 in to 200 ft', issues);
      }),
    )
    .register(z.globalRegistry, {
      description: '"continuous", "ends" (held at the supports only) or the unbraced length: "4 ft"',
    });
}

function slope() {
  return z
    .string()
    .check(
      z.check<string>(({ value, issues }) => {
        const rise = readSlope(value);
        if (!(rise >= 0 && rise <= STEEPEST)) {
          issues.push(custom(value, `${quoted(value)} is not a slope of 0:12 to 24:12; write 4:12`));
        }
      }),
    )
    .register(z.globalRegistry, { description: 'rise to run: "4:12"' });
}

function inBounds(
  kind: QuantityKind,
  value: string,
  least: number,
  most: number,
  words: string,
  issues: z.core.$ZodRawIssue[],
): void {
  const parsed = parseQuantity(kind, value);
  if (!parsed.ok) issues.push(custom(value, parsed.fault));
  else if (parsed.value < least || parsed.value > most) {
    issues.push(custom(value, `${quoted(value)} is out of range; it must be ${words}`));
  }
}

function custom(input: unknown, message: string): z.core.$ZodRawIssue {
  return { code: 'custom', input, message, continue: true };
}

function each<K extends string, T>(keys: readonly K[], make: (key: K) => T): Record<K, T> {
  return Object.fromEntries(keys.map((key) => [key, make(key)])) as Record<K, T>;
}
