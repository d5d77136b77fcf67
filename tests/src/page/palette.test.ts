import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { themes } from '../../../src/drawing/themes.ts';

const style = readFileSync(new URL('../../../src/page/page.css', import.meta.url), 'utf8');
const stated = [...style.matchAll(/--([a-z-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\);/g)];

describe('the colours of the page', () => {
  it('are those of the drawing’s light and dark themes, role by role', () => {
    const byRole = Object.fromEntries(stated.map(([, name = '', light, dark]) => [name, [light, dark]]));
    const expected = Object.fromEntries(
      Object.keys(byRole).map((name) => {
        const role = name === 'at-risk' ? 'atRisk' : (name as keyof typeof themes.light);
        return [name, [themes.light[role], themes.dark[role]].map((colour) => colour.toLowerCase())];
      }),
    );
    expect(byRole).toEqual(expected);
    expect(Object.keys(byRole)).toEqual(
      expect.arrayContaining(['paper', 'ink', 'read', 'held', 'missed', 'focus']),
    );
  });
});
