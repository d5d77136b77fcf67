/** A circuit written down as a textbook draws it: nodes by name, `0` the reference; settled at 25 °C unless said. */
import { expect } from 'vitest';
import { prepare, settle, type Circuit, type Element } from '../../solver/index.ts';

export interface Solved {
  /** V against the reference. */
  readonly volts: (node: string) => number;
  /** Current into a terminal of an element, A. */
  readonly amps: (element: string, terminal: string) => number;
  readonly read: <Operating>(element: Element<Operating>) => Operating;
}

export function solve(
  build: (node: (name: string) => number) => readonly Element[],
  temperature = 298.15,
): Solved {
  const names = ['0'];
  const node = (name: string): number => {
    const known = names.indexOf(name);
    return known >= 0 ? known : names.push(name) - 1;
  };
  const elements = build(node);
  const circuit: Circuit = { nodes: names, elements };
  const prepared = prepare(circuit);
  if (!prepared.ok) throw new Error(prepared.faults.map((fault) => fault.message).join('; '));
  const settlement = settle(prepared.value, { temperature });
  if (!settlement.settled) throw new Error(settlement.reason);
  return {
    volts: (name) => {
      const index = names.indexOf(name);
      expect(index).toBeGreaterThanOrEqual(0);
      return settlement.voltages[index] ?? Number.NaN;
    },
    amps: (elementName, terminal) => {
      const element = elements.find((each) => each.name === elementName);
      if (element === undefined) throw new Error(`no element ${elementName}`);
      return settlement.terminalCurrents(element)[element.law.terminals.indexOf(terminal)] ?? Number.NaN;
    },
    read: (element) => settlement.operating(element),
  };
}

/** Agreement to a number of significant parts, the figures printed when it fails. */
export function expectNear(found: number, expected: number, relative: number): void {
  const error = Math.abs(found - expected) / Math.abs(expected);
  expect(error, `found ${found}, expected ${expected}`).toBeLessThanOrEqual(relative);
}
