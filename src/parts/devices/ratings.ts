/** What a device is rated for: magnitudes, as its data sheet states them. */
import * as z from 'zod';
import type { QuantityName } from '../../values/quantities.ts';
import { plainQuantity, shortText } from '../../values/schema.ts';
import { resolvePlain } from '../../values/value-spec.ts';
import type { PlainValue } from '../../values/value-spec.ts';
import { refined } from './fact.ts';

const plain = (of: QuantityName) => z.exactOptional(plainQuantity(of));

/** A figure by itself, or with the ambient or case temperature (°C) up to which it holds. */
const dissipation = z.exactOptional(
  z.union([
    plainQuantity('power'),
    refined(
      z.strictObject({
        value: plainQuantity('power'),
        ambient: plain('temperature'),
        case: plain('temperature'),
      }),
      (rating) =>
        rating.ambient !== undefined && rating.case !== undefined
          ? [
              {
                code: 'two-conditions',
                message:
                  'A dissipation holds up to an ambient temperature or up to a case temperature, not both.',
                path: 'case',
                found: 'ambient and case',
                allowed: 'ambient or case',
              },
            ]
          : [],
    ),
  ]),
);

/** A figure by itself, or with the mounting it was measured on. */
const junctionToAmbient = z.exactOptional(
  z.union([
    plainQuantity('thermalResistance'),
    z.strictObject({
      value: plainQuantity('thermalResistance'),
      mounting: z.exactOptional(shortText()),
    }),
  ]),
);

const common = {
  dissipation,
  derating: plain('derating'),
  junctionTemperature: plain('temperature'),
  junctionToCase: plain('thermalResistance'),
  junctionToAmbient,
};

export const mosfetRatings = z.strictObject({
  drainToSource: plain('voltageMagnitude'),
  gateToSource: plain('voltageMagnitude'),
  drainCurrent: plain('currentMagnitude'),
  ...common,
});

export const diodeRatings = z.strictObject({
  reverseVoltage: plain('voltageMagnitude'),
  forwardCurrent: plain('currentMagnitude'),
  ...common,
});

export const zenerRatings = z.strictObject({
  reverseVoltage: plain('voltageMagnitude'),
  forwardCurrent: plain('currentMagnitude'),
  zenerCurrent: plain('currentMagnitude'),
  ...common,
});

export const bipolarRatings = z.strictObject({
  collectorToEmitter: plain('voltageMagnitude'),
  collectorCurrent: plain('currentMagnitude'),
  emitterToBase: plain('voltageMagnitude'),
  ...common,
});

/** Ratings in numbers: SI, °C. */
export interface Ratings {
  readonly drainToSource?: number;
  readonly gateToSource?: number;
  readonly drainCurrent?: number;
  readonly reverseVoltage?: number;
  readonly forwardCurrent?: number;
  readonly zenerCurrent?: number;
  readonly collectorToEmitter?: number;
  readonly collectorCurrent?: number;
  readonly emitterToBase?: number;
  readonly dissipation?: DissipationRating;
  readonly derating?: number;
  readonly junctionTemperature?: number;
  readonly junctionToCase?: number;
  readonly junctionToAmbient?: { readonly value: number; readonly mounting?: string };
}

/** W, up to a temperature (°C) of the ambient or of the case. */
export interface DissipationRating {
  readonly value: number;
  readonly upTo: number;
  readonly of: 'ambient' | 'case';
  /** False where 25 °C ambient is the data-sheet convention and not a statement. */
  readonly conditionStated: boolean;
}

type StatedRatings =
  | z.infer<typeof mosfetRatings>
  | z.infer<typeof diodeRatings>
  | z.infer<typeof zenerRatings>
  | z.infer<typeof bipolarRatings>;

const quantities = {
  drainToSource: 'voltageMagnitude',
  gateToSource: 'voltageMagnitude',
  drainCurrent: 'currentMagnitude',
  reverseVoltage: 'voltageMagnitude',
  forwardCurrent: 'currentMagnitude',
  zenerCurrent: 'currentMagnitude',
  collectorToEmitter: 'voltageMagnitude',
  collectorCurrent: 'currentMagnitude',
  emitterToBase: 'voltageMagnitude',
  derating: 'derating',
  junctionTemperature: 'temperature',
  junctionToCase: 'thermalResistance',
} as const satisfies Readonly<Record<string, QuantityName>>;

const dissipationOf = (stated: NonNullable<StatedRatings['dissipation']>): DissipationRating => {
  if (typeof stated !== 'object') {
    return { value: resolvePlain(stated, 'power'), upTo: 25, of: 'ambient', conditionStated: false };
  }
  const upTo = stated.case ?? stated.ambient;
  return {
    value: resolvePlain(stated.value, 'power'),
    upTo: upTo === undefined ? 25 : resolvePlain(upTo, 'temperature'),
    of: stated.case === undefined ? 'ambient' : 'case',
    conditionStated: upTo !== undefined,
  };
};

const junctionToAmbientOf = (stated: NonNullable<StatedRatings['junctionToAmbient']>) =>
  typeof stated === 'object'
    ? {
        value: resolvePlain(stated.value, 'thermalResistance'),
        ...(stated.mounting === undefined ? {} : { mounting: stated.mounting }),
      }
    : { value: resolvePlain(stated, 'thermalResistance') };

/** The ratings of a device that was checked, in numbers. */
export const ratingsOf = (device: { readonly ratings?: StatedRatings }): Ratings => {
  const stated = device.ratings;
  if (stated === undefined) return {};
  const byKey = stated as Readonly<Record<string, PlainValue | undefined>>;
  const figures = Object.entries(quantities).flatMap(([key, of]) => {
    const value = byKey[key];
    return value === undefined ? [] : [[key, resolvePlain(value, of)] as const];
  });
  return {
    ...Object.fromEntries(figures),
    ...(stated.dissipation === undefined ? {} : { dissipation: dissipationOf(stated.dissipation) }),
    ...(stated.junctionToAmbient === undefined
      ? {}
      : { junctionToAmbient: junctionToAmbientOf(stated.junctionToAmbient) }),
  };
};
