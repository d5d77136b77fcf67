import { describe, expect, it } from 'vitest';
import type { PathCommand, SymbolArt } from '../../symbols/art.ts';
import { symbolArt, symbolNames, symbols } from '../../symbols/index.ts';
import { tagArt } from '../../symbols/tag.ts';
import { catalogue } from '../../src/parts/catalogue.ts';

/** The table of pins and offsets of the stage file, version 1: it can never change, as files in use rest on it. */
const twoPins = (first: string, second: string) => ({ [first]: [-3, 0], [second]: [3, 0] });
const node = { node: [0, 0] };
const nMosfet = { gate: [-3, 0], drain: [0, -3], source: [0, 3], body: [3, 0] };
const pMosfet = { gate: [-3, 0], drain: [0, 3], source: [0, -3], body: [3, 0] };
const table: Readonly<Record<string, object>> = {
  resistor: twoPins('a', 'b'),
  potentiometer: { a: [-3, 0], b: [3, 0], wiper: [0, 3] },
  capacitor: twoPins('a', 'b'),
  inductor: twoPins('a', 'b'),
  supply: twoPins('plus', 'minus'),
  battery: twoPins('plus', 'minus'),
  'signal-source': twoPins('plus', 'minus'),
  rail: node,
  'current-source': twoPins('from', 'to'),
  ground: node,
  tag: node,
  'test-point': node,
  'mosfet-n': nMosfet,
  'mosfet-n-plain': nMosfet,
  'mosfet-n-body': nMosfet,
  'mosfet-p': pMosfet,
  'mosfet-p-plain': pMosfet,
  'mosfet-p-body': pMosfet,
  'bipolar-npn': { base: [-3, 0], collector: [0, -3], emitter: [0, 3] },
  'bipolar-pnp': { base: [-3, 0], collector: [0, 3], emitter: [0, -3] },
  diode: twoPins('anode', 'cathode'),
  led: twoPins('anode', 'cathode'),
  zener: twoPins('anode', 'cathode'),
  'switch-open': twoPins('a', 'b'),
  'switch-closed': twoPins('a', 'b'),
  load: twoPins('a', 'b'),
  lamp: twoPins('a', 'b'),
  coil: twoPins('a', 'b'),
  motor: twoPins('a', 'b'),
  heater: twoPins('a', 'b'),
  amplifier: { plus: [-3, -1], minus: [-3, 1], out: [3, 0], high: [0, -3], low: [0, 3] },
  transconductor: { plus: [-3, -1], minus: [-3, 1], from: [3, -1], to: [3, 1] },
  'logic-output': { out: [3, 0], high: [0, -3], low: [0, 3] },
};

/** Ends of the strokes of a symbol. */
const strokeEnds = (art: SymbolArt): readonly string[] =>
  [...art.shapes, ...Object.values(art.whenWired ?? {}).flat()].flatMap((shape) =>
    shape.shape === 'path' ? shape.commands.flatMap(endOf) : [],
  );

const endOf = (command: PathCommand): readonly string[] =>
  command[0] === 'M' || command[0] === 'L' ? [`${command[1]},${command[2]}`] : [];

describe('the symbols', () => {
  it('are those of the table, no more and no fewer', () => {
    expect([...symbolNames].sort()).toEqual(Object.keys(table).sort());
  });

  it.each(symbolNames)('%s has its pins at the stated offsets', (name) => {
    expect(symbolArt(name).pins).toEqual(table[name]);
  });

  it.each(symbolNames)('%s starts a stroke at every pin that a wire can end on', (name) => {
    const art = symbolArt(name);
    const ends = strokeEnds(art);
    const hasBodyLead = !name.startsWith('mosfet') || name.endsWith('body');
    for (const [pin, [x, y]] of Object.entries(art.pins)) {
      if (pin === 'body' && !hasBodyLead) continue;
      expect(ends, pin).toContain(`${12 * x},${12 * y}`);
    }
  });

  it('show the body lead only where it is brought out', () => {
    for (const name of ['mosfet-n', 'mosfet-p', 'mosfet-n-plain', 'mosfet-p-plain'] as const) {
      expect(strokeEnds(symbols[name])).not.toContain('36,0');
    }
  });

  it('leave a tag room for a label of any length, lying and upright', () => {
    for (const width of [0, 20, 140]) {
      expect(tagArt(width).body.right - tagArt(width).body.left).toBeGreaterThan(width + 10);
      expect(tagArt(width, true).body.bottom - tagArt(width, true).body.top).toBeGreaterThan(width + 10);
    }
  });
});

describe('every kind of part', () => {
  const variants = catalogue.flatMap((kind) =>
    kind.variants.map((variant) => [variant.key, kind, variant] as const),
  );

  it.each(variants)('%s is drawn by a symbol with the pins that the kind states', (_, kind, variant) => {
    const context = {
      name: 'X1',
      values: variant.values,
      ...(variant.device === undefined ? {} : { device: variant.device }),
      wired: new Set(variant.wired ?? []),
    };
    const art = kind.symbol(context);
    expect(Object.values(symbols)).toContain(art);
    expect(kind.pins(context)).toEqual(art.pins);
  });
});
