import { describe, expect, it } from 'vitest';
import { bipolar, mosfet } from '../../../solver/index.ts';
import { TransistorProbe } from '../../../src/readings/headroom/control.ts';

const roomTemperature = 298.15;

describe('the control voltage at which a transistor carries its leak', () => {
  it('lies at V_T + sqrt(2I/β(1 + λV_DS)) for a saturated channel (Shichman and Hodges 1968)', () => {
    const probe = new TransistorProbe(
      mosfet('Q1', [1, 2, 3, 4], {
        polarity: 1,
        law: 'square',
        threshold: 1.6,
        gainFactor: 0.08,
        lengthModulation: 0.01,
      }),
    );
    const expected = 1.6 + Math.sqrt((2 * 1e-6) / (0.08 * 1.12)) - 0.2;
    expect(probe.headroom([12, 0.2, 0, 0], 1e-6, 1, roomTemperature)).toBeCloseTo(expected, 8);
  });

  it('is the same for a p-channel with every voltage turned round', () => {
    const probe = new TransistorProbe(
      mosfet('Q1', [1, 2, 3, 4], {
        polarity: -1,
        law: 'square',
        threshold: -1.6,
        gainFactor: 0.08,
        lengthModulation: 0.01,
      }),
    );
    const expected = 1.6 + Math.sqrt((2 * 1e-6) / (0.08 * 1.12)) - 0.2;
    expect(probe.headroom([-12, -0.2, 0, 0], 1e-6, -1, roomTemperature)).toBeCloseTo(expected, 8);
  });

  it('is negative where more than the leak flows, and raised by the body effect', () => {
    const probe = new TransistorProbe(
      mosfet('Q1', [1, 2, 3, 4], {
        polarity: 1,
        law: 'square',
        threshold: 1,
        gainFactor: 0.02,
        bodyFactor: 0.5,
        surfacePotential: 0.7,
      }),
    );
    // V_T = 1 + 0.5(√(0.7 + 2) − √0.7) at V_SB = 2 V.
    const threshold = 1 + 0.5 * (Math.sqrt(2.7) - Math.sqrt(0.7));
    const expected = threshold + Math.sqrt((2 * 1e-5) / 0.02) - 3;
    expect(probe.headroom([12, 5, 2, 0], 1e-5, 1, roomTemperature)).toBeCloseTo(expected, 7);
  });

  it('is nothing where no voltage drives the channel', () => {
    const probe = new TransistorProbe(
      mosfet('Q1', [1, 2, 3, 4], { polarity: 1, law: 'square', threshold: 1, gainFactor: 0.02 }),
    );
    expect(probe.headroom([0, 0, 0, 0], 1e-6, 1, roomTemperature)).toBeNull();
  });

  it('lies at U_T·ln(I/I_S) for a bipolar transistor (Ebers and Moll 1954)', () => {
    const probe = new TransistorProbe(
      bipolar('Q1', [1, 2, 3], { polarity: 1, saturationCurrent: 1e-14, forwardGain: 100 }),
    );
    // kT/q at 25 °C with the SI's exact k and q; the junctions' leak of 5e-13 S is the room in the bound.
    const thermal = (1.380649e-23 * roomTemperature) / 1.602176634e-19;
    const expected = thermal * Math.log(1e-6 / 1e-14) - 0.3;
    expect(probe.headroom([5, 0.3, 0], 1e-6, 1, roomTemperature)).toBeCloseTo(expected, 6);
  });
});
