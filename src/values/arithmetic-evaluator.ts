import {
  addDependencies,
  create,
  divideDependencies,
  multiplyDependencies,
  parseDependencies,
  subtractDependencies,
  unaryMinusDependencies,
  unaryPlusDependencies,
} from 'mathjs/number';
import type { FactoryFunctionMap } from 'mathjs/number';

/** Numbers and operators alone: no functions, no names, no units, no assignment. */
const factories = {
  parseDependencies,
  addDependencies,
  subtractDependencies,
  multiplyDependencies,
  divideDependencies,
  unaryMinusDependencies,
  unaryPlusDependencies,
};
// The library's types call each of them possibly missing; the test of every operator shows they are not.
const math = create(factories as FactoryFunctionMap);

/** The value of an expression of numbers, + - * / and brackets; NaN where it is not one. */
export function evaluate(expression: string): number {
  try {
    const value: unknown = math.parse(expression).compile().evaluate({});
    return typeof value === 'number' ? value : Number.NaN;
  } catch {
    return Number.NaN; // not an expression: the caller says so in its own words
  }
}
