/** A circuit made ready: unknowns numbered, pattern and slots resolved, elements laid out by law. Done once. */
import { codeAt, indexAt } from '../elements/at.ts';
import type { Circuit, Element } from '../circuit.ts';
import { Phase, type Batch, type ElementLaw, type Workspace } from '../elements/law.ts';
import { createLinearSystem, type LinearSystem } from '../matrix/linearSystem.ts';
import { createPattern, type EntryPlace } from '../matrix/pattern.ts';
import { findHull, type Hull } from '../structure/hull.ts';

/** What an unknown is, and so how its step is limited. */
export const UnknownKind = {
  /** Current of a branch; its row is in volts. All others are voltages, their rows currents. */
  branch: 0,
  /** A node that voltage sources alone hold: goes where it must at once. */
  pinned: 1,
  /** A node that cannot leave the hull of the rails. */
  bound: 2,
  /** A node that forced or driven currents reach: it may have far to go. */
  loose: 3,
} as const;

/** First places of one element in the arrays of the workspace. */
export interface ElementPlace {
  readonly element: Element;
  /** Index in `circuit.elements`. */
  readonly index: number;
  readonly unknown: number;
  readonly slot: number;
  readonly derived: number;
  readonly memory: number;
  /** First place in `seenValues`. */
  readonly value: number;
  /** Whether its values hold the voltage of a source. */
  readonly isSource: boolean;
}

/** An internal node and the conductance by which it stands behind a terminal. */
export interface InnerNode {
  readonly row: number;
  /** Places in `work.x`. */
  readonly node: number;
  readonly terminal: number;
  /** Place in `work.jacobian` of the derivative of the node's row against the terminal. */
  readonly entry: number;
}

/**
 * Unknowns: voltages of nodes 1 … , then each element's internal nodes (V) and branch currents (A). The last place
 * of `x` and `residual` is the reference node.
 */
export interface Prepared {
  readonly circuit: Circuit;
  /** Number of unknowns, which is also the reference's place in `x` and `residual`. */
  readonly size: number;
  /** What each unknown is, as `UnknownKind`; length `size`. Kinds of nodes follow the values of the sources. */
  readonly kinds: Uint8Array;
  /** For messages; length `size`. */
  readonly unknownNames: readonly string[];
  readonly places: readonly ElementPlace[];
  readonly placeOf: ReadonlyMap<Element, ElementPlace>;
  readonly batches: readonly { readonly law: ElementLaw; readonly batch: Batch }[];

  // --- From elements to rows ---
  /** Unknown of each of the elements' local unknowns; length of `work.x`. */
  readonly gather: Int32Array;
  /** Slot of each of the elements' local Jacobian entries; length of `work.jacobian`. */
  readonly slots: Int32Array;
  /** The first of them, which belong to linear laws, and the matrix these make by themselves. */
  readonly linearEntries: number;
  readonly linearMatrix: Float64Array;
  /** Row (unknown) and column (unknown) of each of those entries. */
  readonly entryRows: Int32Array;
  readonly entryColumns: Int32Array;
  /** Slot of each unknown's diagonal; length `size`. */
  readonly diagonal: Int32Array;
  /** Outputs with a pole of their own: branch row, output and the slot where they meet. */
  readonly lags: readonly { readonly row: number; readonly output: number; readonly slot: number }[];
  /** Internal nodes: row, its element's local places of node and terminal, and the entry that joins the two. */
  readonly inner: readonly InnerNode[];

  // --- The point at hand ---
  readonly system: LinearSystem;
  readonly work: Workspace;
  /** Unknowns, V and A; length `size + 1`. */
  readonly x: Float64Array;
  /** Sum of each row, A for nodes, V for branches; length `size + 1`. */
  readonly residual: Float64Array;
  /** The step that mends it, V for nodes, A for branches; length `size + 1`. */
  readonly step: Float64Array;
  /** Sum of magnitudes of the currents in each row (A), and of |G|·|V| (A, or V for branches); length `size + 1`. */
  readonly magnitude: Float64Array;
  readonly rounding: Float64Array;

  /** Replaced when a value changes how direct current can pass. */
  hull: Hull;

  // --- What `derived` was worked out from ---
  readonly seenValues: Float64Array;
  readonly seenTemperatures: Float64Array;
  readonly seenLeaks: Float64Array;
}

/** Numbers and lays out a circuit whose structure is known to be sound. */
export function layOut(circuit: Circuit): Prepared {
  const unknownNames: string[] = circuit.nodes.slice(1);
  const rowKinds: number[] = unknownNames.map(() => 0);

  // --- Elements of one law side by side ---
  const byLaw = new Map<ElementLaw, { element: Element; index: number }[]>();
  circuit.elements.forEach((element, index) => {
    const group = byLaw.get(element.law);
    if (group) group.push({ element, index });
    else byLaw.set(element.law, [{ element, index }]);
  });
  // Linear laws first, so that their share of the matrix is one stretch of entries.
  const isLinear = (law: ElementLaw) => law.linear ?? false;
  const groups = [...byLaw].sort(([a], [b]) => Number(isLinear(b)) - Number(isLinear(a)));

  const places: ElementPlace[] = [];
  const batches: { law: ElementLaw; batch: Batch }[] = [];
  const gather: number[] = [];
  const entryRows: number[] = [];
  const entryColumns: number[] = [];
  const lagging: EntryPlace[] = [];
  const inner: InnerNode[] = [];
  let derived = 0;
  let memory = 0;
  let value = 0;
  // The reference's place, size, is only known at the end; −1 stands in.
  let linearEntries = 0;
  for (const [law, group] of groups) {
    batches.push({
      law,
      batch: { count: group.length, unknown: gather.length, slot: entryRows.length, derived, memory },
    });
    for (const { element, index } of group) {
      const isSource = law.paths(element.values).some(({ kind }) => kind === 'source');
      places.push({
        element,
        index,
        unknown: gather.length,
        slot: entryRows.length,
        derived,
        memory,
        value,
        isSource,
      });
      const local = element.nodes.map((node) => node - 1);
      for (const name of law.internals) local.push(addUnknown(`${element.name}.${name}`, 0));
      for (const name of law.branches) local.push(addUnknown(`${element.name}.${name}`, 1));
      (law.behind ?? []).forEach((terminal, k) => {
        const node = law.terminals.length + k;
        const joining = law.pattern.findIndex(([row, column]) => row === node && column === terminal);
        inner.push({
          row: local[node] ?? -1,
          node: gather.length + node,
          terminal: gather.length + terminal,
          entry: entryRows.length + joining,
        });
      });
      gather.push(...local);
      for (const [row, column] of law.pattern) {
        entryRows.push(local[row] ?? -1);
        entryColumns.push(local[column] ?? -1);
      }
      for (const [row, column] of law.lags ?? []) lagging.push([local[row] ?? -1, local[column] ?? -1]);
      if (isLinear(law)) linearEntries = entryRows.length;
      derived += law.derivedSize;
      memory += law.memorySize;
      value += element.values.length;
    }
  }
  const size = unknownNames.length;

  function addUnknown(name: string, kind: 0 | 1): number {
    unknownNames.push(name);
    rowKinds.push(kind);
    return unknownNames.length - 1;
  }

  // --- Pattern; every node keeps its diagonal, for the methods that add to it ---
  const entries: EntryPlace[] = entryRows.map((row, k) => [row, entryColumns[k] ?? -1]);
  const diagonals = rowKinds.flatMap((kind, row): EntryPlace[] => (kind === 0 ? [[row, row]] : []));
  const pattern = createPattern(size, [...entries, ...diagonals]);
  const system = createLinearSystem(pattern);
  const orReference = (unknown: number) => (unknown < 0 ? size : unknown);

  const byIndex = [...places].sort((a, b) => a.index - b.index);
  const prepared: Prepared = {
    circuit,
    size,
    kinds: Uint8Array.from(rowKinds, (kind) => (kind === 1 ? UnknownKind.branch : UnknownKind.bound)),
    unknownNames,
    places: byIndex,
    placeOf: new Map(byIndex.map((place) => [place.element, place])),
    batches,
    gather: Int32Array.from(gather, orReference),
    slots: Int32Array.from(entries, ([row, column]) => pattern.slotOf(row, column)),
    linearEntries,
    linearMatrix: new Float64Array(pattern.entryCount + 1),
    entryRows: Int32Array.from(entryRows, orReference),
    entryColumns: Int32Array.from(entryColumns, orReference),
    diagonal: Int32Array.from(rowKinds, (kind, row) =>
      kind === 0 ? pattern.slotOf(row, row) : pattern.entryCount,
    ),
    lags: lagging.flatMap(([row, output]) =>
      output < 0 ? [] : [{ row, output, slot: pattern.slotOf(row, output) }],
    ),
    inner,
    system,
    work: {
      x: new Float64Array(gather.length),
      residual: new Float64Array(gather.length),
      jacobian: new Float64Array(entries.length),
      derived: new Float64Array(derived),
      memory: new Float64Array(memory),
      phase: Phase.exact,
      linearKnown: false,
      limited: false,
      sourceScale: 1,
      gainScale: 1,
    },
    x: new Float64Array(size + 1),
    residual: new Float64Array(size + 1),
    step: new Float64Array(size + 1),
    magnitude: new Float64Array(size + 1),
    rounding: new Float64Array(size + 1),
    hull: findHull(circuit),
    seenValues: new Float64Array(value).fill(NaN),
    seenTemperatures: new Float64Array(places.length).fill(NaN),
    seenLeaks: new Float64Array(places.length).fill(NaN),
  };
  updateKinds(prepared);
  return prepared;
}

/** Works out the kind of every node from the hull. */
export function updateKinds({ circuit, hull, kinds, places, gather }: Prepared): void {
  const kindOf = (node: number): number => {
    if (codeAt(hull.pinned, node) === 1) return UnknownKind.pinned;
    return codeAt(hull.bound, node) === 1 ? UnknownKind.bound : UnknownKind.loose;
  };
  for (let node = 1; node < circuit.nodes.length; node++) kinds[node - 1] = kindOf(node);
  let internal = circuit.nodes.length;
  for (const { element, unknown } of places) {
    const { terminals, internals } = element.law;
    for (let k = 0; k < internals.length; k++)
      kinds[indexAt(gather, unknown + terminals.length + k)] = kindOf(internal++);
  }
}
