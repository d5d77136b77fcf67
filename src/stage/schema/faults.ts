import type * as z from 'zod';
import { describeFound } from '../../values/found.ts';
import type { Fault } from '../../values/result.ts';
import type { IssueParams } from '../../values/schema.ts';
import { pathText, valueAt } from '../json/json.ts';

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];

/** A damaged file may be wrong in a million places: the first ones are told, and how many more there are. */
const mostFaults = 50;

const kinds: Readonly<Record<string, string>> = {
  object: 'an object',
  record: 'an object',
  array: 'a list',
  tuple: 'a list',
  string: 'text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
};

/**
 * Zod's map from an issue to its message. Here the message says what is allowed, as only at this moment the
 * schema that raised the issue is at hand; `faultsOf` makes the sentence.
 */
export function describeAllowed(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case 'unrecognized_keys':
      return keysOf(issue.inst).join(', ');
    case 'invalid_type':
      return kinds[String(issue.expected)] ?? String(issue.expected);
    case 'invalid_value':
      return (issue.values as readonly unknown[]).map(String).join(', ');
    case 'invalid_union':
      return Array.isArray(issue.options) ? issue.options.map(String).join(', ') : '';
    case 'too_small':
      return `at least ${String(issue.minimum)}`;
    case 'too_big':
      return `at most ${String(issue.maximum)}`;
    default:
      return undefined;
  }
}

function keysOf(schema: unknown): readonly string[] {
  const shape = (schema as { _zod?: { def?: { shape?: object } } } | undefined)?._zod?.def?.shape;
  return shape === undefined ? [] : Object.keys(shape);
}

/** Issues of a schema that was run with `describeAllowed`, as faults with their path, what was found, what is allowed. */
export function faultsOf(issues: readonly Issue[], root: unknown): readonly Fault[] {
  return limitFaults(issues.flatMap((issue) => [...faultsOfIssue(issue, [], root)]));
}

export function limitFaults(faults: readonly Fault[]): readonly Fault[] {
  if (faults.length <= mostFaults) return faults;
  const more = faults.length - mostFaults;
  return [
    ...faults.slice(0, mostFaults),
    { code: 'more-faults', message: `${more} more things are wrong in this file.`, path: '$' },
  ];
}

function* faultsOfIssue(issue: Issue, before: Path, root: unknown): Generator<Fault> {
  const path = [...before, ...issue.path];
  const place = { path: pathText(path), found: describeFound(valueAt(root, path)) };
  switch (issue.code) {
    case 'custom': {
      const fault = (issue.params as IssueParams | undefined)?.fault;
      if (valueAt(root, path) === undefined && path.length > 0) {
        yield missingKey(path, fault?.allowed ?? 'a value');
        return;
      }
      yield fault === undefined
        ? { code: 'wrong-value', message: issue.message, ...place }
        : { ...place, ...fault, path: place.path };
      return;
    }
    case 'unrecognized_keys':
      for (const key of issue.keys) {
        yield {
          code: 'unknown-key',
          message: `"${key.slice(0, 60)}" is not a key here.`,
          path: pathText([...path, key]),
          found: `"${key.slice(0, 60)}"`,
          allowed: issue.message,
        };
      }
      return;
    case 'invalid_key': {
      const nested = issue.issues[0];
      yield {
        code: 'wrong-key',
        message: nested?.message ?? 'This key is not allowed here.',
        path: place.path,
        found: JSON.stringify(String(path.at(-1)).slice(0, 60)),
        ...allowedOf(nested),
      };
      return;
    }
    case 'invalid_union':
      yield* faultsOfUnion(issue, path, root);
      return;
    default:
      yield ordinaryFault(issue, path, root);
  }
}

const allowedOf = (issue: Issue | undefined): { readonly allowed?: string } => {
  const fault = issue?.code === 'custom' ? (issue.params as IssueParams | undefined)?.fault : undefined;
  return fault?.allowed === undefined ? {} : { allowed: fault.allowed };
};

const missingKey = (path: Path, allowed: string): Fault => ({
  code: 'missing-key',
  message: `"${String(path.at(-1))}" is missing.`,
  path: pathText(path),
  found: describeFound(undefined),
  allowed,
});

function ordinaryFault(issue: Issue, path: Path, root: unknown): Fault {
  const found = valueAt(root, path);
  const allowed = issue.message;
  const place = { path: pathText(path), found: describeFound(found), allowed };
  if (found === undefined) return missingKey(path, allowed);
  if (issue.code === 'invalid_type') {
    return { code: 'wrong-type', message: `Found ${place.found} where ${allowed} belongs.`, ...place };
  }
  if (issue.code === 'too_small' || issue.code === 'too_big') {
    return { code: 'out-of-range', message: `This must be ${allowed}.`, ...place };
  }
  return { code: 'unknown-choice', message: `Found ${place.found}; allowed is: ${allowed}.`, ...place };
}

/** Of a union the branch that came furthest is what was meant. */
function* faultsOfUnion(
  issue: Extract<Issue, { readonly code: 'invalid_union' }>,
  path: Path,
  root: unknown,
): Generator<Fault> {
  const depth = (branch: readonly Issue[]) => Math.max(0, ...branch.map(({ path: at }) => at.length));
  let meant: readonly Issue[] | undefined;
  for (const branch of issue.errors) {
    if (meant === undefined || depth(branch) > depth(meant)) meant = branch;
  }
  if (meant === undefined || meant.length === 0) {
    yield ordinaryFault(issue, path, root);
    return;
  }
  for (const nested of meant) yield* faultsOfIssue(nested, path, root);
}
