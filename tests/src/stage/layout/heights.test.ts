import { describe, expect, it } from 'vitest';
import { circuitOf, type Net } from '../../../../src/stage/layout/circuit.ts';
import { heightsOf } from '../../../../src/stage/layout/heights.ts';
import { markPower } from '../../../../src/stage/layout/power.ts';
import type { DrawnStage } from '../../../../src/stage/routing/document.ts';
import { ground, mosfet, rail, resistor, stage, wire } from '../routing/hand.ts';

const heightAt = (document: DrawnStage) => {
  const circuit = circuitOf(document);
  const signals = markPower(circuit);
  const heights = heightsOf(circuit);
  const netOf = (pin: string): Net | undefined => {
    const [id, name = ''] = pin.split('.');
    return circuit.units.find((unit) => unit.id === id)?.nets.get(name);
  };
  return {
    height: (pin: string) => heights.get(netOf(pin) ?? { index: -1, members: [], joints: [], power: null }),
    power: (pin: string) => netOf(pin)?.power,
    signals: [...signals].map(({ id }) => id),
  };
};

describe('heights', () => {
  it('fall evenly along equal parts between rail and ground, transistors among them', () => {
    const { height } = heightAt(
      stage({ p1: rail('VA'), p2: resistor(), p3: mosfet('n'), p4: resistor(), p5: ground() }, [
        wire('p1.node', 'p2.a'),
        wire('p2.b', 'p3.drain'),
        wire('p3.source', 'p4.a'),
        wire('p4.b', 'p5.node'),
      ]),
    );
    expect(height('p1.node')).toBe(1);
    expect(height('p3.drain')).toBeCloseTo(2 / 3, 6);
    expect(height('p3.source')).toBeCloseTo(1 / 3, 6);
    expect(height('p5.node')).toBe(0);
  });

  it('follow Kirchhoff’s law where paths join: two from the rail against one to ground', () => {
    const { height } = heightAt(
      stage({ p1: rail('VA'), p2: resistor(), p3: resistor(), p4: resistor(), p5: ground() }, [
        wire('p1.node', 'p2.a'),
        wire('p1.node', 'p3.a'),
        wire('p2.b', 'p4.a'),
        wire('p3.b', 'p4.a'),
        wire('p4.b', 'p5.node'),
      ]),
    );
    expect(height('p4.a')).toBeCloseTo(2 / 3, 6);
  });

  it('are the same on all tags of one label', () => {
    const tag = { kind: 'tag', values: { label: 'MID' } };
    const { height } = heightAt(
      stage({ p1: rail('VA'), p2: resistor(), p3: tag, p4: tag, p5: resistor(), p6: ground() }, [
        wire('p1.node', 'p2.a'),
        wire('p2.b', 'p3.node'),
        wire('p4.node', 'p5.a'),
        wire('p5.b', 'p6.node'),
      ]),
    );
    expect(height('p3.node')).toBeCloseTo(0.5, 6);
    expect(height('p4.node')).toBe(height('p3.node'));
  });
});

describe('a rail', () => {
  const gateDrive = (series: string, toGround: string) =>
    heightAt(
      stage(
        {
          p1: rail('DRIVE', undefined, 5),
          p2: { kind: 'resistor', values: { resistance: series } },
          p3: { kind: 'resistor', values: { resistance: toGround } },
          p4: mosfet('n'),
          p5: ground(),
          p6: ground(),
        },
        [
          wire('p1.node', 'p2.a'),
          wire('p2.b', 'p4.gate'),
          wire('p4.gate', 'p3.a'),
          wire('p3.b', 'p5.node'),
          wire('p4.source', 'p6.node'),
        ],
      ),
    );

  it('that drives a gate through a small resistor is a signal', () => {
    expect(gateDrive('100', '100k').signals).toEqual(['p1']);
    expect(gateDrive('100', '100k').power('p1.node')).toBeNull();
  });

  it('that feeds a divider is a supply', () => {
    expect(gateDrive('100k', '47k').signals).toEqual([]);
    expect(gateDrive('100k', '47k').power('p1.node')).toBe('top');
  });

  it('that feeds a channel is a supply, below ground if it is negative', () => {
    const feeding = (voltage: unknown) =>
      heightAt(
        stage({ p1: rail('VX', undefined, voltage), p2: mosfet('n') }, [wire('p1.node', 'p2.drain')]),
      ).power('p1.node');
    expect(feeding(12)).toBe('top');
    expect(feeding('-5 V')).toBe('bottom');
    expect(feeding({ value: '−5', tolerance: 0.05 })).toBe('bottom');
  });
});
