import { KIND_WORD, LOAD_KINDS } from '../../loads/kinds.ts';
import type { QuantityKind } from '../../quantity/index.ts';
import { FACTOR_SYMBOLS, STOCK_VALUES, type StockValue } from '../../timber/member.ts';
import type { Path } from '../fault.ts';
import { WITHOUT_UNIT } from '../write-stock.ts';

/** What stands in the cells of a column. */
export type CellKind =
  | { readonly is: 'text' }
  | { readonly is: 'word' }
  | { readonly is: 'number' }
  | { readonly is: 'flag' }
  | { readonly is: 'quantity'; readonly of: QuantityKind }
  /** A length, or one of the words of a bracing. */
  | { readonly is: 'bracing' }
  /** Several in one cell, a semicolon between them; `alone`: one stands for all. */
  | { readonly is: 'quantities'; readonly of: QuantityKind; readonly alone: boolean }
  | { readonly is: 'loads' }
  | { readonly is: 'json' };

/** A column of a beam schedule: one value of a member of the session file. */
export interface ScheduleColumn {
  /** As it is written at the head. */
  readonly head: string;
  /** Its place in the record of a member. */
  readonly path: Path;
  readonly kind: CellKind;
  /** A cell as somebody would write it. */
  readonly example: string;
  readonly says: string;
  /** Other heads that are read. */
  readonly also?: readonly string[];
}

const text: CellKind = { is: 'text' };
const word: CellKind = { is: 'word' };
const number: CellKind = { is: 'number' };
const flag: CellKind = { is: 'flag' };
const length: CellKind = { is: 'quantity', of: 'length' };
const areaLoad: CellKind = { is: 'quantity', of: 'areaLoad' };
const stress: CellKind = { is: 'quantity', of: 'stress' };

/** Of Douglas Fir-Larch No.2 (NDS Supplement, Table 4A, from memory). */
const VALUE_EXAMPLE: Readonly<Record<StockValue, string>> = {
  Fb: '900 psi',
  FbNeg: '900 psi',
  Fv: '180 psi',
  Fcperp: '625 psi',
  E: '1600000 psi',
  Emin: '580000 psi',
  EyMin: '580000 psi',
  G: '0.5',
  COV: '0.25',
};

/** Every column that a beam schedule may have, in the order it is written. Only span and wood have no default. */
export const SCHEDULE_COLUMNS: readonly ScheduleColumn[] = [
  column('name', ['name'], text, 'B1', 'the mark of the beam', ['mark', 'beam', 'member']),
  column('note', ['note'], text, 'over the boat slip', 'anything to remember', [
    'notes',
    'remark',
    'remarks',
  ]),
  column('use', ['use'], word, 'floor', 'floor, roof, roof-ceiling or roof-plaster: gives the limits'),
  column('count', ['count'], number, '4', 'how many there are', ['qty', 'quantity', 'number']),
  column(
    'span',
    ['spans'],
    { is: 'quantities', of: 'length', alone: false },
    '14 ft',
    'between bearing centres; several: 12 ft; 14 ft',
    ['spans'],
  ),
  column('overhang left', ['overhangs', 'left'], length, '2 ft', 'past the first bearing'),
  column('overhang right', ['overhangs', 'right'], length, '2 ft', 'past the last bearing'),
  column('supports', ['supports'], word, 'bearings', 'bearings or cantilever'),
  column('fixed left', ['fixed', 'left'], flag, 'no', 'left end held against rotation'),
  column('fixed right', ['fixed', 'right'], flag, 'no', 'right end held against rotation'),
  column(
    'bearing',
    ['bearing'],
    { is: 'quantities', of: 'length', alone: true },
    '3.5 in',
    'bearing length; one for all, or one a support',
  ),
  column('tributary', ['tributary'], length, '6 ft', 'width of floor or roof it carries', [
    'tributary width',
    'trib',
    'trib width',
  ]),
  column('spacing', ['spacing'], length, '16 in', 'in place of tributary, for joists and rafters', [
    'oc',
    'centres',
    'centers',
  ]),
  ...LOAD_KINDS.map((kind) =>
    column(KIND_WORD[kind], ['area', kind], areaLoad, '20 psf', 'area load', [`${KIND_WORD[kind]} load`]),
  ),
  column(
    'loads',
    ['loads'],
    { is: 'loads' },
    'snow 850 lb at 5 ft',
    'line and point loads, as: dead 60 plf from 0 ft to 8 ft; live 0 plf .. 90 plf; snow 850 lb at 5 ft',
  ),
  column(
    'links',
    ['links'],
    { is: 'json' },
    '[{ "member": "J1", "end": "left", "at": "5 ft" }]',
    'reactions of other rows, as the session file writes them; for --session only',
  ),
  column('self weight', ['selfWeight'], flag, 'yes', 'whether its own weight counts'),
  column(
    'influence area',
    ['liveReduction', 'area'],
    { is: 'quantity', of: 'area' },
    '600 ft2',
    'area of the live load reduction',
  ),
  column('KLL', ['liveReduction', 'KLL'], number, '2', 'live load element factor of it'),
  column('slope', ['slope'], word, '4:12', 'rise to run'),
  column('product', ['stock', 'product'], word, 'dimension lumber', 'dimension lumber where nothing is said'),
  column('species', ['stock', 'species'], text, 'Douglas Fir-Larch', 'as its table names it', ['wood']),
  column('grade', ['stock', 'grade'], text, 'No.2', 'grade, or stress class of glulam'),
  ...STOCK_VALUES.map((key) =>
    column(
      key,
      ['stock', 'values', key],
      WITHOUT_UNIT.includes(key) ? number : stress,
      VALUE_EXAMPLE[key],
      'typed over the table',
    ),
  ),
  column('values from', ['stock', 'valuesFrom'], text, 'report in hand', 'where typed values were read'),
  column(
    'rack',
    ['rack'],
    { is: 'json' },
    '[{ "product": "glulam", "grade": "24F-1.8E" }]',
    'further woods to choose from, as the session file writes them',
  ),
  column('width', ['section', 'width'], length, '1.5 in', 'of one ply, where a size is chosen already', [
    'b',
  ]),
  column('depth', ['section', 'depth'], length, '11.25 in', 'where a size is chosen already'),
  column('plies', ['section', 'plies'], number, '2', 'where a size is chosen already'),
  column('flat', ['flat'], flag, 'no', 'laid on its wide face'),
  column('max depth', ['maxDepth'], length, '12 in', 'deeper sizes do not count'),
  column('max width', ['maxWidth'], length, '6 in', 'wider sizes do not count'),
  column('floor to floor', ['headroom', 'floorToFloor'], length, '9 ft', 'of the storey it stands in'),
  column('clear height', ['headroom', 'clear'], length, '7 ft', 'wanted below it'),
  column('floor build-up', ['headroom', 'floor'], length, '1.5 in', 'deck and finishes above the joists'),
  column('joist depth', ['headroom', 'joists'], length, '9.25 in', 'joists on a dropped beam'),
  column('ceiling', ['headroom', 'ceiling'], length, '5/8 in', 'ceiling below it'),
  column('dropped or flush', ['headroom', 'beam'], word, 'dropped', 'how the joists meet it'),
  column('service', ['service'], word, 'dry', 'dry or wet'),
  column('temperature', ['temperature'], word, 'normal', 'normal, 100-125 F or 125-150 F'),
  column('incised', ['incised'], flag, 'no', 'treated through incisions'),
  column('repetitive', ['repetitive'], flag, 'no', 'three or more side by side that share load'),
  column('seasoned', ['seasoned'], flag, 'yes', 'dry when built in'),
  column('bracing', ['bracing'], { is: 'bracing' }, 'continuous', 'top edge: continuous, ends or a length'),
  column('bracing bottom', ['bracingBottom'], { is: 'bracing' }, 'ends', 'bottom edge, the same'),
  column('shear at', ['shearAt'], word, 'support', 'support or d'),
  column('notch left', ['notch', 'left'], length, '1 in', 'depth of the notch at the left end'),
  column('notch right', ['notch', 'right'], length, '1 in', 'depth of the notch at the right end'),
  column(
    'tied down',
    ['tiedDown'],
    { is: 'quantities', of: 'pointLoad', alone: false },
    '0 lb; 900 lb',
    'uplift each support can hold',
  ),
  column('limit live', ['limits', 'live'], number, '360', 'n of span/n'),
  column('limit total', ['limits', 'total'], number, '240', 'n of span/n'),
  column('limit live max', ['limits', 'liveMax'], length, '0.5 in', 'most live deflection'),
  column('creep', ['creep'], word, 'half dead', 'half dead or Kcr'),
  ...FACTOR_SYMBOLS.flatMap((symbol) => [
    column(symbol, ['factors', symbol, 'value'], number, '0.95', 'typed over that of the standard'),
    column(
      `${symbol} reason`,
      ['factors', symbol, 'reason'],
      text,
      'measured on site',
      `why ${symbol} is so`,
    ),
  ]),
  column('combinations', ['combinations'], word, 'ASCE 7-16', 'ASCE 7-16 or ASCE 7-22'),
];

function column(
  head: string,
  path: Path,
  kind: CellKind,
  example: string,
  says: string,
  also: readonly string[] = [],
): ScheduleColumn {
  return { head, path, kind, example, says, also };
}
