/** What this program draws with. Every glyph is one cell wide in every terminal that can draw it. */
export interface Glyphs {
  readonly kind: 'unicode' | 'ascii';
  /** A stretch that is usual. */
  readonly band: string;
  /** Where we began, when that was marked. */
  readonly began: string;
  /** What the designs compared do not agree in. */
  readonly differs: string;
  /** The knob in hand. */
  readonly hand: string;
  /** A gauge filled to now, and its head. */
  readonly fill: string;
  readonly now: string;
  /** An empty gauge. */
  readonly empty: string;
  /** Where it stood before the run of nudges. */
  readonly ghost: string;
  /** Ratio 1, and the same once exceeded. */
  readonly limit: string;
  readonly limitCrossed: string;
  /** The part of a gauge beyond the limit. */
  readonly beyond: string;
  /** The line of each power wherever it is drawn: once, twice, thrice. */
  readonly powers: readonly [string, string, string];
  /** Behind a word, the power it follows: shear¹. */
  readonly superscripts: readonly [string, string, string];
  readonly crossover: string;
  /** The size at hand in the rack, and the lightest that passes. */
  readonly current: string;
  readonly lightest: string;
  /** A size that passes where none is as light and as shallow. */
  readonly nonDominated: string;
  /** Where a curve is at its largest or smallest. */
  readonly extreme: string;
  /** Points at now from below. */
  readonly pointer: string;
  /** A value lies off the scale, to the left or to the right. */
  readonly offLeft: string;
  readonly offRight: string;
  /** A stretch of the ruler that no power governs. */
  readonly unknown: string;
  /** There is more further up, or further down. */
  readonly further: readonly [string, string];
  /** Stands where a value is absent. */
  readonly none: string;
  /** Ends what was shortened. */
  readonly more: string;
  /** Horizontal and vertical rules between panels. */
  readonly rule: string;
  readonly bar: string;
  /** Foot line: the arrow keys. */
  readonly upDown: string;
  readonly leftRight: string;
  readonly times: string;
  readonly minus: string;
  /** Between words of one line. */
  readonly dot: string;
  readonly chart: ChartGlyphs;
}

/** asciichart's ten symbols: ┼ ┤ ╶ ╴ ─ ╰ ╭ ╮ ╯ │ in its own order. */
export type LineSymbols = readonly [
  string,
  string,
  string,
  string,
  string,
  string,
  string,
  string,
  string,
  string,
];

export interface ChartGlyphs {
  /** The line style of each power. */
  readonly lines: readonly [LineSymbols, LineSymbols, LineSymbols];
  /** The ratio axis, the knob axis, where they meet or carry a mark. */
  readonly upright: string;
  readonly level: string;
  readonly tick: string;
  /** The line of ratio 1. */
  readonly limit: string;
}

const UNICODE: Glyphs = {
  kind: 'unicode',
  band: '░',
  began: '◇',
  differs: '≠',
  hand: '►',
  fill: '━',
  now: '●',
  empty: '─',
  ghost: '○',
  limit: '┃',
  limitCrossed: '╋',
  beyond: '▓',
  powers: ['─', '═', '≡'],
  superscripts: ['¹', '²', '³'],
  crossover: '┊',
  current: '●',
  lightest: '◆',
  nonDominated: '◊',
  extreme: '•',
  pointer: '▲',
  offLeft: '«',
  offRight: '»',
  unknown: '┄',
  further: ['↑', '↓'],
  none: '—',
  more: '…',
  rule: '─',
  bar: '│',
  upDown: '↑↓',
  leftRight: '←→',
  times: '×',
  minus: '−',
  dot: '·',
  chart: {
    lines: [
      ['─', '─', '╶', '╴', '─', '╰', '╭', '╮', '╯', '│'],
      ['═', '═', '═', '═', '═', '╚', '╔', '╗', '╝', '║'],
      ['≡', '≡', '≡', '≡', '≡', '┗', '┏', '┓', '┛', '┃'],
    ],
    upright: '│',
    level: '─',
    tick: '┴',
    limit: '┄',
  },
};

/** A curve whose level runs tell its power; corners below a riser as ', above one as a point. */
const line = (level: string): LineSymbols => [level, level, level, level, level, "'", '.', '.', "'", '|'];

const ASCII: Glyphs = {
  kind: 'ascii',
  band: ':',
  began: '+',
  differs: '!',
  hand: '>',
  fill: '=',
  now: '@',
  empty: '-',
  ghost: 'o',
  limit: '|',
  limitCrossed: '|',
  beyond: '#',
  powers: ['-', '=', '#'],
  superscripts: ['1', '2', '3'],
  crossover: ':',
  current: '@',
  lightest: '*',
  nonDominated: '+',
  extreme: 'o',
  pointer: '^',
  offLeft: '<',
  offRight: '>',
  unknown: '.',
  further: ['^', 'v'],
  none: '-',
  more: '~',
  rule: '-',
  bar: '|',
  upDown: 'Up/Down',
  leftRight: 'Left/Right',
  times: 'x',
  minus: '-',
  dot: ',',
  chart: {
    lines: [line('-'), line('='), line('#')],
    upright: '|',
    level: '-',
    tick: '+',
    limit: '.',
  },
};

type Environment = Readonly<Record<string, string | undefined>>;

/** Terminals whose fonts or manners leave Unicode out, whatever the locale says. */
const PLAIN_TERMINALS = new Set(['linux', 'dumb']);

function speaksUnicode(env: Environment): boolean {
  if (PLAIN_TERMINALS.has(env.TERM ?? '')) return false;
  // POSIX: the first of these that is set and not empty decides the character type.
  const locale = env.LC_ALL || env.LC_CTYPE || env.LANG || '';
  return /utf-?8/i.test(locale);
}

/** The glyphs of this name. */
export const glyphsOf = (kind: Glyphs['kind']): Glyphs => (kind === 'ascii' ? ASCII : UNICODE);

/** The glyphs that a terminal's environment can draw: its locale and TERM decide, THRICE_GLYPHS (ascii, unicode) overrides. */
export function chooseGlyphs(env: Environment): Glyphs {
  if (env.THRICE_GLYPHS === 'ascii' || env.THRICE_GLYPHS === 'unicode') return glyphsOf(env.THRICE_GLYPHS);
  return glyphsOf(speaksUnicode(env) ? 'unicode' : 'ascii');
}
