/** The circuit as laying out sees it: units with roles, and the nets between them, joints taken out. */
import type { SymbolArt } from '../../../symbols/art.ts';
import { checkValue } from '../../values/check-value.ts';
import type { DrawnPart, DrawnStage } from '../routing/document.ts';
import { headings, type Heading } from '../routing/grid.ts';
import { endKey, netsOf } from '../routing/nets.ts';
import { artOf, standArt, wiredPins } from '../routing/shape.ts';

/**
 * What a part is to a drawing, read off the pins of its symbol: how many there are and to which side they point.
 * `stack` has one pin on its left that steers, and one above and one below that carry (a transistor); `tapped` is a
 * two-pin part with a third pin at its side (a potentiometer); `block` is anything else with several pins.
 */
export type Role = 'two-pin' | 'stack' | 'tapped' | 'block' | 'rail' | 'ground' | 'tag' | 'probe';

export interface Unit {
  readonly id: string;
  readonly kind: string;
  readonly part: DrawnPart;
  readonly role: Role;
  readonly art: SymbolArt;
  readonly wired: ReadonlySet<string>;
  /** Pins on which a wire ends, and their nets. */
  readonly nets: ReadonlyMap<string, Net>;
  /** Unturned heading of every pin. */
  readonly headings: ReadonlyMap<string, Heading>;
  /** Place in the document: the tie of all ties. */
  readonly rank: number;
  /** What joins it with others unseen: a rail's name, a tag's label. */
  readonly label: string | undefined;
}

export interface Member {
  readonly unit: Unit;
  readonly pin: string;
}

export interface Net {
  readonly index: number;
  readonly members: Member[];
  readonly joints: string[];
  /** Whether it is held at the top or the bottom of the drawing by a rail, a supply or ground. */
  power: 'top' | 'bottom' | null;
}

export interface Circuit {
  readonly units: readonly Unit[];
  readonly nets: readonly Net[];
}

const nothing: ReadonlySet<string> = new Set();

/** Units and nets of the whole stage. Parts of a kind that nobody knows are left out. */
export const circuitOf = (document: DrawnStage): Circuit => {
  const wires = netsOf(document);
  const wired = wiredPins(document);
  const nets: Net[] = Array.from({ length: wires.count }, (_, index) => ({
    index,
    members: [],
    joints: [],
    power: null,
  }));
  for (const joint of Object.keys(document.joints)) nets[wires.ofEnd.get(joint) ?? -1]?.joints.push(joint);

  const units: Unit[] = [];
  for (const [id, part] of Object.entries(document.parts)) {
    const pins = wired.get(id) ?? nothing;
    const art = artOf(document, id, part, pins);
    if (art === undefined) continue;
    const standing = standArt(id, art, part.kind, [0, 0], { mirror: false, turn: 0 }, pins);
    const own = new Map<string, Net>();
    const pointing = new Map<string, Heading>();
    const unit: Unit = {
      id,
      kind: part.kind,
      part,
      role: roleOf(part.kind, art, new Map([...standing.pins].map(([name, pin]) => [name, pin.heading]))),
      art,
      wired: pins,
      nets: own,
      headings: pointing,
      rank: units.length,
      label: labelOf(part),
    };
    for (const [name, { heading }] of standing.pins) {
      pointing.set(name, heading);
      const net = nets[wires.ofEnd.get(endKey([id, name])) ?? -1];
      if (net === undefined) continue;
      own.set(name, net);
      net.members.push({ unit, pin: name });
    }
    units.push(unit);
  }
  return { units, nets };
};

const labelOf = ({ name, values }: DrawnPart): string | undefined => {
  const label = values?.label;
  return typeof label === 'string' ? label : name;
};

const roleOf = (kind: string, art: SymbolArt, pointing: ReadonlyMap<string, Heading>): Role => {
  const names = [...pointing.keys()];
  if (names.length === 1) {
    // A ground hangs below its wire, a rail and a test point stand above it, a tag lies beside it.
    const heading = [...pointing.values()][0];
    if (heading === 3) return 'ground';
    if (heading === 1) return kind === 'rail' ? 'rail' : 'probe';
    return 'tag';
  }
  if (names.length === 2) return 'two-pin';
  const at = (heading: Heading): readonly string[] =>
    names.filter((name) => pointing.get(name) === heading && art.whenWired?.[name] === undefined);
  if (at(2).length === 1 && at(1).length === 1 && at(3).length === 1) return 'stack';
  if (names.length === 3 && at(2).length === 1 && at(0).length === 1 && at(1).length === 1) return 'tapped';
  return 'block';
};

/** The pin of a unit that points a way as the symbol is drawn. */
export const pinPointing = (unit: Unit, heading: Heading): string | undefined => {
  for (const [name, way] of unit.headings) if (way === heading) return name;
  return undefined;
};

/** Pins that listen without carrying: a gate, a base, the inputs of a block. */
export const listeners = (unit: Unit): readonly string[] =>
  unit.role === 'stack' || unit.role === 'block'
    ? [...unit.headings].filter(([, heading]) => heading === 2).map(([name]) => name)
    : [];

export const isListener = ({ unit, pin }: Member): boolean =>
  (unit.role === 'stack' || unit.role === 'block') && unit.headings.get(pin) === 2;

/** The two pins between which a unit carries current, the upper one of its symbol first; none for the others. */
export const carryingPins = (unit: Unit): readonly [string, string] | undefined => {
  if (unit.role === 'stack') {
    const upper = pinPointing(unit, 3);
    const lower = pinPointing(unit, 1);
    return upper === undefined || lower === undefined ? undefined : [upper, lower];
  }
  if (unit.role === 'two-pin' || unit.role === 'tapped') {
    const left = pinPointing(unit, 2);
    const right = pinPointing(unit, 0);
    return left === undefined || right === undefined ? undefined : [left, right];
  }
  return undefined;
};

/** Whether no direct current flows through: the levels on its two sides say nothing of one another. */
export const blocksDirectCurrent = (unit: Unit): boolean => unit.kind === 'capacitor';

export const isSource = (unit: Unit): boolean => unit.kind === 'supply';

/** The stated resistance, Ω; undefined where there is none to read. */
export const resistanceOf = (unit: Unit): number | undefined => {
  const stated = unit.part.values?.resistance;
  if (stated === undefined) return undefined;
  const checked = checkValue(stated, 'resistance');
  return checked.ok ? checked.value.nominal : undefined;
};

/** The stated voltage, V; undefined where there is none to read. */
export const voltageOf = (unit: Unit): number | undefined => {
  const stated = unit.part.values?.voltage;
  if (stated === undefined) return undefined;
  const checked = checkValue(stated, 'voltage');
  return checked.ok ? checked.value.nominal : undefined;
};

export const stepOf = (heading: Heading): readonly [number, number] => headings[heading] ?? [1, 0];
