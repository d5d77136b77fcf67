import { formatQuantity } from '../../values/format.ts';
import { volts } from '../words.ts';
import { deferral, figureOf } from './settled.ts';
import type { Caution } from './settled.ts';

/** J: enough for a spark that pits a contact and startles (common practice). */
const sparkEnergy = 0.5;
/** V: above this a charged capacitor can shock. */
const shockVoltage = 60;
/** J: at a shock's voltage, what is felt as more than a startle (common practice). */
const shockEnergy = 0.02;

const joules = (energy: number): string => formatQuantity(energy, 'J', { trim: true, figures: 3 });

/** Capacitors that stay charged, and inductances that keep their current, with enough to hurt. */
export const storedEnergy: Caution = (settled) =>
  settled.compiled.parts.flatMap((part) => {
    const { name, figures } = part;
    if (part.part.kind === 'capacitor') {
      const voltage = Math.abs(figureOf(settled, part, 'voltage') ?? 0);
      const energy = 0.5 * (figures.capacitance ?? 0) * voltage ** 2;
      const shocks = voltage > shockVoltage && energy > shockEnergy;
      if (!shocks && energy <= sparkEnergy) return [];
      return [
        {
          code: 'stored-energy',
          severity: shocks ? ('warn' as const) : ('note' as const),
          parts: [name],
          message:
            `${name} holds ${joules(energy)} at ${volts(voltage)} after the supply is off: discharge it before touching` +
            (shocks ? `; ${deferral}` : ''),
        },
      ];
    }
    const current = figureOf(settled, part, 'current') ?? 0;
    const energy = 0.5 * (figures.inductance ?? 0) * current ** 2;
    if (energy <= sparkEnergy) return [];
    return [
      {
        code: 'stored-energy',
        severity: 'note' as const,
        parts: [name],
        message: `${name} holds ${joules(energy)} while its current flows: breaking its lead by hand draws an arc`,
      },
    ];
  });
