import { quoted } from '../quantity/index.ts';
import { pathText, SessionFault } from './fault.ts';

/** Deeper than any session: stops a file made to exhaust the stack. */
const MAX_DEPTH = 32;

/**
 * Reads strict JSON into plain values. Stricter than JSON.parse where a slip would be lost: a key given twice and
 * `__proto__` are refused, and so is deep nesting. Throws SessionFault with line and column.
 */
export function readJson(text: string): unknown {
  const reader = new Reader(text);
  return reader.document();
}

const BLANK = /[ \t\n\r]*/y;
const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
/** A text up to, but without, its closing quote; unrolled, so that it takes linear time on any input. */
const STRING = /"[^"\\\u0000-\u001f]*(?:\\(?:["\\/bfnrt]|u[\da-fA-F]{4})[^"\\\u0000-\u001f]*)*/y;
const WORD = /[A-Za-z]+/y;
const WORDS: ReadonlyMap<string, boolean | null> = new Map([
  ['true', true],
  ['false', false],
  ['null', null],
]);

class Reader {
  private at = 0;
  private readonly path: (string | number)[] = [];
  private readonly text: string;

  constructor(text: string) {
    this.text = text;
  }

  document(): unknown {
    const value = this.value();
    this.skip();
    if (this.at < this.text.length) this.fail('something follows the end of the JSON');
    return value;
  }

  private value(): unknown {
    this.skip();
    if (this.path.length > MAX_DEPTH) this.fail(`nested deeper than ${MAX_DEPTH} levels`);
    switch (this.text[this.at]) {
      case '{':
        return this.object();
      case '[':
        return this.array();
      case '"':
        return this.string();
      default:
        return this.scalar();
    }
  }

  private object(): Record<string, unknown> {
    const record: Record<string, unknown> = {};
    this.at++;
    if (this.next('}')) return record;
    do {
      this.skip();
      const start = this.at;
      if (this.text[start] !== '"') this.fail('expected a key in double quotes');
      const key = this.string();
      if (key === '__proto__') this.fail('the key "__proto__" is not allowed', start);
      if (Object.hasOwn(record, key)) this.fail(`the key ${quoted(key)} is given twice`, start);
      if (!this.next(':')) this.fail('expected ":" after the key');
      this.path.push(key);
      record[key] = this.value();
      this.path.pop();
    } while (this.next(','));
    if (!this.next('}')) this.fail('expected "," or "}"');
    return record;
  }

  private array(): unknown[] {
    const list: unknown[] = [];
    this.at++;
    if (this.next(']')) return list;
    do {
      this.path.push(list.length);
      list.push(this.value());
      this.path.pop();
    } while (this.next(','));
    if (!this.next(']')) this.fail('expected "," or "]"');
    return list;
  }

  private string(): string {
    const found = this.match(STRING)!;
    if (this.text[this.at] !== '"') {
      this.fail(
        this.text[this.at] === '\\' ? 'an unknown escape in a text' : 'a text is not closed by a quote',
      );
    }
    this.at++;
    return found.includes('\\') ? (JSON.parse(`${found}"`) as string) : found.slice(1);
  }

  private scalar(): unknown {
    if (this.at >= this.text.length) this.end();
    const number = this.match(NUMBER);
    if (number !== null) {
      const value = Number(number);
      if (!Number.isFinite(value)) this.fail('the number is too large');
      return value;
    }
    const start = this.at;
    const word = this.match(WORD);
    if (word !== null && WORDS.has(word)) return WORDS.get(word);
    return this.fail(`unexpected ${quoted(word ?? this.text[start]!)}`, start);
  }

  private next(mark: string): boolean {
    this.skip();
    if (this.text[this.at] !== mark) {
      if (this.at >= this.text.length) this.end();
      return false;
    }
    this.at++;
    return true;
  }

  private skip(): void {
    BLANK.lastIndex = this.at;
    BLANK.exec(this.text);
    this.at = BLANK.lastIndex;
  }

  private match(pattern: RegExp): string | null {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text);
    if (found === null) return null;
    this.at = pattern.lastIndex;
    return found[0];
  }

  private end(): never {
    throw new SessionFault([], `the file ends before the JSON is complete${this.within()}`);
  }

  private fail(what: string, at = this.at): never {
    if (at >= this.text.length) this.end();
    const lines = this.text.slice(0, at).split('\n');
    const column = lines[lines.length - 1]!.length + 1;
    throw new SessionFault([], `not JSON at line ${lines.length}, column ${column}: ${what}${this.within()}`);
  }

  private within(): string {
    return this.path.length === 0 ? '' : `, within ${pathText(this.path.slice(0, 8))}`;
  }
}
