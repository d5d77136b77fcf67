/**
 * Which pins are one node. Connectivity is stated by the document, never guessed from geometry: wires join their
 * ends; tags of one label are one node, and the rail of that name with them; rails of one name are one node;
 * every ground is the reference; a mosfet's unwired body is joined to its source.
 */
import { kindOf, partContext, wiredOf } from './partContext.ts';
import type { StageDocument, WireEnd } from './schema/stage.ts';
import { UnionFind } from './unionFind.ts';

export interface PinOf {
  readonly part: string;
  readonly pin: string;
}

export interface Net {
  /** Place in `nets`; 0 is the reference, also where the document has no ground. */
  readonly index: number;
  /** For messages: the rail's name, the tag's label, the test point's name, else a pin of it, `Q1.drain`. */
  readonly name: string;
  readonly pins: readonly PinOf[];
  /** Ids. */
  readonly joints: readonly string[];
  readonly wires: readonly string[];
  /** Names of the rails that are this node; more than one where a drawing shorts them. */
  readonly rails: readonly string[];
  readonly labels: readonly string[];
}

export interface Connectivity {
  readonly nets: readonly Net[];
  /** Nets by `part.pin`; see `netOfPin`. */
  readonly byPin: ReadonlyMap<string, Net>;
  readonly byJoint: ReadonlyMap<string, Net>;
  readonly byWire: ReadonlyMap<string, Net>;
  /** The pins of each part on which a wire ends. */
  readonly wired: ReadonlyMap<string, ReadonlySet<string>>;
  /** Whether any part is the reference. */
  readonly grounded: boolean;
  /** Rails that hold no voltage under their name, with the parts of that name: a snag. */
  readonly railsWithoutVoltage: readonly { readonly name: string; readonly parts: readonly string[] }[];
}

export const pinKey = (part: string, pin: string): string => `${part}.${pin}`;

/** The net of a pin. Every pin of every part has one, if only of its own. */
export function netOfPin(connectivity: Connectivity, part: string, pin: string): Net {
  const net = connectivity.byPin.get(pinKey(part, pin));
  if (net === undefined) throw new Error(`no pin ${pinKey(part, pin)}`);
  return net;
}

/** Joints' keys hold no dot and pins' do, so they share one set of keys without a clash. */
const endKey = ([of, pin]: WireEnd): string => (pin === undefined ? of : pinKey(of, pin));

const reference = '\u0000reference';

export function connectivityOf(document: StageDocument): Connectivity {
  const sets = new UnionFind();
  sets.add(reference);
  const wired = wiredOf(document);
  const pins = pinsOf(document, wired);
  for (const { part, pin } of pins) sets.add(pinKey(part, pin));
  for (const joint of Object.keys(document.joints)) sets.add(joint);

  for (const { ends } of Object.values(document.wires)) sets.join(endKey(ends[0]), endKey(ends[1]));
  let grounded = false;
  for (const [id, part] of Object.entries(document.parts)) {
    const node = pinKey(id, 'node');
    switch (kindOf(part).joins) {
      case 'reference':
        sets.join(reference, node);
        grounded = true;
        break;
      case 'name':
        if (part.name !== undefined) sets.join(`\u0000${part.name}`, node);
        break;
      case 'label':
        // Rails' names and tags' labels are one space of words.
        sets.join(`\u0000${String(part.values?.label)}`, node);
        break;
      case 'nothing':
        break;
    }
    const body = wired.get(id)?.has('body') ?? false;
    if (part.kind === 'mosfet' && !body) sets.join(pinKey(id, 'body'), pinKey(id, 'source'));
  }
  return {
    ...gather(document, pins, sets),
    wired,
    grounded,
    railsWithoutVoltage: railsWithoutVoltage(document),
  };
}

const pinsOf = (document: StageDocument, wired: ReadonlyMap<string, ReadonlySet<string>>): readonly PinOf[] =>
  Object.entries(document.parts).flatMap(([id, part]) => {
    const context = partContext(document, id, wired.get(id) ?? new Set());
    return Object.keys(kindOf(part).pins(context)).map((pin) => ({ part: id, pin }));
  });

interface Growing {
  readonly pins: PinOf[];
  readonly joints: string[];
  readonly wires: string[];
}

/** The sets as nets: the reference first, then in the order in which the document comes to them. */
function gather(document: StageDocument, pins: readonly PinOf[], sets: UnionFind) {
  const growing = new Map<string, Growing>();
  const of = (key: string): Growing => {
    const root = sets.find(key);
    const known = growing.get(root) ?? { pins: [], joints: [], wires: [] };
    growing.set(root, known);
    return known;
  };
  of(reference);
  for (const pin of pins) of(pinKey(pin.part, pin.pin)).pins.push(pin);
  for (const joint of Object.keys(document.joints)) of(joint).joints.push(joint);
  for (const [id, wire] of Object.entries(document.wires)) of(endKey(wire.ends[0])).wires.push(id);

  const nets = [...growing.values()].map((net, index) => asNet(document, net, index));
  const byPin = new Map<string, Net>();
  const byJoint = new Map<string, Net>();
  const byWire = new Map<string, Net>();
  for (const net of nets) {
    for (const { part, pin } of net.pins) byPin.set(pinKey(part, pin), net);
    for (const joint of net.joints) byJoint.set(joint, net);
    for (const wire of net.wires) byWire.set(wire, net);
  }
  return { nets, byPin, byJoint, byWire };
}

function asNet(document: StageDocument, { pins, joints, wires }: Growing, index: number): Net {
  const rails = new Set<string>();
  const labels = new Set<string>();
  for (const { part: id } of pins) {
    const part = document.parts[id];
    if (part === undefined) continue;
    const { joins } = kindOf(part);
    if (joins === 'name' && part.name !== undefined) rails.add(part.name);
    if (joins === 'label') labels.add(String(part.values?.label));
  }
  return {
    index,
    name: nameOfNet(document, index, pins, [...rails, ...labels], joints),
    pins,
    joints,
    wires,
    rails: [...rails],
    labels: [...labels],
  };
}

/** What a person would call the node. */
function nameOfNet(
  document: StageDocument,
  index: number,
  pins: readonly PinOf[],
  words: readonly string[],
  joints: readonly string[],
): string {
  const [word] = words;
  if (index === 0) return 'ground';
  if (word !== undefined) return word;
  const named = (kind: (part: string) => boolean) =>
    pins.find(({ part }) => document.parts[part]?.name !== undefined && kind(part));
  const testPoint = named((part) => document.parts[part]?.kind === 'test-point');
  if (testPoint !== undefined) return document.parts[testPoint.part]?.name ?? testPoint.part;
  const transistor = named((part) => document.parts[part]?.duty !== undefined);
  const pin = transistor ?? named(() => true) ?? pins[0];
  if (pin !== undefined) return `${document.parts[pin.part]?.name ?? pin.part}.${pin.pin}`;
  return joints[0] ?? `node ${index}`;
}

function railsWithoutVoltage(document: StageDocument): Connectivity['railsWithoutVoltage'] {
  const byName = new Map<string, { readonly parts: string[]; held: boolean }>();
  for (const [id, part] of Object.entries(document.parts)) {
    if (part.name === undefined || kindOf(part).joins !== 'name') continue;
    const rails = byName.get(part.name) ?? { parts: [], held: false };
    byName.set(part.name, rails);
    rails.parts.push(id);
    rails.held ||= part.values?.voltage !== undefined;
  }
  return [...byName].filter(([, { held }]) => !held).map(([name, { parts }]) => ({ name, parts }));
}
