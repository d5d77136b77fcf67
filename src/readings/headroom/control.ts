import { prepare, settle, voltageSource } from '../../../solver/index.ts';
import type { Element, Prepared } from '../../../solver/index.ts';
import { measure } from '../../../solver/questions/quantities.ts';
import { bracketedRoot } from './bracketedRoot.ts';

/** Which terminals of a transistor's element steer it and are steered against. */
const shapes = {
  mosfet: { control: 1, against: 2, carries: 'channelCurrent' },
  bipolar: { control: 1, against: 2, carries: 'collectorCurrent' },
} as const;

/** V: beyond this no control voltage is looked for. */
const furthest = 1000;

/**
 * One transistor by itself, every terminal held by a source of its own: the device's law at any voltages, series
 * resistances included. Prepared once, used for as many points as are asked.
 */
export class TransistorProbe {
  readonly #element: Element;
  readonly #sources: readonly Element[];
  readonly #prepared: Prepared;
  #start: Float64Array | null = null;

  constructor(element: Element) {
    this.#element = { ...element, nodes: element.nodes.map((_, terminal) => terminal + 1) };
    this.#sources = element.nodes.map((_, terminal) =>
      voltageSource(`${element.name}.${terminal}`, [terminal + 1, 0], { voltage: 0 }),
    );
    const prepared = prepare({
      nodes: ['reference', ...element.law.terminals],
      elements: [this.#element, ...this.#sources],
    });
    if (!prepared.ok)
      throw new Error(`${element.name} cannot be probed: ${prepared.faults[0]?.message ?? ''}`);
    this.#prepared = prepared.value;
  }

  /**
   * The voltage between control and source (base and emitter) at which the law carries `current` with every other
   * voltage as it is, less the voltage there now, in the sense that turns the transistor on.
   *
   * @param voltages of the element's terminals, V
   * @param current magnitude, A
   * @param polarity +1 where a positive control voltage turns it on
   * @param temperature K
   * @returns V, positive while less than `current` flows; null where no control voltage carries it
   */
  headroom(
    voltages: readonly number[],
    current: number,
    polarity: 1 | -1,
    temperature: number,
  ): number | null {
    const shape = shapes[this.#element.law.name === 'bipolar' ? 'bipolar' : 'mosfet'];
    const carried = (more: number): number => {
      this.#sources.forEach((source, terminal) => {
        const own = voltages[terminal] ?? 0;
        source.values[0] = terminal === shape.control ? own + polarity * more : own;
      });
      const result = settle(this.#prepared, {
        temperature,
        findUnset: false,
        ...(this.#start === null ? {} : { start: this.#start }),
      });
      if (!result.settled) return Number.NaN;
      this.#start = result.state;
      const operating = result.operating(this.#element);
      const carries = Math.abs(measure(this.#element.law.name, operating, shape.carries));
      // A saturated channel's root is straight in the control voltage, and the place of the root is the same.
      return Math.sqrt(carries) - Math.sqrt(current);
    };
    const now = carried(0);
    if (Number.isNaN(now)) return null;
    if (now === 0) return 0;
    const direction = now < 0 ? 1 : -1;
    let step = 0.1;
    let last = { x: 0, y: now };
    while (Math.abs(last.x) < furthest) {
      const x = last.x + direction * step;
      const y = carried(x);
      if (Number.isNaN(y)) return null;
      if (y > 0 !== now > 0) return bracketedRoot(carried, last, { x, y }, 1e-10);
      last = { x, y };
      step *= 2;
    }
    return null;
  }
}
