/** The solver as a library: circuits in, numbers out. SI units, kelvin; currents into terminals. */
export type { Circuit, Element } from './circuit.ts';
export type { ElementLaw } from './elements/law.ts';

// --- Elements ---
export { amplifier, type AmplifierOperating, type AmplifierParameters } from './elements/amplifier.ts';
export {
  bipolar,
  type BipolarOperating,
  type BipolarParameters,
  type BipolarRegion,
} from './elements/bipolar.ts';
export { capacitor, type CapacitorParameters } from './elements/capacitor.ts';
export { currentSource, type CurrentSourceParameters } from './elements/current-source.ts';
export {
  diode,
  zener,
  type DiodeOperating,
  type DiodeParameters,
  type DiodeRegion,
  type ZenerParameters,
} from './elements/diode.ts';
export { inductor, type InductorParameters } from './elements/inductor.ts';
export {
  logicOutput,
  type LogicLevel,
  type LogicOutputOperating,
  type LogicOutputParameters,
} from './elements/logic-output.ts';
export { mosfet, type MosfetParameters } from './elements/mosfet.ts';
export type { Inversion, MosfetOperating, MosfetRegion } from './elements/mosfet-operating.ts';
export {
  potentiometer,
  type PotentiometerOperating,
  type PotentiometerParameters,
} from './elements/potentiometer.ts';
export { resistor, type ResistorParameters } from './elements/resistor.ts';
export { contact, type SwitchParameters } from './elements/switch.ts';
export {
  transconductor,
  type TransconductorOperating,
  type TransconductorParameters,
} from './elements/transconductor.ts';
export type { TwoTerminalOperating } from './elements/two-terminal.ts';
export {
  voltageSource,
  type SourceOperating,
  type VoltageSourceParameters,
} from './elements/voltage-source.ts';

// --- Settling ---
export { prepare, type Preparation } from './settle/prepare.ts';
export type { Prepared } from './settle/prepared.ts';
export type { Surroundings } from './settle/surroundings.ts';
export { resettle } from './settle/resettle.ts';
export { settle } from './settle/settle.ts';
export type {
  Budget,
  Method,
  SettleOptions,
  SettleResult,
  Settlement,
  StructureFault,
  Unsettled,
  UnsettledReason,
  Unset,
} from './settle/settlement.ts';

// --- Constants that others show or convert with ---
export {
  BOLTZMANN,
  DECLARED_LEAK,
  DISCRETE_SATURATION_CURRENT,
  ELEMENTARY_CHARGE,
  ICE_POINT,
  INTEGRATED_SATURATION_CURRENT,
  JUNCTION_GUARD_RESISTANCE,
  REFERENCE_TEMPERATURE,
  RESISTANCE_FLOOR,
  SILICON_BAND_GAP,
  thermalVoltage,
} from './elements/constants.ts';
