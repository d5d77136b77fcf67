/** A device: what a data sheet, or whoever knows better, says of a transistor or diode. Parts refer to it by id. */
import * as z from 'zod';
import { bipolarDeviceSchema } from './bipolarSchema.ts';
import type { BipolarDevice } from './bipolarSchema.ts';
import { diodeDeviceSchema, ledDeviceSchema, zenerDeviceSchema } from './diodeSchema.ts';
import type { DiodeDevice, LedDevice, ZenerDevice } from './diodeSchema.ts';
import { mosfetDeviceSchema } from './mosfetSchema.ts';
import type { MosfetDevice } from './mosfetSchema.ts';

/** Strict schema of one entry of `devices`. */
export const deviceSchema = z.discriminatedUnion('type', [
  mosfetDeviceSchema,
  bipolarDeviceSchema,
  diodeDeviceSchema,
  ledDeviceSchema,
  zenerDeviceSchema,
]);

export type Device = MosfetDevice | BipolarDevice | DiodeDevice | LedDevice | ZenerDevice;
export type DeviceType = Device['type'];

export const deviceTypes: readonly DeviceType[] = ['mosfet', 'bipolar', 'diode', 'led', 'zener'];
