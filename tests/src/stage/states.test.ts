import { describe, expect, it } from 'vitest';
import { effectiveConditions, inState, stateNames } from '../../../src/stage/states.ts';
import { beacon } from './beacon.ts';

describe('states', () => {
  it('are listed with the base state first, under its name', () => {
    expect(stateNames(beacon())).toEqual(['on', 'off']);
    expect(stateNames(beacon({ base: 'lit' }))).toEqual(['lit', 'off']);
  });

  it('the base state is the document itself', () => {
    const document = beacon();
    expect(inState(document, 'on')).toBe(document);
  });

  it('another changes the values, duties and conditions it states, and nothing else', () => {
    const document = beacon({ 'states/off/conditions': { ambient: -20 } });
    const off = inState(document, 'off');
    expect(off?.parts.p5?.values).toEqual({ voltage: 0 });
    expect(off?.parts.p3?.duty).toBe('block');
    expect(off?.conditions).toEqual({ ambient: -20, law: 'square' });
    expect(off?.parts.p2).toBe(document.parts.p2);
    expect(document.parts.p5?.values).toEqual({ voltage: 5 });
  });

  it('can give a part a value that it does not state otherwise', () => {
    const document = beacon({ 'states/off/set': { 'p1.signal': '10m' } });
    expect(inState(document, 'off')?.parts.p1?.values).toMatchObject({ signal: '10m' });
  });

  it('that is not there is undefined, also under a name that every object knows', () => {
    expect(inState(beacon(), 'asleep')).toBeUndefined();
    expect(inState(beacon(), 'constructor')).toBeUndefined();
  });
});

describe('conditions', () => {
  it('are 25 °C, the square law and no self-heating where none are stated', () => {
    expect(effectiveConditions({})).toEqual({
      ambient: { nominal: 25, low: 25, high: 25 },
      law: 'square',
      selfHeating: false,
    });
  });
  it('are what is stated', () => {
    expect(effectiveConditions(beacon().conditions)).toMatchObject({
      ambient: { nominal: 25, low: -20, high: 60 },
    });
  });
});
