/**
 * Quantities of an operating point that a `Limit` can bound: every figure an element reads (yes and no as 1 and 0),
 * and what is derived from them here. SI units.
 */
import type { BipolarOperating } from '../elements/bipolar.ts';
import type { MosfetOperating } from '../elements/mosfet.ts';

type Quantity<Operating> = (at: Operating) => number;

const ofMosfet: Readonly<Record<string, Quantity<MosfetOperating>>> = {
  /** |V_DS|, V. */
  drop: (at) => Math.abs(at.drainToSource),
  /** |V_GS|, V. */
  drive: (at) => Math.abs(at.gateToSource),
  /** |V_DS| − V_DSsat inside the series resistances, V; in cutoff the (negative) overdrive. */
  saturationMargin: (at) =>
    at.region === 'cutoff' ? Math.min(at.overdrive, 0) : at.channelVoltage - at.saturationVoltage,
  /** |V_DS| − V_DSsat inside the series resistances, V, whatever the region: negative in triode. */
  edge: (at) => at.channelVoltage - at.saturationVoltage,
  /** 1 unless the channel is in cutoff. */
  conducts: (at) => (at.region === 'cutoff' ? 0 : 1),
  /** 1 where the body diode carries the current. */
  diodeCarries: (at) => (at.region === 'body-diode' ? 1 : 0),
  /** The channel's part of all the current between drain and source; 1 where there is none at all. */
  channelShare: (at) => {
    const channel = Math.abs(at.channelCurrent);
    const all = channel + Math.abs(at.diodeCurrent);
    return all === 0 ? 1 : channel / all;
  },
  /** |I_D|, the diode included, A. */
  currentMagnitude: (at) => Math.abs(at.drainCurrent),
  /** |V_DS|/|I_D|, Ω; 0 where there is neither. */
  onResistance: (at) => (at.drainToSource === 0 ? 0 : Math.abs(at.drainToSource) / Math.abs(at.drainCurrent)),
  /** The larger forward current of the two junctions, A; 0 where neither conducts. */
  forwardJunction: (at) => Math.max(at.drainJunctionCurrent, at.sourceJunctionCurrent, 0),
};

const ofBipolar: Readonly<Record<string, Quantity<BipolarOperating>>> = {
  /** |V_CE|, V. */
  drop: (at) => Math.abs(at.collectorToEmitter),
  active: (at) => (at.region === 'active' ? 1 : 0),
  saturated: (at) => (at.region === 'saturated' ? 1 : 0),
  /** |I_C|, A. */
  currentMagnitude: (at) => Math.abs(at.collectorCurrent),
  /** |I_B|, A. */
  baseMagnitude: (at) => Math.abs(at.baseCurrent),
  /** |I_C|/|I_B|; 0 where neither flows. */
  forcedGain: (at) => (at.collectorCurrent === 0 ? 0 : Math.abs(at.collectorCurrent / at.baseCurrent)),
};

const derived: Readonly<Record<string, Readonly<Record<string, Quantity<never>>>>> = {
  mosfet: ofMosfet,
  bipolar: ofBipolar,
};

/**
 * One quantity of an operating point, SI.
 *
 * @param law name of the element's law
 * @param operating what the law read
 * @returns NaN where the law has no such quantity; a `Limit` is never kept by that
 */
export const measure = (law: string, operating: unknown, quantity: string): number => {
  const own = derived[law]?.[quantity];
  if (own !== undefined) return own(operating as never);
  if (typeof operating !== 'object' || operating === null) return Number.NaN;
  const figure = (operating as Readonly<Record<string, unknown>>)[quantity];
  if (typeof figure === 'boolean') return figure ? 1 : 0;
  return typeof figure === 'number' ? figure : Number.NaN;
};
