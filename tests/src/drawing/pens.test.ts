import { Resvg } from '@resvg/resvg-js';
import { describe, expect, it } from 'vitest';
import { toPng } from '../../../src/drawing/png.ts';
import type { Drawing, Primitive } from '../../../src/drawing/primitives.ts';
import { rounded } from '../../../src/drawing/round.ts';
import { toSvg } from '../../../src/drawing/svg.ts';
import { themes } from '../../../src/drawing/themes.ts';
import { amplifierChain, drawn, example } from './support/stages.ts';

const text: Primitive = {
  kind: 'text',
  id: 't',
  layer: 'still',
  thing: 'title',
  text: 'R < 1 k & "Ω"\u0007',
  x: 10.123456,
  y: 20,
  size: 13,
  weight: 400,
  align: 'left',
  role: 'ink',
};
const line: Primitive = {
  kind: 'path',
  id: 'l',
  layer: 'still',
  thing: 'wire',
  commands: [['M', 0, 0], ['C', 1 / 3, 2, 3, 4, 5, 1e-9], ['Z']],
  stroke: 'ink',
  width: 1.75,
  dash: [3, 2],
};
const small: Drawing = {
  primitives: [line, text],
  bounds: { left: 0, top: 0, right: 100, bottom: 50 },
  unplaced: [],
};

const sizeOf = (png: Uint8Array) => {
  const view = new DataView(png.buffer, png.byteOffset);
  return [view.getUint32(16), view.getUint32(20)];
};

describe('rounded', () => {
  it('keeps hundredths and knows no negative zero', () => {
    expect(rounded(1 / 3)).toBe(0.33);
    expect(Object.is(rounded(-0.001), 0)).toBe(true);
  });
});

describe('toSvg', () => {
  it('writes the same drawing as the same text', () => {
    const document = example('pressure-bridge');
    expect(toSvg(drawn(document), themes.light)).toBe(toSvg(drawn(document), themes.light));
  });

  it('writes no number with more than two decimals', () => {
    const svg = toSvg(drawn(amplifierChain(2)), themes.light);
    expect(svg.match(/[" ,MLC]-?\d+\.\d{3,}/g)).toBeNull();
  });

  it('draws curves, dashes and texts where the primitives say', () => {
    const svg = toSvg(small, themes.print, { margin: 0 });
    expect(svg).toContain('viewBox="0 0 100 50"');
    expect(svg).toContain(
      '<path d="M0 0C0.33 2 3 4 5 0Z" stroke="#000000" stroke-width="1.75" stroke-dasharray="3 2"/>',
    );
    expect(svg).toContain('x="10.12" y="20" font-size="13" font-weight="400"');
  });

  it('escapes what a person typed, and leaves out what XML cannot hold', () => {
    expect(toSvg(small, themes.print)).toContain('>R &lt; 1 k &amp; &quot;Ω&quot;</text>');
  });

  it('says what it shows to a screen reader', () => {
    const svg = toSvg(small, themes.print, { title: 'A & B', description: 'one wire' });
    expect(svg).toContain('<title id="drawing-title">A &amp; B</title>');
    expect(svg).toContain('aria-labelledby="drawing-title drawing-description"');
  });

  it('names colours by the theme alone', () => {
    for (const name of ['light', 'dark', 'print', 'high-contrast'] as const) {
      const used = new Set(toSvg(drawn(example('pump-switch')), themes[name]).match(/#[0-9A-F]{6}/g) ?? []);
      for (const colour of used) expect(Object.values(themes[name])).toContain(colour);
    }
  });

  it('can carry its font along: two weights, as fonts that another program reads', () => {
    const svg = toSvg(small, themes.print, { embedFont: true });
    const fonts = [...svg.matchAll(/font\/woff;base64,([A-Za-z0-9+/=]+)/g)].map(([, data = '']) =>
      Buffer.from(data, 'base64'),
    );
    expect(fonts).toHaveLength(2);
    for (const font of fonts) {
      expect(font.toString('latin1', 0, 4)).toBe('wOFF');
      expect(font.readUInt32BE(8)).toBe(font.length);
    }
    expect(toSvg(small, themes.print)).not.toContain('font-face');
  });

  it('strikes a stale text through', () => {
    const struck = { ...small, primitives: [{ ...text, struck: true }] };
    expect(toSvg(struck, themes.print).split('<path').length).toBe(2);
  });

  it('is well formed for another program that reads SVG', () => {
    const svg = toSvg(drawn(amplifierChain(4)), themes.dark, { title: '<&>' });
    expect(() => new Resvg(svg)).not.toThrow();
  });
});

describe('toPng', () => {
  it.each([1, 2, 4] as const)('draws at scale %s', (scale) => {
    expect(sizeOf(toPng(small, themes.light, { margin: 10, scale }))).toEqual([120 * scale, 70 * scale]);
  });

  it('changes when a single stroke is taken away', () => {
    const drawing = drawn(example('level-probe-sink'));
    const whole = Buffer.from(toPng(drawing, themes.light));
    const visible = drawing.primitives.filter(({ thing }) => thing !== 'title');
    for (const missing of visible) {
      const primitives = drawing.primitives.filter((one) => one !== missing);
      const without = Buffer.from(toPng({ ...drawing, primitives }, themes.light));
      expect(without.equals(whole), missing.id).toBe(false);
    }
  });
});
