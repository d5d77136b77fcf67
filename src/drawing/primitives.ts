import type { PathCommand } from '../../symbols/art.ts';

/**
 * All there is to see, as data: a small closed set that every pen (canvas, SVG, PDF) draws alike.
 * Coordinates are pixels at 100 %, 12 px to a grid unit, x right, y down. No colour is named here: a role is,
 * and the theme gives it its colour.
 */
export type Role =
  | 'paper'
  | 'panel'
  | 'ink'
  | 'soft'
  | 'line'
  | 'hair'
  | 'tick'
  | 'read'
  | 'held'
  | 'atRisk'
  | 'missed'
  | 'wash'
  | 'focus';

/** Which of the sheet's two painters draws it. */
export type Layer = 'still' | 'readings';

/** What a primitive belongs to, so that a pointer, a test or a screen reader can ask. */
export interface Belonging {
  /** Unique in the drawing: `p3/body`, `w2`, `chip/n4/box`, `badge/p3/dot`. */
  readonly id: string;
  readonly layer: Layer;
  /** What it is: the overlap tests and the hit test go by this. */
  readonly thing:
    | 'part'
    | 'wire'
    | 'junction'
    | 'name'
    | 'value'
    | 'chip'
    | 'leader'
    | 'chevron'
    | 'figure'
    | 'badge'
    | 'verdict'
    | 'word'
    | 'snag'
    | 'caution'
    | 'title'
    | 'frame';
  /** Id of the part, wire or joint concerned, where there is one. */
  readonly of?: string;
}

export interface PathPrimitive extends Belonging {
  readonly kind: 'path';
  readonly commands: readonly PathCommand[];
  readonly stroke?: Role;
  readonly fill?: Role;
  readonly width: number;
  readonly dash?: readonly number[];
  /** 0…1, 1 where left out. */
  readonly opacity?: number;
}

export interface CirclePrimitive extends Belonging {
  readonly kind: 'circle';
  readonly x: number;
  readonly y: number;
  readonly radius: number;
  readonly stroke?: Role;
  readonly fill?: Role;
  readonly width: number;
}

export interface TextPrimitive extends Belonging {
  readonly kind: 'text';
  readonly text: string;
  /** Anchor point: x by `align`, y the baseline. */
  readonly x: number;
  readonly y: number;
  readonly size: number;
  readonly weight: 400 | 600;
  readonly align: 'left' | 'centre' | 'right';
  readonly role: Role;
  /** Drawn with a line through it: a reading that is stale. */
  readonly struck?: boolean;
}

export type Primitive = PathPrimitive | CirclePrimitive | TextPrimitive;

export interface Drawing {
  readonly primitives: readonly Primitive[];
  /** The smallest box that holds every primitive, pixels. */
  readonly bounds: {
    readonly left: number;
    readonly top: number;
    readonly right: number;
    readonly bottom: number;
  };
  /** Readings for which there was truly no room, by name, for the ledger to list. */
  readonly unplaced: readonly string[];
}
