/** A value known to lie between two numbers. */
export type Interval = readonly [low: number, high: number];

/** Numbers are printed with five digits; where more stand behind a point, with those. */
const ROUNDING = 5.1e-5;
const DIGITS = 5;

function roundingOf(number: string): number {
  const [digits] = number.split('e') as [string];
  const count = digits.replace('.', '').replace(/^0+/, '').length;
  return digits.includes('.') && count > DIGITS ? 0.51 * 10 ** (1 - count) : ROUNDING;
}

/** The number that a text begins with, widened by its rounding; null where it begins with none. */
export function leading(text: string): Interval | null {
  const found = /^[-+]?\d+(\.\d+)?(e-?\d+)?/.exec(text);
  return found === null ? null : widened(Number(found[0]), ROUNDING);
}

/** The number of a result: ratios and exponents are printed with three decimals. */
export function printed(text: string): Interval {
  const found = leading(text);
  if (found === null) throw new Error(`${text} begins with no number`);
  const slack = /^[-+]?\d+\.\d{3}$/.test(text) ? 5.1e-4 : 0;
  return [found[0] - slack, found[1] + slack];
}

export function widened(value: number, by: number): Interval {
  const slack = Math.abs(value) * by;
  return [value - slack, value + slack];
}

export function meet(a: Interval, b: Interval): boolean {
  return a[0] <= b[1] && b[0] <= a[1];
}

const TOKEN =
  /\s*(?:(\d+(?:\.\d+)?(?:e-?\d+)?)|(sqrt|min|max|ln)(?=\()|(x)(?=\s)|([A-Za-z%][\w/-]*)|([-+/^(),]))/y;

/** Works out "3 in x (11.25 in)^2 / 6" with the rounding of its numbers; units are passed over. */
export function evaluate(text: string): Interval {
  const tokens = tokensOf(text);
  let at = 0;
  const peek = () => tokens[at];
  const take = (token: string) => {
    if (tokens[at] !== token) throw new Error(`${token} expected at ${at} of ${tokens.join(' ')}`);
    at += 1;
  };
  const sum = (): Interval => {
    let value = product();
    while (peek() === '+' || peek() === '-') {
      const minus = tokens[at] === '-';
      at += 1;
      const next = product();
      value = minus ? [value[0] - next[1], value[1] - next[0]] : [value[0] + next[0], value[1] + next[1]];
    }
    return value;
  };
  const product = (): Interval => {
    let value = signed();
    while (peek() === 'x' || peek() === '/') {
      const over = tokens[at] === '/';
      at += 1;
      const next = signed();
      value = times(value, over ? inverse(next) : next);
    }
    return value;
  };
  const signed = (): Interval => {
    if (peek() !== '-') return power();
    at += 1;
    const [low, high] = power();
    return [-high, -low];
  };
  const power = (): Interval => {
    const base = single();
    if (peek() !== '^') return base;
    at += 1;
    // An exponent is exact.
    const [low, high] = single();
    const exponent = Math.round(((low + high) / 2) * 1e6) / 1e6;
    const exact = [1, 2, 3].flatMap((n) => [9, 10, 20].map((x) => n / x));
    const n = exact.find((each) => Math.abs(each - exponent) < 1e-4) ?? exponent;
    const ends = base.map((each) => each ** n);
    return [Math.min(...ends), Math.max(...ends)];
  };
  const single = (): Interval => {
    const token = tokens[at]!;
    if (token === 'sqrt') {
      at += 1;
      const [low, high] = single();
      return [Math.sqrt(Math.max(0, low)), Math.sqrt(high)];
    }
    if (token === 'ln') {
      at += 1;
      const [low, high] = single();
      return [Math.log(low), Math.log(high)];
    }
    if (token === 'min' || token === 'max') {
      at += 1;
      take('(');
      const first = sum();
      take(',');
      const second = sum();
      take(')');
      const pick = token === 'min' ? Math.min : Math.max;
      return [pick(first[0], second[0]), pick(first[1], second[1])];
    }
    if (token === '(') {
      at += 1;
      const value = sum();
      take(')');
      return value;
    }
    at += 1;
    const value = Number(token);
    if (Number.isNaN(value)) throw new Error(`${token} is no number, in ${text}`);
    return widened(value, roundingOf(token));
  };
  const value = sum();
  if (at !== tokens.length) throw new Error(`${tokens.slice(at).join(' ')} left over of ${text}`);
  return value;
}

function tokensOf(text: string): string[] {
  const tokens: string[] = [];
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < text.trimEnd().length) {
    const from = TOKEN.lastIndex;
    const found = TOKEN.exec(text);
    if (found === null) throw new Error(`cannot read ${text.slice(from)} of ${text}`);
    const [, number, call, cross, , sign] = found;
    const token = number ?? call ?? cross ?? sign;
    if (token !== undefined) tokens.push(token);
  }
  return tokens;
}

function times(a: Interval, b: Interval): Interval {
  const all = [a[0] * b[0], a[0] * b[1], a[1] * b[0], a[1] * b[1]];
  return [Math.min(...all), Math.max(...all)];
}

function inverse([low, high]: Interval): Interval {
  return low <= 0 && high >= 0 ? [Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY] : [1 / high, 1 / low];
}
