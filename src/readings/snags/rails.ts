import type { CompiledStage } from '../compile.ts';
import type { Notice } from '../readings.ts';

/** Rails whose name holds no voltage anywhere. */
export const railSnags = ({ connectivity, partOf }: CompiledStage): readonly Notice[] =>
  connectivity.railsWithoutVoltage.map(({ name, parts }) => ({
    code: 'rail-without-voltage',
    severity: 'warn',
    parts: [...new Set(parts.map((id) => partOf.get(id)?.name ?? id))],
    message: `rail ${name} holds no voltage: state one at one of the rails of that name`,
  }));
