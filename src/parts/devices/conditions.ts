/** The facts of each device type: what the figure is, and what the conditions it holds at are. */
import type { QuantityName } from '../../values/quantities.ts';

export interface FactShape {
  /** What the fact is called beside its figures. */
  readonly label: string;
  readonly figure: QuantityName;
  readonly at: Readonly<Record<string, QuantityName>>;
}

const shape = <const At extends Readonly<Record<string, QuantityName>>>(
  label: string,
  figure: QuantityName,
  at: At,
) => ({ label, figure, at });

const atDrainVoltage = { drainToSource: 'voltageMagnitude' } as const;

export const mosfetFactShapes = {
  gateThreshold: shape('V_GS(th)', 'voltageMagnitude', { drainCurrent: 'currentMagnitude' }),
  onResistance: shape('R_DS(on)', 'resistance', {
    gateToSource: 'voltageMagnitude',
    drainCurrent: 'currentMagnitude',
  }),
  forwardTransconductance: shape('g_fs', 'conductance', {
    drainToSource: 'voltageMagnitude',
    drainCurrent: 'currentMagnitude',
  }),
  zeroBiasCurrent: shape('I_DSS at V_GS = 0', 'currentMagnitude', atDrainVoltage),
  bodyDiodeForward: shape('V_SD', 'voltageMagnitude', { current: 'currentMagnitude' }),
  drainLeakage: shape('drain leakage', 'currentMagnitude', atDrainVoltage),
  gateLeakage: shape('gate leakage', 'currentMagnitude', { gateToSource: 'voltageMagnitude' }),
  inputCapacitance: shape('C_iss', 'capacitance', atDrainVoltage),
  outputCapacitance: shape('C_oss', 'capacitance', atDrainVoltage),
  reverseCapacitance: shape('C_rss', 'capacitance', atDrainVoltage),
  thresholdTemperatureCoefficient: shape(
    'temperature coefficient of the threshold',
    'voltageTemperatureCoefficient',
    {},
  ),
  hotOnResistanceRatio: shape('hot R_DS(on) over that at 25 °C', 'ratio', {}),
} as const satisfies Readonly<Record<string, FactShape>>;

export const diodeFactShapes = {
  forwardVoltage: shape('V_F', 'voltageMagnitude', { current: 'currentMagnitude' }),
  reverseCurrent: shape('I_R', 'currentMagnitude', { voltage: 'voltageMagnitude' }),
  junctionCapacitance: shape('junction capacitance', 'capacitance', { voltage: 'voltageMagnitude' }),
  forwardTemperatureCoefficient: shape('temperature coefficient of V_F', 'voltageTemperatureCoefficient', {}),
} as const satisfies Readonly<Record<string, FactShape>>;

export const zenerFactShapes = {
  ...diodeFactShapes,
  breakdownVoltage: shape('V_Z', 'voltageMagnitude', { current: 'currentMagnitude' }),
  dynamicResistance: shape('Z_Z', 'seriesResistance', { current: 'currentMagnitude' }),
  breakdownTemperatureCoefficient: shape('temperature coefficient of V_Z', 'voltageTemperatureCoefficient', {
    current: 'currentMagnitude',
  }),
} as const satisfies Readonly<Record<string, FactShape>>;

export const bipolarFactShapes = {
  currentGain: shape('h_FE', 'currentGain', {
    collectorCurrent: 'currentMagnitude',
    collectorToEmitter: 'voltageMagnitude',
  }),
  baseToEmitter: shape('V_BE', 'voltageMagnitude', { collectorCurrent: 'currentMagnitude' }),
  saturationVoltage: shape('V_CE(sat)', 'voltageMagnitude', {
    collectorCurrent: 'currentMagnitude',
    baseCurrent: 'currentMagnitude',
  }),
  collectorLeakage: shape('collector leakage', 'currentMagnitude', {
    collectorToBase: 'voltageMagnitude',
  }),
  outputConductance: shape('h_oe', 'conductance', { collectorCurrent: 'currentMagnitude' }),
  baseToEmitterCapacitance: shape('base–emitter capacitance', 'capacitance', {
    voltage: 'voltageMagnitude',
  }),
  baseToCollectorCapacitance: shape('base–collector capacitance', 'capacitance', {
    voltage: 'voltageMagnitude',
  }),
} as const satisfies Readonly<Record<string, FactShape>>;
