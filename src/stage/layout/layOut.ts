import type { DrawnPart, DrawnStage } from '../routing/document.ts';
import { boxAround, type GridBox, type GridPoint } from '../routing/grid.ts';
import { letteringOf } from '../routing/lettering.ts';
import { reachOf } from '../routing/shape.ts';
import { arrange } from './arrange.ts';
import { circuitOf, type Unit } from './circuit.ts';
import { groupsOf } from './columns.ts';
import { fitIn } from './fitIn.ts';
import { heightsOf } from './heights.ts';
import { packed } from './pack.ts';
import { standUnit, type Place } from './places.ts';
import { markPower } from './power.ts';

/**
 * The same document with every part placed. The answer depends on the document alone.
 *
 * A group of parts that hang together by wires and of which none has a place is drawn as a whole: supplies above,
 * ground below, current from top to bottom, signals from left to right. Where some of a group stand already, the
 * others are put near what they are wired to. A part that has a place is never touched, nor is a joint whose wires
 * lead to one, nor a document in which every part has a place.
 */
export const layOut = <Document extends DrawnStage>(document: Document): Document => {
  if (Object.values(document.parts).every((part) => part.place !== undefined)) return document;
  const circuit = circuitOf(document);
  const signals = markPower(circuit);
  const heights = heightsOf(circuit);
  const groups = groupsOf(circuit);
  const places = new Map<Unit, Place>();
  const joints = new Map<string, GridPoint>();

  const fixed = new Map<Unit, Place>();
  for (const unit of circuit.units) {
    const { place, turn, mirror } = unit.part;
    if (place !== undefined) fixed.set(unit, { at: place, turn: turn ?? 0, mirror: mirror ?? false });
  }
  const standing = [...fixed];
  for (const group of groups) {
    if (!group.some((unit) => fixed.has(unit)) || group.every((unit) => fixed.has(unit))) continue;
    for (const [unit, place] of fitIn(document, group, new Map(standing), heights, signals)) {
      places.set(unit, place);
      standing.push([unit, place]);
    }
  }

  const free = groups.filter((group) => !group.some((unit) => fixed.has(unit)));
  const arranged = free.map((group) => ({ group, ...arrange(document, group, heights, signals) }));
  const moving = new Set(arranged.flatMap((one) => [...one.joints.keys()]));
  const staying = Object.entries(document.joints).filter(([joint]) => !moving.has(joint));
  const dots = staying.map(([, [x, y]]): GridBox => ({ left: x, right: x, top: y, bottom: y }));
  const shifts = packed(arranged, boundsOf(standing, dots));
  for (const [index, arrangement] of arranged.entries()) {
    const [dx, dy] = shifts[index] ?? [0, 0];
    for (const [unit, place] of arrangement.places)
      places.set(unit, { ...place, at: [place.at[0] + dx, place.at[1] + dy] });
    for (const [joint, [x, y]] of arrangement.joints) joints.set(joint, [x + dx, y + dy]);
  }
  return placed(document, places, joints);
};

const without = (part: DrawnPart, ...keys: readonly string[]): DrawnPart =>
  Object.fromEntries(Object.entries(part).filter(([key]) => !keys.includes(key))) as unknown as DrawnPart;

const boundsOf = (
  standing: Iterable<readonly [Unit, Place]>,
  others: readonly GridBox[],
): GridBox | undefined => {
  const boxes = [...standing].flatMap(([unit, place]) => {
    const part = standUnit(unit, place);
    return [reachOf(part), ...letteringOf(part)];
  });
  return boxAround([...boxes, ...others]);
};

const placed = <Document extends DrawnStage>(
  document: Document,
  places: ReadonlyMap<Unit, Place>,
  joints: ReadonlyMap<string, GridPoint>,
): Document => {
  const parts = { ...document.parts };
  for (const [unit, { at, turn, mirror }] of places) {
    // What is not turned or mirrored does not say so.
    const stance = { ...(turn === 0 ? {} : { turn }), ...(mirror ? { mirror } : {}) };
    parts[unit.id] = { ...without(unit.part, 'turn', 'mirror'), place: at, ...stance };
  }
  const wires = { ...document.wires };
  const moved = new Set([...[...places.keys()].map(({ id }) => id), ...joints.keys()]);
  for (const [id, wire] of Object.entries(wires)) {
    const loose = wire.ends.some(([end]) => moved.has(end));
    if (!loose || wire.path === undefined) continue;
    // Corners stated for a part that had no place mean nothing.
    wires[id] = { ends: wire.ends };
  }
  return { ...document, parts, wires, joints: { ...document.joints, ...Object.fromEntries(joints) } };
};
