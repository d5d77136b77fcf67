import { netOfPin } from '../../stage/connectivity.ts';
import type { CompiledPart, CompiledStage } from '../compile.ts';
import type { Notice } from '../readings.ts';

/** Pins that mean something unwired: a body goes to its source, an amplifier without supplies is ideal. */
const mayBeUnwired: Readonly<Record<string, readonly string[]>> = {
  mosfet: ['body'],
  amplifier: ['high', 'low'],
};

const pinSnags = ({ connectivity }: CompiledStage, part: CompiledPart): readonly Notice[] => {
  const optional = mayBeUnwired[part.part.kind] ?? [];
  return part.pins.flatMap((pin): readonly Notice[] => {
    const net = netOfPin(connectivity, part.id, pin);
    // A mosfet's source is joined with its own body, whether or not a wire comes to it.
    if (optional.includes(pin) || net.pins.some((other) => other.part !== part.id)) return [];
    if (part.kind.joins !== 'nothing' && net.wires.length === 0 && net.pins.length === 1) {
      return [
        {
          code: 'unwired',
          severity: 'note',
          parts: [part.name],
          message: `${part.name} is not wired to anything`,
        },
      ];
    }
    const wired = connectivity.wired.get(part.id)?.has(pin) ?? false;
    return [
      {
        code: 'unwired',
        severity: 'note',
        parts: [part.name],
        message: wired
          ? `the wire at ${part.name}.${pin} leads to no other part`
          : `${part.name}.${pin} is not wired`,
      },
    ];
  });
};

/** Parts and pins that no wire joins to anything. */
export const wiringSnags = (compiled: CompiledStage): readonly Notice[] =>
  compiled.parts.flatMap((part): readonly Notice[] =>
    compiled.loose.includes(part.id)
      ? [
          {
            code: 'unwired',
            severity: 'warn',
            parts: [part.name],
            message: `${part.name} is not wired to any other part and is left out`,
          },
        ]
      : pinSnags(compiled, part),
  );
