import { describe, expect, it } from 'vitest';
import { mosfet, thermalVoltage, type MosfetParameters } from '../../../solver/index.ts';
import { readElement } from './local.ts';

const nChannel: MosfetParameters = { polarity: 1, law: 'square', threshold: 1, gainFactor: 2e-3 };
const pChannel: MosfetParameters = { ...nChannel, polarity: -1, threshold: -1 };
const read = (parameters: MosfetParameters, unknowns: number[], temperature?: number) =>
  readElement(mosfet('Q1', [1, 2, 3, 4], parameters), unknowns, temperature);

describe('mosfet, square law, by hand', () => {
  it('saturation: V_OV = 2 V, V_DS = 5 V, so I_D = (2 mA/V²/2)·4 V² = 4 mA, g_m = 4 mS', () => {
    const q = read(nChannel, [5, 3, 0, 0]);
    expect(q.region).toBe('saturation');
    expect(q.reversed).toBe(false);
    expect(q.threshold).toBe(1);
    expect(q.overdrive).toBe(2);
    expect(q.saturationVoltage).toBe(2);
    expect(q.channelCurrent).toBeCloseTo(4e-3, 15);
    expect(q.drainCurrent).toBeCloseTo(4e-3, 10); // the junction's and the leak's picoamperes beside it
    expect(q.transconductance).toBeCloseTo(4e-3, 15);
    expect(q.outputConductance).toBe(0);
    expect(q.power).toBeCloseTo(20e-3, 9);
  });

  it('triode: V_OV = 2 V, V_DS = 0.5 V, so I_D = 2 mA/V²·(1 − 0.125) V² = 1.75 mA, g_ds = 3 mS', () => {
    const q = read(nChannel, [0.5, 3, 0, 0]);
    expect(q.region).toBe('triode');
    expect(q.channelCurrent).toBeCloseTo(1.75e-3, 15);
    expect(q.transconductance).toBeCloseTo(1e-3, 15);
    expect(q.outputConductance).toBeCloseTo(3e-3, 15);
  });

  it('the edge V_DS = V_OV counts as saturation, and both expressions meet there with λ', () => {
    const q = { ...nChannel, lengthModulation: 0.05 };
    expect(read(q, [2, 3, 0, 0]).region).toBe('saturation');
    const below = read(q, [2 - 1e-9, 3, 0, 0]);
    const above = read(q, [2, 3, 0, 0]);
    expect(below.channelCurrent).toBeCloseTo(above.channelCurrent, 11);
    expect(above.channelCurrent).toBeCloseTo(4e-3 * 1.1, 15);
    expect(above.outputConductance).toBeCloseTo(4e-3 * 0.05, 15);
  });

  it('cutoff at V_OV = 0 exactly: no channel current, only junction and leak', () => {
    const q = read(nChannel, [5, 1, 0, 0]);
    expect(q.region).toBe('cutoff');
    expect(q.channelCurrent).toBe(0);
    // I_S = 1e-12 A and two leaks of 5e-13 S at 5 V: channel and drain–body junction.
    expect(q.drainCurrent).toBeCloseTo(1e-12 + 2 * 5 * 5e-13, 20);
    expect(q.saturationVoltage).toBe(0);
  });

  it('body effect: 2φ_F = 0.8 V, γ = 0.4 √V, V_SB = 2.8 V raise V_T by 0.4·(√3.6 − √0.8) = 0.4012 V', () => {
    const q = read({ ...nChannel, bodyFactor: 0.4, surfacePotential: 0.8 }, [6, 5.8, 2.8, 0]);
    expect(q.sourceToBody).toBeCloseTo(2.8, 12);
    expect(q.threshold).toBeCloseTo(1 + 0.4 * (1.8973665961 - 0.894427191), 9);
    // g_mb/g_m = γ/(2√(2φ_F + V_SB)) = 0.4/(2·1.897367)
    expect(q.bodyTransconductance / q.transconductance).toBeCloseTo(0.4 / (2 * 1.8973665961), 9);
  });

  it('p-channel mirrors: true signs of voltages, current positive in its normal direction', () => {
    const q = read(pChannel, [-5, -3, 0, 0]);
    expect(q).toMatchObject({
      region: 'saturation',
      gateToSource: -3,
      drainToSource: -5,
      threshold: -1,
      overdrive: 2,
    });
    expect(q.drainCurrent).toBeCloseTo(4e-3, 10);
    expect(q.transconductance).toBeCloseTo(4e-3, 15);
    expect(q.power).toBeCloseTo(20e-3, 9);
  });

  it('reversed: V_DS < 0 exchanges the roles, and overdrive and threshold are those of the exchanged roles', () => {
    // Drain at 0 V, source at 0.5 V with the body at 0 V, gate at 3 V: as a device whose source is the drain pin.
    const q = read(nChannel, [0, 3, 0.5, 0]);
    expect(q.reversed).toBe(true);
    expect(q.gateToSource).toBe(2.5);
    expect(q.overdrive).toBe(2);
    expect(q.region).toBe('triode');
    expect(q.channelCurrent).toBeCloseTo(-1.75e-3, 15);
    expect(q.drainCurrent).toBeCloseTo(-1.75e-3, 10);
  });

  it('body diode: off, with the source above the drain by 0.7 V, the junction carries 1e-12·(e^{0.7/U_T} − 1)', () => {
    const q = read({ ...nChannel, threshold: 3 }, [-0.7, 0, 0, 0]);
    const forward = 1e-12 * Math.expm1(0.7 / 0.02569257912);
    expect(q.region).toBe('body-diode');
    expect(q.drainJunctionCurrent / forward).toBeCloseTo(1, 6);
    expect(q.diodeCurrent).toBe(-q.drainJunctionCurrent);
    expect(q.drainCurrent).toBeCloseTo(-forward, 8);
    expect(q.channelCurrent).toBe(0);
  });

  it('a channel that carries more than its diode is no body diode: reverse conduction through the channel', () => {
    const q = read({ ...nChannel, gainFactor: 1 }, [-0.3, 5, 0, 0]);
    expect(q.region).toBe('triode');
    expect(q.reversed).toBe(true);
  });

  it('temperature: V_T0 − 4 mV/K and β·(T/T0)^−1.5 as discrete parts have them', () => {
    const q = read(nChannel, [10, 3, 0, 0], 398.15);
    expect(q.threshold).toBeCloseTo(1 - 0.4, 12);
    // (398.15/298.15)^−1.5 = 0.648026
    expect(q.channelCurrent).toBeCloseTo(((2e-3 * (398.15 / 298.15) ** -1.5) / 2) * 2.4 ** 2, 12);
    expect(read(pChannel, [-10, -3, 0, 0], 398.15).threshold).toBeCloseTo(-0.6, 12);
  });

  it('with series resistances the region is judged inside them', () => {
    // 1.75 mA through 100 Ω at drain and at source: pins at 0.5 + 2·0.175 V, inner voltages those of the triode case.
    const q = readElement(
      mosfet('Q1', [1, 2, 3, 4], { ...nChannel, drainResistance: 100, sourceResistance: 100 }),
      [0.85, 3.175, 0, 0, 0.675, 0.175],
    );
    expect(q.channelVoltage).toBeCloseTo(0.5, 12);
    expect(q.overdrive).toBeCloseTo(2, 12);
    expect(q.channelCurrent).toBeCloseTo(1.75e-3, 12);
    expect(q.drainToSource).toBe(0.85);
    expect(q.drainCurrent).toBeCloseTo(1.75e-3, 10);
  });
});

describe('mosfet, smooth law', () => {
  const smooth: MosfetParameters = { ...nChannel, law: 'smooth', slopeFactor: 1.4 };
  const ut = thermalVoltage(298.15);

  it('weak inversion: g_m/I_D tends to 1/(nU_T), and ten times the current takes n·U_T·ln 10 (Enz, Krummenacher and Vittoz 1995)', () => {
    const q = read(smooth, [2, 0.4, 0, 0]);
    expect(q.inversion).toBe('weak');
    expect((q.transconductance / q.channelCurrent) * 1.4 * ut).toBeCloseTo(1, 3);
    const decade = read(smooth, [2, 0.4 - 1.4 * ut * Math.LN10, 0, 0]);
    expect(q.channelCurrent / decade.channelCurrent).toBeCloseTo(10, 2);
  });

  it('strong inversion: saturation current tends to β/(2n)·V_OV²', () => {
    const q = read(smooth, [40, 21, 0, 0]);
    expect(q.inversion).toBe('strong');
    expect(q.region).toBe('saturation');
    expect(q.channelCurrent / ((2e-3 / 2.8) * 400)).toBeCloseTo(1, 6);
  });

  it('at V_GS = V_T0: i_f = ln²2 = 0.48045, moderate; V_DSsat = U_T(2√(i_f + ¼) + 3)', () => {
    const q = read(smooth, [2, 1, 0, 0]);
    expect(q.inversionCoefficient).toBeCloseTo(0.4804530139, 9);
    expect(q.inversion).toBe('moderate');
    expect(q.saturationVoltage).toBeCloseTo(ut * (2 * Math.sqrt(0.7304530139) + 3), 9);
    // I = 2nβU_T²·ln²2 in saturation, the reverse term being e^{−2/U_T}
    expect(q.channelCurrent).toBeCloseTo(2 * 1.4 * 2e-3 * ut * ut * 0.4804530139, 12);
  });

  it('levels: weak below 0.1, strong above 10, cutoff below 1e-4 of the forward coefficient', () => {
    // i_f = ln²(1 + e^{(V_GS − V_T0)/(2nU_T)}): solve for V_GS.
    const gateFor = (inversion: number) => 1 + 2 * 1.4 * ut * Math.log(Math.expm1(Math.sqrt(inversion)));
    const at = (inversion: number) => read(smooth, [3, gateFor(inversion), 0, 0]);
    expect(at(0.099).inversion).toBe('weak');
    expect(at(0.101).inversion).toBe('moderate');
    expect(at(9.9).inversion).toBe('moderate');
    expect(at(10.1).inversion).toBe('strong');
    expect(at(1.01e-4).region).toBe('saturation');
    expect(at(0.99e-4).region).toBe('cutoff');
  });

  it('weak inversion stands beside triode where V_DS is small', () => {
    const q = read(smooth, [0.02, 0.7, 0, 0]);
    expect(q.region).toBe('triode');
    expect(q.inversion).toBe('weak');
  });

  it('threshold at a source above the body: V_T0 + (n − 1)V_SB without γ, the body effect with γ', () => {
    expect(read(smooth, [5, 4, 2, 0]).threshold).toBeCloseTo(1 + 0.4 * 2, 12);
    const bulk = read({ ...smooth, bodyFactor: 0.5, surfacePotential: 0.7 }, [5, 4, 2, 0]);
    expect(bulk.threshold).toBeCloseTo(1 + 0.5 * (Math.sqrt(2.7) - Math.sqrt(0.7)), 12);
  });
});
