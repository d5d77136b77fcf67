/**
 * Symbol art as data. Coordinates are pixels at 100 % (12 px to a grid unit), x right, y down, the symbol's
 * origin at (0, 0), as it stands unturned and unmirrored. Pins are in whole grid units.
 */
export type PathCommand =
  | readonly ['M', number, number]
  | readonly ['L', number, number]
  /** Cubic Bézier: two controls and the end. */
  | readonly ['C', number, number, number, number, number, number]
  | readonly ['Z'];

/** Marks that are read like a letter, so they stay upright however the symbol is turned. */
export type UprightMark = 'plus' | 'minus' | 'sine' | 'letter-m' | 'step';

export type SymbolShape =
  | {
      readonly shape: 'path';
      readonly commands: readonly PathCommand[];
      /** `none` strokes only; `paper` fills with the ground so nothing shows inside; `ink` is solid. */
      readonly fill: 'none' | 'paper' | 'ink';
    }
  | {
      readonly shape: 'circle';
      readonly x: number;
      readonly y: number;
      readonly radius: number;
      readonly fill: 'none' | 'paper' | 'ink';
    }
  /** A short upright mark inside a body (plus, minus): never turned or mirrored with the symbol, only moved. */
  | { readonly shape: 'upright'; readonly mark: UprightMark; readonly x: number; readonly y: number };

export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export interface SymbolArt {
  /** Pin name to its offset in grid units. Order is the order of pins in the stage file's table. */
  readonly pins: Readonly<Record<string, readonly [number, number]>>;
  readonly shapes: readonly SymbolShape[];
  /** Strokes drawn only where the pin of that name carries a wire: an amplifier's supplies. */
  readonly whenWired?: Readonly<Record<string, readonly SymbolShape[]>>;
  /** What wires and texts keep clear of, leads left out, pixels. */
  readonly body: Box;
}
