import { describe, expect, it } from 'vitest';
import { bipolarAmplify, mosfetAmplify } from '../../../../src/readings/duty/amplify.ts';
import { mosfetBlock } from '../../../../src/readings/duty/block.ts';
import { judge } from '../../../../src/readings/duty/condition.ts';
import { bipolarConduct, bipolarReserve, mosfetConduct } from '../../../../src/readings/duty/conduct.ts';
import type { AmplifyTerms, ConductTerms } from '../../../../src/readings/duty/terms.ts';

/** The definitions of the stage file's contract, point by point, on points made up here. */
const point =
  (figures: Readonly<Record<string, number>>) =>
  (_: number, quantity: string): number => {
    const figure = figures[quantity];
    if (figure === undefined) throw new Error(`the judgement asks for ${quantity}`);
    return figure;
  };

describe('amplify', () => {
  const terms: AmplifyTerms = { kind: 'amplify', signalPeak: 0.5, saturationVoltage: 0.2 };
  const resting = { diodeCarries: 0, conducts: 1, reversed: 0, saturationMargin: 0.5, drainCurrent: 1e-3 };
  const verdict = (change: Readonly<Record<string, number>>, window?: AmplifyTerms['currentWindow']) =>
    judge(
      {
        conditions: mosfetAmplify(0, window === undefined ? terms : { ...terms, currentWindow: window }),
        remarks: [],
      },
      point({ ...resting, ...change }),
    );

  it('is held with just the signal peak beyond saturation, and missed with less', () => {
    expect(verdict({})).toEqual({ verdict: 'held', reasons: [] });
    expect(verdict({ saturationMargin: 0.4 })).toEqual({
      verdict: 'missed',
      reasons: ['the room is 100 mV short of saturation with a signal peak of 500 mV'],
    });
    expect(verdict({ saturationMargin: -1 }).reasons).toEqual([
      'the drain is 1.5 V short of saturation with a signal peak of 500 mV',
    ]);
  });

  it('is missed when reversed, in cutoff, or carried by the body diode', () => {
    expect(verdict({ reversed: 1 }).verdict).toBe('missed');
    expect(verdict({ conducts: 0, saturationMargin: -0.3 }).reasons).toContain('the channel is cut off');
    expect(verdict({ diodeCarries: 1 }).verdict).toBe('missed');
  });

  it('is held at either end of its current window and missed outside', () => {
    expect(verdict({}, { low: 1e-3, high: 2e-3 }).verdict).toBe('held');
    expect(verdict({}, { low: 0.5e-3, high: 1e-3 }).verdict).toBe('held');
    expect(verdict({}, { low: 2e-3, high: 3e-3 }).reasons).toEqual([
      'the current is 1 mA, less than the 2 mA of its window',
    ]);
    expect(verdict({}, { low: 0, high: 0.5e-3 }).verdict).toBe('missed');
  });

  it('asks a bipolar transistor to be active with V_CE(sat) and the peak to spare', () => {
    const conditions = bipolarAmplify(0, terms);
    const active = { active: 1, reversed: 0, drop: 0.7, collectorCurrent: 1e-3 };
    expect(judge({ conditions, remarks: [] }, point(active)).verdict).toBe('held');
    expect(judge({ conditions, remarks: [] }, point({ ...active, drop: 0.69 })).verdict).toBe('missed');
    expect(judge({ conditions, remarks: [] }, point({ ...active, active: 0 })).verdict).toBe('missed');
  });
});

describe('conduct', () => {
  const terms: ConductTerms = { kind: 'conduct', dropLimit: 0.5, forcedGain: 10 };
  const byModel = { enteredBy: 'model', polarity: 1 } as const;
  const on = { overdrive: 3.4, channelShare: 1, drop: 0.5, onResistance: 3, edge: -3, gateToSource: 5 };

  it('is held at its drop limit, with the reason that no fact stands behind a model', () => {
    expect(judge(mosfetConduct(0, terms, byModel), point(on))).toEqual({
      verdict: 'held',
      reasons: ['entered by model: no data-sheet fact behind it'],
    });
  });

  it('is missed past its drop limit, with the channel off, or with the diode carrying more than a tenth', () => {
    const verdict = (change: Readonly<Record<string, number>>) =>
      judge(mosfetConduct(0, terms, byModel), point({ ...on, ...change }));
    expect(verdict({ drop: 0.6 }).reasons).toEqual(['the drop is 600 mV, more than its limit of 500 mV']);
    expect(verdict({ overdrive: 0 }).verdict).toBe('missed');
    expect(verdict({ channelShare: 0.9 }).verdict).toBe('held');
    expect(verdict({ channelShare: 0.89 }).verdict).toBe('missed');
  });

  it('takes 1.5 times the largest stated R_DS(on) where no drop is stated', () => {
    const facts = { enteredBy: 'facts', polarity: 1, largestOnResistance: 2, coveredFrom: 4.5 } as const;
    const duty = mosfetConduct(0, { kind: 'conduct', forcedGain: 10 }, facts);
    expect(judge(duty, point(on))).toEqual({ verdict: 'held', reasons: [] });
    expect(judge(duty, point({ ...on, onResistance: 3.1 })).verdict).toBe('missed');
  });

  it('is at risk where the drive is below every V_GS with a maximum R_DS(on), for both channels', () => {
    const facts = { enteredBy: 'facts', polarity: 1, largestOnResistance: 2, coveredFrom: 4.5 } as const;
    expect(judge(mosfetConduct(0, terms, facts), point({ ...on, gateToSource: 3.3 }))).toEqual({
      verdict: 'at-risk',
      reasons: [
        'drive not covered by a fact',
        '3.3 V at the gate; a maximum R_DS(on) is stated from 4.5 V on',
      ],
    });
    const p = { ...facts, polarity: -1 } as const;
    expect(judge(mosfetConduct(0, terms, p), point({ ...on, gateToSource: -4.5 })).verdict).toBe('held');
    expect(judge(mosfetConduct(0, terms, p), point({ ...on, gateToSource: -4 })).verdict).toBe('at-risk');
  });

  it('is at risk where facts state no maximum R_DS(on) at all', () => {
    const facts = { enteredBy: 'facts', polarity: 1 } as const;
    expect(judge(mosfetConduct(0, terms, facts), point({ ...on, gateToSource: 20 })).reasons[0]).toBe(
      'drive not covered by a fact',
    );
  });

  it('judges by the region alone where neither drop nor fact is stated, and says so', () => {
    const duty = mosfetConduct(0, { kind: 'conduct', forcedGain: 10 }, byModel);
    expect(judge(duty, point(on)).reasons).toEqual([
      'region only',
      'entered by model: no data-sheet fact behind it',
    ]);
    expect(judge(duty, point({ ...on, edge: 0 })).verdict).toBe('missed');
  });

  it('asks a bipolar transistor to be saturated within its forced gain, and reads the reserve', () => {
    const { conditions } = bipolarConduct(0, terms);
    const duty = { conditions: conditions.slice(0, 2), remarks: [] };
    const saturated = { saturated: 1, forcedGain: 10, currentMagnitude: 10e-3, baseMagnitude: 1e-3 };
    expect(judge(duty, point(saturated)).verdict).toBe('held');
    expect(judge(duty, point({ ...saturated, forcedGain: 12 })).reasons).toEqual([
      'collector over base current is 12, more than 10',
    ]);
    expect(bipolarReserve(0, terms, point({ ...saturated, baseMagnitude: 1.5e-3 }))).toBeCloseTo(0.5, 12);
  });
});

describe('block', () => {
  const conditions = mosfetBlock(0, { kind: 'block', leakLimit: 1e-6 });
  const verdict = (currentMagnitude: number, forwardJunction: number) =>
    judge({ conditions, remarks: [] }, point({ currentMagnitude, forwardJunction }));

  it('is held up to the leak in the drain and in either junction, and missed beyond', () => {
    expect(verdict(1e-6, 1e-6)).toEqual({ verdict: 'held', reasons: [] });
    expect(verdict(2e-6, 0).reasons).toEqual(['2 µA flows, more than the 1 µA it may leak']);
    expect(verdict(0, 2e-6).reasons).toEqual(['a body junction carries 2 µA forward, more than 1 µA']);
  });

  it('is missed, with its reason, where the drawing does not set what flows', () => {
    expect(verdict(Number.NaN, 0)).toEqual({
      verdict: 'missed',
      reasons: ['what the duty asks is not set by the drawing'],
    });
  });
});
