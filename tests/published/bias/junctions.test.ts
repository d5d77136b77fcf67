import { describe, expect, it } from 'vitest';
import { diode, resistor, voltageSource, zener } from '../../../solver/index.ts';
import { expectNear, solve } from '../circuit.ts';
import { d, lambertW, thermalVoltage } from '../decimal.ts';

describe('a diode behind a resistor', () => {
  for (const [supply, resistance, saturation, emission] of [
    [5, 1e3, 6.9e-16, 1],
    [12, 4.7e3, 1e-9, 1.8],
    [0.5, 100, 1e-12, 1],
    [3.3, 1e6, 1e-14, 1.2],
  ] as const) {
    it(`of ${resistance} Ω on ${supply} V carries what Lambert's W says`, () => {
      // Corless, Gonnet, Hare, Jeffrey and Knuth 1996, On the Lambert W function: Shockley's equation with a resistor
      // has the closed form I = (nU_T/R)·W((I_S R/nU_T)·e^((E + I_S R)/nU_T)) − I_S. Worked here at 64 digits.
      const solved = solve((node) => [
        voltageSource('E', [node('plus'), 0], { voltage: supply }),
        resistor('R', [node('plus'), node('anode')], { resistance }),
        diode('D', [node('anode'), 0], {
          saturationCurrent: saturation,
          emissionCoefficient: emission,
          seriesResistance: 0,
        }),
      ]);
      const slope = thermalVoltage('298.15').times(emission);
      const drop = d(saturation).times(resistance);
      const argument = drop.div(slope).times(d(supply).plus(drop).div(slope).exp());
      const current = slope.div(resistance).times(lambertW(argument)).minus(saturation);
      expectNear(solved.amps('D', 'anode'), current.toNumber(), 1e-8);
    });
  }

  it('of 1 kΩ on 5 V, with 0.7 V at 1 mA, rests near 4.26 mA and 0.738 V', () => {
    // Sedra and Smith, Microelectronic Circuits, 6th ed., example 4.4 (iteration with 60 mV a decade). Value from memory.
    const slope = thermalVoltage('298.15');
    // The text rounds a decade to 60 mV; so does the emission coefficient here.
    const emission = d('0.06').div(slope.times(d(10).ln()));
    const saturation = d('1e-3')
      .div(d('0.7').div(slope.times(emission)).exp())
      .toNumber();
    const solved = solve((node) => [
      voltageSource('E', [node('plus'), 0], { voltage: 5 }),
      resistor('R', [node('plus'), node('anode')], { resistance: 1e3 }),
      diode('D', [node('anode'), 0], {
        saturationCurrent: saturation,
        emissionCoefficient: emission.toNumber(),
        seriesResistance: 0,
      }),
    ]);
    expectNear(solved.amps('D', 'anode'), 4.262e-3, 1e-3);
    expectNear(solved.volts('anode'), 0.738, 1e-3);
  });

  it('sees a thermal voltage of 25.85 mV at 300 K', () => {
    // Value from memory of every text; k and q exact since the SI of 2019.
    expectNear(thermalVoltage(300).toNumber(), 25.85e-3, 1e-4);
    // Two settles a decade of current apart stand n·U_T·ln 10 apart.
    const at = (current: number) =>
      solve(
        (node) => [
          voltageSource('E', [node('plus'), 0], { voltage: 1 }),
          resistor('R', [node('plus'), node('anode')], { resistance: 0.5 / current }),
          diode('D', [node('anode'), 0], {
            saturationCurrent: 1e-14,
            emissionCoefficient: 1,
            seriesResistance: 0,
          }),
        ],
        300,
      );
    const [low, high] = [at(1e-6), at(1e-5)];
    const ratio = high.amps('D', 'anode') / low.amps('D', 'anode');
    expectNear((high.volts('anode') - low.volts('anode')) / Math.log(ratio), 25.852e-3, 1e-4);
  });
});

describe('the Zener regulator', () => {
  // Sedra and Smith, 6th ed., example 4.7: 6.8 V at 5 mA, r_z = 20 Ω, 0.5 kΩ from 10 V. No load: I = 6.35 mA and
  // V_O = 6.83 V; a volt more at the supply raises V_O by 38.5 mV; 2 kΩ of load lowers it by about 70 mV; with 0.5 kΩ
  // the breakdown is left and V_O = 5 V. Values from memory. The text takes breakdown as a straight line, where this
  // one is an exponential of the same slope at 5 mA: hence the room in the bounds.
  const regulator = (supply: number, load: number) =>
    solve((node) => [
      voltageSource('E', [node('plus'), 0], { voltage: supply }),
      resistor('R', [node('plus'), node('out')], { resistance: 500 }),
      zener('VR', [0, node('out')], {
        saturationCurrent: 1e-14,
        emissionCoefficient: 1,
        seriesResistance: 0,
        breakdownVoltage: 6.8,
        breakdownCurrent: 5e-3,
        breakdownResistance: 20,
      }),
      ...(load > 0 ? [resistor('RL', [node('out'), 0], { resistance: load })] : []),
    ]).volts('out');

  it('without a load stands at 6.83 V', () => expectNear(regulator(10, 0), 6.83, 1e-3));
  it('moves by about 38.5 mV for a volt of supply', () => {
    expectNear((regulator(11, 0) - regulator(9, 0)) / 2, 38.5e-3, 0.25);
  });
  it('gives way by about 70 mV to a load of 2 kΩ', () => {
    expectNear(regulator(10, 0) - regulator(10, 2e3), 70e-3, 0.5);
  });
  it('leaves breakdown and divides to 5 V under a load of 0.5 kΩ', () => {
    expectNear(regulator(10, 500), 5, 1e-6);
    expect(regulator(10, 500)).toBeLessThan(6.7);
  });
});
