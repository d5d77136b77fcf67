/**
 * The frame around a channel law: polarity, exchange of drain and source, body junctions, the declared leak,
 * series resistances, limiting, region. A p-channel is the n-channel with every voltage and current reversed.
 */
import { REFERENCE_TEMPERATURE } from './constants.ts';
import {
  deriveShockley,
  evaluateJunction,
  JUNCTION_SIZE,
  junctionResult,
  limitJunction,
} from './junction.ts';
import {
  absorbedPower,
  Phase,
  type ElementLaw,
  type LocalEntry,
  type ReadingPoint,
  type Workspace,
} from './law.ts';
import {
  bodyThreshold,
  CHANNEL_SIZE,
  channelResult,
  deriveChannel,
  mosfetParameters,
  type Channel,
} from './mosfet-channel.ts';
import type { MosfetOperating } from './mosfet-operating.ts';

// Local unknowns.
const DRAIN = 0;
const GATE = 1;
const SOURCE = 2;
const BODY = 3;
const INNER_DRAIN = 4;
const INNER_SOURCE = 5;

// Places in `derived`.
const POLARITY = 0;
const LEAK = 1;
const DRAIN_CONDUCTANCE = 2;
const SOURCE_CONDUCTANCE = 3;
const CHANNEL = 4;
const JUNCTION = CHANNEL + CHANNEL_SIZE;
const DERIVED_SIZE = JUNCTION + JUNCTION_SIZE;

// Places in `memory`.
const DRAIN_JUNCTION = 0;
const SOURCE_JUNCTION = 1;
/** ±1: the roles at the last evaluation; 0 before the first. */
const ROLES = 2;
const MEMORY_SIZE = 3;

/** Overdrive at which a channel is first evaluated, V: below threshold the square law has no slope to learn from. */
const START_OVERDRIVE = 0.5;
/** Least conductance of a stated series resistance's partner that is 0, Ω. */
const SERIES_FLOOR = 1e-3;

/** Channel: rows drain and source against drain, gate, source, body. */
const channelPattern = (drain: number, source: number): LocalEntry[] =>
  [drain, source].flatMap((row): LocalEntry[] => [drain, GATE, source, BODY].map((column) => [row, column]));

/** A conductance between two local unknowns. */
const conductanceEntries = (a: number, b: number): LocalEntry[] => [
  [a, a],
  [a, b],
  [b, a],
  [b, b],
];

// Places in an element's slots.
const CHANNEL_SLOTS = 0;
const DRAIN_JUNCTION_SLOTS = 8;
const SOURCE_JUNCTION_SLOTS = 12;
const DRAIN_SERIES_SLOTS = 16;
const SOURCE_SERIES_SLOTS = 20;

/** The whole law of a MOSFET with the given channel, with or without series resistances. */
export function mosfetLaw(channel: Channel, series: boolean): ElementLaw<MosfetOperating> {
  const channelDrain = series ? INNER_DRAIN : DRAIN;
  const channelSource = series ? INNER_SOURCE : SOURCE;
  const width = series ? 6 : 4;
  const pattern = [
    ...channelPattern(channelDrain, channelSource),
    ...conductanceEntries(DRAIN, BODY),
    ...conductanceEntries(SOURCE, BODY),
    ...(series
      ? [...conductanceEntries(DRAIN, INNER_DRAIN), ...conductanceEntries(SOURCE, INNER_SOURCE)]
      : []),
  ];

  return {
    name: 'mosfet',
    terminals: ['drain', 'gate', 'source', 'body'],
    parameters: mosfetParameters,
    internals: series ? ['inner-drain', 'inner-source'] : [],
    behind: series ? [DRAIN, SOURCE] : [],
    branches: [],
    pattern,
    senses: [GATE],
    derivedSize: DERIVED_SIZE,
    memorySize: MEMORY_SIZE,

    paths(values) {
      const n = values[POLARITY]! > 0;
      const junction = (end: number) =>
        ({ kind: 'junction', from: n ? BODY : end, to: n ? end : BODY }) as const;
      return [
        { kind: 'channel', from: channelDrain, to: channelSource },
        junction(DRAIN),
        junction(SOURCE),
        ...(series
          ? ([
              { kind: 'passive', from: DRAIN, to: INNER_DRAIN },
              { kind: 'passive', from: SOURCE, to: INNER_SOURCE },
            ] as const)
          : []),
      ];
    },

    derive(values, { temperature, leak }, derived, at) {
      const rise = (temperature / REFERENCE_TEMPERATURE) ** 2.3;
      derived[at + POLARITY] = values[0]!;
      derived[at + LEAK] = leak;
      derived[at + DRAIN_CONDUCTANCE] = 1 / Math.max(values[8]! * rise, SERIES_FLOOR);
      derived[at + SOURCE_CONDUCTANCE] = 1 / Math.max(values[9]! * rise, SERIES_FLOOR);
      deriveChannel(values, temperature, derived, at + CHANNEL);
      deriveShockley(values[10]!, values[11]!, values[12]!, values[13]!, temperature, derived, at + JUNCTION);
    },

    load(work, batch) {
      const { residual, derived } = work;
      let { unknown: u, slot: s, derived: d, memory: m } = batch;
      for (let k = 0; k < batch.count; k++) {
        residual.fill(0, u, u + width);
        loadChannel(channel, work, u, u + channelDrain, u + channelSource, s + CHANNEL_SLOTS, d, m);
        loadJunction(work, u + DRAIN, u + BODY, s + DRAIN_JUNCTION_SLOTS, d, m + DRAIN_JUNCTION);
        loadJunction(work, u + SOURCE, u + BODY, s + SOURCE_JUNCTION_SLOTS, d, m + SOURCE_JUNCTION);
        if (series) {
          const drainConductance = derived[d + DRAIN_CONDUCTANCE]!;
          const sourceConductance = derived[d + SOURCE_CONDUCTANCE]!;
          loadConductance(work, u + DRAIN, u + INNER_DRAIN, s + DRAIN_SERIES_SLOTS, drainConductance);
          loadConductance(work, u + SOURCE, u + INNER_SOURCE, s + SOURCE_SERIES_SLOTS, sourceConductance);
        }
        u += width;
        s += pattern.length;
        d += DERIVED_SIZE;
        m += MEMORY_SIZE;
      }
    },

    read: (at) => readMosfet(channel, channelDrain, channelSource, at),
  };
}

/** Channel between the places `drain` and `source`, with its leak in parallel. */
function loadChannel(
  channel: Channel,
  work: Workspace,
  u: number,
  drain: number,
  source: number,
  slot: number,
  d: number,
  m: number,
): void {
  const { x, residual, jacobian, derived, memory, phase } = work;
  const polarity = derived[d + POLARITY]!;
  const across = polarity * (x[drain]! - x[source]!);
  const reversed = across < 0;

  // --- In the channel's own coordinates: roles such that V_DS ≥ 0 ---
  const lower = reversed ? drain : source;
  const vds = reversed ? -across : across;
  const vgs = polarity * (x[u + GATE]! - x[lower]!);
  const vsb = polarity * (x[lower]! - x[u + BODY]!);
  let evaluated = vgs;
  if (phase !== Phase.exact) {
    if (phase === Phase.start) {
      evaluated = bodyThreshold(derived, d + CHANNEL, vsb) + START_OVERDRIVE;
      work.limited = true;
    }
    const roles = reversed ? -1 : 1;
    // The junctions' remembered points belong to the roles in which they were met.
    if (memory[m + ROLES] === -roles) memory[m + DRAIN_JUNCTION] = memory[m + SOURCE_JUNCTION] = NaN;
    memory[m + ROLES] = roles;
  }
  channel.evaluate(derived, d + CHANNEL, evaluated, vds, vsb);
  const leak = derived[d + LEAK]!;
  const toGate = channelResult[1]!;
  const toDrain = channelResult[2]! + leak;
  const toBody = -channelResult[3]!;
  const toSource = -(toGate + toDrain + toBody);
  // Linearised from the evaluated point to x.
  const current = channelResult[0]! + leak * vds + toGate * (vgs - evaluated);

  // --- Back to the terminals: the current flows from the end acting as drain to the other ---
  const flow = reversed ? -polarity * current : polarity * current;
  residual[drain]! += flow;
  residual[source]! -= flow;
  const high = reversed ? slot + 4 : slot;
  const low = reversed ? slot : slot + 4;
  const highColumn = reversed ? 2 : 0;
  const lowColumn = 2 - highColumn;
  jacobian[high + highColumn] = toDrain;
  jacobian[high + 1] = toGate;
  jacobian[high + lowColumn] = toSource;
  jacobian[high + 3] = toBody;
  jacobian[low + highColumn] = -toDrain;
  jacobian[low + 1] = -toGate;
  jacobian[low + lowColumn] = -toSource;
  jacobian[low + 3] = -toBody;
}

/** Junction between the places `end` and `body`, with its leak in parallel; conducts from body to end for n. */
function loadJunction(work: Workspace, end: number, body: number, slot: number, d: number, m: number): void {
  const { x, residual, derived, memory, phase } = work;
  const polarity = derived[d + POLARITY]!;
  const voltage = polarity * (x[body]! - x[end]!);
  let evaluated = voltage;
  if (phase !== Phase.exact) {
    if (phase === Phase.limit) {
      const from = memory[m]!;
      // NaN: nothing remembered since the roles changed.
      evaluated = limitJunction(derived, d + JUNCTION, Number.isNaN(from) ? 0 : from, voltage);
    } else if (phase === Phase.start) {
      evaluated = Math.min(voltage, 0);
    }
    if (evaluated !== voltage) work.limited = true;
    memory[m] = evaluated;
  }
  evaluateJunction(derived, d + JUNCTION, evaluated);
  const leak = derived[d + LEAK]!;
  const conductance = junctionResult[1]! + leak;
  const flow = polarity * (junctionResult[0]! + leak * evaluated + conductance * (voltage - evaluated));
  residual[body]! += flow;
  residual[end]! -= flow;
  writeConductance(work.jacobian, slot, conductance);
}

function loadConductance(work: Workspace, a: number, b: number, slot: number, conductance: number): void {
  const { x, residual } = work;
  const current = conductance * (x[a]! - x[b]!);
  residual[a]! += current;
  residual[b]! -= current;
  writeConductance(work.jacobian, slot, conductance);
}

function writeConductance(jacobian: Float64Array, slot: number, conductance: number): void {
  jacobian[slot] = jacobian[slot + 3] = conductance;
  jacobian[slot + 1] = jacobian[slot + 2] = -conductance;
}

/** Current below which a junction does not count as carrying, A. */
const BODY_DIODE_FLOOR = 1e-9;

function readMosfet(
  channel: Channel,
  channelDrain: number,
  channelSource: number,
  at: ReadingPoint,
): MosfetOperating {
  const { unknowns: v, derived } = at;
  const polarity = derived[POLARITY]!;
  const across = polarity * (v[channelDrain]! - v[channelSource]!);
  const reversed = across < 0;
  const lower = reversed ? (channelSource === SOURCE ? DRAIN : INNER_DRAIN) : channelSource;
  const vds = Math.abs(across);
  const vgs = polarity * (v[GATE]! - v[lower]!);
  const vsb = polarity * (v[lower]! - v[BODY]!);
  channel.evaluate(derived, CHANNEL, vgs, vds, vsb);
  const [current = 0, toGate = 0, toDrain = 0, bySource = 0] = channelResult;
  const junction = (end: number): number => {
    evaluateJunction(derived, JUNCTION, polarity * (v[BODY]! - v[end]!));
    return junctionResult[0]!;
  };
  const drainJunctionCurrent = junction(DRAIN);
  const sourceJunctionCurrent = junction(SOURCE);
  const { threshold, saturationVoltage, cutoff, ...inversion } = channel.state(derived, CHANNEL, vgs, vsb);
  const strongest = Math.max(drainJunctionCurrent, sourceJunctionCurrent);
  const region =
    strongest > current && strongest > BODY_DIODE_FLOOR
      ? 'body-diode'
      : cutoff
        ? 'cutoff'
        : vds < saturationVoltage
          ? 'triode'
          : 'saturation';
  return {
    region,
    reversed,
    ...inversion,
    gateToSource: v[GATE]! - v[SOURCE]!,
    drainToSource: v[DRAIN]! - v[SOURCE]!,
    sourceToBody: v[SOURCE]! - v[BODY]!,
    threshold: polarity * threshold,
    overdrive: vgs - threshold,
    saturationVoltage,
    channelVoltage: vds,
    drainCurrent: polarity * at.currents[DRAIN]!,
    channelCurrent: reversed ? 0 - current : current,
    diodeCurrent: 0 - drainJunctionCurrent,
    drainJunctionCurrent,
    sourceJunctionCurrent,
    transconductance: toGate,
    bodyTransconductance: 0 - bySource,
    outputConductance: toDrain,
    power: absorbedPower(at),
  };
}
