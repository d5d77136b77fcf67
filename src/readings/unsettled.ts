import type { Notice, UnsettledState } from './readings.ts';

/** A state that could not be settled: why, and what is concerned, each named once. */
export const unsettledState = (
  { reason, concerns }: { readonly reason: string; readonly concerns: readonly string[] },
  snags: readonly Notice[],
): UnsettledState => ({
  settled: false,
  reason,
  concerns: [...new Set(concerns)],
  snags,
  cautions: [],
});
