import { describe, expect, it } from 'vitest';
import { boundsOf } from '../../../src/drawing/bounds.ts';
import { holds, overlap } from '../../../src/drawing/boxes.ts';
import { drawPlate, type PlateOptions } from '../../../src/drawing/plate/plate.ts';
import { toPng } from '../../../src/drawing/png.ts';
import { toSvg } from '../../../src/drawing/svg.ts';
import { luminance } from '../../../src/drawing/contrast.ts';
import { themes } from '../../../src/drawing/themes.ts';
import { routeWires } from '../../../src/stage/routing/index.ts';
import type { StateReadings } from '../../../src/readings/readings.ts';
import { amplifierChain, example, settled } from './support/stages.ts';

/** Without a date of its own, so that the plate's is shown. */
const { date: ownDate, ...document } = example('echo-preamplifier');
const plate = (
  options: Partial<PlateOptions> = {},
  readings: StateReadings | null = settled(document, options.state),
) =>
  drawPlate(document, readings, {
    density: 'all',
    routes: routeWires(document),
    date: '2031-05-06',
    program: 'Restpoint 9.8.7',
    ...options,
  });
const texts = (drawing: ReturnType<typeof plate>): readonly string[] =>
  drawing.primitives.flatMap((one) => (one.kind === 'text' ? [one.text] : []));

describe('a plate', () => {
  const drawing = plate({ state: 'lampOn' });

  it('carries title, date, state, conditions, law and program', () => {
    const all = texts(drawing);
    for (const expected of [
      document.title,
      '2031-05-06',
      'lampOn',
      'ambient 25 °C',
      'square law',
      'Restpoint 9.8.7',
    ]) {
      expect(all).toContain(expected);
    }
  });

  it('shows the date of the stage where it has one', () => {
    const dated = drawPlate(example('echo-preamplifier'), null, {
      density: 'all',
      routes: routeWires(document),
      date: '2031-05-06',
      program: 'Restpoint 9.8.7',
    });
    expect(texts(dated)).toContain(ownDate);
    expect(texts(dated)).not.toContain('2031-05-06');
  });

  it('lists every transistor with its duty and verdict', () => {
    const all = texts(drawing);
    const readings = settled(document, 'lampOn');
    if (!readings.settled) throw new Error(readings.reason);
    for (const [name, reading] of Object.entries(readings.parts)) {
      if (reading.kind !== 'mosfet') continue;
      expect(all.filter((text) => text === name).length, name).toBe(2);
      expect(all).toContain((reading as { verdict: string }).verdict.replaceAll('-', ' '));
    }
  });

  it('keeps all its words inside its border and off one another', () => {
    const border = drawing.primitives.find(({ id }) => id === 'plate/border');
    if (border === undefined) throw new Error('no border');
    const boxes = drawing.primitives.flatMap((one) =>
      one.kind === 'text' ? [{ id: one.id, box: boundsOf(one) }] : [],
    );
    for (const { id, box } of boxes) expect(holds(boundsOf(border), box), id).toBe(true);
    const clashes = boxes.flatMap((a, index) =>
      boxes.slice(index + 1).flatMap((b) => (overlap(a.box, b.box) ? [`${a.id} on ${b.id}`] : [])),
    );
    expect(clashes).toEqual([]);
  });

  it('gives every primitive an id of its own', () => {
    const ids = drawing.primitives.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('says in words what the signs mean', () => {
    const listening = settled(document, 'listening');
    const all = texts(plate({ state: 'listening' }, listening)).join(' ');
    expect(listening.cautions.length).toBeGreaterThan(0);
    for (const { message } of listening.cautions)
      expect(all).toContain(message.split(' ').slice(0, 6).join(' '));
  });

  it('says that nothing was settled, and why', () => {
    const all = texts(
      plate(
        {},
        { settled: false, reason: 'R1 and R2 hang in the air.', concerns: ['R1'], snags: [], cautions: [] },
      ),
    );
    expect(all).toContain('could not be settled');
    expect(all.join(' ')).toContain('R1 and R2 hang in the air.');
    expect(texts(plate({}, null))).toContain('not settled');
  });

  it('names the readings for which there was no room', () => {
    const crowded = amplifierChain(2, 12);
    const drawn = drawPlate(crowded, settled(crowded), {
      density: 'all',
      routes: routeWires(crowded),
      date: '2031-05-06',
      program: 'Restpoint',
    });
    const all = texts(drawn).join(' ');
    for (const name of drawn.unplaced) expect(all).toContain(name);
    expect(all.includes('No room on the drawing for')).toBe(drawn.unplaced.length > 0);
  });

  it('stays the same file for the same stage', () => {
    const svg = () => toSvg(plate({ state: 'asleep' }), themes.print, { embedFont: true });
    expect(svg()).toBe(svg());
  });

  it.each(['light', 'dark', 'print'] as const)('is drawn as a picture in %s', (theme) => {
    const png = toPng(drawing, themes[theme], { scale: 2 });
    const view = new DataView(png.buffer, png.byteOffset);
    expect(view.getUint32(16)).toBeGreaterThan(1500);
  });

  it('stays legible without its colours: every text differs from the paper by its luminance alone', () => {
    for (const name of ['light', 'dark', 'print'] as const) {
      const theme = themes[name];
      const grey = (role: keyof typeof theme) => luminance(theme[role]);
      for (const one of drawing.primitives) {
        if (one.kind !== 'text') continue;
        const [a, b] = [grey(one.role), grey('paper')];
        const ratio = (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
        expect(ratio, `${one.role} in ${name}`).toBeGreaterThanOrEqual(4.5);
      }
    }
  });
});
