import { resolveValue } from '../../values/value-spec.ts';
import type { ValueSpec } from '../../values/value-spec.ts';
import { volts } from '../words.ts';
import { deferral } from './settled.ts';
import type { Caution } from './settled.ts';

/**
 * Limits of extra-low voltage, 50 V alternating (r.m.s.) and 120 V ripple-free direct (IEC 61140, value from memory).
 */
const directLimit = 120;
const alternatingLimit = 50;

/** Direct voltages between any two nodes above 120 V; signals above 50 V. */
export const dangerousVoltage: Caution = ({ compiled, point }) => {
  const { circuit, parts } = compiled;
  const set = circuit.nodes.flatMap((_, node) =>
    point.unsetNode(node) ? [] : [point.settlement.voltages[node] ?? 0],
  );
  const span = Math.max(...set) - Math.min(...set);
  const sources = parts.filter(({ part }) => part.kind === 'supply' || part.kind === 'rail');
  const direct =
    span > directLimit
      ? [
          {
            code: 'dangerous-voltage',
            severity: 'stop' as const,
            parts: sources.filter(({ elements }) => elements.length > 0).map(({ name }) => name),
            message:
              `${volts(span)} stands between two nodes, above ${directLimit} V direct: it can kill. ` +
              `Do not touch it live; ${deferral}`,
          },
        ]
      : [];
  const alternating = parts.flatMap(({ part, name, kind }) => {
    const stated = kind.kind === 'supply' || kind.kind === 'rail' ? part.values?.signal : undefined;
    const peak = stated === undefined ? 0 : resolveValue(stated as ValueSpec, 'voltage').nominal;
    const effective = Math.abs(peak) / Math.SQRT2;
    if (effective <= alternatingLimit) return [];
    return [
      {
        code: 'dangerous-voltage',
        severity: 'stop' as const,
        parts: [name],
        message:
          `a signal of ${volts(effective)} r.m.s. is above ${alternatingLimit} V alternating: it can kill. ` +
          `Do not touch it live; ${deferral}`,
      },
    ];
  });
  return [...direct, ...alternating];
};
