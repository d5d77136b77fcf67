import type { CompiledStage } from '../compile.ts';
import type { PartDuty } from '../duty/partDuty.ts';
import type { Point } from '../point.ts';
import type { Notice, PartReading } from '../readings.ts';

/** A settled state as the cautions look at it. */
export interface Settled {
  readonly compiled: CompiledStage;
  readonly duties: ReadonlyMap<string, PartDuty>;
  readonly point: Point;
  readonly parts: Readonly<Record<string, PartReading>>;
}

/** What could hurt a person or a part. */
export const cautionsOf = (_settled: Settled): readonly Notice[] => [];
