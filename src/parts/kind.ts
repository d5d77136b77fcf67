/**
 * The interface of a part kind. One file in this folder describes one kind entirely: what it is called, how it is
 * drawn, what a person may state of it, what it is to the solver, and what is read off it. The catalogue lists them.
 *
 * SI units. Temperature is no part's business: the solver is told the temperature of each element, in kelvin.
 */
import type { z } from 'zod';
import type { Element } from '../../solver/circuit.ts';
import type { SymbolArt } from '../../symbols/art.ts';
import type { QuantityName } from '../values/quantities.ts';
import type { Fault, Result } from '../values/result.ts';
import type { Device, DeviceType } from './devices/device.ts';
import type { Field } from './field.ts';
import type { PartReadout } from './readout.ts';

/** The drawer of the store in which a kind lies. */
export type Family =
  'resistors' | 'stores' | 'sources' | 'transistors' | 'diodes' | 'loads' | 'wiring' | 'test points';

export type Law = 'square' | 'smooth';

/** A part's `values` as they stand in the document: as typed, validated by the kind's schema, a state's `set` applied. */
export type Values = Readonly<Record<string, unknown>>;

/** What a kind is told of one part, whatever its electrical surroundings. Enough to draw it. */
export interface PartContext {
  /** The part's name, or its id where it has none: for element names and messages. */
  readonly name: string;
  /** A rail's free label, which stands at it beside its name: `+12V`. */
  readonly label?: string;
  readonly values: Values;
  /** The device the part names, where its kind takes one. */
  readonly device?: Device;
  /** Pins on which a wire ends. */
  readonly wired: ReadonlySet<string>;
}

/** Numbers at hand, SI (°C for temperatures), by the keys of `draws`: nominal, or one corner, or one trial. */
export type Figures = Readonly<Record<string, number>>;

/** One quantity of a part that can be varied: by its spread, by a question, by a slider. */
export interface Draw {
  /** As in `R1.resistance`, `Q1.threshold`. */
  readonly key: string;
  readonly quantity: QuantityName;
  readonly value: number;
  /** Hard limits; equal to `value` where nothing is stated. */
  readonly low: number;
  readonly high: number;
  readonly sigma?: number;
  /** False where the figure is a default that nobody stated. */
  readonly stated: boolean;
}

/** What a kind needs in order to become elements. */
export interface ElectricalContext extends PartContext {
  readonly law: Law;
  /** A number for every key of `draws`. */
  readonly figures: Figures;
  /** The node of a pin. Every pin of `pins` has one, wired or not. */
  readonly node: (pin: string) => number;
}

/** What a kind needs in order to be read. */
export interface ReadingContext extends ElectricalContext {
  /** Solved voltage of a pin against the reference, V. */
  readonly volts: (pin: string) => number;
  /** Current into terminal `terminal` of the element at index `element` of `elements(context)`, A. */
  readonly amps: (element: number, terminal: number) => number;
  /** The operating values of that element, as its law's `read` gives them. */
  readonly operating: (element: number) => unknown;
}

/** One cell of a drawer: the kind with its starting values. */
export interface Variant {
  /** Unique in the catalogue, kebab case: `mosfet-n`, `battery`. */
  readonly key: string;
  readonly title: string;
  readonly values: Values;
  /** Device that a part set down from this cell starts with, where its kind takes one. */
  readonly device?: Device;
  /** Pins that count as brought out when the cell's symbol is drawn (a body lead). */
  readonly wired?: readonly string[];
}

export interface PartKind {
  /** As in the stage file: `current-source`. */
  readonly kind: string;
  readonly title: string;
  readonly family: Family;
  /** At least one. */
  readonly variants: readonly Variant[];
  /** Whether a part of this kind must have a name. */
  readonly nameNeeded: boolean;
  /** Whether several parts of this kind may bear one name. */
  readonly nameShared: boolean;
  /** Device types a part of this kind may name; none where it takes no device. */
  readonly deviceTypes: readonly DeviceType[];
  /** Whether a part of this kind can carry a duty. */
  readonly takesDuty: boolean;
  /** How the part makes a node beyond its wires: it is the reference, or is one with all of its name or its label. */
  readonly joins: 'nothing' | 'reference' | 'name' | 'label';
  /** Strict schema of `values`. Where it accepts `{}`, `values` may be left out. */
  readonly values: z.ZodObject;
  /** The same values for forms, in order. */
  readonly fields: readonly Field[];

  /**
   * What is wrong between values, device and pins, beyond the schema: a width left out where the device needs one.
   * Paths are relative to the part: `values.width`.
   */
  check(context: PartContext): readonly Fault[];

  /** Letters of the reference designator (IEEE Std 315-1975, section 22). */
  designator(context: PartContext): string;
  /** Pin names and offsets in grid units, turn 0, not mirrored. The same as the symbol's. */
  pins(context: PartContext): SymbolArt['pins'];
  symbol(context: PartContext): SymbolArt;
  /** Lines of text at the symbol, as a person stated them: `4k7`, `240 Ω`. */
  text(context: PartContext): readonly string[];

  /**
   * Everything about the part that can be varied. Depends on values, device and law, not on the surroundings.
   * Faults: a device whose facts allow no fit.
   */
  draws(context: PartContext, law: Law): Result<readonly Draw[]>;
  /**
   * What is assumed about the part because nobody stated it: clauses without the part's name, alike for parts on which
   * the same is assumed, so that a record can say `Q1, Q2: length modulation 0 (not stated)`.
   */
  assumptions(context: PartContext, law: Law): readonly string[];

  /**
   * The part as solver elements. Number, order, laws and nodes are the same for the same values-as-structure (pins
   * wired, switch closed, level of an output, device); other figures only change `Element.values`.
   */
  elements(context: ElectricalContext): readonly Element[];
  /** Index in `elements` of the element that carries the part's own law (a transistor's channel); null where none. */
  readonly principal: number | null;
  readout(context: ReadingContext): PartReadout;
}
