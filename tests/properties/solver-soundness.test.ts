/**
 * Random circuits of MOSFETs, resistors and diodes between two rails (solver-random-circuits.ts): all of them settle,
 * nearly all by Newton alone, and what is read holds. RESTPOINT_SOAK=1 runs the full count.
 */
import { afterAll, describe, expect, it } from 'vitest';
import { DECLARED_LEAK, settle } from '../../solver/index.ts';
import {
  currentLaw,
  currentsDivided,
  difference,
  greatestCurrent,
  mirrored,
  outsideRails,
  powerBalance,
  prepared,
  renumbered,
  room,
  settleFresh,
} from './solver-invariants.ts';
import { randomCircuit } from './solver-random-circuits.ts';

const soak = process.env.RESTPOINT_SOAK === '1';
const hours = 3_600_000;

const tally: string[] = [];
afterAll(() => {
  if (soak) console.log(tally.join('\n'));
});

describe.each(['square', 'smooth'] as const)('random circuits, %s law', (law) => {
  const count = soak ? 20_000 : 500;

  it(
    `of 1 … 12 MOSFETs: all ${count} settle, 99 % by Newton alone, inside the rails, with currents and powers that balance`,
    () => {
      const worst = { law: 0, power: 0, outside: 0 };
      const methods: Record<string, number> = {};
      const lost: string[] = [];
      for (let seed = 1; seed <= count; seed++) {
        const circuit = randomCircuit(seed, { law });
        const point = settleFresh(circuit);
        if (!point.settled) {
          lost.push(`seed ${seed}: ${point.message}`);
          continue;
        }
        methods[point.method] = (methods[point.method] ?? 0) + 1;
        worst.law = Math.max(worst.law, currentLaw(circuit, point));
        worst.power = Math.max(worst.power, powerBalance(circuit, point));
        worst.outside = Math.max(worst.outside, outsideRails(circuit, point));
      }
      tally.push(`${law}: ${JSON.stringify(methods)}, worst ${JSON.stringify(worst)}`);
      expect(lost).toEqual([]);
      expect(methods.direct ?? 0).toBeGreaterThanOrEqual(0.99 * count);
      expect(worst.law).toBeLessThanOrEqual(1);
      expect(worst.power).toBeLessThanOrEqual(1);
      expect(worst.outside).toBeLessThanOrEqual(1e-9);
    },
    hours,
  );

  it(
    'of 1 … 40 MOSFETs: all settle',
    () => {
      const large = soak ? 2000 : 60;
      const lost: string[] = [];
      for (let seed = 1; seed <= large; seed++) {
        const point = settleFresh(randomCircuit(seed, { law, mosfets: 40 }));
        if (!point.settled) lost.push(`seed ${seed}: ${point.message}`);
      }
      expect(lost).toEqual([]);
    },
    hours,
  );

  it(
    'read the same with nodes and elements numbered the other way round',
    () => {
      let others = 0;
      for (let seed = 1; seed <= count / 2; seed++) {
        const circuit = randomCircuit(seed, { law });
        const point = settleFresh(circuit);
        const turned = renumbered(circuit);
        const ready = prepared(turned.circuit);
        const again = settle(ready, room);
        if (!point.settled || !again.settled) throw new Error(`seed ${seed} did not settle`);
        if (difference(point, again, turned.nodeOf) <= 1e-8) continue;
        // A circuit with more than one rest point may meet another; the first must then be a rest point here, too.
        others++;
        const start = again.state.slice();
        point.voltages.forEach((v, node) => {
          if (node > 0) start[turned.nodeOf(node) - 1] = v;
        });
        const kept = settle(ready, { ...room, start });
        expect(kept.settled && difference(point, kept, turned.nodeOf), `seed ${seed}`).toBeLessThanOrEqual(
          1e-8,
        );
      }
      tally.push(`${law}: renumbered, ${others} met another rest point`);
      expect(others).toBeLessThanOrEqual(0.02 * count);
    },
    hours,
  );

  it(
    'read the same with n and p exchanged and every voltage turned',
    () => {
      for (let seed = 1; seed <= count / 2; seed++) {
        const circuit = randomCircuit(seed, { law });
        const point = settleFresh(circuit);
        const turned = settleFresh(mirrored(circuit));
        if (!point.settled || !turned.settled) throw new Error(`seed ${seed} did not settle`);
        expect(difference(point, turned, undefined, -1), `seed ${seed}`).toBeLessThanOrEqual(1e-8);
      }
    },
    hours,
  );

  it(
    'rest at the same voltages with all currents, the leak among them, a thousandth',
    () => {
      let compared = 0;
      let others = 0;
      for (let seed = 1; seed <= count / 2; seed++) {
        const circuit = randomCircuit(seed, { law, series: false });
        const point = settleFresh(circuit);
        if (!point.settled) throw new Error(`seed ${seed} did not settle`);
        // The guard of 10 mΩ does not scale: leave out what reaches it.
        if (greatestCurrent(circuit, point) > 0.1) continue;
        compared++;
        const ready = prepared(currentsDivided(circuit, 1000));
        const small: Partial<typeof room> & { leak: number } = { leak: DECLARED_LEAK / 1000 };
        const again = settle(ready, { ...room, ...small });
        if (!again.settled) throw new Error(`seed ${seed} did not settle when divided`);
        if (difference(point, again) <= 1e-8) continue;
        others++;
        const start = again.state.slice();
        start.set(point.voltages.subarray(1), 0);
        const kept = settle(ready, { ...room, ...small, start });
        expect(kept.settled && difference(point, kept), `seed ${seed}`).toBeLessThanOrEqual(1e-8);
      }
      tally.push(`${law}: ${compared} compared with their thousandth, ${others} met another rest point`);
      expect(compared).toBeGreaterThan(0.2 * (count / 2));
      expect(others).toBeLessThanOrEqual(0.02 * count);
    },
    hours,
  );
});

describe('random circuits with bipolar transistors, amplifiers and current sources', () => {
  it(
    'settle, 99.9 % of them; each that does not is named',
    () => {
      const count = soak ? 20_000 : 400;
      const lost: string[] = [];
      let refused = 0;
      for (let seed = 1; seed <= count; seed++) {
        const circuit = randomCircuit(seed, { law: 'square', mixed: true });
        const point = settleFresh(circuit);
        if (point.settled) {
          expect(currentLaw(circuit, point), `seed ${seed}`).toBeLessThanOrEqual(1);
          continue;
        }
        expect([...point.nodes, ...point.elements].length, `seed ${seed}: ${point.message}`).toBeGreaterThan(
          0,
        );
        // A snag with a name of its own is an answer: the currents of that drawing make no sense.
        if (point.reason === 'over-current') refused++;
        else lost.push(`seed ${seed}: ${point.message}`);
      }
      tally.push(`mixed: ${lost.length} of ${count} not settled, ${refused} beyond 1 MA\n${lost.join('\n')}`);
      expect(lost.length, lost.join('\n')).toBeLessThanOrEqual(Math.ceil(0.001 * count));
    },
    hours,
  );
});
