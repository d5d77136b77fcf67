/**
 * What a data sheet's measurements come to for a MOSFET of given parameters, through the solver's own channel laws.
 * n-channel coordinates; SI units, temperatures in kelvin.
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
  /** In the drain lead, Ω; rises with (T/T0)^2.3. */
  readonly drainResistance: number;
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

function prepare(channel: ChannelParameters, temperature: number): void {
  set('polarity', 1);
  set('threshold', channel.threshold);
  set('gainFactor', channel.gainFactor);
  set('lengthModulation', channel.lengthModulation);
  set('bodyFactor', 0);
  set('surfacePotential', 0.7);
  set('slopeFactor', channel.slopeFactor);
  set('thresholdTemperatureCoefficient', channel.thresholdTemperatureCoefficient);
  deriveChannel(values, temperature, derived, 0);
}

const lawOf = (law: MosfetLaw) => (law === 'square' ? squareChannel : smoothChannel);

/** Evaluates the channel that was prepared last, body at the source; A. */
function channelCurrent(law: MosfetLaw, gateToSource: number, drainToSource: number): number {
  lawOf(law).evaluate(derived, 0, gateToSource, drainToSource, 0);
  return channelResult[0] ?? 0;
}

const seriesAt = ({ drainResistance }: ChannelParameters, temperature: number) =>
  drainResistance * (temperature / REFERENCE_TEMPERATURE) ** 2.3;

/** Highest voltage across a channel that a measurement is thought to reach, V. */
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
  prepare(channel, temperature);
  const series = seriesAt(channel, temperature);
  const most = channelCurrent(law, gateToSource, HIGHEST);
  if (!(most > drainCurrent)) return (HIGHEST / drainCurrent) * (drainCurrent / Math.max(most, 1e-300));
  const across = findRoot((v) => channelCurrent(law, gateToSource, v) - drainCurrent, 0, HIGHEST) ?? HIGHEST;
  return across / drainCurrent + series;
}

/**
 * The V_T0 at which the channel carries `drainCurrent` at `gateToSource` and `drainToSource` (of the pins), V; undefined
 * where none does.
 */
export function thresholdFor(
  law: MosfetLaw,
  channel: Omit<ChannelParameters, 'threshold'>,
  gateToSource: number,
  drainToSource: number,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  const inside = drainToSource - drainCurrent * seriesAt({ ...channel, threshold: 0 }, temperature);
  if (!(inside > 0)) return undefined;
  const excess = (threshold: number) => {
    prepare({ ...channel, threshold }, temperature);
    return channelCurrent(law, gateToSource, inside) - drainCurrent;
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
  prepare(channel, temperature);
  const drop = drainCurrent * seriesAt(channel, temperature);
  return findRoot((v) => channelCurrent(law, v, Math.max(v - drop, 0)) - drainCurrent, 0, HIGHEST);
}

/** V_GS at which the device carries `drainCurrent` at `drainToSource` of the pins, V. */
export function gateVoltageFor(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainToSource: number,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  prepare(channel, temperature);
  const inside = drainToSource - drainCurrent * seriesAt(channel, temperature);
  if (!(inside > 0)) return undefined;
  return findRoot((v) => channelCurrent(law, v, inside) - drainCurrent, -HIGHEST, HIGHEST);
}

/** g_fs = ∂I_D/∂V_GS of the pins at a drain voltage and current, S. */
export function forwardTransconductance(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainToSource: number,
  drainCurrent: number,
  temperature: number,
): number | undefined {
  const gate = gateVoltageFor(law, channel, drainToSource, drainCurrent, temperature);
  if (gate === undefined) return undefined;
  const series = seriesAt(channel, temperature);
  channelCurrent(law, gate, drainToSource - drainCurrent * series);
  const [, toGate = 0, toDrain = 0] = channelResult;
  // The drain's own resistance takes part of the drain voltage as the current rises.
  return toGate / (1 + toDrain * series);
}

/** I_D at V_GS = 0, A. */
export function zeroBiasCurrent(
  law: MosfetLaw,
  channel: ChannelParameters,
  drainToSource: number,
  temperature: number,
): number {
  prepare(channel, temperature);
  const series = seriesAt(channel, temperature);
  const most = channelCurrent(law, 0, drainToSource);
  if (series === 0 || most === 0) return most;
  const carried = (current: number) =>
    channelCurrent(law, 0, Math.max(drainToSource - current * series, 0)) - current;
  return findRoot(carried, 0, most) ?? most;
}
