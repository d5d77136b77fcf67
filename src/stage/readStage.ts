import { prepareArithmetic } from '../values/arithmetic.ts';
import type { Result } from '../values/result.ts';
import { failure, success } from '../values/result.ts';
import { checkStage } from './checks/checkStage.ts';
import type { JsonObject } from './json/json.ts';
import { readJson } from './json/readJson.ts';
import { describeAllowed, faultsOf, limitFaults } from './schema/faults.ts';
import { stageSchema } from './schema/stage.ts';
import type { StageDocument } from './schema/stage.ts';
import { upgrade } from './upgrade.ts';

/** Sections that may be left out of a file: nothing is stated in them then. */
const sections = {
  title: '',
  conditions: {},
  devices: {},
  parts: {},
  joints: {},
  wires: {},
  states: {},
  questions: {},
};

/**
 * Reads a stage file. It is opened whole or refused whole, every fault with its JSON path, what was found and
 * what is allowed. The document is what the file states, values as typed and keys in their order, with the
 * sections that were left out added empty.
 */
export async function readStage(text: string): Promise<Result<StageDocument>> {
  const first = readStageAtOnce(text);
  if (first.ok || !first.faults.some(({ code }) => code === 'arithmetic-not-ready')) return first;
  await prepareArithmetic();
  return readStageAtOnce(text);
}

/** As `readStage`, at once; refuses a file that holds arithmetic before `prepareArithmetic()` has finished. */
export function readStageAtOnce(text: string): Result<StageDocument> {
  const json = readJson(text);
  if (!json.ok) return failure(...limitFaults(json.faults));
  const upgraded = upgrade(json.value);
  return upgraded.ok ? checkDocument(upgraded.value) : upgraded;
}

/** Plain data of the current version as a document. */
export function checkDocument(file: JsonObject): Result<StageDocument> {
  const whole = withSections(file);
  const result = stageSchema.safeParse(whole, { error: describeAllowed });
  if (!result.success) return failure(...faultsOf(result.error.issues, whole));
  // Not the schema's own copy, whose keys stand in the schema's order: the file's.
  const document = whole as unknown as StageDocument;
  const faults = checkStage(document);
  return faults.length === 0 ? success(document) : failure(...limitFaults(faults));
}

const withSections = (file: JsonObject): JsonObject => {
  const missing = Object.entries(sections).filter(([key]) => !Object.hasOwn(file, key));
  return missing.length === 0 ? file : { ...file, ...Object.fromEntries(missing) };
};
