import { celsius, watts } from '../words.ts';
import { figureOf } from './settled.ts';
import type { Caution } from './settled.ts';

/** °C: bare metal burns a finger that touches it for a moment at about this (ISO 13732-1, value from memory). */
const touchLimit = 60;
/** W: above this a small part without a known thermal resistance gets hot to the touch (common practice). */
const warmPower = 1;
/** Kinds and forms of load that turn what they absorb into heat where they stand. */
const heats = new Set(['resistor', 'potentiometer', 'mosfet', 'bipolar', 'diode', 'lamp', 'heater']);

/** Parts hot enough to burn. A junction is hotter than its surface, so its temperature errs on the safe side. */
export const hotSurface: Caution = (settled) =>
  settled.compiled.parts.flatMap((part) => {
    const { name, kind } = part;
    const form = kind.kind === 'load' ? part.part.values?.form : kind.kind;
    const junction = figureOf(settled, part, 'junctionTemperature');
    const power = figureOf(settled, part, 'power');
    const hot = (message: string) => [
      { code: 'hot-surface', severity: 'note' as const, parts: [name], message },
    ];
    if (junction !== null) {
      return junction > touchLimit
        ? hot(`the junction of ${name} is at ${celsius(junction)}: its surface can burn`)
        : [];
    }
    if (typeof form !== 'string' || !heats.has(form) || power === null || power <= warmPower) return [];
    return hot(`${name} turns ${watts(power)} into heat: its surface can burn`);
  });
