import { describe, expect, it } from 'vitest';
import type { SettledState, UnsettledState } from '../../../src/readings/readings.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';
import { drawn, example, settled, threeParts } from './support/stages.ts';

const document = example('echo-preamplifier');
const listening = (): SettledState => {
  const readings = settled(document, 'listening');
  if (!readings.settled) throw new Error(readings.reason);
  return readings;
};
const missed = (): SettledState => {
  const readings = listening();
  const q1 = readings.parts.Q1;
  if (q1 === undefined) throw new Error('no Q1');
  return { ...readings, parts: { ...readings.parts, Q1: { ...q1, verdict: 'missed' } as typeof q1 } };
};

describe('a stage without readings', () => {
  it('is drawn in ink alone', () => {
    const drawing = drawn(document, {}, null);
    expect(drawing.primitives.every(({ layer }) => layer === 'still')).toBe(true);
    expect(drawing.unplaced).toEqual([]);
  });

  it('has the same names in the same places as with them', () => {
    const still = (drawing: ReturnType<typeof drawn>) =>
      drawing.primitives.filter(({ layer }) => layer === 'still');
    expect(still(drawn(document, {}, null))).toEqual(still(drawn(document, {}, listening())));
  });
});

describe('stale readings', () => {
  const drawing = drawn(document, { stale: true }, missed());

  it('are all grey and struck through', () => {
    const figures = drawing.primitives.filter(
      ({ thing, layer }) =>
        layer === 'readings' && (thing === 'figure' || thing === 'word' || thing === 'verdict'),
    );
    const texts = figures.flatMap((one) => (one.kind === 'text' ? [one] : []));
    expect(texts.length).toBeGreaterThan(8);
    for (const text of texts) expect([text.role, text.struck], text.text).toEqual(['soft', true]);
  });

  it('leave nothing in the colours of settled figures or verdicts, signs apart', () => {
    for (const one of drawing.primitives) {
      if (one.thing === 'snag' || one.thing === 'caution') continue;
      const roles = one.kind === 'text' ? [one.role] : [one.stroke, one.fill];
      for (const role of roles) expect(['read', 'held', 'atRisk', 'missed'], one.id).not.toContain(role);
    }
  });

  it('stand where they stood', () => {
    const placed = (which: ReturnType<typeof drawn>) =>
      which.primitives.flatMap((one) => (one.kind === 'text' ? [[one.id, one.x, one.y]] : []));
    expect(placed(drawing)).toEqual(placed(drawn(document, {}, missed())));
  });
});

describe('a missed duty', () => {
  it('is said in a word beside the badge', () => {
    const words = drawn(document, {}, missed()).primitives.flatMap((one) =>
      one.kind === 'text' && one.thing === 'verdict' ? [one.text] : [],
    );
    expect(words).toEqual(['missed']);
  });
});

describe('a node that the drawing does not fix', () => {
  it('has a dashed chip with words and no number', () => {
    const readings = settled(threeParts());
    if (!readings.settled) throw new Error(readings.reason);
    const divided = example('float-follower');
    const level = settled(divided);
    if (!level.settled) throw new Error(level.reason);
    const pins = Object.fromEntries(
      Object.entries(level.pins).map(([pin, volts]) => [
        pin,
        pin === 'Q1.source' || pin === 'R2.a' ? null : volts,
      ]),
    );
    const drawing = drawn(divided, {}, { ...level, pins });
    const chip = drawing.primitives.filter(({ id }) => /^chip\/p\d+\.(source|a)\//.test(id));
    const unfixed = chip.filter((one) => one.kind === 'text' && one.text === 'not fixed');
    expect(unfixed).toHaveLength(1);
    const box = drawing.primitives.find(({ id }) => id === unfixed[0]?.id.replace('/text', '/box'));
    expect(box?.kind === 'path' && box.dash).toBeTruthy();
    const other = drawing.primitives.find(({ id, thing }) => thing === 'chip' && id !== box?.id);
    expect(other?.kind === 'path' && other.dash).toBeUndefined();
  });
});

describe('a state that could not be settled', () => {
  const unsettled: UnsettledState = {
    settled: false,
    reason: 'Q1.gate has no path to ground.',
    concerns: ['Q1.gate', 'R4'],
    snags: [{ code: 'floating', severity: 'stop', parts: ['Q1'], message: 'Q1.gate has no path to ground.' }],
    cautions: [],
  };
  const drawing = drawn(document, {}, unsettled);

  it('shows no reading', () => {
    for (const thing of ['chip', 'figure', 'chevron', 'badge', 'verdict', 'word', 'leader']) {
      expect(
        drawing.primitives.filter((one) => one.thing === thing),
        thing,
      ).toEqual([]);
    }
  });

  it('rings the nodes and parts that it names, dashed', () => {
    const rings = drawing.primitives.filter(({ id }) => id.startsWith('concern/'));
    expect(rings.map(({ id }) => id)).toEqual(['concern/Q1.gate', 'concern/R4']);
    for (const ring of rings) expect(ring.kind === 'path' && ring.dash).toBeTruthy();
  });

  it('numbers its snags at their parts', () => {
    const number = drawing.primitives.find(({ id }) => id === 'snag/1/number');
    expect(number).toMatchObject({ text: '1' });
  });
});

describe('values of a state', () => {
  it('stand at the parts in that state', () => {
    const valueAt = (state: string) =>
      drawn(document, { state }, null).primitives.flatMap((one) =>
        one.kind === 'text' && one.thing === 'value' && one.text.endsWith('V') ? [one.text] : [],
      );
    expect(valueAt('lampOn')).not.toEqual(valueAt('listening'));
  });
});

describe('places that a person chose', () => {
  const chosen: StageDocument = { ...document, view: { chips: { 'Q1.drain': [10, -9], Q1: [4, 5] } } };

  it('are kept, for chips by their middle and for badges by their corner', () => {
    const drawing = drawn(chosen, {}, listening());
    const q1 = Object.entries(document.parts).find(([, { name }]) => name === 'Q1');
    const place = q1?.[1].place ?? [NaN, NaN];
    const badge = drawing.placement.badges.get(`badge/${q1?.[0] ?? ''}`);
    expect(badge?.corner).toEqual([(place[0] + 4) * 12, (place[1] + 5) * 12]);
    const chips = [...drawing.placement.chips].filter(([id]) => {
      const text = drawing.primitives.find((one) => one.id === `${id}/text`);
      return text?.kind === 'text' && text.text === '5.361 V';
    });
    expect(chips).toHaveLength(1);
  });

  it('are kept while values change', () => {
    const before = drawn(document, {}, listening());
    const after = drawn(document, { keep: before.placement }, listening());
    expect(after.primitives).toEqual(before.primitives);
  });
});
