/**
 * Takes the place of the package `@alcalzone/ansi-tokenize` in the bundle (see .build/bundle.mjs). Ink reads
 * every styled row through it, each frame anew, one grapheme at a time. Rows made of single-width
 * characters and plain SGR sequences are read here without the segmenter, and what was read is kept, so
 * that a row unchanged since the last frame costs a look-up. All else goes to the package, to which
 * these functions are held equal by a property test.
 * What is returned is shared between calls: callers must not change it, and Ink does not.
 */
import {
  type AnsiCode,
  ansiCodesToString,
  type Char,
  diffAnsiCodes,
  styledCharsFromTokens as libraryStyledChars,
  tokenize as libraryTokenize,
  reduceAnsiCodesIncremental,
  type StyledChar,
  type Token,
} from '@alcalzone/ansi-tokenize';
import { createGenerations } from './generations.ts';
import { sgrEnd } from './sgr.ts';
import { SINGLE_WIDTH } from './single-width.ts';

export * from '@alcalzone/ansi-tokenize';

const ESCAPE = 0x1b;
/** A few frames of the largest screen. */
const ROWS_KEPT = 512;
/** More SGR sequences than any theme has. */
const CODES_KEPT = 256;

/** Full length from the start: an array with wide gaps is slow. */
const charTokens = new Array<Char | undefined>(SINGLE_WIDTH.length);
function charToken(code: number): Char {
  let token = charTokens[code];
  if (token === undefined) {
    token = { type: 'char', value: String.fromCharCode(code), fullWidth: false };
    charTokens[code] = token;
  }
  return token;
}

const codeTokens = createGenerations<string, readonly Token[]>(CODES_KEPT);
/** The package's own reading of one SGR sequence, which does not depend on what stands around it. */
function tokensOfCode(sequence: string): readonly Token[] {
  let tokens = codeTokens.get(sequence);
  if (tokens === undefined) {
    tokens = libraryTokenize(sequence);
    codeTokens.set(sequence, tokens);
  }
  return tokens;
}

const isCode = (token: Token): token is AnsiCode => token.type === 'ansi';
/** The styles that one SGR sequence sets and ends. */
const codesOf = (sequence: string): AnsiCode[] => tokensOfCode(sequence).filter(isCode);

/** Tokens of a text, or null when it holds anything this module does not know. */
function quickTokens(text: string): Token[] | null {
  const tokens: Token[] = [];
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (SINGLE_WIDTH[code] === 1) {
      tokens.push(charToken(code));
    } else if (code === ESCAPE) {
      const end = sgrEnd(text, index);
      if (end === -1) return null;
      tokens.push(...tokensOfCode(text.slice(index, end)));
      index = end - 1;
    } else {
      return null;
    }
  }
  return tokens;
}

const rowTokens = createGenerations<string, Token[]>(ROWS_KEPT);
export function tokenize(text: string, endChar: number = Number.POSITIVE_INFINITY): Token[] {
  if (endChar !== Number.POSITIVE_INFINITY) return libraryTokenize(text, endChar);
  let tokens = rowTokens.get(text);
  if (tokens === undefined) {
    const quick = quickTokens(text);
    if (quick === null) return libraryTokenize(text);
    tokens = quick;
    rowTokens.set(text, tokens);
    readHere.add(tokens);
  }
  return tokens;
}

/** Token lists made here: their characters are known to be single. */
const readHere = new WeakSet<readonly Token[]>();
const styledRows = new WeakMap<readonly Token[], StyledChar[]>();

/** One list for each set of styles, so that equal styles are the same list. */
const styleLists = createGenerations<string, AnsiCode[]>(CODES_KEPT);
const PLAIN: AnsiCode[] = [];
function styleList(codes: AnsiCode[]): AnsiCode[] {
  if (codes.length === 0) return PLAIN;
  const name = codes.map(({ code }) => code).join('');
  let list = styleLists.get(name);
  if (list === undefined) {
    list = codes;
    styleLists.set(name, list);
  }
  return list;
}

/** Each character in each set of styles is one object, so that two rows are compared by identity. */
const cells = new WeakMap<readonly AnsiCode[], (StyledChar | undefined)[]>();
function cellsIn(styles: AnsiCode[]): (StyledChar | undefined)[] {
  let row = cells.get(styles);
  if (row === undefined) {
    row = new Array(SINGLE_WIDTH.length);
    cells.set(styles, row);
  }
  return row;
}

export function styledCharsFromTokens(tokens: Token[]): StyledChar[] {
  if (!readHere.has(tokens)) return libraryStyledChars(tokens);
  let row = styledRows.get(tokens);
  if (row === undefined) {
    row = [];
    let styles = PLAIN;
    let known = cellsIn(styles);
    for (const token of tokens) {
      if (token.type === 'ansi') {
        styles = styleList(reduceAnsiCodesIncremental(styles, [token]));
        known = cellsIn(styles);
      } else if (token.type === 'char') {
        const code = token.value.charCodeAt(0);
        let cell = known[code];
        if (cell === undefined) {
          cell = { ...token, styles };
          known[code] = cell;
        }
        row.push(cell);
      }
    }
    styledRows.set(tokens, row);
  }
  return row;
}

/** Sequences from one list of styles to another, for lists that are shared. */
const strokes = new WeakMap<readonly AnsiCode[], WeakMap<readonly AnsiCode[], string>>();
function stroke(from: AnsiCode[], to: AnsiCode[]): string {
  if (from === to) return '';
  let row = strokes.get(from);
  if (row === undefined) {
    row = new WeakMap();
    strokes.set(from, row);
  }
  let text = row.get(to);
  if (text === undefined) {
    text = ansiCodesToString(diffAnsiCodes(from, to));
    row.set(to, text);
  }
  return text;
}

/**
 * The same as styledCharsToString(styledCharsFromTokens(tokenize(row))) for a row of single-width characters
 * and plain SGR sequences, without taking it apart: each change of style in its shortest form.
 */
export function reduceRow(row: string): string {
  let text = '';
  let written = PLAIN;
  let styles = PLAIN;
  let index = 0;
  while (index < row.length) {
    const next = row.indexOf('\x1b', index);
    const stop = next === -1 ? row.length : next;
    if (stop > index) {
      text += stroke(written, styles) + row.slice(index, stop);
      written = styles;
    }
    if (next === -1) break;
    index = sgrEnd(row, next);
    styles = styleList(reduceAnsiCodesIncremental(styles, codesOf(row.slice(next, index))));
  }
  return text + stroke(written, PLAIN);
}

export function styledCharsToString(chars: StyledChar[]): string {
  let text = '';
  let styles = PLAIN;
  for (const char of chars) {
    const next = char.styles.length === 0 ? PLAIN : char.styles;
    if (next !== styles) {
      text += stroke(styles, next);
      styles = next;
    }
    text += char.value;
  }
  return styles === PLAIN ? text : text + stroke(styles, PLAIN);
}
