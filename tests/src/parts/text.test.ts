import { describe, expect, it } from 'vitest';
import { symbols } from '../../../symbols/index.ts';
import type { Device } from '../../../src/parts/devices/device.ts';
import { contextOf, kindOf } from './settled.ts';
import type { Placed } from './settled.ts';

const linesOf = (kind: string, values: Placed['values'], device?: Device) =>
  kindOf(kind).text(
    contextOf({
      kind,
      name: 'X1',
      pins: {},
      ...(values === undefined ? {} : { values }),
      ...(device === undefined ? {} : { device }),
    }),
  );

describe('the text at a symbol', () => {
  it('gives a value as it was typed', () => {
    expect(linesOf('resistor', { resistance: { value: '4k7', tolerance: 0.05 } })).toEqual(['4k7']);
    expect(linesOf('resistor', { resistance: '3.3 kΩ' })).toEqual(['3.3 kΩ']);
    expect(linesOf('capacitor', { capacitance: '1µ0' })).toEqual(['1µ0']);
  });

  it('gives a bare number its unit', () => {
    expect(linesOf('load', { resistance: 240, form: 'lamp' })).toEqual(['240 Ω']);
    expect(linesOf('supply', { voltage: 12, form: 'battery' })).toEqual(['12 V']);
  });

  it('gives a rail its voltage, a tag its label, an output its level', () => {
    expect(linesOf('rail', { voltage: { value: 12, low: 10.5, high: 14.4 } })).toEqual(['12 V']);
    expect(linesOf('rail', {})).toEqual([]);
    expect(linesOf('tag', { label: 'LEVEL' })).toEqual(['LEVEL']);
    expect(linesOf('logic-output', { level: 'open' })).toEqual(['open']);
  });

  it('gives the size of a small signal beside the voltage', () => {
    expect(linesOf('supply', { voltage: 0, signal: '5m' })).toEqual(['0 V', 'signal 5 mV']);
  });

  it('gives a transistor of a process its width and length, a Zener its voltage', () => {
    const process: Device = {
      type: 'mosfet',
      channel: 'n',
      build: 'integrated',
      title: 'follower cell',
      model: { threshold: 0.7, processTransconductance: '100u' },
    };
    expect(linesOf('mosfet', { width: '20u', length: '1u' }, process)).toEqual(['follower cell', '20u / 1u']);
    const zener: Device = {
      type: 'zener',
      model: { breakdownVoltage: 10, breakdownCurrent: '5m' },
    };
    expect(linesOf('diode', {}, zener)).toEqual(['10 V']);
  });
});

describe('the symbol', () => {
  const mosfet = (build: 'discrete' | 'integrated', wired: boolean) =>
    kindOf('mosfet').symbol(
      contextOf({
        kind: 'mosfet',
        name: 'Q1',
        device: { type: 'mosfet', channel: 'p', build, model: { threshold: -1, gainFactor: 0.1 } },
        pins: wired ? { body: 'x' } : {},
      }),
    );

  it('shows the body diode of a discrete MOSFET, and the body lead only where it is wired', () => {
    expect(mosfet('discrete', false)).toBe(symbols['mosfet-p']);
    expect(mosfet('integrated', false)).toBe(symbols['mosfet-p-plain']);
    expect(mosfet('discrete', true)).toBe(symbols['mosfet-p-body']);
    expect(mosfet('integrated', true)).toBe(symbols['mosfet-p-body']);
  });

  it('follows the form of a load, the state of a switch, the purpose of a supply', () => {
    const symbolOf = (kind: string, values: Placed['values']) =>
      kindOf(kind).symbol(contextOf({ kind, name: 'X1', pins: {}, ...(values ? { values } : {}) }));
    expect(symbolOf('load', { resistance: 1 })).toBe(symbols.load);
    expect(symbolOf('load', { resistance: 1, form: 'motor' })).toBe(symbols.motor);
    expect(symbolOf('switch', { closed: true })).toBe(symbols['switch-closed']);
    expect(symbolOf('switch', { closed: false })).toBe(symbols['switch-open']);
    expect(symbolOf('supply', { voltage: 1 })).toBe(symbols.supply);
    expect(symbolOf('supply', { voltage: 1, form: 'battery', signal: 1 })).toBe(symbols.battery);
    expect(symbolOf('supply', { voltage: 0, signal: 1 })).toBe(symbols['signal-source']);
  });
});
