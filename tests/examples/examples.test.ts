import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readStage } from '../../src/stage/readStage.ts';
import { settleStage } from '../../src/readings/settleStage.ts';
import { expectNear } from '../published/circuit.ts';
import { d, root } from '../published/decimal.ts';
import { exampleText, settledExample } from './settled.ts';

/**
 * Every stage in examples/ settled and held against a hand that knows nothing of the solver: the square law worked
 * at 64 digits, the working in the comment. Junction leakage (1e-12 A) and the declared leak (5e-13 S) are left out
 * of the working; that is the room in the bounds.
 */
const names = readdirSync(new URL('../../examples/', import.meta.url))
  .filter((file) => file.endsWith('.stage.json'))
  .map((file) => file.slice(0, -'.stage.json'.length));

describe('every example', () => {
  for (const name of names) {
    it(`${name} settles in every state, with currents that sum to zero in every part`, async () => {
      const read = await readStage(exampleText(name));
      expect(read.ok ? [] : read.faults).toEqual([]);
      if (!read.ok) return;
      const readings = settleStage(read.value);
      for (const [stateName, state] of Object.entries(readings.states)) {
        expect(state.settled, `${stateName}: ${state.settled ? '' : state.reason}`).toBe(true);
        if (!state.settled) continue;
        expect(state.residual.ratio).toBeLessThanOrEqual(1);
        const sums = new Map<string, { sum: number; pins: number }>();
        for (const [pin, amps] of Object.entries(state.pinCurrents)) {
          const part = pin.slice(0, pin.indexOf('.'));
          const entry = sums.get(part) ?? { sum: 0, pins: 0 };
          sums.set(part, { sum: entry.sum + (amps ?? Number.NaN), pins: entry.pins + 1 });
        }
        for (const [part, { sum, pins }] of sums) {
          if (pins > 1) expect(Math.abs(sum), `${stateName} ${part}`).toBeLessThan(1e-15);
        }
      }
    });
  }
});

/** V_DS in triode behind a resistance R on E: E − v = Rβ(V_OV·v − v²/2), the smaller root. */
function triodeDrop(supply: number, resistance: number, beta: number, overdrive: ReturnType<typeof d>) {
  const a = d(resistance).times(beta).div(2);
  const b = d(resistance).times(beta).times(overdrive).plus(1);
  return b.minus(b.pow(2).minus(a.times(supply).times(4)).sqrt()).div(a.times(2));
}

/** V_OV where ½βx² flows through a source resistance below a drive of V_G − V_T: ½βR·x² + x − drive = 0. */
function degenerateOverdrive(drive: ReturnType<typeof d>, resistance: number, beta: number) {
  const a = d(beta).times(resistance).div(2);
  return d(1).plus(a.times(drive).times(4)).sqrt().minus(1).div(a.times(2));
}

describe('pump switch', async () => {
  const example = await settledExample('pump-switch');
  it('drops 29.5 mV at 2.00 A while pumping, duty held', () => {
    // Gate on 5·100k/100.1k = 4.995 V, V_OV = 3.395 V; 12 − v = 6·20(3.395v − v²/2).
    const overdrive = d(5).times(100e3).div(100.1e3).minus('1.6');
    const v = triodeDrop(12, 6, 20, overdrive);
    const q1 = example.mosfet('pumping', 'Q1');
    expectNear(q1.drainToSource ?? Number.NaN, v.toNumber(), 1e-7);
    expectNear(q1.drainCurrent ?? Number.NaN, d(12).minus(v).div(6).toNumber(), 1e-7);
    expect(q1.region).toBe('triode');
    expect(q1.verdict).not.toBe('missed');
  });
  it('blocks when idle', () => {
    const q1 = example.mosfet('idle', 'Q1');
    expect(q1.region).toBe('cutoff');
    expect(q1.duty).toBe('block');
    expect(Math.abs(q1.drainCurrent ?? Number.NaN)).toBeLessThan(1e-10);
    expectNear(q1.drainToSource ?? Number.NaN, 12, 1e-8);
  });
});

describe('modem rail switch', async () => {
  const example = await settledExample('modem-rail-switch');
  it('carries the modem with the gate held 9.9 V below the rail while awake', () => {
    // Q1 in triode: 12 − v = 24·4(V_OV·v − v²/2), V_OV = V_SG − 1.8 with V_SG as the clamp leaves it, read back: the
    // transistor and its load are checked exactly, the clamp by its own law below.
    const q1 = example.mosfet('awake', 'Q1');
    const gate = d(q1.gateToSource ?? Number.NaN).negated();
    const v = triodeDrop(12, 24, 4, gate.minus('1.8'));
    expectNear(-(q1.drainToSource ?? Number.NaN), v.toNumber(), 1e-7);
    expect(q1.region).toBe('triode');
    // R2 and Q2 draw what R1 and VR1 bring: (12 − V_SG − V_DS2)/1k = V_SG/10k + I_Z, to a nanoampere.
    const v2 = example.mosfet('awake', 'Q2').drainToSource ?? Number.NaN;
    const drawn = (12 - gate.toNumber() - v2) / 1e3;
    const zener = -(example.twoPin('awake', 'VR1').current ?? Number.NaN);
    expectNear(drawn, gate.toNumber() / 10e3 + zener, 1e-7);
    // An exponential of slope 10 Ω at 5 mA through 10 V: V = 10 + 0.05·ln(I/5 mA), give or take its saturation current.
    expectNear(gate.toNumber(), 10 + 0.05 * Math.log(zener / 5e-3), 1e-3);
  });
  it('is off asleep, its gate at the rail', () => {
    const q1 = example.mosfet('asleep', 'Q1');
    expect(q1.region).toBe('cutoff');
    expect(Math.abs(q1.gateToSource ?? Number.NaN)).toBeLessThan(1e-4);
    expect(example.mosfet('asleep', 'Q2').region).toBe('cutoff');
  });
});

describe('battery polarity protection', async () => {
  const example = await settledExample('battery-polarity');
  it('the right way round carries the load backwards through its channel', () => {
    // Roles exchanged: source pin 12 − 0.05·I − v at the load; with the gate on ground the acting source is the drain
    // pin: V_OV = V_D − 1.8 and I = 4(V_OV·v − v²/2); V_D = 12 − 0.05·I; I = (V_D − v)/20.
    const drainOf = (v: ReturnType<typeof d>) =>
      d(12)
        .plus(v.div(400))
        .div(d(1).plus(d(1).div(400)));
    const v = root(
      (x) => {
        const drain = drainOf(x);
        return d(4)
          .times(drain.minus('1.8').times(x).minus(x.pow(2).div(2)))
          .minus(drain.minus(x).div(20));
      },
      0,
      1,
    );
    const q1 = example.mosfet('right', 'Q1');
    expect(q1.reversed).toBe(true);
    expect(q1.region).toBe('triode');
    expectNear(q1.drainToSource ?? Number.NaN, v.toNumber(), 1e-6);
    expectNear(q1.drainCurrent ?? Number.NaN, -drainOf(v).minus(v).div(20).toNumber(), 1e-6);
    expect(q1.verdict).not.toBe('missed');
  });
  it('the wrong way round blocks, with the whole battery across it', () => {
    const q1 = example.mosfet('reversed', 'Q1');
    expect(q1.region).toBe('cutoff');
    expect(q1.verdict).not.toBe('missed');
    expectNear(q1.drainToSource ?? Number.NaN, -12, 1e-6);
    expect(Math.abs(q1.drainCurrent ?? Number.NaN)).toBeLessThan(1e-10);
  });
});

describe('level-probe current sink', () => {
  it('holds 1.172 mA', async () => {
    // x = V_OV: ½·0.02·1500x² + x − 2.1 = 0, or 15x² + x − 2.1 = 0.
    const x = degenerateOverdrive(d('2.1'), 1500, 0.02);
    const q1 = (await settledExample('level-probe-sink')).mosfet('measuring', 'Q1');
    expectNear(q1.drainCurrent ?? Number.NaN, d('2.1').minus(x).div(1500).toNumber(), 1e-7);
    expectNear(q1.drainCurrent ?? Number.NaN, 1.1718e-3, 1e-4);
    expect(q1.region).toBe('saturation');
    expect(q1.verdict).not.toBe('missed');
  });
});

describe('echo preamplifier', async () => {
  const example = await settledExample('echo-preamplifier');
  it('rests at 1.412 mA with 2.62 V of headroom while listening', () => {
    // V_G = 12·470/1470; I = ½·0.004·(V_G − 1000·I − 1.6)²·(1 + 0.01(12 − 5700·I)).
    const gate = d(12).times(470).div(1470);
    const current = root(
      (i) =>
        d('0.002')
          .times(gate.minus(i.times(1000)).minus('1.6').pow(2))
          .times(d(1).plus(d('0.01').times(d(12).minus(i.times(5700)))))
          .minus(i),
      0,
      '0.0022',
    );
    const q1 = example.mosfet('listening', 'Q1');
    expectNear(q1.drainCurrent ?? Number.NaN, current.toNumber(), 1e-6);
    expectNear(example.volts('listening', 'Q1.drain'), d(12).minus(current.times(4700)).toNumber(), 1e-6);
    const overdrive = gate.minus(current.times(1000)).minus('1.6');
    const headroom = d(12).minus(current.times(5700)).minus(overdrive).minus('0.5');
    expectNear(q1.headroom ?? Number.NaN, headroom.toNumber(), 1e-6);
    expectNear(q1.headroom ?? Number.NaN, 2.62, 3e-3);
    expect(q1.verdict).not.toBe('missed');
  });
  it('blocks the lamp while listening with 1.40 V of headroom, and lights it on command', () => {
    // V_GS = 0.2 V; the law carries 1 µA at 0.08/2·x²·(1 + 0.01·12) = 1 µA, x = 4.7 mV: 1.6 + 0.0047 − 0.2.
    const x = d('1e-6').div(d('0.04').times('1.12')).sqrt();
    const off = example.mosfet('listening', 'Q2');
    expectNear(off.headroom ?? Number.NaN, x.plus('1.4').toNumber(), 1e-4);
    expect(off.region).toBe('cutoff');
    const on = example.mosfet('lampOn', 'Q2');
    expect(on.region).toBe('triode');
    expect(on.verdict).not.toBe('missed');
  });
});

describe('echo cascode', () => {
  it('rests at 1.006 mA, both transistors in saturation', async () => {
    // V_G1 = 12·180/990, V_G2 = 12·310/990; 470 Ω in the source; equal currents give equal overdrives.
    const x = degenerateOverdrive(d(12).times(180).div(990).minus(1), 470, 0.004);
    const current = d('0.002').times(x.pow(2));
    const example = await settledExample('echo-cascode');
    const [q1, q2] = [example.mosfet('listening', 'Q1'), example.mosfet('listening', 'Q2')];
    expectNear(q1.drainCurrent ?? Number.NaN, current.toNumber(), 1e-7);
    expectNear(q2.drainCurrent ?? Number.NaN, current.toNumber(), 1e-7);
    expectNear(
      example.volts('listening', 'Q1.drain'),
      d(12).times(310).div(990).minus(1).minus(x).toNumber(),
      1e-7,
    );
    expectNear(example.volts('listening', 'Q2.drain'), d(12).minus(current.times(3300)).toNumber(), 1e-7);
    expect([q1.region, q2.region]).toEqual(['saturation', 'saturation']);
  });
});

describe('float-potentiometer follower', async () => {
  const example = await settledExample('float-follower');
  for (const [state, position] of [
    ['reading', '0.4'],
    ['empty', '0.7'],
    ['full', '0.1'],
  ] as const) {
    it(`follows the wiper in state ${state}, its threshold raised by the body`, () => {
      // V_G = 5(1 − position); ½·0.002(V_G − v − V_T(v))² = v/10k, V_T = 0.7 + 0.5(√(0.7 + v) − √0.7).
      const gate = d(5).times(d(1).minus(position));
      const threshold = (v: ReturnType<typeof d>) =>
        d('0.7').plus(d('0.5').times(v.plus('0.7').sqrt().minus(d('0.7').sqrt())));
      // The root lies below the edge V_G − v − V_T(v) = 0.
      const edge = root((v) => gate.minus(v).minus(threshold(v)), 0, 5);
      const v = root(
        (x) =>
          d('0.001')
            .times(gate.minus(x).minus(threshold(x)).pow(2))
            .minus(x.div(10e3)),
        0,
        edge.toString(),
      );
      expectNear(example.volts(state, 'Q1.source'), v.toNumber(), 1e-6);
      expectNear(example.mosfet(state, 'Q1').threshold ?? Number.NaN, threshold(v).toNumber(), 1e-6);
    });
  }
});

describe('dual-probe mirror', () => {
  it('sets 199 µA in the reference and 231 µA in each probe', async () => {
    // Reference: 5 − v = 18k·0.0005(v − 0.8)²(1 + 0.02v). Outputs: I = 0.0005·x²(1 + 0.02(12 − 10k·I)).
    const v = root(
      (x) =>
        d(5)
          .minus(x)
          .minus(
            d(9)
              .times(x.minus('0.8').pow(2))
              .times(d(1).plus(x.times('0.02'))),
          ),
      '0.8',
      5,
    );
    const k = d('0.0005').times(v.minus('0.8').pow(2));
    const out = k.times('1.24').div(d(1).plus(k.times(200)));
    const example = await settledExample('dual-probe-mirror');
    expectNear(
      example.mosfet('measuring', 'Q1').drainCurrent ?? Number.NaN,
      d(5).minus(v).div(18e3).toNumber(),
      1e-6,
    );
    for (const name of ['Q2', 'Q3']) {
      const q = example.mosfet('measuring', name);
      expectNear(q.drainCurrent ?? Number.NaN, out.toNumber(), 1e-6);
      expect(q.verdict).not.toBe('missed');
    }
  });
});

describe('pressure-bridge pair', () => {
  it('takes the difference of the bridge by the large-signal equation', async () => {
    // Tail: 12 − 1 − x = 10k·½·0.008x², I = 0.004x². Bridge: 5·3.52/7.02 and 5·3.48/6.98, a difference v of 14.3 mV;
    // ΔI = ½·0.004·v√(4I/0.004 − v²).
    const x = d(1).plus(d(4).times(40).times(11)).sqrt().minus(1).div(80);
    const tail = d('0.004').times(x.pow(2));
    const difference = d(5).times(3520).div(7020).minus(d(5).times(3480).div(6980));
    const delta = d('0.002')
      .times(difference)
      .times(tail.times(4).div('0.004').minus(difference.pow(2)).sqrt());
    const example = await settledExample('pressure-bridge');
    expectNear(example.mosfet('measuring', 'Q3').drainCurrent ?? Number.NaN, tail.toNumber(), 1e-6);
    const [q1, q2] = [example.mosfet('measuring', 'Q1'), example.mosfet('measuring', 'Q2')];
    expectNear(q1.drainCurrent ?? Number.NaN, tail.plus(delta).div(2).toNumber(), 1e-6);
    expectNear(q2.drainCurrent ?? Number.NaN, tail.minus(delta).div(2).toNumber(), 1e-6);
    expectNear(
      example.volts('measuring', 'TP1.node'),
      d(12).minus(tail.plus(delta).times(2350)).toNumber(),
      1e-6,
    );
  });
});

describe('flood-alarm relay', async () => {
  const example = await settledExample('alarm-relay');
  it('pulls in with 74.5 mA and 74 mV', () => {
    // Gate on 5·100k/100.22k; 12 − v = 160·0.3(V_OV·v − v²/2).
    const v = triodeDrop(12, 160, 0.3, d(5).times(100e3).div(100.22e3).minus('1.6'));
    const q1 = example.mosfet('alarm', 'Q1');
    expectNear(q1.drainToSource ?? Number.NaN, v.toNumber(), 1e-6);
    expectNear(example.twoPin('alarm', 'K1').current ?? Number.NaN, d(12).minus(v).div(160).toNumber(), 1e-6);
  });
  it('is quiet without drive', () => {
    expect(example.mosfet('quiet', 'Q1').region).toBe('cutoff');
  });
});

describe('debris-screen heater', () => {
  it('drops between what its facts state at 10 V and at 4.5 V on the gate, and is covered by a fact', async () => {
    // Entered by facts: 15 mΩ typical at 10 V, 20 mΩ at 4.5 V, both at 25 °C. At 4.995 V the resistance lies between,
    // and in the cold of the stage (0 °C) below the warm figure: R ∝ 1/β ∝ T^1.5 against a threshold 0.1 V higher.
    const example = await settledExample('screen-heater');
    const q1 = example.mosfet('heating', 'Q1');
    const resistance = (q1.drainToSource ?? Number.NaN) / (q1.drainCurrent ?? Number.NaN);
    expect(resistance).toBeGreaterThan(0.013);
    expect(resistance).toBeLessThan(0.02);
    expectNear(q1.drainCurrent ?? Number.NaN, 12 / (8 + resistance), 1e-6);
    expect(q1.verdict).toBe('held');
    expect(q1.reasons).toEqual(['nominal only']);
    expect(example.mosfet('thawed', 'Q1').verdict).toBe('held');
  });
});
