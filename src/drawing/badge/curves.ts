import type { PathCommand } from '../../../symbols/art.ts';
import type { Point } from '../boxes.ts';

/**
 * The device's own output curve in miniature, 60 × 40, y down. Current upward, voltage to the right: a rise from the
 * origin, a knee, a plateau; to the left of the origin what the device does in reverse.
 */
export const badgeSize = { width: 60, height: 40 } as const;

type Region =
  | 'cutoff'
  | 'triode'
  | 'saturation'
  | 'body-diode'
  | 'active'
  | 'saturated'
  | 'conducting'
  | 'blocking'
  | 'breakdown';

export type Family = 'mosfet' | 'bipolar' | 'diode';
export type BadgeRegion = Region;
export type Dot = 'hollow' | 'half' | 'filled' | 'square';

export interface HeavyPart {
  readonly commands: readonly PathCommand[];
  readonly dot: Dot;
  /** Where the dot sits on a solid heavy part. */
  readonly at: Point;
  /** Where it sits on a broken one: at the far end, so that the pattern is seen. */
  readonly farAt: Point;
  /** Which of the family's thin curves it lies on, to be left out where the heavy part is broken. */
  readonly over: number;
}

const baseLine = (y: number): readonly PathCommand[] => [
  ['M', 5, y],
  ['L', 55, y],
];

const rise: readonly PathCommand[] = [
  ['M', 22, 25],
  ['C', 23.5, 17, 26.5, 9.2, 33.5, 8.4],
];
const plateau: readonly PathCommand[] = [
  ['M', 33.5, 8.4],
  ['L', 55, 6.2],
];
const bodyDiode: readonly PathCommand[] = [
  ['M', 22, 25],
  ['L', 17.5, 25],
  ['C', 12.5, 25, 10.3, 29, 9.5, 35.7],
];
const originTick = (x: number, y: number): readonly PathCommand[] => [
  ['M', x, y - 3.5],
  ['L', x, y + 3.5],
];

const forward: readonly PathCommand[] = [
  ['M', 33, 22],
  ['L', 36.5, 22],
  ['C', 41.5, 22, 43.8, 15, 45.2, 5.5],
];
const breakdown: readonly PathCommand[] = [
  ['M', 15.8, 22],
  ['C', 12.9, 22.6, 12.3, 28, 11.3, 35.3],
];

/** Thin curves of each family, before the heavy part is laid over them. */
export const thinCurves: Readonly<Record<Family, readonly (readonly PathCommand[])[]>> = {
  mosfet: [baseLine(25), rise, plateau, bodyDiode],
  bipolar: [baseLine(25), rise, plateau, originTick(22, 25)],
  diode: [baseLine(22), forward, breakdown, originTick(33, 22)],
};

const onBase: HeavyPart = {
  commands: [
    ['M', 22, 25],
    ['L', 55, 25],
  ],
  dot: 'hollow',
  at: [40, 25],
  farAt: [52, 25],
  over: 0,
};
const onRise: HeavyPart = { commands: rise, dot: 'half', at: [26.6, 12.6], farAt: [33.5, 8.4], over: 1 };
const onPlateau: HeavyPart = { commands: plateau, dot: 'filled', at: [46, 7.1], farAt: [53, 6.4], over: 2 };

export const heavyParts: Readonly<Record<Region, HeavyPart>> = {
  cutoff: onBase,
  triode: onRise,
  saturated: onRise,
  saturation: onPlateau,
  active: onPlateau,
  'body-diode': { commands: bodyDiode, dot: 'square', at: [11.4, 29.6], farAt: [11.4, 29.6], over: 3 },
  conducting: { commands: forward, dot: 'filled', at: [43, 14], farAt: [43, 14], over: 1 },
  blocking: {
    commands: [
      ['M', 15.8, 22],
      ['L', 33, 22],
    ],
    dot: 'hollow',
    at: [24.4, 22],
    farAt: [24.4, 22],
    over: 0,
  },
  breakdown: { commands: breakdown, dot: 'square', at: [12.3, 28.6], farAt: [12.3, 28.6], over: 2 },
};

/** The word beside the badge. Never abbreviated. */
export const regionWord = (region: Region): string => (region === 'body-diode' ? 'body diode' : region);

/** Half a turn about the badge's middle: source and drain have exchanged their parts. */
export const halfTurn = ([x, y]: Point): Point => [badgeSize.width - x, badgeSize.height - y];
