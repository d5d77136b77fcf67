import type { PathCommand, SymbolArt, SymbolShape } from '../../symbols/art.ts';
import { markStrokes } from '../../symbols/marks.ts';
import { standing, type Stance } from '../../symbols/placement.ts';
import type { Point } from './boxes.ts';
import { mapped, shifted } from './paths.ts';
import type { Primitive } from './primitives.ts';

/** One weight of pen for wires and symbols alike. */
export const pen = 1.75;

/** A symbol put down at a place, mirrored and turned; ids `<id>/s0`, `<id>/s1`, … */
export const symbolShapes = (
  id: string,
  art: SymbolArt,
  origin: Point,
  stance: Stance,
  wired: ReadonlySet<string>,
): readonly Primitive[] => {
  const place = (point: Point): Point => {
    const [x, y] = standing(point, stance);
    return [origin[0] + x, origin[1] + y];
  };
  const onlyWired = Object.entries(art.whenWired ?? {}).flatMap(([pin, shapes]) =>
    wired.has(pin) ? shapes : [],
  );
  return [...art.shapes, ...onlyWired].map((shape, index) => primitive(`${id}/s${index}`, id, shape, place));
};

const primitive = (id: string, of: string, shape: SymbolShape, place: (point: Point) => Point): Primitive => {
  const belonging = { id, of, layer: 'still', thing: 'part', stroke: 'ink', width: pen } as const;
  const path = (commands: readonly PathCommand[]) => ({ ...belonging, kind: 'path', commands }) as const;
  switch (shape.shape) {
    case 'path':
      return { ...path(mapped(shape.commands, place)), ...filled(shape.fill) };
    case 'circle': {
      const [x, y] = place([shape.x, shape.y]);
      return { ...belonging, kind: 'circle', x, y, radius: shape.radius, ...filled(shape.fill) };
    }
    case 'upright':
      return path(shifted(markStrokes[shape.mark], place([shape.x, shape.y])));
  }
};

const filled = (fill: 'none' | 'paper' | 'ink'): { readonly fill?: 'paper' | 'ink' } =>
  fill === 'none' ? {} : { fill };
