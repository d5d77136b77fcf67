import { describe, expect, it } from 'vitest';
import { badgeShapes } from '../../../src/drawing/badge/badge.ts';
import type { BadgeSign } from '../../../src/drawing/badge/sign.ts';
import { badgeSize } from '../../../src/drawing/badge/curves.ts';
import { badgeWords } from '../../../src/drawing/badge/words.ts';
import { boundsOf } from '../../../src/drawing/bounds.ts';
import { grown, holds, middle } from '../../../src/drawing/boxes.ts';
import type { Primitive } from '../../../src/drawing/primitives.ts';
import { badgeSheet } from '../../../src/drawing/sheets.ts';

const plain: BadgeSign = { family: 'mosfet', region: 'saturation', reversed: false, verdict: 'not-checked' };
const shapes = (sign: Partial<BadgeSign>): readonly Primitive[] =>
  badgeShapes('b', 'p1', { ...plain, ...sign }, [0, 0]);
const part = (all: readonly Primitive[], name: string): Primitive => {
  const found = all.find(({ id }) => id === `b/${name}`);
  if (found === undefined) throw new Error(`no ${name}`);
  return found;
};
const at = (primitive: Primitive) => middle(boundsOf(primitive));

describe('the badge of a region', () => {
  it('puts a hollow dot on the base line for cutoff', () => {
    const dot = part(shapes({ region: 'cutoff' }), 'dot');
    expect(dot).toMatchObject({ kind: 'circle', fill: 'paper', stroke: 'read' });
    expect(at(dot)[1]).toBe(25);
  });

  it('puts a half filled dot on the rise for triode', () => {
    const all = shapes({ region: 'triode' });
    expect(part(all, 'dot')).toMatchObject({ fill: 'paper', stroke: 'read' });
    // Filled below, open above: the filled half hangs under the dot's middle.
    expect(at(part(all, 'dot-half'))[1]).toBeGreaterThan(at(part(all, 'dot'))[1]);
    const [x] = at(part(all, 'dot'));
    expect(x).toBeGreaterThan(22);
    expect(x).toBeLessThan(33.5);
  });

  it('puts a filled dot on the plateau for saturation', () => {
    const dot = part(shapes({ region: 'saturation' }), 'dot');
    expect(dot).toMatchObject({ kind: 'circle', fill: 'read', radius: 4 });
    expect(at(dot)[0]).toBeGreaterThan(33.5);
    expect(at(dot)[1]).toBeLessThan(9);
  });

  it('puts a filled square left of the origin for the body diode', () => {
    const dot = part(shapes({ region: 'body-diode' }), 'dot');
    expect(dot).toMatchObject({ kind: 'path', fill: 'read' });
    const { left, top, right, bottom } = boundsOf(dot);
    expect([right - left, bottom - top].map((side) => Math.round(side * 10) / 10)).toEqual([7.6, 7.6]);
    expect(right).toBeLessThan(22);
  });

  it('turns the whole curve half round when source and drain are exchanged', () => {
    const forward = at(part(shapes({ region: 'triode' }), 'dot'));
    const reversed = at(part(shapes({ region: 'triode', reversed: true }), 'dot'));
    expect(reversed[0]).toBeCloseTo(badgeSize.width - forward[0]);
    expect(reversed[1]).toBeCloseTo(badgeSize.height - forward[1]);
  });

  it('dots the heavy part in weak inversion and dashes it in moderate, with nothing thin under it', () => {
    const strong = shapes({ inversion: 'strong' });
    const weak = shapes({ inversion: 'weak' });
    const moderate = shapes({ inversion: 'moderate' });
    const thin = (all: readonly Primitive[]) => all.filter(({ id }) => id.startsWith('b/curve')).length;
    expect([thin(strong), thin(weak), thin(moderate)]).toEqual([3, 3, 3]);
    expect(
      weak.filter(({ kind, id }) => kind === 'circle' && id.startsWith('b/heavy')).length,
    ).toBeGreaterThan(2);
    expect(
      moderate.filter(({ kind, id }) => kind === 'path' && id.startsWith('b/heavy')).length,
    ).toBeGreaterThan(2);
    // The dot moves to the far end, so that the pattern is seen.
    expect(at(part(weak, 'dot'))[0]).toBeGreaterThan(at(part(strong, 'dot'))[0]);
  });

  it('tells the regions of one family apart without colour', () => {
    const figure = (sign: Partial<BadgeSign>) =>
      JSON.stringify(
        shapes(sign).map((one) => ({
          ...one,
          stroke: 'stroke' in one,
          fill: 'fill' in one && one.fill === 'paper',
        })),
      );
    const mosfet = (['cutoff', 'triode', 'saturation', 'body-diode'] as const).map((region) =>
      figure({ region }),
    );
    expect(new Set(mosfet).size).toBe(4);
    const diode = (['conducting', 'blocking', 'breakdown'] as const).map((region) =>
      figure({ family: 'diode', region }),
    );
    expect(new Set(diode).size).toBe(3);
  });
});

describe('the frame of a verdict', () => {
  const corner = { left: 50, top: 30, right: 60, bottom: 40 };
  const strokes = (verdict: BadgeSign['verdict']) =>
    shapes({ verdict }).filter(({ thing }) => thing === 'verdict');

  it('is one closed line when the duty is held', () => {
    const [frame, ...more] = strokes('held');
    expect(more).toEqual([]);
    expect(frame?.kind === 'path' && frame.commands.at(-1)?.[0]).toBe('Z');
  });

  it('is open at the lower right corner when the duty is at risk', () => {
    const [frame, ...more] = strokes('at-risk');
    expect(more).toEqual([]);
    if (frame?.kind !== 'path') throw new Error('no frame');
    expect(frame.commands.at(-1)?.[0]).not.toBe('Z');
    const points = frame.commands.flatMap((command) =>
      command[0] === 'M' || command[0] === 'L' ? [[command[1], command[2]]] : [],
    );
    const inCorner = points.filter(([x = 0, y = 0]) => x > corner.left && y > corner.top);
    expect(inCorner).toEqual([]);
    expect(points[0]).toEqual([44, 39.2]);
    expect(points.at(-1)).toEqual([59.2, 26]);
  });

  it('is doubled, broken and crossed when the duty is missed', () => {
    const all = strokes('missed');
    expect(all).toHaveLength(3);
    expect(all.filter((one) => one.kind === 'path' && one.dash !== undefined)).toHaveLength(2);
    const bar = all.find(({ id }) => id === 'b/bar');
    expect(bar).toMatchObject({ width: 2.6, stroke: 'missed' });
  });

  it('is absent when nothing was checked', () => {
    expect(strokes('not-checked')).toEqual([]);
  });

  it('never reaches more than 8 px out', () => {
    for (const verdict of ['held', 'at-risk', 'missed'] as const) {
      const room = grown({ left: 0, top: 0, right: badgeSize.width, bottom: badgeSize.height }, 8);
      for (const shape of strokes(verdict)) expect(holds(room, boundsOf(shape)), shape.id).toBe(true);
    }
  });
});

describe('a stale badge', () => {
  it('is soft all over and struck', () => {
    const all = shapes({ verdict: 'missed', stale: true });
    expect(all.some(({ id }) => id.endsWith('/strike'))).toBe(true);
    for (const one of all) {
      if (one.kind === 'text') continue;
      expect(['soft', 'line', 'paper', undefined]).toContain(one.stroke);
      expect(['soft', 'paper', undefined]).toContain(one.fill);
    }
  });
});

describe('the words beside a badge', () => {
  it('are written in full', () => {
    expect(badgeWords({ region: 'body-diode', reversed: false })).toBe('body diode');
    expect(badgeWords({ region: 'triode', reversed: true })).toBe('triode, reversed');
    expect(badgeWords({ region: 'saturation', reversed: false, inversion: 'moderate' })).toBe(
      'saturation, moderate',
    );
    expect(badgeWords({ region: 'saturation', reversed: false, inversion: 'strong' })).toBe('saturation');
    // A channel that does not conduct has no inversion to speak of.
    expect(badgeWords({ region: 'cutoff', reversed: false, inversion: 'weak' })).toBe('cutoff');
  });
});

describe('the sheet of all badges', () => {
  it('gives every shape an id of its own', () => {
    const ids = badgeSheet().primitives.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });
});
