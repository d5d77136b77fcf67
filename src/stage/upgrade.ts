import type { Result } from '../values/result.ts';
import { failure, success } from '../values/result.ts';
import { describeFound } from '../values/found.ts';
import { isObject } from './json/json.ts';
import type { Json, JsonObject } from './json/json.ts';
import { currentVersion, formatName } from './schema/stage.ts';

/** Takes a file of one version to the next, its `version` apart. */
export type Step = (file: JsonObject) => JsonObject;

/**
 * The step at n takes version n to n + 1. Version 1 is the first, so there is none yet. Whoever adds one keeps a
 * file of the version it starts from in the tests.
 */
const steps: ReadonlyMap<number, Step> = new Map();

/** A file of this format in the current version, whatever else may be wrong with it. */
export function upgrade(
  file: Json,
  {
    target = currentVersion,
    by = steps,
  }: { readonly target?: number; readonly by?: ReadonlyMap<number, Step> } = {},
): Result<JsonObject> {
  const refuse = (path: string, code: string, message: string, found: unknown, allowed: string) =>
    failure({ code, message, path, found: describeFound(found), allowed });

  if (!isObject(file)) return refuse('$', 'wrong-type', 'A stage file holds one object.', file, 'an object');
  if (file.format !== formatName) {
    const message = `This is not a stage file: its "format" must be "${formatName}".`;
    return refuse('format', 'wrong-format', message, file.format, `"${formatName}"`);
  }
  const { version } = file;
  const oldest = Math.min(target, ...by.keys());
  const allowed = oldest === target ? String(target) : `${oldest} to ${target}`;
  if (typeof version !== 'number' || !Number.isInteger(version) || version < oldest) {
    return refuse('version', 'wrong-version', `The version of a stage file is ${allowed}.`, version, allowed);
  }
  if (version > target) {
    const message = `This file is of version ${version}, newer than this program reads: bring the program up to date.`;
    return refuse('version', 'newer-version', message, version, allowed);
  }
  let upgraded = file;
  for (let at = version; at < target; at += 1) {
    const step = by.get(at);
    if (step === undefined) throw new Error(`no step from version ${at}`);
    upgraded = { ...step(upgraded), version: at + 1 };
  }
  return success(upgraded);
}
