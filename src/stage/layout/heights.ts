/** How high each net belongs between the rails: what decides which end of a part is drawn up. */
import { blocksDirectCurrent, carryingPins, isSource, type Circuit, type Net } from './circuit.ts';

/** Holds nets that nothing else holds near the middle. */
const leak = 1e-9;

/**
 * Heights of all nets, 1 at the top rail, 0 at ground, −1 at a negative rail: the potentials of the circuit with
 * every part that carries current taken as a conductance of one (nodal analysis of a resistive network; Gaussian
 * elimination with the diagonal as pivot, which is dominant).
 */
export const heightsOf = (circuit: Circuit): ReadonlyMap<Net, number> => {
  const merged = mergedNets(circuit);
  const heights = new Map<Net, number>();
  const unknown = new Map<Net, number>();
  for (const net of circuit.nets) {
    const one = merged.get(net) ?? net;
    if (unknown.has(one) || heights.has(one)) continue;
    if (one.power === null) unknown.set(one, unknown.size);
    else heights.set(one, one.power === 'top' ? 1 : hasGround(one) ? 0 : -1);
  }

  const size = unknown.size;
  const rows = Array.from({ length: size }, () => new Float64Array(size + 1));
  for (const row of rows.keys()) {
    const line = rows[row];
    if (line === undefined) continue;
    line[row] = leak;
    line[size] = leak / 2;
  }
  for (const unit of circuit.units) {
    const carrying = carryingPins(unit);
    if (carrying === undefined || blocksDirectCurrent(unit) || isSource(unit)) continue;
    const ends = [...unit.nets].filter(([pin]) => unit.role !== 'stack' || carrying.includes(pin));
    const nets = [...new Set(ends.map(([, net]) => merged.get(net) ?? net))];
    for (let index = 1; index < nets.length; index++) {
      const [a, b] = [nets[index - 1], nets[index]];
      if (a === undefined || b === undefined) continue;
      stamp(rows, size, unknown, heights, a, b);
      stamp(rows, size, unknown, heights, b, a);
    }
  }
  const solved = eliminate(rows, size);
  for (const [net, row] of unknown) heights.set(net, solved[row] ?? 0.5);
  for (const net of circuit.nets) heights.set(net, heights.get(merged.get(net) ?? net) ?? 0.5);
  return heights;
};

const hasGround = (net: Net): boolean => net.members.some(({ unit }) => unit.role === 'ground');

/** Tags and rails of one label are one net to the current. Each net to the first of its like. */
const mergedNets = (circuit: Circuit): ReadonlyMap<Net, Net> => {
  const merged = new Map<Net, Net>();
  const byLabel = new Map<string, Net>();
  const first = (net: Net): Net => {
    let one = net;
    for (let next = merged.get(one); next !== undefined; next = merged.get(one)) one = next;
    return one;
  };
  for (const unit of circuit.units) {
    if ((unit.role !== 'tag' && unit.role !== 'rail') || unit.label === undefined) continue;
    for (const net of unit.nets.values()) {
      const known = byLabel.get(unit.label);
      if (known === undefined) byLabel.set(unit.label, net);
      else if (first(known) !== first(net)) {
        const [one, other] =
          first(known).power === null ? [first(net), first(known)] : [first(known), first(net)];
        merged.set(other, one);
      }
    }
  }
  return new Map([...merged.keys()].map((net) => [net, first(net)]));
};

const stamp = (
  rows: readonly Float64Array[],
  size: number,
  unknown: ReadonlyMap<Net, number>,
  heights: ReadonlyMap<Net, number>,
  here: Net,
  there: Net,
): void => {
  const row = unknown.get(here);
  const line = row === undefined ? undefined : rows[row];
  if (row === undefined || line === undefined) return;
  line[row] = (line[row] ?? 0) + 1;
  const column = unknown.get(there);
  if (column === undefined) line[size] = (line[size] ?? 0) + (heights.get(there) ?? 0);
  else line[column] = (line[column] ?? 0) - 1;
};

const eliminate = (rows: readonly Float64Array[], size: number): Float64Array => {
  for (let pivot = 0; pivot < size; pivot++) {
    const line = rows[pivot];
    if (line === undefined) continue;
    for (let row = pivot + 1; row < size; row++) {
      const below = rows[row];
      const factor = (below?.[pivot] ?? 0) / (line[pivot] ?? 1);
      if (below === undefined || factor === 0) continue;
      for (let column = pivot; column <= size; column++) {
        below[column] = (below[column] ?? 0) - factor * (line[column] ?? 0);
      }
    }
  }
  const solved = new Float64Array(size);
  for (let row = size - 1; row >= 0; row--) {
    const line = rows[row];
    let sum = line?.[size] ?? 0;
    for (let column = row + 1; column < size; column++) sum -= (line?.[column] ?? 0) * (solved[column] ?? 0);
    solved[row] = sum / (line?.[row] ?? 1);
  }
  return solved;
};
