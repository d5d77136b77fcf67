/** What is read off a part. Plain figures: what they mean for a duty is the business of the readings. */

export interface TwoPinFigures {
  /** First pin less second, V. */
  readonly voltage: number;
  /** From the first pin to the second through the part, A. */
  readonly current: number;
  /** Absorbed, W. */
  readonly power: number;
}

export interface SupplyFigures extends TwoPinFigures {
  readonly delivered: number;
}

export interface DiodeFigures extends TwoPinFigures {
  readonly region: 'conducting' | 'blocking' | 'breakdown';
}

export interface MosfetFigures {
  readonly region: 'cutoff' | 'triode' | 'saturation' | 'body-diode';
  readonly reversed: boolean;
  readonly inversion?: 'weak' | 'moderate' | 'strong';
  readonly inversionCoefficient?: number;
  readonly gateToSource: number;
  readonly drainToSource: number;
  readonly sourceToBody: number;
  readonly threshold: number;
  readonly overdrive: number;
  readonly saturationVoltage: number;
  readonly drainCurrent: number;
  readonly transconductance: number;
  readonly bodyTransconductance: number;
  readonly outputConductance: number;
  readonly power: number;
}

export interface BipolarFigures {
  readonly region: 'cutoff' | 'active' | 'saturated';
  readonly reversed: boolean;
  readonly baseToEmitter: number;
  readonly collectorToEmitter: number;
  readonly collectorCurrent: number;
  readonly baseCurrent: number;
  readonly transconductance: number;
  readonly power: number;
}

export type OtherFigures = Readonly<Record<string, number | string | boolean | null>>;

/** Amperes into the part, by pin. */
export type PinCurrents = Readonly<Record<string, number>>;

export type PartReadout =
  | { readonly shape: 'two-pin'; readonly figures: TwoPinFigures; readonly pinCurrents: PinCurrents }
  | { readonly shape: 'supply'; readonly figures: SupplyFigures; readonly pinCurrents: PinCurrents }
  | { readonly shape: 'diode'; readonly figures: DiodeFigures; readonly pinCurrents: PinCurrents }
  | { readonly shape: 'mosfet'; readonly figures: MosfetFigures; readonly pinCurrents: PinCurrents }
  | { readonly shape: 'bipolar'; readonly figures: BipolarFigures; readonly pinCurrents: PinCurrents }
  | { readonly shape: 'other'; readonly figures: OtherFigures; readonly pinCurrents: PinCurrents };
