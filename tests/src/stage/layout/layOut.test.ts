import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { layOut } from '../../../../src/stage/layout/layOut.ts';
import type { DrawnPart, DrawnStage } from '../../../../src/stage/routing/document.ts';
import { boxesOverlap } from '../../../../src/stage/routing/grid.ts';
import { linesOf } from '../../../../src/stage/routing/lines.ts';
import { routeStage } from '../../../../src/stage/routing/routeWires.ts';
import { pinPosition, reachOf, standParts } from '../../../../src/stage/routing/shape.ts';
import { ground, mosfet, rail, resistor, stage, wire } from '../routing/hand.ts';
import { faultsOf } from '../routing/inspect.ts';

const at = (document: DrawnStage, pin: string): readonly [number, number] => {
  const [id = '', name = ''] = pin.split('.');
  const found = pinPosition(document, id, name);
  if (found === undefined) throw new Error(`${pin} has no place`);
  return found;
};

const load = (): DrawnPart => ({ kind: 'load', values: { resistance: 240, form: 'lamp' } });

/** Low-side switch: rail, lamp, transistor, ground; the gate driven through a resistor, with another to ground. */
const lowSide = stage(
  {
    p1: rail('VBAT'),
    p2: load(),
    p3: mosfet('n'),
    p4: { kind: 'resistor', values: { resistance: '100' } },
    p5: { kind: 'resistor', values: { resistance: '100k' } },
    p6: rail('DRIVE', undefined, 5),
    p7: ground(),
    p8: ground(),
  },
  [
    wire('p1.node', 'p2.a'),
    wire('p2.b', 'p3.drain'),
    wire('p3.source', 'p7.node'),
    wire('p6.node', 'p4.a'),
    wire('p4.b', 'p3.gate'),
    wire('p3.gate', 'p5.a'),
    wire('p5.b', 'p8.node'),
  ],
);

describe('a low-side switch', () => {
  const laid = layOut(lowSide);

  it('is a spine of rail, load, transistor and ground, straight down', () => {
    const spine = ['p1.node', 'p2.a', 'p2.b', 'p3.drain', 'p3.source', 'p7.node'].map((pin) => at(laid, pin));
    expect(new Set(spine.map(([x]) => x)).size).toBe(1);
    const ys = spine.map(([, y]) => y);
    expect([...ys].sort((a, b) => a - b)).toEqual(ys);
  });

  it('is driven from the left, through a resistor that lies level with the gate', () => {
    const drive = ['p6.node', 'p4.a', 'p4.b', 'p3.gate'].map((pin) => at(laid, pin));
    expect(new Set(drive.map(([, y]) => y)).size).toBe(1);
    const xs = drive.map(([x]) => x);
    expect([...xs].sort((a, b) => a - b)).toEqual(xs);
  });

  it('has the resistor to ground upright, its ground below', () => {
    expect(at(laid, 'p5.a')[0]).toBe(at(laid, 'p5.b')[0]);
    expect(at(laid, 'p5.a')[1]).toBeLessThan(at(laid, 'p5.b')[1]);
    expect(at(laid, 'p8.node')[1]).toBeGreaterThan(at(laid, 'p5.b')[1]);
  });

  it('says of turn and mirror only what is not so anyway', () => {
    expect(laid.parts.p3).not.toHaveProperty('turn');
    expect(laid.parts.p3).not.toHaveProperty('mirror');
    expect(laid.parts.p2).toMatchObject({ turn: 90 });
  });
});

it('a p-channel switch has its source above and its drain below', () => {
  const laid = layOut(
    stage({ p1: rail('VBAT'), p2: mosfet('p'), p3: load(), p4: ground(), p5: rail('DRIVE', undefined, 5) }, [
      wire('p1.node', 'p2.source'),
      wire('p2.drain', 'p3.a'),
      wire('p3.b', 'p4.node'),
      wire('p5.node', 'p2.gate'),
    ]),
  );
  expect(at(laid, 'p2.source')[1]).toBeLessThan(at(laid, 'p2.drain')[1]);
  expect(at(laid, 'p2.gate')[0]).toBeLessThan(at(laid, 'p2.source')[0]);
});

it('a p-channel transistor with its drain to the supply is drawn drain up, gate left all the same', () => {
  const laid = layOut(
    stage({ p1: rail('VBAT'), p2: mosfet('p'), p3: load(), p4: ground(), p5: ground() }, [
      wire('p1.node', 'p2.drain'),
      wire('p2.source', 'p3.a'),
      wire('p3.b', 'p4.node'),
      wire('p2.gate', 'p5.node'),
    ]),
  );
  expect(at(laid, 'p2.drain')[1]).toBeLessThan(at(laid, 'p2.source')[1]);
  expect(at(laid, 'p2.gate')[0]).toBeLessThan(at(laid, 'p2.source')[0]);
});

it('a divider stands upright between its rail and ground', () => {
  const laid = layOut(
    stage(
      {
        p1: rail('VREF'),
        p2: resistor(),
        p3: resistor(),
        p4: ground(),
        p5: { kind: 'tag', values: { label: 'HALF' } },
      },
      [wire('p1.node', 'p2.a'), wire('p2.b', 'p3.a'), wire('p3.b', 'p4.node'), wire('p2.b', 'p5.node')],
    ),
  );
  expect(new Set(['p2.a', 'p2.b', 'p3.a', 'p3.b'].map((pin) => at(laid, pin)[0])).size).toBe(1);
  expect(at(laid, 'p5.node')[0]).toBeGreaterThan(at(laid, 'p3.a')[0]);
});

it('a negative rail stands below, upside down', () => {
  const laid = layOut(
    stage(
      {
        p1: rail('VPOS'),
        p2: resistor(),
        p3: resistor(),
        p4: rail('VNEG', undefined, -12),
        p5: ground(),
        p6: resistor(),
      },
      [
        wire('p1.node', 'p2.a'),
        wire('p2.b', 'p3.a'),
        wire('p3.b', 'p4.node'),
        wire('p2.b', 'p6.a'),
        wire('p6.b', 'p5.node'),
      ],
    ),
  );
  expect(at(laid, 'p4.node')[1]).toBeGreaterThan(at(laid, 'p3.b')[1]);
  expect(laid.parts.p4?.turn).toBe(180);
});

/** Two transistors on one tail, each with its own gate and load. */
const pair = stage(
  {
    p1: rail('VA'),
    p2: resistor(),
    p3: resistor(),
    p4: mosfet('n'),
    p5: mosfet('n'),
    p6: { kind: 'current-source', values: { current: '1m' } },
    p7: ground(),
    p8: { kind: 'tag', values: { label: 'PLUS' } },
    p9: { kind: 'tag', values: { label: 'MINUS' } },
  },
  [
    wire('p1.node', 'p2.a'),
    wire('p1.node', 'p3.a'),
    wire('p2.b', 'p4.drain'),
    wire('p3.b', 'p5.drain'),
    wire('p4.source', 'p6.from'),
    wire('p5.source', 'p6.from'),
    wire('p6.to', 'p7.node'),
    wire('p8.node', 'p4.gate'),
    wire('p9.node', 'p5.gate'),
  ],
);

it('the two of a pair stand side by side, gates outward, their tail between and below', () => {
  const laid = layOut(pair);
  const [left, right] = [at(laid, 'p4.source'), at(laid, 'p5.source')];
  expect(left[1]).toBe(right[1]);
  expect(at(laid, 'p4.gate')[0]).toBeLessThan(left[0]);
  expect(at(laid, 'p5.gate')[0]).toBeGreaterThan(right[0]);
  const tail = at(laid, 'p6.from');
  expect(tail[0]).toBe((left[0] + right[0]) / 2);
  expect(tail[1]).toBeGreaterThan(left[1]);
});

it('a mirror has its tied transistor’s gate toward the other’s', () => {
  const laid = layOut(
    stage(
      {
        p1: rail('VREF'),
        p2: resistor(),
        p3: mosfet('n'),
        p4: mosfet('n'),
        p5: load(),
        p6: rail('VBAT'),
        p7: ground(),
        p8: ground(),
      },
      [
        wire('p1.node', 'p2.a'),
        wire('p2.b', 'p3.drain'),
        wire('p3.drain', 'p3.gate'),
        wire('p3.gate', 'p4.gate'),
        wire('p6.node', 'p5.a'),
        wire('p5.b', 'p4.drain'),
        wire('p3.source', 'p7.node'),
        wire('p4.source', 'p8.node'),
      ],
    ),
  );
  expect(at(laid, 'p3.gate')[1]).toBe(at(laid, 'p4.gate')[1]);
  expect(at(laid, 'p3.gate')[0]).toBeGreaterThan(at(laid, 'p3.source')[0]);
  expect(at(laid, 'p4.gate')[0]).toBeLessThan(at(laid, 'p4.source')[0]);
  expect(at(laid, 'p3.gate')[0]).toBeLessThan(at(laid, 'p4.gate')[0]);
});

describe('parts that have a place', () => {
  const placed: DrawnStage = {
    ...lowSide,
    parts: { ...lowSide.parts, p3: mosfet('n', [40, 30], true), p1: rail('VBAT', [40, 10]) },
  };
  const laid = layOut(placed);

  it('keep it, with their turn and mirror, object and all', () => {
    expect(laid.parts.p3).toBe(placed.parts.p3);
    expect(laid.parts.p1).toBe(placed.parts.p1);
  });

  it('draw the others near: the load in line between rail and drain', () => {
    expect(at(laid, 'p2.a')[0]).toBe(40);
    expect(at(laid, 'p2.a')[1]).toBeGreaterThan(10);
    expect(at(laid, 'p2.b')[1]).toBeLessThan(27);
  });

  it('keep the joints that their wires lead to', () => {
    const document = stage(
      { p1: resistor([0, 0]), p2: resistor() },
      [wire('p1.b', 'j1'), wire('j1', 'p2.a')],
      { j1: [8, 0] },
    );
    expect(layOut(document).joints).toEqual({ j1: [8, 0] });
  });
});

it('a group of its own goes below what stands already', () => {
  const document = stage({ p1: resistor([0, 0]), p2: rail('VBAT'), p3: load(), p4: ground() }, [
    wire('p2.node', 'p3.a'),
    wire('p3.b', 'p4.node'),
  ]);
  expect(at(layOut(document), 'p2.node')[1]).toBeGreaterThan(2);
});

it('an empty stage stays empty', () => {
  const document = stage({}, []);
  expect(layOut(document)).toBe(document);
});

// Measures of a readable drawing as the plan of record states them: nothing on anything, nothing through anything,
// supplies above, ground below, and on the examples at most one crossing for ten parts.
describe('the examples, all places forgotten', () => {
  const folder = new URL('../../../../examples/', import.meta.url);
  for (const file of readdirSync(folder).filter((name) => name.endsWith('.stage.json'))) {
    const stated = JSON.parse(readFileSync(new URL(file, folder), 'utf8')) as DrawnStage;
    const bare: DrawnStage = {
      ...stated,
      parts: Object.fromEntries(
        Object.entries(stated.parts).map(([id, part]) => {
          const kept = Object.entries(part).filter(([key]) => !['place', 'turn', 'mirror'].includes(key));
          return [id, { ...Object.fromEntries(kept), kind: part.kind }];
        }),
      ),
    };

    it(`${file} is laid out readably`, () => {
      const laid = layOut(bare);
      const routing = routeStage(laid);
      expect(faultsOf(laid, routing)).toEqual([]);
      expect([...routing.blocked]).toEqual([]);
      const parts = [...standParts(laid).values()];
      expect(parts).toHaveLength(Object.keys(bare.parts).length);
      for (const [index, one] of parts.entries()) {
        for (const other of parts.slice(index + 1)) {
          expect(boxesOverlap(reachOf(one), reachOf(other)), `${one.id} on ${other.id}`).toBe(false);
        }
      }
      const { crossings } = linesOf(laid, routing.paths);
      expect(crossings.length).toBeLessThanOrEqual(Math.floor(parts.length / 10));

      const pins = Object.values(laid.wires).flatMap(({ ends }) => ends);
      for (const { ends } of Object.values(laid.wires)) {
        const [a, b] = ends.map(([id, pin]) =>
          pin === undefined ? undefined : { kind: laid.parts[id]?.kind, at: at(laid, `${id}.${pin}`) },
        );
        if (a === undefined || b === undefined) continue;
        if (a.kind === 'ground') expect(a.at[1], 'ground below').toBeGreaterThanOrEqual(b.at[1]);
        if (b.kind === 'ground') expect(b.at[1], 'ground below').toBeGreaterThanOrEqual(a.at[1]);
        if (a.kind === 'rail') expect(a.at[1], 'rail above').toBeLessThanOrEqual(b.at[1]);
        if (b.kind === 'rail') expect(b.at[1], 'rail above').toBeLessThanOrEqual(a.at[1]);
      }
      expect(pins.length).toBeGreaterThan(0);
    });
  }
});
