import { readStage } from '../stage/readStage.ts';
import type { Fault } from '../values/result.ts';
import type { Answer } from './answer.ts';
import { readCall, type Call } from './call.ts';
import { ExitStatus } from './exitStatus.ts';
import { faultLines } from './faultText.ts';
import { helpText } from './help.ts';
import { plateVerb } from './plateVerb.ts';
import { settleVerb } from './settleVerb.ts';

/** What the command line needs of the machine it runs on. */
export interface Surroundings {
  /** @throws where the file cannot be read; `message` says why. */
  readonly readText: (path: string) => Promise<string>;
  /** @throws where the file cannot be written; `message` says why. */
  readonly writeFile: (path: string, content: string | Uint8Array) => Promise<void>;
  readonly toOutput: (text: string) => void;
  readonly toErrors: (text: string) => void;
  /** `2026-12-01`. */
  readonly date: string;
  /** Name and version. */
  readonly program: string;
}

const reasonOf = (error: unknown): string => {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  const known: Readonly<Record<string, string>> = {
    ENOENT: 'there is no such file',
    EISDIR: 'it is a folder',
    EACCES: 'this account may not',
    ENOSPC: 'the disk is full',
  };
  return known[code] ?? (error instanceof Error ? error.message : String(error));
};

const answer = async (call: Call, text: string, surroundings: Surroundings): Promise<Answer> => {
  const read = await readStage(text);
  if (!read.ok) return { status: ExitStatus.wrong, faults: read.faults };
  return call.verb.name === 'plate'
    ? plateVerb(call, read.value, surroundings)
    : settleVerb(call, read.value);
};

/** Runs one command. Never throws for a user's mistake: what is wrong goes to standard error. @returns the exit status */
export const run = async (words: readonly string[], surroundings: Surroundings): Promise<ExitStatus> => {
  const tell = (faults: readonly Fault[], where: string): void => {
    for (const fault of faults)
      surroundings.toErrors(`${[where, ''].join(where === '' ? '' : ': ')}${faultLines(fault).join('\n')}\n`);
  };
  const reading = readCall(words);
  if (!reading.ok) {
    tell(reading.faults, '');
    return ExitStatus.wrong;
  }
  if (reading.value.kind === 'help') {
    surroundings.toOutput(helpText(reading.value.verb));
    return ExitStatus.fine;
  }
  const { call } = reading.value;
  let text: string;
  try {
    text = await surroundings.readText(call.file);
  } catch (error) {
    tell([{ code: 'file-unreadable', message: `cannot be read: ${reasonOf(error)}.` }], call.file);
    return ExitStatus.wrong;
  }
  const { status, output, file, faults = [] } = await answer(call, text, surroundings);
  tell(faults, call.file);
  if (output !== undefined) surroundings.toOutput(output);
  if (file !== undefined) {
    try {
      await surroundings.writeFile(file.path, file.content);
    } catch (error) {
      tell([{ code: 'file-unwritable', message: `cannot be written: ${reasonOf(error)}.` }], file.path);
      return ExitStatus.wrong;
    }
  }
  return status;
};
