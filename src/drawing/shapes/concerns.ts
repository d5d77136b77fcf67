/** What an unsettled state names: a dashed ring at each node, and one round each part. */
import { boxAt, grown, type Point } from '../boxes.ts';
import { roundedBox } from '../paths.ts';
import type { Primitive } from '../primitives.ts';
import type { Scene } from '../scene.ts';

const ring = 8;

/** @param concerns names of parts, and `NAME.pin` for nodes */
export const concernShapes = (scene: Scene, concerns: readonly string[]): readonly Primitive[] =>
  concerns.flatMap((concern) => {
    const [name, pin] = concern.split('.');
    const part = scene.parts.find(({ key, id }) => key === name || id === name);
    if (part === undefined) return [];
    const at = pin === undefined ? undefined : part.pins.get(pin);
    const box = at === undefined ? grown(part.body, 7) : squareRound(at);
    const shape: Primitive = {
      kind: 'path',
      id: `concern/${concern}`,
      of: part.id,
      layer: 'readings',
      thing: 'frame',
      commands: roundedBox(box, at === undefined ? 6 : ring),
      stroke: 'atRisk',
      width: 1.6,
      dash: [3.2, 3.4],
    };
    return [shape];
  });

const squareRound = ([x, y]: Point) => boxAt(x - ring, y - ring, 2 * ring, 2 * ring);
