import type { PartKind } from './kind.ts';

/** Every part kind, in the order of the drawers. The only place that names them all. */
export const catalogue: readonly PartKind[] = [];

/** A kind by its name in the stage file. */
export const kindNamed = (kind: string): PartKind | undefined =>
  catalogue.find((entry) => entry.kind === kind);
