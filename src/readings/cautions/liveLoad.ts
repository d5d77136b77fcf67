import { volts } from '../words.ts';
import { deferral, figureOf, voltageOf } from './settled.ts';
import type { Caution } from './settled.ts';

/** V against ground at both pins: worth knowing before a load is taken out of its holder. */
const liveVoltage = 2;
/** A: less counts as off. */
const offCurrent = 1e-5;
/** V: above this even a load at rest is dangerous (IEC 61140, value from memory). */
const dangerous = 120;

/** Loads that rest and yet stand at a voltage against ground at both pins: switched from the low side. */
export const liveLoad: Caution = (settled) =>
  settled.compiled.parts.flatMap((part) => {
    if (part.part.kind !== 'load') return [];
    const current = figureOf(settled, part, 'current');
    const [a, b] = [voltageOf(settled, part, 'a'), voltageOf(settled, part, 'b')];
    if (current === null || a === null || b === null || Math.abs(current) > offCurrent) return [];
    const least = Math.min(Math.abs(a), Math.abs(b));
    if (least < liveVoltage) return [];
    return [
      {
        code: 'live-while-off',
        severity: least > dangerous ? ('stop' as const) : ('note' as const),
        parts: [part.name],
        message:
          `${part.name} is off, and both its pins stand at ${volts(least)} against ground` +
          (least > dangerous ? `: do not touch it; ${deferral}` : ': it is live to ground while off'),
      },
    ];
  });
