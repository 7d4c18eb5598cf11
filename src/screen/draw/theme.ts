import { STYLES, type Style } from './canvas.ts';
import { createPen, type Pen, type SgrCode } from './pen.ts';

/** How many colours the terminal shows; `none` keeps bold, dim and reverse, `bare` writes no codes at all. */
export type Depth = 'true' | '256' | '16' | 'none' | 'bare';
/** What lies behind the text; no one accent reads on both dark and light. */
export type Ground = 'dark' | 'light' | 'unknown';

export interface Theme {
  readonly depth: Depth;
  readonly ground: Ground;
  /** Codes of each style, in the order of STYLES. */
  readonly codes: readonly (readonly SgrCode[])[];
  readonly pen: Pen;
}

type Environment = Readonly<Record<string, string | undefined>>;

const sgr = (open: string, close: number): SgrCode => ({ open: `\x1b[${open}m`, close: `\x1b[${close}m` });
const BOLD = sgr('1', 22);
const DIM = sgr('2', 22);
const UNDERLINE = sgr('4', 24);
const REVERSE = sgr('7', 27);
/** Foreground colours all close alike. */
const FOREGROUND_END = 39;
const colour = (parameters: string): SgrCode => sgr(parameters, FOREGROUND_END);
const rgb = (hex: string): SgrCode => {
  const part = (from: number): number => Number.parseInt(hex.slice(from, from + 2), 16);
  return colour(`38;2;${part(1)};${part(3)};${part(5)}`);
};
const indexed = (index: number): SgrCode => colour(`38;5;${index}`);
const BLUE = colour('34');
const MAGENTA = colour('35');
const BRIGHT_YELLOW = colour('93');
const BRIGHT_CYAN = colour('96');

interface Accents {
  readonly now: SgrCode;
  readonly governs: SgrCode;
  readonly quiet: SgrCode;
}

/** Accents that hold a contrast of 4.5:1 on their ground. */
const ACCENTS: Readonly<Record<'true' | '256' | '16', Readonly<Record<'dark' | 'light', Accents>>>> = {
  true: {
    dark: { now: rgb('#7db7ff'), governs: rgb('#f0a05a'), quiet: rgb('#9aa0a6') },
    light: { now: rgb('#1b57b0'), governs: rgb('#9a4600'), quiet: rgb('#5c6066') },
  },
  256: {
    dark: { now: indexed(111), governs: indexed(215), quiet: indexed(247) },
    light: { now: indexed(25), governs: indexed(94), quiet: indexed(240) },
  },
  16: {
    dark: { now: BRIGHT_CYAN, governs: BRIGHT_YELLOW, quiet: DIM },
    light: { now: BLUE, governs: MAGENTA, quiet: DIM },
  },
};
/** On a ground nobody has named, only the terminal's own foreground and magenta can be trusted. */
const UNKNOWN_GROUND: Accents = { now: BOLD, governs: MAGENTA, quiet: DIM };
const NO_COLOUR: Accents = { now: BOLD, governs: UNDERLINE, quiet: DIM };

function accentsOf(depth: Exclude<Depth, 'bare'>, ground: Ground): Accents {
  if (depth === 'none') return NO_COLOUR;
  return ground === 'unknown' ? UNKNOWN_GROUND : ACCENTS[depth][ground];
}

/** An accent made strong: bold, and underlined where the accent is bold already. */
const strengthen = (accent: SgrCode): readonly SgrCode[] => [accent, accent === BOLD ? UNDERLINE : BOLD];

/** The theme of a colour depth and a ground. */
export function createTheme(depth: Depth, ground: Ground): Theme {
  const codes: Record<Style, readonly SgrCode[]> = {
    plain: [],
    strong: [],
    quiet: [],
    now: [],
    governs: [],
    verdict: [],
    nowStrong: [],
    governsStrong: [],
  };
  if (depth !== 'bare') {
    const { now, governs, quiet } = accentsOf(depth, ground);
    codes.strong = [BOLD];
    codes.quiet = [quiet];
    codes.now = [now];
    codes.governs = [governs];
    codes.verdict = [BOLD, REVERSE];
    codes.nowStrong = strengthen(now);
    codes.governsStrong = strengthen(governs);
  }
  const ordered = STYLES.map((style) => codes[style]);
  return { depth, ground, codes: ordered, pen: createPen(ordered) };
}

function depthOf(env: Environment): Depth {
  const term = env.TERM ?? '';
  if (term === 'dumb') return 'bare';
  // no-color.org: any non-empty value asks for no colour; weight and reverse stay.
  if (env.NO_COLOR) return 'none';
  const colorTerm = env.COLORTERM ?? '';
  if (colorTerm === 'truecolor' || colorTerm === '24bit' || term.endsWith('-direct')) return 'true';
  return term.includes('256color') ? '256' : '16';
}

/** COLORFGBG is "foreground;background"; of the sixteen colours these are the light grounds. */
const LIGHT_GROUNDS = new Set([7, 9, 10, 11, 12, 13, 14, 15]);

function groundOf(env: Environment): Ground {
  if (env.THRICE_THEME === 'dark' || env.THRICE_THEME === 'light') return env.THRICE_THEME;
  const background = env.COLORFGBG?.split(';').at(-1) ?? '';
  if (!/^\d{1,2}$/.test(background) || Number(background) > 15) return 'unknown';
  return LIGHT_GROUNDS.has(Number(background)) ? 'light' : 'dark';
}

/**
 * The theme that a terminal's environment asks for. NO_COLOR drops colour, TERM=dumb every code;
 * COLORTERM and TERM tell the depth; THRICE_THEME (dark, light), else COLORFGBG, tells the ground.
 */
export function chooseTheme(env: Environment): Theme {
  return createTheme(depthOf(env), groundOf(env));
}
