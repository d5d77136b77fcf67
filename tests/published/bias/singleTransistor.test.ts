import { describe, expect, it } from 'vitest';
import { mosfet, resistor, voltageSource, type Element } from '../../../solver/index.ts';
import { expectNear, solve } from '../circuit.ts';
import { d, root } from '../decimal.ts';

type Node = (name: string) => number;
type Reading = ReturnType<ReturnType<typeof mosfet>['law']['read']>;

/** Settles what `build` gives, and reads the one transistor in it. */
function settled(
  build: (node: Node) => { readonly q1: ReturnType<typeof mosfet>; readonly rest: readonly Element[] },
) {
  let q1: ReturnType<typeof mosfet> | undefined;
  const solved = solve((node) => {
    const built = build(node);
    q1 = built.q1;
    return [...built.rest, built.q1];
  });
  if (q1 === undefined) throw new Error('not built');
  const reading: Reading = solved.read(q1);
  return { ...solved, reading };
}

describe('one transistor, as textbooks bias it', () => {
  it('two rails of 2.5 V, 3.25 kΩ in the source and 5 kΩ in the drain rest at 0.4 mA and 0.5 V', () => {
    // Sedra and Smith, Microelectronic Circuits, 6th ed., example 5.3: V_t = 0.7 V, 100 µA/V² × 32. Value from memory.
    const { volts, reading } = settled((node) => ({
      q1: mosfet('Q1', [node('drain'), 0, node('source'), node('source')], {
        polarity: 1,
        law: 'square',
        threshold: 0.7,
        gainFactor: 3.2e-3,
      }),
      rest: [
        voltageSource('VDD', [node('plus'), 0], { voltage: 2.5 }),
        voltageSource('VSS', [node('minus'), 0], { voltage: -2.5 }),
        resistor('RD', [node('plus'), node('drain')], { resistance: 5e3 }),
        resistor('RS', [node('source'), node('minus')], { resistance: 3.25e3 }),
      ],
    }));
    expectNear(reading.drainCurrent, 0.4e-3, 1e-7);
    expectNear(volts('drain'), 0.5, 1e-6);
    expectNear(volts('source'), -1.2, 1e-7);
    expectNear(reading.overdrive, 0.5, 1e-6);
  });

  it('diode-connected behind 25 kΩ on 3 V rests at 80 µA and 1 V', () => {
    // Sedra and Smith, 6th ed., example 5.4: V_t = 0.6 V, 200 µA/V² × 5. Value from memory.
    const { volts, reading } = settled((node) => ({
      q1: mosfet('Q1', [node('drain'), node('drain'), 0, 0], {
        polarity: 1,
        law: 'square',
        threshold: 0.6,
        gainFactor: 1e-3,
      }),
      rest: [
        voltageSource('VDD', [node('plus'), 0], { voltage: 3 }),
        resistor('R', [node('plus'), node('drain')], { resistance: 25e3 }),
      ],
    }));
    expectNear(reading.drainCurrent, 80e-6, 1e-6);
    expectNear(volts('drain'), 1, 1e-6);
    expect(reading.region).toBe('saturation');
  });

  it('in triode behind 12.4 kΩ on 5 V drops 0.1 V at 0.395 mA', () => {
    // Sedra and Smith, 6th ed., example 5.5: V_t = 1 V, 1 mA/V², gate on 5 V. Value from memory.
    const { reading } = settled((node) => ({
      q1: mosfet('Q1', [node('drain'), node('plus'), 0, 0], {
        polarity: 1,
        law: 'square',
        threshold: 1,
        gainFactor: 1e-3,
      }),
      rest: [
        voltageSource('VDD', [node('plus'), 0], { voltage: 5 }),
        resistor('RD', [node('plus'), node('drain')], { resistance: 12.4e3 }),
      ],
    }));
    expect(reading.region).toBe('triode');
    expectNear(reading.drainCurrent, 0.395e-3, 2e-3);
    expectNear(reading.drainToSource, 0.1, 1e-2);
    // Exactly: 5 − v = 12.4(4v − v²/2): 6.2v² − 50.6v + 5 = 0.
    const v = d('50.6').minus(d('50.6').pow(2).minus(124).sqrt()).div('12.4');
    expectNear(reading.drainToSource, v.toNumber(), 1e-7);
  });

  it('p-channel with 3 V on its gate, 6 kΩ in the drain, rests at 0.5 mA and 3 V, and at the edge with 8 kΩ', () => {
    // Sedra and Smith, 6th ed., example 5.7: V_tp = −1 V, 1 mA/V², 5 V supply. Value from memory.
    const withDrain = (resistance: number) =>
      settled((node) => ({
        q1: mosfet('Q1', [node('drain'), node('gate'), node('plus'), node('plus')], {
          polarity: -1,
          law: 'square',
          threshold: -1,
          gainFactor: 1e-3,
        }),
        rest: [
          voltageSource('VDD', [node('plus'), 0], { voltage: 5 }),
          voltageSource('VG', [node('gate'), 0], { voltage: 3 }),
          resistor('RD', [node('drain'), 0], { resistance }),
        ],
      }));
    const { volts, reading } = withDrain(6e3);
    expectNear(reading.drainCurrent, 0.5e-3, 1e-7);
    expectNear(volts('drain'), 3, 1e-7);
    expect(reading.region).toBe('saturation');
    expect(withDrain(7.99e3).reading.region).toBe('saturation');
    expect(withDrain(8.01e3).reading.region).toBe('triode');
  });

  it('a source follower whose body stays on ground obeys the body-effect equation', () => {
    // Body effect as in Shichman and Hodges 1968; the root is worked here at 64 digits.
    const { volts, reading } = settled((node) => ({
      q1: mosfet('Q1', [node('plus'), node('gate'), node('source'), 0], {
        polarity: 1,
        law: 'square',
        threshold: 0.7,
        gainFactor: 2e-3,
        bodyFactor: 0.5,
        surfacePotential: 0.7,
      }),
      rest: [
        voltageSource('VDD', [node('plus'), 0], { voltage: 5 }),
        voltageSource('VG', [node('gate'), 0], { voltage: 3 }),
        resistor('RS', [node('source'), 0], { resistance: 10e3 }),
      ],
    }));
    const thresholdAt = (vs: ReturnType<typeof d>) =>
      d('0.7').plus(d('0.5').times(vs.plus('0.7').sqrt().minus(d('0.7').sqrt())));
    const source = root(
      (vs) =>
        d('1e-3')
          .times(d(3).minus(vs).minus(thresholdAt(vs)).pow(2))
          .minus(vs.div(10e3)),
      0,
      '1.8',
    );
    expectNear(volts('source'), source.toNumber(), 1e-7);
    expectNear(reading.threshold, thresholdAt(source).toNumber(), 1e-7);
    expectNear(reading.sourceToBody, source.toNumber(), 1e-7);
  });

  it('with 3 V between source and body a threshold of 0.8 V stands at 1.23 V', () => {
    // Sedra and Smith, exercise on the body effect: V_t0 = 0.8 V, γ = 0.4 √V, 2φ_f = 0.7 V. Value from memory.
    const { reading } = settled((node) => ({
      q1: mosfet('Q1', [node('drain'), node('gate'), node('source'), 0], {
        polarity: 1,
        law: 'square',
        threshold: 0.8,
        gainFactor: 1e-3,
        bodyFactor: 0.4,
        surfacePotential: 0.7,
      }),
      rest: [
        voltageSource('VD', [node('drain'), 0], { voltage: 8 }),
        voltageSource('VG', [node('gate'), 0], { voltage: 5 }),
        voltageSource('VS', [node('source'), 0], { voltage: 3 }),
      ],
    }));
    expectNear(reading.threshold, 1.23, 5e-3);
    expectNear(
      reading.threshold,
      d('0.8')
        .plus(d('0.4').times(d('3.7').sqrt().minus(d('0.7').sqrt())))
        .toNumber(),
      1e-12,
    );
  });

  it('no current enters the gate, so that the source current is the drain current', () => {
    // Common practice: the insulated gate takes no direct current.
    const { amps } = settled((node) => ({
      q1: mosfet('Q1', [node('drain'), node('gate'), node('source'), node('source')], {
        polarity: 1,
        law: 'square',
        threshold: 1,
        gainFactor: 1e-3,
      }),
      rest: [
        voltageSource('VDD', [node('plus'), 0], { voltage: 10 }),
        resistor('RG', [node('plus'), node('gate')], { resistance: 1e9 }),
        resistor('RG2', [node('gate'), 0], { resistance: 1e9 }),
        resistor('RD', [node('plus'), node('drain')], { resistance: 1e3 }),
        resistor('RS', [node('source'), 0], { resistance: 1e3 }),
      ],
    }));
    expect(amps('Q1', 'gate')).toBe(0);
    expectNear(-amps('Q1', 'source') - amps('Q1', 'body'), amps('Q1', 'drain'), 1e-9);
  });
});
