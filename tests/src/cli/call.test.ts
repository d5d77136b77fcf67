import { describe, expect, it } from 'vitest';
import { readCall } from '../../../src/cli/call.ts';

const messages = (...words: string[]): readonly string[] => {
  const result = readCall(words);
  return result.ok ? [] : result.faults.map((fault) => fault.message);
};

const options = (...words: string[]) => {
  const result = readCall(words);
  if (!result.ok || result.value.kind !== 'call') throw new Error('not a call');
  return Object.fromEntries(result.value.call.options);
};

describe('readCall', () => {
  it('takes a verb, a file and options in any order', () => {
    const result = readCall(['settle', '--json', 'a.stage.json', '--state', 'off', '--law=smooth']);
    expect(result.ok && result.value.kind === 'call' && result.value.call.file).toBe('a.stage.json');
    expect(options('settle', '--json', 'a.stage.json', '--state', 'off', '--law=smooth')).toEqual({
      json: [''],
      state: ['off'],
      law: ['smooth'],
    });
  });

  it('takes a temperature below zero as the value of --ambient', () => {
    expect(options('settle', 'a', '--ambient', '-20')).toEqual({ ambient: ['-20'] });
  });

  it('takes --state more than once for settle, once for plate', () => {
    expect(options('settle', 'a', '--state', 'on', '--state', 'off')).toEqual({ state: ['on', 'off'] });
    expect(messages('plate', 'a', '--state', 'on', '--state', 'off')).toEqual(['--state is given twice.']);
  });

  it('refuses an option that the verb does not take, and says which it takes', () => {
    expect(messages('settle', 'a', '--scale', '2')).toContainEqual(
      expect.stringMatching(/^"settle" has no option --scale; it takes --state, --ambient, --law/),
    );
  });

  it('refuses a choice that is none, and says the choices', () => {
    expect(messages('plate', 'a', '--theme', 'sepia')).toEqual([
      '--theme is one of light, dark, print; found "sepia".',
    ]);
  });

  it('refuses an option left without its value, at the end or before another option', () => {
    expect(messages('settle', 'a', '--law')).toEqual(['--law needs a value after it: --law LAW.']);
    expect(messages('settle', 'a', '--state', '--json')).toEqual([
      '--state needs a value after it: --state NAME.',
    ]);
  });

  it('refuses a value after an option that takes none', () => {
    expect(messages('settle', 'a', '--json=yes')).toEqual(['--json takes no value; found "yes".']);
  });

  it('refuses a call without a file, and a second file', () => {
    expect(messages('settle')).toEqual(['"settle" needs a stage file: restpoint settle FILE.']);
    expect(messages('settle', 'a', 'b')).toEqual(['"settle" takes one file; found "b" after it.']);
  });

  it('refuses an unknown verb with those there are, and says of a later one that it is not there yet', () => {
    expect(messages('solve', 'a')[0]).toMatch(/^There is no verb "solve"; there are settle, plate,/);
    expect(messages('aim', 'a', '--want', 'Q1.drainCurrent=1m')).toEqual([
      '"aim" is not in this version; it answers settle and plate.',
    ]);
  });

  it('tells of itself where nothing, or help, is asked', () => {
    for (const words of [[], ['--help'], ['-h'], ['settle', '--help'], ['aim', '-h']]) {
      const result = readCall(words);
      expect(result.ok && result.value.kind, words.join(' ')).toBe('help');
    }
  });
});
