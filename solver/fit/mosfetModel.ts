/**
 * What a data sheet's measurements come to for a MOSFET of given parameters, through the solver's own channel laws.
 * n-channel coordinates, voltages of the pins, body at the source pin; SI units, temperatures in kelvin.
 */
import { REFERENCE_TEMPERATURE } from '../elements/constants.ts';
import { CHANNEL_SIZE, channelResult, deriveChannel, mosfetParameters } from '../elements/mosfet-channel.ts';
import { smoothChannel } from '../elements/mosfet-smooth.ts';
import { squareChannel } from '../elements/mosfet-square.ts';
import { findRoot } from './root.ts';

export type MosfetLaw = 'square' | 'smooth';

/** The channel and what is in series with it, at 25 °C. */
export interface ChannelParameters {
  /** V_T0, V. */
  readonly threshold: number;
  /** β, A/V². */
  readonly gainFactor: number;
  /** Ω; both rise with (T/T0)^2.3. */
  readonly drainResistance: number;
  readonly sourceResistance: number;
  /** 1/V. */
  readonly lengthModulation: number;
  readonly slopeFactor: number;
  /** V/K. */
  readonly thresholdTemperatureCoefficient: number;
}

const values = new Float64Array(mosfetParameters.length);
const derived = new Float64Array(CHANNEL_SIZE);

const set = (name: (typeof mosfetParameters)[number], value: number) => {
  values[mosfetParameters.indexOf(name)] = value;
};

/** A device at a temperature, ready to be measured. Only the one prepared last may be measured. */
interface Prepared {
  /** Channel current at voltages inside the series resistances, A. The body is at the source pin. */
  readonly current: (gateToSource: number, drainToSource: number, sourceToBody: number) => number;
  readonly drain: number;
  readonly source: number;
}

function prepare(law: MosfetLaw, channel: ChannelParameters, temperature: number): Prepared {
  set('polarity', 1);
  set('threshold', channel.threshold);
  set('gainFactor', channel.gainFactor);
  set('lengthModulation', channel.lengthModulation);
  set('bodyFactor', 0);
  set('surfacePotential', 0.7);
  set('slopeFactor', channel.slopeFactor);
  set('thresholdTemperatureCoefficient', channel.thresholdTemperatureCoefficient);
  deriveChannel(values, temperature, derived, 0);
  const channelLaw = law === 'square' ? squareChannel : smoothChannel;
  const rise = (temperature / REFERENCE_TEMPERATURE) ** 2.3;
  const source = channel.sourceResistance * rise;
  return {
    current: (gateToSource, drainToSource, sourceToBody) => {
      channelLaw.evaluate(derived, 0, gateToSource, Math.max(drainToSource, 0), sourceToBody);
      return channelResult[0] ?? 0;
    },
    drain: channel.drainResistance * rise,
    source,
  };
}

/** Highest voltage that a measurement is thought to reach, V. */
const HIGHEST = 1e3;

/**
 * R_DS(on) = V_DS/I_D at a gate voltage and a current, Ω. Where the channel cannot carry the current, a resistance that
 * keeps growing with what is missing, so that a search finds its way back.
 */
export function onResistance(
  law: MosfetLaw,
  channel: ChannelParameters,
  gateToSource: number,
  drainCurrent: number,
  temperature: number,
): number {
  const { current, drain, source } = prepare(law, channel, temperature);
  const atSource = drainCurrent * source;
  const gate = gateToSource - atSource;
  const most = current(gate, HIGHEST, atSource);
  if (!(most > drainCurrent)) return HIGHEST / Math.max(most, 1e-300);
  const across = findRoot((v) => current(gate, v, atSource) - drainCurrent, 0, HIGHEST) ?? HIGHEST;
  return across / drainCurrent + drain + source;
}

/**
 * The V_T0 at which the device carries `drainCurrent` at these voltages, V; undefined where none does.
 */
export function thresholdFor(
  law: MosfetLaw,
  channel: Omit<ChannelParameters, 'threshold'>,
  gateToSource: number,
  drainToSource: number,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  const excess = (threshold: number) => {
    const { current, drain, source } = prepare(law, { ...channel, threshold }, temperature);
    const atSource = drainCurrent * source;
    const inside = drainToSource - atSource - drainCurrent * drain;
    return current(gateToSource - atSource, inside, atSource) - drainCurrent;
  };
  return findRoot(excess, gateToSource - 200, gateToSource + 20);
}

/** V_GS at which the device carries `drainCurrent` with the gate tied to the drain, V. */
export function diodeConnectedVoltage(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  const { current, drain, source } = prepare(law, channel, temperature);
  const atSource = drainCurrent * source;
  return findRoot(
    (v) => current(v - atSource, v - atSource - drainCurrent * drain, atSource) - drainCurrent,
    0,
    HIGHEST,
  );
}

/** V_GS at which the device carries `drainCurrent` at `drainToSource`, V. */
export function gateVoltageFor(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainToSource: number,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  const { current, drain, source } = prepare(law, channel, temperature);
  const atSource = drainCurrent * source;
  const inside = drainToSource - atSource - drainCurrent * drain;
  if (!(inside > 0)) return undefined;
  const gate = findRoot((v) => current(v, inside, atSource) - drainCurrent, -HIGHEST, HIGHEST);
  return gate === undefined ? undefined : gate + atSource;
}

/** g_fs = ∂I_D/∂V_GS at a drain voltage and current, S. */
export function forwardTransconductance(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainToSource: number,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  const gate = gateVoltageFor(law, channel, drainToSource, drainCurrent, temperature);
  if (gate === undefined) return undefined;
  const { current, drain, source } = prepare(law, channel, temperature);
  const atSource = drainCurrent * source;
  current(gate - atSource, drainToSource - atSource - drainCurrent * drain, atSource);
  const [, toGate = 0, toDrain = 0, toBody = 0] = channelResult;
  // As the current rises, the source takes of the gate and body voltages, and both resistances of the drain's.
  return toGate / (1 + (toGate - toBody) * source + toDrain * (drain + source));
}

/** I_D at V_GS = 0, A. */
export function zeroBiasCurrent(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainToSource: number,
  temperature: number,
): number {
  const { current, drain, source } = prepare(law, channel, temperature);
  const most = current(0, drainToSource, 0);
  if (drain + source === 0 || most === 0) return most;
  const excess = (i: number) => current(-i * source, drainToSource - i * (drain + source), i * source) - i;
  return findRoot(excess, 0, most) ?? most;
}
