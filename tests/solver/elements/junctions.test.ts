import { all, bignumber, create } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { bipolar, diode, zener } from '../../../solver/index.ts';
import { wrightOmega } from '../../../solver/elements/wright-omega.ts';
import { randomStream } from '../../properties/solver-random-circuits.ts';
import { Complex, complexStep } from './complex.ts';
import { diodeCurrent, saturationAt, thermal } from './formulas.ts';
import { evaluateElement, readElement } from './local.ts';

const big = create(all ?? {}, { number: 'BigNumber', precision: 64 });

describe('wrightOmega', () => {
  it('solves y + ln y = z to rounding from −700 to 1e6, put back with 64 digits', () => {
    const random = randomStream(3);
    const points = [-700, -50.5, -49.5, -2, -1, 0, 0.5, 1, 1.5, 2, 10, 1e3, 1e6];
    for (let k = 0; k < 200; k++) points.push(-60 + 120 * random());
    for (const z of points) {
      const y = wrightOmega(z);
      const back = big.add(bignumber(y), big.log(bignumber(y)));
      const miss = Number(big.subtract(bignumber(z), back as never));
      // dy/y = miss/(1 + y); allow rounding of y itself and of z.
      expect(Math.abs(miss) / (1 + y)).toBeLessThan(4e-16 * (1 + Math.abs(z) / (1 + y)));
    }
  });

  it('knows the omega constant: ω(0) = 0.56714 32904 09783 87299 99686 62210 (W(1), value from memory)', () => {
    expect(wrightOmega(0)).toBeCloseTo(0.5671432904097838, 15);
  });
});

describe('diode', () => {
  it.each([
    ['without series resistance', 0, 1],
    ['with 0.5 Ω', 0.5, 1.7],
    ['with 20 Ω', 20, 2],
  ])(
    '%s: current and slope agree with a complex step to 1e-12',
    (_, seriesResistance, emissionCoefficient) => {
      const element = diode('D1', [1, 2], {
        saturationCurrent: 2e-12,
        emissionCoefficient,
        seriesResistance,
      });
      const random = randomStream(11);
      const scale = emissionCoefficient * thermal(298.15);
      for (let k = 0; k < 200; k++) {
        // Up to 1 A without series resistance, so short of the tangent at 10 mΩ.
        const v =
          seriesResistance === 0 ? -0.3 + random() * (0.3 + scale * Math.log(1 / 2e-12)) : 0.3 + 2 * random();
        const { value, gradient } = complexStep(
          ([x = new Complex(0)]) => diodeCurrent(2e-12, scale, seriesResistance, x),
          [v],
        );
        const { residual, jacobian } = evaluateElement(element, [v, 0], 298.15, 0);
        expect(Math.abs((residual[0] ?? NaN) - value)).toBeLessThan(1e-12 * Math.abs(value) + 1e-27);
        expect(Math.abs((jacobian[0]?.[0] ?? NaN) - (gradient[0] ?? NaN))).toBeLessThan(
          1e-12 * (gradient[0] ?? 0) + 1e-26,
        );
      }
    },
  );

  it('is continued by its tangent above nU_T/10 mΩ: 2.57 A at 25 °C, from where the slope stays at 100 S', () => {
    const element = diode('D1', [1, 2], { saturationCurrent: 1e-12 });
    const ut = thermal(298.15);
    const edge = ut * Math.log(ut / 10e-3 / 1e-12); // V at which I + I_S = U_T/10 mΩ
    const at = (v: number) => evaluateElement(element, [v, 0], 298.15, 0);
    expect(at(edge).residual[0]).toBeCloseTo(ut / 10e-3, 9);
    expect(at(edge - 1e-9).jacobian[0]?.[0]).toBeCloseTo(100, 4);
    expect(at(12).jacobian[0]?.[0]).toBe(100);
    expect(at(12).residual[0]).toBeCloseTo(ut / 10e-3 + (12 - edge) * 100, 9);
  });

  it('blocks with I_S and the declared leak', () => {
    const element = diode('D1', [1, 2], { saturationCurrent: 1e-12 });
    // −1e-12 A − 5 V·5e-13 S
    expect(evaluateElement(element, [-5, 0]).residual[0]).toBeCloseTo(-3.5e-12, 24);
    expect(readElement(element, [-5, 0]).region).toBe('blocking');
  });

  it('conducts from 1 µA', () => {
    const element = diode('D1', [1, 2], { saturationCurrent: 1e-12 });
    const at = (current: number) => thermal(298.15) * Math.log(current / 1e-12 + 1);
    expect(readElement(element, [at(1.01e-6), 0]).region).toBe('conducting');
    expect(readElement(element, [at(0.99e-6), 0]).region).toBe('blocking');
  });

  it('at constant current falls by about 2 mV/K (common practice)', () => {
    const element = diode('D1', [1, 2], { saturationCurrent: 1e-14 });
    const forward = (temperature: number): number => {
      let low = 0;
      let high = 1;
      for (let k = 0; k < 60; k++) {
        const middle = (low + high) / 2;
        if ((evaluateElement(element, [middle, 0], temperature).residual[0] ?? 0) > 1e-3) high = middle;
        else low = middle;
      }
      return low;
    };
    const slope = (forward(308.15) - forward(288.15)) / 20;
    expect(slope).toBeGreaterThan(-2.3e-3);
    expect(slope).toBeLessThan(-1.5e-3);
    // By the formula: dV/dT = V/T − (3/n)·U_T·n/T − E_g/T, here at 298.15 K.
    const v = forward(298.15);
    const expected = (v - 3 * thermal(298.15) - 1.12) / 298.15;
    expect(slope).toBeCloseTo(expected, 5);
    expect(evaluateElement(element, [0.5, 0], 350, 0).residual[0]).toBeCloseTo(
      saturationAt(1e-14, 1, 1.12, 350) * Math.expm1(0.5 / thermal(350)),
      12,
    );
  });

  it('with a stated coefficient moves by just that at its current, and carries nothing at 0 V', () => {
    const element = diode('D1', [1, 2], {
      saturationCurrent: 1e-18,
      emissionCoefficient: 2,
      forwardTemperatureCoefficient: -3e-3,
      coefficientCurrent: 0.02,
    });
    const cold = 2 * thermal(298.15) * Math.log(0.02 / 1e-18);
    expect(evaluateElement(element, [cold - 0.15, 0], 348.15, 0).residual[0]).toBeCloseTo(0.02, 10);
    expect(evaluateElement(element, [0, 0], 348.15, 0).residual[0]).toBeCloseTo(0, 25);
  });
});

describe('zener', () => {
  const element = zener('VR1', [1, 2], {
    saturationCurrent: 1e-14,
    breakdownVoltage: 5.1,
    breakdownCurrent: 5e-3,
    breakdownResistance: 7,
    breakdownTemperatureCoefficient: 1e-3,
  });

  it('passes exactly through −I_Z at −V_Z with slope 1/Z_Z', () => {
    const { residual, jacobian } = evaluateElement(element, [-5.1, 0], 298.15, 0);
    expect(residual[0]).toBeCloseTo(-5e-3, 12);
    expect(1 / (jacobian[0]?.[0] ?? NaN)).toBeCloseTo(7, 6);
    expect(readElement(element, [-5.1, 0]).region).toBe('breakdown');
  });

  it('keeps slope and point where V_Z is hardly more than I_Z·Z_Z, and carries nothing at 0 V', () => {
    const soft = zener('VR1', [1, 2], {
      saturationCurrent: 1e-14,
      breakdownVoltage: 2.4,
      breakdownCurrent: 20e-3,
      breakdownResistance: 60,
    });
    const { residual, jacobian } = evaluateElement(soft, [-2.4, 0], 298.15, 0);
    expect(residual[0]).toBeCloseTo(-20e-3, 12);
    expect(1 / (jacobian[0]?.[0] ?? NaN)).toBeCloseTo(60, 5);
    expect(evaluateElement(soft, [0, 0], 298.15, 0).residual[0]).toBe(0);
  });

  it('moves by its coefficient: 5.15 V at 75 °C', () => {
    expect(evaluateElement(element, [-5.15, 0], 348.15, 0).residual[0]).toBeCloseTo(-5e-3, 9);
  });

  it('breaks down at 200 V as well, where e^{V_Z/a} is beyond any number', () => {
    const high = zener('VR1', [1, 2], {
      saturationCurrent: 1e-14,
      breakdownVoltage: 200,
      breakdownCurrent: 1e-3,
      breakdownResistance: 5,
    });
    expect(evaluateElement(high, [-200, 0], 298.15, 0).residual[0]).toBeCloseTo(-1e-3, 12);
    expect(readElement(high, [-150, 0]).region).toBe('blocking');
  });

  it('slopes agree with a complex step on both sides', () => {
    const a = 5e-3 * 7; // V, e^{−V_Z/a} = 5e-64 being nothing beside 1
    const random = randomStream(5);
    for (let k = 0; k < 200; k++) {
      const v = -5.3 + 5.9 * random();
      const { value, gradient } = complexStep(
        ([x = new Complex(0)]) =>
          x.div(thermal(298.15)).expm1().mul(1e-14).sub(x.mul(-1).sub(5.1).div(a).exp().mul(5e-3)),
        [v],
      );
      const { residual, jacobian } = evaluateElement(element, [v, 0], 298.15, 0);
      expect(Math.abs((residual[0] ?? NaN) - value)).toBeLessThan(2e-12 * Math.abs(value) + 1e-28);
      expect(Math.abs((jacobian[0]?.[0] ?? NaN) - (gradient[0] ?? NaN))).toBeLessThan(
        2e-12 * Math.abs(gradient[0] ?? NaN) + 1e-27,
      );
    }
  });
});

describe('bipolar', () => {
  const figures = { saturationCurrent: 1e-14, forwardGain: 120, reverseGain: 2, earlyVoltage: 60 };

  /** Transport form of Ebers and Moll (1954): collector and base current of an n-p-n from C, B, E. */
  const transport =
    (wanted: 'collector' | 'base') =>
    ([c, b, e]: readonly Complex[]): Complex => {
      if (!c || !b || !e) throw new Error('three voltages');
      const ut = thermal(298.15);
      const forward = b.sub(e).div(ut).expm1().mul(figures.saturationCurrent);
      const reverse = b.sub(c).div(ut).expm1().mul(figures.saturationCurrent);
      if (wanted === 'base') return forward.div(figures.forwardGain).add(reverse.div(figures.reverseGain));
      const vce = c.sub(e);
      const size = vce.re < 0 ? vce.mul(-1) : vce;
      return forward
        .sub(reverse)
        .mul(size.div(figures.earlyVoltage).add(1))
        .sub(reverse.div(figures.reverseGain));
    };

  it.each([
    ['n-p-n', 1],
    ['p-n-p', -1],
  ] as const)(
    '%s: currents and slopes agree with a complex step, active, saturated and reversed',
    (_, polarity) => {
      const element = bipolar('Q1', [1, 2, 3], { polarity, ...figures });
      const random = randomStream(17);
      for (let k = 0; k < 300; k++) {
        const x = [k % 3 === 0 ? 0.1 * random() : 3 * random(), 0.65 * random(), 0.1 * random()];
        const { residual, jacobian } = evaluateElement(
          element,
          x.map((v) => polarity * v),
          298.15,
          0,
        );
        (['collector', 'base'] as const).forEach((wanted, row) => {
          const { value, gradient } = complexStep(transport(wanted), x);
          const scale = Math.max(...gradient.map(Math.abs), 1e-15);
          expect(Math.abs(polarity * (residual[row] ?? NaN) - value)).toBeLessThan(
            1e-12 * Math.abs(value) + 2e-15 * scale,
          );
          gradient.forEach((slope, column) => {
            expect(Math.abs((jacobian[row]?.[column] ?? NaN) - slope)).toBeLessThan(1e-12 * scale);
          });
        });
        expect(Math.abs((residual[0] ?? NaN) + (residual[1] ?? NaN) + (residual[2] ?? NaN))).toBeLessThan(
          1e-18,
        );
      }
    },
  );

  it('reads active, saturated, cutoff and reversed', () => {
    const element = bipolar('Q1', [1, 2, 3], { polarity: 1, ...figures });
    // V_BE for 1 mA: U_T·ln(1e-3/1e-14) = 0.6508 V
    const active = readElement(element, [5, 0.6508, 0]);
    expect(active.region).toBe('active');
    // I_C = 1e-14·e^{0.6508/U_T}·(1 + 5/60), I_B = the same without modulation over 120, by hand with U_T = 25.6926 mV
    const forward = 1e-14 * Math.exp(0.6508 / 0.025692579);
    expect(active.collectorCurrent / (forward * (1 + 5 / 60))).toBeCloseTo(1, 5);
    expect(active.baseCurrent / (forward / 120)).toBeCloseTo(1, 5);
    expect(active.transconductance / (active.collectorCurrent / 0.025692579)).toBeCloseTo(1, 5);
    // r_o = (V_A + V_CE)/I_C in this form
    expect(active.outputConductance / (active.collectorCurrent / 65)).toBeCloseTo(1, 5);
    expect(readElement(element, [0.1, 0.7, 0]).region).toBe('saturated');
    expect(readElement(element, [5, 0.2, 0]).region).toBe('cutoff');
    expect(readElement(element, [-1, 0.3, 0]).reversed).toBe(true);
  });

  it('gains 0.6 %/K of h_FE', () => {
    const element = bipolar('Q1', [1, 2, 3], { polarity: 1, ...figures });
    expect(readElement(element, [5, 0.6, 0], 348.15).forwardGain).toBeCloseTo(120 * 1.3, 9);
  });

  it('mirrors: a p-n-p reads true signs for voltages and positive currents', () => {
    const pnp = bipolar('Q1', [1, 2, 3], { polarity: -1, ...figures });
    const npn = bipolar('Q1', [1, 2, 3], { polarity: 1, ...figures });
    const p = readElement(pnp, [-5, -0.65, 0]);
    const n = readElement(npn, [5, 0.65, 0]);
    expect(p.baseToEmitter).toBe(-0.65);
    expect(p.collectorCurrent).toBe(n.collectorCurrent);
    expect(p.power).toBe(n.power);
  });
});
