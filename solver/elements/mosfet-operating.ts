/** What is read off a MOSFET. */

export type MosfetRegion = 'cutoff' | 'triode' | 'saturation' | 'body-diode';
export type Inversion = 'weak' | 'moderate' | 'strong';

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
