/** A few parts wired by net names, settled at 25 °C and read: as the stage does it, without a document. */
import { prepare, settle } from '../../../solver/index.ts';
import type { Element } from '../../../solver/index.ts';
import { kindNamed } from '../../../src/parts/catalogue.ts';
import type { Device } from '../../../src/parts/devices/device.ts';
import type { Figures, Law, PartContext, PartKind, ReadingContext } from '../../../src/parts/kind.ts';
import type { PartReadout } from '../../../src/parts/readout.ts';

export interface Placed {
  readonly kind: string;
  readonly name: string;
  readonly values?: Readonly<Record<string, unknown>>;
  readonly device?: Device;
  /** Net of each wired pin; `0` is the reference. A pin left out is not wired. */
  readonly pins: Readonly<Record<string, string>>;
  /** Figures in place of the nominal ones. */
  readonly figures?: Figures;
}

export const contextOf = ({ name, values = {}, device, pins }: Placed): PartContext => ({
  name,
  values,
  ...(device === undefined ? {} : { device }),
  wired: new Set(Object.keys(pins)),
});

export const kindOf = (kind: string): PartKind => {
  const found = kindNamed(kind);
  if (found === undefined) throw new Error(`no kind ${kind}`);
  return found;
};

export const nominal = (placed: Placed, law: Law = 'square'): Figures => {
  const draws = kindOf(placed.kind).draws(contextOf(placed), law);
  if (!draws.ok) throw new Error(draws.faults.map(({ message }) => message).join('; '));
  return {
    ...Object.fromEntries(draws.value.map(({ key, value }) => [key, value])),
    ...placed.figures,
  };
};

export const settleParts = (
  parts: readonly Placed[],
  law: Law = 'square',
  celsius = 25,
): Readonly<Record<string, PartReadout>> => {
  const nodes = ['0'];
  const nodeOf = (net: string) => {
    const known = nodes.indexOf(net);
    return known >= 0 ? known : nodes.push(net) - 1;
  };
  const compiled = parts.map((placed) => {
    const kind = kindOf(placed.kind);
    const node = (pin: string) => nodeOf(placed.pins[pin] ?? `${placed.name}.${pin}`);
    const context = { ...contextOf(placed), law, figures: nominal(placed, law), node };
    return { kind, name: placed.name, context, elements: kind.elements(context) };
  });
  const elements: readonly Element[] = compiled.flatMap((part) => part.elements);
  const prepared = prepare({ nodes, elements });
  if (!prepared.ok) throw new Error(prepared.faults.map(({ message }) => message).join('; '));
  const point = settle(prepared.value, { temperature: celsius + 273.15 });
  if (!point.settled) throw new Error(point.message);
  return Object.fromEntries(
    compiled.map(({ kind, name, context, elements: own }) => {
      const elementAt = (index: number) => {
        const element = own[index];
        if (element === undefined) throw new Error(`${name} has no element ${index}`);
        return element;
      };
      const reading: ReadingContext = {
        ...context,
        volts: (pin) => point.voltages[context.node(pin)] ?? NaN,
        amps: (index, terminal) => point.terminalCurrents(elementAt(index))[terminal] ?? NaN,
        operating: (index) => point.operating(elementAt(index)),
      };
      return [name, kind.readout(reading)];
    }),
  );
};

export const sumOfPinCurrents = ({ pinCurrents }: PartReadout): number =>
  Object.values(pinCurrents).reduce((sum, current) => sum + current, 0);
