import type { PartReadout } from '../parts/readout.ts';
import type { ReadingContext } from '../parts/kind.ts';
import type { CompiledPart, CompiledStage } from './compile.ts';
import { bipolarReserve } from './duty/conduct.ts';
import type { PartDuty } from './duty/partDuty.ts';
import type { Point } from './point.ts';
import { junctionTemperature } from './ratings.ts';
import type { BipolarReading, DutyReading, Figure, MosfetReading, PartReading } from './readings.ts';

/** −0 is 0 to whoever reads it. */
export const plain = (value: number): number => value + 0;

/** What a kind reads off its part at a settled point. Voltages of nodes that nothing electrical reaches are NaN. */
export const readoutOf = (compiled: CompiledStage, part: CompiledPart, point: Point): PartReadout => {
  const { settlement } = point;
  const currents = part.elements.map((element) => settlement.terminalCurrents(element));
  const context: ReadingContext = {
    ...part.context,
    volts: (pin) => {
      const node = compiled.nodeOf(part.id, pin);
      return node === null ? Number.NaN : (settlement.voltages[node] ?? Number.NaN);
    },
    amps: (element, terminal) => currents[element]?.[terminal] ?? 0,
    operating: (element) => point.operating(part.firstElement + element),
  };
  return part.kind.readout(context);
};

/** Figures that are differences of pin voltages, with their pins: null where one of the pins is not set. */
const differences: Readonly<Record<string, readonly [string, string]>> = {
  gateToSource: ['gate', 'source'],
  drainToSource: ['drain', 'source'],
  sourceToBody: ['source', 'body'],
  baseToEmitter: ['base', 'emitter'],
  collectorToEmitter: ['collector', 'emitter'],
};
/** Figures that stay as they are where the leak decides the voltages: they are as small as the leak. */
const currents = new Set(['current', 'drainCurrent', 'collectorCurrent', 'baseCurrent']);

type Figures = Readonly<Record<string, string | number | boolean | null>>;

/** The figures of a part, those that the drawing does not set as null. */
const setFigures = (compiled: CompiledStage, part: CompiledPart, point: Point, figures: Figures): Figures => {
  const unset = part.elements.some((_, index) => point.unsetElement(part.firstElement + index));
  const dark = (pin: string): boolean => point.unsetNode(compiled.nodeOf(part.id, pin));
  // A single pin has no difference: its voltage is its node's.
  const single = part.pins.length === 1 && part.pins.some(dark);
  const value = (key: string, figure: string | number | boolean | null) => {
    if (typeof figure === 'number' && !Number.isFinite(figure)) return null;
    if (unset || single) {
      const pins = differences[key];
      if (pins !== undefined ? pins.some(dark) : typeof figure === 'number' && !currents.has(key))
        return null;
      if (key === 'region' && figure !== 'cutoff' && figure !== 'blocking') return null;
    }
    return typeof figure === 'number' ? plain(figure) : figure;
  };
  return Object.fromEntries(Object.entries(figures).map(([key, figure]) => [key, value(key, figure)]));
};

const junction = (duty: PartDuty | null, ambient: number, power: unknown): Figure =>
  duty === null || typeof power !== 'number' ? null : junctionTemperature(duty.ratings, ambient, power);

/**
 * The reading of a part as the contract states it, from what its kind reads.
 *
 * @param duty what is asked of it; null where nothing is
 * @param judged its verdict and headroom
 * @returns null for a part that has no figures of its own: a ground
 */
export const readPart = (
  compiled: CompiledStage,
  part: CompiledPart,
  readout: PartReadout,
  point: Point,
  duty: PartDuty | null,
  judged: DutyReading,
): PartReading | null => {
  const figures = setFigures(compiled, part, point, readout.figures as unknown as Figures);
  if (Object.keys(figures).length === 0) return null;
  const own = { id: part.id, kind: part.part.kind };
  const ambient = compiled.conditions.ambient.nominal;
  const temperature = junction(duty, ambient, figures.power);
  switch (readout.shape) {
    case 'mosfet':
      return { ...own, ...figures, junctionTemperature: temperature, ...judged } as unknown as MosfetReading;
    case 'bipolar': {
      const reserve =
        duty?.terms?.kind === 'conduct'
          ? { reserve: bipolarReserve(duty.element, duty.terms, point.measure) }
          : {};
      return {
        ...own,
        ...figures,
        junctionTemperature: temperature,
        ...judged,
        ...reserve,
      } as unknown as BipolarReading;
    }
    case 'diode':
      return { ...own, ...figures, junctionTemperature: temperature };
    case 'two-pin':
    case 'supply':
      return { ...own, ...figures };
    case 'other':
      return { ...own, ...figures };
  }
};
