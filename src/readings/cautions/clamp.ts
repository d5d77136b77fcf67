import { netOfPin } from '../../stage/connectivity.ts';
import type { Net } from '../../stage/connectivity.ts';
import type { CompiledPart, CompiledStage } from '../compile.ts';
import type { Notice } from '../readings.ts';
import type { Caution } from './settled.ts';

/** What can break a current, by kind, and the pins at which it does. */
const breakers: Readonly<Record<string, readonly string[]>> = {
  mosfet: ['drain', 'source'],
  bipolar: ['collector', 'emitter'],
  switch: ['a', 'b'],
  'logic-output': ['out'],
};

const isInductive = ({ part }: CompiledPart): boolean =>
  part.kind === 'inductor' ||
  (part.kind === 'load' &&
    (part.values?.inductance !== undefined || part.values?.form === 'coil' || part.values?.form === 'motor'));

const partsAt = ({ partOf }: CompiledStage, net: Net) =>
  net.pins.flatMap(({ part, pin }) => {
    const compiled = partOf.get(part);
    return compiled === undefined ? [] : [{ part: compiled, pin }];
  });

/**
 * Whether the current of an inductance can go on flowing through something at the node that breaks it: a diode that
 * leads away from the node where the current came into it (or to it, where it went out), a Zener either way, or a
 * resistor across the inductance.
 */
const isClamped = (stage: CompiledStage, coil: CompiledPart, net: Net, other: Net, into: number): boolean =>
  partsAt(stage, net).some(({ part, pin }) => {
    if (part.id === coil.id) return false;
    if (part.part.kind === 'diode') {
      if (part.device?.type === 'zener' || into === 0) return true;
      return pin === (into > 0 ? 'anode' : 'cathode');
    }
    if (part.part.kind !== 'resistor') return false;
    return part.pins.some((end) => netOfPin(stage.connectivity, part.id, end) === other);
  });

/** Inductive loads whose current a transistor or a switch can break with nowhere to go. */
export const noClamp: Caution = ({ compiled, point }) =>
  compiled.parts.filter(isInductive).flatMap((coil): readonly Notice[] => {
    if (coil.principal === null) return [];
    const current = point.measure(coil.principal, 'current');
    const [a, b] = coil.pins.map((pin) => netOfPin(compiled.connectivity, coil.id, pin));
    if (a === undefined || b === undefined) return [];
    const ends = [
      { net: a, other: b, into: -current },
      { net: b, other: a, into: current },
    ];
    return ends.flatMap(({ net, other, into }): readonly Notice[] => {
      const breaker = partsAt(compiled, net).find(
        ({ part, pin }) => breakers[part.part.kind]?.includes(pin) ?? false,
      );
      if (breaker === undefined || isClamped(compiled, coil, net, other, Math.abs(into) < 1e-6 ? 0 : into)) {
        return [];
      }
      return [
        {
          code: 'no-clamp',
          severity: 'warn',
          parts: [coil.name, breaker.part.name],
          message:
            `when ${breaker.part.name} breaks the current of ${coil.name} it has nowhere to go and drives up the ` +
            'voltage there: fit a clamp diode',
        },
      ];
    });
  });
