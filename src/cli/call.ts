import { parseArgs } from 'node:util';
import { failure, success } from '../values/result.ts';
import type { Fault, Result } from '../values/result.ts';
import { verbNamed, verbs } from './verbs.ts';
import type { OptionSpec, VerbSpec } from './verbs.ts';

/** A call that is understood: a verb, its file, and the values given to each option (empty text for a bare one). */
export interface Call {
  readonly verb: VerbSpec;
  readonly file: string;
  readonly options: ReadonlyMap<string, readonly string[]>;
}

export type Reading =
  { readonly kind: 'call'; readonly call: Call } | { readonly kind: 'help'; readonly verb: VerbSpec | null };

const dashed = (options: readonly OptionSpec[]): string =>
  options.map((option) => `--${option.name}`).join(', ');

const wrong = (code: string, message: string, found?: string, allowed?: string): Fault => ({
  code,
  message,
  ...(found === undefined ? {} : { found }),
  ...(allowed === undefined ? {} : { allowed }),
});

/** Node's parser finds the words; what they may be is judged here, so that a refusal says what is allowed. */
const wordsOf = (spec: VerbSpec, words: readonly string[]) =>
  parseArgs({
    args: [...words],
    strict: false,
    allowPositionals: true,
    tokens: true,
    options: Object.fromEntries(
      spec.options.map((option) => [
        option.name,
        {
          type: option.value === undefined ? ('boolean' as const) : ('string' as const),
          ...(option.name === 'help' ? { short: 'h' } : {}),
        },
      ]),
    ),
  }).tokens;

/** Fault of one option with its value, or null. */
const judgeOption = (
  spec: VerbSpec,
  name: string,
  value: string | undefined,
  inline: boolean,
  given: ReadonlyMap<string, readonly string[]>,
): Fault | null => {
  const option = spec.options.find((entry) => entry.name === name);
  if (option === undefined) {
    return wrong(
      'unknown-option',
      `"${spec.name}" has no option --${name}; it takes ${dashed(spec.options)}.`,
      `--${name}`,
      dashed(spec.options),
    );
  }
  if (option.value === undefined && value !== undefined) {
    return wrong('option-without-value', `--${name} takes no value; found "${value}".`, value);
  }
  if (option.value !== undefined && (value === undefined || (!inline && value.startsWith('--')))) {
    return wrong('option-value-missing', `--${name} needs a value after it: --${name} ${option.value}.`);
  }
  if (option.choices !== undefined && value !== undefined && !option.choices.includes(value)) {
    const allowed = option.choices.join(', ');
    return wrong('option-value', `--${name} is one of ${allowed}; found "${value}".`, value, allowed);
  }
  if (given.has(name) && option.repeats !== true) {
    return wrong('option-repeated', `--${name} is given twice.`);
  }
  return null;
};

/**
 * Reads the words after the program's name.
 *
 * @returns a call, or a wish for help; faults with what was found and what is allowed
 */
export const readCall = (words: readonly string[]): Result<Reading> => {
  const [first, ...rest] = words;
  if (first === undefined || first === '--help' || first === '-h' || first === 'help') {
    return success({ kind: 'help', verb: null });
  }
  const allowed = verbs.map((verb) => verb.name).join(', ');
  const verb = verbNamed(first);
  if (verb === undefined) {
    return failure(
      wrong('unknown-verb', `There is no verb "${first}"; there are ${allowed}.`, first, allowed),
    );
  }
  if (rest.includes('--help') || rest.includes('-h')) return success({ kind: 'help', verb });
  if (!verb.built) {
    return failure(
      wrong('verb-not-built', `"${verb.name}" is not in this version; it answers settle and plate.`),
    );
  }

  const faults: Fault[] = [];
  const files: string[] = [];
  const options = new Map<string, readonly string[]>();
  for (const token of wordsOf(verb, rest)) {
    if (token.kind === 'positional') files.push(token.value);
    if (token.kind !== 'option') continue;
    const fault = judgeOption(verb, token.name, token.value, token.inlineValue === true, options);
    if (fault === null) options.set(token.name, [...(options.get(token.name) ?? []), token.value ?? '']);
    else faults.push(fault);
  }
  const [file, extra] = files;
  if (file === undefined) {
    faults.push(wrong('file-missing', `"${verb.name}" needs a stage file: restpoint ${verb.name} FILE.`));
  }
  if (extra !== undefined) {
    faults.push(wrong('word-extra', `"${verb.name}" takes one file; found "${extra}" after it.`, extra));
  }
  return file === undefined || faults.length > 0
    ? failure(...faults)
    : success({ kind: 'call', call: { verb, file, options } });
};
