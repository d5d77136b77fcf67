import { describe, expect, it } from 'vitest';
import { table } from '../../../../src/cli/text/table.ts';
import { wrapped } from '../../../../src/cli/text/wrap.ts';

describe('table', () => {
  it('aligns words to the left and figures to the right, by what a person sees of them', () => {
    const lines = table(
      [
        { title: 'name', align: 'left' },
        { title: 'value', align: 'right' },
      ],
      [
        ['R1', '4.7 kΩ'],
        ['VBAT', '\u221212 V'],
      ],
    );
    expect(lines).toEqual(['  name   value', '  R1    4.7 kΩ', '  VBAT   \u221212 V']);
  });
});

describe('wrapped', () => {
  it('keeps every line within the width and every word in order', () => {
    const text = 'the drop is 312.4 mV, more than its limit of 250 mV';
    const lines = wrapped(text, 20);
    expect(lines.join(' ')).toBe(text);
    for (const line of lines) expect(line.length).toBeLessThanOrEqual(20);
  });

  it('leaves a word longer than the line whole', () => {
    expect(wrapped('a pneumonoultramicroscopic b', 6)).toEqual(['a', 'pneumonoultramicroscopic', 'b']);
  });
});
