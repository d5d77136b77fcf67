/** Small stages put together by hand. */
import type { Turn } from '../../../../symbols/placement.ts';
import type { Device } from '../../../../src/parts/devices/device.ts';
import type { DrawnEnd, DrawnPart, DrawnStage, DrawnWire } from '../../../../src/stage/routing/document.ts';
import type { GridPoint } from '../../../../src/stage/routing/grid.ts';

export const devices: Readonly<Record<string, Device>> = {
  n: { type: 'mosfet', channel: 'n', model: { threshold: 1.6, gainFactor: 0.08 } },
  p: { type: 'mosfet', channel: 'p', model: { threshold: -1.6, gainFactor: 0.08 } },
};

export const resistor = (place?: GridPoint, turn: Turn = 0): DrawnPart => ({
  kind: 'resistor',
  values: { resistance: '4k7' },
  ...(place === undefined ? {} : { place, turn }),
});

export const mosfet = (device: 'n' | 'p', place?: GridPoint, mirror = false): DrawnPart => ({
  kind: 'mosfet',
  device,
  ...(place === undefined ? {} : { place, mirror }),
});

export const rail = (name: string, place?: GridPoint, voltage: unknown = 12): DrawnPart => ({
  kind: 'rail',
  name,
  values: { voltage },
  ...(place === undefined ? {} : { place }),
});

export const ground = (place?: GridPoint): DrawnPart => ({
  kind: 'ground',
  ...(place === undefined ? {} : { place }),
});

/** `p1.a` or `j1`. */
export const end = (text: string): DrawnEnd => {
  const [id = '', pin] = text.split('.');
  return pin === undefined ? [id] : [id, pin];
};

export const wire = (from: string, to: string, path?: readonly GridPoint[]): DrawnWire => ({
  ends: [end(from), end(to)],
  ...(path === undefined ? {} : { path }),
});

/** Wires are named w1, w2, … in the order given. */
export const stage = (
  parts: Readonly<Record<string, DrawnPart>>,
  wires: readonly DrawnWire[],
  joints: Readonly<Record<string, GridPoint>> = {},
): DrawnStage => ({
  devices,
  parts,
  joints,
  wires: Object.fromEntries(wires.map((one, index) => [`w${index + 1}`, one])),
});
