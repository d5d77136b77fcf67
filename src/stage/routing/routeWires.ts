import type { DrawnStage } from './document.ts';
import type { Polyline } from './grid.ts';
import type { Routing } from './routing.ts';
import { plainLine, Session, type Task } from './session.ts';
import type { StandingPart } from './shape.ts';
import { statedRoute } from './statedPath.ts';

/** How often the drawn wires are taken up again, one by one, to see whether they now find a better way. */
const rounds = 2;

/**
 * Routes every wire of a stage. The answer follows from the document alone.
 *
 * A path that a person stated comes first and is kept where it may stand. The others follow, short ones first, each
 * by the cheapest way that is left; then each is lifted and laid again in the light of all the others. A wire that
 * finds no way asks those in its way to move.
 */
export const routeStage = (document: DrawnStage, parts?: ReadonlyMap<string, StandingPart>): Routing =>
  routeIn(new Session(document, parts), document);

/** As `routeStage`, in a session of its own, for who wants to know more of it than the routes. */
export const routeIn = (session: Session, document: DrawnStage): Routing => {
  const open: Task[] = [];
  for (const task of session.tasks.values()) {
    const path = document.wires[task.id]?.path;
    if (path === undefined || !session.take(task.id, statedRoute(task.from.at, path, task.to.at)))
      open.push(task);
  }
  return finish(session, open, rounds);
};

/** The routes of `routeStage` alone: wire id to its line, both ends included. */
export const routeWires = (document: DrawnStage): ReadonlyMap<string, Polyline> => routeStage(document).paths;

/** Lays the open wires of a session, betters them, and gives what came out. */
export const finish = (session: Session, open: readonly Task[], betterings: number): Routing => {
  const ordered = [...open].sort((a, b) => span(a) - span(b));
  const failed: Task[] = [];
  for (const task of ordered) if (!session.route(task)) failed.push(task);
  const movable = new Set(ordered.map(({ id }) => id));
  const blocked = new Set<string>();
  for (const task of failed) if (!makeWay(session, task, movable)) blocked.add(task.id);
  for (let round = 0; round < betterings; round++) {
    let changed = false;
    for (const task of ordered) {
      if (blocked.has(task.id) || session.isIdeal(task)) continue;
      const former = session.paths.get(task.id);
      session.lift(task.id);
      if (!session.route(task) && former !== undefined) session.draw(task, former);
      else if (!sameLine(session.paths.get(task.id), former)) changed = true;
    }
    if (!changed) break;
  }

  const paths = new Map<string, Polyline>();
  for (const [id, task] of session.tasks) paths.set(id, session.paths.get(id) ?? plainLine(task));
  return { paths, blocked };
};

/**
 * Lays a wire that found no way: over the lines of others at first, then with those lifted and laid again. Where one
 * of them then finds no way itself, all is put back and the wire counts as blocked.
 */
const makeWay = (session: Session, task: Task, movable: ReadonlySet<string>): boolean => {
  const through = session.find(task, true);
  if (through === null) return false;
  const former = new Map<string, Polyline>();
  const standing = new Set(session.field.foreignAlong(through, task.net));
  for (const [id, line] of [...session.paths]) {
    const other = session.tasks.get(id);
    if (other === undefined || !standing.has(other.net) || !movable.has(id)) continue;
    former.set(id, line);
    session.lift(id);
  }
  if (session.route(task)) {
    const again = [...former.keys()].every((id) => {
      const other = session.tasks.get(id);
      return other !== undefined && session.route(other);
    });
    if (again) return true;
  }
  session.lift(task.id);
  for (const id of former.keys()) session.lift(id);
  for (const [id, line] of former) {
    const other = session.tasks.get(id);
    if (other !== undefined) session.draw(other, line);
  }
  return false;
};

const span = ({ from, to }: Task): number => {
  const across = Math.abs(from.at[0] - to.at[0]);
  const down = Math.abs(from.at[1] - to.at[1]);
  // Straight ones first: everything else goes round them.
  return across + down + (across > 0 && down > 0 ? 3 : 0);
};

const sameLine = (a: Polyline | undefined, b: Polyline | undefined): boolean =>
  JSON.stringify(a) === JSON.stringify(b);
