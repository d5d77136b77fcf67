/** Something wrong, as a value: what, where, what was found, what is allowed, and what to do. */
export interface Fault {
  /** A stable word for programs, in kebab case: `unknown-key`, `out-of-range`, … */
  readonly code: string;
  /** One sentence a person can act on; complete in itself. */
  readonly message: string;
  /** The JSON path (`parts.p3.values.resistance`), or the place a person would look. */
  readonly path?: string;
  /** Line and column, both from 1, where the JSON text itself is broken. */
  readonly line?: number;
  readonly column?: number;
  readonly found?: string;
  readonly allowed?: string;
  /** Names (or ids) of the parts concerned. */
  readonly parts?: readonly string[];
}

export type Result<Value, Problem = readonly Fault[]> =
  { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly faults: Problem };

export const success = <Value>(value: Value): { readonly ok: true; readonly value: Value } => ({
  ok: true,
  value,
});

export const failure = (
  ...faults: readonly Fault[]
): { readonly ok: false; readonly faults: readonly Fault[] } => ({ ok: false, faults });
