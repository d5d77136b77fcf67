import { describe, expect, it } from 'vitest';
import { connectivityOf, netOfPin } from '../../../src/stage/connectivity.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';
import { beacon } from './beacon.ts';

/** The nets as sets of pins in words, the reference first. */
const netsOf = (document: StageDocument) =>
  connectivityOf(document).nets.map(({ pins }) =>
    pins
      .map(({ part, pin }) => `${part}.${pin}`)
      .sort()
      .join(' '),
  );

describe('connectivity', () => {
  it('of the worked example is its five nodes', () => {
    expect(netsOf(beacon())).toEqual([
      'p3.body p3.source p6.node',
      'p1.node p2.a',
      'p2.b p3.drain',
      'p3.gate p4.b',
      'p4.a p5.node',
    ]);
    expect(connectivityOf(beacon()).nets.map(({ name }) => name)).toEqual([
      'ground',
      'VBAT',
      'Q1.drain',
      'Q1.gate',
      'DRIVE',
    ]);
  });

  it('an unwired body is joined to its source, a wired one is where its wire goes', () => {
    const wired = beacon({
      'wires/w6': {
        ends: [
          ['p3', 'body'],
          ['p1', 'node'],
        ],
      },
    });
    const connectivity = connectivityOf(wired);
    expect(netOfPin(connectivity, 'p3', 'body').name).toBe('VBAT');
    expect(netOfPin(connectivity, 'p3', 'source').index).toBe(0);
    expect([...(connectivity.wired.get('p3') ?? [])].sort()).toEqual(['body', 'drain', 'gate', 'source']);
  });

  it('rails of one name are one node, without a wire', () => {
    const document = beacon({ 'parts/p7': { kind: 'rail', name: 'VBAT' } });
    const connectivity = connectivityOf(document);
    expect(netOfPin(connectivity, 'p7', 'node')).toBe(netOfPin(connectivity, 'p1', 'node'));
    expect(netOfPin(connectivity, 'p7', 'node').rails).toEqual(['VBAT']);
  });

  it('tags of one label are one node, and the rail of that name with them', () => {
    const document = beacon({
      'parts/p7': { kind: 'tag', values: { label: 'LAMP' } },
      'parts/p8': { kind: 'tag', values: { label: 'LAMP' } },
      'parts/p9': { kind: 'tag', values: { label: 'VBAT' } },
      'wires/w6': {
        ends: [
          ['p7', 'node'],
          ['p2', 'b'],
        ],
      },
    });
    const connectivity = connectivityOf(document);
    expect(netOfPin(connectivity, 'p8', 'node')).toBe(netOfPin(connectivity, 'p3', 'drain'));
    expect(netOfPin(connectivity, 'p8', 'node').name).toBe('LAMP');
    expect(netOfPin(connectivity, 'p9', 'node')).toBe(netOfPin(connectivity, 'p1', 'node'));
  });

  it('every ground is the reference', () => {
    const document = beacon({ 'parts/p7': { kind: 'ground' }, 'parts/p8': { kind: 'ground' } });
    const connectivity = connectivityOf(document);
    expect(netOfPin(connectivity, 'p8', 'node').index).toBe(0);
    expect(connectivity.grounded).toBe(true);
  });

  it('without a ground the reference is there, and empty', () => {
    const connectivity = connectivityOf(beacon({ 'parts/p6': { kind: 'test-point', name: 'TP1' } }));
    expect(connectivity.grounded).toBe(false);
    expect(connectivity.nets[0]).toMatchObject({ name: 'ground', pins: [] });
    expect(netOfPin(connectivity, 'p6', 'node').name).toBe('TP1');
  });

  it('joints join what is wired to them; pins that merely touch are not joined', () => {
    const document = beacon({
      joints: { j1: [1, 1], j2: [2, 2] },
      'wires/w1': { ends: [['p1', 'node'], ['j1']] },
      'wires/w6': { ends: [['j1'], ['p2', 'a']] },
      // At the very place of the rail, and not wired to it.
      'parts/p7': { kind: 'test-point', name: 'TP1', place: [30, 2] },
    });
    const connectivity = connectivityOf(document);
    expect(netOfPin(connectivity, 'p2', 'a')).toBe(netOfPin(connectivity, 'p1', 'node'));
    expect(connectivity.byJoint.get('j1')?.wires).toEqual(['w1', 'w6']);
    expect(connectivity.byWire.get('w6')).toBe(connectivity.byJoint.get('j1'));
    expect(connectivity.byJoint.get('j2')?.pins).toEqual([]);
    expect(netOfPin(connectivity, 'p7', 'node').pins).toHaveLength(1);
  });

  it('names the rails that hold no voltage under their name', () => {
    const document = beacon({
      'parts/p7': { kind: 'rail', name: 'VBAT' },
      'parts/p8': { kind: 'rail', name: 'VREF' },
      'parts/p9': { kind: 'rail', name: 'VREF' },
    });
    expect(connectivityOf(document).railsWithoutVoltage).toEqual([{ name: 'VREF', parts: ['p8', 'p9'] }]);
  });
});
