/**
 * Reads JSON (RFC 8259) and, beyond what the language's own reader tells, where a text is broken, which keys are
 * said twice, and which numbers are past what a double holds. Never throws, whatever the text.
 */
import type { Fault, Result } from '../../values/result.ts';
import { failure, success } from '../../values/result.ts';
import { pathText } from './json.ts';
import type { Json } from './json.ts';

/** A stage of ten thousand parts takes some 3 MB. */
const longestText = 16_000_000;
/** The deepest place of a stage file is about ten deep; the limit keeps the reader's own stack safe. */
const deepest = 64;

export function readJson(text: string): Result<Json> {
  if (text.length > longestText) {
    return failure({
      code: 'too-long',
      message: 'This file is too long to be a stage.',
      path: '$',
      found: `${text.length} characters`,
      allowed: `at most ${longestText} characters`,
    });
  }
  const reader = new Reader(text.startsWith('\ufeff') ? text.slice(1) : text);
  try {
    const value = reader.document();
    return reader.faults.length === 0 ? success(value) : failure(...reader.faults);
  } catch (broken) {
    if (broken instanceof Broken) return failure(...reader.faults, broken.fault);
    throw broken;
  }
}

/** Ends the reading of a text that is no JSON; never leaves this file. */
class Broken extends Error {
  readonly fault: Fault;
  constructor(fault: Fault) {
    super(fault.message);
    this.fault = fault;
  }
}

const escapes: Readonly<Record<string, string>> = {
  '"': '"',
  '\\': '\\',
  '/': '/',
  b: '\b',
  f: '\f',
  n: '\n',
  r: '\r',
  t: '\t',
};
const numberPattern = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const blank = /[ \t\n\r]*/y;
/** A run of a string's characters without quotes, escapes or control characters. */
// eslint-disable-next-line no-control-regex -- JSON forbids exactly these characters in a string
const plainRun = /[^"\\\u0000-\u001f]*/y;

class Reader {
  readonly faults: Fault[] = [];
  private at = 0;
  private readonly path: (string | number)[] = [];
  private readonly text: string;

  constructor(text: string) {
    this.text = text;
  }

  document(): Json {
    const value = this.value();
    this.skipBlank();
    if (this.at < this.text.length) this.broken('nothing more, the JSON being complete');
    return value;
  }

  private value(): Json {
    this.skipBlank();
    if (this.path.length > deepest) this.broken(`no more than ${deepest} levels`, 'too-deep');
    switch (this.text[this.at]) {
      case '{':
        return this.object();
      case '[':
        return this.list();
      case '"':
        return this.string();
      case 't':
        return this.word('true', true);
      case 'f':
        return this.word('false', false);
      case 'n':
        return this.word('null', null);
      default:
        return this.number();
    }
  }

  private object(): Json {
    const object: Record<string, Json> = {};
    this.at += 1;
    this.skipBlank();
    if (this.take('}')) return object;
    for (;;) {
      this.skipBlank();
      const start = this.at;
      if (this.text[this.at] !== '"') this.broken('a key in double quotes');
      const key = this.string();
      this.skipBlank();
      if (!this.take(':')) this.broken('a colon after the key');
      this.path.push(key);
      if (key === '__proto__') this.refuseKey(start, 'forbidden-key', 'The key __proto__ is not allowed.');
      const repeated = Object.hasOwn(object, key);
      if (repeated) {
        this.refuseKey(start, 'repeated-key', 'This key stands twice in one object: keep one of them.');
      }
      const value = this.value();
      if (key !== '__proto__' && !repeated) object[key] = value;
      this.path.pop();
      this.skipBlank();
      if (this.take('}')) return object;
      if (!this.take(',')) this.broken('a comma or a closing brace');
    }
  }

  private list(): Json {
    const list: Json[] = [];
    this.at += 1;
    this.skipBlank();
    if (this.take(']')) return list;
    for (;;) {
      this.path.push(list.length);
      list.push(this.value());
      this.path.pop();
      this.skipBlank();
      if (this.take(']')) return list;
      if (!this.take(',')) this.broken('a comma or a closing bracket');
    }
  }

  private string(): string {
    const start = this.at;
    this.at += 1;
    let text = '';
    for (;;) {
      text += this.match(plainRun) ?? '';
      if (this.take('"')) return text;
      if (!this.take('\\')) {
        if (this.at >= this.text.length) this.at = start;
        this.broken('a string that ends with a double quote on the same line');
      }
      const mark = this.text[this.at] ?? '';
      const plain = escapes[mark];
      if (plain !== undefined) {
        this.at += 1;
        text += plain;
        continue;
      }
      const code = /^u([0-9a-fA-F]{4})/.exec(this.text.slice(this.at, this.at + 5))?.[1];
      if (code === undefined) this.broken('an escape such as \\n or \\u00b5');
      this.at += 5;
      text += String.fromCharCode(Number.parseInt(code, 16));
    }
  }

  private number(): number {
    const start = this.at;
    const digits = this.match(numberPattern);
    if (digits === undefined || digits === '') this.broken('a value');
    const value = Number(digits);
    if (!Number.isFinite(value)) {
      this.faults.push({
        code: 'not-finite',
        message: 'This number is larger than any that can be worked with.',
        path: pathText(this.path),
        ...this.position(start),
        found: digits.slice(0, 60),
        allowed: 'a finite number',
      });
    }
    return value === 0 ? 0 : value; // no negative zero: it is written as 0
  }

  private word<Value extends Json>(word: string, value: Value): Value {
    if (!this.text.startsWith(word, this.at)) this.broken('a value');
    this.at += word.length;
    return value;
  }

  private match(pattern: RegExp): string | undefined {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text)?.[0];
    if (found !== undefined) this.at += found.length;
    return found;
  }

  private skipBlank(): void {
    this.match(blank);
  }

  private take(character: string): boolean {
    if (this.text[this.at] !== character) return false;
    this.at += 1;
    return true;
  }

  private refuseKey(at: number, code: string, message: string): void {
    const key = String(this.path.at(-1));
    this.faults.push({
      code,
      message,
      path: pathText(this.path),
      ...this.position(at),
      found: JSON.stringify(key.slice(0, 60)),
      allowed: code === 'repeated-key' ? 'each key once' : 'any other key',
    });
  }

  private broken(allowed: string, code = 'broken-json'): never {
    const character = this.text.codePointAt(this.at);
    const { line, column } = this.position(this.at);
    const found =
      character === undefined ? 'the end of the file' : JSON.stringify(String.fromCodePoint(character));
    throw new Broken({
      code,
      message: `The JSON is broken at line ${line}, column ${column}: expected ${allowed}, found ${found}.`,
      path: pathText(this.path),
      line,
      column,
      found,
      allowed,
    });
  }

  /** Line and column of a place in the text, both from 1. */
  private position(at: number): { readonly line: number; readonly column: number } {
    let line = 1;
    let lineStart = 0;
    for (let end = this.text.indexOf('\n'); end !== -1 && end < at; end = this.text.indexOf('\n', end + 1)) {
      line += 1;
      lineStart = end + 1;
    }
    return { line, column: at - lineStart + 1 };
  }
}
