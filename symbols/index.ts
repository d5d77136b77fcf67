import { amplifier } from './amplifier.ts';
import type { SymbolArt } from './art.ts';
import { battery } from './battery.ts';
import { bipolarNpn } from './bipolarNpn.ts';
import { bipolarPnp } from './bipolarPnp.ts';
import { capacitor } from './capacitor.ts';
import { coil } from './coil.ts';
import { currentSource } from './currentSource.ts';
import { diode } from './diode.ts';
import { ground } from './ground.ts';
import { heater } from './heater.ts';
import { inductor } from './inductor.ts';
import { lamp } from './lamp.ts';
import { led } from './led.ts';
import { load } from './load.ts';
import { logicOutput } from './logicOutput.ts';
import { mosfetN } from './mosfetN.ts';
import { mosfetNBody } from './mosfetNBody.ts';
import { mosfetNPlain } from './mosfetNPlain.ts';
import { mosfetP } from './mosfetP.ts';
import { mosfetPBody } from './mosfetPBody.ts';
import { mosfetPPlain } from './mosfetPPlain.ts';
import { motor } from './motor.ts';
import { potentiometer } from './potentiometer.ts';
import { rail } from './rail.ts';
import { resistor } from './resistor.ts';
import { signalSource } from './signalSource.ts';
import { supply } from './supply.ts';
import { switchClosed } from './switchClosed.ts';
import { switchOpen } from './switchOpen.ts';
import { tag } from './tag.ts';
import { testPoint } from './testPoint.ts';
import { transconductor } from './transconductor.ts';
import { zener } from './zener.ts';

/** Every symbol by its name. A kind with several forms (a switch, a load) chooses among them. */
export const symbols = {
  resistor,
  potentiometer,
  capacitor,
  inductor,
  supply,
  battery,
  'signal-source': signalSource,
  rail,
  'current-source': currentSource,
  ground,
  tag,
  'test-point': testPoint,
  'mosfet-n': mosfetN,
  'mosfet-p': mosfetP,
  'mosfet-n-plain': mosfetNPlain,
  'mosfet-p-plain': mosfetPPlain,
  'mosfet-n-body': mosfetNBody,
  'mosfet-p-body': mosfetPBody,
  'bipolar-npn': bipolarNpn,
  'bipolar-pnp': bipolarPnp,
  diode,
  led,
  zener,
  'switch-open': switchOpen,
  'switch-closed': switchClosed,
  load,
  lamp,
  coil,
  motor,
  heater,
  amplifier,
  transconductor,
  'logic-output': logicOutput,
} as const satisfies Readonly<Record<string, SymbolArt>>;

export type SymbolName = keyof typeof symbols;

export const symbolNames = Object.keys(symbols) as readonly SymbolName[];

export const symbolArt = (name: SymbolName): SymbolArt => symbols[name];
