import { describe, expect, it } from 'vitest';
import { mosfet, type MosfetParameters } from '../../../solver/index.ts';
import { randomStream } from '../../properties/solver-random-circuits.ts';
import { Complex, complexStep } from './complex.ts';
import { smoothCurrent, squareCurrent, thresholdOf, type ChannelFigures } from './formulas.ts';
import { evaluateElement } from './local.ts';

/** Worst relative difference of terminal current and of the drain row's slopes over random points. */
function worstDifference(
  law: 'square' | 'smooth',
  polarity: 1 | -1,
  figures: ChannelFigures,
  point: (random: () => number) => [drain: number, gate: number, source: number, body: number],
  formula: (x: readonly Complex[]) => Complex,
  count = 300,
): { value: number; slope: number } {
  const parameters: MosfetParameters = {
    ...figures,
    polarity,
    law,
    threshold: polarity * figures.threshold,
    bodyDiode: { saturationCurrent: 1e-300 }, // nothing but the channel
  };
  const element = mosfet('Q1', [1, 2, 3, 4], parameters);
  const random = randomStream(7);
  const worst = { value: 0, slope: 0 };
  for (let k = 0; k < count; k++) {
    const x = point(random);
    const reference = complexStep(formula, x);
    const { residual, jacobian } = evaluateElement(
      element,
      x.map((v) => polarity * v),
      298.15,
      0,
    );
    const row = jacobian[0] ?? new Float64Array(4);
    const scale = Math.max(...reference.gradient.map(Math.abs));
    worst.value = Math.max(
      worst.value,
      Math.abs(polarity * (residual[0] ?? NaN) - reference.value) / Math.abs(reference.value),
    );
    reference.gradient.forEach((expected, column) => {
      worst.slope = Math.max(worst.slope, Math.abs((row[column] ?? NaN) - expected) / scale);
    });
    // What goes in at the drain comes out at the source.
    expect((residual[0] ?? NaN) + (residual[2] ?? NaN)).toBe(0);
  }
  return worst;
}

const plain: ChannelFigures = {
  threshold: 1.1,
  gainFactor: 0.02,
  lengthModulation: 0.03,
  bodyFactor: 0,
  surfacePotential: 0.7,
  slopeFactor: 1.35,
};
const bulk: ChannelFigures = { ...plain, bodyFactor: 0.6 };

describe.each([
  ['n-channel', 1],
  ['p-channel', -1],
] as const)(
  'mosfet, %s: value and slopes agree with a complex step of the published formula',
  (_, polarity) => {
    it.each([
      ['triode', 'without body effect', plain, 1.2, 0.05, 0.95],
      ['saturation', 'without body effect', plain, 1.2, 1.05, 4],
      ['triode', 'with body effect', bulk, 2.5, 0.05, 0.95],
      ['saturation', 'with body effect', bulk, 2.5, 1.05, 4],
      ['saturation', 'with the body forward, on the tangent', bulk, -0.8, 1.05, 4],
    ] as const)('square law, %s, %s, to 1e-12', (_region, _body, figures, vsbSpan, from, to) => {
      const worst = worstDifference(
        'square',
        polarity,
        figures,
        (random) => {
          const source = random() * 2;
          const vsb = vsbSpan < 0 ? -0.4 + vsbSpan * random() : vsbSpan * random();
          const overdrive = 0.05 + 3 * random();
          const threshold = thresholdOf(figures, new Complex(vsb)).re;
          return [
            source + overdrive * (from + (to - from) * random()),
            source + threshold + overdrive,
            source,
            source - vsb,
          ];
        },
        (x) => squareCurrent(figures, x),
      );
      expect(worst.value).toBeLessThan(1e-12);
      expect(worst.slope).toBeLessThan(1e-12);
    });

    it.each([
      ['without body factor', plain],
      ['with body factor', bulk],
    ] as const)('smooth law %s, from weak to strong inversion, to 1e-12', (_body, figures) => {
      const worst = worstDifference(
        'smooth',
        polarity,
        figures,
        (random) => {
          const source = random() * 2;
          return [source + 0.1 + 3 * random(), source + 0.4 + 3 * random(), source, source - 2 * random()];
        },
        (x) => smoothCurrent(figures, 298.15, x),
      );
      expect(worst.value).toBeLessThan(1e-12);
      expect(worst.slope).toBeLessThan(1e-12);
    });
  },
);

describe('mosfet with exchanged roles', () => {
  it('carries the mirrored current: exchanging drain and source turns the current and nothing else', () => {
    for (const law of ['square', 'smooth'] as const) {
      const element = mosfet('Q1', [1, 2, 3, 4], { ...bulk, polarity: 1, law });
      const forward = evaluateElement(element, [2, 3, 0.5, 0]);
      const back = evaluateElement(element, [0.5, 3, 2, 0]);
      expect(back.residual[0]).toBe(forward.residual[2]);
      expect(back.residual[2]).toBe(forward.residual[0]);
      const [drain, gate, source, body] = forward.jacobian[0] ?? [];
      const [backDrain, backGate, backSource, backBody] = back.jacobian[2] ?? [];
      expect([backSource, backGate, backDrain, backBody]).toEqual([drain, gate, source, body]);
    }
  });
});
