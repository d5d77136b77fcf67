/** What is put in order from left to right: columns, lying parts, blocks, and the symbols at which a signal enters or leaves. */
import { isListener, listeners, type Net, type Unit } from './circuit.ts';
import type { Column, Lying, Standing } from './columns.ts';

export interface Cell {
  readonly form: 'column' | 'lying' | 'block' | 'symbol';
  readonly units: readonly Unit[];
  /** For a column, its parts top to bottom. */
  readonly column: Column;
  /** For a lying part. */
  readonly lying: Lying | undefined;
  /** Place in the document of its first unit. */
  readonly rank: number;
  /** Nets that it touches, power nets left out. */
  readonly nets: ReadonlySet<Net>;
  /** Nets that it only listens to. */
  readonly hears: ReadonlySet<Net>;
}

const cellOf = (form: Cell['form'], units: readonly Unit[], column: Column = [], lying?: Lying): Cell => {
  const nets = new Set<Net>();
  const carried = new Set<Net>();
  for (const unit of units) {
    for (const [pin, net] of unit.nets) {
      if (net.power !== null) continue;
      nets.add(net);
      if (!isListener({ unit, pin })) carried.add(net);
    }
  }
  const hears = new Set([...nets].filter((net) => !carried.has(net)));
  return { form, units, column, lying, rank: Math.min(...units.map((unit) => unit.rank)), nets, hears };
};

export const cellsOf = (
  standing: Standing,
  units: readonly Unit[],
  signals: ReadonlySet<Unit>,
): readonly Cell[] => {
  const symbols = units
    .filter(({ role }) => role === 'tag')
    .concat(units.filter((unit) => isSignalRail(unit, signals)));
  return [
    ...standing.columns.map((column) =>
      cellOf(
        'column',
        column.map(({ unit }) => unit),
        column,
      ),
    ),
    ...standing.lying.map((lying) => cellOf('lying', [lying.unit], [], lying)),
    ...standing.blocks.map((unit) => cellOf('block', [unit])),
    ...symbols.map((unit) => cellOf('symbol', [unit])),
  ].sort((a, b) => a.rank - b.rank);
};

export const isSignalRail = (unit: Unit, signals: ReadonlySet<Unit>): boolean =>
  unit.role === 'rail' && (signals.has(unit) || [...unit.nets.values()].every((net) => net.power === null));

/** The transistor or block of a cell that listens to a net. */
export const listenerIn = (cell: Cell, net: Net): Unit | undefined =>
  cell.units.find((unit) => listeners(unit).some((pin) => unit.nets.get(pin) === net));
