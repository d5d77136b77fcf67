/** The figures that a part of a grade has to meet, each with the means of working out what a device gives for it. */
import { REFERENCE_TEMPERATURE } from '../elements/constants.ts';
import type { Bound, Fact, Grade, UnusedFact } from './fact.ts';
import { opposite } from './fact.ts';
import type { ChannelParameters, MosfetLaw } from './mosfetModel.ts';
import {
  diodeConnectedVoltage,
  forwardTransconductance,
  gateVoltageFor,
  onResistance,
  zeroBiasCurrent,
} from './mosfetModel.ts';

/** Magnitudes, SI units, kelvin; every list may be empty. */
export interface MosfetFacts {
  readonly mode: 'enhancement' | 'depletion';
  readonly gateThreshold: readonly Fact<'drainCurrent'>[];
  readonly onResistance: readonly Fact<'gateToSource' | 'drainCurrent'>[];
  readonly forwardTransconductance: readonly Fact<'drainToSource' | 'drainCurrent'>[];
  readonly zeroBiasCurrent: readonly Fact<'drainToSource'>[];
  readonly bodyDiodeForward: readonly Fact<'current'>[];
  /** R_DS(on) at the fact's temperature over that at 25 °C. */
  readonly hotOnResistanceRatio: readonly Fact[];
}

export interface Target {
  readonly fact: string;
  readonly index: number;
  readonly figure: Grade;
  readonly bound: Bound;
  readonly stated: number;
  readonly model: (channel: ChannelParameters) => number;
}

/** Current at which an on-resistance is worked out where none is stated, A: small enough to leave the channel straight. */
export const SMALL_CURRENT = 1e-3;
/** Drain voltage of a figure in saturation where none is stated, V (common practice). */
export const USUAL_DRAIN_VOLTAGE = 10;

/** Test current of a threshold where none is stated, A (common practice). */
export const USUAL_TEST_CURRENT = 250e-6;

/** V_GS(th), V: gate tied to the drain, or for a depletion device the gate voltage at the usual drain voltage. */
export function gateThreshold(
  law: MosfetLaw,
  mode: MosfetFacts['mode'],
  channel: ChannelParameters,
  drainCurrent: number,
  temperature: number,
): number {
  const voltage =
    mode === 'enhancement'
      ? diodeConnectedVoltage(law, channel, drainCurrent, temperature)
      : gateVoltageFor(law, channel, USUAL_DRAIN_VOLTAGE, drainCurrent, temperature);
  return voltage ?? Number.MIN_VALUE;
}

export interface Measured {
  readonly key: string;
  readonly index: number;
  readonly fact: Fact;
  /** Whether the figure rises or falls from the part of low threshold to the part of high threshold. */
  readonly direction: 'along' | 'against';
  readonly model: (channel: ChannelParameters) => number;
}

/** Every fact that has a say in gain and series resistance; those that lack a condition are left out, with the reason. */
export function measuredFacts(
  facts: MosfetFacts,
  law: MosfetLaw,
): { readonly measured: readonly Measured[]; readonly unused: readonly UnusedFact[] } {
  const unused: UnusedFact[] = [];
  const measured: Measured[] = [];
  facts.gateThreshold.forEach((fact, index) => {
    // The first is what the threshold itself is taken from.
    if (index === 0) return;
    const current = fact.at.drainCurrent ?? USUAL_TEST_CURRENT;
    measured.push({
      key: 'gateThreshold',
      index,
      fact,
      direction: 'along',
      model: (channel) => Math.abs(gateThreshold(law, facts.mode, channel, current, fact.at.temperature)),
    });
  });
  facts.onResistance.forEach((fact, index) => {
    const gate = fact.at.gateToSource ?? (facts.mode === 'depletion' ? 0 : undefined);
    if (gate === undefined) {
      unused.push({ fact: 'onResistance', index, reason: 'its gate voltage is not stated' });
      return;
    }
    const current = fact.at.drainCurrent ?? SMALL_CURRENT;
    measured.push({
      key: 'onResistance',
      index,
      fact,
      direction: 'along',
      model: (channel) => onResistance(law, channel, gate, current, fact.at.temperature),
    });
  });
  facts.forwardTransconductance.forEach((fact, index) => {
    const current = fact.at.drainCurrent;
    if (current === undefined) {
      unused.push({ fact: 'forwardTransconductance', index, reason: 'its drain current is not stated' });
      return;
    }
    const drain = fact.at.drainToSource ?? USUAL_DRAIN_VOLTAGE;
    measured.push({
      key: 'forwardTransconductance',
      index,
      fact,
      direction: 'against',
      model: (channel) =>
        forwardTransconductance(law, channel, drain, current, fact.at.temperature) ?? Number.MIN_VALUE,
    });
  });
  facts.zeroBiasCurrent.forEach((fact, index) => {
    if (facts.mode !== 'depletion') {
      unused.push({ fact: 'zeroBiasCurrent', index, reason: 'it is a figure of depletion devices' });
      return;
    }
    const drain = fact.at.drainToSource ?? USUAL_DRAIN_VOLTAGE;
    measured.push({
      key: 'zeroBiasCurrent',
      index,
      fact,
      // A depletion device of larger |V_GS(th)| carries more.
      direction: 'along',
      model: (channel) => zeroBiasCurrent(law, channel, drain, fact.at.temperature),
    });
  });
  const [first] = facts.onResistance;
  facts.hotOnResistanceRatio.forEach((fact, index) => {
    const gate = first?.at.gateToSource ?? (facts.mode === 'depletion' ? 0 : undefined);
    if (first === undefined || gate === undefined) {
      unused.push({
        fact: 'hotOnResistanceRatio',
        index,
        reason: 'no on-resistance is stated for it to be of',
      });
      return;
    }
    const current = first.at.drainCurrent ?? SMALL_CURRENT;
    const at = (channel: ChannelParameters, temperature: number) =>
      onResistance(law, channel, gate, current, temperature);
    measured.push({
      key: 'hotOnResistanceRatio',
      index,
      fact,
      direction: 'along',
      model: (channel) => at(channel, fact.at.temperature) / at(channel, REFERENCE_TEMPERATURE),
    });
  });
  return { measured, unused };
}

/** The end of a figure that a part of this grade has. */
export function endOf({ key, direction }: Measured, grade: Grade, mode: MosfetFacts['mode']): Grade {
  // A depletion device conducts the better the larger its |V_GS(th)|.
  const turned = mode === 'depletion' && (key === 'onResistance' || key === 'forwardTransconductance');
  return (direction === 'along') === turned ? opposite(grade) : grade;
}

/**
 * Whether a minimum is no more than a bound: of a gain, where it is all that is stated, or where an on-resistance says
 * already what the worst part is.
 */
export const isSoleMinimum = ({ key, fact }: Measured, measured: readonly Measured[]): boolean =>
  (key === 'forwardTransconductance' || key === 'zeroBiasCurrent') &&
  ((fact.typical === undefined && fact.high === undefined) ||
    measured.some((other) => other.key === 'onResistance'));

/**
 * What one grade has to meet. A part at one end of the threshold takes each fact's figure of the end that goes with it
 * (maximum with maximum), else the typical figure (minimum with typical), never the other end: that is a bound.
 */
export const targetsOf = (
  measured: readonly Measured[],
  grade: Grade,
  mode: MosfetFacts['mode'],
): readonly Target[] =>
  measured.map((of): Target => {
    const { key, index, fact, model } = of;
    const target = (figure: Grade, bound: Bound, stated: number): Target => ({
      fact: key,
      index,
      figure,
      bound,
      stated,
      model,
    });
    const end = endOf(of, grade, mode);
    const own = fact[end];
    if (own !== undefined) {
      return target(end, end === 'low' && isSoleMinimum(of, measured) ? 'at-least' : 'equal', own);
    }
    if (fact.typical !== undefined) return target('typical', 'equal', fact.typical);
    if (fact.low !== undefined && fact.high !== undefined) {
      return target('typical', 'equal', Math.sqrt(fact.low * fact.high));
    }
    if (fact.high !== undefined) return target('high', 'at-most', fact.high);
    return target('low', 'at-least', fact.low ?? 0);
  });
