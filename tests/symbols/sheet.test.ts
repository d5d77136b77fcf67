import { describe, expect, it } from 'vitest';
import type { Turn } from '../../symbols/placement.ts';
import { symbolNames, symbolArt } from '../../symbols/index.ts';
import { grown, holds, moved } from '../../src/drawing/boxes.ts';
import { boundsOf } from '../../src/drawing/bounds.ts';
import { toPng } from '../../src/drawing/png.ts';
import { badgeSheet, symbolSheet } from '../../src/drawing/sheets.ts';
import { symbolShapes } from '../../src/drawing/symbolShapes.ts';
import { themes } from '../../src/drawing/themes.ts';
import { asDrawn } from '../../symbols/placement.ts';

describe('the sheet of all symbols', () => {
  it.each([
    [false, 0],
    [false, 90],
    [true, 0],
    [true, 270],
  ] as const)('draws every symbol once, mirrored %s and turned %s', (mirror, turn: Turn) => {
    const sheet = symbolSheet({ mirror, turn });
    const drawn = new Set(sheet.primitives.filter(({ thing }) => thing === 'part').map(({ of }) => of));
    expect([...drawn].sort()).toEqual([...symbolNames].sort());
    const png = toPng(sheet, themes.light);
    expect(new DataView(png.buffer, png.byteOffset).getUint32(1)).toBe(0x504e470d);
  });

  it('holds finite numbers only', () => {
    for (const sheet of [symbolSheet(), badgeSheet()]) {
      for (const primitive of sheet.primitives) {
        const { left, top, right, bottom } = boundsOf(primitive);
        expect([left, top, right, bottom].every(Number.isFinite), primitive.id).toBe(true);
      }
    }
  });
});

describe.each(symbolNames)('the symbol %s', (name) => {
  const art = symbolArt(name);
  const wired = new Set(Object.keys(art.pins));

  it('keeps its marks upright in every turn', () => {
    const marks = art.shapes.flatMap((shape, index) => (shape.shape === 'upright' ? [index] : []));
    const strokesOf = (turn: Turn, mirror: boolean) =>
      symbolShapes('x', art, [0, 0], { mirror, turn }, wired).flatMap((primitive, index) => {
        if (!marks.includes(index)) return [];
        const { left, top, right, bottom } = boundsOf(primitive);
        return [`${(right - left).toFixed(3)} × ${(bottom - top).toFixed(3)}`];
      });
    for (const turn of [90, 180, 270] as const) {
      expect(strokesOf(turn, false)).toEqual(strokesOf(0, false));
      expect(strokesOf(turn, true)).toEqual(strokesOf(0, false));
    }
  });

  it('lies within its body, its leads apart', () => {
    const body = grown(art.body, 1);
    const shapes = symbolShapes('x', art, [0, 0], asDrawn, wired);
    const pins = Object.values(art.pins).map(([x, y]) =>
      moved({ left: 0, top: 0, right: 0, bottom: 0 }, [12 * x, 12 * y]),
    );
    for (const primitive of shapes) {
      const box = boundsOf(primitive);
      const isLead = pins.some((pin) => holds(box, pin));
      if (!isLead) expect(holds(body, box), `${primitive.id} of ${name}`).toBe(true);
    }
  });

  it('has a body no larger than 50 by 52 pixels', () => {
    const { left, top, right, bottom } = art.body;
    expect(right - left).toBeLessThanOrEqual(50);
    expect(bottom - top).toBeLessThanOrEqual(52);
  });
});
