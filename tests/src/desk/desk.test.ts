import { describe, expect, it } from 'vitest';
import { Desk } from '../../../src/desk/desk.ts';
import type { LiveFrame } from '../../../src/desk/live.ts';
import { remove } from '../../../src/desk/edits/remove.ts';
import { setValue, type ValuePlace } from '../../../src/desk/edits/setValue.ts';
import { mirrorParts, moveParts, turnParts } from '../../../src/desk/edits/standParts.ts';
import { divider, example } from './stages.ts';

const lower: ValuePlace = { part: 'p3', key: 'resistance', quantity: 'resistance' };

const openDivider = async () => new Desk(await divider());

/** Voltage of the divider's middle, V. */
const middle = (desk: Desk): unknown => {
  const { readings } = desk.store.getState();
  return readings?.settled === true ? readings.pins['TP1.node'] : undefined;
};

describe('the desk', () => {
  it('opens a document settled, in its base state, with nothing to undo', async () => {
    const desk = await openDivider();
    const { history, state, stale, selection } = desk.store.getState();
    expect([history.past.length, state, stale, selection.size]).toEqual([0, 'on', false, 0]);
    expect(middle(desk)).toBeCloseTo(5, 9); // 10 V · 1 kΩ / 2 kΩ
  });

  it('settles after an edit, and goes back and forth by one step', async () => {
    const desk = await openDivider();
    const first = desk.document;
    expect(desk.edit('Set R2', setValue(lower, '3k', 'on')).ok).toBe(true);
    expect(middle(desk)).toBeCloseTo(7.5, 9); // 10 V · 3 / 4
    desk.undo();
    expect(desk.document).toEqual(first);
    expect(middle(desk)).toBeCloseTo(5, 9);
    desk.redo();
    expect(middle(desk)).toBeCloseTo(7.5, 9);
  });

  it('marks readings stale where it is told not to keep them settled, and settles when asked', async () => {
    const desk = await openDivider();
    desk.setKeepSettled(false);
    desk.edit('Set R2', setValue(lower, '3k', 'on'));
    expect(desk.store.getState().stale).toBe(true);
    expect(middle(desk)).toBeCloseTo(5, 9);
    desk.settle();
    expect(desk.store.getState().stale).toBe(false);
    expect(middle(desk)).toBeCloseTo(7.5, 9);
  });

  it('does not call readings stale because a part was moved', async () => {
    const desk = await openDivider();
    desk.setKeepSettled(false);
    const { readings } = desk.store.getState();
    desk.edit('Move R2', moveParts(new Set(['p3']), [2, 0]));
    expect(desk.document.parts.p3?.place).toEqual([12, 16]);
    expect(desk.store.getState()).toMatchObject({ stale: false, readings });
  });

  it('shows no reading of one state in another', async () => {
    const desk = await openDivider();
    desk.setKeepSettled(false);
    desk.chooseState('asleep');
    expect(desk.store.getState()).toMatchObject({ state: 'asleep', readings: null });
    desk.setKeepSettled(true);
    expect(middle(desk)).toBeCloseTo(2, 9); // 4 V · 1/2
  });

  it('tells the frames of a drag without touching the store, and commits it as one step', async () => {
    const desk = await openDivider();
    const frames: (LiveFrame | null)[] = [];
    desk.onLive((frame) => frames.push(frame));
    let changes = 0;
    desk.store.subscribe(() => (changes += 1));
    for (const ohms of [1200, 2000, 4000]) desk.setLive('p3', 'resistance', ohms);
    expect(changes).toBe(0);
    const volts = frames.map((frame) => frame?.readings?.settled === true && frame.readings.pins['TP1.node']);
    // 10 V · R / (1 kΩ + R)
    [5.454545454545454, 6.666666666666667, 8].forEach((expected, index) =>
      expect(volts[index]).toBeCloseTo(expected, 8),
    );
    expect(desk.commitLive(lower, { value: '4k', tolerance: 0.01 }).ok).toBe(true);
    expect(frames.at(-1)).toBeNull();
    expect(desk.store.getState().history.past.map(({ title }) => title)).toEqual(['Set R2']);
    expect(middle(desk)).toBeCloseTo(8, 9);
    desk.undo();
    expect(middle(desk)).toBeCloseTo(5, 9);
  });

  it('is as it was where a drag is given up', async () => {
    const desk = await openDivider();
    const before = desk.store.getState();
    desk.setLive('p3', 'resistance', 4000);
    desk.cancelLive();
    expect(desk.store.getState()).toBe(before);
    desk.settle();
    expect(middle(desk)).toBeCloseTo(5, 9);
  });

  it('tells stale frames where the readings are not kept settled', async () => {
    const desk = await openDivider();
    desk.setKeepSettled(false);
    const frames: (LiveFrame | null)[] = [];
    desk.onLive((frame) => frames.push(frame));
    desk.setLive('p3', 'resistance', 4000);
    expect(frames[0]?.stale).toBe(true);
  });

  it('lets what is no longer there fall out of the selection', async () => {
    const desk = await openDivider();
    desk.select(['p2', 'p3', 'w1']);
    desk.edit('Delete', remove(new Set(['p3'])));
    expect([...desk.store.getState().selection]).toEqual(['p2', 'w1']);
  });

  it('draws the wires of an undone move where they ran before', async () => {
    const desk = new Desk(await example('echo-preamplifier'));
    const before = desk.store.getState().routing.paths;
    desk.edit('Move R3', moveParts(new Set(['p4']), [3, 2]));
    expect(desk.store.getState().routing.paths).not.toEqual(before);
    desk.undo();
    expect(desk.store.getState().routing.paths).toEqual(before);
  });
});

describe('the edits of the sheet', () => {
  it('refuse a value that is none, change nothing and say why', async () => {
    const desk = await openDivider();
    const before = desk.document;
    const refused = desk.edit('Set R2', setValue(lower, '4,7k', 'on'));
    expect(refused).toMatchObject({ ok: false, faults: [{ code: 'decimal-comma' }] });
    expect(desk.document).toBe(before);
  });

  it('make no step where the value is stated already', async () => {
    const desk = await openDivider();
    desk.edit('Set R2', setValue(lower, { value: '1k', tolerance: 0.01 }, 'on'));
    expect(desk.store.getState().history.past).toEqual([]);
  });

  it('change a value in the state that has one of its own, in the drawing otherwise', async () => {
    const desk = await openDivider();
    desk.chooseState('asleep');
    const rail: ValuePlace = { part: 'p1', key: 'voltage', quantity: 'voltage' };
    desk.edit('Set VBAT', setValue(rail, 6, 'asleep'));
    desk.edit('Set R2', setValue(lower, '2k', 'asleep'));
    expect(desk.document.states.asleep?.set).toEqual({ 'p1.voltage': 6 });
    expect(desk.document.parts.p1?.values).toEqual({ voltage: 10 });
    expect(desk.document.parts.p3?.values).toEqual({ resistance: '2k' });
  });

  it('move a joint with the parts when nothing else hangs on it, and leave it otherwise', async () => {
    const desk = await openDivider();
    desk.edit('Move', moveParts(new Set(['p2', 'p3']), [1, 0]));
    expect(desk.document.joints.j1).toEqual([10, 11]);
    desk.edit('Move', moveParts(new Set(['p2', 'p3', 'p5']), [1, 0]));
    expect(desk.document.joints.j1).toEqual([11, 11]);
  });

  it('turn by quarters, four of which are none, and mirror twice to the same', async () => {
    const desk = await openDivider();
    const before = desk.document;
    const ids = new Set(['p2']);
    for (let quarter = 0; quarter < 4; quarter += 1) desk.edit('Turn R1', turnParts(ids, 'left'));
    expect(desk.document).toEqual(before);
    for (let times = 0; times < 2; times += 1) desk.edit('Mirror R1', mirrorParts(ids));
    expect(desk.document).toEqual(before);
  });

  it('take away with a part its wires, loose joints and what states say of it', async () => {
    const desk = await openDivider();
    desk.edit('Delete', remove(new Set(['p1', 'p3'])));
    expect(Object.keys(desk.document.parts)).toEqual(['p2', 'p4', 'p5']);
    expect(Object.keys(desk.document.wires)).toEqual(['w2', 'w5']);
    expect(desk.document.states).toEqual({ asleep: { set: {} } });
  });
});
