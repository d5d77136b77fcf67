import { describe, expect, it } from 'vitest';
import { contrast } from '../../../src/drawing/contrast.ts';
import type { Role } from '../../../src/drawing/primitives.ts';
import { badgeSheet } from '../../../src/drawing/sheets.ts';
import { themes, type ThemeName } from '../../../src/drawing/themes.ts';
import { drawPlate } from '../../../src/drawing/plate/plate.ts';
import { routeWires } from '../../../src/stage/routing/index.ts';
import { drawn, example, settled } from './support/stages.ts';

describe('contrast', () => {
  // WCAG 2.2, definition of contrast ratio: black on white is 21:1. #767676 is the lightest grey that passes 4.5:1 on
  // white and #777777 the first that fails (W3C technique G18 works the same formula; the pair is common knowledge).
  it('agrees with the known ratios', () => {
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 10);
    expect(contrast('#767676', '#FFFFFF')).toBeCloseTo(4.54, 2);
    expect(contrast('#777777', '#FFFFFF')).toBeCloseTo(4.48, 2);
    expect(contrast('#123456', '#123456')).toBe(1);
  });
});

const document = example('echo-preamplifier');
const state = 'listening';
const readings = settled(document, state);
const pictures = [
  drawn(document, {}, readings),
  drawn(document, { stale: true }, readings),
  badgeSheet(),
  drawPlate(document, readings, {
    density: 'all',
    routes: routeWires(document),
    state,
    date: '2030-01-01',
    program: 'Restpoint',
  }),
];
const textRoles = new Set<Role>(
  pictures.flatMap(({ primitives }) => primitives.flatMap((one) => (one.kind === 'text' ? [one.role] : []))),
);
const strokeRoles = new Set<Role>(
  pictures.flatMap(({ primitives }) =>
    primitives.flatMap((one) => {
      // Rules between rows carry no meaning: they are decoration.
      if (one.kind === 'text' || one.stroke === undefined || one.stroke === 'hair') return [];
      return [one.stroke];
    }),
  ),
);

describe.each(Object.keys(themes) as ThemeName[])('the theme %s', (name) => {
  const theme = themes[name];
  const least = name === 'high-contrast' ? 7 : 4.5;

  it(`keeps every text at ${least}:1 or more on paper and panel`, () => {
    for (const role of [...textRoles, 'ink', 'soft', 'read', 'held', 'atRisk', 'missed'] as const) {
      for (const ground of ['paper', 'panel'] as const) {
        expect(contrast(theme[role], theme[ground]), `${role} on ${ground}`).toBeGreaterThanOrEqual(least);
      }
    }
  });

  it('keeps ink legible on the wash of what is edited', () => {
    expect(contrast(theme.ink, theme.wash)).toBeGreaterThanOrEqual(4.5);
  });

  it('keeps every line that carries meaning at 3:1 or more', () => {
    for (const role of strokeRoles) {
      expect(contrast(theme[role], theme.paper), role).toBeGreaterThanOrEqual(3);
    }
  });
});

describe('the palette', () => {
  it('never writes in the colours of rules and ticks', () => {
    expect(textRoles.size).toBeGreaterThan(3);
    for (const role of ['line', 'hair', 'tick', 'wash', 'paper', 'panel'] as const) {
      expect(textRoles.has(role), role).toBe(false);
    }
  });
});
