/**
 * A document in one state as a circuit, with the way from parts and pins to elements and nodes and back. Done once; a
 * changed figure is copied into the elements in place.
 */
import { ICE_POINT } from '../../solver/index.ts';
import type { Circuit, Element } from '../../solver/index.ts';
import type { Device } from '../parts/devices/device.ts';
import type { Draw, ElectricalContext, PartContext, PartKind } from '../parts/kind.ts';
import { connectivityOf, netOfPin, pinKey } from '../stage/connectivity.ts';
import type { Connectivity, Net } from '../stage/connectivity.ts';
import { kindOf, partContext } from '../stage/partContext.ts';
import type { Part, StageDocument } from '../stage/schema/stage.ts';
import { effectiveConditions } from '../stage/states.ts';
import type { EffectiveConditions } from '../stage/states.ts';
import { failure, success } from '../values/result.ts';
import type { Fault, Result } from '../values/result.ts';

export interface CompiledPart {
  readonly id: string;
  /** Its name, or its id where it has none. */
  readonly name: string;
  readonly part: Part;
  readonly kind: PartKind;
  readonly device: Device | undefined;
  readonly draws: readonly Draw[];
  /** The figures at hand by the draws' keys, SI; changed in place. */
  readonly figures: Record<string, number>;
  readonly context: ElectricalContext;
  /** Pin names in the order of the stage file's table. */
  readonly pins: readonly string[];
  /** Place of its first element in the circuit; its others follow. Empty where it is left out. */
  readonly firstElement: number;
  readonly elements: readonly Element[];
  /** Place in the circuit of the element with the part's own law; null where there is none. */
  readonly principal: number | null;
}

export interface CompiledStage {
  readonly document: StageDocument;
  readonly conditions: EffectiveConditions;
  readonly connectivity: Connectivity;
  readonly circuit: Circuit;
  readonly parts: readonly CompiledPart[];
  readonly partOf: ReadonlyMap<string, CompiledPart>;
  /** Node of a pin in the circuit; null for a pin that nothing electrical is joined to. */
  readonly nodeOf: (part: string, pin: string) => number | null;
  /** The net of each node of the circuit. */
  readonly nets: readonly Net[];
  /** Ids of parts that no wire, name or label joins to any other: left out of the circuit. */
  readonly loose: readonly string[];
}

/** A part none of whose pins meets another part, and which therefore says nothing about the circuit. */
const isLoose = (connectivity: Connectivity, id: string, pins: readonly string[]): boolean =>
  pins.every((pin) => netOfPin(connectivity, id, pin).pins.every(({ part }) => part === id));

interface Piece {
  readonly id: string;
  readonly part: Part;
  readonly kind: PartKind;
  readonly context: PartContext;
  readonly draws: readonly Draw[];
  readonly pins: readonly string[];
  readonly loose: boolean;
}

/**
 * @param document as it stands in the state wanted (`inState`)
 * @returns the circuit; faults of parts that cannot become elements, each naming its part
 */
export const compileStage = (document: StageDocument): Result<CompiledStage> => {
  const connectivity = connectivityOf(document);
  const conditions = effectiveConditions(document.conditions);
  const faults: Fault[] = [];
  const pieces: Piece[] = [];
  for (const [id, part] of Object.entries(document.parts)) {
    const kind = kindOf(part);
    const context = partContext(document, id, connectivity.wired.get(id) ?? new Set());
    const draws = kind.draws(context, conditions.law);
    if (!draws.ok) {
      faults.push(...draws.faults.map((fault) => ({ ...fault, parts: [part.name ?? id] })));
      continue;
    }
    const pins = Object.keys(kind.pins(context));
    const loose = pins.length > 1 && isLoose(connectivity, id, pins);
    pieces.push({ id, part, kind, context, draws: draws.value, pins, loose });
  }
  if (faults.length > 0) return failure(...faults);

  const nets: Net[] = [connectivity.nets[0] ?? emptyReference];
  const numbers = new Map<Net, number>([[nets[0] ?? emptyReference, 0]]);
  /** Nodes are numbered as elements come to them, so that nets without any stay outside the circuit. */
  const numberOf = (part: string, pin: string): number => {
    const net = netOfPin(connectivity, part, pin);
    const known = numbers.get(net);
    if (known !== undefined) return known;
    numbers.set(net, nets.length);
    nets.push(net);
    return nets.length - 1;
  };

  const elements: Element[] = [];
  const parts = pieces.map((piece): CompiledPart => {
    const figures = Object.fromEntries(piece.draws.map((draw) => [draw.key, draw.value]));
    const context: ElectricalContext = {
      ...piece.context,
      law: conditions.law,
      figures,
      node: (pin) => numberOf(piece.id, pin),
    };
    const own = piece.loose ? [] : piece.kind.elements(context);
    const firstElement = elements.length;
    elements.push(...own);
    return {
      id: piece.id,
      name: piece.context.name,
      part: piece.part,
      kind: piece.kind,
      device: piece.context.device,
      draws: piece.draws,
      figures,
      context,
      pins: piece.pins,
      firstElement,
      elements: own,
      principal:
        piece.kind.principal === null || own.length === 0 ? null : firstElement + piece.kind.principal,
    };
  });

  const nodeOf = (part: string, pin: string): number | null => {
    const net = connectivity.byPin.get(pinKey(part, pin));
    return net === undefined ? null : (numbers.get(net) ?? null);
  };
  return success({
    document,
    conditions,
    connectivity,
    circuit: { nodes: nets.map((net) => net.name), elements },
    parts,
    partOf: new Map(parts.map((part) => [part.id, part])),
    nodeOf,
    nets,
    loose: pieces.filter((piece) => piece.loose).map((piece) => piece.id),
  });
};

const emptyReference: Net = {
  index: 0,
  name: 'ground',
  pins: [],
  joints: [],
  wires: [],
  rails: [],
  labels: [],
};

/** Copies what a part's figures now come to into its elements. */
export const refreshPart = (part: CompiledPart): void => {
  if (part.elements.length === 0) return;
  part.kind.elements(part.context).forEach((element, index) => {
    part.elements[index]?.values.set(element.values);
  });
};

export const kelvin = (celsius: number): number => celsius + ICE_POINT;
