/** A fact of a data sheet as the stage file holds it: figures, the condition they hold at, and the source. */
import * as z from 'zod';
import { describeFound } from '../../values/found.ts';
import type { QuantityName } from '../../values/quantities.ts';
import type { Fault } from '../../values/result.ts';
import { plainQuantity, shortText } from '../../values/schema.ts';
import type { IssueParams } from '../../values/schema.ts';
import { resolvePlain } from '../../values/value-spec.ts';
import type { PlainValue } from '../../values/value-spec.ts';

export interface Fact<Condition extends string = string> {
  readonly low?: PlainValue;
  readonly typical?: PlainValue;
  readonly high?: PlainValue;
  readonly at?: Readonly<Partial<Record<Condition | 'temperature', PlainValue>>>;
  readonly source?: string;
}

/** A fact in numbers: SI, the temperature in °C (25 where none is stated), conditions that are stated. */
export interface FactFigures<Condition extends string = string> {
  readonly low?: number;
  readonly typical?: number;
  readonly high?: number;
  readonly at: Readonly<Partial<Record<Condition, number>>> & { readonly temperature: number };
  readonly source?: string;
}

/** Adds a check whose faults carry the path of what is wrong, below the schema's own place. */
export const refined = <Schema extends z.ZodType>(
  schema: Schema,
  check: (value: z.infer<Schema>) => readonly Fault[],
): Schema =>
  schema.superRefine((value, context) => {
    for (const fault of check(value)) {
      context.addIssue({
        code: 'custom',
        message: fault.message,
        path: fault.path === undefined ? [] : fault.path.split('.'),
        params: { fault } satisfies IssueParams,
      });
    }
  });

const optionalQuantities = <Key extends string>(quantities: Readonly<Record<Key, QuantityName>>) =>
  Object.fromEntries(
    Object.entries<QuantityName>(quantities).map(([key, of]) => [key, z.exactOptional(plainQuantity(of))]),
  ) as Record<Key, z.ZodExactOptional<ReturnType<typeof plainQuantity>>>;

const checkFigures = (fact: Fact, figure: QuantityName): readonly Fault[] => {
  const figures = (['low', 'typical', 'high'] as const).flatMap((key) =>
    fact[key] === undefined ? [] : [{ key, value: resolvePlain(fact[key], figure) }],
  );
  if (figures.length === 0) {
    return [
      {
        code: 'fact-without-figure',
        message: 'A fact states at least one figure: low, typical or high.',
        found: describeFound(fact),
        allowed: 'low, typical or high',
      },
    ];
  }
  return figures.flatMap(({ key, value }, index) => {
    const before = figures[index - 1];
    if (before === undefined || before.value <= value) return [];
    return [
      {
        code: 'spread-order',
        message: 'The figures of a fact must stand in the order low ≤ typical ≤ high.',
        path: key,
        found: `${before.key} ${before.value}, ${key} ${value}`,
        allowed: 'low ≤ typical ≤ high',
      },
    ];
  });
};

/** The schema of the list of one kind of fact: its figures are of `figure`, its conditions of `conditions`. */
export const facts = <Condition extends string>(
  figure: QuantityName,
  conditions: Readonly<Record<Condition, QuantityName>>,
) =>
  z.exactOptional(
    z
      .array(
        refined(
          z.strictObject({
            ...optionalQuantities({ low: figure, typical: figure, high: figure }),
            at: z.exactOptional(
              z.strictObject(optionalQuantities({ ...conditions, temperature: 'temperature' })),
            ),
            source: z.exactOptional(shortText()),
          }) as unknown as z.ZodType<Fact<Condition>>,
          (fact) => checkFigures(fact, figure),
        ),
      )
      .min(1),
  );

/** The figures of a list of facts that was checked. */
export const factFigures = <Condition extends string>(
  list: readonly Fact<Condition>[] | undefined,
  figure: QuantityName,
  conditions: Readonly<Record<Condition, QuantityName>>,
): readonly FactFigures<Condition>[] =>
  (list ?? []).map((fact) => {
    const figures: Record<string, number> = {};
    for (const key of ['low', 'typical', 'high'] as const) {
      if (fact[key] !== undefined) figures[key] = resolvePlain(fact[key], figure);
    }
    const at: Record<string, number> = { temperature: 25 };
    for (const [key, of] of Object.entries<QuantityName>({ ...conditions, temperature: 'temperature' })) {
      const stated = fact.at?.[key as Condition];
      if (stated !== undefined) at[key] = resolvePlain(stated, of);
    }
    return {
      ...figures,
      at: at as FactFigures<Condition>['at'],
      ...(fact.source === undefined ? {} : { source: fact.source }),
    };
  });
