import { describe, expect, it } from 'vitest';
import { pathText } from '../../../src/stage/json/json.ts';
import { readJson } from '../../../src/stage/json/readJson.ts';

const fault = (text: string) => {
  const result = readJson(text);
  return result.ok ? undefined : result.faults[0];
};

describe('readJson', () => {
  it.each([
    [
      '{"a": [1, -2.5e-3, true, null, "x\\n\\u00b5\\ud83d\\ude00"]}',
      { a: [1, -0.0025, true, null, 'x\nµ😀'] },
    ],
    [' 7 ', 7],
    ['""', ''],
    ['[]', []],
    ['{"constructor": 1, "toString": 2}', { constructor: 1, toString: 2 }],
  ])('reads %s', (text, value) => {
    expect(readJson(text)).toEqual({ ok: true, value });
  });

  it.each([
    ['{"a": 1,}', 1, 9],
    ['{"a": 1\n "b": 2}', 2, 2],
    ['{a: 1}', 1, 2],
    ["{'a': 1}", 1, 2],
    ['[1 2]', 1, 4],
    ['[01]', 1, 3],
    ['[1.]', 1, 3],
    ['[+1]', 1, 2],
    ['[NaN]', 1, 2],
    ['["a\nb"]', 1, 4],
    ['["a]', 1, 2],
    ['["\\x"]', 1, 4],
    ['["\\u12"]', 1, 4],
    ['{"a": 1} // said', 1, 10],
    ['{"a": 1', 1, 8],
    ['', 1, 1],
    ['\n\n  tru', 3, 3],
  ])('says where %j is broken', (text, line, column) => {
    expect(fault(text)).toMatchObject({ code: 'broken-json', line, column });
  });

  it('names the path at which it is broken', () => {
    expect(fault('{"parts": {"p1": {"place": [1, }}}')?.path).toBe('parts.p1.place[1]');
  });

  it('reads no negative zero, which JSON would not give back', () => {
    const result = readJson('-0.0');
    expect(result.ok && Object.is(result.value, 0)).toBe(true);
  });

  it('names every key that is said twice', () => {
    const result = readJson('{"a": {"b": 1, "b": 2}, "a": 3}');
    expect(result.ok ? [] : result.faults.map(({ path }) => path)).toEqual(['a.b', 'a']);
  });
});

describe('a path as text', () => {
  it.each([
    [[], '$'],
    [['parts', 'p3', 'values', 'resistance'], 'parts.p3.values.resistance'],
    [['wires', 'w1', 'ends', 0, 1], 'wires.w1.ends[0][1]'],
    [['states', 'off', 'set', 'p5.voltage'], 'states.off.set["p5.voltage"]'],
    [['parts', 'a "b"'], 'parts["a \\"b\\""]'],
    [[3], '[3]'],
  ])('%j is %s', (path, text) => {
    expect(pathText(path)).toBe(text);
  });
});
