/** What a duty asks of one transistor, in numbers: the part's own limits, or what holds where none is stated. */

export interface AmplifyTerms {
  readonly kind: 'amplify';
  /** V. */
  readonly signalPeak: number;
  /** A, in the device's normal direction; an end that is not stated is open. */
  readonly currentWindow?: { readonly low?: number; readonly high?: number };
  /** V_CE(sat) of a bipolar transistor, V. */
  readonly saturationVoltage: number;
}

export interface ConductTerms {
  readonly kind: 'conduct';
  /** V; where none is stated the drop is judged by the device's facts, or the region alone. */
  readonly dropLimit?: number;
  /** Largest I_C/I_B of a bipolar transistor. */
  readonly forcedGain: number;
}

export interface BlockTerms {
  readonly kind: 'block';
  /** A. */
  readonly leakLimit: number;
}

export type DutyTerms = AmplifyTerms | ConductTerms | BlockTerms;

/** What a device's entry in the stage file has to do with its duty. */
export interface DeviceFacts {
  readonly enteredBy: 'model' | 'facts';
  /** +1 where a positive gate voltage drives the device, −1 where a negative one does. */
  readonly polarity: 1 | -1;
  /** The largest R_DS(on) stated, Ω. */
  readonly largestOnResistance?: number;
  /** The lowest |V_GS| at which a maximum R_DS(on) is stated, V. */
  readonly coveredFrom?: number;
}
