import * as z from 'zod';
import { choice } from '../../values/schema.ts';
import { mosfetFactShapes } from './conditions.ts';
import { deviceText, modelOrFacts, parameter, plainParameter } from './deviceSchema.ts';
import { refined } from './fact.ts';
import { factSchema } from './factSchema.ts';
import { mosfetRatings } from './ratings.ts';
import { quantity } from '../../values/schema.ts';

const model = refined(
  z.strictObject({
    threshold: quantity('threshold'),
    gainFactor: parameter('gainFactor'),
    processTransconductance: parameter('processTransconductance'),
    lengthModulation: parameter('lengthModulation'),
    bodyFactor: parameter('bodyFactor'),
    surfacePotential: parameter('surfacePotential'),
    slopeFactor: parameter('slopeFactor'),
    thresholdTemperatureCoefficient: parameter('voltageTemperatureCoefficient'),
    drainResistance: parameter('seriesResistance'),
    sourceResistance: parameter('seriesResistance'),
    bodyDiode: z.exactOptional(
      z.strictObject({
        saturationCurrent: parameter('saturationCurrent'),
        emissionCoefficient: parameter('emissionCoefficient'),
        seriesResistance: parameter('seriesResistance'),
      }),
    ),
    inputCapacitance: plainParameter('capacitance'),
    outputCapacitance: plainParameter('capacitance'),
    reverseCapacitance: plainParameter('capacitance'),
  }),
  ({ gainFactor, processTransconductance }) =>
    (gainFactor === undefined) === (processTransconductance === undefined)
      ? [
          {
            code: 'gain-of-model',
            message: 'A MOSFET model states either its gain factor or its process transconductance.',
            found: gainFactor === undefined ? 'neither' : 'both',
            allowed: 'gainFactor or processTransconductance',
          },
        ]
      : [],
);

const mode = choice('enhancement', 'depletion');

export const mosfetDeviceSchema = modelOrFacts(
  z.strictObject({
    type: z.literal('mosfet'),
    channel: choice('n', 'p'),
    build: z.exactOptional(choice('discrete', 'integrated')),
    ...deviceText,
    model: z.exactOptional(model),
    facts: z.exactOptional(
      factSchema<typeof mosfetFactShapes, { readonly mode?: z.infer<typeof mode> }>(mosfetFactShapes, {
        mode: z.exactOptional(mode),
      }),
    ),
    ratings: z.exactOptional(mosfetRatings),
  }),
);

export type MosfetDevice = z.infer<typeof mosfetDeviceSchema>;
export type MosfetModel = NonNullable<MosfetDevice['model']>;
export type MosfetStatedFacts = NonNullable<MosfetDevice['facts']>;
