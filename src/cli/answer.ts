import type { Fault } from '../values/result.ts';
import type { ExitStatus } from './exitStatus.ts';

/** What a verb comes to: what goes to standard output or to a file, and the status the command ends with. */
export interface Answer {
  readonly status: ExitStatus;
  readonly output?: string;
  readonly file?: { readonly path: string; readonly content: string | Uint8Array };
  /** Told on standard error; the status says whether they stopped the work. */
  readonly faults?: readonly Fault[];
}
