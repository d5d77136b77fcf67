import type { CompiledStage } from '../compile.ts';
import type { Point } from '../point.ts';
import type { Notice } from '../readings.ts';

/** Nodes at which the drawing sets no voltage: only leakage does. */
export const notSetSnags = (compiled: CompiledStage, point: Point): readonly Notice[] =>
  point.settlement.unset.nodes.flatMap((node): readonly Notice[] => {
    const net = compiled.nets[node];
    if (net === undefined) return [];
    const names = [...new Set(net.pins.map(({ part }) => compiled.partOf.get(part)?.name ?? part))];
    return [
      {
        code: 'not-set',
        severity: 'warn',
        parts: names,
        message: `the voltage of ${net.name} is not set by the drawing: only leakage decides it`,
      },
    ];
  });
