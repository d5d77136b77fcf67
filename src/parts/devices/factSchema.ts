/** The schema of a device's facts, from the list of what facts its type has. */
import * as z from 'zod';
import type { FactShape } from './conditions.ts';
import { facts, factFigures } from './fact.ts';
import type { Fact, FactFigures } from './fact.ts';

type Shapes = Readonly<Record<string, FactShape>>;

type ConditionOf<Shape extends FactShape> = keyof Shape['at'] & string;

/** Facts as the file holds them. */
export type StatedFacts<Of extends Shapes> = {
  readonly [key in keyof Of]?: readonly Fact<ConditionOf<Of[key]>>[];
};

/** The same in numbers, every list there, empty where nothing is stated. */
export type FactsInFigures<Of extends Shapes> = {
  readonly [key in keyof Of]: readonly FactFigures<ConditionOf<Of[key]>>[];
};

const entries = (shapes: Shapes) =>
  Object.fromEntries(Object.entries(shapes).map(([key, { figure, at }]) => [key, facts<string>(figure, at)]));

/** Strict: these facts, and the further keys given. At least one entry. */
export const factSchema = <Of extends Shapes, More extends object = object>(
  shapes: Of,
  more: Readonly<Record<string, z.ZodType>> = {},
) => z.strictObject({ ...more, ...entries(shapes) }) as unknown as z.ZodType<StatedFacts<Of> & More>;

export const factsInFigures = <Of extends Shapes>(shapes: Of, stated: StatedFacts<Of>): FactsInFigures<Of> =>
  Object.fromEntries(
    Object.entries(shapes).map(([key, { figure, at }]) => [
      key,
      factFigures<string>((stated as Readonly<Record<string, readonly Fact[] | undefined>>)[key], figure, at),
    ]),
  ) as unknown as FactsInFigures<Of>;
