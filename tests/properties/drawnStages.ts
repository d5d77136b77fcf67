/** Random stages for drawing: parts of many kinds put down without touching, and wires between them. */
import fc from 'fast-check';
import type { Turn } from '../../symbols/placement.ts';
import type { Device } from '../../src/parts/devices/device.ts';
import type { DrawnEnd, DrawnPart, DrawnStage, DrawnWire } from '../../src/stage/routing/document.ts';
import type { GridPoint } from '../../src/stage/routing/grid.ts';

export const devices: Readonly<Record<string, Device>> = {
  d1: { type: 'mosfet', channel: 'n', model: { threshold: 1.6, gainFactor: 0.08 } },
  d2: { type: 'mosfet', channel: 'p', model: { threshold: -1.6, gainFactor: 0.08 } },
  d3: { type: 'bipolar', polarity: 'n-p-n', model: { saturationCurrent: 1e-14, forwardGain: 100 } },
  d4: { type: 'diode', model: { saturationCurrent: 1e-9 } },
};

interface Blank {
  readonly part: DrawnPart;
  readonly pins: readonly string[];
}

const two = ['a', 'b'] as const;

/** A part of each shape with the pins that a wire may end on. */
const blanks: readonly Blank[] = [
  { part: { kind: 'resistor', values: { resistance: '4k7' } }, pins: two },
  { part: { kind: 'capacitor', values: { capacitance: '1u' } }, pins: two },
  { part: { kind: 'load', values: { resistance: 240, form: 'lamp' } }, pins: two },
  { part: { kind: 'switch', values: { closed: true } }, pins: two },
  { part: { kind: 'supply', values: { voltage: 12, form: 'battery' } }, pins: ['plus', 'minus'] },
  { part: { kind: 'diode', device: 'd4' }, pins: ['anode', 'cathode'] },
  {
    part: { kind: 'potentiometer', values: { resistance: '10k', position: 0.5 } },
    pins: ['a', 'b', 'wiper'],
  },
  { part: { kind: 'mosfet', device: 'd1' }, pins: ['gate', 'drain', 'source'] },
  { part: { kind: 'mosfet', device: 'd2' }, pins: ['gate', 'drain', 'source', 'body'] },
  { part: { kind: 'bipolar', device: 'd3' }, pins: ['base', 'collector', 'emitter'] },
  { part: { kind: 'amplifier', values: { gain: 1e5 } }, pins: ['plus', 'minus', 'out', 'high', 'low'] },
  { part: { kind: 'rail', name: 'VBAT', values: { voltage: 12 } }, pins: ['node'] },
  { part: { kind: 'ground' }, pins: ['node'] },
  { part: { kind: 'tag', values: { label: 'OUT' } }, pins: ['node'] },
  { part: { kind: 'test-point' }, pins: ['node'] },
];

const turn = fc.constantFrom<Turn>(0, 90, 180, 270);

/** Cells of a coarse grid, wide enough that no two parts touch wherever in its cell each stands. */
const pitch = 12;
const columns = 6;

interface Draft {
  readonly blank: Blank;
  readonly turn: Turn;
  readonly mirror: boolean;
  readonly offset: GridPoint;
}

const draft: fc.Arbitrary<Draft> = fc.record({
  blank: fc.constantFrom(...blanks),
  turn,
  mirror: fc.boolean(),
  offset: fc.tuple(fc.integer({ min: -1, max: 1 }), fc.integer({ min: -1, max: 1 })),
});

/** Which two ends each wire joins, as numbers to be taken modulo how many ends there are. */
const links = (most: number): fc.Arbitrary<readonly (readonly [number, number])[]> => {
  const pick = fc.noBias(fc.integer({ min: 0, max: 999_983 }));
  return fc.array(fc.tuple(pick, pick), { minLength: 1, maxLength: most, size: 'max' });
};

const wired = (
  ends: readonly DrawnEnd[],
  picks: readonly (readonly [number, number])[],
): Readonly<Record<string, DrawnWire>> => {
  const wires: Record<string, DrawnWire> = {};
  for (const [index, [a, b]] of picks.entries()) {
    const one = ends[a % ends.length];
    const other = ends[b % ends.length];
    if (one === undefined || other === undefined || one.join() === other.join()) continue;
    wires[`w${index + 1}`] = { ends: [one, other] };
  }
  return wires;
};

const endsOf = (
  drafts: readonly { readonly blank: Blank }[],
  joints: readonly string[],
): readonly DrawnEnd[] => [
  ...drafts.flatMap(({ blank }, index) => blank.pins.map((pin): DrawnEnd => [`p${index + 1}`, pin])),
  ...joints.map((joint): DrawnEnd => [joint]),
];

/** Parts that stand apart from each other, some joints between them, and wires from anywhere to anywhere. */
export const placedStage = (mostParts: number, mostWires: number): fc.Arbitrary<DrawnStage> =>
  fc
    .tuple(
      fc.array(draft, { minLength: 2, maxLength: mostParts, size: 'max' }),
      links(mostWires),
      fc.integer({ min: 0, max: 3 }),
    )
    .map(([drafts, picks, jointCount]) => {
      const parts: Record<string, DrawnPart> = {};
      for (const [index, { blank, offset, ...stance }] of drafts.entries()) {
        const x = (index % columns) * pitch + offset[0];
        const y = Math.floor(index / columns) * pitch + offset[1];
        parts[`p${index + 1}`] = { ...blank.part, ...stance, place: [x, y] };
      }
      const joints = Object.fromEntries(
        Array.from({ length: jointCount }, (_, index): [string, GridPoint] => [
          `j${index + 1}`,
          [pitch / 2 + index * pitch, pitch / 2 + ((index * 7) % 3) * pitch],
        ]),
      );
      return { devices, parts, joints, wires: wired(endsOf(drafts, Object.keys(joints)), picks) };
    });

/** The same without any place. */
export const unplacedStage = (mostParts: number, mostWires: number): fc.Arbitrary<DrawnStage> =>
  fc
    .tuple(fc.array(draft, { minLength: 1, maxLength: mostParts, size: 'max' }), links(mostWires))
    .map(([drafts, picks]) => ({
      devices,
      parts: Object.fromEntries(drafts.map(({ blank }, index) => [`p${index + 1}`, blank.part])),
      joints: {},
      wires: wired(endsOf(drafts, []), picks),
    }));
