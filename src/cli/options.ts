import type { SettleConditions } from '../readings/session.ts';
import { stateNames } from '../stage/states.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { parseValue } from '../values/parse.ts';
import { failure, success } from '../values/result.ts';
import type { Result } from '../values/result.ts';
import type { Call } from './call.ts';

/** The one value of an option, or undefined where it was not given. */
export const optionOf = ({ options }: Call, name: string): string | undefined => options.get(name)?.[0];

/** `--ambient` and `--law`; an ambient temperature that is none is a fault. */
export const conditionsOf = (call: Call): Result<SettleConditions> => {
  const law = optionOf(call, 'law');
  const text = optionOf(call, 'ambient');
  const stated: SettleConditions = law === 'square' || law === 'smooth' ? { law } : {};
  if (text === undefined) return success(stated);
  const ambient = parseValue(text, 'temperature');
  if (!ambient.ok) {
    return failure(...ambient.faults.map((fault) => ({ ...fault, message: `--ambient: ${fault.message}` })));
  }
  return success({ ...stated, ambient: ambient.value });
};

/** The states that `--state` names, or undefined where it was not given; a name that is none is a fault. */
export const statesOf = (call: Call, document: StageDocument): Result<readonly string[] | undefined> => {
  const named = call.options.get('state');
  if (named === undefined) return success(undefined);
  const known = stateNames(document);
  const unknown = named.filter((name) => !known.includes(name));
  if (unknown.length === 0) return success([...new Set(named)]);
  return failure(
    ...unknown.map((name) => ({
      code: 'unknown-state',
      message: `There is no state "${name}"; there are ${known.join(', ')}.`,
      found: name,
      allowed: known.join(', '),
    })),
  );
};
