import { describe, expect, it } from 'vitest';
import {
  amplifier,
  capacitor,
  contact,
  currentSource,
  diode,
  mosfet,
  prepare,
  resistor,
  voltageSource,
  type Element,
  type StructureFault,
} from '../../../solver/index.ts';

const faultsOf = (nodes: string[], elements: Element[]): readonly StructureFault[] => {
  const preparation = prepare({ nodes: ['ground', ...nodes], elements });
  return preparation.ok ? [] : preparation.faults;
};
const codes = (nodes: string[], elements: Element[]) => faultsOf(nodes, elements).map(({ code }) => code);
const battery = (name = 'BT1', plus = 1, minus = 0) => voltageSource(name, [plus, minus], { voltage: 12 });
const n = { polarity: 1, law: 'square', threshold: 1, gainFactor: 0.01 } as const;

describe('checkStructure', () => {
  it('passes a circuit in which everything has its path', () => {
    expect(
      codes(
        ['vbat', 'drain'],
        [battery(), resistor('R1', [1, 2], { resistance: 1 }), mosfet('Q1', [2, 1, 0, 0], n)],
      ),
    ).toEqual([]);
  });

  it('names a missing ground alone: without it nothing else means much', () => {
    expect(codes(['a', 'b'], [battery('BT1', 1, 2), resistor('R1', [1, 2], { resistance: 1 })])).toEqual([
      'no-ground',
    ]);
  });

  it('names the nodes and parts of an island', () => {
    const faults = faultsOf(
      ['vbat', 'x', 'y'],
      [
        battery(),
        capacitor('C1', [1, 2], { capacitance: 1 }),
        resistor('R1', [2, 3], { resistance: 1 }),
        resistor('R2', [1, 0], { resistance: 1 }),
      ],
    );
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatchObject({ code: 'no-path-to-ground', nodes: ['x', 'y'], elements: ['C1', 'R1'] });
    expect(faults[0]?.message).toBe('x and y (C1 and R1) has no path for direct current to ground');
  });

  it('names a gate that hangs on nothing, alone or behind a capacitor', () => {
    const alone = faultsOf(['vbat', 'gate'], [battery(), mosfet('Q1', [1, 2, 0, 0], n)]);
    expect(alone).toMatchObject([{ code: 'floating-gate', nodes: ['gate'], elements: ['Q1'] }]);
    expect(alone[0]?.message).toContain('Q1.gate');
    expect(
      codes(
        ['vbat', 'gate'],
        [battery(), mosfet('Q1', [1, 2, 0, 0], n), capacitor('C1', [1, 2], { capacitance: 1 })],
      ),
    ).toEqual(['floating-gate']);
  });

  it('names every gate of one floating node', () => {
    const faults = faultsOf(
      ['vbat', 'gate'],
      [battery(), mosfet('Q1', [1, 2, 0, 0], n), mosfet('Q2', [1, 2, 0, 0], n)],
    );
    expect(faults).toMatchObject([{ code: 'floating-gate', elements: ['Q1', 'Q2'] }]);
  });

  it('names amplifier inputs that hang on nothing', () => {
    expect(
      codes(['in', 'out'], [amplifier('U1', [1, 2, 2]), resistor('R1', [2, 0], { resistance: 1 })]),
    ).toEqual(['floating-gate']);
  });

  it('names a loop of voltage sources with all its parts, but not one with resistance in it', () => {
    const faults = faultsOf(['a', 'b'], [battery('BT1', 1, 0), battery('BT2', 2, 1), battery('BT3', 2, 0)]);
    expect(faults).toMatchObject([{ code: 'voltage-loop' }]);
    expect([...(faults[0]?.elements ?? [])].sort()).toEqual(['BT1', 'BT2', 'BT3']);
    expect(codes(['a'], [battery(), voltageSource('BT2', [1, 0], { voltage: 12, resistance: 0.1 })])).toEqual(
      [],
    );
  });

  it('counts an ideal amplifier output as a voltage', () => {
    expect(codes(['a'], [battery(), amplifier('U1', [1, 0, 1])])).toEqual(['voltage-loop']);
  });

  it('names a source shorted on itself', () => {
    expect(codes(['a'], [battery('BT1', 1, 1), resistor('R1', [1, 0], { resistance: 1 })])).toEqual([
      'shorted-source',
    ]);
  });

  it('names the current sources that alone reach a node', () => {
    const faults = faultsOf(
      ['a', 'b'],
      [battery(), currentSource('I1', [1, 2], { current: 1 }), currentSource('I2', [2, 0], { current: 1 })],
    );
    expect(faults).toMatchObject([{ code: 'current-cut-set', nodes: ['b'], elements: ['I1', 'I2'] }]);
  });

  it('counts an open switch as no path, a leaking or closed one as a path', () => {
    const circuit = (made: Element) =>
      codes(['a', 'b'], [battery(), made, capacitor('C1', [2, 0], { capacitance: 1 })]);
    expect(circuit(contact('S1', [1, 2], { closed: false }))).toEqual(['no-path-to-ground']);
    expect(circuit(contact('S1', [1, 2], { closed: false, leakage: 1e-9 }))).toEqual([]);
    expect(circuit(contact('S1', [1, 2], { closed: true }))).toEqual([]);
  });

  it('counts a junction and a channel as paths, whichever way they point', () => {
    expect(codes(['a', 'b'], [battery(), diode('D1', [2, 1], { saturationCurrent: 1e-12 })])).toEqual([]);
  });

  it('names a node that nothing is joined to', () => {
    expect(faultsOf(['a', 'alone'], [battery()])).toMatchObject([
      { code: 'no-path-to-ground', nodes: ['alone'], elements: [] },
    ]);
  });

  it('names several faults at once', () => {
    expect(codes(['a', 'gate'], [battery('BT1'), battery('BT2'), mosfet('Q1', [1, 2, 0, 0], n)])).toEqual([
      'floating-gate',
      'voltage-loop',
    ]);
  });
});
