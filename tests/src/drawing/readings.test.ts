import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { SettledState } from '../../../src/readings/readings.ts';
import type { Drawing, TextPrimitive } from '../../../src/drawing/primitives.ts';
import { connectivityOf } from '../../../src/stage/connectivity.ts';
import { layOut } from '../../../src/stage/layout/layOut.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';
import { inState, stateNames } from '../../../src/stage/states.ts';
import { formatQuantity } from '../../../src/values/format.ts';
import { amplifierChain, drawn, example, settled, threeParts } from './support/stages.ts';

const textsOf = (drawing: Drawing, ...things: readonly TextPrimitive['thing'][]): readonly string[] =>
  drawing.primitives.flatMap((one) => (one.kind === 'text' && things.includes(one.thing) ? [one.text] : []));

const settledIn = (document: StageDocument, state: string): SettledState => {
  const readings = settled(document, state);
  if (!readings.settled) throw new Error(readings.reason);
  return readings;
};

const volts = (value: number | null | undefined): string =>
  value === null || value === undefined
    ? 'not fixed'
    : formatQuantity(Math.abs(value) < 1e-9 ? 0 : value, 'V');

/** Voltages that the drawing must show: of every net on which a wire ends, save those stated in ink. */
const expectedVolts = (document: StageDocument, readings: SettledState): readonly string[] =>
  connectivityOf(document).nets.flatMap((net) => {
    const isStated = net.index === 0 || net.rails.length > 0;
    const [first] = net.pins.filter(({ part, pin }) => {
      const name = document.parts[part]?.name ?? part;
      return `${name}.${pin}` in readings.pins;
    });
    if (isStated || net.wires.length === 0 || first === undefined) return [];
    return [volts(readings.pins[`${document.parts[first.part]?.name ?? first.part}.${first.pin}`])];
  });

const examples = readdirSync(new URL('../../../examples', import.meta.url))
  .filter((name) => name.endsWith('.stage.json'))
  .map((name) => name.replace('.stage.json', ''));

const cases: (readonly [string, string, StageDocument])[] = [
  ...examples.flatMap((name) => {
    const document = layOut(example(name));
    return stateNames(document).map((state) => [name, state, document] as const);
  }),
  ['three parts', 'on', threeParts()],
  ['forty parts', 'on', amplifierChain(4)],
];

describe.each(cases)('at density all, %s in the state %s', (_, state, base) => {
  const document = inState(base, state) ?? base;
  const readings = settledIn(base, state);
  const drawing = drawn(base, { state }, readings);
  const chips = drawing.primitives.filter(({ id, kind }) => id.startsWith('chip/') && kind === 'text');

  it('shows the voltage of every node that is not stated, once', () => {
    const shown = chips.map((one) => (one.kind === 'text' ? one.text : ''));
    expect([...shown].sort()).toEqual([...expectedVolts(document, readings)].sort());
  });

  it('shows every transistor with its region in full and its current', () => {
    for (const [name, reading] of Object.entries(readings.parts)) {
      if (reading.kind !== 'mosfet') continue;
      const texts = textsOf(
        {
          ...drawing,
          primitives: drawing.primitives.filter(({ of, id }) => of === reading.id && id.startsWith('badge/')),
        },
        'word',
        'figure',
      );
      const { region, drainCurrent } = reading as { readonly region: string; readonly drainCurrent: number };
      expect(texts[0], name).toContain(region.replace('-', ' '));
      expect(texts[1], name).toBe(formatQuantity(Math.abs(drainCurrent) < 1e-12 ? 0 : drainCurrent, 'A'));
    }
  });

  it('shows the current of every two-pin part that carries one, unsigned or at a badge', () => {
    const figures = textsOf(drawing, 'figure').map((text) => text.replace('−', ''));
    for (const [name, reading] of Object.entries(readings.parts)) {
      const current = reading['current' as keyof typeof reading] as unknown;
      const isLoose = connectivityOf(document).wired.get(reading.id)?.size === 0;
      // What a rail gives in all is no branch's where the rail is drawn in several places.
      if (reading.kind === 'rail') continue;
      if (typeof current !== 'number' || Math.abs(current) < 1e-12 || isLoose) continue;
      expect(figures, `${name} carries ${current} A`).toContain(formatQuantity(Math.abs(current), 'A'));
    }
  });

  it('gives every primitive an id of its own', () => {
    const ids = drawing.primitives.map(({ id }) => id);
    expect(ids.filter((id, index) => ids.indexOf(id) !== index)).toEqual([]);
  });
});

describe('the densities', () => {
  const document = amplifierChain(2);
  const count = (density: 'all' | 'key' | 'none', thing: string) =>
    drawn(document, { density }).primitives.filter((one) => one.thing === thing).length;

  it('show less and less, the drawing itself always', () => {
    for (const thing of ['part', 'wire', 'name', 'value', 'junction']) {
      expect(count('none', thing), thing).toBe(count('all', thing));
    }
    expect(count('all', 'chevron')).toBeGreaterThan(0);
    expect(count('key', 'chevron')).toBe(0);
    expect(count('key', 'chip')).toBeGreaterThan(0);
    expect(count('key', 'chip')).toBeLessThan(count('all', 'chip'));
    expect(count('key', 'badge')).toBe(count('all', 'badge'));
    expect(count('none', 'chip') + count('none', 'badge') + count('none', 'chevron')).toBe(0);
  });
});

describe('chevrons', () => {
  // A rail at 12 V over a resistor to ground: the current runs down the sheet, from the rail to the ground.
  const pointsDown = (document: StageDocument): boolean => {
    const chevron = drawn(document).primitives.find(({ thing }) => thing === 'chevron');
    if (chevron?.kind !== 'path') throw new Error('no chevron');
    const [arm, apex] = chevron.commands;
    if (arm?.[0] !== 'M' || apex?.[0] !== 'L') throw new Error('no arms');
    return apex[2] > arm[2];
  };

  it('point the way the current really flows', () => {
    expect(pointsDown(threeParts())).toBe(true);
    const negative = structuredClone(threeParts()) as StageDocument & {
      parts: Record<string, { values?: object }>;
    };
    Object.assign(negative.parts.p1 ?? {}, { values: { voltage: -12 } });
    expect(pointsDown(negative)).toBe(false);
  });

  it('carry the figure without its sign', () => {
    const negative = structuredClone(threeParts()) as StageDocument & {
      parts: Record<string, { values?: object }>;
    };
    Object.assign(negative.parts.p1 ?? {}, { values: { voltage: -12 } });
    // 12 V over 4.7 kΩ: 2.553 mA.
    expect(textsOf(drawn(negative), 'figure')).toEqual(['2.553 mA']);
  });

  it('are not drawn where nothing flows', () => {
    const dead = structuredClone(threeParts()) as StageDocument & {
      parts: Record<string, { values?: object }>;
    };
    Object.assign(dead.parts.p1 ?? {}, { values: { voltage: 0 } });
    expect(drawn(dead).primitives.some(({ thing }) => thing === 'chevron')).toBe(false);
  });

  it('turn round when the current does, without leaving their places', () => {
    const before = drawn(threeParts());
    const negative = structuredClone(threeParts()) as StageDocument & {
      parts: Record<string, { values?: object }>;
    };
    Object.assign(negative.parts.p1 ?? {}, { values: { voltage: -12 } });
    const after = drawn(negative, { keep: before.placement });
    const chevron = (drawing: Drawing) => {
      const found = drawing.primitives.find(({ thing }) => thing === 'chevron');
      if (found?.kind !== 'path') throw new Error('no chevron');
      return found.commands.map((command) => command.slice(1) as unknown as readonly [number, number]);
    };
    const [[x1, y1] = [0, 0], [, apex1] = [0, 0]] = chevron(before);
    const [[x2, y2] = [0, 0], [, apex2] = [0, 0]] = chevron(after);
    expect([x1 + x2, y1 + y2, apex1 + apex2].every(Number.isFinite)).toBe(true);
    // The same middle, the apex on its other side.
    expect((y1 + apex1) / 2).toBeCloseTo((y2 + apex2) / 2, 9);
    expect(Math.sign(apex1 - y1)).toBe(-Math.sign(apex2 - y2));
  });
});
