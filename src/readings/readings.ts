/**
 * The shape of what `settle --json` prints and of what the sheet shows: plain data, SI units, °C for temperatures.
 * Keys are the stage file's contract (page 4 of the plan of record, restated in README.md).
 */
export type Verdict = 'held' | 'at-risk' | 'missed' | 'not-checked';
export type DutyKind = 'amplify' | 'conduct' | 'block' | 'none';
export type Method = 'direct' | 'timed' | 'ramped' | 'traced';
export type MosfetRegion = 'cutoff' | 'triode' | 'saturation' | 'body-diode';
export type BipolarRegion = 'cutoff' | 'active' | 'saturated';
export type DiodeRegion = 'conducting' | 'blocking' | 'breakdown';
export type Inversion = 'weak' | 'moderate' | 'strong';

/** A figure the drawing does not set is null, and a snag says so. */
export type Figure = number | null;

export interface SpreadReading {
  readonly corners: number;
  readonly trials: number;
  readonly held: number;
  readonly worst: { readonly headroom: Figure; readonly at: Readonly<Record<string, string>> };
}

export interface DutyReading {
  readonly duty: DutyKind;
  readonly verdict: Verdict;
  readonly headroom: Figure;
  readonly reasons: readonly string[];
  readonly spread: SpreadReading | null;
}

export interface PartReadingBase {
  readonly id: string;
  readonly kind: string;
  /** Power absorbed, W. */
  readonly power?: Figure;
}

export interface TwoPinReading extends PartReadingBase {
  readonly voltage: Figure;
  readonly current: Figure;
  readonly delivered?: Figure;
  /** Diodes only. */
  readonly region?: DiodeRegion | null;
  readonly junctionTemperature?: Figure;
}

export interface MosfetReading extends PartReadingBase, DutyReading {
  readonly kind: 'mosfet';
  readonly region: MosfetRegion | null;
  readonly reversed: boolean;
  readonly inversion?: Inversion;
  readonly inversionCoefficient?: Figure;
  readonly gateToSource: Figure;
  readonly drainToSource: Figure;
  readonly sourceToBody: Figure;
  readonly threshold: Figure;
  readonly overdrive: Figure;
  readonly saturationVoltage: Figure;
  readonly drainCurrent: Figure;
  readonly transconductance: Figure;
  readonly bodyTransconductance: Figure;
  readonly outputConductance: Figure;
  readonly junctionTemperature: Figure;
}

export interface BipolarReading extends PartReadingBase, DutyReading {
  readonly kind: 'bipolar';
  readonly region: BipolarRegion | null;
  readonly reversed: boolean;
  readonly baseToEmitter: Figure;
  readonly collectorToEmitter: Figure;
  readonly collectorCurrent: Figure;
  readonly baseCurrent: Figure;
  readonly transconductance: Figure;
  /** I_B·forcedGain/I_C − 1, duty conduct only. */
  readonly reserve?: Figure;
  readonly junctionTemperature: Figure;
}

/** Kinds with their own figures (amplifier, potentiometer, …) add named ones. */
export type OtherReading = PartReadingBase & Readonly<Record<string, string | boolean | Figure | undefined>>;

export type PartReading = TwoPinReading | MosfetReading | BipolarReading | OtherReading;

export type Severity = 'note' | 'warn' | 'stop';

/** A snag (something wrong with the drawing) or a caution (something that could hurt a person or a part). */
export interface Notice {
  readonly code: string;
  readonly severity: Severity;
  /** Names of the parts concerned (ids where a part has no name), the first being where the sign stands. */
  readonly parts: readonly string[];
  readonly message: string;
}

export interface SettledState {
  readonly settled: true;
  readonly method: Method;
  readonly iterations: number;
  readonly residual: { readonly amperes: number; readonly ratio: number };
  readonly assumptions: readonly string[];
  /** `NAME.pin` (id where a part has no name) to volts against the reference. */
  readonly pins: Readonly<Record<string, Figure>>;
  /** Amperes, positive into the part. */
  readonly pinCurrents: Readonly<Record<string, Figure>>;
  readonly parts: Readonly<Record<string, PartReading>>;
  readonly snags: readonly Notice[];
  readonly cautions: readonly Notice[];
}

export interface UnsettledState {
  readonly settled: false;
  /** Why, in a sentence. */
  readonly reason: string;
  /** Names of the parts and `NAME.pin` of the nodes concerned. */
  readonly concerns: readonly string[];
  readonly snags: readonly Notice[];
  readonly cautions: readonly Notice[];
}

export type StateReadings = SettledState | UnsettledState;

export interface StageReadings {
  readonly format: 'restpoint-readings';
  readonly version: 1;
  readonly title: string;
  readonly states: Readonly<Record<string, StateReadings>>;
}
