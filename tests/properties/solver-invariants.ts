/** What must hold of every settled circuit whatever it is, each measured as a number that the tests bound. */
import {
  prepare,
  settle,
  type Circuit,
  type Element,
  type MosfetOperating,
  type Prepared,
  type SettleOptions,
  type SettleResult,
  type Settlement,
} from '../../solver/index.ts';

export const room = { temperature: 298.15, findUnset: false } as const;

export function prepared(circuit: Circuit): Prepared {
  const preparation = prepare(circuit);
  if (!preparation.ok) throw new Error(preparation.faults.map(({ message }) => message).join('; '));
  return preparation.value;
}

export const settleFresh = (circuit: Circuit, options: Partial<SettleOptions> = {}): SettleResult =>
  settle(prepared(circuit), { ...room, ...options });

/** No less than the element's largest conductance at these voltages, S; from its parameters alone. */
function conductanceBound(element: Element, volts: number, amperes: number): number {
  const value = (name: string): number => element.values[element.law.parameters.indexOf(name)] ?? 0;
  switch (element.law.name) {
    case 'resistor':
      return 1 / value('resistance');
    case 'mosfet': {
      const channel = value('gainFactor') * 2 * volts * (1 + value('lengthModulation') * 2 * volts);
      // A series resistance of 0 beside one that is not counts as 1 mΩ.
      const series = element.law.internals.length > 0 ? 1e3 : 0;
      return channel + series + amperes / 0.025;
    }
    default:
      return amperes / 0.025; // a junction: I/U_T
  }
}

/** What circulates in an element from one junction through its channel to another, and shows at no terminal, A. */
function currentsInside(element: Element, point: Settlement): number {
  if (element.law.internals.length === 0) return 0;
  const { channelCurrent } = point.operating(element as Element<MosfetOperating>);
  return Math.abs(channelCurrent);
}

/** By node: the sum of its currents, and 1e-9·Σ|I| and 1e-15·Σ|G||V| + 1e-15 A of the rule of acceptance, A. */
function nodeSums(circuit: Circuit, point: Settlement) {
  const sums = circuit.nodes.map(() => ({ sum: 0, currents: 0, rounding: 1e-15 }));
  for (const element of circuit.elements) {
    const currents = point.terminalCurrents(element);
    const inside = currentsInside(element, point);
    const amperes = Math.max(inside, ...Array.from(currents, Math.abs));
    const volts = Math.max(...element.nodes.map((node) => Math.abs(point.voltages[node] ?? NaN)));
    const rounding = 1e-15 * conductanceBound(element, volts, amperes) * 2 * volts;
    element.nodes.forEach((node, terminal) => {
      const here = sums[node];
      const current = currents[terminal] ?? NaN;
      if (!here) return;
      here.sum += current;
      here.currents += Math.abs(current) + 2 * inside;
      here.rounding += rounding;
    });
  }
  return sums;
}

/** Worst node's sum of currents, as a part of what acceptance allows: Kirchhoff, summed from the elements here. */
export const currentLaw = (circuit: Circuit, point: Settlement): number =>
  Math.max(
    ...nodeSums(circuit, point)
      .slice(1)
      .map(({ sum, currents, rounding }) => Math.abs(sum) / (1e-9 * currents + rounding)),
  );

/** The sum of all powers, zero by Tellegen's theorem, as a part of 1e-9 of their magnitudes and of the rounding. */
export function powerBalance(circuit: Circuit, point: Settlement): number {
  let sum = 0;
  let size = 0;
  for (const element of circuit.elements) {
    const currents = point.terminalCurrents(element);
    let power = 0;
    element.nodes.forEach((node, terminal) => {
      power += (point.voltages[node] ?? NaN) * (currents[terminal] ?? NaN);
    });
    sum += power;
    size += Math.abs(power);
  }
  let rounding = 0;
  nodeSums(circuit, point).forEach(
    (node, k) => (rounding += Math.abs(point.voltages[k] ?? NaN) * node.rounding),
  );
  return Math.abs(sum) / (1e-9 * size + rounding);
}

/** How far the farthest node lies outside the rails, V; the rails being `V1` and `V2` against ground. */
export function outsideRails(circuit: Circuit, point: Settlement): number {
  const rails = [
    0,
    ...circuit.elements
      .filter(({ law }) => law.name === 'voltage-source')
      .map(({ values }) => values[0] ?? 0),
  ];
  const low = Math.min(...rails);
  const high = Math.max(...rails);
  return Math.max(...Array.from(point.voltages, (v) => Math.max(v - high, low - v, 0)));
}

/** The same circuit with its nodes numbered and its elements listed the other way round; ground stays node 0. */
export function renumbered(circuit: Circuit): { circuit: Circuit; nodeOf: (node: number) => number } {
  const count = circuit.nodes.length;
  const nodeOf = (node: number) => (node === 0 ? 0 : count - node);
  const nodes = circuit.nodes.map((_, node) => circuit.nodes[nodeOf(node)] ?? '');
  const elements = circuit.elements.map((element) => ({
    ...element,
    nodes: element.nodes.map(nodeOf),
    values: element.values.slice(),
  }));
  return { circuit: { nodes, elements: elements.reverse() }, nodeOf };
}

/** A copy with some values changed; `change` is given each value by its parameter's name. */
const changed = (
  element: Element,
  change: (name: string, value: number) => number,
  nodes: readonly number[] = element.nodes,
): Element => ({
  ...element,
  nodes,
  values: element.values.map((value, k) => change(element.law.parameters[k] ?? '', value)),
});

/** The circuit with every polarity turned: n for p, rails negative, diodes the other way. Voltages all change sign. */
export function mirrored(circuit: Circuit): Circuit {
  const turned = new Set(['polarity', 'threshold', 'thresholdTemperatureCoefficient']);
  return {
    nodes: circuit.nodes,
    elements: circuit.elements.map((element) => {
      switch (element.law.name) {
        case 'mosfet':
          return changed(element, (name, value) => (turned.has(name) ? -value : value));
        case 'voltage-source':
          return changed(element, (name, value) => (name === 'voltage' ? -value : value));
        case 'diode':
          return changed(element, (_, value) => value, [...element.nodes].reverse());
        default:
          return element;
      }
    }),
  };
}

/** The circuit with every current 1/factor of what it was at the same voltages. The leak must be scaled alike. */
export function currentsDivided(circuit: Circuit, factor: number): Circuit {
  const divided = new Set(['gainFactor', 'saturationCurrent']);
  const multiplied = new Set(['resistance', 'seriesResistance', 'drainResistance', 'sourceResistance']);
  return {
    nodes: circuit.nodes,
    elements: circuit.elements.map((element) =>
      changed(element, (name, value) =>
        divided.has(name) ? value / factor : multiplied.has(name) ? value * factor : value,
      ),
    ),
  };
}

/** The greatest current in any element, A. */
export const greatestCurrent = (circuit: Circuit, point: Settlement): number =>
  Math.max(...circuit.elements.flatMap((element) => Array.from(point.terminalCurrents(element), Math.abs)));

/** Greatest difference of node voltages, as a part of 1 V or of the voltage where that is more. */
export function difference(
  a: Settlement,
  b: Settlement,
  inB: (node: number) => number = (node) => node,
  sign: 1 | -1 = 1,
): number {
  let worst = 0;
  a.voltages.forEach((v, node) => {
    const other = sign * (b.voltages[inB(node)] ?? NaN);
    worst = Math.max(worst, Math.abs(v - other) / Math.max(1, Math.abs(v)));
  });
  return worst;
}
