import { amperes } from '../words.ts';
import type { Caution } from './settled.ts';

/** A battery drives whatever it is shorted by: nothing in a drawing of these kinds stands for a fuse. */
export const unfusedBattery: Caution = ({ compiled }) =>
  compiled.parts.flatMap(({ part, name, figures }) => {
    if (part.kind !== 'supply' || part.values?.form !== 'battery') return [];
    const { voltage = 0, resistance = 0 } = figures;
    const short = resistance > 0 ? `, about ${amperes(Math.abs(voltage) / resistance)} into a short` : '';
    return [
      {
        code: 'unfused-battery',
        severity: 'note' as const,
        parts: [name],
        message: `no fuse is drawn at ${name}${short}: fit one at the battery, sized for its wires; local codes come first`,
      },
    ];
  });
