/** MOSFET: what a part states of it, which law it takes, and what is read off it. Both channels, both laws. */
import type { Element } from '../circuit.ts';
import { DISCRETE_SATURATION_CURRENT, SILICON_BAND_GAP } from './constants.ts';
import type { ElementLaw } from './law.ts';
import { mosfetLaw } from './mosfet-frame.ts';
import type { MosfetOperating } from './mosfet-operating.ts';
import { smoothChannel } from './mosfet-smooth.ts';
import { squareChannel } from './mosfet-square.ts';

export type { Inversion, MosfetOperating, MosfetRegion } from './mosfet-operating.ts';

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
