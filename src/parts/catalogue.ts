import { amplifier } from './amplifier.ts';
import { bipolar } from './bipolar.ts';
import { capacitor } from './capacitor.ts';
import { currentSource } from './currentSource.ts';
import { diode } from './diode.ts';
import { ground } from './ground.ts';
import { inductor } from './inductor.ts';
import type { PartKind } from './kind.ts';
import { load } from './load.ts';
import { logicOutput } from './logicOutput.ts';
import { mosfet } from './mosfet.ts';
import { potentiometer } from './potentiometer.ts';
import { rail } from './rail.ts';
import { resistor } from './resistor.ts';
import { supply } from './supply.ts';
import { switchPart } from './switch.ts';
import { tag } from './tag.ts';
import { testPoint } from './testPoint.ts';
import { transconductor } from './transconductor.ts';

/** Every part kind, in the order of the drawers. The only place that names them all. */
export const catalogue: readonly PartKind[] = [
  resistor,
  potentiometer,
  capacitor,
  inductor,
  supply,
  rail,
  currentSource,
  logicOutput,
  amplifier,
  transconductor,
  mosfet,
  bipolar,
  diode,
  load,
  ground,
  tag,
  switchPart,
  testPoint,
];

const byName = new Map(catalogue.map((kind) => [kind.kind, kind]));

/** A kind by its name in the stage file. */
export const kindNamed = (kind: string): PartKind | undefined => byName.get(kind);
