import { describe, expect, it } from 'vitest';
import { prepare, settle, type Circuit, type Settlement } from '../../solver/index.ts';
import { randomCircuit } from './solver-random-circuits.ts';

/** `RESTPOINT_SOAK=1` tries them all. */
const count = process.env.RESTPOINT_SOAK === '1' ? 20_000 : 400;
const temperature = 298.15;

const settled = (circuit: Circuit, seed: number): Settlement => {
  const prepared = prepare(circuit);
  if (!prepared.ok)
    throw new Error(`seed ${seed}: ${prepared.faults.map((fault) => fault.message).join('; ')}`);
  const result = settle(prepared.value, { temperature, findUnset: false });
  if (!result.settled) throw new Error(`seed ${seed}: ${result.message}`);
  return result;
};

const rails = (circuit: Circuit): readonly number[] =>
  circuit.elements
    .filter((element) => element.law.name === 'voltage-source')
    .map((element) => element.values[0] ?? Number.NaN);

/** The same circuit with its nodes in another order: `order[k]` is the new number of node k, the reference kept. */
const renumbered = (circuit: Circuit): { circuit: Circuit; order: readonly number[] } => {
  const last = circuit.nodes.length - 1;
  const order = circuit.nodes.map((_, node) => (node === 0 ? 0 : last + 1 - node));
  const nodes = [...circuit.nodes];
  order.forEach((place, node) => (nodes[place] = circuit.nodes[node] ?? ''));
  const elements = [...circuit.elements]
    .reverse()
    .map((element) => ({ ...element, nodes: element.nodes.map((node) => order[node] ?? Number.NaN) }));
  return { circuit: { nodes, elements }, order };
};

describe.each(['square', 'smooth'] as const)('random circuits of 1 to 12 transistors, %s law', (law) => {
  it('all settle, 99 of 100 by Newton alone, inside the hull of the rails, with powers that sum to nothing', () => {
    let direct = 0;
    for (let seed = 1; seed <= count; seed++) {
      const circuit = randomCircuit(seed, { law });
      const result = settled(circuit, seed);
      if (result.method === 'direct') direct++;
      const low = Math.min(0, ...rails(circuit));
      const high = Math.max(0, ...rails(circuit));
      for (const volts of result.voltages) {
        expect(volts, `seed ${seed}`).toBeGreaterThanOrEqual(low - 1e-9);
        expect(volts, `seed ${seed}`).toBeLessThanOrEqual(high + 1e-9);
      }
      // Tellegen's theorem. A femtoampere a node at the rails' voltage is what acceptance allows where nothing flows.
      let [sum, magnitude] = [0, 0];
      for (const element of circuit.elements) {
        const currents = result.terminalCurrents(element);
        let power = 0;
        element.nodes.forEach((node, terminal) => {
          power += (result.voltages[node] ?? Number.NaN) * (currents[terminal] ?? Number.NaN);
        });
        sum += power;
        magnitude += Math.abs(power);
      }
      const floor = circuit.nodes.length * 2e-15 * Math.max(high, -low);
      expect(Math.abs(sum), `seed ${seed}`).toBeLessThanOrEqual(1e-9 * magnitude + floor);
    }
    expect(direct / count).toBeGreaterThanOrEqual(0.99);
  });

  it('rest where they rest whatever the order of nodes and elements, where Newton finds one rest point alike', () => {
    let compared = 0;
    for (let seed = 1; seed <= Math.ceil(count / 4); seed++) {
      const original = randomCircuit(seed, { law });
      const { circuit, order } = renumbered(original);
      const [one, other] = [settled(original, seed), settled(circuit, seed)];
      if (one.method !== 'direct' || other.method !== 'direct') continue;
      compared++;
      one.voltages.forEach((volts, node) => {
        const found = other.voltages[order[node] ?? 0] ?? Number.NaN;
        expect(Math.abs(found - volts), `seed ${seed}, ${original.nodes[node] ?? ''}`).toBeLessThanOrEqual(
          1e-6,
        );
      });
    }
    expect(compared).toBeGreaterThan(count / 5);
  });
});
