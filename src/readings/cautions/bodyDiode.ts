import { amperes } from '../words.ts';
import type { Caution } from './settled.ts';

/** Transistors whose current has no other path than the body diode. */
export const bodyDiodeOnly: Caution = ({ compiled, point }) =>
  compiled.parts.flatMap(({ part, name, principal }) => {
    if (part.kind !== 'mosfet' || principal === null) return [];
    if (point.measure(principal, 'diodeCarries') !== 1) return [];
    const current = point.measure(principal, 'currentMagnitude');
    return [
      {
        code: 'body-diode',
        severity: 'warn' as const,
        parts: [name],
        message: `${amperes(current)} flows through ${name} by its body diode alone, whatever its gate does`,
      },
    ];
  });
