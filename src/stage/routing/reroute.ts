import type { DrawnStage } from './document.ts';
import { samePoint } from './grid.ts';
import type { Routing } from './routing.ts';
import { finish } from './routeWires.ts';
import { Session, type Task } from './session.ts';
import type { StandingPart } from './shape.ts';
import { statedRoute } from './statedPath.ts';

/**
 * Routes after parts or joints have moved, turned, come or gone: wires whose ends stayed and whose line may still
 * stand keep it, so that nothing moves far from the hand; only the others are laid anew. Quick enough for every
 * frame of a drag. `routeStage` on the same document is what the stage looks like when it is opened again.
 */
export const rerouteAfterMove = (
  document: DrawnStage,
  previous: Routing,
  parts?: ReadonlyMap<string, StandingPart>,
): Routing => {
  const session = new Session(document, parts);
  const open: Task[] = [];
  const waiting: Task[] = [];
  for (const task of session.tasks.values()) {
    const path = document.wires[task.id]?.path;
    if (path === undefined) waiting.push(task);
    else if (!session.take(task.id, statedRoute(task.from.at, path, task.to.at))) open.push(task);
  }
  for (const task of waiting) {
    const line = previous.blocked.has(task.id) ? undefined : previous.paths.get(task.id);
    const start = line?.[0];
    const end = line?.at(-1);
    const stayed =
      line !== undefined &&
      start !== undefined &&
      end !== undefined &&
      samePoint(start, task.from.at) &&
      samePoint(end, task.to.at) &&
      session.take(task.id, line);
    if (!stayed) open.push(task);
  }
  return finish(session, open, 1);
};
