/** MOSFET: what a part states of it, which law it takes, and what is read off it. Both channels, both laws. */
import type { Element } from '../circuit.ts';
import { DISCRETE_SATURATION_CURRENT, SILICON_BAND_GAP } from './constants.ts';
import type { ElementLaw } from './law.ts';
import { mosfetLaw } from './mosfet-frame.ts';
import { smoothChannel } from './mosfet-smooth.ts';
import { squareChannel } from './mosfet-square.ts';

export type MosfetRegion = 'cutoff' | 'triode' | 'saturation' | 'body-diode';
export type Inversion = 'weak' | 'moderate' | 'strong';

/** Parameters at 25 °C, as the device is: an enhancement p-channel has a negative threshold. */
export interface MosfetParameters {
  /** +1 n-channel, −1 p-channel. */
  readonly polarity: 1 | -1;
  /** Square law of Shichman and Hodges, or smooth law of Enz, Krummenacher and Vittoz. */
  readonly law: 'square' | 'smooth';
  /** V_T0, V, signed as the device is. */
  readonly threshold: number;
  /** β, A/V². */
  readonly gainFactor: number;
  /** λ, 1/V; 0. */
  readonly lengthModulation?: number;
  /** γ, √V; 0. */
  readonly bodyFactor?: number;
  /** 2φ_F, V; 0.7. */
  readonly surfacePotential?: number;
  /** n of the smooth law where no body factor is given; 1.3. */
  readonly slopeFactor?: number;
  /** V/K, signed as the device is; −4 mV/K for n, +4 mV/K for p (discrete, common practice). */
  readonly thresholdTemperatureCoefficient?: number;
  /** Series resistances, Ω; 0. Rise with (T/T0)^2.3. A device made with both at 0 keeps them at 0. */
  readonly drainResistance?: number;
  readonly sourceResistance?: number;
  /** The junctions between body and drain, and body and source. */
  readonly bodyDiode?: {
    /** I_S, A; 1e-12. */
    readonly saturationCurrent?: number;
    /** Emission coefficient; 1. */
    readonly emissionCoefficient?: number;
    /** Ω; 0, with the junction's tangent at 10 mΩ all the same. */
    readonly seriesResistance?: number;
  };
}

/** Voltages between the pins of those names, true signs. Threshold, overdrive, saturation voltage: roles exchanged where reversed. */
export interface MosfetOperating {
  readonly region: MosfetRegion;
  /** Drain and source have exchanged roles: s·V_DS < 0. */
  readonly reversed: boolean;
  /** From the forward inversion coefficient; smooth law only. */
  readonly inversion?: Inversion;
  readonly inversionCoefficient?: number;
  readonly gateToSource: number;
  readonly drainToSource: number;
  readonly sourceToBody: number;
  /** V_T with body effect and temperature, V, signed as the device is. */
  readonly threshold: number;
  /** s·(V_GS − V_T), V: positive when the channel is on. */
  readonly overdrive: number;
  /** V_DSsat, V, a magnitude, not below 0. */
  readonly saturationVoltage: number;
  /** |V_DS| inside the series resistances: what the region is judged by, V. */
  readonly channelVoltage: number;
  /** Total, in the device's normal direction (into the drain for n, out of it for p), diode included, A. */
  readonly drainCurrent: number;
  /** The channel's share of it, A. */
  readonly channelCurrent: number;
  /** The drain–body diode's share of it, A: negative where the diode conducts forward. */
  readonly diodeCurrent: number;
  /** Forward current of the drain–body junction and of the source–body junction, A; negative in reverse. */
  readonly drainJunctionCurrent: number;
  readonly sourceJunctionCurrent: number;
  /** g_m, g_mb, g_ds of the channel, S, roles exchanged where reversed. */
  readonly transconductance: number;
  readonly bodyTransconductance: number;
  readonly outputConductance: number;
  /** Absorbed, W. */
  readonly power: number;
}

const laws: Record<
  MosfetParameters['law'],
  readonly [plain: ElementLaw<MosfetOperating>, series: ElementLaw<MosfetOperating>]
> = {
  square: [mosfetLaw(squareChannel, false), mosfetLaw(squareChannel, true)],
  smooth: [mosfetLaw(smoothChannel, false), mosfetLaw(smoothChannel, true)],
};

/** Terminals in the order drain, gate, source, body. */
export function mosfet(
  name: string,
  nodes: readonly [drain: number, gate: number, source: number, body: number],
  parameters: MosfetParameters,
): Element<MosfetOperating> {
  const { polarity, drainResistance = 0, sourceResistance = 0, bodyDiode = {} } = parameters;
  const [plain, series] = laws[parameters.law];
  return {
    name,
    law: drainResistance > 0 || sourceResistance > 0 ? series : plain,
    nodes,
    // In the order of mosfetParameters.
    values: Float64Array.of(
      polarity,
      parameters.threshold,
      parameters.gainFactor,
      parameters.lengthModulation ?? 0,
      parameters.bodyFactor ?? 0,
      parameters.surfacePotential ?? 0.7,
      parameters.slopeFactor ?? 1.3,
      parameters.thresholdTemperatureCoefficient ?? -0.004 * polarity,
      drainResistance,
      sourceResistance,
      bodyDiode.saturationCurrent ?? DISCRETE_SATURATION_CURRENT,
      bodyDiode.emissionCoefficient ?? 1,
      bodyDiode.seriesResistance ?? 0,
      SILICON_BAND_GAP,
    ),
  };
}
