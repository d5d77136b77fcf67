/**
 * As much of the stage document as drawing wires and laying parts out asks for. The document of the schema fits it;
 * so does anything a test puts together by hand.
 */
import type { Turn } from '../../../symbols/placement.ts';
import type { Device } from '../../parts/devices/device.ts';
import type { GridPoint } from './grid.ts';

export interface DrawnPart {
  readonly kind: string;
  readonly name?: string | undefined;
  /** Of a rail: what is written at it in place of its name. */
  readonly label?: string | undefined;
  readonly place?: GridPoint | undefined;
  readonly turn?: Turn | undefined;
  readonly mirror?: boolean | undefined;
  readonly device?: string | undefined;
  readonly values?: Readonly<Record<string, unknown>> | undefined;
}

/** `[part, pin]` or `[joint]`. */
export type DrawnEnd = readonly [string, string] | readonly [string];

export interface DrawnWire {
  readonly ends: readonly [DrawnEnd, DrawnEnd];
  /** Corners, without the ends. */
  readonly path?: readonly GridPoint[] | undefined;
}

export interface DrawnStage {
  readonly devices: Readonly<Record<string, Device>>;
  readonly parts: Readonly<Record<string, DrawnPart>>;
  readonly joints: Readonly<Record<string, GridPoint>>;
  readonly wires: Readonly<Record<string, DrawnWire>>;
}
