import * as z from 'zod';
import { choice, quantity } from '../../values/schema.ts';
import { bipolarFactShapes } from './conditions.ts';
import { deviceText, modelOrFacts, parameter, plainParameter } from './deviceSchema.ts';
import { factSchema } from './factSchema.ts';
import { bipolarRatings } from './ratings.ts';

export const bipolarDeviceSchema = modelOrFacts(
  z.strictObject({
    type: z.literal('bipolar'),
    polarity: choice('n-p-n', 'p-n-p'),
    ...deviceText,
    model: z.exactOptional(
      z.strictObject({
        saturationCurrent: quantity('saturationCurrent'),
        forwardGain: quantity('currentGain'),
        reverseGain: parameter('currentGain'),
        earlyVoltage: parameter('earlyVoltage'),
        baseToEmitterCapacitance: plainParameter('capacitance'),
        baseToCollectorCapacitance: plainParameter('capacitance'),
      }),
    ),
    facts: z.exactOptional(factSchema<typeof bipolarFactShapes>(bipolarFactShapes)),
    ratings: z.exactOptional(bipolarRatings),
  }),
);

export type BipolarDevice = z.infer<typeof bipolarDeviceSchema>;
export type BipolarModel = NonNullable<BipolarDevice['model']>;
