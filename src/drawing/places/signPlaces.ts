import { boxAt, centredBox, distance, grown, middle, type Point } from '../boxes.ts';
import type { Occupancy } from '../occupancy.ts';
import type { ScenePart } from '../scene.ts';
import { signReach } from '../shapes/signs.ts';
import type { Place } from './solve.ts';

export interface SignPlace extends Place {
  readonly centre: Point;
}

const air = 2;

/** Where a sign may stand: close to its part, on the left by preference, never on it. */
export const signPlaces = (part: ScenePart, occupancy: Occupancy): readonly SignPlace[] => {
  const { body } = part;
  const [, y] = middle(body);
  const reach = signReach + 5;
  const steps = [0, 6, -6, 12, -12, 18, -18, 24, -24, 36, -36, 48, -48, 60, -60];
  const places: SignPlace[] = [];
  for (const out of [0, 6, 12, 24, 40, 60, 80]) {
    for (const shift of steps) {
      const cost = out * 0.5 + Math.abs(shift) * 0.3;
      const add = (centre: Point, dislike: number): void => {
        const box = centredBox(centre, 2 * signReach, 2 * signReach);
        if (!occupancy.isFree(grown(box, air))) return;
        const room = occupancy.clearance(box, 8);
        const way = distance(box, body) * 0.1;
        places.push({
          centre,
          boxes: [grown(box, air)],
          shares: [],
          cost: cost + dislike + way + (8 - room) * 0.3,
        });
      };
      add([body.left - reach - out, y + shift], 0);
      add([body.right + reach + out, y + shift], 2);
      add([(body.left + body.right) / 2 + shift, body.top - reach - out], 4);
      add([(body.left + body.right) / 2 + shift, body.bottom + reach + out], 4);
    }
  }
  return places.sort((a, b) => a.cost - b.cost);
};

/** Room for a sign at no part in particular: a row along the top of the drawing. */
export const looseSignPlaces = (top: Point): readonly SignPlace[] =>
  Array.from({ length: 60 }, (_, index) => {
    const centre: Point = [top[0] + signReach + index * 30, top[1] - 30];
    return {
      centre,
      boxes: [boxAt(centre[0] - signReach, centre[1] - signReach, 2 * signReach, 2 * signReach)],
      shares: [],
      cost: index,
    };
  });
