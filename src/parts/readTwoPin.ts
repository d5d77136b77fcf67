import type { ReadingContext } from './kind.ts';
import type { PinCurrents, PartReadout, TwoPinFigures } from './readout.ts';

/** Reads a part of two pins that is one element, its terminals in the order of the pins. */
export const readTwoPins = (
  context: ReadingContext,
  [first, second]: readonly [string, string],
): { readonly figures: TwoPinFigures; readonly pinCurrents: PinCurrents } => {
  const voltage = context.volts(first) - context.volts(second);
  const current = context.amps(0, 0);
  return {
    figures: { voltage, current, power: voltage * current },
    pinCurrents: { [first]: current, [second]: context.amps(0, 1) },
  };
};

export const readTwoPin =
  (pins: readonly [string, string]) =>
  (context: ReadingContext): PartReadout => ({ shape: 'two-pin', ...readTwoPins(context, pins) });

/** As `readTwoPin`, for a source: with the power it gives to the circuit. */
export const readSource =
  (pins: readonly [string, string]) =>
  (context: ReadingContext): PartReadout => {
    const { figures, pinCurrents } = readTwoPins(context, pins);
    return { shape: 'supply', figures: { ...figures, delivered: -figures.power }, pinCurrents };
  };
