import type { StructureFault } from '../../../solver/index.ts';
import type { CompiledStage } from '../compile.ts';
import type { Notice } from '../readings.ts';
import { overlapSnags } from './overlap.ts';
import { railSnags } from './rails.ts';
import { wiringSnags } from './wiring.ts';

/** What is wrong with the drawing itself, before anything is settled. */
export const drawingSnags = (compiled: CompiledStage): readonly Notice[] => [
  ...railSnags(compiled),
  ...wiringSnags(compiled),
  ...overlapSnags(compiled),
];

/** A fault of the circuit's structure as a snag, its elements as the parts they belong to. */
export const structureSnag = (compiled: CompiledStage, fault: StructureFault): Notice => {
  const owners = compiled.parts.filter((part) =>
    part.elements.some((element) => fault.elements.includes(element.name)),
  );
  return {
    code: fault.code,
    severity: 'stop',
    parts: owners.map((part) => part.name),
    message: fault.message,
  };
};
