import type { Notice } from '../readings.ts';
import { unfusedBattery } from './battery.ts';
import { bodyDiodeOnly } from './bodyDiode.ts';
import { noClamp } from './clamp.ts';
import { hotSurface } from './heat.ts';
import { liveLoad } from './liveLoad.ts';
import { passedRatings } from './ratings.ts';
import type { Caution, Settled } from './settled.ts';
import { storedEnergy } from './storedEnergy.ts';
import { dangerousVoltage } from './voltage.ts';

/** The gravest first. */
const cautions: readonly Caution[] = [
  dangerousVoltage,
  passedRatings,
  noClamp,
  bodyDiodeOnly,
  storedEnergy,
  hotSurface,
  liveLoad,
  unfusedBattery,
];

/** What could hurt a person or a part in a settled state. */
export const cautionsOf = (settled: Settled): readonly Notice[] =>
  cautions.flatMap((caution) => caution(settled));
