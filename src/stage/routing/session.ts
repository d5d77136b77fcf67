import { cost } from './costs.ts';
import type { DrawnEnd, DrawnStage } from './document.ts';
import { Field } from './field.ts';
import { boxAround, lengthOf, tidied, type GridBox, type GridPoint, type Polyline } from './grid.ts';
import { isAdmissible } from './admissible.ts';
import { endKey, netsOf, type Nets } from './nets.ts';
import { PathFinder, type Search, type Terminal } from './search.ts';
import { reachOf, standParts, type StandingPart } from './shape.ts';

/** How far beyond its two ends a route is looked for at first, grid units; then on the whole field. */
const nearby = 10;

const dot = ([x, y]: GridPoint): GridBox => ({ left: x, right: x, top: y, bottom: y });

/** One wire with both ends on the sheet. */
export interface Task {
  readonly id: string;
  readonly net: number;
  readonly from: Terminal;
  readonly to: Terminal;
}

/** The field of one stage, the wires to be drawn on it, and those drawn so far. */
export class Session {
  readonly field: Field;
  readonly nets: Nets;
  /** Every wire with both ends placed, in the order of the document. */
  readonly tasks: ReadonlyMap<string, Task>;
  readonly paths = new Map<string, Polyline>();
  private readonly drawn: Set<string>[];
  /** For each net a box that holds all its lines. Not made smaller when a line is lifted. */
  private readonly boxes: GridBox[] = [];
  private readonly finder: PathFinder;

  constructor(document: DrawnStage, parts: ReadonlyMap<string, StandingPart> = standParts(document)) {
    this.nets = netsOf(document);
    const terminal = ([id, pin]: DrawnEnd): Terminal | undefined => {
      if (pin === undefined) {
        const at = document.joints[id];
        return at === undefined ? undefined : { at, heading: null, sideways: 0 };
      }
      const part = parts.get(id);
      const found = part?.pins.get(pin);
      if (part === undefined || found === undefined) return undefined;
      const { at, heading } = found;
      const isSymbol = part.pins.size === 1 && (heading === 1 || heading === 3);
      return { at, heading, sideways: isSymbol ? cost.sidewaysOfSymbol : cost.sideways };
    };

    const tasks = new Map<string, Task>();
    for (const [id, { ends }] of Object.entries(document.wires)) {
      const from = terminal(ends[0]);
      const to = terminal(ends[1]);
      if (from === undefined || to === undefined) continue;
      tasks.set(id, { id, net: this.nets.ofWire.get(id) ?? 0, from, to });
    }
    this.tasks = tasks;

    const boxes: GridBox[] = [...parts.values()].map(reachOf);
    for (const at of Object.values(document.joints)) boxes.push(dot(at));
    for (const { path } of Object.values(document.wires)) for (const at of path ?? []) boxes.push(dot(at));
    this.field = new Field(boxAround(boxes) ?? dot([0, 0]));
    for (const part of parts.values()) this.field.addPart(part);
    for (const [id, at] of Object.entries(document.joints)) this.field.addPin(at, this.nets.ofEnd.get(id));
    for (const [id, part] of parts) {
      for (const [name, pin] of part.pins) {
        if (pin.drawn) this.field.addPin(pin.at, this.nets.ofEnd.get(endKey([id, name])));
      }
    }
    this.drawn = Array.from({ length: this.nets.count }, () => new Set<string>());
    this.finder = new PathFinder(this.field);
  }

  /** How much searching has been done so far, in states looked at. */
  get effort(): number {
    return this.finder.effort;
  }

  /** How often lines of two nets cross. */
  crossings(): number {
    let met = 0;
    for (const [id, line] of this.paths) met += this.conflicts(line, this.tasks.get(id)?.net ?? -1);
    // Each crossing is met once from either side.
    return met / 2;
  }

  /** Draws a wire's line if it may stand there. */
  take(id: string, line: Polyline): boolean {
    const task = this.tasks.get(id);
    if (task === undefined || !isAdmissible(this.field, line, task.net)) return false;
    this.draw(task, line);
    return true;
  }

  /** Takes a wire off the field. Lines that it shared with others of its net stay. */
  lift(id: string): void {
    const task = this.tasks.get(id);
    const line = this.paths.get(id);
    if (task === undefined || line === undefined) return;
    this.field.draw(line, -1);
    this.paths.delete(id);
    const others = this.drawn[task.net];
    others?.delete(id);
    for (const other of others ?? []) this.field.draw(this.paths.get(other) ?? [], task.net);
  }

  /** Finds and draws a route for a wire; false where there is none. */
  route(task: Task): boolean {
    const line = this.find(task);
    if (line === null) return false;
    this.draw(task, line);
    return true;
  }

  find(task: Task, trespassing = false): Polyline | null {
    const { field, finder } = this;
    const search: Search = {
      from: task.from,
      to: task.to,
      net: task.net,
      lines: (this.drawn[task.net]?.size ?? 0) > 0 ? (this.boxes[task.net] ?? null) : null,
      beyond: nearby,
      trespassing,
    };
    return finder.find(search) ?? finder.find({ ...search, beyond: field.width + field.height });
  }

  draw(task: Task, line: Polyline): void {
    this.field.draw(line, task.net);
    this.paths.set(task.id, line);
    this.drawn[task.net]?.add(task.id);
    const former = this.boxes[task.net];
    const around = boxAround([...line.map(dot), ...(former === undefined ? [] : [former])]);
    if (around !== undefined) this.boxes[task.net] = around;
  }

  /** Points at which a line crosses or runs into lines of other nets. */
  conflicts(line: Polyline, net: number): number {
    return this.field.foreignAlong(line, net).length;
  }

  /** Whether no route could be better: no crossing, no detour, and no more bends than its ends ask for. */
  isIdeal(task: Task): boolean {
    const line = this.paths.get(task.id);
    if (line === undefined) return true;
    const apart = Math.abs(task.from.at[0] - task.to.at[0]) + Math.abs(task.from.at[1] - task.to.at[1]);
    return line.length <= 3 && lengthOf(line) === apart && this.conflicts(line, task.net) === 0;
  }
}

/** A plain L (or a straight line) between two ends, whatever stands in its way. */
export const plainLine = ({ from, to }: Task): Polyline => {
  const upFirst = from.heading === 1 || from.heading === 3;
  const corner: GridPoint = upFirst ? [from.at[0], to.at[1]] : [to.at[0], from.at[1]];
  return tidied([from.at, corner, to.at]);
};
