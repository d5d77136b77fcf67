/** A device's parameters as quantities that can be varied, with what holds where nobody stated them. */
import type { QuantityName } from '../../values/quantities.ts';
import type { ValueSpec } from '../../values/value-spec.ts';
import type { Draw } from '../kind.ts';
import { defaultDraw, drawOf, notStated } from '../values.ts';

export interface Parameter {
  /** Key of the figure; below `bodyDiode` with a dot: `bodyDiode.saturationCurrent`. */
  readonly key: string;
  readonly label: string;
  readonly quantity: QuantityName;
  /** What holds where nothing is stated; no default where the parameter is then left out. */
  readonly fallback?: Fallback;
}

export interface Fallback {
  readonly value: number;
  /** Hard limits of the default itself, where common practice gives them. */
  readonly low?: number;
  readonly high?: number;
  /** The clause for the list of assumptions; worded from label and value where left out. */
  readonly clause?: string;
  /** A default that has no say at the operating point is not worth a line in the record. */
  readonly silent?: boolean;
}

type Stated = Readonly<Record<string, unknown>>;

const statedAt = (model: Stated, key: string): ValueSpec | undefined =>
  key
    .split('.')
    .reduce<unknown>(
      (inside, step) =>
        typeof inside === 'object' && inside !== null ? (inside as Stated)[step] : undefined,
      model,
    ) as ValueSpec | undefined;

export const fallbackDraw = ({ key, quantity }: Parameter, { value, low, high }: Fallback): Draw => ({
  ...defaultDraw(key, quantity, value),
  low: low ?? value,
  high: high ?? value,
});

/** A draw for each parameter that is stated or has a default. */
export const parameterDraws = (parameters: readonly Parameter[], model: Stated): readonly Draw[] =>
  parameters.flatMap((parameter) => {
    const spec = statedAt(model, parameter.key);
    if (spec !== undefined) return [drawOf(parameter.key, parameter.quantity, spec)];
    return parameter.fallback === undefined ? [] : [fallbackDraw(parameter, parameter.fallback)];
  });

/** A clause for each default that stands in for a statement. */
export const parameterAssumptions = (parameters: readonly Parameter[], model: Stated): readonly string[] =>
  parameters.flatMap(({ key, label, quantity, fallback }) => {
    if (fallback === undefined || fallback.silent === true || statedAt(model, key) !== undefined) return [];
    return [fallback.clause ?? notStated(label, fallback.value, quantity)];
  });
