import { Resvg } from '@resvg/resvg-js';
import { describe, expect, it } from 'vitest';
import { fitted, isCovered, textBox, textWidth, wrapped } from '../../../src/drawing/fontMetrics.ts';
import { fontWidths } from '../../../src/drawing/fontWidths.ts';
import { fontFiles } from '../../../src/tasks/bundledFont.ts';

/** Right edge of a text as another program shapes and draws it with the same font, kerning off, pixels. */
const drawnRight = (text: string, weight: 400 | 600, size: number): number => {
  const svg =
    `<svg xmlns="http://www.w3.org/2000/svg" width="9000" height="400"><text x="0" y="300" font-size="${size}"` +
    ` font-weight="${weight}" font-family="Source Sans 3" style="font-kerning:none">${text}</text></svg>`;
  const box = new Resvg(svg, {
    font: { loadSystemFonts: false, fontFiles: Object.values(fontFiles) },
  }).getBBox();
  if (box === undefined) throw new Error(`nothing drawn for ${text}`);
  return box.x + box.width;
};

describe('textWidth', () => {
  // Behind the text an H is drawn; how far its right edge moves is the width of the text.
  it.each([
    ['1.412 mA', 400],
    ['8.163 µA', 400],
    ['−1.071 mA', 400],
    ['240 Ω', 400],
    ['saturation', 600],
    ['VBAT', 600],
    ['AVToWa', 400],
    ['Pegelstation Nord, 25 °C', 400],
  ] as const)('measures %s as it is drawn, weight %s', (text, weight) => {
    const size = 100;
    const alone = drawnRight('H', weight, size);
    expect(drawnRight(`${text}H`, weight, size) - alone).toBeCloseTo(textWidth(text, size, weight), 0);
  });

  it('gives every figure the same width, so that columns stand', () => {
    for (const weight of [400, 600] as const) {
      const widths = new Set(Array.from('0123456789').map((digit) => textWidth(digit, 1000, weight)));
      expect(widths.size).toBe(1);
    }
    // The font's own hmtx table: 497 and 513 units of 1000.
    expect(textWidth('0', 1000, 400)).toBe(497);
    expect(textWidth('0', 1000, 600)).toBe(513);
  });

  it('leaves room for characters that the font lacks', () => {
    expect(isCovered('水位', 400)).toBe(false);
    expect(textWidth('水位', 10)).toBeGreaterThan(10);
  });

  it('has every run of characters in both weights', () => {
    expect(fontWidths[400].map(([first]) => first)).toEqual(fontWidths[600].map(([first]) => first));
  });
});

describe('textBox', () => {
  it('lies to the right of, about, or to the left of its anchor', () => {
    const text = { text: 'R12', x: 100, y: 50, size: 13, weight: 600 } as const;
    const width = textWidth('R12', 13, 600);
    expect(textBox({ ...text, align: 'left' }).left).toBe(100);
    expect(textBox({ ...text, align: 'centre' }).left).toBeCloseTo(100 - width / 2);
    expect(textBox({ ...text, align: 'right' }).right).toBe(100);
  });
});

describe('wrapped and fitted', () => {
  it('break only at spaces and lose nothing', () => {
    const text = 'a lamp holder is live while dark: 12.00 V to ground at both pins';
    const lines = wrapped(text, 150, 13);
    expect(lines.length).toBeGreaterThan(1);
    expect(lines.join(' ')).toBe(text);
    for (const line of lines) expect(textWidth(line, 13)).toBeLessThanOrEqual(150);
  });

  it('cut with an ellipsis that still fits', () => {
    expect(fitted('short', 200, 13)).toBe('short');
    const cut = fitted('a very long title of a stage', 80, 13);
    expect(cut.endsWith('…')).toBe(true);
    expect(textWidth(cut, 13)).toBeLessThanOrEqual(80);
  });
});
