/** One select-graphic-rendition attribute: the sequence that starts it and the one that ends it. */
export interface SgrCode {
  readonly open: string;
  readonly close: string;
}

/** A step from one style to another: what to write, and where the pen stands then. */
export interface Stroke {
  readonly text: string;
  readonly state: PenState;
}

/** The attributes in force, oldest first: the order is what the terminal has seen, and decides how they close. */
export interface PenState {
  readonly codes: readonly SgrCode[];
  /** Strokes to each style, filled in as they are asked for. */
  readonly to: (Stroke | undefined)[];
  /** Whether a blank written now could be told from a plain one. */
  readonly marksBlanks: boolean;
}

export interface Pen {
  readonly start: PenState;
  /** The stroke from a state to the style at this index of STYLES. */
  to(state: PenState, style: number): Stroke;
  /** What ends every attribute in force. */
  close(state: PenState): string;
  /** Whether a blank in this style could be told from a plain one. */
  marksBlanks(style: number): boolean;
}

/** Attributes that show on a blank cell: underline, reverse. */
const SHOWS_ON_BLANK = new Set(['\x1b[4m', '\x1b[7m']);
const marksBlank = (codes: readonly SgrCode[]): boolean => codes.some(({ open }) => SHOWS_ON_BLANK.has(open));
/** Bold and dim close alike but do not replace each other. */
const INTENSITY_END = '\x1b[22m';

const holds = (codes: readonly SgrCode[], code: SgrCode): boolean =>
  codes.some(({ open }) => open === code.open);

/**
 * Moves between styles with the very sequences Ink writes after its own reduction, so that a row read
 * back by Ink's tokenizer comes out unchanged and is read only once.
 * No style may hold bold and dim together: their shared end would need re-opening.
 */
export function createPen(styles: readonly (readonly SgrCode[])[]): Pen {
  const states = new Map<string, PenState>();

  function stateOf(codes: readonly SgrCode[]): PenState {
    const name = codes.map(({ open }) => open).join('');
    let state = states.get(name);
    if (state === undefined) {
      state = { codes, to: new Array(styles.length).fill(undefined), marksBlanks: marksBlank(codes) };
      states.set(name, state);
    }
    return state;
  }

  /** Ends what the next style lacks, newest first, each end once; a colour replaced by a colour is not ended. */
  function ended(from: readonly SgrCode[], to: readonly SgrCode[]): SgrCode[] {
    return from.filter((code) =>
      code.close === INTENSITY_END ? !holds(to, code) : !to.some(({ close }) => close === code.close),
    );
  }

  function strokeTo(from: PenState, style: number): Stroke {
    const target = styles[style] ?? [];
    const gone = ended(from.codes, target);
    const begun = target.filter((code) => !holds(from.codes, code));
    const kept = from.codes.filter((code) => holds(target, code));
    const text = [...gone.reverse().map(({ close }) => close), ...begun.map(({ open }) => open)].join('');
    return { text, state: stateOf([...kept, ...begun]) };
  }

  return {
    start: stateOf([]),
    to(state, style) {
      let stroke = state.to[style];
      if (stroke === undefined) {
        stroke = strokeTo(state, style);
        state.to[style] = stroke;
      }
      return stroke;
    },
    close: (state) =>
      [...state.codes]
        .reverse()
        .map(({ close }) => close)
        .join(''),
    marksBlanks: (style) => marksBlank(styles[style] ?? []),
  };
}
