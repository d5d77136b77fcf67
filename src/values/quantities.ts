/**
 * The quantities a value can be of: unit, symbol, and the range that is allowed, in SI base units
 * (temperatures in °C). The ranges that src/stage/stage-file.md names are the file's contract.
 */
export interface Quantity {
  /** The quantity's own unit as it is written; empty for a pure number. */
  readonly unit: string;
  /** The symbol the literature uses, as it stands on the screen. */
  readonly symbol: string;
  /** Lowest and highest value allowed, both included. */
  readonly range: readonly [low: number, high: number];
  /** Other ways of writing the unit, and what one of them is worth in the quantity's own unit. */
  readonly aliases?: Readonly<Record<string, number>>;
  /** Whether SI prefixes make sense before the unit when it is written (`mV`, but not `m°C`). */
  readonly prefixed: boolean;
  /** Whose letters the marking code of IEC 60062 uses for this quantity. */
  readonly code?: 'resistance' | 'capacitance';
}

const ohm = { unit: 'Ω', aliases: { '\u2126': 1, ohm: 1, ohms: 1, Ohm: 1 }, prefixed: true } as const;
const volt = { unit: 'V', symbol: 'V', prefixed: true } as const;
const ampere = { unit: 'A', symbol: 'I', prefixed: true } as const;
const farad = { unit: 'F', symbol: 'C', prefixed: true } as const;
const pure = { unit: '', aliases: { '%': 0.01 }, prefixed: false } as const;
const celsius = { unit: '°C', aliases: { '\u2103': 1, degC: 1 }, prefixed: false } as const;
const gainUnit = { unit: 'A/V²', aliases: { 'A/V2': 1, 'A/V^2': 1 }, prefixed: true } as const;

export const quantities = {
  resistance: { ...ohm, symbol: 'R', range: [1e-3, 100e9], code: 'resistance' },
  /** A resistance inside a device, where none at all is usual. */
  seriesResistance: { ...ohm, symbol: 'R', range: [0, 100e9], code: 'resistance' },
  capacitance: { ...farad, range: [1e-15, 10], code: 'capacitance' },
  /** The inductor's code is common practice: IEC 60062 itself covers resistances and capacitances. */
  inductance: { unit: 'H', symbol: 'L', range: [1e-9, 1e3], prefixed: true, code: 'capacitance' },
  voltage: { ...volt, range: [-10e3, 10e3] },
  voltageMagnitude: { ...volt, range: [0, 10e3] },
  current: { ...ampere, range: [-10e3, 10e3] },
  currentMagnitude: { ...ampere, range: [0, 10e3] },
  power: { unit: 'W', symbol: 'P', range: [0, 1e6], prefixed: true },
  temperature: { ...celsius, symbol: 'T', range: [-100, 300] },
  tolerance: { ...pure, symbol: '', range: [0, 0.99] },
  /** A part of a whole, 0 … 1. */
  fraction: { ...pure, symbol: '', range: [0, 1] },
  /** How often something goes into something else. */
  ratio: { ...pure, symbol: '', range: [0, 1e6] },
  gain: { unit: '', aliases: { 'V/V': 1, 'A/A': 1 }, symbol: 'A', range: [-1e12, 1e12], prefixed: true },
  currentGain: { unit: '', symbol: 'h_FE', range: [1e-3, 1e6], prefixed: true },
  transconductance: { unit: 'S', aliases: { 'A/V': 1 }, symbol: 'g_m', range: [-1e4, 1e4], prefixed: true },
  conductance: { unit: 'S', aliases: { 'A/V': 1 }, symbol: 'g', range: [0, 1e6], prefixed: true },
  gainFactor: { ...gainUnit, symbol: 'β', range: [1e-12, 1e4] },
  processTransconductance: { ...gainUnit, symbol: 'k′', range: [1e-12, 1e4] },
  threshold: { ...volt, symbol: 'V_T0', range: [-100, 100] },
  lengthModulation: { unit: '1/V', aliases: { '/V': 1 }, symbol: 'λ', range: [0, 1], prefixed: false },
  bodyFactor: { unit: '√V', aliases: { 'V^0.5': 1 }, symbol: 'γ', range: [0, 10], prefixed: false },
  surfacePotential: { ...volt, symbol: '2φ_F', range: [0.1, 2] },
  slopeFactor: { unit: '', symbol: 'n', range: [1, 3], prefixed: false },
  emissionCoefficient: { unit: '', symbol: 'n', range: [0.5, 10], prefixed: false },
  saturationCurrent: { ...ampere, symbol: 'I_S', range: [1e-40, 1] },
  bandGap: { unit: 'eV', symbol: 'E_g', range: [0.1, 10], prefixed: true },
  earlyVoltage: { ...volt, symbol: 'V_A', range: [0.1, 1e6] },
  length: { unit: 'm', symbol: 'L', range: [1e-9, 0.1], prefixed: true },
  temperatureCoefficient: {
    unit: '1/K',
    aliases: { '/K': 1, 'ppm/K': 1e-6, 'ppm/°C': 1e-6, '%/K': 0.01, '%/°C': 0.01 },
    symbol: 'α',
    range: [-1, 1],
    prefixed: false,
  },
  voltageTemperatureCoefficient: {
    unit: 'V/K',
    aliases: { 'V/°C': 1 },
    symbol: 'a',
    range: [-1, 1],
    prefixed: true,
  },
  thermalResistance: {
    unit: 'K/W',
    aliases: { '°C/W': 1 },
    symbol: 'R_θ',
    range: [1e-3, 1e5],
    prefixed: false,
  },
  derating: { unit: 'W/K', aliases: { 'W/°C': 1 }, symbol: '', range: [0, 1e4], prefixed: true },
  frequency: { unit: 'Hz', symbol: 'f', range: [0, 1e12], prefixed: true },
} as const satisfies Readonly<Record<string, Quantity>>;

export type QuantityName = keyof typeof quantities;

/** The quantity of that name, in its general shape. */
export const quantityOf = (name: QuantityName): Quantity => quantities[name];

/** The name in plain words: `gainFactor` is "gain factor". */
export const wordsOf = (name: QuantityName): string =>
  name.replace(/[A-Z]/g, (capital) => ` ${capital.toLowerCase()}`);
