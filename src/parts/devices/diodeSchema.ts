import * as z from 'zod';
import { quantity } from '../../values/schema.ts';
import { diodeFactShapes, zenerFactShapes } from './conditions.ts';
import { deviceText, modelOrFacts, parameter } from './deviceSchema.ts';
import { factSchema } from './factSchema.ts';
import { diodeRatings, zenerRatings } from './ratings.ts';

const forward = {
  saturationCurrent: parameter('saturationCurrent'),
  emissionCoefficient: parameter('emissionCoefficient'),
  seriesResistance: parameter('seriesResistance'),
  bandGap: parameter('bandGap'),
};

const diodeModel = z.strictObject({ ...forward, saturationCurrent: quantity('saturationCurrent') });

const ofType = <const Type extends 'diode' | 'led'>(type: Type) =>
  modelOrFacts(
    z.strictObject({
      type: z.literal(type),
      ...deviceText,
      model: z.exactOptional(diodeModel),
      facts: z.exactOptional(factSchema<typeof diodeFactShapes>(diodeFactShapes)),
      ratings: z.exactOptional(diodeRatings),
    }),
  );

export const diodeDeviceSchema = ofType('diode');
export const ledDeviceSchema = ofType('led');

export const zenerDeviceSchema = modelOrFacts(
  z.strictObject({
    type: z.literal('zener'),
    ...deviceText,
    model: z.exactOptional(
      z.strictObject({
        ...forward,
        breakdownVoltage: quantity('voltageMagnitude'),
        breakdownCurrent: quantity('currentMagnitude'),
        breakdownResistance: parameter('seriesResistance'),
        breakdownTemperatureCoefficient: parameter('voltageTemperatureCoefficient'),
      }),
    ),
    facts: z.exactOptional(factSchema<typeof zenerFactShapes>(zenerFactShapes)),
    ratings: z.exactOptional(zenerRatings),
  }),
);

export type DiodeDevice = z.infer<typeof diodeDeviceSchema>;
export type LedDevice = z.infer<typeof ledDeviceSchema>;
export type ZenerDevice = z.infer<typeof zenerDeviceSchema>;
export type DiodeModel = NonNullable<DiodeDevice['model']>;
export type ZenerModel = NonNullable<ZenerDevice['model']>;
